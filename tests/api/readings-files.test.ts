import { createHash } from 'node:crypto'
import excel from 'exceljs'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { studies } from '@evenrule/api/contract'
import { rowsXml, sheetOf, workbookParts } from '../../packages/api/src/server/tables/testing/workbook'
import { zipOf } from '../../packages/api/src/server/tables/testing/zip'
import { goodReadings, startStory, type Story } from './prepared'

let story: Story
beforeAll(async () => {
  story = await startStory()
})
afterAll(() => story.stop())

interface Sent {
  name: string
  bytes: Buffer
}
let counter = 0
const engineer = () => story.by('engineer')
const path = (studyId: string) => `/organisations/${story.organisations.supplier.id}/studies/${studyId}`
async function register(more: object = {}) {
  const task = await story.task()
  return engineer().call(
    studies.registerStudy,
    {},
    {
      body: {
        ...{ code: `RF-${(counter += 1)}`, taskIds: [task.id], standardId: task.standard.id },
        ...{ plannedReadings: 15, unit: 'mm', measuredAs: 'value', ...more },
      },
    },
  )
}
const preview = (studyId: string, file: Sent, body: object = {}) =>
  engineer().call(studies.previewReadings, { studyId }, { body: { source: 'uploaded', ...body }, file })
const store = (study: studies.Study, file: Sent, more: object = {}) =>
  engineer().call(
    studies.storeReadings,
    { studyId: study.id },
    {
      body: {
        ...{ source: 'uploaded', expectedVersion: study.rowVersion, complete: true },
        ...{ collectedOn: '2026-11-02', appraiser: 'A', takenBy: [story.people.engineer.id], ...more },
      },
      file,
    },
  )
const download = async (address: string) =>
  Buffer.from(
    (
      await engineer()
        .client.send('get', address)
        .buffer(true)
        .parse((response, done) => {
          const pieces: Buffer[] = []
          response.on('data', (piece: Buffer) => pieces.push(piece))
          response.on('end', () => done(null, Buffer.concat(pieces)))
        })
        .expect(200)
    ).body as Buffer,
  )
async function refusal(call: Promise<unknown>) {
  try {
    await call
  } catch (error) {
    const { status, problem } = error as {
      status: number
      problem: { errors?: { path: string; message: string; row?: number; column?: string }[] }
    }
    return { status, ...problem.errors?.[0] }
  }
  throw new Error('nothing was refused')
}
const numbers = goodReadings.map(Number)
const workbook = (bytes: Buffer, name = 'readings.xlsx'): Sent => ({ name, bytes })

