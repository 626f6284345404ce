import type { Side, submissions } from '@evenrule/api/contract'
import type { SubmissionState } from '@evenrule/api/contract/moves/submission'
import { capital, countWord, formatCount, formatDate } from '../format'

/** Who stands on either side of a submission, and on which side the reader is; null for anybody, as on paper. */
export interface Parties {
  side: Side | null
  supplier: string
  customer: string
}

const whose = (parties: Parties, side: Side): string =>
  parties.side === side ? 'your' : `${parties[side]}${parties[side].endsWith('s') ? '’' : '’s'}`

/** How long something has stood still: "today", "1 day", "6 days". */
export const ageText = (days: number): string => (days <= 0 ? 'today' : formatCount(days, 'day'))
const waits = (days: number, what: string): string =>
  days <= 0 ? `It waits for ${what}.` : `It has waited ${formatCount(days, 'day')} for ${what}.`

/** Where a submission stands and whose step is next: the decisive part, and the rest. */
export const standingWords: Record<
  SubmissionState,
  (parties: Parties, days: number, decidedAt: string | null) => [string, string]
> = {
  draft: () => ['A draft.', 'Choose the studies that count, then send it for signature.'],
  'for-signature': (_parties, days) => [
    waits(days, 'a signature'),
    'An approver who took none of the readings signs it.',
  ],
  submitted: (parties, days) => [waits(days, `${whose(parties, 'customer')} decision`), ''],
  challenged: (parties, days) => [
    waits(days, `${whose(parties, 'supplier')} answer`),
    parties.side === 'customer' ? 'You challenge a result.' : `${parties.customer} challenges a result.`,
  ],
  answered: (parties, days) => [
    waits(days, `${whose(parties, 'customer')} decision`),
    parties.side === 'supplier' ? 'You have answered.' : `${parties.supplier} has answered.`,
  ],
  'awaiting-second-person': (parties, days) => [
    waits(days, 'a second person'),
    `Somebody else of ${parties.customer} must confirm the acceptance.`,
  ],
  accepted: (parties, _days, decidedAt) => [
    `Accepted by ${parties.customer} on ${formatDate(decidedAt)}.`,
    '',
  ],
  'accepted-with-conditions': (parties, _days, decidedAt) => [
    `Accepted with conditions by ${parties.customer} on ${formatDate(decidedAt)}.`,
    '',
  ],
  refused: (parties, _days, decidedAt) => [`Refused by ${parties.customer} on ${formatDate(decidedAt)}.`, ''],
  withdrawn: (parties) => [`Taken back by ${parties.supplier}.`, 'It asks for nothing any more.'],
  superseded: () => ['A later submission takes its place.', ''],
}

export const submissionWords = {
  listQuestion: {
    supplier: 'What have we put before our customers?',
    customer: 'Which submissions wait for our decision?',
  },
  waitForUs: (count: number) => `${capital(countWord(count))} ${count === 1 ? 'waits' : 'wait'} for us`,
  noneForUs: 'Nothing waits for us',
  oldest: (days: number) => (days <= 0 ? ', the oldest since today' : `, the oldest for ${ageText(days)}`),
  waitForThem: {
    supplier: (count: number) =>
      count === 1 ? 'one waits for a customer' : `${countWord(count)} wait for customers`,
    customer: (count: number) =>
      count === 1 ? 'one waits for a supplier' : `${countWord(count)} wait for suppliers`,
  },
  search: 'Search gauge, part or characteristic',
  caption: 'Submissions',
  age: 'Waiting',
  submission: 'Submission',
  number: 'Number',
  other: { supplier: 'Customer', customer: 'Supplier' },
  characteristic: 'Characteristic',
  state: 'State',
  result: 'Result',
  clauses: 'Clauses',
  clausesMet: (met: number, total: number) => `${met} of ${total}`,
  safety: 'safety',
  draft: 'draft',
  numbered: (number: number) => `submission ${number}`,
  waitsOnChoices: {
    us: 'what waits for us',
    them: { supplier: 'what waits for customers', customer: 'what waits for suppliers' },
    all: 'everything',
  },
  nothingFoundText: 'Nothing of what is shown matches. The whole list may hold it.',
  nothingWaitsTitle: { us: 'Nothing waits for us', them: 'Nothing waits for the other side' },
  nothingWaitsText: 'What is decided, or waits for somebody else, is in the whole list.',
  showAll: 'Show all submissions',
  searchAll: 'Look in all submissions',
  nothingWaits: '–',
  emptyTitle: 'No submission yet',
  emptyText: {
    supplier:
      'When the studies of a measuring task are computed, put them before the customer from the page of that task.',
    customer: 'What your suppliers sign and submit for your decision is listed here.',
  },
  toParts: 'Go to the parts',
  ofTask: 'Submissions',
  emptyOfTask: 'Nothing submitted yet',
  emptyOfTaskText: {
    supplier:
      'A submission puts the verdict of every clause in force before the customer, with the studies it rests on.',
    customer: 'The supplier has not submitted proof for this measuring task.',
  },
  prepare: 'Prepare a submission',
  breadcrumb: (number: number | null) => (number === null ? 'Draft' : `Submission ${number}`),
  print: 'Print page',
  otherActs: 'Other steps',
  taskLink: 'Open the measuring task',
} as const

