import ExcelJS from 'exceljs'
import type { imports } from '@evenrule/api/contract'
import { type Side } from '@evenrule/api/contract'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { startImports, type Imports } from './imports.world'
import { goodReadings } from './prepared'

let world: Imports
let task: Awaited<ReturnType<Imports['story']['task']>>
beforeAll(async () => {
  world = await startImports()
  task = await world.story.task()
}, 120_000)
afterAll(() => world.story.stop())

type Row = Record<string, string>
type Format = 'csv' | 'xlsx'

/** Downloads a template and fills its columns in by their names, as somebody would; nothing else of it is touched. */
async function filled(
  side: Side,
  kind: imports.ImportKind,
  query: { format: Format; layout?: string },
  rows: Row[],
) {
  const { supplier, customer } = world.story.organisations
  const organisation = side === 'supplier' ? supplier : customer
  const answer = await world.story
    .by(side === 'supplier' ? 'engineer' : 'quality')
    .client.send('get', `/organisations/${organisation.id}/imports/${kind}/template`)
    .query(query)
    .buffer(true)
    .parse((response, done) => {
      const pieces: Buffer[] = []
      response.on('data', (piece: Buffer) => pieces.push(piece))
      response.on('end', () => done(null, Buffer.concat(pieces)))
    })
  expect(answer.status).toBe(200)
  expect(answer.headers['content-disposition']).toContain(`.${query.format}`)
  const bytes = answer.body as Buffer
  return query.format === 'csv' ? inCsv(bytes, rows) : inWorkbook(bytes, rows)
}

function inCsv(bytes: Buffer, rows: Row[]) {
  const header = bytes.toString('utf8').replace('\ufeff', '').trimEnd().split(',')
  const lines = rows.map((row) => {
    for (const name of Object.keys(row)) expect(header).toContain(name)
    return header.map((name) => row[name] ?? '').join(',')
  })
  return { name: 'filled.csv', bytes: Buffer.concat([bytes, Buffer.from(`${lines.join('\r\n')}\r\n`)]) }
}

async function inWorkbook(bytes: Buffer, rows: Row[]) {
  const workbook = new ExcelJS.Workbook()
  await workbook.xlsx.load(bytes as never)
  expect(workbook.worksheets).toHaveLength(2)
  const [sheet, help] = workbook.worksheets
  expect(help?.getCell('A1').value).toBe('Column')
  const header = (sheet?.getRow(1).values as string[]).slice(1)
  expect(sheet?.rowCount).toBe(1)
  for (const row of rows) {
    for (const name of Object.keys(row)) expect(header).toContain(name)
    sheet?.addRow(header.map((name) => row[name] ?? ''))
  }
  return { name: 'filled.xlsx', bytes: Buffer.from(await workbook.xlsx.writeBuffer()) }
}

describe.each<Format>(['csv', 'xlsx'])('a template as %s, downloaded, filled in and uploaded', (format) => {
  it.each<[Side, 'engineer' | 'quality']>([
    ['supplier', 'engineer'],
    ['customer', 'quality'],
  ])('brings in the parts that the %s filled in, digit by digit', async (side, who) => {
    const number = `T-${format}-${side}`
    const file = await filled(side, 'parts', { format }, [
      {
        ...{ 'Part number': number, 'Part name': 'Shaft', Revision: 'A', 'Characteristic number': '3' },
        ...{
          'Characteristic name': 'diameter',
          Nominal: '24.000',
          'Lower limit': '23.9750',
          'Upper limit': '24.025',
        },
        ...{ Unit: 'mm', Class: 'safety' },
      },
      {
        'Part number': number,
        'Characteristic number': '4',
        'Characteristic name': 'run-out',
        'Upper limit': '0.02',
        Unit: 'mm',
      },
    ])
    expect(await world.apply(who, 'parts', file)).toMatchObject({
      state: 'applied',
      counts: { new: 3, badRows: 0 },
    })
    const entered = (await world.characteristicsNow(who)).filter(({ partNumber }) => partNumber === number)
    expect(
      entered.map((each) => [each.number, each.nominal, each.lowerLimit, each.upperLimit, each.class]),
    ).toEqual([
      [3, '24.000', '23.9750', '24.025', 'safety'],
      [4, null, null, '0.02', 'ordinary'],
    ])
    expect((await world.preview(who, 'parts', file)).counts).toMatchObject({
      new: 0,
      changed: 0,
      unchanged: 3,
    })
  })

  it('brings in gauges with their calibrations', async () => {
    const code = `TG-${format}`
    const cal = (at: number) => ({
      ...{ 'Certificate number': `C-${at}`, 'Calibrated on': `${at}-03-02`, 'Due on': `${at + 1}-03-02` },
      'Found within limits': 'yes',
    })
    const file = await filled('supplier', 'gauges', { format }, [
      {
        'Gauge code': code,
        'Gauge name': 'Snap gauge',
        Resolution: '0.0010',
        Unit: 'mm',
        Site: 'Hall 3',
        ...cal(2025),
      },
      { 'Gauge code': code, ...cal(2026) },
    ])
    expect(await world.apply('engineer', 'gauges', file)).toMatchObject({
      state: 'applied',
      counts: { new: 3 },
    })
    expect((await world.preview('engineer', 'gauges', file)).counts).toMatchObject({ new: 0, unchanged: 3 })
  })

  it.each(['wide', 'long'])('brings in past studies laid out %s', async (layout) => {
    const code = `TS-${format}-${layout}`
    const named = {
      ...{ 'Study code': code, 'Part number': task.part.number, 'Characteristic number': '5' },
      ...{ 'Gauge code': task.gauge.code, 'Reference standard': task.standard.code },
      ...{ 'Collected on': '2026-06-01', Appraiser: 'B' },
    }
    const rows: Row[] =
      layout === 'wide'
        ? [
            {
              ...named,
              ...Object.fromEntries(goodReadings.map((reading, at) => [`Reading ${at + 1}`, reading])),
            },
          ]
        : goodReadings.map((Reading, at) => ({ ...(at === 0 ? named : { 'Study code': code }), Reading }))
    const file = await filled('supplier', 'studies', { format, layout }, rows)
    expect(await world.apply('engineer', 'studies', file)).toMatchObject({
      ...{ state: 'applied', counts: { new: 1, badRows: 0 } },
    })
    expect((await world.preview('engineer', 'studies', file)).counts).toMatchObject({ new: 0, unchanged: 1 })
  })
})
