import { imports, parts, characteristics, record } from '@evenrule/api/contract'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { csv, startImports, type Imports } from './imports.world'

let world: Imports
beforeAll(async () => {
  world = await startImports()
}, 120_000)
afterAll(() => world.story.stop())

const header = [
  ...['Part number', 'Part name', 'Revision', 'Characteristic number', 'Characteristic name'],
  ...['Nominal', 'Lower limit', 'Upper limit', 'Tolerance ±', 'Unit', 'Class'],
]
const bore = (part: string, number: string, name = 'bore') => [
  ...[part, 'Housing', 'A', number, name, '24.000', '23.975', '24.025', '', 'mm', 'significant'],
]

describe('a file of parts', () => {
  it('is previewed without storing anything, then imported, and changes nothing when it comes again', async () => {
    const file = csv(
      header,
      bore('N-1', '5'),
      ['N-1', '', '', '6', 'height', '10.0', '', '', '0.05', 'mm', ''],
      ['N-2', 'Cover', 'B', '', '', '', '', '', '', '', ''],
    )
    const before = await world.partsNow('quality')
    const seen = await world.preview('quality', 'parts', file)
    expect(seen.counts).toEqual({ rows: 3, badRows: 0, new: 4, changed: 0, unchanged: 0 })
    expect(await world.partsNow('quality')).toEqual(before)

    const done = await world.apply('quality', 'parts', file)
    expect(done).toMatchObject({ state: 'applied', done: 4, counts: { new: 4 }, failure: null })
    const entered = await world.characteristicsNow('quality')
    expect(
      entered.map(({ number, nominal, lowerLimit, upperLimit, class: of, confirmedByCustomer }) => [
        ...[number, nominal, lowerLimit, upperLimit, of, confirmedByCustomer],
      ]),
    ).toEqual([
      [5, '24.000', '23.975', '24.025', 'significant', true],
      [6, '10.0', '9.95', '10.05', 'ordinary', true],
    ])
    const again = await world.apply('quality', 'parts', file)
    expect(again.counts).toEqual({ rows: 3, badRows: 0, new: 0, changed: 0, unchanged: 4 })
    expect(await world.characteristicsNow('quality')).toEqual(entered)
  })

  it('leaves the events of the single acts in the chain, and one of its own in the journal', async () => {
    const { items } = await world.story.by('quality').call(record.listEvents, {}, { query: { size: 100 } })
    const types = items.map(({ type }) => type)
    for (const type of ['part.created', 'characteristic.created', 'import.applied'])
      expect(types).toContain(type)
    const applied = items.find(({ type }) => type === 'import.applied')
    expect(applied).toMatchObject({
      subject: { type: 'import', label: 'rows.csv' },
      chainId: world.story.organisations.customer.id,
    })
  })

  it('takes decimal commas, names in German and numbers that a spreadsheet has stripped of zeros', async () => {
    const file = {
      name: 'teile.csv',
      bytes: Buffer.from(
        'Teilenummer;Benennung;Änderungsstand;Merkmal-Nr.;Merkmal;Nennmaß;USG;OSG;Einheit;Klasse\r\nN-1;Housing;A;5;bore;24;23,975;24,025;mm;wichtig\r\n',
      ),
    }
    const seen = await world.preview('quality', 'parts', file)
    expect(seen.missing).toEqual([])
    expect(seen.bad).toEqual([])
    expect(seen.counts).toMatchObject({ new: 0, changed: 0, unchanged: 2 })
  })

  it('shows what would change, and changes it', async () => {
    const file = csv(header, [
      ...['N-1', 'Bearing housing', '', '5', 'bore', '24.000', '23.970', '24.025', '', 'mm', 'significant'],
    ])
    const seen = await world.preview('quality', 'parts', file)
    expect(seen.things.map(({ what, outcome, differences }) => [what, outcome, differences])).toEqual([
      ['part', 'changed', [{ field: 'Part name', from: 'Housing', to: 'Bearing housing' }]],
      ['characteristic', 'changed', [{ field: 'Lower limit', from: '23.975', to: '23.970' }]],
    ])
    await world.apply('quality', 'parts', file)
    expect((await world.characteristicsNow('quality'))[0]).toMatchObject({ lowerLimit: '23.970' })
  })

  it('adds a revision that the part does not have yet, with the characteristics of the file alone', async () => {
    const file = csv(header, ['N-2', '', 'C', '1', 'width', '5', '4.9', '5.1', '', 'mm', ''])
    const seen = await world.preview('quality', 'parts', file)
    expect(seen.things.map(({ what, outcome }) => [what, outcome])).toEqual([
      ['revision', 'new'],
      ['characteristic', 'new'],
      ['part', 'unchanged'],
    ])
    await world.apply('quality', 'parts', file)
    const part = (await world.partsNow('quality')).find(({ number }) => number === 'N-2')
    expect(part?.currentRevision.label).toBe('C')
  })

  it('of the supplier waits for the confirmation, also after a change', async () => {
    await world.apply('engineer', 'parts', csv(header, bore('N-1', '7', 'slot')))
    const slot = (await world.characteristicsNow('engineer')).find(({ number }) => number === 7)
    expect(slot?.confirmedByCustomer).toBe(false)
  })
})

