import { createHash } from 'node:crypto'
import type { Clause, ClauseInput, ClauseOutput } from '@evenrule/metrology'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { calibrations, gauges, standards, studies } from '@evenrule/api/contract'
import {
  attemptsOn,
  resultsForTask,
} from '../../packages/api/src/server/modules/studies/studies.results.service'
import { clauses, goodReadings, startStory, type Story } from './prepared'

let story: Story
beforeAll(async () => {
  story = await startStory()
})
afterAll(() => story.stop())

type Task = Awaited<ReturnType<Story['task']>>
let counter = 0
const code = () => `ST-${(counter += 1)}`
const engineer = () => story.by('engineer')
const base = () => `/organisations/${story.organisations.supplier.id}/studies`

const registration = (task: Pick<Task, 'id' | 'standard'>, more: object = {}) => ({
  ...{ code: code(), taskIds: [task.id], standardId: task.standard.id, plannedReadings: 15 },
  ...{ unit: 'mm', measuredAs: 'value', ...more },
})
const register = (task: Pick<Task, 'id' | 'standard'>, more: object = {}) =>
  engineer().call(studies.registerStudy, {}, { body: registration(task, more) })
const storing = (study: { rowVersion: number }, more: object = {}) => ({
  ...{ source: 'typed', text: goodReadings.join('\n'), expectedVersion: study.rowVersion, complete: true },
  ...{ collectedOn: '2026-11-02', appraiser: 'A', takenBy: [story.people.engineer.id], ...more },
})
const store = (
  study: { id: string; rowVersion: number },
  more: object = {},
  file?: { name: string; bytes: Buffer },
) =>
  engineer().call(
    studies.storeReadings,
    { studyId: study.id },
    { body: storing(study, more), ...(file ? { file } : {}) },
  )
const read = (studyId: string) => engineer().call(studies.readStudy, { studyId })
/** A refusal's code and the places it names. */
const refused = async (call: Promise<unknown>) => {
  try {
    await call
  } catch (error) {
    const { status, problem } = error as {
      status: number
      problem: { code: string; errors?: { path: string; message: string; row?: number; column?: string }[] }
    }
    return { status, code: problem.code, errors: problem.errors ?? [] }
  }
  throw new Error('nothing was refused')
}
const events = async (studyId: string) =>
  (
    await story.harness.owner.query<{ type: string; org_id: string | null; text: string }>(
      'select type, org_id, text from record_events where subject_id = $1 order by sequence',
      [studyId],
    )
  ).rows
const verdicts = (study: studies.Study) =>
  Object.fromEntries(study.evaluations.map(({ clauseKey, verdict }) => [clauseKey, verdict]))
async function agreedTask(options: Parameters<Story['task']>[0] = {}, agreed: Clause[] = clauses) {
  const task = await story.task(options)
  await story.agree(task.part.id, agreed)
  return task
}

describe('planning', () => {
  it('names for every clause the readings it needs and why, and stores nothing', async () => {
    const task = await agreedTask()
    const plan = (more: object = {}) =>
      engineer().call(
        studies.planStudy,
        {},
        {
          body: {
            ...{ taskIds: [task.id], unit: 'mm', bias: '0,0005', standardDeviation: '0.001', chance: 0.9 },
            ...more,
          },
        },
      )
    const planned = await plan()
    const [of] = planned.tasks
    expect(of?.clauses.map(({ clauseKey, reason }) => [clauseKey, reason])).toEqual([
      ['design/readings', 'minimum'],
      ['resolution/share', 'not-about-size'],
      ['calibration/date', 'not-about-size'],
      ['bias/mean', 'size-found'],
    ])
    expect(planned.readings).toBe(Math.max(...(of?.clauses.map(({ readings }) => readings ?? 0) ?? [])))
    expect(planned.readings).toBeGreaterThanOrEqual(10)
    // The same truth in micrometres asks for the same size.
    expect((await plan({ unit: 'µm', bias: '0.5', standardDeviation: '1' })).readings).toBe(planned.readings)
    // A gauge that is off by more than the margin shows nothing, however many readings it takes.
    const hopeless = await plan({ bias: '0.003' })
    expect(hopeless.readings).toBeNull()
    expect(hopeless.tasks[0]?.clauses.at(-1)?.reason).toBe('no-size-suffices')
    const { total } = await engineer().call(studies.listStudies, {}, { query: { taskId: task.id } })
    expect(total).toBe(0)
  })
  it('counts the attempts made so far', async () => {
    const task = await agreedTask()
    await register(task)
    const planned = await engineer().call(
      studies.planStudy,
      {},
      { body: { taskIds: [task.id], unit: 'mm', bias: '0', standardDeviation: '0.001', chance: 0.9 } },
    )
    expect(planned.tasks[0]?.attempts).toBe(1)
  })
})

