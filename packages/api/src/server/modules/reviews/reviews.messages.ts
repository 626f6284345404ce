import type { ConditionMoveName } from '../../../contract/moves/condition'
import type { Side } from '../../../contract/access'
import { dayInWords } from '../../calendar'
import type { Spoken } from './challenges.follow.service'

interface Said {
  subject: string
  body: string[]
}

interface Asked {
  text: string
  dueOn: string
  owner: Side
}

const listed = (conditions: readonly Asked[]): string[] =>
  conditions.map(({ text, dueOn, owner }) => `Until ${dayInWords(dueOn)}, by the ${owner}: ${text}`)

/** What messages about the review of a submission say; `words` is what a person wrote. */
export const reviewMessages = {
  accepted: (words: string) => ({ subject: 'Accepted', body: [words] }),
  acceptedWithConditions: (conditions: readonly Asked[], words: string) => ({
    subject: 'Accepted with conditions',
    body: ['What must follow:', ...listed(conditions), words],
  }),
  refused: (words: string) => ({ subject: 'Refused', body: ['The reason given:', words] }),
  secondPersonAsked: () => ({
    subject: 'Waits for a second person',
    body: ['On a safety-class characteristic somebody else must confirm the acceptance, or send it back.'],
  }),
  sentBack: (words: string) => ({
    subject: 'Acceptance not confirmed',
    body: ['The review goes on. The reason given:', words],
  }),
  oneOffProposed: (conditions: readonly Asked[], words: string) => ({
    subject: 'Accepted, waits for your agreement',
    body: [
      'No criteria are agreed for it, so an approver of your side has to agree before it counts.',
      ...listed(conditions),
      words,
    ],
  }),
  oneOffAgreed: () => ({
    subject: 'One-off acceptance agreed',
    body: ['An approver of the supplier agreed. The acceptance counts from now.'],
  }),
  oneOffDeclined: (words: string) => ({
    subject: 'One-off acceptance not agreed',
    body: ['The review goes on. The reason given:', words],
  }),
  correctionWaits: (note: string) => ({
    subject: 'Correction waits for your signature',
    body: ['Read what was corrected, then sign it. Whoever took the readings may not sign.', note],
  }),
}

/** What messages about a challenge say, by the move that was made. */
export const challengeMessages: Record<
  Spoken,
  (words: string, challenge: { dueOn: string; laboratory: string | null }) => Said
> = {
  open: (words, { dueOn }) => ({
    subject: 'Challenged',
    body: [words, `Answer it until ${dayInWords(dueOn)}.`],
  }),
  answer: (words) => ({ subject: 'Challenge answered', body: [words] }),
  correct: (words) => ({
    subject: 'Challenge answered by a correction',
    body: [words, 'The corrected readings stand beside the earlier ones, which are kept.'],
  }),
  reply: (words) => ({ subject: 'Answer does not settle the challenge', body: [words] }),
  settle: (words) => ({ subject: 'Challenge settled', body: [words] }),
  withdraw: (words) => ({ subject: 'Challenge withdrawn', body: [words] }),
  'propose-unresolved': (words, { laboratory }) => ({
    subject: 'Proposal to leave a challenge unresolved',
    body: [
      words,
      laboratory === null ? '' : `Laboratory named: ${laboratory}.`,
      'An approver of your side agrees, or does not and says why.',
    ],
  }),
  'agree-unresolved': (words) => ({ subject: 'Challenge left unresolved', body: [words] }),
  'decline-unresolved': (words) => ({
    subject: 'Not agreed to leave the challenge unresolved',
    body: [words],
  }),
}

/** What messages about a condition say, by the move that was made. */
export const conditionMessages: Record<
  ConditionMoveName,
  (words: string, condition: { number: number; text: string }) => Said
> = {
  report: (words, { number, text }) => ({
    subject: `Condition ${number} reported done`,
    body: [text, words, 'Confirm that it is fulfilled, or say what is missing.'],
  }),
  confirm: (words, { number, text }) => ({ subject: `Condition ${number} confirmed`, body: [text, words] }),
  return: (words, { number, text }) => ({
    subject: `Condition ${number} not fulfilled yet`,
    body: [text, words],
  }),
}