describe('bad rows', () => {
  it.each<[string, string[], string, RegExp]>([
    ['without a part number', ['', ...bore('', '1').slice(1)], 'Part number', /Enter the part number/],
    [
      'without a name for a new part',
      ['X-1', '', 'A', '1', 'bore', '', '1', '2', '', 'mm', ''],
      'Part name',
      /new/,
    ],
    [
      'without a revision for a new part',
      ['X-1', 'Y', '', '1', 'b', '', '1', '2', '', 'mm', ''],
      'Revision',
      /new/,
    ],
    [
      'with letters in a number',
      ['X-1', 'Y', 'A', '1', 'b', '24.0 mm', '1', '2', '', 'mm', ''],
      'Nominal',
      /24/,
    ],
    [
      'with limits the wrong way round',
      ['X-1', 'Y', 'A', '1', 'b', '', '3', '2', '', 'mm', ''],
      'Upper limit',
      /above/,
    ],
    [
      'without any limit',
      ['X-1', 'Y', 'A', '1', 'b', '', '', '', '', 'mm', ''],
      'Upper limit',
      /at least one limit/,
    ],
    [
      'with limits and a tolerance',
      ['X-1', 'Y', 'A', '1', 'b', '2', '1', '3', '1', 'mm', ''],
      'Tolerance ±',
      /not both/,
    ],
    [
      'with an unknown unit',
      ['X-1', 'Y', 'A', '1', 'b', '', '1', '2', '', 'furlong', ''],
      'Unit',
      /unit of the list/,
    ],
    [
      'with an unknown class',
      ['X-1', 'Y', 'A', '1', 'b', '', '1', '2', '', 'mm', 'blue'],
      'Class',
      /ordinary/,
    ],
    [
      'with a number that is none',
      ['X-1', 'Y', 'A', '5a', 'b', '', '1', '2', '', 'mm', ''],
      'Characteristic number',
      /whole number/,
    ],
    [
      'without the characteristic number',
      ['X-1', 'Y', 'A', '', 'b', '', '1', '2', '', 'mm', ''],
      'Characteristic number',
      /drawing/,
    ],
    [
      'with a name that is too long',
      ['X-1', 'y'.repeat(201), 'A', '1', 'b', '', '1', '2', '', 'mm', ''],
      'Part name',
      /200/,
    ],
  ])('%s are named with cell and mend', async (_what, row, field, message) => {
    const file = csv(header, row)
    const seen = await world.preview('quality', 'parts', file)
    const found = seen.bad.find((each) => each.field === field)
    expect([seen.bad, found?.row]).toEqual([seen.bad, 2])
    expect(found?.message).toMatch(message)
    expect(await world.refusal('quality', 'parts', file)).toMatchObject({
      status: 422,
      code: 'invalid-input',
    })
  })

  it('are told where they contradict or repeat an earlier row', async () => {
    const seen = await world.preview(
      'quality',
      'parts',
      csv(header, bore('X-2', '1'), bore('X-2', '1'), ['X-2', 'Other', ...bore('X-2', '2').slice(2)]),
    )
    expect(seen.bad.map(({ row, field }) => [row, field])).toEqual([
      [3, 'Characteristic number'],
      [4, 'Part name'],
    ])
  })

  it('draw rows with them that rest on them, and are left out on request', async () => {
    const file = csv(
      header,
      ['G-1', 'Good', 'A', '1', 'bore', '', '1', '2', '', 'mm', ''],
      ['D-1', 'Dependent', 'A', 'x', 'bore', '', '1', '2', '', 'mm', ''],
      ['D-1', '', '', '2', 'slot', '', '1', '2', '', 'mm', ''],
    )
    const seen = await world.preview('quality', 'parts', file)
    expect(seen.bad.map(({ row, message }) => [row, message])).toEqual([
      [3, expect.stringMatching(/whole number/)],
      [4, expect.stringMatching(/rests on row 3/)],
    ])
    const before = await world.partsNow('quality')
    expect(await world.refusal('quality', 'parts', file)).toMatchObject({ status: 422 })
    expect(await world.partsNow('quality')).toEqual(before)

    const done = await world.apply('quality', 'parts', file, { mode: 'good-rows' })
    expect(done).toMatchObject({ state: 'applied', counts: { new: 2, badRows: 2 } })
    expect(done.leftOut.map(({ row }) => row)).toEqual([3, 4])
    const numbers = (await world.partsNow('quality')).map(({ number }) => number)
    expect(numbers).toContain('G-1')
    expect(numbers).not.toContain('D-1')

    const answer = await world.story
      .by('quality')
      .client.send(
        'get',
        `/organisations/${world.story.organisations.customer.id}/imports/${done.id}/left-out.csv`,
      )
    const lines = answer.text.replace('\ufeff', '').trim().split('\r\n')
    expect(lines).toHaveLength(3)
    expect(lines[0]).toBe([...header, 'What to mend'].join(','))
    expect(lines[1]).toMatch(/^D-1,Dependent,A,x,.*whole number/)
    // Mended and uploaded as it is, with its further column.
    const mended = { name: 'mended.csv', bytes: Buffer.from(answer.text.replace(',A,x,', ',A,1,')) }
    expect((await world.apply('quality', 'parts', mended)).counts).toMatchObject({ new: 3, badRows: 0 })
  })

  it('name the rules of the single acts: frozen limits, archived parts, the supplier’s own number', async () => {
    const { story } = world
    const ready = await story.task()
    await story.agree(ready.part.id)
    const row = (lower: string) => [
      ...[ready.part.number, '', '', '5', 'bore', '24.000', lower, '24.025', '', 'mm', 'ordinary'],
    ]
    expect((await world.preview('quality', 'parts', csv(header, row('23.975')))).counts.unchanged).toBe(2)
    const frozen = await world.preview('quality', 'parts', csv(header, row('23.970')))
    expect(frozen.bad[0]?.message).toMatch(/rests on these limits/)

    const part = (await world.partsNow('quality')).find(({ number }) => number === 'G-1')
    await story
      .by('quality')
      .call(parts.archivePart, { partId: part?.id ?? '' }, { body: { expectedVersion: part?.rowVersion } })
    const archived = await world.preview('quality', 'parts', csv(header, bore('G-1', '1')))
    expect(archived.bad[0]?.message).toMatch(/archived/)
    const named = csv([...header, 'Our number'], [...bore('N-1', '5'), 'OWN-1'])
    expect((await world.preview('quality', 'parts', named)).bad[0]?.message).toMatch(/supplier’s own number/)
  })

  it('say so where a number of a revision is archived', async () => {
    const slot = (await world.characteristicsNow('quality')).find(({ number }) => number === 7)
    await world.story
      .by('quality')
      .call(
        characteristics.archiveCharacteristic,
        { characteristicId: slot?.id ?? '' },
        { body: { expectedVersion: slot?.rowVersion } },
      )
    const seen = await world.preview('quality', 'parts', csv(header, bore('N-1', '7', 'slot')))
    expect(seen.bad[0]).toMatchObject({ field: 'Characteristic number' })
  })
})

describe('who and what', () => {
  it('knows nothing of other organisations: their partners and parts are unknown', async () => {
    const file = csv(['Supplier', ...header], ['Halm Turning', ...bore('N-1', '5')])
    const seen = await world.preview('stranger', 'parts', file)
    expect(seen.bad[0]).toMatchObject({ field: 'Supplier', row: 2 })
    expect(seen.counts.new).toBe(0)
  })

  it('refuses readers, and does not show one organisation’s imports to the other', async () => {
    const file = csv(header, bore('N-1', '5'))
    expect(
      await world.story.by('reader').refusal(imports.importsOf.parts.preview, {}, { body: {}, file }),
    ).toMatchObject({
      status: 403,
    })
    const done = await world.apply('quality', 'parts', file)
    expect(await world.story.by('engineer').refusal(imports.readImport, { importId: done.id })).toMatchObject(
      {
        status: 404,
      },
    )
    const listed = await world.story.by('quality').call(imports.listImports, {}, { query: { kind: 'parts' } })
    expect(listed.items.find(({ id }) => id === done.id)).toMatchObject({ kind: 'parts', state: 'applied' })
  })
})
