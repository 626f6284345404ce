import { clauseKey, type Clause, type ClauseOutput } from '@evenrule/metrology'
import { createHash } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { agreements, files, gauges, requests, submissions } from '@evenrule/api/contract'
import { certificate, clauses, startStory, type Story } from './prepared'

let story: Story
beforeAll(async () => {
  story = await startStory()
})
afterAll(() => story.stop())

const byHand: Clause = {
  type: 'by-hand',
  parameters: { subject: 'stability', measure: 'Drift chart', asks: 'A control chart over three months.' },
}
const key = clauseKey(byHand)
const upload = async (name: string) =>
  (await story.by('engineer').call(files.uploadAttachment, {}, { body: {}, file: certificate(name) })).id
const contentOf = async (who: 'engineer' | 'approver' | 'quality', id: string) => {
  const content = submissions.contentOf((await story.read(who, id)).text)
  if (!content) throw new Error('The text is readable.')
  return content
}
const sendAndSign = async (id: string, who: 'approver' | 'engineer' = 'approver') => {
  const { rowVersion: expectedVersion } = await story.read('engineer', id)
  const params = { submissionId: id }
  await story.by('engineer').call(submissions.sendForSignature, params, { body: { expectedVersion } })
  const seen = await story.read('approver', id)
  const body = { expectedVersion: seen.rowVersion, sha256: seen.sha256 }
  return story.by(who).call(submissions.signSubmission, params, { body })
}

describe('a clause judged by hand', () => {
  const judging = async (id: string, body: object) =>
    story
      .by('engineer')
      .call(submissions.judgeByHand, { submissionId: id, clauseKey: encodeURIComponent(key) }, { body })
  const ready = async () => {
    const task = await story.task()
    await story.agree(task.part.id, [...clauses, byHand])
    await story.study(task)
    return story.submission(task.id, 'draft')
  }

  it('is not shown until somebody judges it on a document, which is then frozen with it', async () => {
    const id = await ready()
    const before = await story.read('engineer', id)
    expect(before).toMatchObject({ verdict: 'not-shown', clausesMet: 4, clausesTotal: 5 })
    expect(before.byHand).toMatchObject([{ clauseKey: key, clause: byHand, judged: null }])
    const fileId = await upload('chart')
    const judged = { verdict: 'meets', reason: 'No drift over three months.' } as const
    await judging(id, { expectedVersion: 1, fileId, ...judged })
    const after = await story.read('engineer', id)
    expect(after).toMatchObject({ verdict: 'meets', clausesMet: 5, rowVersion: 2 })
    expect(after.byHand[0]?.judged).toMatchObject({ ...judged, document: { id: fileId, name: 'chart.pdf' } })
    await sendAndSign(id)
    const sha256 = createHash('sha256').update(certificate('chart').bytes).digest('hex')
    const content = await contentOf('quality', id)
    expect(content.byHand).toEqual([{ clauseKey: key, ...judged, document: { name: 'chart.pdf', sha256 } }])
    expect(content.files.at(-1)).toMatchObject({ role: 'document', name: 'chart.pdf', sha256 })
    const seen = await story.read('quality', id)
    expect(seen.byHand).toEqual([])
    const evaluation = seen.evaluations.find((each) => each.clauseKey === key)
    expect(JSON.parse(evaluation?.outputText ?? '{}') as ClauseOutput).toMatchObject({
      ...{ verdict: 'meets', reason: { code: 'judged-by-hand', documentSha256: sha256 } },
    })
    expect(await story.by('quality').call(submissions.verifySubmission, { submissionId: id })).toMatchObject({
      equal: true,
    })
    const document = seen.files.find(({ role }) => role === 'document')
    const { client, organisation } = story.by('quality')
    const answer = await client
      .send('get', `/organisations/${organisation.id}/submissions/${id}/files/${document?.id}`)
      .buffer(true)
    expect(Buffer.from(answer.body as Uint8Array)).toEqual(certificate('chart').bytes)
  })

  it('takes the last judgement, can be taken back, and only while it is a draft', async () => {
    const id = await ready()
    const fileId = await upload('chart')
    await judging(id, { expectedVersion: 1, verdict: 'meets', reason: 'Fine.', fileId })
    await judging(id, { expectedVersion: 2, verdict: 'falls-short', reason: 'It drifts.', fileId })
    expect(await story.read('engineer', id)).toMatchObject({ verdict: 'falls-short', clausesMet: 4 })
    const params = { submissionId: id, clauseKey: encodeURIComponent(key) }
    const engineer = story.by('engineer')
    await engineer.call(submissions.clearByHand, params, { body: { expectedVersion: 3 } })
    expect(await story.read('engineer', id)).toMatchObject({ verdict: 'not-shown' })
    expect(
      await engineer.refusal(submissions.clearByHand, params, { body: { expectedVersion: 4 } }),
    ).toMatchObject({ status: 404 })
    await sendAndSign(id)
    const body = { expectedVersion: 6, verdict: 'meets', reason: 'x', fileId }
    expect(await engineer.refusal(submissions.judgeByHand, params, { body })).toMatchObject({
      code: 'wrong-state',
    })
  })

  it('must be one of the submission’s, with a file of one’s own, a reason and a verdict', async () => {
    const id = await ready()
    const engineer = story.by('engineer')
    const body = { expectedVersion: 1, verdict: 'meets', reason: 'x', fileId: await upload('chart') }
    const params = { submissionId: id, clauseKey: encodeURIComponent(key) }
    const other = { submissionId: id, clauseKey: encodeURIComponent('bias/mean') }
    expect(await engineer.refusal(submissions.judgeByHand, other, { body })).toMatchObject({ status: 404 })
    for (const [wrong, path] of [
      [{ reason: ' ' }, 'body.reason'],
      [{ verdict: 'meets-with-conditions' }, 'body.verdict'],
      [{ fileId: story.relationship.id }, 'body.fileId'],
    ] as const)
      expect(
        await engineer.refusal(submissions.judgeByHand, params, { body: { ...body, ...wrong } }),
      ).toMatchObject({ status: 422, errors: [{ path }] })
    for (const who of ['reader', 'quality'] as const)
      expect((await story.by(who).refusal(submissions.judgeByHand, params, { body })).status).toBe(403)
  })
})

