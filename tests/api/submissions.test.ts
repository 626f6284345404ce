import { createHash } from 'node:crypto'
import type { Clause, ClauseOutput } from '@evenrule/metrology'
import type pg from 'pg'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { agreements, studies, submissions, type SubmissionCheck } from '@evenrule/api/contract'
import { withTenant } from '../../packages/api/src/server/db/tenant'
import { sql } from './harness'
import { biasedReadings, certificate, clauses, startStory, type Seen, type Story } from './prepared'

let story: Story
beforeAll(async () => {
  story = await startStory()
})
afterAll(() => story.stop())

const hashOf = (bytes: string | Buffer) => createHash('sha256').update(bytes).digest('hex')
const contentOf = ({ text }: Seen) => submissions.submissionContentSchema.parse(JSON.parse(text))
const prepare = (taskId: string, studyIds?: string[]) =>
  story.by('engineer').call(submissions.prepareSubmission, {}, { body: { taskId, studyIds } })
const verify = (who: 'quality' | 'engineer', id: string): Promise<SubmissionCheck> =>
  story.by(who).call(submissions.verifySubmission, { submissionId: id })
const owner = (statement: string, values: unknown[] = []) => story.harness.owner.query(statement, values)
const events = async (chainId: string, subjectId: string): Promise<string[]> =>
  (
    await owner('select type from record_events where chain_id = $1 and subject_id = $2 order by sequence', [
      chainId,
      subjectId,
    ])
  ).rows.map((row: { type: string }) => row.type)

