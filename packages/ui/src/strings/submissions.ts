import type { Side, submissions } from '@evenrule/api/contract'
import type { SubmissionState } from '@evenrule/api/contract/moves/submission'
import { capital, countWord, formatCount, formatDate, joinWords } from '../format'

/** Who stands on either side of a submission, and on which side the reader is; null for anybody, as on paper. */
export interface Parties {
  side: Side | null
  supplier: string
  customer: string
}

/** "your" for the reader's own side, else the organisation's name in the possessive. */
export const whoseOf = (parties: Parties, side: Side): string =>
  parties.side === side ? 'your' : `${parties[side]}${parties[side].endsWith('s') ? '’' : '’s'}`

/** How long something has stood still: "today", "1 day", "6 days". */
export const ageText = (days: number): string => (days <= 0 ? 'today' : formatCount(days, 'day'))
const waits = (days: number, what: string): string =>
  days <= 0 ? `It waits for ${what}.` : `It has waited ${formatCount(days, 'day')} for ${what}.`

/** In the place of “challenged”, where all that is asked for is to leave a challenge unresolved. */
export const unresolvedAsked = (parties: Parties, days: number): [string, string] => [
  waits(days, `an approver of ${parties.side === 'supplier' ? 'yours' : parties.supplier}`),
  `${parties.side === 'customer' ? 'You propose' : `${parties.customer} proposes`} to leave a challenge unresolved.`,
]

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
  submitted: (parties, days) => [waits(days, `${whoseOf(parties, 'customer')} decision`), ''],
  challenged: (parties, days) => [
    waits(days, `${whoseOf(parties, 'supplier')} answer`),
    parties.side === 'customer'
      ? 'You challenge something in it.'
      : `${parties.customer} challenges something in it.`,
  ],
  answered: (parties, days) => [
    waits(days, `${whoseOf(parties, 'customer')} decision`),
    parties.side === 'supplier' ? 'You have answered.' : `${parties.supplier} has answered.`,
  ],
  'awaiting-second-person': (parties, days) => [
    waits(days, 'a second person'),
    `Somebody else of ${parties.customer} must confirm the acceptance.`,
  ],
  'awaiting-other-side': (parties, days) => [
    waits(days, `an approver of ${parties.side === 'supplier' ? 'yours' : parties.supplier}`),
    `${parties.side === 'customer' ? 'You accept' : `${parties.customer} accepts`} it without agreed criteria; it counts once the other side agrees.`,
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
  numberShort: (number: number) => `no. ${number}`,
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
  noAgreements: 'Criteria',
  noAgreementsText: 'None were agreed for this measuring task on that day.',
  houseTerms: (number: number) => `House terms ${number}, for information`,
  corrects: 'Takes the place of',
  correctsText: (revision: number, challenge: number) =>
    `Revision ${revision}, corrected for challenge ${challenge}`,
  requests: 'Answers',
  requestsText: (numbers: readonly number[]) =>
    `${numbers.length === 1 ? 'Request' : 'Requests'} ${joinWords(numbers.map(String))}`,
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
  restsOn: (study: string) => `What the readings of study ${study} rest on`,
  readingsLabel: 'The readings',
  readingsTaken: (count: number, day: string, appraiser: string, revision: number) =>
    `${formatCount(count, 'reading')}, collected ${day} by appraiser ${appraiser}${revision > 1 ? `, data revision ${revision}` : ''}`,
  leftOut: (rows: readonly { row: number; text: string }[]) =>
    `Left out because no number stood there: ${joinWords(rows.map(({ row, text }) => `row ${row} “${text}”`))}`,
  replacedBecause: (reason: string) => `Readings replaced; the reason given: “${reason}”`,
  standardLabel: 'The reference standard',
  setUpLabel: 'The set-up',
  calibrated: (certificate: string, due: string) => `Calibration certificate ${certificate}, next due ${due}`,
  notCalibrated: 'No calibration known on the day of collection',
  measuredAs: {
    value: 'Readings taken as values',
    deviation: 'Readings taken as deviations from the standard',
  },
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
    document: 'document that a judgement by hand rests on',
  },
  fileName: 'File',
  fileRole: 'What it is',
  fileSize: 'Size',
  signatures: 'Signatures and decisions',
  noSignatures: 'Not signed yet.',
  meanings: {
    submits: 'signed and submitted it',
    corrects: 'signed a correction',
    'agrees-one-off': 'agreed to the acceptance without agreed criteria',
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
  record: 'What happened to this submission?',
} as const

