import { calibrations, gauges, imports, reviews } from '@evenrule/api/contract'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { csv, startImports, type Imports } from './imports.world'

let world: Imports
beforeAll(async () => {
  world = await startImports()
}, 120_000)
afterAll(() => world.story.stop())

const header = [
  ...['Gauge code', 'Gauge name', 'Resolution', 'Unit', 'Site', 'Certificate number', 'Laboratory'],
  ...['Calibrated on', 'Due on', 'Found within limits'],
]
const gaugesNow = async () =>
  (await world.story.by('engineer').call(gauges.listGauges, {}, { query: { size: 100 } })).items
const calibrationsOf = async (code: string) => {
  const gauge = (await gaugesNow()).find((each) => each.code === code)
  const page = await world.story
    .by('engineer')
    .call(calibrations.listGaugeCalibrations, { gaugeId: gauge?.id ?? '' }, {})
  return page.items
}
const file = csv(
  header,
  ['EG-1', 'Bore gauge', '0.001', 'mm', 'Hall 1', 'C-25', 'North', '02.03.2025', '02.03.2026', 'ja'],
  ['EG-1', '', '', '', '', 'C-26', 'North', '2026-03-02', '2027-03-02', 'yes'],
  ['HG-2', 'Height gauge', '0.01', 'mm', '', '', '', '', '', ''],
)

describe('a file of gauges', () => {
  it('brings in gauges with several calibrations each, and nothing when it comes again', async () => {
    const done = await world.apply('engineer', 'gauges', file)
    expect(done).toMatchObject({ state: 'applied', counts: { rows: 3, new: 4, badRows: 0 } })
    expect((await gaugesNow()).map(({ code, resolution, site }) => [code, resolution, site])).toEqual([
      ['EG-1', '0.001', 'Hall 1'],
      ['HG-2', '0.01', null],
    ])
    const entered = await calibrationsOf('EG-1')
    expect(
      entered.map(({ certificateNumber, calibratedOn, dueOn }) => [certificateNumber, calibratedOn, dueOn]),
    ).toEqual([
      ['C-26', '2026-03-02', '2027-03-02'],
      ['C-25', '2025-03-02', '2026-03-02'],
    ])
    expect((await world.apply('engineer', 'gauges', file)).counts).toMatchObject({
      new: 0,
      changed: 0,
      unchanged: 4,
    })
    expect(await calibrationsOf('EG-1')).toEqual(entered)
  })

  it('changes what differs of a gauge and enters a further calibration', async () => {
    const next = csv(header, ['EG-1', '', '0.002', '', '', 'C-26b', '', '2026-06-01', '2027-06-01', 'no'])
    const seen = await world.preview('engineer', 'gauges', next)
    expect(seen.things.map(({ what, outcome }) => [what, outcome])).toEqual([
      ['calibration', 'new'],
      ['gauge', 'changed'],
    ])
    expect(seen.things[0]?.notes[0]).toMatch(/Found outside its limits/)
    await world.apply('engineer', 'gauges', next)
    expect((await gaugesNow())[0]).toMatchObject({ resolution: '0.002', name: 'Bore gauge' })
    expect((await calibrationsOf('EG-1'))[0]?.foundWithinLimits).toBe(false)
  })

  it('tells before what a calibration found outside suspends, and suspends it', async () => {
    const { story } = world
    const task = await story.ready()
    const id = await story.submission(task.id, 'submitted')
    const { rowVersion: expectedVersion, sha256 } = await story.read('quality', id)
    await story
      .by('quality')
      .call(reviews.accept, { submissionId: id }, { body: { expectedVersion, sha256 } })
    story.harness.moveClock(new Date(story.harness.now().getTime() + 60_000))
    const found = csv(header, [
      task.gauge.code,
      '',
      '',
      '',
      '',
      'OUT',
      '',
      '2026-11-02',
      '2027-11-02',
      'nein',
    ])
    const seen = await world.preview('engineer', 'gauges', found)
    expect(seen.things.find(({ what }) => what === 'calibration')?.notes[0]).toMatch(
      /1 acceptance .* suspended/,
    )
    await world.apply('engineer', 'gauges', found)
    expect((await story.read('quality', id)).standing?.state).toBe('suspended')
  }, 60_000)
})

