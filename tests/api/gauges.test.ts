import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { calibrations, files, gauges, standards } from '@evenrule/api/contract'
import { calibrationOn } from '../../packages/api/src/server/modules/gauges/gauges.lookup.service'
import { startHarness, type Harness, type Organisation, type Person } from './harness'

let harness: Harness
let engineer: Person, reader: Person, stranger: Person
let supplier: Organisation, strangers: Organisation

beforeAll(async () => {
  harness = await startHarness()
  engineer = await harness.person('Grit Falk')
  reader = await harness.person('Pim Rehn')
  stranger = await harness.person('Sten Uhl')
  supplier = await harness.organisation('Halm Turning', [
    [engineer, ['gauge-engineer']],
    [reader, ['reader']],
  ])
  strangers = await harness.organisation('Ufer Springs', [[stranger, ['gauge-engineer']]])
})
afterAll(() => harness.stop())

const own = () => harness.as('supplier', engineer)
const at = (more: Record<string, string> = {}) => ({ organisationId: supplier.id, ...more })
const gauge = (code: string, more: object = {}) => ({
  code,
  name: `Bore gauge ${code}`,
  resolution: '0.001',
  unit: 'mm',
  ...more,
})
const register = (code: string, more: object = {}) =>
  own().call(gauges.createGauge, at(), { body: gauge(code, more) })
const ring = (code: string, more: object = {}) => ({
  code,
  name: `Setting ring ${code}`,
  certifiedValue: '23.9990',
  unit: 'mm',
  expandedUncertainty: '0.0006',
  coverageFactor: '2',
  ...more,
})
const pdf = Buffer.from('%PDF-1.4\ncertificate\n%%EOF\n')
const calibrate = (
  gaugeId: string,
  calibratedOn: string,
  dueOn: string,
  file?: { name: string; bytes: Buffer },
) =>
  own().call(calibrations.addGaugeCalibration, at({ gaugeId }), {
    body: { certificateNumber: `C ${calibratedOn}`, calibratedOn, dueOn, foundWithinLimits: true },
    ...(file ? { file } : {}),
  })

describe('gauges', () => {
  it('are registered with resolution as typed and a site that is made when it is new', async () => {
    const made = await register('G-1', { resolution: '0,0010', site: 'Grinding shop' })
    expect(made).toMatchObject({
      code: 'G-1',
      resolution: '0.0010',
      site: 'Grinding shop',
      tasks: 0,
      calibration: { standing: 'none', dueOn: null },
    })
    await register('G-1b', { site: 'Grinding shop' })
    const sites = await own().call(gauges.listSites, at())
    expect(sites.items.map((each) => each.name)).toEqual(['Grinding shop'])
  })

  it('stand in the journal of their organisation, not in any relationship', async () => {
    const made = await register('G-2')
    const { rows } = await harness.owner.query(
      'select type, org_id from record_events where subject_id = $1',
      [made.id],
    )
    expect(rows).toEqual([{ type: 'gauge.created', org_id: supplier.id }])
  })

  it.each([
    [{ resolution: '0' }, 'body.resolution', 'Enter a number above zero.'],
    [{ resolution: 'fine' }, 'body.resolution', 'Enter a number, such as 24.025.'],
    [{ unit: 'cubit' }, 'body.unit', 'Choose a unit from the list.'],
    [{ code: '' }, 'body.code', 'Enter something here.'],
    [{ name: '' }, 'body.name', 'Enter something here.'],
  ])('with %j are refused at that field', async (wrong, path, message) => {
    const answer = await own().send('post', `/organisations/${supplier.id}/gauges`).send(gauge('bad', wrong))
    expect(answer.status).toBe(422)
    expect(answer.body.errors).toContainEqual({ path, message })
  })

  it('have codes of their own, told at the field', async () => {
    await register('G-3')
    const answer = await own().send('post', `/organisations/${supplier.id}/gauges`).send(gauge('G-3'))
    expect(answer.body).toMatchObject({ status: 409, code: 'already-taken', errors: [{ path: 'body.code' }] })
    const elsewhere = await harness
      .as('supplier', stranger)
      .call(gauges.createGauge, { organisationId: strangers.id }, { body: gauge('G-3') })
    expect(elsewhere.code).toBe('G-3')
  })

  it('refuse a stale version, and change when the version is right', async () => {
    const made = await register('G-4')
    const change = (name: string, expectedVersion: number) =>
      own()
        .send('put', `/organisations/${supplier.id}/gauges/${made.id}`)
        .send({ ...gauge('G-4', { name }), expectedVersion })
    expect((await change('First', 1)).body).toMatchObject({ name: 'First', rowVersion: 2 })
    expect((await change('Second', 1)).body).toMatchObject({ status: 409, code: 'changed-meanwhile' })
  })

  it('are seen by their organisation alone, on the supplier’s side alone', async () => {
    const made = await register('G-5')
    const foreign = await harness
      .as('supplier', stranger)
      .send('get', `/organisations/${strangers.id}/gauges/${made.id}`)
    expect(foreign.status).toBe(404)
    const otherSide = await harness
      .as('customer', engineer)
      .send('get', `/organisations/${supplier.id}/gauges`)
    expect(otherSide.status).toBe(403)
    const write = await harness
      .as('supplier', reader)
      .send('post', `/organisations/${supplier.id}/gauges`)
      .send(gauge('G-5b'))
    expect(write.status).toBe(403)
  })
})