/** Headings and labels of the page of one submission. */
export const sectionWords = {
  clauses: 'What each clause asks, and what was shown',
  noClauses: 'No clause applies to this measuring task.',
  steps: 'How far it is',
  prepared: 'prepared',
  sentForSignature: 'sent for signature',
  signed: 'signed and submitted',
  decided: 'decided',
  withdrawn: 'taken back',
  frozen: 'What is frozen',
  frozenText:
    'The signatures name the SHA-256 of one text that holds all of this. Nothing in it can change without changing that hash.',
  wouldFreeze: 'What signing would freeze',
  wouldFreezeText: 'As things stand today. Signing freezes it; until then it follows the studies chosen.',
  wholeText: 'Text of the submission',
  agreement: (agreement: number, version: number) => `Agreement ${agreement}, version ${version}`,
  scopes: {
    relationship: 'the whole relationship',
    part: 'the part number',
    characteristic: 'the characteristic',
  },
  inForce: (day: string, scope: string) => `in force from ${day} for ${scope}`,
  criteriaOn: 'Criteria as of',
  limits: 'Limits',
  process: 'Process standard deviation',
  gauge: 'Gauge',
  resolution: 'Resolution',
  place: 'Where',
  engine: (version: string) => `Engine ${version}`,
  data: (study: string) => `Readings of study ${study}`,
  dataText: (readings: number, revision: number) =>
    revision > 1
      ? `${formatCount(readings, 'reading')}, revision ${revision}`
      : formatCount(readings, 'reading'),
  standard: (study: string) => `Reference standard of study ${study}`,
  standardText: (code: string, name: string, value: string, uncertainty: string | null, factor: string) =>
    `${code} ${name}, certified ${value}${uncertainty === null ? '' : `, expanded uncertainty ${uncertainty} (coverage factor ${factor})`}`,
  hash: 'SHA-256',
  copy: 'Copy',
  copied: 'Copied',
  attempts: 'Attempts on this measuring task',
  attemptsText: (count: number, since: string | null) =>
    since === null
      ? 'No criteria were in force for it so far, so no attempts are counted.'
      : `${formatCount(count, 'study has', 'studies have')} been registered since ${since}, the first day on which criteria for it were in force. All of them are listed, whether submitted or not.`,
  attemptCode: 'Study',
  attemptRegistered: 'Registered',
  attemptBeforehand: 'Before its first reading',
  attemptCollected: 'Collected',
  attemptState: 'State',
  attemptHere: 'In this submission',
  yes: 'yes',
  no: 'no',
  files: 'Files',
  filesText: 'Kept byte for byte; the hash of each stands in the frozen text.',
  noFiles: 'No file belongs to it: nothing was uploaded, and no certificate is attached.',
  fileRoles: {
    readings: 'readings as uploaded',
    'gauge-certificate': 'calibration certificate of the gauge',
    'standard-certificate': 'certificate of the reference standard',
  },
  fileName: 'File',
  fileRole: 'What it is',
  fileSize: 'Size',
  signatures: 'Signatures and decisions',
  noSignatures: 'Not signed yet.',
  meanings: {
    submits: 'signed and submitted it',
    accepts: 'accepted it',
    'accepts-with-conditions': 'accepted it with conditions',
    refuses: 'refused it',
    'second-person': 'confirmed as second person',
  },
  someone: { supplier: 'An approver of the supplier', customer: 'A representative of the customer' },
  signedHash: (short: string) => `names the text ${short} …`,
  notes: 'Notes before signing',
  notesText: 'These stay on your side.',
  choices: 'Which studies count',
  choicesText:
    'Each clause is judged on the newest of the studies chosen. All attempts are named to the customer whatever you choose.',
  noChoices:
    'No computed study of this measuring task is there yet. Register one and take its readings first.',
  chooseStudies: 'Use these studies',
  study: (code: string, readings: number, collected: string) =>
    `${code}: ${formatCount(readings, 'reading')}, collected ${collected}`,
  notCollected: 'on no known day',
  warnings: 'What a reader of the figures should know',
  readings: (study: string) => `Readings of study ${study}`,
  supersededBy: (number: number) => `See submission ${number}`,
  withdrawalReason: 'The reason given:',
  page: 'On this page',
} as const

type HindranceCode = submissions.Hindrance['code']

/** Why a move is not this person's to make right now. */
export const hindranceWords: Record<HindranceCode, string> = {
  'no-criteria': 'no signed criteria apply to this measuring task today. Agree them first.',
  'took-the-readings': 'you took the readings of a study in it. Another approver must sign.',
  'same-person': 'you decided first. Somebody else must confirm it.',
  'challenge-open': 'a challenge waits for the supplier’s answer. Withdraw it, or wait for the answer.',
  'challenge-unsettled': 'a challenge is not settled. Settle it, withdraw it, or reply to the answer first.',
  'newer-accepted': 'a later submission of the same measuring task is accepted already.',
}
