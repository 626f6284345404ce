import { agreements, messages, requests, reviews } from '@evenrule/api/contract'
import { pino } from 'pino'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { openDatabase } from '../../packages/api/src/server/db/database'
import { tellReminders } from '../../packages/api/src/server/modules/reminders/reminders.service'
import { stageOf } from '../../packages/api/src/server/modules/reminders/reminders.stages'
import { clauses, startStory, type Story } from './prepared'

let story: Story
let system: ReturnType<typeof openDatabase>
const start = '2026-11-02T09:00:00.000Z'

beforeAll(async () => {
  story = await startStory()
  system = openDatabase(story.harness.urlAs('evenrule_system'), 8)
})
afterAll(async () => {
  await system.pool.end()
  await story.stop()
})
beforeEach(async () => {
  story.harness.moveClock(start)
  await story.harness.owner.query('delete from outbox')
  await story.harness.owner.query('delete from messages')
})

/** One run of a worker's chore at an instant. */
async function chore(at: string, database = system.database): Promise<number> {
  story.harness.moveClock(at)
  return tellReminders({ database, logger: pino({ level: 'silent' }), clock: story.harness.now })
}
const told = async (who: 'engineer' | 'quality' | 'approver', about = '') =>
  (await story.by(who).call(messages.listMessages, {}, { query: { size: 100, sort: 'createdAt' } })).items
    .filter(({ kind, link }) => (kind === 'reminder' || kind === 'standing') && link.endsWith(about))
    .map(({ subject }) => subject)

async function ask(dueOn: string) {
  const task = await story.task()
  return story.by('quality').call(
    requests.askForProof,
    {},
    {
      body: {
        ...{
          relationshipId: story.relationship.id,
          taskIds: [task.id],
          dueOn,
          occasion: 'yearly',
          words: '',
        },
      },
    },
  )
}

describe('the stage of a day', () => {
  it.each([
    ['2026-11-20', '2026-11-02', null],
    ['2026-11-20', '2026-11-13', 7],
    ['2026-11-20', '2026-11-18', 7],
    ['2026-11-20', '2026-11-19', 1],
    ['2026-11-20', '2026-11-20', 1],
    ['2026-11-20', '2026-11-21', 'over'],
  ])('%s is told on %s as %s', (day, today, stage) => expect(stageOf(day, today, [7, 1])).toBe(stage))

  it('is not told of a stretch in which it was set', () => {
    expect(stageOf('2026-11-20', '2026-11-15', [7, 1], '2026-11-14')).toBeNull()
    expect(stageOf('2026-11-20', '2026-11-19', [7, 1], '2026-11-14')).toBe(1)
    expect(stageOf('2026-11-20', '2026-11-21', [7, 1], '2026-11-20')).toBe('over')
  })
})

