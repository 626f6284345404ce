import { imports, studies } from '@evenrule/api/contract'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { csv, startImports, type Imports } from './imports.world'
import { biasedReadings, goodReadings } from './prepared'

let world: Imports
let one: Awaited<ReturnType<Imports['story']['task']>>
beforeAll(async () => {
  world = await startImports()
  one = await world.story.task()
  await world.story.agree(one.part.id)
}, 120_000)
afterAll(() => world.story.stop())

const header = [
  ...['Study code', 'Part number', 'Characteristic number', 'Gauge code', 'Reference standard'],
  ...['Kind', 'Measured as', 'Unit', 'Collected on', 'Appraiser'],
]
const named = (code: string, more: Partial<Record<number, string>> = {}) =>
  [
    code,
    one.part.number,
    '5',
    one.gauge.code,
    one.standard.code,
    'bias',
    'value',
    'mm',
    '2026-05-04',
    'A',
  ].map((cell, at) => more[at] ?? cell)
const wideHeader = (count: number) => [
  ...header,
  ...Array.from({ length: count }, (_, at) => `Reading ${at + 1}`),
]
const studyNamed = async (code: string) => {
  const engineer = world.story.by('engineer')
  const { items } = await engineer.call(studies.listStudies, {}, { query: { search: code } })
  const found = items.find((each) => each.code === code)
  return found && engineer.call(studies.readStudy, { studyId: found.id })
}

describe('a file of past studies', () => {
  it('with a row for each study is computed like one registered not beforehand', async () => {
    const file = csv(
      wideHeader(15),
      [...named('OLD-1'), ...goodReadings],
      [...named('OLD-2'), ...biasedReadings],
    )
    const done = await world.apply('engineer', 'studies', file)
    expect(done).toMatchObject({ state: 'applied', counts: { rows: 2, new: 2, badRows: 0 } })
    const [good, biased] = [await studyNamed('OLD-1'), await studyNamed('OLD-2')]
    expect(good).toMatchObject({
      ...{ state: 'computed', registeredBeforehand: false, collectedOn: '2026-05-04', plannedReadings: 15 },
    })
    expect(good?.data[0]).toMatchObject({
      ...{ source: 'uploaded', texts: goodReadings, appraiser: 'A', leftOut: [] },
      file: { name: 'rows.csv', sha256: done.file.sha256 },
    })
    const verdicts = (study: typeof good) =>
      Object.fromEntries(study?.evaluations.map(({ clauseKey, verdict }) => [clauseKey, verdict]) ?? [])
    expect(Object.keys(verdicts(good))).toHaveLength(4)
    expect(verdicts(good)['bias/mean']).toBe('meets')
    expect(verdicts(biased)['bias/mean']).toBe('falls-short')
    // The clause on the design asks for a registration beforehand, which nobody pretends here.
    expect(Object.entries(verdicts(good)).find(([key]) => key.startsWith('design'))?.[1]).toBe('falls-short')
    expect(good?.tasks[0]?.attempt).toBe(1)
    expect(biased?.tasks[0]?.attempt).toBe(2)
  })

  it('with a row for each reading gives the same readings', async () => {
    const rows = goodReadings.map((reading, at) => [
      ...(at === 0 ? named('OLD-3') : ['OLD-3', ...header.slice(1).map(() => '')]),
      reading,
    ])
    const seen = await world.preview('engineer', 'studies', csv([...header, 'Reading'], ...rows))
    expect(seen.counts).toMatchObject({ rows: 15, new: 1, badRows: 0 })
    await world.apply('engineer', 'studies', csv([...header, 'Reading'], ...rows))
    expect((await studyNamed('OLD-3'))?.data[0]?.texts).toEqual(goodReadings)
  })

  it('changes nothing when it comes again, and refuses other readings under a code that is taken', async () => {
    const again = csv(wideHeader(15), [...named('OLD-1'), ...goodReadings])
    expect((await world.preview('engineer', 'studies', again)).counts).toMatchObject({ new: 0, unchanged: 1 })
    expect(await world.apply('engineer', 'studies', again)).toMatchObject({ state: 'applied', done: 0 })
    const other = csv(wideHeader(15), [...named('OLD-1'), ...biasedReadings])
    expect((await world.preview('engineer', 'studies', other)).bad[0]).toMatchObject({
      ...{ row: 2, field: 'Study code', message: expect.stringMatching(/Another study has this code/) },
    })
  })

  it('knows a part by the supplier’s own number, and takes deviations with decimal commas', async () => {
    const bytes = Buffer.from(
      [
        'Studie;Teilenummer;Merkmal;Prüfmittel;Normal;Gemessen als;Messdatum;Prüfer;Messwert 1;Messwert 2;Messwert 3',
        `OLD-4;${one.part.number};5;${one.gauge.code};${one.standard.code};Abweichung;04.05.2026;B;0,0001;0,0002;-0,0001`,
      ].join('\r\n'),
    )
    await world.apply('engineer', 'studies', { name: 'alt.csv', bytes })
    const study = await studyNamed('OLD-4')
    expect(study).toMatchObject({ measuredAs: 'deviation', unit: 'mm' })
    expect(study?.data[0]).toMatchObject({ values: [0.0001, 0.0002, -0.0001], readAs: { decimal: 'comma' } })
  })
})