describe('calibrations', () => {
  it('are judged by the day in the organisation’s time zone: in date, due soon, overdue', async () => {
    const [fine, soon, today, late, none] = [
      await register('S-fine'),
      await register('S-soon'),
      await register('S-today'),
      await register('S-late'),
      await register('S-none'),
    ]
    await calibrate(fine.id, '2026-10-01', '2026-12-03')
    await calibrate(soon.id, '2026-10-01', '2026-12-02')
    await calibrate(today.id, '2026-10-01', '2026-11-02')
    await calibrate(late.id, '2025-10-01', '2026-11-01')
    const list = (query: object) => own().call(gauges.listGauges, at(), { query: { search: 'S-', ...query } })
    const standings = async () =>
      Object.fromEntries((await list({})).items.map((each) => [each.code, each.calibration.standing]))
    expect(await standings()).toEqual({
      'S-fine': 'in-date',
      'S-soon': 'due-soon',
      'S-today': 'due-soon',
      'S-late': 'overdue',
      'S-none': 'none',
    })
    // The filter in the database and the word on the row follow the same rule.
    for (const [standing, codes] of [
      ['in-date', ['S-fine']],
      ['due-soon', ['S-soon', 'S-today']],
      ['overdue', ['S-late']],
      ['none', ['S-none']],
    ] as const)
      expect((await list({ calibration: standing })).items.map((each) => each.code)).toEqual(codes)
    expect((await list({ sort: 'dueOn' })).items.map((each) => each.code)).toEqual([
      'S-late',
      'S-today',
      'S-soon',
      'S-fine',
      'S-none',
    ])
    // 23:30 UTC on the due day is already the next day in Berlin.
    harness.moveClock('2026-11-02T23:30:00.000Z')
    expect((await standings())['S-today']).toBe('overdue')
    harness.moveClock('2026-11-02T09:00:00.000Z')
    expect(none.calibration.standing).toBe('none')
  })

  it('that count on a day are the latest made on or before it', async () => {
    const made = await register('C-1')
    await calibrate(made.id, '2025-03-01', '2026-03-01')
    await calibrate(made.id, '2026-02-01', '2027-02-01')
    await harness.inTenant('supplier', supplier, engineer, ['gauge-engineer'], async (tenant) => {
      const on = async (day: string) =>
        (await calibrationOn(tenant, { gaugeId: made.id }, day))?.dueOn ?? null
      expect(await on('2025-02-28')).toBeNull()
      expect(await on('2025-03-01')).toBe('2026-03-01')
      expect(await on('2026-01-31')).toBe('2026-03-01')
      expect(await on('2026-02-01')).toBe('2027-02-01')
    })
  })

  it('keep their certificate byte for byte and give it back as an attachment', async () => {
    const made = await register('C-2')
    const name = '../Zertifikat "№ 7".pdf'
    const added = await calibrate(made.id, '2026-10-01', '2027-10-01', { name, bytes: pdf })
    expect(added.certificate).toMatchObject({
      name: 'Zertifikat № 7.pdf',
      contentType: 'application/pdf',
      size: pdf.length,
    })
    const answer = await own()
      .send('get', `/organisations/${supplier.id}/files/${added.certificate?.id}/content`)
      .buffer(true)
      .parse((response, done) => {
        const chunks: Buffer[] = []
        response.on('data', (chunk: Buffer) => chunks.push(chunk))
        response.on('end', () => done(null, Buffer.concat(chunks)))
      })
    expect(Buffer.compare(answer.body as Buffer, pdf)).toBe(0)
    expect(answer.headers).toMatchObject({
      'content-type': 'application/pdf',
      'x-content-type-options': 'nosniff',
      'content-disposition': expect.stringMatching(/^attachment; /),
    })
    const seen = await own().call(files.readFile, at({ fileId: added.certificate?.id ?? '' }))
    expect(seen.sha256).toMatch(/^[0-9a-f]{64}$/)
    expect(seen).not.toHaveProperty('storageKey')
    for (const path of ['', '/content']) {
      const foreign = await harness
        .as('supplier', stranger)
        .send('get', `/organisations/${strangers.id}/files/${added.certificate?.id}${path}`)
      expect(foreign.status).toBe(404)
    }
  })

  it.each([
    ['a program that is called a PDF', 'evil.pdf', Buffer.from('MZ\u0090\u0000\u0003')],
    ['an HTML page', 'page.pdf', Buffer.from('<html><script>alert(1)</script></html>')],
    ['nothing at all', 'empty.pdf', Buffer.alloc(0)],
  ])('refuse %s, by its content', async (_what, name, bytes) => {
    const made = await register(`C-${name}`)
    const answer = await own()
      .send('post', `/organisations/${supplier.id}/gauges/${made.id}/calibrations`)
      .field('data', JSON.stringify(body({})))
      .attach('file', bytes, name)
    expect(answer.status).toBe(422)
    expect(answer.body.errors[0]).toMatchObject({
      path: 'body.file',
      message: expect.stringContaining('PDF, PNG or JPEG'),
    })
  })

  it('refuse a file above 20 MB, and say the limit', async () => {
    const made = await register('C-large')
    const answer = await own()
      .send('post', `/organisations/${supplier.id}/gauges/${made.id}/calibrations`)
      .field('data', JSON.stringify(body({})))
      .attach('file', Buffer.concat([pdf, Buffer.alloc(20_000_001)]), 'large.pdf')
    expect(answer.body).toMatchObject({ status: 413, code: 'file-too-large' })
    expect(answer.body.detail).toContain('20 MB')
  })

  const body = (more: object) => ({
    certificateNumber: 'C 9',
    calibratedOn: '2026-10-01',
    dueOn: '2027-10-01',
    foundWithinLimits: true,
    ...more,
  })
  it.each([
    [{ dueOn: '2026-09-30' }, 'body.dueOn', 'Enter a due day on or after the day of the calibration.'],
    [
      { calibratedOn: '2026-11-03' },
      'body.calibratedOn',
      'This day is still to come. Enter the day of the calibration.',
    ],
    [{ calibratedOn: '1 Oct' }, 'body.calibratedOn', 'Enter a day, such as 2026-10-14.'],
    [{ certificateNumber: '' }, 'body.certificateNumber', 'Enter something here.'],
  ])('refuse %j at its field', async (wrong, path, message) => {
    const made = await register(`C-bad-${path}-${Object.values(wrong)[0]}`.slice(0, 40))
    const answer = await own()
      .send('post', `/organisations/${supplier.id}/gauges/${made.id}/calibrations`)
      .field('data', JSON.stringify(body(wrong)))
    expect(answer.status).toBe(422)
    expect(answer.body.errors).toContainEqual({ path, message })
  })

  it('come in pages, the latest first', async () => {
    const made = await register('C-pages')
    for (const year of [2024, 2025, 2026]) await calibrate(made.id, `${year}-01-01`, `${year + 1}-01-01`)
    const page = await own().call(calibrations.listGaugeCalibrations, at({ gaugeId: made.id }), {
      query: { size: 2 },
    })
    expect(page.total).toBe(3)
    expect(page.items.map((each) => each.calibratedOn)).toEqual(['2026-01-01', '2025-01-01'])
  })
})

