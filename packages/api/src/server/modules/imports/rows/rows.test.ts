import { describe, expect, it } from 'vitest'
import type { Table } from '../../../tables/table'
import { fieldsOf, sourceOf } from '../imports.source'
import { gaugeFields } from '../kinds/gauges.fields'
import { studyFields } from '../kinds/studies.fields'
import { keptDecimal, limitsAround } from './decimals'
import { orderOfDays, readDay } from './days'
import { RowCells } from './cells'
import { findHeader, guessMapping, normalised } from './mapping'
import { basisOf, changedRows, type Planned } from './plan'
import { dependentsOf } from './settle'
import { unitOf } from './units'
import { cut } from './words'

const table = (...rows: string[][]): Table => ({
  ...{ kind: 'csv', contentType: 'text/csv', broken: null, dialect: null, sheets: [], sheet: null },
  hiddenColumns: [],
  rows: rows.map((cells, at) => ({ row: at + 1, cells })),
})
const input = { takenBy: [] }

describe('the names of columns', () => {
  it.each([
    ['Nennmaß [mm]', 'nennmass'],
    ['N° de pièce', 'n de piece'],
    ['Due  on:', 'due on'],
    ['Tolerance (±)', 'tolerance'],
  ])('%j is compared as %j', (name, compared) => expect(normalised(name)).toBe(compared))

  it.each<[string, string[], Record<string, number[]>]>([
    ['English', ['Gage ID', 'Description', 'Next calibration'], { code: [0], name: [1], dueOn: [2] }],
    [
      'German',
      ['Prüfmittel-Nr.', 'Bezeichnung', 'Auflösung', 'Fällig am'],
      { code: [0], name: [1], resolution: [2], dueOn: [3] },
    ],
    [
      'French',
      ['Calibre', 'Nom', 'Résolution', 'Certificat'],
      { code: [0], name: [1], resolution: [2], certificateNumber: [3] },
    ],
    ['Spanish', ['Código', 'Nombre', 'Unidad', 'Ubicación'], { code: [0], name: [1], unit: [2], site: [3] }],
    [
      'Italian',
      ['Strumento', 'Nome', 'Risoluzione', 'Scadenza'],
      { code: [0], name: [1], resolution: [2], dueOn: [3] },
    ],
  ])('are guessed in %s', (_language, header, mapping) =>
    expect(guessMapping(gaugeFields, header)).toEqual(mapping),
  )

  it('of a template are all known, on either side and in either layout', () => {
    for (const kind of ['parts', 'gauges', 'studies'] as const)
      for (const side of ['supplier', 'customer'] as const) {
        const fields = fieldsOf(kind, side)
        const mapping = guessMapping(
          fields,
          fields.map(({ label }) => label),
        )
        expect(Object.keys(mapping).sort()).toEqual(fields.map(({ key }) => key).sort())
        expect(Object.values(mapping).flat()).toHaveLength(fields.length)
      }
  })

  it('find every reading of a row, however they are counted', () => {
    const common = ['Study', 'Part', 'Characteristic', 'Gauge', 'Master', 'Date', 'Operator']
    for (const counted of [
      ['Reading 1', 'Reading 2', 'Reading 10'],
      ['x1', 'x2', 'x3'],
      ['1', '2', '3'],
      ['Messwert 1', 'Messwert 2', 'Messwert 3'],
    ])
      expect(guessMapping(studyFields, [...common, ...counted]).readings).toEqual([7, 8, 9])
  })

  it('may stand below a heading', () => {
    expect(findHeader(gaugeFields, [['Our gauges'], [], ['Code', 'Name', 'Unit'], ['A', 'B', 'mm']])).toBe(2)
    expect(
      findHeader(gaugeFields, [
        ['x', 'y'],
        ['1', '2'],
      ]),
    ).toBe(0)
  })
})

describe('days', () => {
  it.each([
    ['2026-10-14', '2026-10-14'],
    ['14.10.2026', '2026-10-14'],
    ['1. 3. 2026', '2026-03-01'],
    ['14 Oct 2026', '2026-10-14'],
    ['14. März 2026', '2026-03-14'],
    ['14 août 2026', '2026-08-14'],
    ['2026-10-14 00:00:00', '2026-10-14'],
    ['03/03/2026', '2026-03-03'],
  ])('%j is %s', (cell, value) => expect(readDay(cell, 'unknown')).toEqual({ value }))

  it.each(['31.02.2026', '14.10.26', '46309', '2026-13-01', 'soon', '03/04/2026'])('%j is refused', (cell) =>
    expect(readDay(cell, 'unknown')).toEqual({ message: expect.stringMatching(/2026-10-14/) }),
  )

  it('with strokes are settled by the other days of the column', () => {
    expect(orderOfDays(['03/04/2026', '25/04/2026'])).toBe('day-first')
    expect(orderOfDays(['03/04/2026', '04/25/2026'])).toBe('month-first')
    expect(readDay('03/04/2026', 'day-first')).toEqual({ value: '2026-04-03' })
    expect(readDay('03/04/2026', 'month-first')).toEqual({ value: '2026-03-04' })
  })
})