describe('registering', () => {
  it('freezes criteria, limits and gauge, and stands in the journal of the organisation alone', async () => {
    const task = await agreedTask()
    const study = await register(task, { plan: { bias: '0.0005', standardDeviation: '0.001', chance: 0.9 } })
    expect(study).toMatchObject({
      state: 'registered',
      registeredBeforehand: true,
      gauge: { id: task.gauge.id, resolution: '0.0001' },
      plan: { bias: '0.0005', standardDeviation: '0.001', chance: 0.9 },
      tasks: [{ attempt: 1, characteristic: { lowerLimit: '23.975' }, customerName: 'Nordhof Drives' }],
      data: [],
      evaluations: [],
    })
    expect(study.tasks[0]?.criteria.map(({ clause }) => clause)).toEqual(clauses)
    await engineer().call(
      gauges.changeGauge,
      { gaugeId: task.gauge.id },
      {
        body: {
          ...{ code: task.gauge.code, name: 'Renamed', resolution: '0.01', unit: 'mm', site: null },
          expectedVersion: task.gauge.rowVersion,
        },
      },
    )
    expect((await read(study.id)).gauge).toMatchObject({ name: 'Bore gauge', resolution: '0.0001' })
    const [event] = await events(study.id)
    expect(event).toMatchObject({ type: 'study.registered', org_id: story.organisations.supplier.id })
  })
  it('without criteria in force is possible; the result then has figures and no verdict', async () => {
    const task = await story.task()
    const study = await store(await register(task))
    expect(study.tasks[0]?.criteria).toEqual([])
    expect(study.evaluations).toEqual([])
    expect(JSON.parse(study.tasks[0]?.figuresText ?? '{}')).toMatchObject({ kind: 'bias', n: 15 })
  })
  it('serves several tasks of one gauge, and refuses those of another', async () => {
    const [task, other] = [await agreedTask(), await agreedTask()]
    const errors = (await refused(register(task, { taskIds: [task.id, other.id] }))).errors
    expect(errors).toMatchObject([{ path: 'body.taskIds.1' }])
    expect((await refused(register(task, { taskIds: [task.id, task.id] }))).errors).toMatchObject([
      { path: 'body.taskIds.1', message: 'This measuring task is chosen twice.' },
    ])
  })
  it.each([
    [{ unit: 'g' }, 'body.unit'],
    [{ plannedReadings: 1 }, 'body.plannedReadings'],
    [{ taskIds: [] }, 'body.taskIds'],
    [{ measuredAs: 'feeling' }, 'body.measuredAs'],
    [{ standardId: '01890a5d-ac96-774b-bcce-b302099a8057' }, 'body.standardId'],
    [{ code: ' ' }, 'body.code'],
  ])('with %j is refused at that field', async (wrong, path) => {
    const task = await story.task()
    const { status, errors } = await refused(register(task, wrong))
    expect([status, errors[0]?.path]).toEqual([422, path])
  })
  it('refuses a standard of another quantity', async () => {
    const task = await story.task()
    const weight = await engineer().call(
      standards.createStandard,
      {},
      { body: { code: 'W-1', name: 'Weight', certifiedValue: '100', unit: 'g' } },
    )
    const { errors } = await refused(register(task, { standardId: weight.id }))
    expect(errors).toMatchObject([{ path: 'body.standardId' }])
  })
  it('has a code of its own', async () => {
    const task = await story.task()
    await register(task, { code: 'SAME' })
    expect(await refused(register(task, { code: 'SAME' }))).toMatchObject({
      status: 409,
      code: 'already-taken',
      errors: [{ path: 'body.code' }],
    })
  })
  it('numbers the attempts on a task one after the other, also when made at once', async () => {
    const task = await agreedTask()
    const made = await Promise.all(Array.from({ length: 8 }, () => register(task)))
    const numbers = made.map((study) => study.tasks[0]?.attempt ?? 0).sort((a, b) => a - b)
    expect(numbers).toEqual([1, 2, 3, 4, 5, 6, 7, 8])
    expect((await read(made[0]?.id ?? '')).tasks[0]?.attempts).toHaveLength(8)
  })
})

