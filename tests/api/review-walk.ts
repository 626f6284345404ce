import fc from 'fast-check'
import {
  allows,
  reviews,
  studies,
  submissions,
  type EndpointShape,
  type Permission,
} from '@evenrule/api/contract'
import {
  challengeMovesNamed,
  isUnsettled,
  waitsOnSupplier,
  type ChallengePrecondition,
} from '../../packages/api/src/contract/moves/challenge'
import {
  movesNamed,
  openToChallenge,
  type SubmissionMoveName,
  type SubmissionPrecondition,
} from '../../packages/api/src/contract/moves/submission'
import { biasedReadings, goodReadings, type Seen, type Story } from './prepared'

/** Those who walk through submissions and challenges in the property test. */
export const actors = {
  engineer: { side: 'supplier', roles: ['gauge-engineer'] },
  approver: { side: 'supplier', roles: ['supplier-approver'] },
  quality: { side: 'customer', roles: ['quality-representative'] },
  second: { side: 'customer', roles: ['quality-representative'] },
  approves: { side: 'customer', roles: ['customer-approver'] },
} as const
export type Actor = keyof typeof actors

export const ofSubmission = {
  'send-for-signature': submissions.sendForSignature,
  return: submissions.returnSubmission,
  sign: submissions.signSubmission,
  discard: submissions.discardSubmission,
  withdraw: submissions.withdrawSubmission,
  accept: reviews.accept,
  'accept-with-conditions': reviews.acceptWithConditions,
  refuse: reviews.refuse,
  confirm: reviews.confirm,
  'send-back': reviews.sendBack,
  'agree-one-off': reviews.agreeOneOff,
  'decline-one-off': reviews.declineOneOff,
  challenge: reviews.openChallenge,
} satisfies Partial<Record<SubmissionMoveName, EndpointShape>>

export const ofChallenge = {
  answer: reviews.answerChallenge,
  correct: reviews.signCorrection,
  reply: reviews.replyToAnswer,
  settle: reviews.settleChallenge,
  withdraw: reviews.withdrawChallenge,
  'propose-unresolved': reviews.proposeUnresolved,
  'agree-unresolved': reviews.agreeUnresolved,
  'decline-unresolved': reviews.declineUnresolved,
}

export const keysOf = <K extends string>(record: Record<K, unknown>): K[] => Object.keys(record) as K[]

export const step = fc.record({
  who: fc.constantFrom(...keysOf(actors)),
  move: fc.oneof(
    { weight: 4, arbitrary: moves('submission', ofSubmission) },
    { weight: 4, arbitrary: moves('challenge', ofChallenge) },
    // The engineer stores other readings in the study the submission rests on.
    { weight: 1, arbitrary: fc.constant({ of: 'readings' as const, name: 'store' as const }) },
  ),
  pick: fc.nat(1000),
  /** Mostly what a page would offer somebody, now and then anything at all. */
  sensible: fc.boolean(),
})
export type Step = typeof step extends fc.Arbitrary<infer S> ? S : never
export type Move = Exclude<Step['move'], { of: 'readings' }>

function moves<O extends string, K extends string>(of: O, endpoints: Record<K, unknown>) {
  return fc.record({ of: fc.constant(of), name: fc.constantFrom(...keysOf(endpoints)) })
}

export const endpointOf = (move: Move): EndpointShape =>
  move.of === 'submission' ? ofSubmission[move.name] : ofChallenge[move.name]

const holds = (who: Actor, permission: string): boolean =>
  allows(permission as Permission, actors[who].side, [...actors[who].roles])

/** What one of the actors could well try where the submission stands. */
export function sensibleStep(before: Seen, given: Step): Step {
  const unsettled = before.challenges.some(({ state }) => isUnsettled(state))
  const tries = keysOf(actors).flatMap((who): Step[] => [
    ...keysOf(ofSubmission)
      .filter((name) => holds(who, ofSubmission[name].access) && movesNamed(name, before.state).length > 0)
      // What ends it all ends most walks too soon.
      .filter((name) => given.pick % 8 === 0 || !['discard', 'withdraw', 'refuse'].includes(name))
      .map((name) => ({ ...given, who, move: { of: 'submission', name } as Step['move'] })),
    ...keysOf(ofChallenge)
      .filter((name) => unsettled && holds(who, ofChallenge[name].access))
      .map((name) => ({ ...given, who, move: { of: 'challenge', name } as Step['move'] })),
  ])
  return tries[given.pick % Math.max(1, tries.length)] ?? given
}

/** Something of the submission to challenge; where nothing was judged, readings or the set-up. */
export function targetOf(before: Seen, pick: number): reviews.ChallengeTarget {
  const content = submissions.contentOf(before.text)
  const study = content?.studies[0]?.code ?? ''
  const clauseKey = before.evaluations[pick % Math.max(1, before.evaluations.length)]?.clauseKey
  if (clauseKey !== undefined && pick % 3 !== 0) return { kind: 'clause', clauseKey }
  return pick % 2
    ? { kind: 'readings', study, readings: [pick % 15, (pick + 4) % 15] }
    : { kind: 'set-up', study }
}

const reasonOf = {
  clause: 'verdict',
  readings: 'outlying',
  'set-up': 'fixture',
  standard: 'value',
  calculation: 'rounding',
} as const

