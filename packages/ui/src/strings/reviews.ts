import type { reviews } from '@evenrule/api/contract'
import { capital } from '../format'
import type { Parties } from './submissions'

/** What can be done with a submission by a button; challenges have acts of their own. */
export const actNames = [
  'send-for-signature',
  'return',
  'sign',
  'discard',
  'withdraw',
  'accept',
  'accept-with-conditions',
  'refuse',
  'confirm',
  'send-back',
  'agree-one-off',
  'decline-one-off',
] as const
export type ActName = (typeof actNames)[number]

interface ActFacts extends Parties {
  gauge: string
  safety: boolean
  /** No criteria are agreed: an approver of each side decides. */
  oneOff: boolean
}
export interface ActWords {
  /** The question of the dialog. */
  title: string
  /** What will happen. */
  text: (facts: ActFacts) => string
  /** What the button in the dialog says. */
  submit: string
  /** What cannot be done, before its reason. */
  cannot: string
}

export const actWords: Record<ActName, ActWords> = {
  'send-for-signature': {
    title: 'Send it for signature?',
    text: ({ supplier }) =>
      `The approvers of ${supplier} are told. The studies chosen stay as they are until it is signed or returned.`,
    submit: 'Send for signature',
    cannot: 'You cannot send it for signature:',
  },
  return: {
    title: 'Return it to its draft?',
    text: () =>
      'Whoever prepared it sees your note and can change the studies. The customer sees nothing of it.',
    submit: 'Return with a note',
    cannot: 'You cannot return it:',
  },
  sign: {
    title: 'Sign and submit?',
    text: ({ supplier, customer }) =>
      `You sign for ${supplier}. ${customer} sees it at once: the verdicts, the readings behind them and every attempt made. Nothing in it can change afterwards; a correction is a new submission.`,
    submit: 'Sign and submit',
    cannot: 'You cannot sign it:',
  },
  discard: {
    title: 'Discard this submission?',
    text: ({ customer }) =>
      `It was not signed, so ${customer} never saw it. Its studies stay, and another submission can be prepared from them.`,
    submit: 'Discard',
    cannot: 'You cannot discard it:',
  },
  withdraw: {
    title: 'Withdraw the submission?',
    text: ({ customer }) =>
      `${customer} is told, with your reason, and decides nothing on it any more. It stays in the record of both sides.`,
    submit: 'Withdraw the submission',
    cannot: 'You cannot withdraw it:',
  },
  accept: {
    title: 'Accept the submission?',
    text: ({ supplier, gauge, safety, oneOff }) =>
      oneOff
        ? `No criteria are agreed, so this is a decision for this once: ${safety ? 'a second person of your organisation confirms it, and then ' : ''}an approver of ${supplier} must agree before ${gauge} counts as accepted.`
        : safety
          ? `The characteristic is of class safety: a second person of your organisation must confirm before ${gauge} counts as accepted. ${supplier} is told then.`
          : `${capital(gauge)} counts as accepted proof for this characteristic. ${supplier} is told at once, and the decision stands in the record of both sides.`,
    submit: 'Accept',
    cannot: 'You cannot accept it:',
  },
  'accept-with-conditions': {
    title: 'Accept it with conditions?',
    text: ({ supplier, safety, oneOff }) =>
      `${supplier} sees what must follow and until when.${oneOff ? ` No criteria are agreed, so one of its approvers must agree before it counts.` : ''}${safety ? ' The characteristic is of class safety: a second person of your organisation must confirm first.' : ''} The decision stands in the record of both sides.`,
    submit: 'Accept with conditions',
    cannot: 'You cannot accept it with conditions:',
  },
  refuse: {
    title: 'Refuse the submission?',
    text: ({ supplier }) =>
      `${supplier} is told, with your reason, and can answer only by a new submission. Challenges that were answered stay unresolved.`,
    submit: 'Refuse',
    cannot: 'You cannot refuse it:',
  },
  confirm: {
    title: 'Confirm the acceptance as second person?',
    text: ({ supplier, gauge }) =>
      `${capital(gauge)} counts as accepted proof for this safety characteristic. ${supplier} is told at once, and both names stand in the record.`,
    submit: 'Confirm as second person',
    cannot: 'You cannot confirm it:',
  },
  'send-back': {
    title: 'Not confirm the acceptance?',
    text: () =>
      'The review goes on as if it had not been decided. Your own side sees the reason; the supplier is not told of it.',
    submit: 'Send back to review',
    cannot: 'You cannot send it back:',
  },
  'agree-one-off': {
    title: 'Agree to the acceptance?',
    text: ({ customer, gauge }) =>
      `No criteria were agreed beforehand. ${customer} accepts it this once; with your signature ${gauge} counts as accepted proof, and both signatures stand in the record.`,
    submit: 'Agree and sign',
    cannot: 'You cannot agree to it:',
  },
  'decline-one-off': {
    title: 'Not agree to the acceptance?',
    text: ({ customer }) => `${customer} sees your reason, and the review goes on.`,
    submit: 'Do not agree',
    cannot: 'You cannot decline it:',
  },
}

