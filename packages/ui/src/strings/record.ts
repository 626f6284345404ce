import type { record, Role } from '@evenrule/api/contract'
import type { GaugeEventKind, LimitsComparison } from '@evenrule/api/contract/standing'
import type { Verdict } from '@evenrule/metrology'
import { formatDate, formatDateTime, formatNumber } from '../format'
import { describeKey } from './clauses'
import { roleWords } from './roles'
import { equipmentEventWords } from './standings'
import { verdictWords } from './verdicts'

/** What a subject is called before its name; without a name the second form. */
export const recordSubjectWords: Record<record.RecordSubject, [named: string, unnamed: string]> = {
  'agreement-version': ['agreement', 'an agreement'],
  study: ['study', 'a study'],
  submission: ['submission', 'a submission'],
  challenge: ['challenge', 'a challenge'],
  request: ['request', 'a request'],
  'house-terms': ['house terms', 'house terms'],
  part: ['part', 'a part'],
  characteristic: ['characteristic', 'a characteristic'],
  'measuring-task': ['measuring task', 'a measuring task'],
  gauge: ['gauge', 'a gauge'],
  'reference-standard': ['reference standard', 'a reference standard'],
  import: ['the import of', 'an import'],
  member: ['member', 'a former member'],
  organisation: ['organisation', 'the organisation'],
  invitation: ['invitation of', 'an invitation'],
  relationship: ['business relationship of', 'the business relationship'],
}

/** Kinds of subject in the filter. */
export const recordFilterWords: Record<record.RecordSubject, string> = {
  'agreement-version': 'agreements',
  submission: 'submissions',
  challenge: 'challenges',
  request: 'requests',
  'house-terms': 'house terms',
  study: 'studies',
  part: 'parts',
  characteristic: 'characteristics',
  'measuring-task': 'measuring tasks',
  gauge: 'gauges',
  'reference-standard': 'reference standards',
  import: 'imports',
  member: 'members',
  organisation: 'organisation',
  invitation: 'invitations',
  relationship: 'business relationships',
}