describe('preparing a submission', () => {
  it('shows what signing today would freeze, judged from the readings, and stores none of it', async () => {
    const task = await story.ready()
    const made = await prepare(task.id)
    expect(made).toMatchObject({ state: 'draft', rowVersion: 1 })
    const seen = await story.read('engineer', made.id)
    expect(seen).toMatchObject({ number: null, verdict: 'meets', clausesMet: 4, clausesTotal: 4 })
    expect(seen.sha256).toBe(hashOf(seen.text))
    const content = contentOf(seen)
    expect(content).toMatchObject({
      criteriaOn: '2026-11-02',
      attemptsSince: '2026-11-02',
      attempts: [{ code: task.study.code, state: 'computed', registeredBeforehand: true }],
      task: { gaugeCode: task.gauge.code, gaugeResolution: '0.0001', site: 'Hall 2' },
      agreements: [{ versionNumber: 1, scope: 'part', effectiveOn: '2026-11-02' }],
    })
    expect(content.clauses.map(({ clause, study }) => [clause.type, study])).toEqual(
      clauses.map(({ type }) => [type, task.study.code]),
    )
    const bias = seen.evaluations.find(({ clauseKey }) => clauseKey === 'bias/mean')
    const output = JSON.parse(bias?.outputText ?? '{}') as ClauseOutput
    expect(output.study?.n).toBe(15)
    expect(output.study?.bias).toBeCloseTo(0.0001, 10)
    for (const table of ['submission_texts', 'submission_clauses', 'submission_files'])
      expect((await owner(`select 1 from ${table} where submission_id = $1`, [made.id])).rowCount).toBe(0)
  })

  it('names the files that go with it: the readings as uploaded, and the certificates of the day', async () => {
    const task = await story.ready()
    const seen = await story.read('engineer', (await prepare(task.id)).id)
    expect(seen.files.map(({ role, name, id }) => [role, name, id])).toEqual([
      ['readings', `${task.study.code}.csv`, null],
      ['gauge-certificate', `gauge ${task.at}.pdf`, null],
      ['standard-certificate', `ring ${task.at}.pdf`, null],
    ])
    expect(seen.files[1]?.sha256).toBe(hashOf(certificate(`gauge ${task.at}`).bytes))
  })

  it('judges a clause that no study answers on no study, and says so', async () => {
    const task = await story.task()
    await story.agree(task.part.id)
    const seen = await story.read('engineer', (await prepare(task.id)).id)
    expect(seen).toMatchObject({ verdict: 'not-shown', clausesMet: 1, choices: [] })
    const reasons = seen.evaluations.map(({ clauseKey, outputText }) => {
      const { verdict, reason } = JSON.parse(outputText) as ClauseOutput
      return [clauseKey, verdict, reason.code]
    })
    expect(reasons).toEqual([
      ['design/readings', 'not-shown', 'no-study'],
      ['resolution/share', 'meets', 'resolution-fine-enough'],
      ['calibration/date', 'not-shown', 'calibration-unknown'],
      ['bias/mean', 'not-shown', 'no-study'],
    ])
  })

  it('judges a study by the version it was registered under, and only what came later by a later one', async () => {
    const task = await story.task()
    const [design, resolution, calibration, equivalence] = clauses
    if (!design || !resolution || !calibration || !equivalence) throw new Error('There are four clauses.')
    await story.agree(task.part.id, [design, resolution, equivalence])
    const study = await story.study(task)
    const stricter: Clause = {
      type: 'bias-equivalence',
      parameters: { margin: { base: 'absolute', value: 0.0002, unit: 'mm' }, confidence: 0.95 },
    }
    await story.agree(task.part.id, [design, resolution, calibration, stricter])
    const { id } = await prepare(task.id)
    const before = contentOf(await story.read('engineer', id))
    expect(
      before.clauses.map(({ clauseKey, versionNumber, study: on, verdict }) => [
        ...[clauseKey, versionNumber, on, verdict],
      ]),
    ).toEqual([
      ['design/readings', 1, study.code, 'meets'],
      ['resolution/share', 1, study.code, 'meets'],
      ['calibration/date', 2, null, 'not-shown'],
      ['bias/mean', 1, study.code, 'meets'],
    ])
    expect(before.agreements.map(({ versionNumber }) => versionNumber)).toEqual([1, 2])
    const later = await story.study(task)
    await story.by('engineer').call(
      submissions.chooseStudies,
      { submissionId: id },
      {
        body: { expectedVersion: 1, studyIds: [later.id] },
      },
    )
    const after = contentOf(await story.read('engineer', id))
    expect(new Set(after.clauses.map(({ versionNumber }) => versionNumber))).toEqual(new Set([2]))
    expect(after.clauses[3]?.verdict).toBe('not-shown')
    expect(after.attempts).toHaveLength(2)
  })

  it('lets the engineer choose among the computed studies of the task, and of no other', async () => {
    const task = await story.ready()
    const second = await story.study(task, { readings: biasedReadings })
    const other = await story.ready()
    const { id } = await prepare(task.id)
    const seen = await story.read('engineer', id)
    expect(seen.choices.map(({ studyId, chosen, readings }) => [studyId, chosen, readings])).toEqual([
      [second.id, true, 15],
      [task.study.id, false, 15],
    ])
    expect(seen.verdict).toBe('falls-short')
    const engineer = story.by('engineer')
    const params = { submissionId: id }
    await engineer.call(submissions.chooseStudies, params, {
      body: { expectedVersion: 1, studyIds: [task.study.id] },
    })
    const chosen = await story.read('engineer', id)
    expect(chosen).toMatchObject({ verdict: 'meets', rowVersion: 2 })
    // Both attempts are told, whichever counts.
    expect(contentOf(chosen).attempts.map(({ code }) => code)).toEqual([task.study.code, second.code])
    const wrong = await engineer.refusal(submissions.chooseStudies, params, {
      body: { expectedVersion: 2, studyIds: [task.study.id, other.study.id] },
    })
    expect(wrong).toMatchObject({ status: 422, errors: [{ path: 'body.studyIds.1' }] })
  })

  it('is refused while another is being prepared', async () => {
    const bare = await story.ready()
    const engineer = story.by('engineer')
    const body = { taskId: bare.id }
    await prepare(bare.id)
    expect(await engineer.refusal(submissions.prepareSubmission, {}, { body })).toMatchObject({
      ...{ status: 409, code: 'other-draft' },
    })
  })

  it('comes about once when two begin it at the same moment', async () => {
    const task = await story.ready()
    const engineer = story.by('engineer')
    const answers = await Promise.all(
      [1, 2].map(() =>
        engineer.client
          .send('post', `/organisations/${engineer.organisation.id}/submissions`)
          .send({ taskId: task.id }),
      ),
    )
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
  })

  it('stays in the supplier’s own journal, and nobody at the customer sees it', async () => {
    const task = await story.ready()
    const id = await story.submission(task.id, 'for-signature')
    const { supplier } = story.organisations
    expect(await events(supplier.id, id)).toEqual(['submission.prepared', 'submission.sent-for-signature'])
    expect(await events(story.relationship.id, id)).toEqual([])
    const params = { submissionId: id }
    for (const who of ['quality', 'approves', 'buyerReader', 'stranger'] as const) {
      for (const endpoint of [submissions.readSubmission, submissions.verifySubmission])
        expect((await story.by(who).refusal(endpoint, params)).status).toBe(404)
      const list = await story.by(who).call(submissions.listSubmissions, {}, { query: { taskId: task.id } })
      expect(list).toMatchObject({ items: [], total: 0 })
    }
    const { customer } = story.organisations
    const seen = await withTenant(
      story.harness.database,
      story.harness.services,
      {
        ...{ organisationId: customer.id, userId: story.people.quality.id, side: 'customer' },
        ...{ roles: [], authenticatedAt: story.harness.now().toISOString() },
      },
      async ({ tx }) => {
        const count = async (table: string, column = 'submission_id') =>
          (await tx.execute(sql.raw(`select 1 from ${table} where ${column} = '${id}'`))).rowCount
        return [
          await count('submissions', 'id'),
          await count('submission_studies'),
          await count('submission_notes'),
        ]
      },
    )
    expect(seen).toEqual([0, 0, 0])
  })

  it('is discarded without a trace at the customer, and leaves no gap in the numbers', async () => {
    const task = await story.ready()
    const first = await prepare(task.id)
    await story.by('engineer').call(
      submissions.discardSubmission,
      { submissionId: first.id },
      {
        body: { expectedVersion: 1 },
      },
    )
    const before = await story
      .by('quality')
      .call(submissions.listSubmissions, {}, { query: { sort: '-number' } })
    const id = await story.submission(task.id, 'submitted')
    const { number } = await story.read('quality', id)
    expect(number).toBe((before.items[0]?.number ?? 0) + 1)
    expect(
      (await story.by('quality').refusal(submissions.readSubmission, { submissionId: first.id })).status,
    ).toBe(404)
    expect((await story.read('engineer', first.id)).state).toBe('withdrawn')
  })
})

