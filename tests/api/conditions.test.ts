import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { files, messages, reviews, submissions, type EndpointShape } from '@evenrule/api/contract'
import { sql } from './harness'
import { certificate, startStory, type Seen, type Story } from './prepared'

let story: Story
let task: Awaited<ReturnType<Story['ready']>>
let id: string
beforeAll(async () => {
  story = await startStory()
  task = await story.ready()
})
afterAll(() => story.stop())

type Who = Parameters<Story['by']>[0]
const asked = [
  { text: 'Repeat the study.', dueOn: '2026-11-30', owner: 'supplier', followUp: 'new-study' },
  { text: 'Send us the drawing.', dueOn: '2026-11-20', owner: 'customer', followUp: 'document' },
]
const conditionsOf = ({ decisions }: Seen) => decisions.at(-1)?.conditions ?? []
const conditionOf = (seen: Seen, number: number) => {
  const found = conditionsOf(seen).find((each) => each.number === number)
  if (!found) throw new Error(`There is no condition ${number}.`)
  return found
}
const decide = async (who: Who, endpoint: EndpointShape, more: object = {}) => {
  const { rowVersion: expectedVersion, sha256 } = await story.read(who, id)
  return story.by(who).call(endpoint, { submissionId: id }, { body: { expectedVersion, sha256, ...more } })
}
const bodyFor = async (number: number, more: object) => {
  const { id: conditionId, rowVersion } = conditionOf(await story.read('quality', id), number)
  return {
    params: { submissionId: id, conditionId },
    body: { expectedVersion: rowVersion, text: 'Done.', ...more },
  }
}
const act = async (who: Who, endpoint: EndpointShape, number: number, more: object = {}) => {
  const { params, body } = await bodyFor(number, more)
  return story.by(who).call(endpoint, params, { body })
}
const cannot = async (who: Who, endpoint: EndpointShape, number: number, more: object = {}) => {
  const { params, body } = await bodyFor(number, more)
  return story.by(who).refusal(endpoint, params, { body })
}