export const decisionWords = {
  stale:
    'A signature needs a sign-in of the last five minutes, and yours is older. You are asked to sign in again and come back to this question.',
  fresh: 'You have signed in afresh, so the signature can be given now.',
  signsText: 'You sign the text with this SHA-256:',
  /** What the words of a move are. */
  wordsOf: {
    'send-for-signature': 'Note for the approvers',
    return: 'What should change',
    withdraw: 'Why it is withdrawn',
    accept: 'Remark for the supplier',
    'accept-with-conditions': 'Remark for the supplier',
    refuse: 'Why it is refused',
    'send-back': 'Why it is not confirmed',
    sign: '',
    discard: '',
    confirm: '',
    'agree-one-off': '',
    'decline-one-off': 'Why you do not agree',
  } satisfies Record<ActName, string>,
  sayWhy: 'Say why.',
  /** In place of the moves, where the same reason keeps several back. */
  cannotDecide: 'You cannot decide on it yet:',
  secondPerson: (name: string | null) =>
    name === null
      ? 'Somebody has decided to accept it. On a safety-class characteristic that counts only once a second person confirms.'
      : `${name} has decided to accept it. On a safety-class characteristic that counts only once a second person confirms.`,
  secondPersonSupplier: (customer: string) =>
    `The characteristic is of class safety, so ${customer} decides with two people. The first has decided; the second has not yet.`,
  kinds: {
    accepted: 'Accepted',
    'accepted-with-conditions': 'Accepted with conditions',
    refused: 'Refused',
  } satisfies Record<reviews.DecisionKind, string>,
  states: {
    'awaiting-second-person': 'waits for a second person',
    'awaiting-other-side': 'waits for an approver of the supplier',
    final: '',
    withdrawn: 'did not take effect',
  } satisfies Record<reviews.Decision['state'], string>,
  conditionUntil: (number: number, day: string) => `Condition ${number}, until ${day}:`,
  secondBy: (name: string | null) => (name === null ? 'a second person' : name),
  sentBack: 'Not confirmed:',
  declined: (name: string | null) => `${name ?? 'An approver of the supplier'} did not agree:`,
  otherSideBy: (name: string | null) => `${name ?? 'an approver of the supplier'} agreed`,
  ofRevision: (revision: number) => `on revision ${revision}`,
  safetyTitle: 'Safety class: two people decide.',
  safetyText:
    'Whoever accepts it first only proposes; the acceptance counts once somebody else of the customer confirms it, signed in afresh.',
  /** Beside a clause that an estimate or a zero-difference test decides. */
  weakOnSafety:
    'Safety class: this clause is met by an estimate, or by failing to find a difference. It proves little by itself.',
  somebody: 'Somebody of the customer',
} as const
