import { messages, record, requests, reviews, submissions, tasks } from '@evenrule/api/contract'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { startStory, type Story } from './prepared'

let story: Story
beforeAll(async () => {
  story = await startStory()
})
afterAll(() => story.stop())

const ask = (taskIds: string[], more: Record<string, unknown> = {}) =>
  story.by('quality').call(
    requests.askForProof,
    {},
    {
      body: {
        relationshipId: story.relationship.id,
        ...{ taskIds, dueOn: '2026-11-20', occasion: 'new-part', words: 'First parts leave on 23 November.' },
        ...more,
      },
    },
  )
const read = (who: 'quality' | 'engineer' | 'reader', id: string) =>
  story.by(who).call(requests.readRequest, { requestId: id })
const list = (who: 'quality' | 'engineer', query: Record<string, unknown> = {}) =>
  story.by(who).call(requests.listRequests, {}, { query })
const subjectsOf = async (who: 'quality' | 'engineer') =>
  (await story.by(who).call(messages.listMessages, {}, { query: { kind: 'request' } })).items.map(
    ({ subject }) => subject,
  )
const seen = async (id: string) => {
  const { rowVersion, sha256 } = await story.read('quality', id)
  return { expectedVersion: rowVersion, sha256 }
}

describe('a request for proof', () => {
  it('is numbered, told to the supplier with a link, and stands in the record of both', async () => {
    const task = await story.task()
    const asked = await ask([task.id])
    const second = await ask([task.id], { occasion: 'yearly', words: '' })
    expect(asked).toMatchObject({
      ...{ state: 'open', tasks: 1, owed: 1, answered: 0, accepted: 0, daysLeft: 18, askedBy: 'Ola Brandt' },
      list: [{ taskId: task.id, state: 'open', submission: null, work: null, proof: 'missing' }],
    })
    expect(second.number).toBe(asked.number + 1)
    const told = await story.by('engineer').call(messages.listMessages, {}, { query: { kind: 'request' } })
    const message = told.items.find(({ link }) => link.endsWith(`/requests/${asked.id}`))
    expect(message).toMatchObject({
      subject: `Asks for proof by 20 Nov 2026: request ${asked.number}`,
      body: expect.stringContaining('First parts leave on 23 November.'),
    })
    expect(message?.link).toBe(`/organisations/${story.organisations.supplier.id}/requests/${asked.id}`)
    for (const who of ['quality', 'engineer'] as const) {
      const { items } = await story
        .by(who)
        .call(record.listEvents, {}, { query: { subjectType: 'request', subjectId: asked.id } })
      expect(items.map(({ type, subject }) => [type, subject.label])).toEqual([
        ['request.asked', `${asked.number}`],
      ])
    }
  })

  it('is answered by the next signed submission of the task, without anybody saying so, and closed by its acceptance', async () => {
    const [one, two] = [await story.ready(), await story.task()]
    const { id, number } = await ask([one.id, two.id])
    expect((await read('engineer', id)).list[0]?.work).toMatchObject({
      study: { id: one.study.id, state: 'computed' },
      draft: null,
    })
    const draft = await story.submission(one.id, 'draft')
    expect((await read('engineer', id)).list[0]).toMatchObject({
      state: 'open',
      work: { draft: { id: draft } },
    })
    expect((await read('quality', id)).list[0]).toMatchObject({ state: 'open', work: null, submission: null })
    await story
      .by('engineer')
      .call(submissions.discardSubmission, { submissionId: draft }, { body: { expectedVersion: 1 } })

    const submissionId = await story.submission(one.id, 'submitted')
    const content = submissions.contentOf((await story.read('quality', submissionId)).text)
    expect(content?.requests).toEqual([{ id, number }])
    expect(await read('quality', id)).toMatchObject({
      ...{ state: 'open', owed: 1, answered: 1 },
      list: [{ state: 'answered', submission: { id: submissionId } }, { state: 'open' }],
    })
    expect(await subjectsOf('quality')).not.toContain(`Answered: request ${number}`)

    await story.agree(two.part.id)
    await story.study(two)
    const last = await story.submission(two.id, 'submitted')
    expect(await read('quality', id)).toMatchObject({ state: 'answered', owed: 0, answered: 2 })
    expect(await subjectsOf('quality')).toContain(`Answered: request ${number}`)
    for (const answer of [submissionId, last])
      await story.by('quality').call(reviews.accept, { submissionId: answer }, { body: await seen(answer) })
    expect(await read('engineer', id)).toMatchObject({ state: 'closed', accepted: 2, owed: 0 })
    const events = await story
      .by('engineer')
      .call(record.listEvents, {}, { query: { subjectType: 'request', subjectId: id } })
    expect(events.items.map(({ type, data }) => [type, data.state])).toEqual([
      ['request.answered', 'answered'],
      ['request.answered', 'open'],
      ['request.asked', undefined],
    ])
  })

  it('is owed again once its answer was refused, or taken back', async () => {
    const task = await story.ready()
    const { id } = await ask([task.id])
    const first = await story.submission(task.id, 'submitted')
    await story
      .by('quality')
      .call(
        reviews.refuse,
        { submissionId: first },
        { body: { ...(await seen(first)), reason: 'Not the agreed ring.' } },
      )
    expect(await read('engineer', id)).toMatchObject({ state: 'open', owed: 1, list: [{ state: 'refused' }] })
    const second = await story.submission(task.id, 'submitted')
    expect(await read('engineer', id)).toMatchObject({
      state: 'answered',
      list: [{ submission: { id: second } }],
    })
    const { rowVersion } = await story.read('engineer', second)
    await story
      .by('engineer')
      .call(
        submissions.withdrawSubmission,
        { submissionId: second },
        { body: { expectedVersion: rowVersion, reason: 'Wrong file.' } },
      )
    expect(await read('quality', id)).toMatchObject({ state: 'open', list: [{ state: 'refused' }] })
  })

  it('is not answered by what was signed before it', async () => {
    const task = await story.ready()
    await story.submission(task.id, 'submitted')
    const { id } = await ask([task.id])
    expect(await read('quality', id)).toMatchObject({ state: 'open', owed: 1 })
    await story.submission(task.id, 'submitted')
    expect(await read('quality', id)).toMatchObject({ state: 'answered', owed: 0 })
  })
})