describe('the run sheet', () => {
  it('deals positions in rounds, the same every time, as a file that is read back', async () => {
    const task = await story.task()
    const slots = ['0°', '90°', '=180', '270°']
    const study = await register(task, { plannedReadings: 10, slots })
    expect(study.runSheet.map(({ number }) => number)).toEqual([1, 2, 3, 4, 5, 6, 7, 8, 9, 10])
    for (const round of [study.runSheet.slice(0, 4), study.runSheet.slice(4, 8)])
      expect(round.map(({ slot }) => slot).sort()).toEqual([...slots].sort())
    expect((await read(study.id)).runSheet).toEqual(study.runSheet)
    const answer = await engineer()
      .client.send('get', `${base()}/${study.id}/run-sheet.csv?separator=semicolon`)
      .expect(200)
    expect(answer.headers['content-disposition']).toContain('attachment')
    const lines = answer.text.trimEnd().split('\r\n')
    expect(lines[0]).toBe(`\ufeffRun sheet of study ${study.code}`)
    expect(lines[2]).toBe('No.;Position or time;Reading (mm);Remark')
    expect(lines).toHaveLength(13)
    expect(answer.text).toContain(";'=180;")
    const filled = lines
      .map((line, at) => (at < 3 ? line : line.replace(/;;$/, `;24,00${at % 10};`)))
      .join('\r\n')
    const preview = await engineer().call(
      studies.previewReadings,
      { studyId: study.id },
      { body: { source: 'uploaded' }, file: { name: 'sheet.csv', bytes: Buffer.from(filled) } },
    )
    expect(preview.readAs).toMatchObject({ columns: ['C'], columnNames: ['Reading (mm)'], decimal: 'comma' })
    expect([preview.readings.length, preview.errorCount]).toEqual([10, 0])
  })
  it('differs between studies', async () => {
    const task = await story.task()
    const slots = Array.from({ length: 12 }, (_each, at) => `position ${at}`)
    const [one, two] = [
      await register(task, { plannedReadings: 12, slots }),
      await register(task, { plannedReadings: 12, slots }),
    ]
    expect(one.runSheet).not.toEqual(two.runSheet)
  })
})

