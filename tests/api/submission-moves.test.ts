import fc from 'fast-check'
import { afterAll, beforeAll, expect, it } from 'vitest'
import { reviews, submissions } from '@evenrule/api/contract'
import {
  challengeMoves,
  challengeMovesNamed,
  isUnsettled,
  waitsOnSupplier,
} from '../../packages/api/src/contract/moves/challenge'
import { conditionMoves } from '../../packages/api/src/contract/moves/condition'
import {
  submissionMove,
  submissionMoves,
  underReview,
  type SubmissionMoveName,
} from '../../packages/api/src/contract/moves/submission'
import { startStory, type Seen, type Story } from './prepared'
import {
  bodyOf,
  correctionOf,
  endpointOf,
  mayMove,
  ofChallenge,
  ofSubmission,
  sensibleStep,
  step,
  storeReadings,
  targetOf,
  type Actor,
  type Move,
  type Step,
} from './review-walk'

const kinds = ['ordinary', 'safety', 'one-off', 'safety-one-off'] as const
type Kind = (typeof kinds)[number]

let story: Story
let tasks: Record<Kind, string>
beforeAll(async () => {
  story = await startStory()
  const withoutCriteria = async (safety: boolean) => {
    const task = await story.task({ safety })
    await story.study(task)
    return task.id
  }
  tasks = {
    ordinary: (await story.ready()).id,
    safety: (await story.ready({ safety: true })).id,
    'one-off': await withoutCriteria(false),
    'safety-one-off': await withoutCriteria(true),
  }
})
afterAll(() => story.stop())

it('endpoints ask for a permission that the table of moves names', () => {
  for (const [name, endpoint] of Object.entries(ofSubmission)) {
    const named = submissionMoves.filter((each) => each.name === name).map(({ permission }) => permission)
    expect([name, named]).toEqual([name, expect.arrayContaining([endpoint.access])])
  }
  for (const [name, endpoint] of Object.entries(ofChallenge))
    for (const move of challengeMoves.filter((each) => each.name === name))
      expect([name, endpoint.access]).toEqual([name, move.permission])
  const ofCondition = {
    report: reviews.reportCondition,
    confirm: reviews.confirmCondition,
    return: reviews.returnCondition,
  }
  for (const { name, permission } of conditionMoves)
    expect([name, ofCondition[name].access]).toEqual([name, permission])
})

/** A walk that begins at a signed submission (its length is odd), as `who move` in order. */
const walk = (...tried: [Actor, Step['move']['of'], string, number?][]): Step[] =>
  tried.map(([who, of, name, pick = 1]) => ({
    ...{ who, pick, sensible: false },
    move: { of, name } as Step['move'],
  }))

