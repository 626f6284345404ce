import { array, assert, boolean, constantFrom, property } from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  isOwed,
  requestMoves,
  requestMovesNamed,
  requestState,
  requestStates,
  requestTaskState,
  type RequestMove,
  type RequestMoveName,
  type RequestState,
} from './request'
import { submissionStates, type SubmissionState } from './submission'

/** What can happen to a request of three tasks: to the request, or to a submission that names it for one task. */
type Step =
  | { kind: 'withdraw' | 'move-date' }
  | { kind: 'sign' | 'take-back' | 'refuse' | 'accept' | 'accept-with-conditions'; task: number }

interface World {
  withdrawn: boolean
  /** States of the submissions that name the request, by task, the newest first. */
  answers: SubmissionState[][]
}

const stateOf = ({ withdrawn, answers }: World): RequestState =>
  requestState(withdrawn, answers.map(requestTaskState))

/** The move of the table that a step is; null where nothing of the request moves. */
const nameOf: Record<Step['kind'], RequestMoveName> = {
  withdraw: 'withdraw',
  'move-date': 'move-date',
  sign: 'answer',
  'take-back': 'take-back-answer',
  refuse: 'refuse-answer',
  accept: 'close',
  'accept-with-conditions': 'close',
}

const decided: Partial<Record<Step['kind'], SubmissionState>> = {
  'take-back': 'withdrawn',
  refuse: 'refused',
  accept: 'accepted',
  'accept-with-conditions': 'accepted-with-conditions',
}

/** Makes a step where the product would let it happen; undefined where it would not. */
function take(world: World, step: Step): World | undefined {
  if (world.withdrawn) return undefined
  if (!('task' in step)) {
    if (requestMovesNamed(step.kind, stateOf(world)).length === 0) return undefined
    return step.kind === 'withdraw' ? { ...world, withdrawn: true } : world
  }
  const own = world.answers[step.task] ?? []
  const next = decided[step.kind]
  if (!next) {
    // A signature answers every request that has no accepted answer for the task.
    if (requestTaskState(own) === 'accepted') return undefined
    return withAnswers(world, step.task, ['submitted', ...own])
  }
  if (own[0] !== 'submitted') return undefined
  return withAnswers(world, step.task, [next, ...own.slice(1)])
}

const withAnswers = (world: World, task: number, own: SubmissionState[]): World => ({
  ...world,
  answers: world.answers.map((each, index) => (index === task ? own : each)),
})

const ofRequest: Step[] = [{ kind: 'withdraw' }, { kind: 'move-date' }]
const ofTask = (['sign', 'sign', 'take-back', 'refuse', 'accept', 'accept-with-conditions'] as const).flatMap(
  (kind) => [0, 1, 2].map((task): Step => ({ kind, task })),
)
// Withdrawing ends the story, so it comes rarely.
const steps = array(constantFrom(...ofTask, ...ofTask, ...ofRequest), { minLength: 10, maxLength: 40 })

describe('the moves of a request', () => {
  it('reach every state, and lead out of none that has ended', () => {
    const reached = new Set<string>(requestMoves.map(({ to }) => to))
    expect([...reached].sort()).toEqual([...requestStates].sort())
    for (const ended of ['closed', 'withdrawn'] as const)
      expect(requestMoves.filter(({ from }) => (from as readonly string[]).includes(ended))).toEqual([])
  })

  it('are the customer’s, but for those that a submission of the supplier makes', () => {
    for (const { name, side } of requestMoves)
      expect([name, side]).toEqual([
        name,
        name === 'answer' || name === 'take-back-answer' ? 'supplier' : 'customer',
      ])
  })

  it('cover whatever can happen: random steps never leave the table', () => {
    let changes = 0
    assert(
      property(steps, (story) => {
        let world: World = { withdrawn: false, answers: [[], [], []] }
        for (const step of story) {
          const [before, next] = [stateOf(world), take(world, step)]
          if (!next) continue
          world = next
          const after = stateOf(world)
          if (before === after) continue
          changes += 1
          const possible: RequestMove[] = requestMovesNamed(nameOf[step.kind], before)
          expect([step.kind, before, possible.map(({ to }) => to)]).toEqual([
            step.kind,
            before,
            expect.arrayContaining([after]),
          ])
        }
      }),
      { numRuns: 2000 },
    )
    expect(changes).toBeGreaterThan(500)
  })
})

describe('the state of a request', () => {
  const states = constantFrom(...submissionStates)
  it('is open exactly while a task is owed, and closed only when all are accepted', () => {
    assert(
      property(
        array(array(states, { maxLength: 4 }), { minLength: 1, maxLength: 5 }),
        boolean(),
        (answers, gone) => {
          const tasks = answers.map(requestTaskState)
          const state = requestState(gone, tasks)
          expect(state === 'withdrawn').toBe(gone)
          if (gone) return
          expect(state === 'open').toBe(tasks.some(isOwed))
          expect(state === 'closed').toBe(tasks.every((each) => each === 'accepted'))
        },
      ),
    )
  })

  it('is decided for a task by the newest signed submission, and by an acceptance for good', () => {
    expect(requestTaskState([])).toBe('open')
    expect(requestTaskState(['draft', 'withdrawn'])).toBe('open')
    expect(requestTaskState(['withdrawn', 'refused'])).toBe('refused')
    expect(requestTaskState(['challenged', 'refused'])).toBe('answered')
    expect(requestTaskState(['submitted', 'accepted'])).toBe('accepted')
    expect(requestTaskState(['superseded'])).toBe('accepted')
  })
})