/** What somebody did, in the past tense; `*` stands for the thing it was done to. */
export const eventWords: Record<string, string> = {
  'agreement.drafted': 'began a draft of *',
  'agreement.draft-kept': 'went on with a draft of *',
  'agreement.draft-discarded': 'discarded a draft of *',
  'agreement.proposed': 'proposed *',
  'agreement.countered': 'answered with a changed proposal for *',
  'agreement.clauses-withdrawn': 'took clauses out of the proposal of *',
  'agreement.commented': 'commented on *',
  'agreement.marked': 'marked what is accepted in *',
  'agreement.accepted': 'accepted the proposal of *',
  'agreement.withdrawn': 'withdrew *',
  'agreement.signature-given': 'signed * for one side',
  'agreement.signed': 'signed *; both sides have signed',
  'house-terms.drafted': 'began a draft of *',
  'house-terms.draft-kept': 'went on with a draft of *',
  'house-terms.draft-discarded': 'discarded a draft of *',
  'house-terms.published': 'published *',
  'house-terms.offered': 'offered * to suppliers',
  'request.asked': 'asked for proof with *',
  'request.date-moved': 'moved the date of *',
  'request.withdrawn': 'withdrew *',
  'request.answered': 'answered * with a submission',
  'study.registered': 'registered * before its first reading',
  'study.taken-over': 'registered *, whose readings were taken before',
  'study.readings-kept': 'kept readings of *',
  'study.computed': 'finished the readings of * and had it computed',
  'study.corrected': 'stored corrected readings of *',
  'study.abandoned': 'abandoned *',
  'submission.prepared': 'prepared *',
  'submission.studies-chosen': 'chose the studies of *',
  'submission.sent-for-signature': 'sent * for signature',
  'submission.returned': 'returned * with a note',
  'submission.signed': 'signed * and submitted it',
  'submission.discarded': 'discarded *',
  'submission.withdrawn': 'withdrew *',
  'submission.challenged': 'challenged *',
  'submission.answered': 'answered the challenges of *',
  'submission.review-resumed': 'went on with the review of *',
  'submission.accepted': 'accepted *',
  'submission.accepted-with-conditions': 'accepted * with conditions',
  'submission.second-person-asked': 'decided on * and asked for a second person',
  'submission.second-person-declined': 'sent * back to review as second person',
  'submission.refused': 'refused *',
  'submission.one-off-proposed': 'accepted * without agreed criteria, for the other side to agree',
  'submission.one-off-agreed': 'agreed to the acceptance of * without agreed criteria',
  'submission.one-off-declined': 'did not agree to the acceptance of * without agreed criteria',
  'submission.judged-by-hand': 'judged a clause of * by hand',
  'submission.by-hand-cleared': 'took back what was judged by hand of *',
  'submission.corrected': 'signed a corrected revision of *',
  'condition.reported': 'reported a condition of * as done',
  'condition.confirmed': 'confirmed a condition of *',
  'condition.returned': 'did not take a condition of * as fulfilled',
  'submission.superseded': 'replaced * by a newer acceptance',
  'submission.suspended': 'reported what suspends *',
  'submission.gauge-event': 'reported what concerns the gauge of *',
  'submission.hold-lifted': 'lifted the hold of * with a calibration',
  'submission.reinstated': 'let * stand again',
  'submission.reopened': 'reopened * with a new revision of the part',
  'submission.carried-over': 'carried * over to a new revision',
  'challenge.opened': 'opened *',
  'challenge.answered': 'answered *',
  'challenge.answered-by-correction': 'answered * with corrected readings',
  'challenge.correction-sent-for-signature': 'sent a correction that answers * for signature',
  'challenge.unresolved-proposed': 'proposed to leave * unresolved',
  'challenge.unresolved-declined': 'did not agree to leave * unresolved',
  'challenge.replied': 'replied to the answer to * and kept it open',
  'challenge.settled': 'took the answer as settling *',
  'challenge.withdrawn': 'withdrew *',
  'challenge.left-unresolved': 'left * unresolved',
  'part.created': 'entered *',
  'part.changed': 'changed *',
  'part.revision-added': 'added a revision to *',
  'part.archived': 'archived *',
  'part.restored': 'restored *',
  'characteristic.created': 'entered *',
  'characteristic.changed': 'changed *',
  'characteristic.confirmed': 'confirmed *',
  'characteristic.archived': 'archived *',
  'characteristic.restored': 'restored *',
  'measuring-task.created': 'set up *',
  'measuring-task.changed': 'changed *',
  'measuring-task.archived': 'archived *',
  'measuring-task.restored': 'restored *',
  'gauge.created': 'registered *',
  'gauge.changed': 'changed *',
  'gauge.reported-out-of-limits': 'reported * out of limits',
  'gauge.repaired': 'reported a repair of *',
  'gauge.moved': 'reported that * was moved',
  'gauge.changed-in-use': 'reported a change of software or fixture of *',
  'gauge.archived': 'archived *',
  'gauge.restored': 'restored *',
  'reference-standard.created': 'registered *',
  'reference-standard.changed': 'changed *',
  'reference-standard.archived': 'archived *',
  'reference-standard.restored': 'restored *',
  'calibration.entered': 'entered a calibration of *',
  'calibration.certificate-added': 'added the certificate to a calibration of *',
  'import.applied': 'finished *',
  'member.changed': 'changed the membership of *',
  'member.joined': 'accepted an invitation and joined: *',
  'invitation.sent': 'sent *',
  'invitation.sent-again': 'sent * again',
  'invitation.revoked': 'revoked *',
  'organisation.founded': 'founded *',
  'relationship.begun': 'accepted an invitation and began *',
  'organisation.changed': 'changed the details of *',
}

type Data = record.RecordEvent['data']

/** The sentence around the thing of an event; one of a kind that has no words yet is told by its type. */
export function eventSentence(type: string, data: Data = {}): [before: string, after: string] {
  // What was registered afterwards was never before its first reading.
  const isTakenOver = type === 'study.registered' && data.registeredBeforehand === false
  const words =
    eventWords[isTakenOver ? 'study.taken-over' : type] ??
    `recorded “${type.replace(/^[^.]*\./, '').replaceAll('-', ' ')}” for *`
  const [before = '', after = ''] = words.split('*')
  return [before, after]
}

const isText = (value: unknown): value is string => typeof value === 'string' && value.trim() !== ''

type Detail = (data: Data) => string

