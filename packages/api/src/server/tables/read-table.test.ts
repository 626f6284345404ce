import { describe, expect, it } from 'vitest'
import type { TableChoice } from '../../contract/tables'
import { ProblemError } from '../errors'
import { parseTable } from './parse-table'
import { readTable } from './read-table'
import { rowsXml, sheetOf, workbookParts } from './testing/workbook'
import { zipOf } from './testing/zip'

const file = (bytes: Buffer | string, name = 'table.xlsx') => ({ name, bytes: Buffer.from(bytes) })
const read = (bytes: Buffer | string, choice: TableChoice = {}) => parseTable(file(bytes), choice)
const cells = async (bytes: Buffer, choice?: TableChoice) =>
  (await read(bytes, choice)).rows.map((row) => row.cells)
async function refusal(call: Promise<unknown>): Promise<string> {
  try {
    await call
  } catch (error) {
    if (error instanceof ProblemError && error.status < 500 && error.errors?.[0])
      return `${error.errors[0].path}: ${error.errors[0].message}`
    throw error
  }
  throw new Error('nothing was refused')
}

describe('a workbook', () => {
  it('gives text with true rows and columns, numbers as their shortest decimal', async () => {
    const table = await read(
      sheetOf(
        '<row r="2"><c r="B2" t="s"><v>0</v></c><c r="D2"><v>24.000999999999998</v></c></row>' +
          '<row r="4"><c r="A4"><v>1.5E-7</v></c><c r="B4" t="str"><f>A4</f><v>x_x0041_</v></c></row>',
        { strings: ['<r><t>Ist</t></r><r><t xml:space="preserve"> mm</t></r><rPh><t>no</t></rPh>'] },
      ),
    )
    expect(table).toMatchObject({ kind: 'xlsx', sheet: 'Data', broken: null, dialect: null })
    expect(table.rows).toEqual([
      { row: 1, cells: [] },
      { row: 2, cells: ['', 'Ist mm', '', '24.000999999999998'], marks: { 3: { number: true } } },
      { row: 3, cells: [] },
      { row: 4, cells: ['1.5e-7', 'xA'], marks: { 0: { number: true }, 1: { formula: true } } },
    ])
  })
  it('marks formulas, those of an area too, errors and days', async () => {
    const { rows } = await read(
      sheetOf(
        '<row r="1"><c r="A1"><f t="array" ref="A1:A2">B1:B2</f><v>1</v></c><c r="B1" t="e"><v>#DIV/0!</v></c></row>' +
          '<row r="2"><c r="A2"><v>2</v></c><c r="B2" s="1"><v>46309.354166666664</v></c><c r="C2" s="2"><v>0.5</v></c><c r="D2" s="3"><v>46309</v></c><c r="E2"><f>1/0</f></c></row>',
        { formats: ['yyyy\\-mm\\-dd hh:mm', '0.0000&quot;d&quot;'] },
      ),
    )
    expect(rows[0]).toMatchObject({
      cells: ['1', '#DIV/0!'],
      marks: { 0: { number: true, formula: true }, 1: { error: true } },
    })
    expect(rows[1]).toMatchObject({
      cells: ['2', '2026-10-14 08:30', '0.5', '2026-10-14', ''],
      marks: {
        0: { number: true, formula: true },
        1: { date: true },
        2: { number: true },
        3: { date: true },
        4: { formula: true },
      },
    })
  })
  it('counts days from 1904 where it says so', async () => {
    const bytes = sheetOf('<row r="1"><c r="A1" s="1"><v>44847</v></c></row>', { from1904: true })
    expect(await cells(bytes)).toEqual([['2026-10-14']])
  })
  it('has sheets, hidden ones too, of which one is chosen; the first that holds anything is read', async () => {
    const bytes = zipOf(
      workbookParts({
        sheets: [
          { name: 'Secret', rows: rowsXml([['hidden']]), state: 'veryHidden' },
          { name: 'Empty', rows: '' },
          {
            name: 'Data',
            rows: rowsXml([['seen']]),
            before: '<cols><col min="1" max="1" hidden="1"/></cols>',
          },
        ],
      }),
    )
    const table = await read(bytes)
    expect(table.sheets).toEqual([
      { name: 'Secret', hidden: true },
      { name: 'Empty', hidden: false },
      { name: 'Data', hidden: false },
    ])
    expect([table.sheet, table.rows[0]?.cells, table.hiddenColumns]).toEqual(['Data', ['seen'], ['A']])
    expect(await cells(bytes, { sheet: 'Secret' })).toEqual([['hidden']])
    expect(await refusal(read(bytes, { sheet: 'Nope' }))).toMatch(/^body.sheet: .*Secret, Empty, Data/)
  })
  it('with a character that cannot be stored names its place', async () => {
    const { broken } = await read(
      sheetOf('<row r="3"><c r="B3" t="inlineStr"><is><t>a_x0000_b</t></is></c></row>'),
    )
    expect(broken).toMatchObject({ code: 'unstorable-character', row: 3, column: 'B', text: 'a\ufffd' })
  })
})