describe('signing', () => {
  it('freezes everything, gives the number, and puts it before the customer', async () => {
    const task = await story.ready()
    const id = await story.submission(task.id, 'for-signature')
    const offered = await story.read('approver', id)
    expect(offered.hindrances).toEqual([])
    const moved = await story.by('approver').call(
      submissions.signSubmission,
      { submissionId: id },
      {
        body: { expectedVersion: offered.rowVersion, sha256: offered.sha256 },
      },
    )
    expect(moved).toMatchObject({ state: 'submitted', rowVersion: 3 })
    const mine = await story.read('engineer', id)
    const theirs = await story.read('quality', id)
    expect(theirs.text).toBe(offered.text)
    expect(theirs.sha256).toBe(offered.sha256)
    expect(theirs.evaluations).toEqual(offered.evaluations)
    expect(theirs.signatures).toEqual([
      {
        ...{ side: 'supplier', name: 'Arne Holt', meaning: 'submits', sha256: offered.sha256 },
        ...{ revision: 1, signedAt: story.harness.now().toISOString() },
      },
    ])
    expect({ ...mine, hindrances: [] }).toEqual({ ...theirs, hindrances: [] })
    expect(await verify('quality', id)).toMatchObject({ equal: true })
    expect(theirs.number).toBe(contentOf(theirs).number)
    const told = await owner(
      'select distinct user_id, link, subject from messages where link like $1 and side = $2',
      [`%${id}`, 'customer'],
    )
    expect(told.rows.map((row) => row.user_id).sort()).toEqual(
      [story.people.quality.id, story.people.second.id, story.people.approves.id].sort(),
    )
    expect(told.rows[0].link).toBe(`/organisations/${story.organisations.customer.id}/submissions/${id}`)
    expect(told.rows[0].subject).toContain(
      `Waits for your decision: submission ${theirs.number}, ${task.gauge.code} for ${task.part.number} A no. 5 bore`,
    )
  })

  it('writes the hashes of everything into the chain that both sides share', async () => {
    const task = await story.ready()
    const id = await story.submission(task.id, 'submitted')
    const seen = await story.read('quality', id)
    const { rows } = await owner(
      'select type, text from record_events where chain_id = $1 and subject_id = $2',
      [story.relationship.id, id],
    )
    expect(rows).toHaveLength(1)
    const event = JSON.parse(rows[0].text)
    expect(event).toMatchObject({
      type: 'submission.signed',
      data: { number: seen.number, sha256: seen.sha256, verdict: 'meets' },
    })
    expect(event.data.clauses.map((each: { outputSha256: string }) => each.outputSha256)).toEqual(
      seen.evaluations.map(({ outputSha256 }) => outputSha256),
    )
    // People stand in neither by name.
    for (const text of [rows[0].text, seen.text]) expect(text).not.toMatch(/Falk|Holt/)
  })

  it('sends the customer every file byte for byte, though the originals are the supplier’s alone', async () => {
    const task = await story.ready()
    const id = await story.submission(task.id, 'submitted')
    const quality = story.by('quality')
    const { files } = await story.read('quality', id)
    expect(files.map(({ role }) => role).sort()).toEqual([
      'gauge-certificate',
      'readings',
      'standard-certificate',
    ])
    for (const file of files) {
      const answer = await quality.client
        .send('get', `/organisations/${quality.organisation.id}/submissions/${id}/files/${file.id}`)
        .buffer(true)
        .parse((response, done) => {
          const chunks: Buffer[] = []
          response.on('data', (chunk: Buffer) => chunks.push(chunk))
          response.on('end', () => done(null, Buffer.concat(chunks)))
        })
      expect(answer.status).toBe(200)
      expect(hashOf(answer.body as Buffer)).toBe(file.sha256)
      expect(answer.headers['content-disposition']).toContain('attachment')
    }
    const elsewhere = await story.submission((await story.ready()).id, 'submitted')
    const foreign = await quality.refusal(submissions.downloadSubmissionFile, {
      ...{ submissionId: elsewhere, fileId: files[0]?.id ?? '' },
    })
    expect(foreign.status).toBe(404)
  })

  it('is refused to whoever took the readings, and to everybody else but an approver', async () => {
    const task = await story.ready({ takenBy: story.people.approver })
    const id = await story.submission(task.id, 'for-signature')
    const { rowVersion, sha256, hindrances } = await story.read('approver', id)
    expect(hindrances).toEqual([{ move: 'sign', code: 'took-the-readings' }])
    const body = { expectedVersion: rowVersion, sha256 }
    const params = { submissionId: id }
    expect(await story.by('approver').refusal(submissions.signSubmission, params, { body })).toMatchObject({
      ...{ status: 403, code: 'took-the-readings' },
    })
    for (const who of ['engineer', 'reader'] as const)
      expect(await story.by(who).refusal(submissions.signSubmission, params, { body })).toMatchObject({
        ...{ status: 403, code: 'not-allowed' },
      })
    expect((await story.read('approver', id)).state).toBe('for-signature')
  })

  it('needs a fresh sign-in, and the very bytes that were seen', async () => {
    const task = await story.ready()
    const id = await story.submission(task.id, 'for-signature')
    const { rowVersion: expectedVersion, sha256 } = await story.read('approver', id)
    const params = { submissionId: id }
    const path = `/organisations/${story.organisations.supplier.id}/submissions/${id}/sign`
    const approver = story.by('approver')
    expect(
      await approver.refusal(submissions.signSubmission, params, {
        body: { expectedVersion, sha256: hashOf('something else') },
      }),
    ).toMatchObject({ status: 409, code: 'not-as-seen' })
    const before = story.harness.now()
    story.harness.moveClock(new Date(before.getTime() + 6 * 60_000))
    const stale = await approver.client.send('post', path).send({ expectedVersion, sha256 })
    expect(stale.body).toMatchObject({ status: 403, code: 'sign-in-afresh' })
    story.harness.moveClock(before)
    // Readings corrected since then make other bytes.
    const { rowVersion } = await story.by('engineer').call(studies.readStudy, { studyId: task.study.id })
    await story.by('engineer').call(
      studies.storeReadings,
      { studyId: task.study.id },
      {
        body: {
          ...{
            source: 'typed',
            text: biasedReadings.join('\n'),
            expectedVersion: rowVersion,
            complete: true,
          },
          ...{ collectedOn: '2026-11-02', appraiser: 'A', takenBy: [story.people.engineer.id] },
          reason: 'The first file was of another gauge.',
        },
      },
    )
    expect(
      await approver.refusal(submissions.signSubmission, params, { body: { expectedVersion, sha256 } }),
    ).toMatchObject({ status: 409, code: 'not-as-seen' })
    expect(await story.read('approver', id)).toMatchObject({ verdict: 'falls-short' })
  })

  it('happens once when two approvers sign at the same moment', async () => {
    const task = await story.ready()
    const id = await story.submission(task.id, 'for-signature')
    const { rowVersion: expectedVersion, sha256 } = await story.read('approver', id)
    const { client, organisation } = story.by('approver')
    const answers = await Promise.all(
      [1, 2].map(() =>
        client
          .send('post', `/organisations/${organisation.id}/submissions/${id}/sign`)
          .send({ expectedVersion, sha256 }),
      ),
    )
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    expect(answers.find(({ status }) => status === 409)?.body.code).toBe('changed-meanwhile')
    expect((await story.read('quality', id)).signatures).toHaveLength(1)
    expect(await events(story.relationship.id, id)).toEqual(['submission.signed'])
  })

  it('gives two submissions signed at once numbers of their own, or asks one to look again', async () => {
    const offered = []
    for (const task of [await story.ready(), await story.ready()])
      offered.push(await story.read('approver', await story.submission(task.id, 'for-signature')))
    const { client, organisation } = story.by('approver')
    const answers = await Promise.all(
      offered.map(({ id, rowVersion, sha256 }) =>
        client
          .send('post', `/organisations/${organisation.id}/submissions/${id}/sign`)
          .send({ expectedVersion: rowVersion, sha256 }),
      ),
    )
    // Both were offered the same next number, so what one of them saw is no longer what would be frozen.
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    expect(answers.find(({ status }) => status === 409)?.body.code).toBe('not-as-seen')
  })

  it('returns to its draft with a note that only the supplier reads', async () => {
    const task = await story.ready()
    const id = await story.submission(task.id, 'for-signature')
    const params = { submissionId: id }
    await story.by('approver').call(submissions.returnSubmission, params, {
      body: { expectedVersion: 2, note: 'The wrong ring, I think.' },
    })
    const seen = await story.read('engineer', id)
    expect(seen).toMatchObject({ state: 'draft', sentForSignatureAt: null })
    expect(seen.notes).toMatchObject([{ name: 'Arne Holt', text: 'The wrong ring, I think.' }])
    await story.by('engineer').call(submissions.sendForSignature, params, {
      body: { expectedVersion: 3, note: 'I checked: it is the right one.' },
    })
    const { rowVersion: expectedVersion, sha256 } = await story.read('approver', id)
    await story.by('approver').call(submissions.signSubmission, params, { body: { expectedVersion, sha256 } })
    expect((await story.read('engineer', id)).notes).toHaveLength(2)
    const theirs = await story
      .by('quality')
      .client.send('get', `/organisations/${story.organisations.customer.id}/submissions/${id}`)
    expect(theirs.body.notes).toEqual([])
    expect(theirs.text).not.toContain('wrong ring')
  })
})

