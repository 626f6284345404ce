import { submissions, type Side } from '@evenrule/api/contract'
import { waitsOn } from '@evenrule/api/contract/moves/submission'
import { clauseBasis, clauseDescriptor } from '@evenrule/metrology'
import { formatNumber, parseNumber } from '../../format'
import type { Parties } from '../../strings/submissions'
import { readingsOf, studyFiguresOf, type StudyFigures } from '../results/studyFigures'
import { resultOf, type ClauseResult } from '../results/types'
import { unjudgedStudy } from '../studies/unjudged'

export type Content = submissions.SubmissionContent
export type FrozenStudy = submissions.FrozenStudy

/** A submission with its frozen text read, made ready to be shown. */
export interface ReadSubmission {
  submission: submissions.Submission
  content: Content
  /** The revision that is shown. */
  revision: number
  /** Of the agreed clauses, in the order of the text. */
  results: ClauseResult[]
  /** Of house terms, judged for information where no criteria are agreed. */
  advisory: ClauseResult[]
}

/** Reads the frozen text and the evaluations of a submission; clauses stand in the order of the text. */
export function readContent(submission: submissions.Submission): ReadSubmission {
  const content = submissions.submissionContentSchema.parse(JSON.parse(submission.text))
  const evaluated = (clauseKey: string) =>
    submission.evaluations.find((evaluation) => evaluation.clauseKey === clauseKey)
  const results = content.clauses.flatMap((clause) => {
    const evaluation = evaluated(clause.clauseKey)
    const { agreementNumber, versionNumber, scope } = clause
    return evaluation ? [resultOf(evaluation, { agreementNumber, versionNumber, scope })] : []
  })
  const advisory = content.advisory.flatMap(({ clauseKey }) => {
    const evaluation = evaluated(clauseKey)
    return evaluation ? [resultOf(evaluation, null)] : []
  })
  return { submission, content, revision: submission.revision, results, advisory }
}

/** Both organisations by name, and on which side the reader is; null for a reader of either or none. */
export const partiesOf = ({ relationship }: Content, side: Side | null): Parties => ({
  side,
  supplier: relationship.supplier.name,
  customer: relationship.customer.name,
})

/** The results of agreed clauses that rest on the readings of one study; house terms explain no plot. */
export const resultsOfStudy = (
  { content, results }: Pick<ReadSubmission, 'content' | 'results'>,
  code: string,
): ClauseResult[] => {
  const keys = content.clauses.filter(({ study }) => study === code).map(({ clauseKey }) => clauseKey)
  return results.filter(({ clauseKey }) => keys.includes(clauseKey))
}

/** What the plot of a study shows; where no clause rests on its readings, they are computed here. */
export function figuresOfStudy(read: ReadSubmission, study: FrozenStudy): StudyFigures | null {
  const judged = studyFiguresOf(resultsOfStudy(read, study.code))
  if (judged) return judged
  // As entered: the decimal sign may be a comma.
  const values = study.data.readings.map((text) => parseNumber(text).value ?? NaN)
  const output = unjudgedStudy(study, { values })
  return output && readingsOf(values, study.unit, output)
}

/**
 * On a safety-class characteristic: a clause that an estimate decides, or one that is met by failing to find a
 * difference, proves little by itself.
 */
export const isWeakOnSafety = ({ clause }: Pick<ClauseResult, 'clause'>, content: Content): boolean =>
  content.characteristic.class === 'safety' &&
  (clause.type === 'bias-zero-test' ||
    (clauseBasis(clause) === 'estimate' && clauseDescriptor(clause).studyKind !== null))

export type WaitsFor = 'us' | 'them' | null

/** Whose step is next, seen from the reader's side. */
export const waitsFor = (state: submissions.Submission['state'], side: Side): WaitsFor =>
  waitsOn[state] === null ? null : waitsOn[state] === side ? 'us' : 'them'

/** The first digits of a hash, enough to tell it apart when read aloud. */
export const shortHash = (hash: string): string => hash.slice(0, 12)

const kilo = 1000
/** The size of a file: "312 B", "4.1 kB", "2.0 MB". */
export function sizeParts(bytes: number): { value: number; unit: 'B' | 'kB' | 'MB'; digits: number } {
  if (bytes < kilo) return { value: bytes, unit: 'B', digits: 0 }
  if (bytes < kilo * kilo) return { value: bytes / kilo, unit: 'kB', digits: 1 }
  return { value: bytes / kilo / kilo, unit: 'MB', digits: 1 }
}

/** The same as text. */
export function sizeText(bytes: number): string {
  const { value, ...format } = sizeParts(bytes)
  return formatNumber(value, format)
}