/** Walks that chance takes too seldom: each tries what is not allowed before what is. */
const walks: [Kind, Step[]][] = [
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
    'ordinary',
    walk(
      ['quality', 'submission', 'challenge', 3],
      ['approver', 'challenge', 'correct'],
      ['engineer', 'readings', 'store', 1],
      ['engineer', 'challenge', 'correct'],
      ['quality', 'challenge', 'settle'],
      ['approver', 'challenge', 'correct'],
      ['approver', 'challenge', 'correct'],
      ['quality', 'submission', 'accept'],
      ['quality', 'challenge', 'settle'],
      ['quality', 'submission', 'accept'],
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
  [
    'one-off',
    walk(
      ['quality', 'submission', 'accept'],
      ['quality', 'submission', 'challenge', 2],
      ['approves', 'challenge', 'propose-unresolved'],
      ['approves', 'submission', 'accept'],
      ['engineer', 'challenge', 'agree-unresolved'],
      ['approver', 'challenge', 'decline-unresolved'],
      ['approves', 'challenge', 'propose-unresolved'],
      ['approver', 'challenge', 'agree-unresolved'],
      ['approves', 'submission', 'accept'],
      ['engineer', 'submission', 'agree-one-off'],
      ['approver', 'submission', 'decline-one-off'],
      ['approves', 'submission', 'accept-with-conditions'],
      ['approver', 'submission', 'agree-one-off'],
    ),
  ],
  [
    'safety-one-off',
    walk(
      ['second', 'submission', 'accept'],
      ['approves', 'submission', 'accept'],
      ['approver', 'submission', 'agree-one-off'],
      ['approves', 'submission', 'confirm'],
      ['quality', 'submission', 'confirm'],
      ['quality', 'submission', 'send-back'],
      ['approver', 'submission', 'agree-one-off'],
    ),
  ],
]

it('whatever people try, in whatever order, states change as the tables say and not otherwise', async () => {
  const reached = new Set<string>()
  await fc.assert(
    fc.asyncProperty(
      fc.constantFrom(...kinds),
      fc.array(step, { minLength: 8, maxLength: 30 }),
      async (kind, steps) => {
        const id = await story.submission(tasks[kind], 'draft')
        // Most runs begin where the review does, or few would ever come that far.
        if (steps.length % 4) await signed(id)
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
    { numRuns: 24, examples: walks, endOnFailure: true, interruptAfterTimeLimit: 200_000 },
  )
  // The walk must have been somewhere, or it proved nothing.
  for (const way of [
    'answered → accepted-with-conditions',
    'awaiting-other-side → accepted-with-conditions',
    'awaiting-other-side → answered',
    'awaiting-second-person → awaiting-other-side',
    'challenged → answered',
  ])
    expect(reached).toContain(way)
  expect(reached.size).toBeGreaterThanOrEqual(12)
}, 300_000)

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

async function attempt(id: string, given: Step): Promise<{ from: string; to: string }> {
  const before = await story.read('engineer', id)
  const { who, move, pick } = given.sensible ? sensibleStep(before, given) : given
  const stays = { from: before.state, to: before.state }
  if (move.of === 'readings') {
    await storeReadings(story, before, pick)
    // Whatever is stored in the study, what was signed stays.
    if (before.number !== null) expect((await story.read('engineer', id)).text).toBe(before.text)
    return stays
  }
  const challenge = before.challenges[pick % Math.max(1, before.challenges.length)]
  if (move.of === 'challenge' && !challenge) return stays
  const target = targetOf(before, pick)
  const expected = await mayMove(story, before, { who, move }, { challenge, target })
  const sha256 =
    move.name === 'correct' && challenge && before.number !== null
      ? (await correctionOf(story, before, challenge)).sha256
      : before.sha256
  const answer = await story
    .by(who)
    .call(
      endpointOf(move),
      { submissionId: id, challengeId: challenge?.id ?? '' },
      { body: { ...bodyOf(before, move, target, challenge?.rowVersion), sha256 } },
    )
    .then(
      () => 200,
      (error: { status: number }) => error.status,
    )
  const after = await story.read('engineer', id)
  const tried = `${who} ${move.of} ${move.name} in ${before.state}, ${challenge?.state ?? 'no challenge'}`
  expect([tried, answer === 200]).toEqual([tried, expected])
  if (answer === 200) moved(before, after, move, tried)
  else {
    expect([tried, [403, 404, 409]]).toEqual([tried, expect.arrayContaining([answer])])
    expect({ ...after, hindrances: [] }).toEqual({ ...before, hindrances: [] })
  }
  return { from: before.state, to: after.state }
}

/** The move of the submission that may follow from one of its challenge's. */
const following: Record<keyof typeof ofChallenge, SubmissionMoveName> = {
  answer: 'answer',
  correct: 'answer',
  reply: 'challenge',
  settle: 'resume',
  withdraw: 'resume',
  'propose-unresolved': 'challenge',
  'agree-unresolved': 'answer',
  'decline-unresolved': 'answer',
}

/** What must hold after any move that was made. */
function moved(before: Seen, after: Seen, move: Move, tried: string): void {
  expect(after.rowVersion).toBe(before.rowVersion + 1)
  const name: SubmissionMoveName = move.of === 'submission' ? move.name : following[move.name]
  if (after.state !== before.state)
    expect([tried, submissionMove(name, before.state, after.state)]).toEqual([tried, expect.anything()])
  else expect(move.of === 'challenge' || move.name === 'challenge').toBe(true)
  for (const challenge of after.challenges) {
    const was = before.challenges.find(({ id }) => id === challenge.id)?.state ?? null
    if (was === challenge.state) continue
    const to = challengeMoves.filter(
      (each) => each.to === challenge.state && challengeMovesNamed(each.name, was).length > 0,
    )
    expect([tried, to.length]).toEqual([tried, expect.toSatisfy((count: number) => count > 0)])
  }
  const isOver = !underReview.includes(after.state) && after.number !== null && after.state !== 'withdrawn'
  // Nothing is decided, nor proposed to be, while a challenge asks for something.
  if (isOver || after.state.startsWith('awaiting'))
    expect([tried, after.challenges.filter(({ state }) => isUnsettled(state))]).toEqual([tried, []])
  else if (after.state !== 'withdrawn')
    expect(after.challenges.some(({ state }) => waitsOnSupplier(state))).toBe(after.state === 'challenged')
  if (before.number === null) return
  // A correction adds a text; nothing ever changes one.
  expect(after.revisions.slice(0, before.revisions.length)).toEqual(before.revisions)
  expect(after.revisions).toHaveLength(before.revisions.length + (move.name === 'correct' ? 1 : 0))
  if (move.name !== 'correct') expect(after.text).toBe(before.text)
}
