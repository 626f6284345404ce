import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { messages, reviews, studies, submissions } from '@evenrule/api/contract'
import { sql } from './harness'
import { biasedReadings, goodReadings, startStory, type Story } from './prepared'

let story: Story
let task: Awaited<ReturnType<Story['ready']>>
let id: string
let challengeId: string
beforeAll(async () => {
  story = await startStory()
})
afterAll(() => story.stop())

/** Readings 3 and 6 of good ones typed wrongly, so that nothing is shown. */
const mistyped = goodReadings.map((reading, at) => ([2, 5].includes(at) ? '24.0301' : reading))

beforeEach(async () => {
  task = await story.ready({ readings: mistyped })
  id = await story.submission(task.id, 'submitted')
  const { rowVersion: expectedVersion } = await story.read('quality', id)
  const target = { kind: 'readings', study: task.study.code, readings: [2, 5] }
  const opened = await story.by('quality').call(
    reviews.openChallenge,
    { submissionId: id },
    {
      body: { expectedVersion, target, reasonKind: 'mistyped', dueOn: '2026-11-20', text: 'Mistyped?' },
    },
  )
  challengeId = opened.id
})

const correctReadings = async (readings = goodReadings, takenBy = story.people.engineer) => {
  const { rowVersion: expectedVersion } = await story
    .by('engineer')
    .call(studies.readStudy, { studyId: task.study.id })
  return story.by('engineer').call(
    studies.storeReadings,
    { studyId: task.study.id },
    {
      body: {
        ...{ expectedVersion, source: 'typed', text: readings.join('\n'), complete: true },
        ...{ reason: 'Typed wrongly.', collectedOn: '2026-11-02', appraiser: 'A', takenBy: [takenBy.id] },
      },
    },
  )
}
const correction = (who: 'engineer' | 'approver' = 'approver') =>
  story.by(who).call(reviews.readCorrection, { submissionId: id, challengeId })
const rowVersion = async () =>
  (await story.read('engineer', id)).challenges.find((each) => each.id === challengeId)?.rowVersion
const bodyOf = async (more: object = {}) => ({
  ...{ expectedVersion: await rowVersion(), sha256: (await correction()).sha256 },
  ...{ text: 'Two readings were mistyped.', ...more },
})
const sign = async () =>
  story
    .by('approver')
    .call(reviews.signCorrection, { submissionId: id, challengeId }, { body: await bodyOf() })
const verify = () => story.by('quality').call(submissions.verifySubmission, { submissionId: id })