describe('numbers and units', () => {
  it('keep the digits that stand where the file says the same number', () => {
    expect(keptDecimal('24.000', '24')).toBe('24.000')
    expect(keptDecimal('24.000', '24.0001')).toBe('24.0001')
    expect(keptDecimal(null, '24.00')).toBe('24.00')
    expect(limitsAround('24.000', '0.025')).toEqual({ lowerLimit: '23.975', upperLimit: '24.025' })
    expect(limitsAround('-0.1', '+0.30')).toEqual({ lowerLimit: '-0.40', upperLimit: '0.20' })
  })

  it.each([
    ['um', 'µm'],
    ['μm', 'µm'],
    ['Nm', 'N·m'],
    ['N*cm', 'N·cm'],
    ['nm', 'nm'],
    ['inch', 'in'],
    ['\u2126', 'Ω'],
    ['furlong', 'furlong'],
  ])('%s means %s', (cell, unit) => expect(unitOf(cell)).toBe(unit))

  it('are read by the decimal mark that most of the file has', async () => {
    const source = await sourceOf(
      'gauges',
      'supplier',
      table(['Code', 'Resolution'], ['A', '0,01'], ['B', '0,02'], ['C', '0.03']),
      input,
    )
    expect(source.mapped.writing.decimal).toBe('comma')
    const [first, , third] = source.mapped.rows.map((row) => new RowCells(row, source.mapped.writing))
    expect(first?.decimal('resolution')).toBe('0.01')
    expect(third?.decimal('resolution')).toBeNull()
    expect(third?.problems).toEqual([
      { row: 4, field: 'resolution', message: expect.stringMatching(/Write 0,03/) },
    ])
  })

  it('of a workbook have a point of their own, whatever its texts have', async () => {
    const rows = table(['Code', 'Resolution'], ['A', '0,01'], ['B', '0.02'])
    const marked = {
      ...rows,
      rows: rows.rows.map((row) =>
        row.row === 3 ? { ...row, marks: { 1: { number: true as const } } } : row,
      ),
    }
    const source = await sourceOf('gauges', 'supplier', marked, input)
    const cells = source.mapped.rows.map((row) => new RowCells(row, source.mapped.writing))
    expect(cells.map((each) => each.decimal('resolution'))).toEqual(['0.01', '0.02'])
  })
})

describe('a file', () => {
  it('of more rows than one import takes is refused with the mend', async () => {
    const rows = Array.from({ length: 10_001 }, (_, at) => [`G-${at}`])
    await expect(sourceOf('gauges', 'supplier', table(['Code'], ...rows), input)).rejects.toMatchObject({
      ...{
        status: 422,
        errors: [{ path: 'body.file', message: expect.stringMatching(/10,001 rows.*Split/) }],
      },
    })
  })

  it('without a row below its names is refused', async () => {
    await expect(sourceOf('gauges', 'supplier', table(['Code']), input)).rejects.toMatchObject({
      status: 422,
    })
  })

  it('is told by its own columns, and what is missing of them', async () => {
    const source = await sourceOf('gauges', 'supplier', table(['x', 'y'], ['A', 'B']), input)
    expect(source.missing).toEqual(['Gauge code'])
    const told = await sourceOf('gauges', 'supplier', table(['x', 'y'], ['A', 'B']), {
      ...input,
      ...{ headerRow: 1, columns: { code: ['B'] } },
    })
    expect(told.missing).toEqual([])
    expect(told.mapped.rows.map(({ row, cells }) => [row, cells])).toEqual([[2, { code: 'B' }]])
  })
})

describe('a workbook', () => {
  it('with a failed formula, or one without its result, is told at the cell', async () => {
    const rows = table(['Code', 'Name'], ['A', '#N/A'], ['B', ''])
    const [header, failed, empty] = rows.rows
    const marked = [
      { ...header, ...{ row: 1, cells: header?.cells ?? [] } },
      { row: 2, cells: failed?.cells ?? [], marks: { 1: { error: true as const, formula: true as const } } },
      { row: 3, cells: empty?.cells ?? [], marks: { 1: { formula: true as const } } },
    ]
    const source = await sourceOf('gauges', 'supplier', { ...rows, rows: marked }, input)
    const cells = source.mapped.rows.map((row) => new RowCells(row, source.mapped.writing))
    expect(cells.map(({ problems }) => problems.map(({ row, field }) => [row, field]))).toEqual([
      [[2, 'name']],
      [[3, 'name']],
    ])
  })

  it('never leaves half a character of a text that is cut', () => {
    expect(cut(`${'x'.repeat(39)}😀`, 40)).toBe('x'.repeat(39))
    expect(cut('😀', 40)).toBe('😀')
  })
})

describe('what rests on something else', () => {
  it('is bad with it, as far as it reaches', () => {
    const rows = [
      { row: 2, takesFrom: [2] },
      { row: 3, takesFrom: [2] },
      { row: 4, takesFrom: [3] },
      { row: 5, takesFrom: [5] },
    ]
    expect(dependentsOf(rows, new Set([2])).map(({ row }) => row)).toEqual([3, 4])
    expect(dependentsOf(rows, new Set([5]))).toEqual([])
  })

  it('is known by row when it changes', () => {
    const thing = (row: number, version: number): Planned => ({
      ...{ row, what: 'gauge', label: `G${row}`, outcome: 'changed', differences: [], notes: [] },
      restsOn: ['id', version],
    })
    const before = basisOf({ things: [thing(2, 1), thing(3, 1), thing(3, 4)] })
    expect(changedRows(before, before)).toEqual([])
    expect(changedRows(before, basisOf({ things: [thing(2, 2), thing(3, 1), thing(3, 4)] }))).toEqual([2])
    expect(changedRows(before, basisOf({ things: [thing(2, 1), thing(3, 1)] }))).toEqual([3])
    expect(changedRows(before, '')).toEqual([2, 3])
  })
})