describe('a workbook of readings', () => {
  const two = workbook(
    zipOf(
      workbookParts({
        sheets: [
          {
            name: 'Cover',
            rows: rowsXml([
              ['Bore gauge', 'BG-14'],
              ['No numbers', 'here'],
            ]),
          },
          {
            name: 'Data',
            rows: rowsXml([
              ['Part', 'Trial 1', 'Trial 2', 'Trial 3', 'Mean'],
              ...Array.from({ length: 5 }, (_each, at) => [
                `part ${at + 1}`,
                ...numbers.slice(at * 3, at * 3 + 3),
                24,
              ]),
            ]),
          },
          { name: 'Old', rows: rowsXml([['Reading'], [25.5]]), state: 'hidden' },
        ],
      }),
    ),
  )
  it('is read from the sheet that holds readings, wide, row by row; kept byte for byte, and read again the same', async () => {
    const study = await register()
    const seen = await preview(study.id, two)
    expect(seen.readAs).toMatchObject({
      ...{ kind: 'xlsx', sheet: 'Data', layout: 'wide', columns: ['B', 'C', 'D'], headerRows: 1 },
      ...{ encoding: null, separator: null },
    })
    expect(seen.sheets.map(({ name, hidden }) => [name, hidden])).toEqual([
      ['Cover', false],
      ['Data', false],
      ['Old', true],
    ])
    expect(seen.readings.map(({ value }) => value)).toEqual(numbers)
    expect(seen.readings[3]).toEqual({ row: 3, column: 'B', text: '24.0005', value: 24.0005 })
    const stored = await store(study, two, { sheet: 'Data' })
    expect(stored.data[0]?.values).toEqual(numbers)
    expect(stored.data[0]?.file).toMatchObject({
      contentType: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
      sha256: createHash('sha256').update(two.bytes).digest('hex'),
    })
    const kept = await download(`${path(study.id)}/readings/1/file`)
    expect(kept.equals(two.bytes)).toBe(true)
    const { sheet, layout, columns, headerRows, decimal } = stored.data[0]?.readAs as studies.ReadAs
    const again = await preview(study.id, workbook(kept), { sheet, layout, columns, headerRows, decimal })
    expect(again.readings.map(({ value }) => value)).toEqual(numbers)
  })
  it('is read as last time: the sheet and columns that were chosen are remembered, for this organisation alone', async () => {
    const rows = rowsXml([['Nr', 'Left', 'Right'], ...numbers.map((value, at) => [at + 1, value + 1, value])])
    const file = workbook(
      zipOf(
        workbookParts({
          sheets: [
            {
              name: 'A',
              rows: rowsXml([
                ['x', 'y'],
                [1, 2.5],
              ]),
            },
            { name: 'B', rows },
          ],
        }),
      ),
    )
    const study = await register()
    expect((await preview(study.id, file)).readAs.sheet).toBe('A')
    const chosen = { sheet: 'B', layout: 'long', columns: ['C'] }
    const seen = await preview(study.id, file, chosen)
    expect([seen.remembered, seen.readAs.columnNames]).toEqual([false, ['Right']])
    await store(study, file, { ...chosen, headerRows: 1 })
    const other = await register()
    const recalled = await preview(other.id, file)
    expect(recalled.remembered).toBe(true)
    expect(recalled.readAs).toMatchObject({ sheet: 'B', columns: ['C'], layout: 'long' })
    const csv = { name: 'same.csv', bytes: Buffer.from('Nr;left;RIGHT\n1;25,1;24,1\n2;25,2;24,2\n') }
    expect(await preview(other.id, csv)).toMatchObject({ remembered: true, readAs: { columns: ['C'] } })
    expect(await preview(other.id, csv, { asRemembered: false })).toMatchObject({
      ...{ remembered: false, readAs: { columns: ['B'] } },
    })
    // Choosing what is found anyway forgets.
    await store(other, csv, { layout: 'long', columns: ['B'] })
    expect((await preview((await register()).id, csv)).remembered).toBe(false)
    const { rows: left } = await story.harness.owner.query('select distinct purpose from column_mappings')
    expect(left).toEqual([{ purpose: 'readings.sheet' }])
  })
  it('with cells that are no readings names each: formulas, errors, days, text, a mean', async () => {
    const study = await register()
    const bytes = sheetOf(
      '<row r="1"><c t="inlineStr"><is><t>Nr</t></is></c><c t="inlineStr"><is><t>Reading</t></is></c></row>' +
        '<row r="2"><c><v>1</v></c><c><v>24.0001</v></c></row>' +
        '<row r="3"><c><v>2</v></c><c><f>B2+0.001</f><v>24.0011</v></c></row>' +
        '<row r="4"><c><v>3</v></c><c t="e"><v>#DIV/0!</v></c></row>' +
        '<row r="5"><c><v>4</v></c><c s="1"><v>46309</v></c></row>' +
        '<row r="6"><c><v>5</v></c><c t="inlineStr"><is><t>24,0002</t></is></c></row>' +
        '<row r="7"><c t="inlineStr"><is><t>Mean</t></is></c><c><f>AVERAGE(B2:B6)</f><v>24.0002</v></c></row>',
    )
    const seen = await preview(study.id, workbook(bytes))
    expect(seen.errors.map(({ row, column, code }) => `${column}${row} ${code}`)).toEqual([
      'B3 formula',
      'B4 error-value',
      'B5 date-in-cell',
      'B7 summary-row',
    ])
    expect(seen.errors[0]?.message).toContain('paste them as values')
    // A number needs no decimal mark; a text beside it is read with its comma.
    expect(seen.readings.map(({ value }) => value)).toEqual([24.0001, 24.0002])
    expect(await refusal(store(study, workbook(bytes)))).toMatchObject({ status: 422, row: 3, column: 'B' })
  })
  it('says what is hidden, and refuses columns and sheets that are not there', async () => {
    const study = await register()
    const rows = rowsXml([['Reading'], ...numbers.map((value) => [value])]).replace(
      'r="3"',
      'r="3" hidden="1"',
    )
    const file = workbook(sheetOf(rows))
    expect((await preview(study.id, file)).notes.map(({ code }) => code)).toContain('hidden-cells')
    expect(await refusal(preview(study.id, file, { columns: ['F'] }))).toMatchObject({ path: 'body.columns' })
    expect(await refusal(preview(study.id, file, { columns: ['A', 'A'] }))).toMatchObject({
      path: 'body.columns',
    })
    expect(await refusal(preview(study.id, file, { sheet: 'Nope' }))).toMatchObject({ path: 'body.sheet' })
  })
  it('of 50 MB is refused before it is read', async () => {
    const study = await register()
    const large = workbook(Buffer.alloc(50_000_000, 'PK'))
    expect(await refusal(preview(study.id, large))).toMatchObject({ status: 413 })
  })
})