type HindranceCode = submissions.Hindrance['code']

/** Why a move is not this person's to make right now. */
export const hindranceWords: Record<HindranceCode, string> = {
  'nothing-to-judge':
    'no criteria are agreed and no study is chosen, so it would show nothing. Choose a computed study first.',
  'task-archived': 'the measuring task is archived. Restore it first.',
  'needs-approver': 'no criteria are agreed, so this decision takes an approver of your side.',
  'took-the-readings': 'you took the readings of a study in it. Another approver must sign.',
  'same-person': 'you decided first. Somebody else must confirm it.',
  'challenge-open': 'a challenge waits for the supplier’s answer. Withdraw it, or wait for the answer.',
  'challenge-unsettled':
    'a challenge is not settled. Settle it, withdraw it, reply to the answer, or leave it unresolved with the other side first.',
  'newer-accepted': 'a later submission of the same measuring task is accepted already.',
}

/** No criteria were agreed: said as such, and the customer's house terms for information. */
export const advisoryWords = {
  answer: 'No criteria agreed.',
  answerRest: (parties: Parties) =>
    `So there is no verdict: ${parties.side === 'customer' ? 'your approver' : `an approver of ${parties.customer}`} decides for this once, and ${parties.side === 'supplier' ? 'yours' : `one of ${parties.supplier}`} must agree.`,
  answerEnded: 'So there was no verdict; the decision was made for this once.',
  verdict: 'no criteria agreed',
  heading: (customer: string) => `What would the house terms of ${customer} say?`,
  text: (customer: string, number: number) =>
    `House terms ${number} of ${customer}, for information only. Nobody has agreed to them here, so none of this counts as a verdict.`,
  none: (customer: string) =>
    `${customer} has published no house terms, so there is nothing to compare with.`,
  would: {
    meets: 'would meet',
    'meets-with-conditions': 'would meet with conditions',
    'falls-short': 'would fall short',
    'not-shown': 'would not be shown',
  },
} as const

const orWords = (names: readonly string[]): string =>
  names.length > 1 ? `${names.slice(0, -1).join(', ')} or ${names.at(-1)}` : (names[0] ?? '')

/** The terms frozen with a submission, each as a sentence. */
export const termsWords = {
  heading: 'What becomes of an acceptance',
  validity: (months: number | null) =>
    months === null ? 'It does not run out.' : `It is valid for ${formatCount(months, 'month')}.`,
  overdue: {
    'on-hold': 'While a calibration is overdue it is on hold.',
    stays: 'An overdue calibration changes nothing.',
  },
  suspended: (what: readonly string[]) => `It is suspended when the gauge is ${orWords(what)}.`,
  stays: (what: readonly string[]) => `It stays when the gauge is ${orWords(what)}.`,
  events: {
    outOfLimits: 'found out of limits',
    repaired: 'repaired',
    moved: 'moved',
    changed: 'changed in software or fixture',
  },
  taker: {
    yes: 'Whoever took the readings may sign.',
    no: 'Whoever took the readings may not sign.',
  },
} as const

/** The parts of a submission's page, by their places in the address. */
export const indexWords = {
  label: 'On this page',
  parts: {
    results: 'results',
    standing: 'does it stand',
    conditions: 'what must follow',
    challenges: 'challenges',
    readings: 'readings',
    'what-if': 'what if',
    recompute: 'recompute',
    signatures: 'signatures',
    frozen: 'what is frozen',
    record: 'what happened',
  },
} as const