describe('a request', () => {
  it('is told seven days and one day ahead and when it is over, each once, by the relationship’s calendar', async () => {
    const { id, number } = await ask('2026-11-20')
    const path = `requests/${id}`
    await chore('2026-11-12T22:30:00.000Z')
    expect(await told('engineer', path)).toEqual([])
    // Half an hour before midnight in London, it is the 13th in Berlin already.
    await chore('2026-11-12T23:30:00.000Z')
    const due = [`Due in 7 days: request ${number}`]
    expect(await told('engineer', path)).toEqual(due)
    for (const at of ['2026-11-13T08:00:00.000Z', '2026-11-16T08:00:00.000Z']) await chore(at)
    expect(await told('engineer', path)).toEqual(due)
    await chore('2026-11-19T08:00:00.000Z')
    due.push(`Due tomorrow: request ${number}`)
    expect(await told('engineer', path)).toEqual(due)
    expect(await told('quality', path)).toEqual([])
    await chore('2026-11-20T22:30:00.000Z')
    expect(await told('engineer', path)).toEqual(due)
    await chore('2026-11-20T23:30:00.000Z')
    await chore('2027-02-01T08:00:00.000Z')
    due.push(`Overdue: request ${number}`)
    expect(await told('engineer', path)).toEqual(due)
    expect(await told('quality', path)).toEqual([`Not answered in time: request ${number}`])
  })

  it('after days of down time is told only what is left to tell', async () => {
    const { id, number } = await ask('2026-11-20')
    await chore('2026-11-25T08:00:00.000Z')
    expect(await told('engineer', `requests/${id}`)).toEqual([`Overdue: request ${number}`])
  })

  it('whose day was moved is told anew; one withdrawn is told no more', async () => {
    const asked = await ask('2026-11-20')
    const path = `requests/${asked.id}`
    await chore('2026-11-14T08:00:00.000Z')
    const moved = await story
      .by('quality')
      .call(
        requests.moveRequestDate,
        { requestId: asked.id },
        { body: { expectedVersion: asked.rowVersion, dueOn: '2026-12-20', reason: 'Later.' } },
      )
    await chore('2026-11-21T08:00:00.000Z')
    expect(await told('engineer', path)).toEqual([`Due in 6 days: request ${asked.number}`])
    await chore('2026-12-15T08:00:00.000Z')
    expect(await told('engineer', path)).toHaveLength(2)
    await story
      .by('quality')
      .call(
        requests.withdrawRequest,
        { requestId: asked.id },
        { body: { expectedVersion: moved.rowVersion, reason: 'Not needed.' } },
      )
    await chore('2026-12-22T08:00:00.000Z')
    expect(await told('engineer', path)).toHaveLength(2)
  })

  it('is told once by four workers at the same time', async () => {
    const asked = await Promise.all(['2026-11-20', '2026-11-20', '2026-11-20'].map(ask))
    story.harness.moveClock('2026-11-19T08:00:00.000Z')
    const counts = await Promise.all(
      [1, 2, 3, 4].map(() =>
        tellReminders({
          database: system.database,
          logger: pino({ level: 'silent' }),
          clock: story.harness.now,
        }),
      ),
    )
    expect(counts.filter((count) => count > 0).length).toBeGreaterThan(0)
    for (const { id, number } of asked)
      expect(await told('engineer', `requests/${id}`)).toEqual([`Due tomorrow: request ${number}`])
    expect(await chore('2026-11-19T09:00:00.000Z')).toBe(0)
  })

  it('leaves nothing half told when the worker dies in the middle', async () => {
    const { id } = await ask('2026-11-20')
    await story.harness.owner.query(
      `alter table outbox add constraint dies check (next_attempt_at < '2026-11-19')`,
    )
    try {
      expect(await chore('2026-11-19T08:00:00.000Z')).toBe(0)
    } finally {
      await story.harness.owner.query('alter table outbox drop constraint dies')
    }
    expect(await told('engineer', `requests/${id}`)).toEqual([])
    expect(await chore('2026-11-19T08:00:00.000Z')).toBeGreaterThan(0)
    expect(await told('engineer', `requests/${id}`)).toHaveLength(1)
  })
})