describe('a run sheet that comes back', () => {
  const slots = ['08:00', '=1+1', '1/2']
  const readings = numbers.slice(0, 6)
  async function sheetOfStudy() {
    const study = await register({ plannedReadings: 6, slots })
    return { study, bytes: await download(`${path(study.id)}/run-sheet.xlsx`) }
  }
  async function filled(bytes: Buffer, values: readonly (number | null)[]) {
    const book = new excel.Workbook()
    await book.xlsx.load(bytes as unknown as Parameters<typeof book.xlsx.load>[0])
    const sheet = book.getWorksheet('Run sheet')
    if (!sheet) throw new Error('There is no run sheet.')
    for (const [at, value] of values.entries()) sheet.getCell(at + 4, 3).value = value
    return { book, sheet, bytes: Buffer.from(await book.xlsx.writeBuffer()) }
  }
  it('as XLSX, saved again by another program, gives the same readings', async () => {
    const { study, bytes } = await sheetOfStudy()
    const { sheet, bytes: back } = await filled(bytes, readings)
    expect(sheet.views[0]).toMatchObject({ state: 'frozen', ySplit: 3 })
    expect(sheet.getCell('B4').type).toBe(excel.ValueType.String)
    const seen = await preview(study.id, workbook(back))
    expect(seen).toMatchObject({ errorCount: 0, notes: [], remembered: false })
    expect(seen.readAs).toMatchObject({ columns: ['C'], columnNames: ['Reading (mm)'], headerRows: 3 })
    const stored = await store(study, workbook(back))
    expect(stored.data[0]?.values).toEqual(readings)
    // It now stands with its readings, to be corrected.
    const again = await filled(await download(`${path(study.id)}/run-sheet.xlsx`), [])
    expect([4, 9].map((row) => again.sheet.getCell(row, 3).value)).toEqual([readings[0], readings[5]])
  })
  it('half filled keeps its readings, and the same sheet filled further adds the rest alone', async () => {
    const { study, bytes } = await sheetOfStudy()
    const half = await filled(bytes, readings.slice(0, 2))
    const first = await store(study, workbook(half.bytes), { complete: false })
    expect(first.data[0]?.values).toEqual(readings.slice(0, 2))
    const wrong = await filled(bytes, [1, ...readings.slice(1)])
    expect(await refusal(preview(study.id, workbook(wrong.bytes), { append: true }))).toMatchObject({
      ...{ status: 422, path: 'body.file', row: 4, column: 'C' },
    })
    const whole = await filled(await download(`${path(study.id)}/run-sheet.xlsx`), readings)
    expect((await preview(study.id, workbook(whole.bytes), { append: true })).readings).toHaveLength(4)
    const second = await store(first, workbook(whole.bytes), { append: true })
    expect(second.data[0]?.values).toEqual(readings)
  })
  it.each([
    ['semicolon', ';', ','],
    ['comma', ',', '.'],
    ['tab', '\t', '.'],
  ])(
    'as CSV with %s, saved by a spreadsheet, gives the same readings',
    async (separator, character, decimal) => {
      const study = await register({ plannedReadings: 6, slots })
      const text = (await download(`${path(study.id)}/run-sheet.csv?separator=${separator}`)).toString()
      expect(text).toContain(`'=1+1`)
      // As a spreadsheet writes it: every row as wide as the widest, line ends and encoding of its own.
      const lines = text.slice(1).trimEnd().split('\r\n')
      const saved = lines.map((line, at) => {
        const cells = line.split(character)
        while (cells.length < 4) cells.push('')
        if (at >= 3) cells[2] = String(readings[at - 3]).replace('.', decimal)
        return cells.join(character)
      })
      const file = { name: 'sheet.csv', bytes: Buffer.from(`${saved.join('\r\n')}\r\n`, 'latin1') }
      expect((await preview(study.id, file)).errors).toEqual([])
      expect((await store(study, file)).data[0]?.values).toEqual(readings)
    },
  )
  it('of another study is refused, saying whose it is', async () => {
    const [one, two] = [await sheetOfStudy(), await register()]
    const { bytes } = await filled(one.bytes, readings)
    for (const call of [preview(two.id, workbook(bytes)), store(two, workbook(bytes))])
      expect(await refusal(call)).toMatchObject({
        ...{ status: 422, path: 'body.file', row: 1, column: 'A' },
        message: expect.stringContaining(`run sheet of study ${one.study.code}`),
      })
  })
})