describe('reference standards', () => {
  it('are registered, changed, archived and restored', async () => {
    const made = await own().call(standards.createStandard, at(), { body: ring('R-1') })
    expect(made).toMatchObject({
      certifiedValue: '23.9990',
      expandedUncertainty: '0.0006',
      coverageFactor: '2',
      calibration: { standing: 'none' },
    })
    const params = at({ standardId: made.id })
    const changed = await own().call(standards.changeStandard, params, {
      body: { ...ring('R-1', { certifiedValue: '23.9992' }), expectedVersion: 1 },
    })
    expect(changed).toMatchObject({ certifiedValue: '23.9992', rowVersion: 2 })
    await own().call(standards.archiveStandard, params, { body: { expectedVersion: 2 } })
    const list = (archived: string) =>
      own().call(standards.listStandards, at(), { query: { search: 'R-1', archived } })
    expect((await list('active')).total).toBe(0)
    expect((await list('archived')).total).toBe(1)
    const late = await own()
      .send('post', `/organisations/${supplier.id}/standards/${made.id}/calibrations`)
      .field(
        'data',
        JSON.stringify({
          certificateNumber: 'C',
          calibratedOn: '2026-10-01',
          dueOn: '2027-10-01',
          foundWithinLimits: true,
        }),
      )
    expect(late.body).toMatchObject({ status: 409, code: 'archived' })
    const restored = await own().call(standards.restoreStandard, params, { body: { expectedVersion: 3 } })
    expect(restored.archivedAt).toBeNull()
  })

  it.each([
    [
      { coverageFactor: null },
      'body.coverageFactor',
      'Enter the coverage factor k from the certificate. If it states none, ask the laboratory.',
    ],
    [
      { expandedUncertainty: null },
      'body.expandedUncertainty',
      'Enter the expanded uncertainty this coverage factor belongs to, or leave both empty.',
    ],
    [
      { coverageFactor: '95' },
      'body.coverageFactor',
      'Enter a coverage factor from 1 to 10; most certificates state 2.',
    ],
    [{ expandedUncertainty: '-0.1' }, 'body.expandedUncertainty', 'Enter a number above zero.'],
    [{ certifiedValue: '' }, 'body.certifiedValue', 'Enter a number, such as 24.025.'],
  ])('with %j are refused at that field', async (wrong, path, message) => {
    const answer = await own()
      .send('post', `/organisations/${supplier.id}/standards`)
      .send(ring('R-bad', wrong))
    expect(answer.status).toBe(422)
    expect(answer.body.errors).toEqual([{ path, message }])
  })

  it('may have no stated uncertainty, and then no factor', async () => {
    const made = await own().call(standards.createStandard, at(), {
      body: ring('R-2', { expandedUncertainty: null, coverageFactor: null }),
    })
    expect(made).toMatchObject({ expandedUncertainty: null, coverageFactor: null })
  })

  it('have calibrations of their own, sorted by due day in the list', async () => {
    const made = await own().call(standards.createStandard, at(), { body: ring('R-3') })
    const png = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 1, 2, 3])
    await own().call(calibrations.addStandardCalibration, at({ standardId: made.id }), {
      body: {
        certificateNumber: 'C',
        calibratedOn: '2025-01-01',
        dueOn: '2026-01-01',
        foundWithinLimits: true,
      },
      file: { name: 'scan.bin', bytes: png },
    })
    const list = await own().call(standards.listStandards, at(), {
      query: { calibration: 'overdue', sort: '-dueOn' },
    })
    expect(list.items.map((each) => each.code)).toEqual(['R-3'])
    const own3 = await own().call(calibrations.listStandardCalibrations, at({ standardId: made.id }))
    expect(own3.items[0]?.certificate).toMatchObject({ contentType: 'image/png', name: 'scan.bin' })
  })
})
