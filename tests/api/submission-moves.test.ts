import fc from 'fast-check'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { allows, reviews, submissions, type EndpointShape, type Permission } from '@evenrule/api/contract'
import { challengeMove, isUnsettled } from '../../packages/api/src/contract/moves/challenge'
import {
  movesNamed,
  submissionMove,
  submissionMoves,
  underReview,
  type SubmissionMoveName,
  type SubmissionPrecondition,
} from '../../packages/api/src/contract/moves/submission'
import { startStory, type Seen, type Story } from './prepared'

let story: Story
let tasks: Record<'ordinary' | 'safety', string>
beforeAll(async () => {
  story = await startStory()
  tasks = {
    ordinary: (await story.ready()).id,
    safety: (await story.ready({ safety: true, takenBy: story.people.engineer })).id,
  }
})
afterAll(() => story.stop())

const actors = {
  engineer: { side: 'supplier', roles: ['gauge-engineer'] },
  approver: { side: 'supplier', roles: ['supplier-approver'] },
  quality: { side: 'customer', roles: ['quality-representative'] },
  second: { side: 'customer', roles: ['quality-representative'] },
  approves: { side: 'customer', roles: ['customer-approver'] },
} as const
type Actor = keyof typeof actors

const ofSubmission = {
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
  challenge: reviews.openChallenge,
} satisfies Partial<Record<SubmissionMoveName, EndpointShape>>
const ofChallenge = {
  answer: reviews.answerChallenge,
  reply: reviews.replyToAnswer,
  settle: reviews.settleChallenge,
  withdraw: reviews.withdrawChallenge,
}

const step = fc.record({
  who: fc.constantFrom(...(Object.keys(actors) as Actor[])),
  move: fc.oneof(
    fc.record({ of: fc.constant('submission' as const), name: fc.constantFrom(...keysOf(ofSubmission)) }),
    fc.record({ of: fc.constant('challenge' as const), name: fc.constantFrom(...keysOf(ofChallenge)) }),
  ),
  pick: fc.nat(1000),
  /** Mostly what a page would offer somebody, now and then anything at all. */
  sensible: fc.boolean(),
})
type Step = typeof step extends fc.Arbitrary<infer S> ? S : never

function keysOf<K extends string>(record: Record<K, unknown>): K[] {
  return Object.keys(record) as K[]
}

const body = {
  reason: 'x',
  note: 'x',
  text: 'x',
  conditions: 'x',
  conditionsDueOn: '2027-01-01',
  reasonKind: 'result',
}

it('endpoints ask for the permission that the table of moves names', () => {
  for (const [name, endpoint] of Object.entries(ofSubmission))
    for (const move of submissionMoves.filter((each) => each.name === name))
      expect([name, endpoint.access]).toEqual([name, move.permission])
  for (const [name, endpoint] of Object.entries(ofChallenge))
    expect(endpoint.access).toBe(
      challengeMove(name as 'answer', name === 'answer' ? 'open' : 'answered')?.permission,
    )
})

/** A walk that begins at a signed submission (its length is odd), as `who move` in order. */
const walk = (...tried: [Actor, 'submission' | 'challenge', string][]): Step[] =>
  tried.map(([who, of, name]) => ({ who, move: { of, name } as Step['move'], pick: 0, sensible: false }))

/** Walks that chance takes too seldom: each tries what is not allowed before what is. */
const walks: [keyof typeof tasks, Step[]][] = [
  [
    'ordinary',
    walk(
      ['quality', 'submission', 'challenge'],
      ['quality', 'submission', 'accept'],
      ['quality', 'submission', 'challenge'],
      ['engineer', 'challenge', 'answer'],
      ['quality', 'submission', 'accept'],
      ['second', 'challenge', 'reply'],
      ['approver', 'challenge', 'answer'],
      ['approves', 'submission', 'accept-with-conditions'],
      ['quality', 'challenge', 'settle'],
      ['approves', 'submission', 'accept-with-conditions'],
      ['engineer', 'submission', 'withdraw'],
    ),
  ],
  [
    'safety',
    walk(
      ['quality', 'submission', 'accept'],
      ['quality', 'submission', 'confirm'],
      ['quality', 'submission', 'challenge'],
      ['second', 'submission', 'send-back'],
      ['approves', 'submission', 'accept-with-conditions'],
      ['approves', 'submission', 'confirm'],
      ['quality', 'submission', 'refuse'],
      ['second', 'submission', 'confirm'],
      ['quality', 'submission', 'refuse'],
    ),
  ],
]