describe('a correction', () => {
  it('is judged by the same clauses, signed as a new revision, and leaves the old one readable', async () => {
    const before = await story.read('quality', id)
    expect(before).toMatchObject({ revision: 1, verdict: 'not-shown' })
    await correctReadings()
    // Nothing of it is seen until it is signed.
    expect(await story.read('quality', id)).toMatchObject({ text: before.text, revisions: [{ revision: 1 }] })
    const offered = await correction()
    expect(offered).toMatchObject({ revision: 2, verdict: 'meets', clausesMet: 4, hindrances: [] })
    expect(offered.studies).toEqual([{ studyId: task.study.id, code: task.study.code, corrected: true }])
    const answered = await sign()
    expect(answered).toMatchObject({ state: 'answered', revision: 1 })
    expect(answered.messages.at(-1)).toMatchObject({
      ...{ move: 'correct', answerKind: 'correction', revision: 2, name: 'Arne Holt' },
    })
    const after = await story.read('quality', id)
    expect(after).toMatchObject({ state: 'answered', revision: 2, verdict: 'meets', text: offered.text })
    expect(after.revisions.map(({ verdict, challenge }) => [verdict, challenge])).toEqual([
      ['not-shown', null],
      ['meets', 1],
    ])
    const old = await story
      .by('quality')
      .call(submissions.readSubmission, { submissionId: id }, { query: { revision: 1 } })
    expect(old).toMatchObject({
      revision: 1,
      text: before.text,
      sha256: before.sha256,
      verdict: 'not-shown',
    })
    expect(old.evaluations).toEqual(before.evaluations)
    expect(old.files.map(({ role, name }) => [role, name])).toEqual(
      before.files.map(({ role, name }) => [role, name]),
    )
    const [first, second] = [old, after].map(({ text }) => submissions.contentOf(text))
    expect(second).toMatchObject({ revision: 2, corrects: { sha256: old.sha256, challenge: 1 } })
    expect(second?.clauses.map(({ versionId, clause }) => [versionId, clause])).toEqual(
      first?.clauses.map(({ versionId, clause }) => [versionId, clause]),
    )
    expect(submissions.dataDifference(old.text, after.text)).toMatchObject([
      {
        code: task.study.code,
        ...{ reason: 'Typed wrongly.', kept: 13, leftOut: [], fields: [] },
        readings: [
          { before: { number: 3, text: '24.0301' }, after: { number: 3, text: goodReadings[2] } },
          { before: { number: 6, text: '24.0301' }, after: { number: 6, text: goodReadings[5] } },
        ],
      },
    ])
    expect(
      await story
        .by('quality')
        .refusal(submissions.readSubmission, { submissionId: id }, { query: { revision: 3 } }),
    ).toMatchObject({ status: 404 })
  })

  it('is told to the customer, stands in the record, and every revision can be recomputed', async () => {
    await correctReadings()
    await sign()
    const check = await verify()
    expect(check).toMatchObject({ equal: true, revision: 2, corrects: { equal: true } })
    expect(check.earlier).toMatchObject([{ equal: true, revision: 1, corrects: null }])
    expect(check.signatures).toEqual([{ meaning: 'corrects', equal: true }])
    const { rows } = await story.harness.owner.query<{ type: string; text: string }>(
      `select type, text from record_events where chain_id = $1 order by sequence desc limit 3`,
      [story.relationship.id],
    )
    expect(rows.map(({ type }) => type)).toEqual([
      ...['submission.answered', 'challenge.answered-by-correction', 'submission.corrected'],
    ])
    const { sha256 } = await story.read('quality', id)
    expect(JSON.parse(rows[2]?.text ?? '{}').data).toMatchObject({ revision: 2, sha256 })
    const told = await story.by('quality').call(messages.listMessages, {}, { query: { size: 100 } })
    expect(
      told.items.find(({ link, subject }) => link.endsWith(id) && subject.includes('by a correction')),
    ).toBeDefined()
  })

  it('ends the challenge as resolved by correction, and what is decided names the newest text', async () => {
    const old = await story.read('quality', id)
    await correctReadings()
    await sign()
    const settled = await story
      .by('quality')
      .call(
        reviews.settleChallenge,
        { submissionId: id, challengeId },
        { body: { expectedVersion: await rowVersion() } },
      )
    expect(settled).toMatchObject({ state: 'resolved-by-correction' })
    const { rowVersion: expectedVersion, sha256 } = await story.read('quality', id)
    const params = { submissionId: id }
    const quality = story.by('quality')
    expect(
      await quality.refusal(reviews.accept, params, { body: { expectedVersion, sha256: old.sha256 } }),
    ).toMatchObject({ status: 409, code: 'not-as-seen' })
    await quality.call(reviews.accept, params, { body: { expectedVersion, sha256 } })
    const { signatures, decisions } = await story.read('engineer', id)
    expect(signatures.map((each) => [each.meaning, each.revision])).toEqual([
      ...[
        ['submits', 1],
        ['corrects', 2],
        ['accepts', 2],
      ],
    ])
    expect(decisions).toMatchObject([{ revision: 2, kind: 'accepted' }])
    expect(await verify()).toMatchObject({ equal: true })
  })

  it('needs something corrected, somebody who took no reading, and the bytes that were seen', async () => {
    const params = { submissionId: id, challengeId }
    expect((await correction()).hindrances).toEqual(['nothing-corrected'])
    const approver = story.by('approver')
    expect(await approver.refusal(reviews.signCorrection, params, { body: await bodyOf() })).toMatchObject({
      ...{ status: 409, code: 'nothing-corrected' },
    })
    await correctReadings(goodReadings, story.people.approver)
    expect((await correction()).hindrances).toEqual(['took-the-readings'])
    expect((await correction('engineer')).hindrances).toEqual(['not-an-approver'])
    expect(await approver.refusal(reviews.signCorrection, params, { body: await bodyOf() })).toMatchObject({
      ...{ status: 403, code: 'took-the-readings' },
    })
    const seen = await bodyOf()
    await correctReadings(biasedReadings)
    expect(await approver.refusal(reviews.signCorrection, params, { body: seen })).toMatchObject({
      ...{ status: 409, code: 'not-as-seen' },
    })
    const engineer = story.by('engineer')
    expect((await engineer.refusal(reviews.signCorrection, params, { body: seen })).status).toBe(403)
    for (const who of ['quality', 'reader'] as const)
      expect((await story.by(who).refusal(reviews.readCorrection, params)).status).toBe(403)
  })

  it('is put before the approvers by the engineer, of which the customer learns nothing', async () => {
    const params = { submissionId: id, challengeId }
    const engineer = story.by('engineer')
    const body = { expectedVersion: await rowVersion(), note: 'From the strip.' }
    expect(await engineer.refusal(reviews.askForCorrection, params, { body })).toMatchObject({
      code: 'nothing-corrected',
    })
    await correctReadings()
    const before = await story.read('quality', id)
    await engineer.call(reviews.askForCorrection, params, { body })
    const told = await story.by('approver').call(messages.listMessages, {}, { query: { size: 100 } })
    expect(
      told.items.some(({ link, subject }) => link.endsWith(id) && subject.includes('Correction waits')),
    ).toBe(true)
    expect(await story.read('quality', id)).toEqual(before)
    const { rows } = await story.harness.owner.query<{ chain: string }>(
      `select chain_id as chain from record_events where type = 'challenge.correction-sent-for-signature'`,
    )
    expect(new Set(rows.map(({ chain }) => chain))).toEqual(new Set([story.organisations.supplier.id]))
  })

  it('answers a second challenge too, by pointing to the revision', async () => {
    const { rowVersion: expectedVersion } = await story.read('quality', id)
    const second = await story.by('quality').call(
      reviews.openChallenge,
      { submissionId: id },
      {
        body: {
          ...{ expectedVersion, reasonKind: 'verdict', dueOn: '2026-11-20', text: 'And so?' },
          target: { kind: 'clause', clauseKey: 'bias/mean' },
        },
      },
    )
    const answer = { expectedVersion: 1, kind: 'correction', text: 'See the correction.' }
    const params = { submissionId: id, challengeId: second.id }
    const engineer = story.by('engineer')
    expect(await engineer.refusal(reviews.answerChallenge, params, { body: answer })).toMatchObject({
      ...{ status: 422, errors: [{ path: 'body.kind' }] },
    })
    await correctReadings()
    await sign()
    expect((await story.read('quality', id)).state).toBe('challenged')
    const answered = await engineer.call(reviews.answerChallenge, params, { body: answer })
    expect(answered.messages.at(-1)).toMatchObject({ answerKind: 'correction', revision: 2 })
    expect((await story.read('quality', id)).state).toBe('answered')
  })
})

