import type { Side } from '@evenrule/api/contract'
import type {
  AnswerKind,
  ChallengeReason,
  ChallengeTarget,
  ChallengeTargetKind,
} from '@evenrule/api/contract/challenges'
import type { ChallengeState } from '@evenrule/api/contract/moves/challenge'
import { formatCount, formatDate, joinWords } from '../format'
import type { Parties } from './submissions'

/** Files that go with words. */
export const filesWords = {
  choose: (most: number) =>
    most === 1 ? 'Choose a file, or drop it here' : 'Choose files, or drop them here',
  hint: (most: number) =>
    most === 1
      ? 'PDF, PNG, JPEG, XLSX or CSV, up to 20 MB. The other side can open it.'
      : 'PDF, PNG, JPEG, XLSX or CSV, up to 20 MB each. The other side can open them.',
  chosen: 'Files chosen',
  remove: 'Take out',
  sending: (name: string) => `Sending ${name} …`,
  failed: (name: string, why: string) => `${name} was not taken: ${why}`,
  tooMany: (most: number) =>
    most === 1 ? 'Only one file goes here.' : `At most ${most} files go with one message.`,
  download: 'Download',
} as const

/** What a challenge is about, to choose from. */
export const targetKindWords: Record<ChallengeTargetKind, { label: string; hint: string }> = {
  clause: { label: 'The result of a clause', hint: 'the verdict does not follow from what was shown' },
  readings: { label: 'Chosen readings', hint: 'how they were taken or written down' },
  standard: { label: 'The reference standard', hint: 'its value, uncertainty or calibration' },
  'set-up': { label: 'The set-up', hint: 'fixture, surroundings, procedure, appraiser' },
  calculation: { label: 'The calculation', hint: 'the way from the readings to the figure' },
}

export const challengeReasonWords: Record<ChallengeReason, string> = {
  verdict: 'The verdict does not follow',
  'too-few-readings': 'Too few readings',
  'wrong-method': 'Another method is needed',
  'wrong-study': 'Another study should count',
  outlying: 'They lie far from the others',
  mistyped: 'They look mistyped',
  'wrong-unit': 'They look like another unit',
  'not-as-planned': 'They were not taken as planned',
  value: 'Its value is in doubt',
  uncertainty: 'Its uncertainty is in doubt',
  calibration: 'Its calibration is in doubt',
  unsuitable: 'It does not suit this measuring task',
  fixture: 'The fixture is in doubt',
  surroundings: 'Temperature or other surroundings',
  procedure: 'The procedure is in doubt',
  appraiser: 'Who measured is in doubt',
  'figure-differs': 'We compute another figure',
  'wrong-input': 'It starts from a wrong input',
  rounding: 'Rounding is in doubt',
  other: 'Something else',
}

/** "readings 3 and 7 of study S-1"; `clause` is the sentence of the clause that the target names. */
export function describeTarget(target: ChallengeTarget, clause: string): string {
  switch (target.kind) {
    case 'clause':
      return `the result of “${clause}”`
    case 'calculation':
      return `the calculation of “${clause}”`
    case 'readings': {
      const numbers = target.readings.map((place) => String(place + 1))
      const named =
        numbers.length === 1
          ? `reading ${numbers[0]}`
          : numbers.length <= 6
            ? `readings ${joinWords(numbers)}`
            : `${formatCount(numbers.length, 'reading')}`
      return `${named} of study ${target.study}`
    }
    case 'standard':
      return `the reference standard of study ${target.study}`
    case 'set-up':
      return `the set-up of study ${target.study}`
  }
}

/** Short mark beside what is challenged. */
export const challengeMark = (number: number): string => `challenge ${number}`

const anybodyState: Record<ChallengeState, string> = {
  open: 'waits for the supplier’s answer',
  answered: 'answered; the customer has the next word',
  'unresolved-proposed':
    'the customer proposes to leave it unresolved; the supplier’s approver has the next word',
  'resolved-by-evidence': 'resolved by evidence',
  'resolved-by-correction': 'resolved by correction',
  withdrawn: 'withdrawn by the customer',
  unresolved: 'left unresolved by both sides',
}
/** How a challenge stands, for either side and on paper. */
export const challengeStateText = (state: ChallengeState, side: Side | null): string => {
  const own: Partial<Record<ChallengeState, string>> =
    side === 'supplier'
      ? {
          open: 'waits for your answer',
          'unresolved-proposed':
            'the customer proposes to leave it unresolved; your approver has the next word',
        }
      : side === 'customer'
        ? { answered: 'answered; your word is next', withdrawn: 'withdrawn' }
        : {}
  return own[state] ?? anybodyState[state]
}