describe('previewing readings', () => {
  const preview = (studyId: string, body: object, file?: { name: string; bytes: Buffer }) =>
    engineer().call(studies.previewReadings, { studyId }, { body, ...(file ? { file } : {}) })
  it('names dialect, bad cells and what is odd, and stores nothing', async () => {
    const study = await register(await story.task({ resolution: '0.001' }))
    const bytes = Buffer.from('Nr;Länge [µm]\n1;24,001\n2;24,0O2\n3;24,0005\n4;25,000\n', 'latin1')
    const seen = await preview(study.id, { source: 'uploaded' }, { name: 'bore.csv', bytes })
    expect(seen.readAs).toMatchObject({
      encoding: 'windows-1252',
      separator: 'semicolon',
      decimal: 'comma',
      columns: ['B'],
      columnNames: ['Länge [µm]'],
    })
    expect(seen.errors).toMatchObject([{ code: 'not-a-number', row: 3, column: 'B', text: '24,0O2' }])
    expect(seen.readings.map(({ value }) => value)).toEqual([24.001, 24.0005, 25])
    expect(seen.warnings.map((each) => [each.code, each.readings])).toEqual([
      ['fewer-than-planned', []],
      ['finer-than-resolution', [2]],
      ['far-from-reference', [3]],
    ])
    expect(seen.file).toEqual({
      name: 'bore.csv',
      size: bytes.length,
      sha256: createHash('sha256').update(bytes).digest('hex'),
    })
    expect(await read(study.id)).toMatchObject({ state: 'registered', rowVersion: 1, data: [] })
    expect(await events(study.id)).toHaveLength(1)
    expect(await filesNamed('bore.csv')).toBe(0)
  })
  it('tells deviations from values', async () => {
    const task = await story.task()
    const [value, deviation] = [await register(task), await register(task, { measuredAs: 'deviation' })]
    const codes = async (studyId: string, text: string) =>
      (await preview(studyId, { source: 'pasted', text })).warnings.map((each) => each.code)
    expect(await codes(value.id, '0.0001\n-0.0002')).toContain('looks-like-deviations')
    expect(await codes(deviation.id, '24.0001\n23.9998')).toContain('looks-like-values')
    expect(await codes(deviation.id, '0.0001\n-0.0002')).toEqual(['fewer-than-planned'])
  })
  it('refuses a file that is too large, and one that is no text', async () => {
    const study = await register(await story.task())
    const large = { name: 'large.csv', bytes: Buffer.alloc(10_000_001, '1') }
    expect(await refused(preview(study.id, { source: 'uploaded' }, large))).toMatchObject({
      status: 413,
      code: 'file-too-large',
    })
    const workbook = { name: 'book.csv', bytes: Buffer.from('PK\u0003\u0004') }
    expect(await refused(preview(study.id, { source: 'uploaded' }, workbook))).toMatchObject({
      status: 422,
      errors: [{ path: 'body.file' }],
    })
  })
})

const filesNamed = async (name: string): Promise<number> =>
  (await story.harness.owner.query('select 1 from files where name = $1', [name])).rows.length