/** A body that every move takes, for the submission as it stands. */
export const bodyOf = (before: Seen, move: Move, target: reviews.ChallengeTarget, rowVersion?: number) => ({
  ...{ reason: 'x', note: 'x', text: 'x', sha256: before.sha256 },
  ...{ target, reasonKind: reasonOf[target.kind], dueOn: '2027-01-01' },
  conditions: [{ text: 'x', dueOn: '2027-01-01', owner: 'supplier', followUp: 'document' }],
  expectedVersion: move.of === 'challenge' ? rowVersion : before.rowVersion,
})

/** Other readings in the study that the submission rests on: a new revision of its data. */
export async function storeReadings(story: Story, before: Seen, pick: number): Promise<void> {
  const code = submissions.contentOf(before.text)?.studies[0]?.code
  const engineer = story.by('engineer')
  const found = (await engineer.call(studies.listStudies, {}, { query: { search: code, size: 100 } })).items
  const study = found.find((each) => each.code === code)
  if (!study) return
  const { rowVersion: expectedVersion } = await engineer.call(studies.readStudy, { studyId: study.id })
  await engineer.call(
    studies.storeReadings,
    { studyId: study.id },
    {
      body: {
        ...{ expectedVersion, source: 'typed', complete: true, reason: 'Read again.', appraiser: 'A' },
        text: (pick % 2 ? goodReadings : biasedReadings).join('\n'),
        collectedOn: story.harness.now().toISOString().slice(0, 10),
        takenBy: [story.people.engineer.id],
      },
    },
  )
}

/** Whether the tables allow a move, by what both sides can see. */
export async function mayMove(
  story: Story,
  before: Seen,
  { who, move }: { who: Actor; move: Move },
  { challenge, target }: { challenge?: reviews.Challenge | undefined; target: reviews.ChallengeTarget },
): Promise<boolean> {
  if (!holds(who, endpointOf(move).access)) return false
  if (move.of === 'challenge') return mayMoveChallenge(story, before, who, move, challenge)
  if (move.name === 'challenge')
    return (
      movesNamed('challenge', before.state).length > 0 &&
      !before.challenges.some((each) => isUnsettled(each.state) && reviews.sameTarget(each.target, target))
    )
  const facts = await submissionFacts(story, before, who)
  return movesNamed(move.name, before.state).some(
    ({ side, permission, preconditions }) =>
      side === actors[who].side && holds(who, permission) && preconditions.every((each) => facts[each]),
  )
}

async function mayMoveChallenge(
  story: Story,
  before: Seen,
  who: Actor,
  move: Extract<Move, { of: 'challenge' }>,
  challenge: reviews.Challenge | undefined,
): Promise<boolean> {
  if (!challenge) return false
  const answers = challenge.messages.filter(({ answerKind }) => answerKind !== null)
  const corrected = answers.at(-1)?.answerKind === 'correction'
  const facts: Record<ChallengePrecondition, boolean> = {
    'submission-under-review': openToChallenge.includes(before.state),
    'target-not-under-challenge': true,
    'words-given': true,
    'files-given': true,
    'data-corrected': move.name === 'correct' && (await correctionOf(story, before, challenge)).corrected,
    'did-not-take-readings': who !== 'engineer',
    'as-seen': true,
    corrected,
    'not-corrected': !corrected,
    'submission-refused': false,
  }
  return challengeMovesNamed(move.name, challenge.state).some(
    ({ side, permission, preconditions }) =>
      side === actors[who].side && holds(who, permission) && preconditions.every((each) => facts[each]),
  )
}

/** What the supplier could sign as a correction now. */
export async function correctionOf(story: Story, before: Seen, { id }: { id: string }) {
  const { sha256, hindrances } = await story
    .by('approver')
    .call(reviews.readCorrection, { submissionId: before.id, challengeId: id })
  return { sha256, corrected: !hindrances.includes('nothing-corrected') }
}

async function submissionFacts(
  story: Story,
  before: Seen,
  who: Actor,
): Promise<Record<SubmissionPrecondition, boolean>> {
  const { challenges } = before
  const theirs = before.number === null ? null : await story.read('quality', before.id)
  const proposed = theirs?.decisions.find(({ state }) => state.startsWith('awaiting'))
  const { items } = await story
    .by('engineer')
    .call(submissions.listSubmissions, {}, { query: { taskId: before.taskId, sort: '-number', size: 100 } })
  const waiting = challenges.some(({ state }) => waitsOnSupplier(state))
  return {
    'task-in-use': true,
    'something-to-judge': true,
    'no-other-draft': true,
    'reason-given': true,
    'as-seen': true,
    'did-not-take-readings': who !== 'engineer',
    'a-challenge-is-open': waiting,
    'no-challenge-open': !waiting,
    'no-challenge-was-answered': !challenges.some(({ messages }) =>
      messages.some(({ side }) => side === 'supplier'),
    ),
    'challenges-settled': !challenges.some(({ state }) => isUnsettled(state)),
    'criteria-agreed': before.criteria === 'agreed',
    'no-criteria-agreed': before.criteria === 'none',
    'safety-class': before.safety,
    'not-safety-class': !before.safety,
    'no-newer-accepted': !items.some(
      ({ state, number }) => state.startsWith('accepted') && (number ?? 0) > (before.number ?? 0),
    ),
    'newer-accepted': false,
    'without-conditions': proposed?.kind === 'accepted',
    'with-conditions': proposed?.kind === 'accepted-with-conditions',
    'another-person': proposed?.decidedBy !== story.people[who].name,
  }
}
