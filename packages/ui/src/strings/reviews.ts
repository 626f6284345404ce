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
] as const
export type ActName = (typeof actNames)[number]

interface ActFacts extends Parties {
  gauge: string
  safety: boolean
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
    text: ({ supplier, gauge, safety }) =>
      safety
        ? `The characteristic is of class safety: a second person of your organisation must confirm before ${gauge} counts as accepted. ${supplier} is told then.`
        : `${capital(gauge)} counts as accepted proof for this characteristic. ${supplier} is told at once, and the decision stands in the record of both sides.`,
    submit: 'Accept',
    cannot: 'You cannot accept it:',
  },
  'accept-with-conditions': {
    title: 'Accept it on conditions?',
    text: ({ supplier, safety }) =>
      `${supplier} sees what must follow and until when.${safety ? ' The characteristic is of class safety: a second person of your organisation must confirm first.' : ''} The decision stands in the record of both sides.`,
    submit: 'Accept with conditions',
    cannot: 'You cannot accept it on conditions:',
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
  } satisfies Record<ActName, string>,
  conditions: 'What must follow',
  conditionsHint: 'Such as “Repeat the study with 30 readings on the new fixture”.',
  dueOn: 'Until when',
  sayWhy: 'Say why.',
  sayWhat: 'Say what must follow.',
  sayWhen: 'Choose the day by which it must follow.',
  dueInPast: 'Choose a day from today on.',
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
    final: '',
    withdrawn: 'not confirmed',
  } satisfies Record<reviews.Decision['state'], string>,
  conditionsUntil: (day: string) => `Until ${day}:`,
  secondBy: (name: string | null) => (name === null ? 'a second person' : name),
  sentBack: 'Not confirmed:',
  safetyTitle: 'Safety class: two people decide.',
  safetyText:
    'Whoever accepts it first only proposes; the acceptance counts once somebody else of the customer confirms it, signed in afresh.',
  /** Beside a clause that an estimate or a zero-difference test decides. */
  weakOnSafety:
    'Safety class: this clause is met by an estimate, or by failing to find a difference. It proves little by itself.',
  somebody: 'Somebody of the customer',
} as const

export const challengeWords = {
  heading: 'Challenges',
  challenge: 'Challenge this result',
  challengeAny: 'Challenge a result',
  toAnswer: (number: number) => `Answer challenge ${number}`,
  title: 'Challenge a result?',
  text: (supplier: string) =>
    `${supplier} is told what you doubt and answers in words. Nothing is decided while the challenge is open.`,
  clause: 'Result in question',
  chooseClause: 'Choose the result you challenge.',
  reason: 'What is in doubt',
  chooseReason: 'Choose what is in doubt.',
  words: 'What is wrong with it',
  wordsMissing: 'Say what is wrong, so that it can be answered.',
  sayMissing: 'Say it in words.',
  reasons: {
    result: 'The result',
    readings: 'The readings',
    'set-up': 'The set-up of the gauge',
    'reference-standard': 'The reference standard',
    calculation: 'The calculation',
  } satisfies Record<reviews.ChallengeReason, string>,
  reasonHints: {
    result: 'the verdict does not follow from what was shown',
    readings: 'how, when or by whom they were taken',
    'set-up': 'fixture, adjustment, software, place',
    'reference-standard': 'its value, uncertainty or certificate',
    calculation: 'the way from the readings to the figure',
  } satisfies Record<reviews.ChallengeReason, string>,
  numbered: (number: number) => `Challenge ${number}`,
  about: (reason: string) => `in doubt: ${reason.charAt(0).toLowerCase()}${reason.slice(1)}`,
  mark: (number: number) => `challenge ${number}`,
  states: {
    open: {
      supplier: 'waits for your answer',
      customer: 'waits for the supplier’s answer',
      anybody: 'waits for the supplier’s answer',
    },
    answered: {
      supplier: 'answered; the customer has the next word',
      customer: 'answered; your word is next',
      anybody: 'answered; the customer has the next word',
    },
    'resolved-by-evidence': {
      supplier: 'settled by the answer',
      customer: 'settled by the answer',
      anybody: 'settled by the answer',
    },
    withdrawn: {
      supplier: 'withdrawn by the customer',
      customer: 'withdrawn',
      anybody: 'withdrawn by the customer',
    },
    unresolved: { supplier: 'left unresolved', customer: 'left unresolved', anybody: 'left unresolved' },
  },
  closed: (day: string, name: string | null) => (name === null ? day : `${day} by ${name}`),
  say: {
    answer: {
      act: 'Answer',
      title: 'Answer the challenge',
      text: (facts: Parties) => `${facts.customer} is told and decides whether the answer settles it.`,
      field: 'Your answer',
      submit: 'Send the answer',
      required: true,
    },
    reply: {
      act: 'Reply, keep it open',
      title: 'Reply to the answer',
      text: (facts: Parties) => `The challenge is open again: ${facts.supplier} is asked for another answer.`,
      field: 'Your reply',
      submit: 'Reply, keep it open',
      required: true,
    },
    settle: {
      act: 'The answer settles it',
      title: 'Does the answer settle it?',
      text: () =>
        'The challenge ends as resolved by evidence. The decision on the submission is still yours to make.',
      field: 'Closing words',
      submit: 'The answer settles it',
      required: false,
    },
    withdraw: {
      act: 'Withdraw the challenge',
      title: 'Withdraw the challenge?',
      text: () =>
        'The challenge ends as withdrawn and stays on the page. The decision is still yours to make.',
      field: 'Closing words',
      submit: 'Withdraw the challenge',
      required: false,
    },
  },
} as const