describe('storing readings', () => {
  it('keeps file and texts byte for byte and computes every clause, the same again when recomputed', async () => {
    const study = await register(await agreedTask())
    const bytes = Buffer.from(`Messwert µ\r\n${goodReadings.join('\r\n').replaceAll('.', ',')}\r\n`, 'latin1')
    const file = { name: 'ring.csv', bytes }
    const computed = await store(study, { source: 'uploaded', text: undefined }, file)
    expect(computed).toMatchObject({ state: 'computed', collectedOn: '2026-11-02', rowVersion: 2 })
    const [data] = computed.data
    const texts = goodReadings.map((text) => text.replace('.', ','))
    expect(data).toMatchObject({
      ...{ revision: 1, source: 'uploaded', complete: true, texts, appraiser: 'A' },
      values: goodReadings.map(Number),
      sha256: createHash('sha256').update(JSON.stringify(texts)).digest('hex'),
      takenBy: [{ id: story.people.engineer.id, name: 'Grit Falk' }],
      file: { name: 'ring.csv', sha256: createHash('sha256').update(bytes).digest('hex') },
    })
    const download = await engineer()
      .client.send('get', `${base()}/${study.id}/readings/1/file`)
      .buffer(true)
      .parse((response, done) => {
        const chunks: Buffer[] = []
        response.on('data', (chunk: Buffer) => chunks.push(chunk))
        response.on('end', () => done(null, Buffer.concat(chunks)))
      })
    expect(Buffer.compare(download.body as Buffer, bytes)).toBe(0)
    expect(verdicts(computed)).toEqual({
      'design/readings': 'meets',
      'resolution/share': 'meets',
      'calibration/date': 'meets',
      'bias/mean': 'meets',
    })
    for (const evaluation of computed.evaluations) {
      expect(await story.harness.services.engines.recompute(evaluation)).toEqual({
        outputText: evaluation.outputText,
        equal: true,
      })
      expect((JSON.parse(evaluation.inputText) as ClauseInput).data?.readings).toEqual(
        goodReadings.map(Number),
      )
    }
    expect((await events(study.id)).map(({ type }) => type)).toEqual(['study.registered', 'study.computed'])
  })
  it('refuses wrong cells at their row and column, and stores nothing, not even the file', async () => {
    const study = await register(await agreedTask())
    const file = { name: 'broken.csv', bytes: Buffer.from('Nr;Wert\n1;24,001\n2;lost\n3;1.024,5\n') }
    const answer = await refused(store(study, { source: 'uploaded', text: undefined }, file))
    expect(answer).toMatchObject({ status: 422, code: 'invalid-input' })
    expect(answer.errors.map(({ path, row, column }) => [path, row, column])).toEqual([
      ['body.file', 3, 'B'],
      ['body.file', 4, 'B'],
    ])
    expect(await read(study.id)).toMatchObject({ state: 'registered', rowVersion: 1, data: [] })
    expect(await filesNamed('broken.csv')).toBe(0)
    expect(await events(study.id)).toHaveLength(1)
    const hash = createHash('sha256').update(file.bytes).digest('hex')
    await expect(story.harness.services.files.get(`files/${hash}`)).rejects.toThrow()
  })
  it('leaves out rows that were named, when that is wanted', async () => {
    const study = await register(await agreedTask())
    const text = [...goodReadings, 'lost', 'n/a'].join('\n')
    const computed = await store(study, { text, leaveOutBadRows: true })
    expect(computed.data[0]).toMatchObject({
      leftOut: [
        { row: 16, column: 'A', text: 'lost' },
        { row: 17, column: 'A', text: 'n/a' },
      ],
    })
    expect(computed.data[0]?.values).toHaveLength(15)
    const nul = await refused(
      store(await register(await story.task()), { text: '24.001\n24\u0000.002', leaveOutBadRows: true }),
    )
    expect(nul.errors).toMatchObject([{ path: 'body.text', row: 2, column: 'A' }])
  })
  it('keeps readings while more will follow, and computes once they are complete', async () => {
    const study = await register(await agreedTask())
    const kept = await store(study, { text: goodReadings.slice(0, 8).join('\n'), complete: false })
    expect([kept.state, kept.evaluations, kept.evaluatedDataId]).toEqual(['collecting', [], null])
    const whole = await store(kept, { text: goodReadings.slice(8).join('\n'), append: true })
    expect(whole.state).toBe('computed')
    expect(whole.data.map(({ revision, values }) => [revision, values.length])).toEqual([
      [2, 15],
      [1, 8],
    ])
    expect(whole.evaluatedDataId).toBe(whole.data[0]?.id)
    expect(verdicts(whole)['bias/mean']).toBe('meets')
  })
  it('takes corrections as a new revision with a reason; the old stays', async () => {
    const study = await store(await register(await agreedTask()))
    expect((await refused(store(study))).errors).toMatchObject([{ path: 'body.reason' }])
    expect((await refused(store(study, { reason: 'typing error', append: true }))).errors).toMatchObject([
      { path: 'body.append' },
    ])
    const biased = goodReadings.map((text) => (Number(text) + 0.01).toFixed(4)).join('\n')
    const corrected = await store(study, { text: biased, reason: 'The gauge was zeroed on another ring.' })
    expect(corrected).toMatchObject({ state: 'computed', rowVersion: 3 })
    expect(corrected.data.map(({ revision, reason }) => [revision, reason])).toEqual([
      [2, 'The gauge was zeroed on another ring.'],
      [1, null],
    ])
    expect(corrected.data[1]?.texts).toEqual(goodReadings)
    expect(verdicts(corrected)['bias/mean']).toBe('falls-short')
    expect((await events(study.id)).at(-1)?.type).toBe('study.corrected')
    const { rows } = await story.harness.owner.query(
      'select data_id, count(*)::integer as count from study_evaluations where study_id = $1 group by data_id',
      [study.id],
    )
    expect(rows.map(({ count }: { count: number }) => count)).toEqual([4, 4])
  })
  it('names what would settle a clause that is not shown', async () => {
    const study = await register(await agreedTask())
    const computed = await store(study, { text: '24.0000\n24.0024\n24.0021\n24.0012' })
    const bias = computed.evaluations.find(({ clauseKey }) => clauseKey === 'bias/mean')
    expect(bias).toMatchObject({ verdict: 'not-shown', settling: { reason: 'more-readings' } })
    expect(bias?.settling?.readings).toBeGreaterThan(4)
    expect(bias?.settling?.chance).toBeGreaterThanOrEqual(0.9)
  })
  it('judges deviations as differences, in whatever unit, like the values they stand for', async () => {
    const task = await agreedTask()
    const values = await store(await register(task))
    const text = goodReadings.map((each) => ((Number(each) - 24) * 1000).toFixed(1)).join('\n')
    const deviations = await store(await register(task, { unit: 'µm', measuredAs: 'deviation' }), { text })
    const biasOf = (study: studies.Study) => {
      const found = study.evaluations.find(({ clauseKey }) => clauseKey === 'bias/mean')
      return JSON.parse(found?.outputText ?? '{}') as ClauseOutput
    }
    const [a, b] = [biasOf(values), biasOf(deviations)]
    expect(b.study?.bias).toBe(a.study?.bias)
    expect(b.study?.standardDeviation).toBe(a.study?.standardDeviation)
    expect([b.interval, b.verdict]).toEqual([a.interval, a.verdict])
    expect(b.study?.reference).toEqual({ value: 0, standardUncertainty: 0.0002 })
    expect(a.study?.reference).toEqual({ value: 24, standardUncertainty: 0.0002 })
  })
  it('counts calibrations on the day of collection', async () => {
    const task = await agreedTask()
    await engineer().call(
      calibrations.addGaugeCalibration,
      { gaugeId: task.gauge.id },
      {
        body: {
          ...{
            certificateNumber: 'late',
            calibratedOn: '2026-10-01',
            dueOn: '2026-10-31',
            foundWithinLimits: true,
          },
        },
      },
    )
    const computed = await store(await register(task))
    expect(computed.calibration.gauge).toMatchObject({ certificateNumber: 'late' })
    expect(verdicts(computed)['calibration/date']).toBe('falls-short')
  })
  it('keeps the certified value it was computed with, whatever is entered later', async () => {
    const task = await agreedTask()
    const study = await store(await register(task))
    await engineer().call(
      standards.changeStandard,
      { standardId: task.standard.id },
      {
        body: {
          ...{ code: task.standard.code, name: 'Setting ring', certifiedValue: '24.0100', unit: 'mm' },
          ...{ expandedUncertainty: '0.0004', coverageFactor: '2', expectedVersion: 1 },
        },
      },
    )
    expect((await read(study.id)).standard.certifiedValue).toBe('24.0000')
    const { supplier } = story.organisations
    const [result] = await story.harness.inTenant('supplier', supplier, story.people.engineer, [], (tenant) =>
      resultsForTask(tenant, task.id),
    )
    expect(result?.standard.certifiedValue).toBe('24.0000')
  })
  it.each([
    [{ collectedOn: '2026-11-03' }, 'body.collectedOn', 'still to come'],
    [{ collectedOn: '2026-11-01' }, 'body.collectedOn', 'registered on 2 Nov 2026'],
    [{ takenBy: [] }, 'body.takenBy', 'Say who took the readings'],
    [{ appraiser: '' }, 'body.appraiser', 'Enter something here'],
    [{ text: ' \n' }, 'body.text', 'no readings'],
  ])('with %j is refused at that field', async (wrong, path, words) => {
    const study = await register(await story.task())
    const { status, errors } = await refused(store(study, wrong))
    expect([status, errors[0]?.path]).toEqual([422, path])
    expect(errors[0]?.message).toContain(words)
    expect((await read(study.id)).data).toEqual([])
  })
  it('may be older than its registration when it was not registered beforehand, and is told so', async () => {
    const study = await register(await agreedTask(), { registeredBeforehand: false })
    const computed = await store(study, { collectedOn: '2026-09-15' })
    expect(verdicts(computed)['design/readings']).toBe('falls-short')
  })
  it('refuses a stranger among those who took the readings', async () => {
    const study = await register(await story.task())
    const takenBy = [story.people.engineer.id, story.people.stranger.id]
    expect((await refused(store(study, { takenBy }))).errors).toMatchObject([{ path: 'body.takenBy.1' }])
  })
  it('refuses a stale version, and keeps one of two that come at once', async () => {
    const study = await register(await agreedTask())
    const answers = await Promise.allSettled([store(study), store(study), store(study)])
    expect(answers.filter(({ status }) => status === 'fulfilled')).toHaveLength(1)
    for (const answer of answers)
      if (answer.status === 'rejected')
        expect((answer.reason as { problem: object }).problem).toMatchObject({ code: 'changed-meanwhile' })
    expect((await read(study.id)).data).toHaveLength(1)
  })
})