export const challengeWords = {
  heading: 'What is challenged, and how does it stand?',
  challenge: 'Challenge this result',
  challengeAny: 'Open a challenge',
  challengeReadings: 'Challenge readings',
  challengeStandard: 'Challenge the standard',
  challengeSetUp: 'Challenge the set-up',
  correct: 'Correct the data',
  toAnswer: (number: number) => `Answer challenge ${number}`,
  title: 'What do you challenge?',
  text: (supplier: string) =>
    `${supplier} is told at once and asked for an answer by the day you name. Nothing is decided while the challenge is not settled.`,
  target: 'What is in question',
  chooseTarget: 'Choose what is in question.',
  clause: 'Clause',
  chooseClause: 'Choose the clause.',
  study: 'Study',
  chooseStudy: 'Choose the study.',
  chooseReadings: 'Choose the readings in question.',
  reason: 'Reason',
  chooseReason: 'Choose a reason.',
  words: 'What is wrong with it',
  wordsMissing: 'Say what is wrong, so that it can be answered.',
  sayMissing: 'Say it in words.',
  dueOn: 'Answer asked for by',
  dueMissing: 'Choose the day by which you ask for an answer.',
  dueInPast: 'Choose a day from today on.',
  files: 'Files',
  send: 'Send the challenge',
  quoted: 'Your what-if goes with it',
  dropQuote: 'Leave the what-if out',
  numbered: (number: number) => `Challenge ${number}`,
  due: (day: string) => `answer asked for by ${formatDate(day)}`,
  about: (reason: ChallengeReason) => `reason: ${challengeReasonWords[reason].toLowerCase()}`,
  closed: (day: string, name: string | null) => (name === null ? day : `${day} by ${name}`),
  ofRevision: (revision: number) => `named in revision ${revision}`,
  laboratory: (name: string) => `Both sides leave it to ${name}.`,
  laboratoryProposed: (name: string) => `It is to be left to ${name}.`,
  plot: 'The readings in question, framed',
  filesOf: 'Files',
  whatIf: 'A what-if quoted as an argument; no verdict follows from it.',
} as const

/** What a message did, behind the name of who wrote it. */
export const messageMoveWords = {
  open: 'opened the challenge',
  answer: {
    words: 'answered',
    evidence: 'answered with files',
    correction: 'answered by a correction',
    criterion: 'answered by proposing another criterion',
  } satisfies Record<AnswerKind, string>,
  correct: 'signed a correction',
  reply: 'replied and keeps it open',
  settle: 'settled it',
  withdraw: 'withdrew it',
  'propose-unresolved': 'proposed to leave it unresolved',
  'agree-unresolved': 'agreed to leave it unresolved',
  'decline-unresolved': 'did not agree to leave it unresolved',
} as const

export const answerWords = {
  how: 'How do you answer?',
  kinds: {
    words: { label: 'In words', hint: 'say why the result holds' },
    evidence: { label: 'With files', hint: 'certificates, pictures, records of the measurement' },
    correction: { label: 'By a correction already signed', hint: 'the newest revision answers this as well' },
    criterion: {
      label: 'By another criterion',
      hint: 'a proposal to change the agreement, with this challenge as its case',
    },
  } satisfies Record<AnswerKind, { label: string; hint: string }>,
  filesMissing: 'Choose at least one file, or answer in words.',
  proposal: 'Your proposal',
  proposalHint: 'Proposals of yours that name this challenge as their case.',
  proposalMissing: 'Choose the proposal. Begin one first where there is none.',
  noProposal:
    'No proposal of yours names this challenge yet. Begin one from the challenge, send it, then answer with it.',
  changeCriterion: 'Change the criterion',
  seeProposal: 'Read the proposal',
} as const

export const sayWords = {
  answer: {
    act: 'Answer',
    title: 'Answer the challenge',
    text: (facts: Parties) => `${facts.customer} is told and decides whether the answer settles it.`,
    field: 'Your answer',
    submit: 'Send the answer',
  },
  reply: {
    act: 'Reply, keep it open',
    title: 'Reply to the answer',
    text: (facts: Parties) => `The challenge is open again: ${facts.supplier} is asked for another answer.`,
    field: 'Your reply',
    submit: 'Reply, keep it open',
  },
  settle: {
    act: 'The answer settles it',
    title: 'Does the answer settle it?',
    text: () =>
      'The challenge ends as resolved by evidence. The decision on the submission is still yours to make.',
    field: 'Closing words',
    submit: 'The answer settles it',
  },
  'settle-corrected': {
    act: 'The correction settles it',
    title: 'Does the correction settle it?',
    text: () =>
      'The challenge ends as resolved by correction. The decision is on the newest revision and still yours to make.',
    field: 'Closing words',
    submit: 'The correction settles it',
  },
  withdraw: {
    act: 'Withdraw the challenge',
    title: 'Withdraw the challenge?',
    text: () => 'The challenge ends as withdrawn and stays on the page. The decision is still yours to make.',
    field: 'Closing words',
    submit: 'Withdraw the challenge',
  },
  'propose-unresolved': {
    act: 'Leave it unresolved',
    title: 'Propose to leave it unresolved?',
    text: (facts: Parties) =>
      `An approver of ${facts.supplier} must agree. It then counts as settled, though neither side convinced the other, and the decision can be made.`,
    field: 'Why it cannot be resolved',
    submit: 'Propose to leave it unresolved',
  },
  'agree-unresolved': {
    act: 'Agree to leave it unresolved',
    title: 'Agree to leave it unresolved?',
    text: (facts: Parties) =>
      `The challenge ends as unresolved, in the name of both sides, and ${facts.customer} can decide on the submission.`,
    field: 'Closing words',
    submit: 'Agree to leave it unresolved',
  },
  'decline-unresolved': {
    act: 'Do not agree',
    title: 'Not agree to leave it unresolved?',
    text: (facts: Parties) => `${facts.customer} has the next word, as after an answer.`,
    field: 'Why not',
    submit: 'Do not agree',
  },
} as const

