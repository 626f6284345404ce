import type { agreements, Side } from '@evenrule/api/contract'
import { capital, countWord, formatCount, formatDate, inSentence, joinWords } from '../format'

type Scope = agreements.AgreementScope

/** How many of a thing, to begin a sentence: "Two clauses". */
export const several = (count: number, one: string, many = `${one}s`): string =>
  `${capital(countWord(count))} ${count === 1 ? one : many}`

/** Whose something is, seen from one's own side. */
export const whose = (side: Side, own: Side, other: string): string =>
  side === own ? 'ours' : `from ${other}`

/** What an agreement covers, as a row or a crumb names it. */
export function scopeText(scope: Scope): string {
  if (scope.kind === 'relationship') return 'All parts'
  if (scope.kind === 'part') return `${scope.partNumber}, all characteristics`
  return `${scope.partNumber} rev ${scope.revision}, ${scope.characteristicNumber} ${scope.characteristicName}`
}

/** What an agreement covers, inside a sentence. */
function scopePhrase(scope: Scope, side: Side, other: string): string {
  if (scope.kind === 'relationship')
    return side === 'customer' ? `everything ${other} makes for us` : `everything we make for ${other}`
  if (scope.kind === 'part') return `${scope.partNumber}`
  return `${inSentence(scope.characteristicName ?? '')} of ${scope.partNumber}`
}

export const scopeKindWords: Record<agreements.ScopeKind, string> = {
  relationship: 'All parts of the relationship',
  part: 'One part number',
  characteristic: 'One characteristic',
}

export const scopeKindHints: Record<agreements.ScopeKind, string> = {
  relationship: 'The usual criteria; narrower agreements may replace single clauses.',
  part: 'Replaces clauses of the whole relationship for this part.',
  characteristic: 'Replaces clauses of the part for this characteristic.',
}

export const listPageWords = {
  question: 'Which criteria are agreed, and which are still open?',
  none: 'Nothing is agreed or proposed yet.',
  waiting: (count: number) => `${several(count, 'agreement')} ${count === 1 ? 'waits' : 'wait'} for us.`,
  nothingWaits: 'Nothing waits for us.',
  drafts: (count: number) => `${several(count, 'draft')} of ours ${count === 1 ? 'is' : 'are'} not sent.`,
  total: (count: number) => `${formatCount(count, 'agreement')} in all.`,
  waitingHeading: 'Waits for us',
  allHeading: 'All agreements',
  waitingCaption: 'Agreements that wait for us',
  caption: 'All agreements',
  search: 'Search part, characteristic or partner',
  propose: 'Propose criteria',
  scope: 'Criteria for',
  partner: { supplier: 'Customer', customer: 'Supplier' },
  standing: 'Standing',
  inForce: 'In force',
  from: 'First day',
  changed: 'Last step',
  state: 'Standing',
  everyState: 'all',
  version: (version: number) => `version ${version}`,
  since: (day: string) => `since ${formatDate(day)}`,
  notYet: 'none yet',
  number: (number: number | null) => (number === null ? 'draft' : `agreement ${number}`),
  emptyTitle: 'No criteria yet',
  emptyText:
    'Propose criteria for everything you do together, one part number or one characteristic. The other side answers, and an approver of each side signs.',
  emptyReader: 'As soon as one side proposes criteria, they stand here.',
} as const

/** What a row of the list waits for, from one's own side. */
export function standingText(row: agreements.AgreementRow, side: Side): string {
  const { state, rounds, proposedBy } = row.newest
  if (state === 'draft') return 'our draft, not sent'
  if (state === 'proposed' || state === 'countered')
    return proposedBy === side
      ? `our round ${rounds} waits for their answer`
      : `their round ${rounds} waits for our answer`
  if (state === 'agreed') return `agreed, waits for ${signaturesOf(row.waitsOn, side)}`
  return {
    signed: `signed, in force from ${formatDate(row.newest.effectiveOn)}`,
    'in-force': 'in force',
    superseded: 'superseded',
    withdrawn: 'withdrawn',
    lapsed: 'lapsed, not signed in time',
  }[state]
}

function signaturesOf(waitsOn: readonly Side[], side: Side, other?: string): string {
  if (waitsOn.length > 1) return 'both signatures'
  if (waitsOn[0] === side) return 'our signature'
  return other ? `the signature of ${other}` : 'their signature'
}