describe('abandoning', () => {
  it('takes a reason, stays an attempt, and ends what can be done', async () => {
    const task = await agreedTask()
    const study = await register(task)
    const abandon = (reason: string, expectedVersion = 1) =>
      engineer().call(studies.abandonStudy, { studyId: study.id }, { body: { reason, expectedVersion } })
    expect((await refused(abandon(''))).errors).toMatchObject([{ path: 'body.reason' }])
    const abandoned = await abandon('The fixture broke.')
    expect(abandoned).toMatchObject({
      state: 'abandoned',
      abandonReason: 'The fixture broke.',
      rowVersion: 2,
    })
    expect(await refused(store(abandoned))).toMatchObject({ status: 409, code: 'wrong-state' })
    expect(await refused(abandon('again', 2))).toMatchObject({ status: 409, code: 'wrong-state' })
    const next = await register(task)
    expect(next.tasks[0]).toMatchObject({
      attempt: 2,
      attempts: [{ attempt: 2 }, { attempt: 1, state: 'abandoned', abandonReason: 'The fixture broke.' }],
    })
    const { supplier } = story.organisations
    const told = await story.harness.inTenant('supplier', supplier, story.people.engineer, [], (tenant) =>
      attemptsOn(tenant, task.id, '2026-11-02'),
    )
    expect(told.map(({ state }) => state)).toEqual(['abandoned', 'registered'])
    const later = await story.harness.inTenant('supplier', supplier, story.people.engineer, [], (tenant) =>
      attemptsOn(tenant, task.id, '2026-11-03'),
    )
    expect(later).toEqual([])
  })
  it('is refused once the study is computed', async () => {
    const study = await store(await register(await agreedTask()))
    const body = { reason: 'too bad', expectedVersion: study.rowVersion }
    expect(
      await refused(engineer().call(studies.abandonStudy, { studyId: study.id }, { body })),
    ).toMatchObject({
      code: 'wrong-state',
    })
  })
})