it('whatever people try, in whatever order, states change as the tables say and not otherwise', async () => {
  const reached = new Set<string>()
  await fc.assert(
    fc.asyncProperty(
      fc.constantFrom('ordinary' as const, 'safety' as const),
      fc.array(step, { minLength: 8, maxLength: 30 }),
      async (kind, steps) => {
        const id = await story.submission(tasks[kind], 'draft')
        // Half the runs begin where the review does, or few would ever come that far.
        if (steps.length % 2) await signed(id)
        let afterTheEnd = 0
        for (const each of steps) {
          if (afterTheEnd > 2) break
          const { from, to } = await attempt(id, each)
          if (from !== to) reached.add(`${from} → ${to}`)
          if (!submissionMoves.some((move) => (move.from as readonly string[]).includes(to))) afterTheEnd += 1
        }
        await finish(id)
      },
    ),
    { numRuns: 20, examples: walks, endOnFailure: true, interruptAfterTimeLimit: 150_000 },
  )
  // The walk must have been somewhere, or it proved nothing.
  expect(reached.size).toBeGreaterThanOrEqual(10)
}, 240_000)

/** What one of the actors could well try where the submission stands. */
function sensibleStep(before: Seen, step: Step): Step {
  const tries = keysOf(actors).flatMap((who) => {
    const { side, roles } = actors[who]
    const holds = (endpoint: EndpointShape) => allows(endpoint.access as Permission, side, [...roles])
    return [
      ...keysOf(ofSubmission)
        .filter((name) => holds(ofSubmission[name]) && movesNamed(name, before.state).length > 0)
        // What ends it all ends most walks too soon.
        .filter((name) => step.pick % 8 === 0 || !['discard', 'withdraw', 'refuse'].includes(name))
        .map((name) => ({ ...step, who, move: { of: 'submission' as const, name } })),
      ...keysOf(ofChallenge)
        .filter(
          (name) => holds(ofChallenge[name]) && before.challenges.some(({ state }) => isUnsettled(state)),
        )
        .map((name) => ({ ...step, who, move: { of: 'challenge' as const, name } })),
    ]
  })
  return tries[step.pick % Math.max(1, tries.length)] ?? step
}

async function signed(id: string): Promise<void> {
  const params = { submissionId: id }
  await story.by('engineer').call(submissions.sendForSignature, params, { body: { expectedVersion: 1 } })
  const { rowVersion: expectedVersion, sha256 } = await story.read('approver', id)
  await story.by('approver').call(submissions.signSubmission, params, { body: { expectedVersion, sha256 } })
}

/** Leaves the task free for the next run. */
async function finish(id: string): Promise<void> {
  const { state, rowVersion: expectedVersion } = await story.read('engineer', id)
  if (state === 'draft' || state === 'for-signature')
    await story
      .by('engineer')
      .call(submissions.discardSubmission, { submissionId: id }, { body: { expectedVersion } })
}

