import type { Clause, ClauseOutput } from '@evenrule/metrology'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { houseTerms, messages, reviews, submissions, tasks, type EndpointShape } from '@evenrule/api/contract'
import { clauses, startStory, type Story } from './prepared'

let story: Story
let task: Awaited<ReturnType<Story['task']>>
let id: string
beforeAll(async () => {
  story = await startStory()
  task = await story.task()
  await story.study(task)
})
afterAll(() => story.stop())

type Who = Parameters<Story['by']>[0]
const bodyOf = async (who: Who, more: object) => {
  const { rowVersion: expectedVersion, sha256 } = await story.read(who, id)
  return { body: { expectedVersion, sha256, ...more } }
}
const act = async (who: Who, endpoint: EndpointShape, more: object = {}) =>
  story.by(who).call(endpoint, { submissionId: id }, await bodyOf(who, more))
const cannot = async (who: Who, endpoint: EndpointShape, more: object = {}) =>
  story.by(who).refusal(endpoint, { submissionId: id }, await bodyOf('quality', more))
const contentOf = async () => {
  const content = submissions.contentOf((await story.read('engineer', id)).text)
  if (!content) throw new Error('The text is readable.')
  return content
}
const condition = { text: 'Repeat it.', dueOn: '2027-01-31', owner: 'supplier', followUp: 'new-study' }

describe('a submission without agreed criteria', () => {
  beforeEach(async () => {
    id = await story.submission(task.id, 'submitted')
  })

  it('is shown as such: no clause judges it, and nothing is met', async () => {
    expect(await story.read('quality', id)).toMatchObject({
      ...{ criteria: 'none', verdict: 'not-shown', clausesMet: 0, clausesTotal: 0 },
    })
    expect(await contentOf()).toMatchObject({ criteria: 'none', clauses: [], agreements: [] })
    const listed = await story
      .by('quality')
      .call(submissions.listSubmissions, {}, { query: { criteria: 'none', size: 100 } })
    expect(listed.items.every(({ criteria }) => criteria === 'none')).toBe(true)
    expect(listed.items.some((item) => item.id === id)).toBe(true)
    expect(await story.by('quality').call(submissions.verifySubmission, { submissionId: id })).toMatchObject({
      equal: true,
      clauses: [],
    })
  })

  it('is accepted by an approver of each side, and counts only then', async () => {
    expect((await story.read('quality', id)).hindrances).toEqual(
      expect.arrayContaining([
        { move: 'accept', code: 'needs-approver' },
        { move: 'refuse', code: 'needs-approver' },
      ]),
    )
    for (const [endpoint, more] of [
      [reviews.accept, {}],
      [reviews.refuse, { reason: 'x' }],
    ] as const)
      expect(await cannot('quality', endpoint, more)).toMatchObject({ status: 403, code: 'needs-approver' })
    expect(await act('approves', reviews.accept, { reason: 'Looks right.' })).toMatchObject({
      state: 'awaiting-other-side',
    })
    const between = await story.read('approver', id)
    expect(between).toMatchObject({ decidedAt: null, standing: null })
    expect(between.decisions).toMatchObject([{ kind: 'accepted', state: 'awaiting-other-side' }])
    const proof = async () => (await story.by('quality').call(tasks.readTask, { taskId: task.id })).proof
    expect(await proof()).not.toBe('accepted')
    expect(await cannot('engineer', reviews.agreeOneOff)).toMatchObject({ status: 403 })
    expect(await cannot('approves', reviews.agreeOneOff)).toMatchObject({ status: 403 })
    expect(await cannot('approver', reviews.agreeOneOff, { sha256: '0'.repeat(64) })).toMatchObject({
      code: 'not-as-seen',
    })
    expect(await act('approver', reviews.agreeOneOff)).toMatchObject({ state: 'accepted' })
    const seen = await story.read('quality', id)
    expect(seen.decisions).toMatchObject([
      { state: 'final', decidedBy: 'Veit Sahm', otherSideBy: 'Arne Holt' },
    ])
    expect(seen.signatures.map(({ side, meaning }) => [side, meaning])).toEqual([
      ['supplier', 'submits'],
      ['customer', 'accepts'],
      ['supplier', 'agrees-one-off'],
    ])
    expect(await proof()).toBe('accepted')
    const { rows } = await story.harness.owner.query<{ type: string }>(
      `select type from record_events where subject_id = $1 and chain_id = $2 order by sequence`,
      [id, story.relationship.id],
    )
    expect(rows.map(({ type }) => type)).toEqual([
      ...['submission.signed', 'submission.one-off-proposed', 'submission.one-off-agreed'],
    ])
    const told = await story.by('approver').call(messages.listMessages, {}, { query: { size: 100 } })
    expect(
      told.items.some(
        ({ link, subject }) => link.endsWith(id) && subject.includes('waits for your agreement'),
      ),
    ).toBe(true)
  })

  it('supersedes what was accepted before only once the supplier agrees', async () => {
    await act('approves', reviews.accept)
    await act('approver', reviews.agreeOneOff)
    const older = id
    id = await story.submission(task.id, 'submitted')
    await act('approves', reviews.acceptWithConditions, { conditions: [condition] })
    expect((await story.read('quality', older)).state).toBe('accepted')
    await act('approver', reviews.agreeOneOff)
    expect((await story.read('quality', older)).state).toBe('superseded')
    const seen = await story.read('engineer', id)
    expect(seen).toMatchObject({ state: 'accepted-with-conditions', standing: { state: 'stands' } })
    expect(seen.decisions[0]?.conditions).toMatchObject([condition])
  })

  it('goes back to review with the reason where the supplier does not agree', async () => {
    await act('approves', reviews.acceptWithConditions, { conditions: [condition] })
    expect(await cannot('approver', reviews.declineOneOff, { reason: ' ' })).toMatchObject({ status: 422 })
    await act('approver', reviews.declineOneOff, { reason: 'Too soon for us.' })
    const seen = await story.read('quality', id)
    expect(seen).toMatchObject({
      state: 'submitted',
      decisions: [{ state: 'withdrawn', declinedReason: 'Too soon for us.', otherSideBy: 'Arne Holt' }],
    })
    // The same two may agree after all.
    await act('approves', reviews.accept)
    expect(await act('approver', reviews.agreeOneOff)).toMatchObject({ state: 'accepted' })
  })

  it('can be taken back while the supplier has still to agree, and waits for nobody then', async () => {
    await act('approves', reviews.accept)
    expect(await story.read('engineer', id)).toMatchObject({ state: 'awaiting-other-side' })
    const waiting = await story
      .by('approver')
      .call(submissions.listSubmissions, {}, { query: { waitsOn: 'supplier', size: 100 } })
    expect(waiting.items.some((item) => item.id === id)).toBe(true)
    await act('engineer', submissions.withdrawSubmission, { reason: 'Wrong ring.' })
    expect((await story.read('quality', id)).decisions).toMatchObject([{ state: 'withdrawn' }])
  })
})