const minimal = workbookParts({ sheets: [{ name: 'Data', rows: rowsXml([[1]]) }] })
const withPart = (name: string, content: string | Buffer, more: object = {}) =>
  zipOf([...minimal.filter((part) => part.name !== name), { name, content, ...more }])
const sheetPath = 'xl/worksheets/sheet1.xml'

describe('a workbook that is wrong', () => {
  it.each<[string, Buffer, RegExp]>([
    ['cut off', sheetOf(rowsXml([[1]])).subarray(0, 900), /ends too early/],
    ['no list of sheets', zipOf([{ name: 'docs/xl/workbook.xml', content: '' }]), /no list of its sheets/],
    ['a sheet that is missing', zipOf(minimal.filter(({ name }) => name !== sheetPath)), /missing/],
    [
      'a bomb that tells its size',
      withPart(sheetPath, Buffer.alloc(200_000_000, 32)),
      /unpacks to more than/,
    ],
    [
      'a bomb that lies',
      withPart(sheetPath, Buffer.alloc(3_000_000, 32), { declared: 10 }),
      /not what the directory says/,
    ],
    ['an overlap', zipOf([...minimal, { name: 'a', content: '', sharesBytesOf: 0 }]), /overlap/],
    ['a part twice', zipOf([...minimal, ...minimal]), /twice/],
    ['a path outside', zipOf([...minimal, { name: '../../etc/passwd', content: 'x' }]), /outside of it/],
    ['an absolute path', zipOf([...minimal, { name: '/etc/passwd', content: 'x' }]), /outside of it/],
    ['a password', withPart(sheetPath, 'x', { flags: 1 }), /password/],
    ['another packing', withPart(sheetPath, 'x', { method: 99 }), /packed in a way/],
    [
      'entities',
      withPart(
        sheetPath,
        '<!DOCTYPE w [<!ENTITY a "ha"><!ENTITY b "&a;&a;&a;">]><worksheet><sheetData><row><c t="str"><v>&b;</v></c></row></sheetData></worksheet>',
      ),
      /declares a document type/,
    ],
    ['an unknown entity', sheetOf('<row><c t="str"><v>&lol;</v></c></row>'), /cannot be read/],
    ['broken XML', sheetOf('<row><c>'), /cannot be read/],
    ['no UTF-8', withPart(sheetPath, Buffer.from([0x3c, 0x61, 0xff, 0xfe, 0x3e])), /cannot be read/],
    ['a text it does not hold', sheetOf('<row><c t="s"><v>7</v></c></row>'), /cannot be read/],
    ['a cell in another row', sheetOf('<row r="1"><c r="A2"><v>1</v></c></row>'), /not in its place/],
    [
      'a cell twice',
      sheetOf('<row r="1"><c r="A1"><v>1</v></c><c r="A1"><v>2</v></c></row>'),
      /not in its place/,
    ],
    ['a row twice', sheetOf('<row r="1"/><row r="1"/>'), /follows row 1/],
    ['too many rows', sheetOf('<row r="200001"><c><v>1</v></c></row>'), /at most 200,000 rows/],
    ['too many columns', sheetOf('<row r="1"><c r="XFD1"><v>1</v></c></row>'), /16,384 columns; at most 500/],
    [
      'too many parts',
      zipOf([...minimal, ...Array.from({ length: 2000 }, (_e, at) => ({ name: `p${at}`, content: '' }))]),
      /2,007 parts/,
    ],
    [
      'one long text in every cell',
      sheetOf(
        rowsXml([[]]) +
          Array.from({ length: 300 }, () => `<row>${'<c t="s"><v>0</v></c>'.repeat(10)}</row>`).join(''),
        { strings: [`<t>${'x'.repeat(32_000)}</t>`] },
      ),
      /more than is read at once/,
    ],
  ])('is refused: %s', async (_name, bytes, message) => {
    expect(await refusal(read(bytes))).toMatch(/^body.file: /)
    expect(await refusal(read(bytes))).toMatch(message)
  })
})