describe('what is frozen of a revision', () => {
  const asSupplier = async (statement: string): Promise<string> =>
    story.harness
      .inTenant('supplier', story.organisations.supplier, story.people.approver, [], async ({ tx }) =>
        tx.execute(sql.raw(statement)),
      )
      .then(
        () => 'not refused',
        (error: { cause?: unknown }) => String(error.cause ?? error),
      )

  it('is closed by its text: nothing can be added to it, and no text but through an open challenge', async () => {
    await correctReadings()
    await sign()
    const clause = (revision: number) =>
      `insert into submission_clauses select gen_random_uuid(), relationship_id, supplier_org_id, customer_org_id, submission_id, ${revision}, 9, 'more', false, verdict, input_text, output_text, output_sha256, engine_version, engine_sha256 from submission_clauses where submission_id = '${id}' limit 1`
    for (const revision of [1, 2]) expect(await asSupplier(clause(revision))).toMatch(/row-level security/)
    const text = `insert into submission_texts select relationship_id, supplier_org_id, customer_org_id, submission_id, 3, 2, text, sha256, frozen_at from submission_texts where submission_id = '${id}' and revision = 2`
    // The challenge is answered, so nobody asks for a correction any more.
    expect(await asSupplier(text)).toMatch(/row-level security/)
  })

  it('is found altered, whichever revision it is', async () => {
    await correctReadings()
    await sign()
    const { owner } = story.harness
    await owner.query(
      `update submission_clauses set output_text = replace(output_text, '"n":15', '"n":51') where submission_id = $1 and revision = 1`,
      [id],
    )
    const check = await verify()
    expect(check.equal).toBe(false)
    expect(check.earlier[0]).toMatchObject({ equal: false })
    expect(check.clauses.every(({ equal }) => equal)).toBe(true)
  })

  it('is all there or not at all when the signing is cut off in the middle', async () => {
    await correctReadings()
    const body = await bodyOf()
    const { owner } = story.harness
    const before = await story.read('engineer', id)
    // The last write of all fails: the event of the chain.
    await owner.query(
      `alter table record_events add constraint cut_off check (type <> 'submission.corrected') not valid`,
    )
    const { client, organisation } = story.by('approver')
    const path = `/organisations/${organisation.id}/submissions/${id}/challenges/${challengeId}/correction`
    expect((await client.send('post', path).send(body)).status).toBe(500)
    await owner.query('alter table record_events drop constraint cut_off')
    expect(await story.read('engineer', id)).toEqual(before)
    for (const table of ['submission_texts', 'submission_clauses', 'submission_files'])
      expect(
        (await owner.query(`select 1 from ${table} where submission_id = $1 and revision = 2`, [id]))
          .rowCount,
      ).toBe(0)
    expect(await verify()).toMatchObject({ equal: true, revision: 1 })
    await sign()
    expect(await verify()).toMatchObject({ equal: true, revision: 2 })
  })
})
