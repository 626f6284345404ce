import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { studies } from '@evenrule/api/contract'
import { studyMove, studyStates } from '../../packages/api/src/contract/moves/study'
import { attemptsOn } from '../../packages/api/src/server/modules/studies/studies.results.service'
import { goodReadings, startStory, type Story } from './prepared'

let story: Story
let task: Awaited<ReturnType<Story['task']>>
beforeAll(async () => {
  story = await startStory()
  task = await story.task()
})
afterAll(() => story.stop())

let counter = 0
const engineer = () => story.by('engineer')
const register = (more: object = {}) =>
  engineer().call(
    studies.registerStudy,
    {},
    {
      body: {
        ...{ code: `M-${(counter += 1)}`, taskIds: [task.id], standardId: task.standard.id },
        ...{ plannedReadings: 15, unit: 'mm', measuredAs: 'value' },
        ...more,
      },
    },
  )

/** What each move sends; everything but the state is in order. */
const acts = {
  'keep-readings': (study: studies.Study) => store(study, { complete: false }),
  compute: (study: studies.Study) => store(study, { complete: true }),
  correct: (study: studies.Study) => store(study, { complete: true, reason: 'A digit was mistyped.' }),
  abandon: (study: studies.Study) =>
    engineer().call(
      studies.abandonStudy,
      { studyId: study.id },
      { body: { expectedVersion: study.rowVersion, reason: 'The fixture broke.' } },
    ),
}
const store = (study: studies.Study, more: object) =>
  engineer().call(
    studies.storeReadings,
    { studyId: study.id },
    {
      body: {
        ...{ source: 'typed', text: goodReadings.join('\n'), expectedVersion: study.rowVersion },
        ...{ collectedOn: '2026-11-02', appraiser: 'A', takenBy: [story.people.engineer.id] },
        ...more,
      },
    },
  )
const inState = {
  registered: () => register(),
  collecting: async () => acts['keep-readings'](await register()),
  computed: async () => acts.compute(await register()),
  abandoned: async () => acts.abandon(await register()),
}

describe('a study in each state', () => {
  const names = Object.keys(acts) as (keyof typeof acts)[]
  it.each(studyStates.flatMap((state) => names.map((name) => [state, name] as const)))(
    'that is %s takes %s exactly where the table of moves says so',
    async (state, name) => {
      const study = await inState[state]()
      expect(study.state).toBe(state)
      // A complete set of readings corrects a computed study and computes any other, with or without a reason.
      const meant = name === 'correct' && state !== 'computed' ? 'compute' : name
      const allowed =
        studyMove(meant, state) ?? (name === 'compute' ? studyMove('correct', state) : undefined)
      const outcome = await acts[name](study).then(
        (moved) => moved.state,
        (error: { problem: { code: string } }) => error.problem.code,
      )
      if (state === 'computed' && (name === 'compute' || name === 'keep-readings'))
        // What a correction needs is missing, and is asked for at its field.
        expect(outcome).toBe('invalid-input')
      else expect(outcome).toBe(allowed?.to ?? 'wrong-state')
      const { rows } = await story.harness.owner.query<{ type: string }>(
        'select type from record_events where subject_id = $1 order by sequence desc limit 1',
        [study.id],
      )
      if (outcome === allowed?.to) expect(rows[0]?.type).toBe(allowed.event)
    },
  )
})

describe('attempts', () => {
  it('count from a day of the relationship’s calendar, not of the clock’s', async () => {
    const other = await story.task()
    const code = 'NIGHT'
    story.harness.moveClock('2026-11-02T23:30:00.000Z') // In Berlin it is the third already.
    await register({ code, taskIds: [other.id], standardId: other.standard.id })
    story.harness.moveClock('2026-11-03T09:00:00.000Z')
    const since = (day: string) =>
      story.harness.inTenant(
        'supplier',
        story.organisations.supplier,
        story.people.engineer,
        [],
        async (tenant) => (await attemptsOn(tenant, other.id, day)).map((each) => each.code),
      )
    expect(await since('2026-11-03')).toEqual([code])
    expect(await since('2026-11-04')).toEqual([])
  })
})