describe('house terms', () => {
  const offered: Clause[] = [
    ...clauses.filter(({ type }) => type !== 'resolution-share'),
    // Cannot be computed here: nobody has entered the spread of the process.
    { type: 'resolution-share', parameters: { share: 0.1, base: 'process' } },
  ]

  it('are judged for information where no criteria are agreed, and judge nothing', async () => {
    const { id: houseTermsId } = await story
      .by('quality')
      .call(houseTerms.beginHouseTerms, {}, { body: { clauses: offered, words: 'What we ask.' } })
    await story
      .by('quality')
      .call(houseTerms.publishHouseTerms, { houseTermsId }, { body: { expectedVersion: 1 } })
    id = await story.submission(task.id, 'submitted')
    const seen = await story.read('quality', id)
    expect(seen).toMatchObject({ verdict: 'not-shown', clausesMet: 0, clausesTotal: 0 })
    const content = await contentOf()
    expect(content).toMatchObject({ clauses: [], houseTerms: { id: houseTermsId, number: 1 } })
    expect(content.advisory.map(({ clauseKey, verdict }) => [clauseKey, verdict])).toEqual([
      ['design/readings', 'meets'],
      ['calibration/date', 'meets'],
      ['bias/mean', 'meets'],
      ['resolution/share', 'not-shown'],
    ])
    expect(content.advisory).toHaveLength(seen.evaluations.length)
    expect(seen.evaluations.every(({ advisory }) => advisory)).toBe(true)
    const bias = seen.evaluations.find(({ clauseKey }) => clauseKey === 'bias/mean')
    expect((JSON.parse(bias?.outputText ?? '{}') as ClauseOutput).study?.n).toBe(15)
    expect(await story.by('quality').call(submissions.verifySubmission, { submissionId: id })).toMatchObject({
      equal: true,
    })
    await act('approves', reviews.refuse, { reason: 'Let us agree on criteria first.' })
  })

  it('are left aside as soon as criteria are agreed', async () => {
    const agreed = await story.ready()
    id = await story.submission(agreed.id, 'submitted')
    expect(await contentOf()).toMatchObject({ criteria: 'agreed', advisory: [], houseTerms: null })
  })
})

describe('what is handed on', () => {
  it('rests on a study where there are no criteria, for otherwise there is nothing to look at', async () => {
    const bare = await story.task()
    id = await story.submission(bare.id, 'draft')
    const refusal = await story
      .by('engineer')
      .refusal(submissions.sendForSignature, { submissionId: id }, { body: { expectedVersion: 1 } })
    expect(refusal).toMatchObject({ status: 409, code: 'nothing-to-judge' })
    expect((await story.read('engineer', id)).hindrances).toEqual([
      { move: 'send-for-signature', code: 'nothing-to-judge' },
    ])
  })

  it('is not signed for a measuring task that was archived meanwhile', async () => {
    const gone = await story.ready()
    id = await story.submission(gone.id, 'for-signature')
    await story.by('engineer').call(tasks.archiveTask, { taskId: gone.id }, { body: { expectedVersion: 1 } })
    const { rowVersion: expectedVersion, sha256, hindrances } = await story.read('approver', id)
    expect(hindrances).toEqual([{ move: 'sign', code: 'task-archived' }])
    expect(
      await story
        .by('approver')
        .refusal(submissions.signSubmission, { submissionId: id }, { body: { expectedVersion, sha256 } }),
    ).toMatchObject({ status: 409, code: 'task-archived' })
  })
})