describe('the list', () => {
  it('is paged, sorted, filtered and searched, and counts verdicts', async () => {
    const task = await agreedTask()
    const computed = await store(await register(task, { code: 'LIST-B' }))
    await register(task, { code: 'LIST-A' })
    const list = (query: Record<string, unknown>) =>
      engineer().call(studies.listStudies, {}, { query: { taskId: task.id, ...query } })
    const all = await list({ sort: 'code' })
    expect(all.items.map((each) => [each.code, each.state, each.readings])).toEqual([
      ['LIST-A', 'registered', 0],
      ['LIST-B', 'computed', 15],
    ])
    expect(all.items[0]?.verdicts).toBeNull()
    expect(all.items[1]).toMatchObject({
      verdicts: { meets: 4, 'falls-short': 0, 'not-shown': 0, 'meets-with-conditions': 0 },
      tasks: [{ attempt: 1, characteristicName: 'bore', customerName: 'Nordhof Drives' }],
      gaugeCode: task.gauge.code,
      standardCode: task.standard.code,
    })
    expect((await list({ state: 'computed' })).items.map(({ id }) => id)).toEqual([computed.id])
    expect((await list({ search: 'list-a' })).total).toBe(1)
    expect((await list({ search: task.part.number })).total).toBe(2)
    expect((await list({ gaugeId: task.gauge.id, size: 1, page: 2 })).items).toHaveLength(1)
    expect((await list({ search: '100%' })).total).toBe(0)
  })
})