describe('what is frozen', () => {
  const asRuntime = (side: 'supplier' | 'customer', statement: string) => {
    const organisation = story.organisations[side]
    const person = side === 'supplier' ? story.people.approver : story.people.approves
    return story.harness.inTenant(side, organisation, person, [], async ({ tx }) =>
      tx.execute(sql.raw(statement)),
    )
  }
  const refused = async (side: 'supplier' | 'customer', statement: string): Promise<string> => {
    try {
      await asRuntime(side, statement)
    } catch (error) {
      return String((error as { cause?: unknown }).cause ?? error)
    }
    return 'not refused'
  }

  it('cannot be changed, removed or added to by the running product, on either side', async () => {
    const id = await story.submission((await story.ready()).id, 'submitted')
    for (const side of ['supplier', 'customer'] as const) {
      for (const statement of [
        `update submission_texts set text = '{}' where submission_id = '${id}'`,
        `update submission_clauses set verdict = 'meets' where submission_id = '${id}'`,
        `update submission_files set sha256 = '' where submission_id = '${id}'`,
        `update submission_signatures set sha256 = '' where submission_id = '${id}'`,
        `delete from submission_clauses where submission_id = '${id}'`,
        `delete from submission_texts where submission_id = '${id}'`,
        `update submissions set task_id = id where id = '${id}'`,
        `delete from submissions where id = '${id}'`,
      ])
        expect(await refused(side, statement)).toMatch(/permission denied/)
      const clause = `insert into submission_clauses select gen_random_uuid(), relationship_id, supplier_org_id, customer_org_id, submission_id, 1, 9, 'more', false, verdict, input_text, output_text, output_sha256, engine_version, engine_sha256 from submission_clauses where submission_id = '${id}' limit 1`
      expect(await refused(side, clause)).toMatch(/row-level security/)
    }
    expect(await verify('quality', id)).toMatchObject({ equal: true })
  })

  const tampered = async (statement: string, values: unknown[] = []): Promise<SubmissionCheck> => {
    const id = await story.submission((await story.ready()).id, 'submitted')
    expect((await verify('quality', id)).equal).toBe(true)
    const { rowCount } = await owner(statement, [id, ...values])
    expect(rowCount).toBeGreaterThan(0)
    const check = await verify('quality', id)
    expect(check.equal).toBe(false)
    return check
  }
  const bias = "submission_id = $1 and clause_key = 'bias/mean'"
  const ofBias = ({ clauses: checked }: SubmissionCheck) =>
    checked.find(({ clauseKey }) => clauseKey === 'bias/mean')

  it('tells the first differing field of an output that its owner altered, hash and all', async () => {
    const check = await tampered(
      `update submission_clauses set output_text = changed, output_sha256 = encode(sha256(changed::bytea), 'hex')
       from (select id as of, replace(output_text, '"n":15', '"n":51') as changed from submission_clauses where ${bias}) c
       where id = c.of`,
    )
    expect(ofBias(check)).toMatchObject({
      problem: 'output-altered',
      difference: { path: 'study.n', stored: '51', recomputed: '15' },
    })
    expect(check.clauses.filter(({ equal }) => equal)).toHaveLength(3)
  })

  it.each([
    ['the verdict', `verdict = 'falls-short'`, 'verdict-altered', 'verdict'],
    ['the hash', `output_sha256 = repeat('0', 64)`, 'output-altered', 'outputSha256'],
    ['the engine', `engine_sha256 = repeat('0', 64)`, 'engine-altered', 'engineSha256'],
    ['a reading', `input_text = replace(input_text, '24.0003', '24.0009')`, 'input-altered', 'figure'],
  ])('finds %s altered beside the frozen output', async (_what, change, problem, path) => {
    const check = await tampered(`update submission_clauses set ${change} where ${bias}`)
    expect(ofBias(check)).toMatchObject({ problem, difference: { path } })
  })

  it('finds a clause that was removed, and one that was added', async () => {
    const check = await tampered(`update submission_clauses set clause_key = 'bias/other' where ${bias}`)
    expect(check.clauses.map(({ clauseKey, problem }) => [clauseKey, problem])).toEqual([
      ['design/readings', null],
      ['resolution/share', null],
      ['calibration/date', null],
      ['bias/mean', 'missing'],
      ['bias/other', 'not-in-text'],
    ])
  })

  it('finds an altered text though its hash was altered with it, by the signature', async () => {
    const check = await tampered(
      `update submission_texts set text = changed, sha256 = encode(sha256(convert_to(changed, 'UTF8')), 'hex')
       from (select submission_id as of, replace(text, '24.0003', '24.0009') as changed from submission_texts) c
       where submission_id = c.of and submission_id = $1`,
    )
    expect(check).toMatchObject({ text: { equal: true }, signatures: [{ equal: false }] })
    expect(check.data[0]?.equal).toBe(false)
  })

  it('finds a text that is none any more, and shows nothing as met', async () => {
    const id = await story.submission((await story.ready()).id, 'submitted')
    await owner(`update submission_texts set text = 'gone' where submission_id = $1`, [id])
    expect(await verify('engineer', id)).toMatchObject({ equal: false, text: { equal: false } })
    expect(await story.read('quality', id)).toMatchObject({
      verdict: 'not-shown',
      clausesMet: 0,
      text: 'gone',
    })
  })

  it('finds a verdict in the lists that nobody signed', async () => {
    const check = await tampered(`update submissions set verdict = 'falls-short' where id = $1`)
    expect(check.listed).toMatchObject({ equal: false, difference: { path: 'verdict' } })
  })

  it('is not checked before there is anything', async () => {
    const { id } = await prepare((await story.ready()).id)
    expect(
      await story.by('engineer').refusal(submissions.verifySubmission, { submissionId: id }),
    ).toMatchObject({
      ...{ status: 409, code: 'not-signed' },
    })
  })
})