describe('the asker', () => {
  it('moves the day while it is open, withdraws it with a reason, and then it is answered by nothing', async () => {
    const task = await story.ready()
    const { id, number, rowVersion } = await ask([task.id])
    const params = { requestId: id }
    const moved = await story.by('second').call(requests.moveRequestDate, params, {
      body: { expectedVersion: rowVersion, dueOn: '2026-12-04', reason: 'The tool comes later.' },
    })
    expect(moved).toMatchObject({ dueOn: '2026-12-04', daysLeft: 32, state: 'open' })
    expect(
      await story.by('second').refusal(requests.withdrawRequest, params, {
        body: { expectedVersion: rowVersion, reason: 'No part any more.' },
      }),
    ).toMatchObject({ status: 409, code: 'changed-meanwhile' })
    const gone = await story.by('quality').call(requests.withdrawRequest, params, {
      body: { expectedVersion: moved.rowVersion, reason: 'No part any more.' },
    })
    expect(gone).toMatchObject({
      ...{ state: 'withdrawn', withdrawnBy: 'Ola Brandt', withdrawalReason: 'No part any more.' },
    })
    expect(await subjectsOf('engineer')).toEqual(
      expect.arrayContaining([`Withdrawn: request ${number}`, `Due on 4 Dec 2026 now: request ${number}`]),
    )
    const submission = await story.submission(task.id, 'submitted')
    expect(submissions.contentOf((await story.read('quality', submission)).text)?.requests).toEqual([])
    expect(
      await story.by('quality').refusal(requests.moveRequestDate, params, {
        body: { expectedVersion: gone.rowVersion, dueOn: '2026-12-24', reason: 'Once more.' },
      }),
    ).toMatchObject({ status: 409, code: 'wrong-state' })
  })

  it.each([
    ['a day that is over', { dueOn: '2026-11-01' }, 'body.dueOn'],
    ['no task', { taskIds: [] }, 'body.taskIds'],
    ['a stranger’s task', { taskIds: ['0198f5a0-0000-7000-8000-000000000001'] }, 'body.taskIds[0]'],
    ['no occasion', { occasion: 'because' }, 'body.occasion'],
  ])('is told the place of %s', async (_what, wrong, path) => {
    const task = await story.task()
    const refused = await story.by('quality').refusal(
      requests.askForProof,
      {},
      {
        body: {
          ...{ relationshipId: story.relationship.id, taskIds: [task.id], dueOn: '2026-11-20' },
          ...{ occasion: 'change', words: '', ...wrong },
        },
      },
    )
    expect(refused).toMatchObject({ status: 422, errors: [{ path }] })
  })

  it('may name a task once, and only one in use', async () => {
    const [one, gone] = [await story.task(), await story.task()]
    await story.by('engineer').call(tasks.archiveTask, { taskId: gone.id }, { body: { expectedVersion: 1 } })
    const refused = await story.by('quality').refusal(
      requests.askForProof,
      {},
      {
        body: {
          relationshipId: story.relationship.id,
          ...{ taskIds: [one.id, gone.id, one.id], dueOn: '2026-11-20', occasion: 'other', words: '' },
        },
      },
    )
    expect(refused.errors?.map(({ path }) => path)).toEqual(['body.taskIds[1]', 'body.taskIds[2]'])
  })

  it('chooses among the supplier’s tasks, those without accepted proof first', async () => {
    const [proved, bare] = [await story.ready(), await story.task()]
    const submission = await story.submission(proved.id, 'submitted')
    await story
      .by('quality')
      .call(reviews.accept, { submissionId: submission }, { body: await seen(submission) })
    const { number } = await ask([bare.id])
    const choices = async (query: Record<string, unknown>) =>
      (
        await story
          .by('quality')
          .call(
            requests.listRequestChoices,
            {},
            { query: { relationshipId: story.relationship.id, size: 100, ...query } },
          )
      ).items
    const all = await choices({})
    const at = (id: string) => all.findIndex(({ taskId }) => taskId === id)
    expect(at(bare.id)).toBeLessThan(at(proved.id))
    expect(all[at(bare.id)]).toMatchObject({ askedIn: [number], proof: 'missing' })
    expect(all[at(proved.id)]).toMatchObject({ askedIn: [], proof: 'accepted' })
    expect(
      (await choices({ proof: 'accepted', partId: proved.part.id })).map(({ taskId }) => taskId),
    ).toEqual([proved.id])
    expect(await choices({ proof: 'missing', partId: proved.part.id })).toEqual([])
    expect((await choices({ search: bare.gauge.code })).map(({ taskId }) => taskId)).toEqual([bare.id])
  })

  it('is the customer: neither readers nor the supplier ask or withdraw', async () => {
    const task = await story.task()
    const { id } = await ask([task.id])
    const body = { expectedVersion: 1, reason: 'Why not.' }
    for (const who of ['buyerReader', 'engineer', 'approver'] as const)
      expect(
        await story.by(who).refusal(requests.withdrawRequest, { requestId: id }, { body }),
      ).toMatchObject({ status: 403 })
    expect(await story.by('stranger').refusal(requests.readRequest, { requestId: id })).toMatchObject({
      status: 404,
    })
  })
})