export const laboratoryWords = {
  field: 'Laboratory that is to find out',
  hint: 'Only where you both leave it to one; its result comes as a new study or document.',
} as const

export const correctionWords = {
  title: 'Answer by corrected data',
  howTo:
    'Store the corrected readings in the study first; the readings so far stay. Then an approver who took none of them signs the corrected content here.',
  toStudy: (code: string) => `Correct the readings of ${code}`,
  corrected: (code: string) => `Corrected readings of ${code} are stored and not signed yet.`,
  whatChanges: (revision: number) => `What revision ${revision} would change`,
  verdicts: 'Verdicts',
  before: (verdict: string) => `${verdict} before`,
  words: 'What was corrected, and why',
  wordsMissing: 'Say in words what was corrected.',
  sign: 'Sign the correction',
  signText: (customer: string) =>
    `You sign the corrected content as a new revision. ${customer} sees what changed; the revisions before stay readable to both sides.`,
  ask: 'Ask an approver to sign it',
  asked: 'The approvers are told that the correction waits for their signature.',
  note: 'Note for the approvers',
  hindrances: {
    'nothing-corrected': 'Nothing differs from the newest revision yet.',
    'took-the-readings': 'You took the readings, so another approver must sign.',
    'not-an-approver': 'Signing it takes an approver of yours who took none of the readings.',
  },
} as const

export const revisionWords = {
  heading: 'Which revisions are there?',
  text: 'Each was signed and stays readable; the newest counts.',
  revision: (revision: number) => `revision ${revision}`,
  title: (revision: number) => `Revision ${revision}`,
  first: 'as first submitted',
  correctedFor: (challenge: number) => `corrected for challenge ${challenge}`,
  newest: 'counts',
  read: 'Read it',
  readNewest: 'Read the newest',
  older: (revision: number, newest: number) =>
    `You read revision ${revision}. Revision ${newest} has taken its place and is what a decision is about.`,
  changed: 'What changed in it',
  summary: (changes: number, kept: number) =>
    changes === 0
      ? `no reading changed, ${kept} as before.`
      : `${formatCount(changes, 'reading')} changed, ${kept === 0 ? 'none' : kept} as before.`,
  sameData: 'The readings are the same.',
  caption: (code: string) => `Readings of study ${code} that differ`,
  reading: 'Reading',
  numbers: (before: number | null, after: number | null) =>
    before === null
      ? `added as ${after}`
      : after === null || before === after
        ? String(before)
        : `${before}, now ${after}`,
  notThere: 'not there',
  takenOut: 'taken out',
  because: 'The reason given:',
  leftOutRow: (row: number) => `Row ${row}, left out`,
  notLeftOut: 'not left out any more',
  /** What else a correction can change, by the name the contract gives it. */
  fields: {
    'standard.code': 'Reference standard',
    'standard.name': 'Name of the standard',
    'standard.certifiedValue': 'Certified value',
    'standard.expandedUncertainty': 'Expanded uncertainty',
    'standard.coverageFactor': 'Coverage factor',
    'calibration.gauge.certificateNumber': 'Certificate of the gauge',
    'calibration.gauge.dueOn': 'Calibration of the gauge due',
    'calibration.standard.certificateNumber': 'Certificate of the standard',
    'calibration.standard.dueOn': 'Calibration of the standard due',
    appraiser: 'Appraiser',
    collectedOn: 'Collected on',
  } as Readonly<Record<string, string>>,
  dataHash: (revision: number) => `SHA-256 of the readings, revision ${revision}`,
} as const

/** What waits for whom, at the top of the page. */
export const waitingWords = {
  heading: 'What waits for whom',
  challenge: (number: number) => `Challenge ${number}`,
  condition: (number: number) => `Condition ${number}`,
  decision: 'Decision',
  answerOf: (whose: string) => `waits for ${whose} answer`,
  wordOf: (whose: string) => `is answered; ${whose} word is next`,
  approverOf: (whose: string) => `waits for ${whose} approver: leave it unresolved or not`,
  reportOf: (whose: string) => `waits for ${whose} report`,
  confirmationOf: (whose: string) => `is reported done; ${whose} confirmation is next`,
  secondPerson: (whose: string) => `waits for a second person on ${whose} side`,
  otherSide: (whose: string) => `waits for ${whose} approver, since no criteria are agreed`,
  due: (day: string, left: string) => `due ${formatDate(day)}, ${left}`,
  daysLeft: (days: number) =>
    days === 0
      ? 'today'
      : days > 0
        ? `${formatCount(days, 'day')} left`
        : `${formatCount(-days, 'day')} over`,
} as const
