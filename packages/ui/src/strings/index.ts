export {
  clauseTypeHints,
  clauseTypeWords,
  describeBaseline,
  describeClause,
  describeKey,
  describeMargin,
  describeTerms,
  figureWords,
  subjectWords,
} from './clauses'
export { choiceWords, clauseFieldWords, describeParameter, marginBaseWords } from './fields'
export { describeIncentive, incentiveWords, type IncentiveSentence } from './incentives'
export { numberProblemWords, problemWords } from './problems'
export { describeReason, describeSettling, reasonWords, settleWords, type ReasonWords } from './reasons'
export { roleWords, sideWords } from './roles'
export { describeRule } from './rules'
export {
  agreementStateWords,
  challengeStateWords,
  classWords,
  coverageWords,
  studyStateWords,
  submissionStateWords,
} from './states'
export { verdictWords } from './verdicts'
export { describeWarning, nameReadings, warningWords } from './warnings'