describe('bad rows', () => {
  const cal = ['C', '', '2026-03-02', '2027-03-02', 'yes']
  it.each<[string, string[], string, RegExp]>([
    ['without a code', ['', 'X', '1', 'mm', '', '', '', '', '', ''], 'Gauge code', /Enter the code/],
    ['without a name', ['X-1', '', '1', 'mm', '', '', '', '', '', ''], 'Gauge name', /new/],
    ['with a resolution of nothing', ['X-1', 'X', '0', 'mm', '', ...cal], 'Resolution', /above zero/],
    ['with an unknown unit', ['X-1', 'X', '1', 'ell', '', ...cal], 'Unit', /unit of the list/],
    [
      'with half a calibration',
      ['X-1', 'X', '1', 'mm', '', 'C', '', '2026-03-02', '', 'yes'],
      'Due on',
      /due/,
    ],
    [
      'with a day that does not exist',
      ['X-1', 'X', '1', 'mm', '', 'C', '', '30.02.2026', '2027-03-02', 'yes'],
      'Calibrated on',
      /no day/,
    ],
    [
      'with a day in two readings',
      ['X-1', 'X', '1', 'mm', '', 'C', '', '03/02/2026', '2027-03-02', 'yes'],
      'Calibrated on',
      /two days/,
    ],
    [
      'with a day to come',
      ['X-1', 'X', '1', 'mm', '', 'C', '', '2026-12-24', '2027-03-02', 'yes'],
      'Calibrated on',
      /still to come/,
    ],
    [
      'due before it was made',
      ['X-1', 'X', '1', 'mm', '', 'C', '', '2026-03-02', '2026-01-02', 'yes'],
      'Due on',
      /on or after/,
    ],
    [
      'with a result that is neither',
      ['X-1', 'X', '1', 'mm', '', 'C', '', '2026-03-02', '2027-03-02', 'so so'],
      'Found within limits',
      /yes or no/,
    ],
    [
      'that say otherwise what is entered',
      ['EG-1', '', '', '', '', 'C-25', 'North', '2025-03-02', '2026-09-02', 'yes'],
      'Certificate number',
      /never changed/,
    ],
  ])('%s are named with cell and mend', async (_what, row, field, message) => {
    const seen = await world.preview('engineer', 'gauges', csv(header, row))
    const found = seen.bad.find((each) => each.field === field)
    expect([seen.bad, found?.row]).toEqual([seen.bad, 2])
    expect(found?.message).toMatch(message)
  })

  it('of a gauge draw its calibrations with them', async () => {
    const seen = await world.preview(
      'engineer',
      'gauges',
      csv(header, ['X-9', 'X', 'fine', 'mm', '', ...cal], ['X-9', '', '', '', '', 'C2', ...cal.slice(1)]),
    )
    expect(seen.bad.map(({ row, message }) => [row, message])).toEqual([
      [2, expect.stringMatching(/no number/)],
      [3, expect.stringMatching(/row 2/)],
    ])
    expect(seen.counts).toMatchObject({ badRows: 2, new: 0 })
  })

  it('keep a unit of another quantity from a gauge that measures something', async () => {
    const task = await world.story.task()
    const seen = await world.preview(
      'engineer',
      'gauges',
      csv(header, [task.gauge.code, '', '', 'N', '', '', '', '', '', '']),
    )
    expect(seen.bad[0]).toMatchObject({ field: 'Unit' })
  })
})

