import type { agreements, Side } from '@evenrule/api/contract'
import { formatCount, formatDate } from '../format'
import { several, whose } from './agreements'

export const editorWords = {
  heading: { draft: 'Our proposal', answer: 'Our answer', begin: 'Our proposal for a new version' },
  clause: (at: number) => `Clause ${at + 1}`,
  remove: 'Remove',
  removeLabel: (name: string) => `Remove: ${name}`,
  replace: 'Kind',
  empty: 'No clause yet. Add the first one.',
  wider: 'What is not named here stays as agreed for the wider scope.',
  effectiveOn: 'First day in force',
  effectiveOnHint: (timeZone: string) => `In the time zone ${timeZone}. Both sides must have signed by then.`,
  effectiveOnMissing: 'Choose the first day in force.',
  effectiveOnPast: 'Choose today or a later day.',
  comment: 'Comment to the other side',
  commentHint: (other: string) => `${other} reads it with this round.`,
  saved: 'Draft saved.',
  repeated: (what: string) => `Two clauses here judge the same thing (${what}). Keep one of them.`,
} as const

export const actWords = {
  acceptTitle: (round: number) => `Accept round ${round}?`,
  acceptText: (other: string, day: string) =>
    `Its text is fixed as it stands and waits for an approver of each side. Nothing is in force before both have signed; the first day is ${formatDate(day)}. ${other} is told.`,
  withdrawTitle: 'Withdraw this negotiation?',
  withdrawText: (other: string) =>
    `The version ends here. ${other} sees the reason, and either side can propose another. What is in force stays in force.`,
  reason: 'Reason',
  reasonHint: 'Both sides read it in the record.',
  discardTitle: 'Discard this draft?',
  discardText: 'Nobody else has seen it. It cannot be brought back.',
} as const

/** Why a move is allowed but cannot be made now, with the mend. */
export const hindranceWords: Record<agreements.AgreementHindrance['code'], string> = {
  'no-clauses': 'There is no clause in it yet.',
  'clauses-cannot-be-agreed':
    'A clause cannot be computed for this scope; the row says which. Propose it with another margin or base.',
  'effective-date-past': 'Its first day in force has passed. Propose a later one.',
  'negotiation-open': 'Another version of this scope is under negotiation; it must end first.',
  'limits-changed':
    'Limits of a characteristic have changed since this was agreed. Withdraw it and propose the clauses anew.',
  'own-side-has-signed': 'Our side has signed.',
  'last-clause': 'It is the last clause of the round. Withdraw the proposal instead.',
  'round-replaced':
    'The round it answers has been replaced. Go on with the answer, look at the new round, then send it.',
}

export const signWords = {
  heading: 'Sign these criteria',
  intro: (day: string) =>
    `Your signature binds your side to this text from ${formatDate(day)}, once the other side has signed the same bytes.`,
  seen: 'I have seen what these clauses reward',
  seenHint:
    'The plots and words above: what a worse gauge, fewer readings and a stricter risk level do to the chance to pass.',
  seenPlain: 'I have read these clauses',
  seenMissing: 'Look at the consequences above and tick this before you sign.',
  perverse: (names: string) =>
    `Rewards the wrong thing: ${names}. That is legal to agree on; sign it only if you want it.`,
  sign: 'Sign',
  afresh: 'Signing needs a fresh sign-in, so that it is surely you.',
  hash: 'SHA-256 of the text',
  showText: 'Show the exact text',
  hideText: 'Hide the exact text',
  text: 'The exact text that both sides sign',
  notApprover: 'An approver of your side signs it.',
} as const

export const signatureWords = {
  heading: 'Signatures',
  none: 'not signed yet',
  by: 'for',
  at: 'signed',
  caption: 'Signatures of both sides',
  same: 'Both signatures name this hash.',
  person: (name: string | null) => name ?? 'a person no longer named',
} as const

export const roundsWords = {
  heading: 'Rounds',
  round: (number: number, side: Side, own: Side, other: string) =>
    `Round ${number}, ${whose(side, own, other)}`,
  sent: (at: string) => `sent ${at}`,
  first: (count: number, day: string) =>
    `${formatCount(count, 'clause')}, first day in force ${formatDate(day)}.`,
  day: (before: string, after: string) => `First day in force: ${formatDate(before)} → ${formatDate(after)}`,
  noChange: 'The clauses stay as in the round before.',
  added: (what: string) => `New: ${what}`,
  removed: (what: string) => `Falls away: ${what}`,
  replaced: (subject: string, before: string, after: string) => `${subject}: ${before} → ${after}`,
  parameter: (subject: string, label: string, before: string, after: string) =>
    `${label.startsWith(subject) ? label : `${subject}, ${label.toLowerCase()}`}: ${before} → ${after}`,
} as const

export const versionsWords = {
  heading: 'Versions',
  version: (number: number | null) => (number === null ? 'Draft' : `Version ${number}`),
  from: (day: string | null) => (day ? `from ${formatDate(day)}` : ''),
  shown: 'shown above',
  show: 'Show',
} as const

export const proposeWords = {
  title: 'What do you want to agree on?',
  partner: { supplier: 'Customer', customer: 'Supplier' },
  partnerMissing: { supplier: 'Choose the customer.', customer: 'Choose the supplier.' },
  scope: 'Criteria for',
  part: 'Part number',
  partMissing: 'Choose the part number.',
  searchPart: 'Type a part number or name',
  noPart: 'No part number is found. Enter it under Parts first.',
  characteristic: 'Characteristic',
  characteristicMissing: 'Choose the characteristic.',
  searchCharacteristic: 'Type its name',
  noCharacteristic: 'No characteristic of the current revision is found.',
  begin: 'Begin the proposal',
  fromHouseTerms: (number: number) =>
    `It starts with the clauses and terms of house terms ${number}; you can change them before you send it.`,
  beginHint: 'It begins as a draft that only your side sees.',
} as const

export const taskCriteriaWords = {
  heading: 'Criteria',
  none: 'No criteria apply to this measuring task today.',
  noneHint: 'What is measured can be judged only once both sides have signed criteria for it.',
  apply: (count: number, day: string) =>
    `${several(count, 'clause')} ${count === 1 ? 'applies' : 'apply'} today, ${formatDate(day)}.`,
  since: (day: string) => `Criteria are in force without a gap since ${formatDate(day)}.`,
  clause: 'Clause',
  subject: 'About',
  reason: 'Why it applies',
  why: 'What applies on another day, and why',
  from: (agreement: number, version: number) => `Agreement ${agreement}, version ${version}`,
  scope: { relationship: 'for all parts', part: 'for this part', characteristic: 'for this characteristic' },
  inForceSince: (day: string) => `in force since ${formatDate(day)}`,
  caption: 'Clauses that apply to this measuring task',
  propose: 'Go to agreements',
} as const

/** Beside a clause that proves little, where it would apply to characteristics of class safety. */
export const safetyFlagWords: Record<
  agreements.AgreementRound['flags'][number]['code'],
  (count: number) => string
> = {
  'zero-difference': (count) =>
    `Applies to ${formatCount(count, 'characteristic')} of class safety: it is met by failing to find a difference, and proves little by itself.`,
  'point-estimate': (count) =>
    `Applies to ${formatCount(count, 'characteristic')} of class safety: it is met by an estimate alone, which luck can bring about.`,
}