describe('what is no table', () => {
  const ole = (stream: string) =>
    Buffer.concat([Buffer.from('d0cf11e0a1b11ae1', 'hex'), Buffer.alloc(600), Buffer.from(stream, 'utf16le')])
  it.each<[string, Buffer | string, RegExp]>([
    ['nothing', '', /is empty/],
    ['an old workbook', ole('Workbook'), /old binary workbook \(XLS\).*Save it as XLSX or CSV/],
    ['a workbook with a password', ole('EncryptedPackage'), /with a password.*without a password/],
    ['an old document', ole('WordDocument'), /old office document/],
    [
      'an OpenDocument sheet',
      zipOf([{ name: 'mimetype', content: 'application/vnd.oasis.opendocument.spreadsheet', method: 0 }]),
      /\(ODS\)/,
    ],
    ['a document', zipOf([{ name: 'word/document.xml', content: '' }]), /DOCX/],
    ['macros', zipOf([...minimal, { name: 'xl/vbaProject.bin', content: '' }]), /XLSM/],
    ['a binary workbook', zipOf([{ name: 'xl/workbook.bin', content: '' }]), /XLSB/],
    ['another ZIP', zipOf([{ name: 'a.csv', content: '1' }]), /a ZIP file.*Unpack/],
    ['a PDF', '%PDF-1.7\n', /a PDF file.*Export/],
    ['a picture', Buffer.from('89504e470d0a1a0a', 'hex'), /a PNG picture/],
    ['a photograph', Buffer.from('ffd8ffe0', 'hex'), /a JPEG picture/],
    ['a web page', '\n<html><table><tr><td>1</td></tr></table></html>', /a web page \(HTML\)/],
    [
      'an XML spreadsheet',
      '<?xml version="1.0"?><Workbook xmlns="urn:schemas-microsoft-com:office:spreadsheet"/>',
      /XML spreadsheet of 2003/,
    ],
    ['JSON', '{"readings": [1, 2]}', /JSON/],
    ['a program', Buffer.from('MZ\u0090\u0000'), /a program/],
    [
      'bytes',
      Buffer.from(Array.from({ length: 500 }, (_e, at) => (at * 7) % 29)),
      /neither text nor a workbook/,
    ],
    ['a million columns', `${'1;'.repeat(1_000_000)}1\n`, /1,000,001 columns; at most 500/],
    ['a million rows', '1\n'.repeat(1_000_000), /at most 200,000 rows/],
  ])('is refused: %s', async (_name, bytes, message) => expect(await refusal(read(bytes))).toMatch(message))
})

describe('a text', () => {
  it('is told by its content, whatever its name says', async () => {
    const table = await read('Nr;Wert\n1;24,001\n')
    expect(table).toMatchObject({
      ...{ kind: 'csv', contentType: 'text/csv', sheets: [], sheet: null },
      dialect: { encoding: 'utf-8', separator: 'semicolon' },
      rows: [
        { row: 1, cells: ['Nr', 'Wert'] },
        { row: 2, cells: ['1', '24,001'] },
      ],
    })
  })
  it('in UTF-16 is known without a byte order mark too', async () => {
    const text = 'Nr\tWert\n1\t24,001\n2\t24,002\n'
    const swapped = Buffer.from(text, 'utf16le').swap16()
    for (const bytes of [Buffer.from(text, 'utf16le'), swapped]) {
      const table = await read(bytes)
      expect(table.dialect).toMatchObject({ encoding: 'utf-16', byteOrderMark: false, separator: 'tab' })
      expect(table.rows[1]?.cells).toEqual(['1', '24,001'])
    }
  })
})

describe('a large table', () => {
  it('is read on a thread of its own, with the same outcome and the same refusals', async () => {
    const text = Array.from({ length: 20_000 }, (_each, at) => `${at};24,${at}`).join('\n')
    const there = await readTable(file(text))
    expect(there).toEqual(await parseTable(file(text)))
    const workbook = sheetOf(rowsXml(Array.from({ length: 9_000 }, (_each, at) => [at, 24 + at / 1000])))
    expect(await readTable(file(workbook))).toEqual(await parseTable(file(workbook)))
    expect(await refusal(readTable(file('1\n'.repeat(300_000))))).toMatch(/at most 200,000 rows/)
  })
})