describe('bad rows', () => {
  const readings = ['24.0001', '24.0002', '24.0003']
  it.each<[string, Partial<Record<number, string>>, string[], string, RegExp]>([
    ['without a code', { 0: '' }, readings, 'Study code', /Enter the code/],
    ['of an unknown part', { 1: 'P-9999' }, readings, 'Part number', /no part/],
    ['of an unknown characteristic', { 2: '99' }, readings, 'Characteristic number', /no characteristic/],
    ['with an unknown gauge', { 3: 'ZZ' }, readings, 'Gauge code', /no gauge/],
    ['with an unknown standard', { 4: 'ZZ' }, readings, 'Reference standard', /no reference standard/],
    ['of a kind that is not computed', { 5: 'linearity' }, readings, 'Kind', /bias/],
    ['measured as something else', { 6: 'guess' }, readings, 'Measured as', /value or deviation/],
    ['in a unit of another quantity', { 7: 'N' }, readings, 'Unit', /same quantity/],
    ['on a day to come', { 8: '2026-12-24' }, readings, 'Collected on', /still to come/],
    ['without an appraiser', { 9: '' }, readings, 'Appraiser', /person who took/],
    ['with text in a reading', {}, ['24.0001', 'abc', '24.0003'], 'Reading', /no number/],
    ['with a gap between readings', {}, ['24.0001', '', '24.0003'], 'Reading', /no reading here/],
    ['with a single reading', {}, ['24.0001', '', ''], 'Reading', /at least 2/],
  ])('%s are named with cell and mend', async (_what, more, values, field, message) => {
    const seen = await world.preview(
      'engineer',
      'studies',
      csv(wideHeader(3), [...named('BAD', more), ...values]),
    )
    const found = seen.bad.find((each) => each.field === field)
    expect([seen.bad, found?.row]).toEqual([seen.bad, 2])
    expect(found?.message).toMatch(message)
    expect(seen.counts.new).toBe(0)
  })

  it('take their whole study with them, and only it', async () => {
    const file = csv(
      [...header, 'Reading'],
      [...named('HALF'), '24.0001'],
      [...named('HALF'), 'x'],
      [...named('HALF'), '24.0002'],
      [...named('WHOLE'), '24.0001'],
      [...named('WHOLE'), '24.0002'],
    )
    const done = await world.apply('engineer', 'studies', file, { mode: 'good-rows' })
    expect(done.counts).toMatchObject({ new: 1, badRows: 3 })
    expect(done.leftOut.map(({ row }) => row).sort()).toEqual([2, 3, 4])
    expect(await studyNamed('HALF')).toBeUndefined()
    expect((await studyNamed('WHOLE'))?.state).toBe('computed')
  })

  it('name a gauge that is not set up to measure the characteristic', async () => {
    const other = await world.story.task()
    const file = csv(wideHeader(3), [...named('BAD', { 3: other.gauge.code }), ...readings])
    expect((await world.preview('engineer', 'studies', file)).bad[0]?.message).toMatch(/not set up/)
  })
})

it('asks who took the readings, who must be members', async () => {
  const file = csv(wideHeader(15), [...named('WHO'), ...goodReadings])
  expect(await world.refusal('engineer', 'studies', file, { takenBy: [] })).toMatchObject({
    ...{ status: 422, errors: [{ path: 'body.takenBy' }] },
  })
  const strange = await world.apply('engineer', 'studies', file, {
    takenBy: [world.story.people.stranger.id],
  })
  expect(strange).toMatchObject({ state: 'failed', failure: { errors: [{ row: 2 }] } })
  expect(await studyNamed('WHO')).toBeUndefined()
})

it('knows nothing of the studies, gauges and parts of others', async () => {
  const file = csv(wideHeader(15), [...named('OLD-1'), ...goodReadings])
  const seen = await world
    .preview('stranger', 'studies', file)
    .catch((error: { status: number }) => error.status)
  expect(seen).toBe(403)
  expect(await world.story.by('quality').refusal(imports.importsOf.studies.template)).toMatchObject({
    status: 403,
  })
})