describe('who may', () => {
  it('see and change studies: their own organisation, on the supplier’s side, in the right role', async () => {
    const task = await agreedTask()
    const study = await store(await register(task))
    const path = `${base()}/${study.id}`
    const { harness, people, organisations } = story
    const status = async (call: PromiseLike<{ status: number }>) => (await call).status
    // Anonymous, another organisation by its own address and by this one's, the customer, a reader.
    expect(await status(harness.as('supplier', null).send('get', path))).toBe(401)
    expect(await status(harness.as('supplier', people.stranger).send('get', path))).toBe(404)
    const foreign = `/organisations/${organisations.rivals.id}/studies/${study.id}`
    expect(await status(harness.as('supplier', people.stranger).send('get', foreign))).toBe(404)
    for (const [method, rest] of [
      ['get', '/run-sheet.csv'],
      ['get', '/run-sheet.xlsx'],
      ['get', '/readings/1/file'],
    ] as const)
      expect(await status(harness.as('supplier', people.stranger).send(method, foreign + rest))).toBe(404)
    const asStranger = harness.as('supplier', people.stranger)
    const there = { organisationId: organisations.rivals.id, studyId: study.id }
    expect(
      await refused(asStranger.call(studies.storeReadings, there, { body: storing(study) })),
    ).toMatchObject({ status: 404 })
    expect(
      await refused(
        asStranger.call(studies.previewReadings, there, { body: { source: 'pasted', text: '1.5' } }),
      ),
    ).toMatchObject({ status: 404 })
    const taskOfOthers = { organisationId: organisations.rivals.id }
    expect(
      await refused(asStranger.call(studies.registerStudy, taskOfOthers, { body: registration(task) })),
    ).toMatchObject({ status: 422, errors: [{ path: 'body.taskIds.0' }] })
    expect(await status(harness.as('customer', people.engineer).send('get', path))).toBe(403)
    expect(await status(harness.as('customer', people.quality).send('get', path))).toBe(404)
    const own = `/organisations/${organisations.customer.id}/studies`
    expect(await status(harness.as('customer', people.quality).send('get', own))).toBe(403)
    expect(await status(harness.as('supplier', people.reader).send('get', path))).toBe(200)
    const readersWrite = harness.as('supplier', people.reader).send('post', base()).send(registration(task))
    expect(await status(readersWrite)).toBe(403)
  })
})