const day = (value: unknown): string => (isText(value) ? formatDate(value) : '')
const has = (value: unknown, words: (text: string) => string): string => (isText(value) ? words(value) : '')

/** What happened to a gauge, on what day, and since when its readings are in doubt. */
const gaugeEvent: Detail = ({ gauge, kind, happenedOn, inDoubtSince }) => {
  const what = equipmentEventWords[kind as GaugeEventKind]
  const doubt = has(inDoubtSince, (on) => `, in doubt since ${formatDate(on)}`)
  return what && isText(gauge) ? `${gauge} ${what} on ${day(happenedOn)}${doubt}.` : ''
}
const happened: Detail = ({ happenedOn }) => has(happenedOn, (on) => `On ${formatDate(on)}.`)

const verdicts: Detail = ({ clauses }) =>
  Array.isArray(clauses) && clauses.length > 0
    ? `${(clauses as { clauseKey?: unknown; verdict?: unknown }[])
        .map(
          ({ clauseKey, verdict }) =>
            `${describeKey(String(clauseKey))} ${verdictWords[verdict as Verdict] ?? String(verdict)}`,
        )
        .join(', ')}.`
    : ''

const limitsWords: Record<LimitsComparison, string> = {
  same: 'its limits did not change',
  differ: 'its limits changed',
  missing: 'it has no such characteristic',
}

/** What events of a type add, where it is more than a reason. */
const details: Record<string, Detail> = {
  'part.revision-added': ({ label }) => has(label, (text) => `Revision ${text}.`),
  'calibration.entered': ({ dueOn, foundWithinLimits }) =>
    [foundWithinLimits === false ? 'Found out of limits.' : '', has(dueOn, (on) => `Due ${formatDate(on)}.`)]
      .filter(Boolean)
      .join(' '),
  'calibration.certificate-added': ({ certificateNumber }) =>
    has(certificateNumber, (text) => `Certificate ${text}.`),
  'gauge.reported-out-of-limits': happened,
  'gauge.repaired': happened,
  'gauge.moved': happened,
  'gauge.changed-in-use': happened,
  'submission.suspended': gaugeEvent,
  'submission.gauge-event': gaugeEvent,
  'submission.hold-lifted': ({ gauge, calibratedOn, dueOn }) =>
    has(gauge, (code) => `${code} was calibrated on ${day(calibratedOn)}, due again ${day(dueOn)}.`),
  'submission.reopened': ({ revision, limits }) =>
    has(revision, (label) => `Revision ${label}: ${limitsWords[limits as LimitsComparison] ?? ''}.`),
  'submission.carried-over': ({ revision }) => has(revision, (label) => `Revision ${label}.`),
  'import.applied': ({ new: made, changed, badRows }) =>
    [
      `${String(made)} new, ${String(changed)} changed.`,
      Number(badRows) > 0 ? `${String(badRows)} rows left out.` : '',
    ]
      .filter(Boolean)
      .join(' '),
  'submission.signed': verdicts,
  'submission.corrected': verdicts,
}

/** What an event adds in words: the reason given, days, the revision's label, the verdicts, the roles. */
export function eventDetail({ type, data }: Pick<record.RecordEvent, 'type' | 'data'>): string {
  const parts = [
    has(data.reason, (text) => `“${text}”`),
    details[type]?.(data) ?? '',
    Array.isArray(data.roles)
      ? `${data.roles.map((role) => roleWords[role as Role] ?? String(role)).join(', ')}.`
      : '',
    has(data.endsOn, (on) => `Until ${formatDate(on)}.`),
  ]
  return parts.filter(Boolean).join(' ')
}