describe('days of proof', () => {
  const seen = async (id: string) => {
    const { rowVersion, sha256 } = await story.read('quality', id)
    return { expectedVersion: rowVersion, sha256 }
  }

  it('of a calibration are told to the supplier, and the hold on what rests on it to both, each once', async () => {
    const task = await story.ready()
    const id = await story.submission(task.id, 'submitted')
    await story.by('quality').call(reviews.accept, { submissionId: id }, { body: await seen(id) })
    const at = `gauges/${task.gauge.id}`
    for (const day of ['2027-01-29', '2027-01-30', '2027-02-10']) await chore(`${day}T08:00:00.000Z`)
    const soon = `Calibration due in 30 days: ${task.gauge.code} Bore gauge`
    expect(await told('engineer', at)).toEqual([soon])
    await chore('2027-03-01T08:00:00.000Z')
    expect(await told('engineer', at)).toEqual([soon, `Calibration due today: ${task.gauge.code} Bore gauge`])
    expect(await told('quality', id)).toEqual([])
    for (const day of ['2027-03-02', '2027-03-03', '2027-04-01']) await chore(`${day}T08:00:00.000Z`)
    expect((await told('engineer', at)).at(-1)).toBe(`Calibration overdue: ${task.gauge.code} Bore gauge`)
    const { number } = await story.read('quality', id)
    for (const who of ['engineer', 'quality'] as const)
      expect(await told(who, `submissions/${id}`)).toEqual([
        `On hold: submission ${number}, ${task.gauge.code} for ${task.part.number} bore`,
      ])
  })

  it('of a challenge and of a condition are told to who owes something, the lapse to both', async () => {
    const task = await story.ready()
    const first = await story.submission(task.id, 'submitted')
    const { expectedVersion } = await seen(first)
    await story.by('quality').call(
      reviews.openChallenge,
      { submissionId: first },
      {
        body: {
          ...{ expectedVersion, target: { kind: 'clause', clauseKey: 'bias/mean' }, reasonKind: 'verdict' },
          ...{ text: 'Is it so?', dueOn: '2026-11-20' },
        },
      },
    )
    const other = await story.ready()
    const second = await story.submission(other.id, 'submitted')
    const conditions = [
      { text: 'Send the instruction.', dueOn: '2026-12-20', owner: 'supplier', followUp: 'document' },
    ]
    await story
      .by('approves')
      .call(
        reviews.acceptWithConditions,
        { submissionId: second },
        { body: { ...(await seen(second)), conditions } },
      )
    await chore('2026-11-17T08:00:00.000Z')
    const [of, to] = [`submissions/${first}`, `submissions/${second}`]
    expect((await told('engineer', of)).map((each) => each.split(':')[0])).toEqual(['Answer due in 3 days'])
    await chore('2026-11-21T08:00:00.000Z')
    expect((await told('engineer', of)).map((each) => each.split(':')[0])).toEqual([
      'Answer due in 3 days',
      'Answer overdue',
    ])
    expect((await told('quality', of)).map((each) => each.split(':')[0])).toEqual(['Not answered in time'])
    await chore('2026-12-06T08:00:00.000Z')
    await chore('2026-12-18T08:00:00.000Z')
    const kinds = ['Condition due in 14 days', 'Condition due in 2 days']
    expect((await told('engineer', to)).map((each) => each.split(':')[0])).toEqual(kinds)
    expect(await told('quality', to)).toEqual([])
    await chore('2026-12-21T08:00:00.000Z')
    expect((await told('engineer', to)).map((each) => each.split(':')[0])).toEqual([...kinds, 'Lapsed'])
    expect((await told('quality', to)).map((each) => each.split(':')[0])).toEqual(['Lapsed'])
  })

  it('of criteria: who has not signed is told that they lapse, both that they are in force', async () => {
    const task = await story.task()
    const scope = { relationshipId: story.relationship.id, partId: task.part.id, characteristicId: null }
    const begun = await story
      .by('quality')
      .call(
        agreements.beginVersion,
        {},
        { body: { ...scope, clauses, effectiveOn: '2026-11-20', send: true } },
      )
    const at = (found: agreements.Agreement) => ({
      params: { agreementId: found.id, versionId: found.versions[0]?.id ?? '' },
      expectedVersion: found.versions[0]?.rowVersion ?? 0,
      sha256: found.versions[0]?.sha256 ?? '',
    })
    const sent = at(begun)
    let now = at(
      await story
        .by('engineer')
        .call(agreements.acceptRound, sent.params, { body: { expectedVersion: sent.expectedVersion } }),
    )
    const sign = async (who: 'approves' | 'approver') => {
      const { params, ...body } = now
      now = at(await story.by(who).call(agreements.signVersion, params, { body }))
    }
    await sign('approves')
    await chore('2026-11-18T08:00:00.000Z')
    const path = `agreements/${begun.id}`
    expect((await told('approver', path)).map((each) => each.split(':')[0])).toEqual([
      'Lapses without your signature',
    ])
    expect(await told('engineer', path)).toEqual([])
    expect(await told('quality', path)).toEqual([])
    await sign('approver')
    await chore('2026-11-19T22:30:00.000Z')
    expect(await told('quality', path)).toEqual([])
    for (const instant of ['2026-11-19T23:30:00.000Z', '2026-11-21T08:00:00.000Z']) await chore(instant)
    for (const who of ['engineer', 'quality'] as const)
      expect((await told(who, path)).map((each) => each.split(':')[0])).toEqual(['In force now'])
  })
})