async function attempt(id: string, step: Step): Promise<{ from: string; to: string }> {
  const before = await story.read('engineer', id)
  const { who, move, pick } = step.sensible ? sensibleStep(before, step) : step
  const { side, roles } = actors[who]
  const endpoint: EndpointShape = move.of === 'submission' ? ofSubmission[move.name] : ofChallenge[move.name]
  const challenge = before.challenges[pick % Math.max(1, before.challenges.length)]
  const clause = before.evaluations[pick % before.evaluations.length]
  if (move.of === 'challenge' && !challenge) return { from: before.state, to: before.state }
  const holds = allows(endpoint.access as Permission, side, [...roles])
  const expected = holds && (await mayMove(id, before, who, move, challenge, clause?.clauseKey))
  const answer = await story
    .by(who)
    .call(
      endpoint,
      { submissionId: id, challengeId: challenge?.id ?? '' },
      {
        body: {
          ...body,
          sha256: before.sha256,
          clauseKey: clause?.clauseKey,
          expectedVersion: move.of === 'challenge' ? challenge?.rowVersion : before.rowVersion,
        },
      },
    )
    .then(
      () => 200,
      (error: { status: number }) => error.status,
    )
  const after = await story.read('engineer', id)
  const tried = `${who} ${move.of} ${move.name} in ${before.state}`
  if (answer !== 200) {
    expect([tried, answer]).toEqual([
      tried,
      expect.toSatisfy((status: number) => [403, 404, 409].includes(status)),
    ])
    expect({ ...after, hindrances: [] }).toEqual({ ...before, hindrances: [] })
  }
  expect([tried, answer === 200]).toEqual([tried, expected])
  if (answer === 200) {
    expect(after.rowVersion).toBe(before.rowVersion + 1)
    const names: SubmissionMoveName[] =
      move.of === 'submission'
        ? [move.name]
        : [
            { answer: 'answer', reply: 'challenge', settle: 'resume', withdraw: 'resume' }[
              move.name
            ] as SubmissionMoveName,
          ]
    if (after.state !== before.state)
      expect(names.some((name) => submissionMove(name, before.state, after.state))).toBe(true)
    else expect(move.of === 'challenge' || move.name === 'challenge').toBe(true)
    if (underReview.includes(after.state))
      expect(after.challenges.some(({ state }) => state === 'open')).toBe(after.state === 'challenged')
    if (after.number !== null && before.number !== null) expect(after.text).toBe(before.text)
  }
  return { from: before.state, to: after.state }
}

/** Whether the tables allow it, by what both sides can see. */
async function mayMove(
  id: string,
  before: Seen,
  who: Actor,
  move: Step['move'],
  challenge: Seen['challenges'][number] | undefined,
  clauseKey: string | undefined,
): Promise<boolean> {
  const { challenges } = before
  const reviewed = ['submitted', 'challenged', 'answered'].includes(before.state)
  if (move.of === 'challenge')
    return reviewed && challenge !== undefined && challengeMove(move.name, challenge.state) !== undefined
  if (move.name === 'challenge')
    return (
      movesNamed('challenge', before.state).length > 0 &&
      !challenges.some((each) => each.clauseKey === clauseKey && isUnsettled(each.state))
    )
  const theirs = before.number === null ? null : await story.read('quality', id)
  const proposed = theirs?.decisions.find(({ state }) => state === 'awaiting-second-person')
  const accepted = await story
    .by('engineer')
    .call(submissions.listSubmissions, {}, { query: { taskId: before.taskId, sort: '-number', size: 100 } })
  const facts: Record<SubmissionPrecondition, boolean> = {
    'criteria-in-force': true,
    'no-other-draft': true,
    'reason-given': true,
    'as-seen': true,
    'did-not-take-readings': who !== 'engineer',
    'a-challenge-is-open': challenges.some(({ state }) => state === 'open'),
    'no-challenge-open': !challenges.some(({ state }) => state === 'open'),
    'no-challenge-was-answered': !challenges.some(({ messages }) =>
      messages.some(({ side }) => side === 'supplier'),
    ),
    'challenges-settled': !challenges.some(({ state }) => isUnsettled(state)),
    'safety-class': before.safety,
    'not-safety-class': !before.safety,
    'no-newer-accepted': !accepted.items.some(
      ({ state, number }) => state.startsWith('accepted') && (number ?? 0) > (before.number ?? 0),
    ),
    'newer-accepted': false,
    'without-conditions': proposed?.kind === 'accepted',
    'with-conditions': proposed?.kind === 'accepted-with-conditions',
    'another-person': proposed?.decidedBy !== story.people[who].name,
  }
  return movesNamed(move.name, before.state).some((row) => row.preconditions.every((each) => facts[each]))
}
