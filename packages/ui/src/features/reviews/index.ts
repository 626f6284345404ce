export { default as AnswerDialog } from './AnswerDialog.vue'
export { default as ChallengeDialog } from './ChallengeDialog.vue'
export {
  challengesOf,
  challengesOfStudy,
  isUnderChallenge,
  mayChallenge,
  possibleSayings,
  readingsInQuestion,
  type Saying,
} from './challenges'
export { default as ChallengesSection } from './ChallengesSection.vue'
export { default as ConditionDialog } from './ConditionDialog.vue'
export { default as ConditionsSection } from './ConditionsSection.vue'
export { default as CorrectionDialog } from './CorrectionDialog.vue'
export { default as MessageList } from './MessageList.vue'
export { default as ResultActs } from './ResultActs.vue'
export { default as SayDialog } from './SayDialog.vue'