describe('the list of submissions', () => {
  it('shows each side its own, with the age in days of the relationship’s calendar', async () => {
    const task = await story.ready()
    const before = story.harness.now()
    story.harness.moveClock('2026-11-02T22:30:00.000Z') // 23:30 in Berlin
    const id = await story.submission(task.id, 'submitted')
    story.harness.moveClock('2026-11-03T00:00:00.000Z') // 01:00 the next day there
    const query = { taskId: task.id }
    const theirs = await story.by('quality').call(submissions.listSubmissions, {}, { query })
    expect(theirs.items).toMatchObject([
      {
        ...{ id, state: 'submitted', ageDays: 1, waitsOn: 'customer', verdict: 'meets', safety: false },
        ...{ clausesMet: 4, clausesTotal: 4, gaugeCode: task.gauge.code, partNumber: task.part.number },
        ...{ revision: 'A', characteristicNumber: 5, nominal: '24.000', unit: 'mm' },
        other: { name: 'Halm Turning' },
      },
    ])
    const mine = await story.by('reader').call(submissions.listSubmissions, {}, { query })
    expect(mine.items).toMatchObject([{ id, other: { name: 'Nordhof Drives' } }])
    story.harness.moveClock(before)
  })

  it('filters, searches, sorts both ways and pages', async () => {
    const list = async (query: Record<string, unknown>) =>
      story.by('engineer').call(submissions.listSubmissions, {}, { query: { size: 100, ...query } })
    const all = await list({})
    expect(all.total).toBeGreaterThan(20)
    const waiting = await list({ waitsOn: 'customer' })
    expect(new Set(waiting.items.map(({ waitsOn }) => waitsOn))).toEqual(new Set(['customer']))
    expect((await list({ waitsOn: 'supplier' })).total + waiting.total).toBeLessThanOrEqual(all.total)
    const drafts = await list({ state: 'draft' })
    expect(drafts.items.every(({ state, number }) => state === 'draft' && number === null)).toBe(true)
    expect((await list({ verdict: 'meets' })).items.every(({ verdict }) => verdict === 'meets')).toBe(true)
    expect(await list({ safety: 'true' })).toMatchObject({ total: 0 })
    const [any] = waiting.items
    expect((await list({ search: any?.gaugeCode })).items.map(({ gaugeCode }) => gaugeCode)).toContain(
      any?.gaugeCode,
    )
    expect(await list({ search: 'no such thing' })).toMatchObject({ items: [], total: 0 })
    for (const sort of submissions.submissionSorts) {
      const up = (await list({ sort })).items.map(({ id }) => id)
      const down = (await list({ sort: `-${sort}` })).items.map(({ id }) => id)
      expect([...up].sort()).toEqual([...down].sort())
    }
    const numbers = (await list({ sort: '-number' })).items.flatMap(({ number }) => number ?? [])
    expect(numbers).toEqual(Array.from({ length: numbers.length }, (_each, at) => numbers.length - at))
    const pages = []
    for (let page = 1; page <= Math.ceil(all.total / 7); page += 1)
      pages.push(...(await list({ page, size: 7, sort: 'part' })).items.map(({ id }) => id))
    expect(new Set(pages).size).toBe(all.total)
    const wrong = await story
      .by('engineer')
      .refusal(submissions.listSubmissions, {}, { query: { sort: 'id' } })
    expect(wrong).toMatchObject({ status: 422, errors: [{ path: 'query.sort' }] })
  })

  it('is one query for a page and one for the standings, however many rows there are', async () => {
    const statements = await queriesOf(() =>
      story.by('quality').call(submissions.listSubmissions, {}, { query: { size: 100 } }),
    )
    expect(statements.filter((text) => text.includes('from "submissions"'))).toHaveLength(2)
  })
})