describe('what a submission freezes beside its clauses', () => {
  /** Both sides sign terms of their own for a part. */
  const agreeTerms = async (partId: string, terms: object) => {
    const scope = { relationshipId: story.relationship.id, partId, characteristicId: null }
    const today = story.harness.now().toISOString().slice(0, 10)
    const begun = await story
      .by('quality')
      .call(
        agreements.beginVersion,
        {},
        { body: { ...scope, clauses, terms, effectiveOn: today, send: true } },
      )
    const at = (found: agreements.Agreement) => ({
      params: { agreementId: found.id, versionId: found.versions[0]?.id ?? '' },
      body: { expectedVersion: found.versions[0]?.rowVersion, sha256: found.versions[0]?.sha256 },
    })
    let now = at(begun)
    now = at(await story.by('engineer').call(agreements.acceptRound, now.params, { body: now.body }))
    for (const who of ['approves', 'approver'] as const)
      now = at(await story.by(who).call(agreements.signVersion, now.params, { body: now.body }))
  }

  it('are the terms in force, so that a later agreement changes nothing', async () => {
    const task = await story.task()
    await agreeTerms(task.part.id, { validityMonths: 12, moved: 'suspended' })
    await story.study(task)
    const id = await story.submission(task.id, 'submitted')
    const terms = {
      validityMonths: 12,
      moved: 'suspended',
      repaired: 'suspended',
      readingsTakerMaySign: false,
    }
    expect(await contentOf('quality', id)).toMatchObject({ terms })
    await agreeTerms(task.part.id, { validityMonths: 6 })
    expect(await contentOf('quality', id)).toMatchObject({ terms })
    const next = await story.submission(task.id, 'draft')
    expect(await contentOf('engineer', next)).toMatchObject({ terms: { validityMonths: 6, moved: 'stays' } })
    await agreeTerms(task.part.id, { validityMonths: 'no-expiry' })
    expect(await contentOf('engineer', next)).toMatchObject({ terms: { validityMonths: null } })
  })

  it('lets who took the readings sign where the agreement says so, and nowhere else', async () => {
    for (const allowed of [false, true]) {
      const task = await story.task()
      await agreeTerms(task.part.id, { readingsTakerMaySign: allowed })
      await story.study(task, { takenBy: story.people.approver })
      const id = await story.submission(task.id, 'draft')
      if (allowed) expect(await sendAndSign(id)).toMatchObject({ state: 'submitted' })
      else await expect(sendAndSign(id)).rejects.toMatchObject({ problem: { code: 'took-the-readings' } })
    }
  })

  it('is the gauge as it stood when the study was registered, judged and named alike', async () => {
    const task = await story.ready()
    const { rowVersion: expectedVersion, ...gauge } = await story
      .by('engineer')
      .call(gauges.readGauge, { gaugeId: task.gauge.id })
    await story.by('engineer').call(
      gauges.changeGauge,
      { gaugeId: gauge.id },
      {
        body: {
          ...{ expectedVersion, code: gauge.code, name: gauge.name, unit: gauge.unit },
          resolution: '0.01',
        },
      },
    )
    const id = await story.submission(task.id, 'submitted')
    const content = await contentOf('quality', id)
    expect(content.task).toMatchObject({ gaugeResolution: '0.0001', gaugeUnit: 'mm' })
    expect(content.studies[0]?.gauge).toMatchObject({ resolution: '0.0001' })
    const resolution = (await story.read('quality', id)).evaluations.find(
      (each) => each.clauseKey === 'resolution/share',
    )
    expect(JSON.parse(resolution?.inputText ?? '{}')).toMatchObject({ resolution: 0.0001 })
    expect(content.clauses.find((each) => each.clauseKey === 'resolution/share')?.verdict).toBe('meets')
  })

  it('are the customer’s open requests of the task, which it answers', async () => {
    const task = await story.ready()
    const asked = await story.by('quality').call(
      requests.askForProof,
      {},
      {
        body: {
          ...{ relationshipId: story.relationship.id, taskIds: [task.id], dueOn: '2026-12-01' },
          occasion: 'yearly',
        },
      },
    )
    const id = await story.submission(task.id, 'submitted')
    expect((await contentOf('quality', id)).requests).toEqual([{ id: asked.id, number: asked.number }])
    expect(await story.by('quality').call(requests.readRequest, { requestId: asked.id })).toMatchObject({
      state: 'answered',
      list: [{ submission: { id } }],
    })
  })
})