export const roomWords = {
  question: (scope: Scope, side: Side, other: string, from: string | null) =>
    `Which criteria apply to ${scopePhrase(scope, side, other)}${from ? ` from ${formatDate(from)}` : ''}?`,
  meta: (number: number | null, version: number | null, other: string) =>
    [number === null ? 'Draft' : `Agreement ${number}`, version === null ? '' : `version ${version}`]
      .filter(Boolean)
      .join(', ') + `, with ${other}`,
  draft: 'Our draft, not sent yet.',
  draftRest: (other: string) => `Nobody at ${other} sees it.`,
  waitsForUs: (round: number, other: string) => `Round ${round}, from ${other}, waits for our answer.`,
  waitsForThem: (round: number, other: string) => `Round ${round}, ours, waits for an answer from ${other}.`,
  ownDraftAnswer: 'We have begun an answer that is not sent yet.',
  agreed: (waitsOn: readonly Side[], side: Side, other: string) =>
    `Agreed, and waits for ${signaturesOf(waitsOn, side, other)}.`,
  lapses: (day: string) => `Unless both sides sign by ${formatDate(day)}, it lapses.`,
  signed: (day: string) => `Signed by both sides, in force from ${formatDate(day)}.`,
  inForce: (count: number, day: string) =>
    `${several(count, 'clause')}, signed by both sides, in force since ${formatDate(day)}.`,
  fromWider: (count: number) =>
    `${several(count, 'more applies', 'more apply')} by agreements for a wider scope.`,
  superseded: 'No longer in force: a later version has taken its place.',
  withdrawn: (by: string, day: string) => `Withdrawn by ${by} on ${formatDate(day)}.`,
  lapsed: (day: string) => `Lapsed: both sides had not signed by ${formatDate(day)}.`,
  reason: (reason: string) => `Reason: ${reason}`,
  stays: (number: number | null, version: number) =>
    `Agreement ${number ?? ''}, version ${version}, stays in force until both sides sign.`,
  nothingInForce: 'Nothing is in force for this scope until both sides sign.',
  us: 'us',
  changes: ({ changed, added, removed, same }: Record<'changed' | 'added' | 'removed' | 'same', number>) => {
    const what = [
      changed && `${countWord(changed)} ${changed === 1 ? 'changes' : 'change'}`,
      added && `${countWord(added)} ${added === 1 ? 'is' : 'are'} new`,
      removed && `${countWord(removed)} ${removed === 1 ? 'falls' : 'fall'} away`,
      same && `${countWord(same)} ${same === 1 ? 'stays' : 'stay'}`,
    ].filter((part): part is string => Boolean(part))
    if (changed + added + removed === 0) return 'No clause changes.'
    return `Of the clauses, ${joinWords(what)}.`
  },
  answer: 'Answer with changes',
  newVersion: 'Propose a new version',
  edit: 'Edit the draft',
  accept: 'Accept the proposal',
  sign: 'Read and sign',
  withdraw: 'Withdraw',
  send: 'Send the proposal',
  goOn: 'Go on with our answer',
  saveDraft: 'Save draft',
  stopEditing: 'Stop editing',
  discard: 'Discard the draft',
} as const

export const comparisonWords = {
  heading: 'Clauses',
  caption: 'Clauses side by side',
  clause: 'Clause',
  inForce: 'In force',
  inForceOf: (agreement: number | null, version: number) =>
    `In force (agreement ${agreement ?? '–'}, version ${version})`,
  wider: (agreement: number, scope: agreements.ScopeKind) =>
    scope === 'relationship'
      ? `from agreement ${agreement}, all parts`
      : `from agreement ${agreement}, the part`,
  round: (round: number, side: Side, own: Side, other: string) =>
    `Round ${round}, ${whose(side, own, other)}`,
  roundShort: (round: number) => `round ${round}`,
  draft: 'Our draft',
  effect: 'What it does',
  change: 'Change',
  same: 'unchanged',
  added: 'new',
  removed: 'falls away',
  changed: 'changed',
  nothing: 'none',
  compareWith: 'Compare with',
  was: (before: string) => `(was ${before})`,
  alone: 'nothing',
  noClauses: 'No clause is in this proposal yet.',
  notFor: (count: number, why: string) =>
    `Cannot be computed for ${formatCount(count, 'characteristic')} of the scope. ${why}`,
  effects: {
    worse: (rule: string, before: string, after: string, bias: string) =>
      `A worse gauge passes the ${rule} more easily: at a bias of ${bias} ${before} → ${after} when its spread doubles.`,
    sound: 'A better gauge and more readings make it easier to meet.',
    readings: (before: number, after: number) =>
      after > before
        ? `Needs ${after} readings instead of ${before}.`
        : `${after} readings are enough instead of ${before}.`,
  },
} as const