/** Texts of the statements that the product sends while something runs. */
async function queriesOf(work: () => Promise<unknown>): Promise<string[]> {
  const sent: string[] = []
  const pool = (story.harness.database as unknown as { $client: pg.Pool }).$client
  const watch = (client: pg.PoolClient) => {
    const query = client.query.bind(client)
    Object.assign(client, {
      query: (...input: Parameters<typeof query>) => {
        const [first] = input as unknown[]
        sent.push(typeof first === 'string' ? first : (first as { text: string }).text)
        return query(...input)
      },
    })
    restore.push(() => Object.assign(client, { query }))
  }
  const restore: (() => void)[] = []
  pool.on('acquire', watch)
  try {
    await work()
  } finally {
    pool.off('acquire', watch)
    for (const undo of restore) undo()
  }
  return sent
}

describe('withdrawing', () => {
  it('takes back what is not decided, with a reason that both sides keep', async () => {
    const task = await story.ready()
    const id = await story.submission(task.id, 'submitted')
    await story.by('engineer').call(
      submissions.withdrawSubmission,
      { submissionId: id },
      {
        body: { expectedVersion: 3, reason: 'The gauge was repaired meanwhile.' },
      },
    )
    expect(await story.read('quality', id)).toMatchObject({
      ...{ state: 'withdrawn', withdrawalReason: 'The gauge was repaired meanwhile.' },
    })
    expect(await events(story.relationship.id, id)).toEqual(['submission.signed', 'submission.withdrawn'])
    // The next one of the same task gets the next number.
    const again = await story.read('quality', await story.submission(task.id, 'submitted'))
    expect(again.number).toBe(((await story.read('quality', id)).number ?? 0) + 1)
  })
})