describe('the list', () => {
  it('is sorted by day, filtered, searched, and says the same as each request', async () => {
    const task = await story.task()
    const late = await ask([task.id], { dueOn: '2027-06-01', occasion: 'complaint' })
    const soon = await ask([task.id], { dueOn: '2026-11-05' })
    const ids = async (query: Record<string, unknown>) =>
      (await list('engineer', { taskId: task.id, ...query })).items.map(({ id }) => id)
    expect(await ids({})).toEqual([soon.id, late.id])
    expect(await ids({ sort: '-dueOn' })).toEqual([late.id, soon.id])
    expect(await ids({ due: 'soon' })).toEqual([soon.id])
    expect(await ids({ occasion: 'complaint' })).toEqual([late.id])
    expect(await ids({ due: 'overdue' })).toEqual([])
    expect(await ids({ search: task.gauge.code })).toEqual([soon.id, late.id])
    expect(await ids({ search: 'no such gauge' })).toEqual([])
    const now = story.harness.now()
    // 23:30 UTC on the day it is due is the next day in Berlin, where the relationship counts.
    story.harness.moveClock('2026-11-05T22:30:00.000Z')
    expect(await ids({ due: 'overdue' })).toEqual([])
    story.harness.moveClock('2026-11-05T23:30:00.000Z')
    expect(await ids({ due: 'overdue' })).toEqual([soon.id])
    story.harness.moveClock(now)

    const { items } = await list('quality', { size: 100 })
    expect(new Set(items.map(({ state }) => state))).toEqual(
      new Set(['open', 'answered', 'closed', 'withdrawn']),
    )
    for (const item of items) {
      const one = await read('quality', item.id)
      expect(one).toMatchObject(item)
      const count = (...states: string[]) => one.list.filter(({ state }) => states.includes(state)).length
      expect([item.owed, item.answered, item.accepted]).toEqual([
        count('open', 'refused'),
        count('answered'),
        count('accepted'),
      ])
      expect((await list('engineer', { state: item.state, size: 100 })).items.map(({ id }) => id)).toContain(
        item.id,
      )
    }
  })
})