describe('conditions of an acceptance', () => {
  beforeEach(async () => {
    id = await story.submission(task.id, 'submitted')
    await decide('approves', reviews.acceptWithConditions, { conditions: asked })
  })

  it('stand with their day, who owes them and what shows them, for both sides', async () => {
    for (const who of ['engineer', 'quality'] as const)
      expect(conditionsOf(await story.read(who, id))).toMatchObject([
        { number: 1, ...asked[0], state: 'open', overdue: false, reports: [] },
        { number: 2, ...asked[1], state: 'open', overdue: false, reports: [] },
      ])
  })

  it('are reported by who owes them, with files, and confirmed or returned by the customer', async () => {
    expect(await cannot('quality', reviews.reportCondition, 1)).toMatchObject({ status: 409 })
    expect(await cannot('engineer', reviews.reportCondition, 2)).toMatchObject({ status: 409 })
    expect(await cannot('quality', reviews.confirmCondition, 1)).toMatchObject({ status: 409 })
    const { id: fileId } = await story
      .by('engineer')
      .call(files.uploadAttachment, {}, { body: {}, file: certificate('study') })
    await act('engineer', reviews.reportCondition, 1, { fileIds: [fileId] })
    expect(await cannot('engineer', reviews.confirmCondition, 1)).toMatchObject({ status: 403 })
    expect(await cannot('quality', reviews.returnCondition, 1, { text: ' ' })).toMatchObject({ status: 422 })
    await act('quality', reviews.returnCondition, 1, { text: 'Ten readings only.' })
    await act('engineer', reviews.reportCondition, 1, { text: 'Now with 25.' })
    const confirmed = await act('second', reviews.confirmCondition, 1, { text: '' })
    expect(confirmed).toMatchObject({ state: 'confirmed', confirmedAt: story.harness.now().toISOString() })
    const { reports } = conditionOf(await story.read('engineer', id), 1)
    expect(reports.map(({ move, name, text }) => [move, name, text])).toEqual([
      ['report', 'Grit Falk', 'Done.'],
      ['return', 'Ola Brandt', 'Ten readings only.'],
      ['report', 'Grit Falk', 'Now with 25.'],
      ['confirm', 'Ida Mohn', ''],
    ])
    expect(reports[0]?.files.map(({ name }) => name)).toEqual(['study.pdf'])
    // What the customer owes it reports and confirms itself.
    await act('quality', reviews.reportCondition, 2)
    await act('approves', reviews.confirmCondition, 2)
    const { rows } = await story.harness.owner.query<{ type: string }>(
      `select type from record_events where subject_id = $1 and type like 'condition.%' order by sequence`,
      [id],
    )
    expect(rows.map(({ type }) => type)).toEqual([
      ...['condition.reported', 'condition.returned', 'condition.reported', 'condition.confirmed'],
      ...['condition.reported', 'condition.confirmed'],
    ])
    const told = await story.by('quality').call(messages.listMessages, {}, { query: { size: 100 } })
    expect(
      told.items.some(({ link, subject }) => link.endsWith(id) && /^Condition 1 reported/.test(subject)),
    ).toBe(true)
  })

  it('lapse the acceptance when one is past its day and not confirmed, by the relationship’s calendar', async () => {
    const now = story.harness.now()
    const standingAt = async (instant: string) => {
      story.harness.moveClock(new Date(instant))
      const seen = await story.read('engineer', id)
      const listed = await story
        .by('quality')
        .call(submissions.listSubmissions, {}, { query: { standing: 'lapsed', size: 100 } })
      const { state } = seen.standing ?? {}
      expect(listed.items.some((item) => item.id === id)).toBe(state === 'lapsed')
      return [state, conditionOf(seen, 2).overdue]
    }
    expect(await standingAt('2026-11-20T22:30:00.000Z')).toEqual(['stands', false])
    expect(await standingAt('2026-11-20T23:30:00.000Z')).toEqual(['lapsed', true])
    // What is reported is not confirmed yet; what is confirmed late stands again.
    await act('quality', reviews.reportCondition, 2)
    expect(await standingAt('2026-11-21T09:00:00.000Z')).toEqual(['lapsed', true])
    await act('quality', reviews.confirmCondition, 2)
    expect(await standingAt('2026-11-21T09:00:00.000Z')).toEqual(['stands', false])
    expect(await standingAt('2026-12-01T09:00:00.000Z')).toEqual(['lapsed', false])
    story.harness.moveClock(now)
  })

  it('are over once a newer acceptance takes the place', async () => {
    const older = id
    id = await story.submission(task.id, 'submitted')
    await decide('quality', reviews.accept)
    id = older
    expect(await cannot('engineer', reviews.reportCondition, 1)).toMatchObject({ code: 'wrong-state' })
  })

  it('are confirmed once when two do so at the same moment', async () => {
    await act('engineer', reviews.reportCondition, 1)
    const { params, body } = await bodyFor(1, {})
    const answers = await Promise.all(
      (['quality', 'second'] as const).map((who) => {
        const { client, organisation } = story.by(who)
        const path = `/organisations/${organisation.id}/submissions/${id}/conditions/${params.conditionId}/confirm`
        return client.send('post', path).send(body)
      }),
    )
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
  })

  it('cannot be confirmed, added or changed by the supplier past the services', async () => {
    await act('engineer', reviews.reportCondition, 1)
    const attempt = (statement: string) =>
      story.harness
        .inTenant('supplier', story.organisations.supplier, story.people.engineer, [], async ({ tx }) =>
          tx.execute(sql.raw(statement)),
        )
        .then(
          ({ rowCount }) => `${rowCount} rows`,
          (error: { cause?: unknown }) => String(error.cause),
        )
    const of = `where submission_id = '${id}'`
    expect(
      await attempt(`update conditions set state = 'confirmed', confirmed_at = now() ${of} and number = 1`),
    ).toMatch(/0 rows|row-level security/)
    expect(await attempt(`update conditions set state = 'reported' ${of} and number = 2`)).toMatch(/0 rows/)
    expect(await attempt(`update conditions set due_on = '2030-01-01' ${of}`)).toMatch(/permission denied/)
    expect(await attempt(`delete from conditions ${of}`)).toMatch(/permission denied/)
    expect(
      await attempt(
        `insert into conditions select gen_random_uuid(), relationship_id, supplier_org_id, customer_org_id, submission_id, decision_id, 9, text, due_on, owner, follow_up, 'open', null, 1 from conditions ${of} limit 1`,
      ),
    ).toMatch(/row-level security/)
    expect(await attempt(`update condition_reports set text = 'x'`)).toMatch(/permission denied/)
  })
})

it('of a proposed acceptance are the customer’s own business until it is confirmed', async () => {
  const safe = await story.ready({ safety: true })
  id = await story.submission(safe.id, 'submitted')
  await decide('approves', reviews.acceptWithConditions, { conditions: asked })
  expect(conditionsOf(await story.read('engineer', id))).toEqual([])
  const { rows } = await story.harness.inTenant(
    'supplier',
    story.organisations.supplier,
    story.people.engineer,
    [],
    async ({ tx }) => tx.execute(sql.raw(`select id from conditions where submission_id = '${id}'`)),
  )
  expect(rows).toEqual([])
  expect(await cannot('quality', reviews.reportCondition, 2)).toMatchObject({ code: 'wrong-state' })
  await decide('quality', reviews.confirm)
  expect(conditionsOf(await story.read('engineer', id))).toHaveLength(2)
})