it('takes criteria from the agreement of the whole relationship where a part has none', async () => {
  const task = await story.task()
  await story.agree(null, clauses.slice(0, 2))
  const study = await story.study(task, { upload: false })
  const content = contentOf(await story.read('engineer', (await prepare(task.id)).id))
  expect(content.clauses.map(({ scope, study: on }) => [scope, on])).toEqual([
    ['relationship', study.code],
    ['relationship', study.code],
  ])
  expect(content.studies[0]?.data).toMatchObject({
    source: 'typed',
    fileSha256: null,
    readings: expect.any(Array),
  })
  const criteria = await story.by('engineer').call(agreements.readCriteria, { taskId: task.id })
  expect(criteria.criteria).toHaveLength(2)
})

it('has no move of the supplier for a stranger, who finds nothing there', async () => {
  const id = await story.submission((await story.ready()).id, 'for-signature')
  const { rivals } = story.organisations
  story.harness.signInAfresh(story.people.stranger)
  const stranger = story.harness.as('supplier', story.people.stranger)
  const body = { expectedVersion: 2, sha256: '0'.repeat(64), note: 'x', reason: 'x', studyIds: [] }
  for (const [method, path] of [
    ['get', ''],
    ['get', '/verify'],
    ['put', '/studies'],
    ['post', '/send-for-signature'],
    ['post', '/return'],
    ['post', '/sign'],
    ['post', '/discard'],
    ['post', '/withdraw'],
  ] as const) {
    const answer = await stranger
      .send(method, `/organisations/${rivals.id}/submissions/${id}${path}`)
      .send(body)
    expect([path, answer.status]).toEqual([path, 404])
    const foreign = await stranger
      .send(method, `/organisations/${story.organisations.supplier.id}/submissions/${id}${path}`)
      .send(body)
    expect([path, foreign.status]).toEqual([path, 404])
  }
  expect((await story.read('engineer', id)).state).toBe('for-signature')
})