describe('while others work', () => {
  const one = (code: string) => csv(header, [code, 'Caliper', '0.01', 'mm', '', '', '', '', '', ''])

  it('refuses to apply a preview on which somebody has worked since, and says which row', async () => {
    const { story } = world
    const change = csv(header, ['HG-2', 'Height gauge 2', '', '', '', '', '', '', '', ''])
    const seen = await world.preview('engineer', 'gauges', change)
    const gauge = (await gaugesNow()).find(({ code }) => code === 'HG-2')
    await story.by('engineer').call(
      gauges.changeGauge,
      { gaugeId: gauge?.id ?? '' },
      {
        body: {
          ...{ code: 'HG-2', name: 'Height gauge', resolution: '0.02', unit: 'mm' },
          expectedVersion: gauge?.rowVersion,
        },
      },
    )
    const refused = await story
      .by('engineer')
      .refusal(
        imports.importsOf.gauges.apply,
        {},
        { body: { sha256: seen.file.sha256, basis: seen.basis, mode: 'all' }, file: change },
      )
    expect(refused).toMatchObject({ status: 409, code: 'changed-since-preview', errors: [{ row: 2 }] })
    expect((await gaugesNow()).find(({ code }) => code === 'HG-2')?.name).toBe('Height gauge')
  })

  it('refuses another file than the one that was previewed', async () => {
    const seen = await world.preview('engineer', 'gauges', one('CA-1'))
    const refused = await world.story
      .by('engineer')
      .refusal(
        imports.importsOf.gauges.apply,
        {},
        { body: { sha256: seen.file.sha256, basis: seen.basis, mode: 'all' }, file: one('CA-2') },
      )
    expect(refused).toMatchObject({ status: 422, errors: [{ path: 'body.sha256' }] })
  })

  it('lets one of two imports of the same gauge through and tells the other what changed', async () => {
    const both = await Promise.all([0, 1].map(() => world.begin('engineer', 'gauges', one('CA-3'))))
    const ends = await Promise.all(both.map(({ id }) => world.end('engineer', id)))
    expect(ends.map(({ state }) => state).sort()).toEqual(['applied', 'failed'])
    const failed = ends.find(({ state }) => state === 'failed')
    expect(failed?.failure).toMatchObject({ code: 'changed-since-preview', errors: [{ row: 2 }] })
    expect((await gaugesNow()).filter(({ code }) => code === 'CA-3')).toHaveLength(1)
  })

  it('tells an import whose program stopped, and repeats it', async () => {
    const { harness } = world.story
    const done = await world.apply('engineer', 'gauges', one('CA-4'))
    await harness.owner.query(
      `update imports set state = 'applying', alive_at = now() - interval '1 hour' where id = $1`,
      [done.id],
    )
    await harness.owner.query(`delete from gauges where code = 'CA-4'`)
    const stopped = await world.read('engineer', done.id)
    expect(stopped.state).toBe('interrupted')
    await world.story
      .by('engineer')
      .call(
        imports.importsOf.gauges.repeat,
        { importId: done.id },
        { body: { expectedVersion: stopped.rowVersion } },
      )
    expect(await world.end('engineer', done.id)).toMatchObject({ state: 'applied', done: 1 })
    expect((await gaugesNow()).map(({ code }) => code)).toContain('CA-4')
    const refused = await world.story
      .by('engineer')
      .refusal(
        imports.importsOf.gauges.repeat,
        { importId: done.id },
        { body: { expectedVersion: stopped.rowVersion } },
      )
    expect(refused).toMatchObject({ status: 409, code: 'wrong-state' })
  })

  it('is the supplier’s alone', async () => {
    expect(
      await world.story.by('quality').refusal(imports.importsOf.gauges.preview, {}, { body: {}, file }),
    ).toMatchObject({ status: 403, code: 'not-allowed' })
  })
})

describe('a file that is no list of gauges', () => {
  it('is told which columns are missing', async () => {
    const seen = await world.preview('engineer', 'gauges', csv(['colour', 'weight'], ['red', '5']))
    expect(seen.missing).toEqual(['Gauge code'])
    expect(await world.refusal('engineer', 'gauges', csv(['colour'], ['red']))).toMatchObject({ status: 422 })
  })

  it('can be told its columns by hand', async () => {
    const strange = csv(['a', 'b', 'c', 'd'], ['mm', '0.5', 'Feeler', 'FG-1'])
    const columns = { code: ['D'], name: ['C'], resolution: ['B'], unit: ['A'] }
    const seen = await world.preview('engineer', 'gauges', strange, { columns, headerRow: 1 })
    expect(seen.counts).toMatchObject({ new: 1, badRows: 0 })
    // What was chosen once is known when a file of the same names comes again, on this organisation alone.
    await world.apply('engineer', 'gauges', strange, { columns, headerRow: 1 })
    const again = await world.preview('engineer', 'gauges', strange, { headerRow: 1 })
    expect(again.counts).toMatchObject({ new: 0, unchanged: 1, badRows: 0 })
    expect(
      await world.story
        .by('engineer')
        .refusal(
          imports.importsOf.gauges.preview,
          {},
          { body: { columns: { code: ['D'], name: ['D'] }, headerRow: 1 }, file: strange },
        ),
    ).toMatchObject({ status: 422, errors: [{ path: 'body.columns.name' }] })
  })
})