/** How the chain is broken, and what that means. */
export const faultWords: Record<record.RecordFault, (sequence: number) => [what: string, means: string]> = {
  missing: (n) => [`Event ${n} is missing.`, 'It was there: later events, or the end of the chain, say so.'],
  'text-changed': (n) => [
    `Event ${n} was changed.`,
    'Its text and its hash do not belong together; one of them was altered after it was written.',
  ],
  misplaced: (n) => [
    `Event ${n} does not belong in this place.`,
    'Its own text names another place: events were taken out, put in or exchanged.',
  ],
  'link-broken': (n) => [
    `Event ${n} does not follow from the one before.`,
    'One of the two was changed and given a new hash.',
  ],
  'columns-changed': (n) => [
    `Event ${n} is not listed as it was written.`,
    'Its text is whole, but its day, person or subject in the list was altered.',
  ],
  'frozen-changed': (n) => [
    `What event ${n} froze was changed.`,
    'The event itself is whole, but a signed text or an evaluation it names by hash is no longer the one that was signed.',
  ],
  added: (n) => [
    `Event ${n} was put in past the end.`,
    'The chain ends before it; it was not written by this program.',
  ],
  'end-changed': (n) => [
    `The end of the chain was altered, after event ${n}.`,
    'The end no longer names the last event: later ones may have been cut off.',
  ],
  'end-missing': (n) => [
    `The end of the chain is gone, after event ${n}.`,
    'Nothing says any more whether later events were cut off.',
  ],
}

export const recordWords = {
  question: (partner: string) => `What happened between us and ${partner}?`,
  journalQuestion: 'What happened in our own house?',
  answer: (total: number, latest: string) =>
    `${formatNumber(total)} ${total === 1 ? 'event' : 'events'}, the latest on ${formatDateTime(latest)}.`,
  filteredAnswer: (total: number) =>
    `${formatNumber(total)} ${total === 1 ? 'event matches' : 'events match'} the filters.`,
  nothing: 'Nothing yet.',
  shared: 'Both sides read the same record, and neither can change it unseen.',
  own: 'Only your organisation reads it: drafts, gauges, members.',
  chain: 'Record',
  journal: 'Our own journal',
  findChain: 'Find a record',
  noChain: 'No record by that name',
  about: 'About',
  everything: 'everything',
  onlySubject: 'Only what concerns one thing.',
  showAll: 'Show everything',
  by: 'By',
  anybody: 'anybody',
  task: 'Measuring task',
  anyTask: 'any',
  oneTask: 'one that is not among those listed',
  clause: 'Clause',
  anyClause: 'any',
  from: 'From',
  to: 'To',
  filters: 'Narrow the record',
  personOf: (name: string | null, organisation: string | null) =>
    `${name ?? 'somebody of before'}${organisation ? ` (${organisation})` : ''}`,
  somebody: 'Somebody who may not be named',
  otherPerson: 'somebody who is not among those listed',
  filterPerson: (name: string) => `Only what ${name} did`,
  list: 'Events',
  proof: 'Exact text',
  proofOf: (sequence: number) => `Exact text of event ${sequence}`,
  number: (sequence: number) => `no. ${formatNumber(sequence)}`,
  proofText: 'The hash is the SHA-256 of exactly this text, which holds the hash of the event before.',
  hash: 'Hash',
  emptyTitle: 'Nothing has happened yet',
  emptyText: {
    shared: 'Once one of you enters a part, proposes criteria or submits proof, it stands here for both.',
    own: 'Once somebody registers a gauge, drafts or changes members, it stands here.',
  },
  ofSubject: 'What happened so far',
  moreEvents: (total: number) => `Show all ${formatNumber(total)} events`,
} as const

export const checkWords = {
  action: 'Check the record',
  checking: 'Checking …',
  title: 'Is this record unbroken?',
  whole: 'Yes, unbroken.',
  wholeText: (count: number, at: string) =>
    `${formatNumber(count)} ${count === 1 ? 'event was' : 'events were'} recomputed from the first; each follows from the one before, up to the latest of ${formatDateTime(at)}.`,
  empty: 'There is nothing to check yet.',
  broken: 'No, broken.',
  brokenText: (sound: number) =>
    sound === 0
      ? 'No event of this record can be relied on. Ask who runs this service for the last backup in which the check succeeds.'
      : `Events 1 to ${formatNumber(sound)} stand. What comes after cannot be relied on. Ask who runs this service for the last backup in which the check succeeds.`,
  keep: 'Keep this hash where nobody else can change it. Whoever rewrites the whole record later cannot give it back.',
  kept: 'Hash you kept from an earlier check',
  keptHint: 'Optional. Paste it, and the check says whether this record still holds it.',
  keptFound: (sequence: number, at: string) =>
    `The hash you kept is that of event ${formatNumber(sequence)}, ${formatDateTime(at)}. Up to there the record is the one you saw.`,
  keptMissing:
    'The hash you kept is nowhere in this record. It was rewritten since then, or the hash is of another record.',
} as const
