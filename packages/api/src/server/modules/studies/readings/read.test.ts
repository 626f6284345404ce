import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { ReadingsInput } from '../../../../contract/readings'
import { ProblemError } from '../../../errors'
import { readTextFile, readText } from '../../../tables/csv/read-text'
import { readReadings } from './read'
import { readingsOf, type ReadReadings } from './take'

const paste = (text: string, more: Partial<ReadingsInput> = {}) => {
  const input = { source: 'pasted' as const, ...more }
  const separator = input.separator ?? (input.source === 'typed' ? 'none' : undefined)
  return readingsOf(readText(text, separator), input)
}
const upload = (content: string | Buffer, more: Partial<ReadingsInput> = {}) => {
  const file = { name: 'bore.csv', bytes: Buffer.from(content) }
  return readingsOf(readTextFile(file, more), { source: 'uploaded', ...more })
}
const values = (read: ReadReadings) => read.readings.map(({ value }) => value)
const texts = (read: ReadReadings) => read.readings.map(({ text }) => text)
const codes = (read: ReadReadings) => read.notes.map(({ code }) => code)
const places = (read: ReadReadings) => read.errors.map(({ row, column, code }) => `${column}${row} ${code}`)
function problem(act: () => unknown): { path: string; message: string } {
  try {
    act()
  } catch (error) {
    return firstOf(error)
  }
  throw new Error('nothing was refused')
}
const refusal = (act: Promise<unknown>) =>
  act.then(() => {
    throw new Error('nothing was refused')
  }, firstOf)
function firstOf(error: unknown): { path: string; message: string } {
  if (error instanceof ProblemError && error.errors?.[0]) return error.errors[0]
  throw error
}

describe('one column', () => {
  it('of numbers with a point is read without any help', () => {
    const read = paste('24.001\n23.999\n24.000\n')
    expect(values(read)).toEqual([24.001, 23.999, 24])
    expect(texts(read)).toEqual(['24.001', '23.999', '24.000'])
    expect(read.readAs).toEqual({
      kind: 'csv',
      sheet: null,
      encoding: 'utf-8',
      byteOrderMark: false,
      separator: 'none',
      decimal: 'point',
      layout: 'long',
      headerRows: 0,
      columns: ['A'],
      columnNames: [null],
    })
    expect([read.errors, read.notes]).toEqual([[], []])
  })
  it('with a decimal comma is one column and not two, and the answer says so', () => {
    const read = paste('24,001\n23,999\n24,000')
    expect(values(read)).toEqual([24.001, 23.999, 24])
    expect(read.readAs).toMatchObject({ separator: 'none', decimal: 'comma' })
    expect(codes(read)).toEqual(['comma-read-as-decimal'])
  })
  it('with a decimal comma stays one column when one cell is wrong or has a unit', () => {
    const read = paste('24,001\n24,0O1\n23,999 mm\n24,002')
    expect(values(read)).toEqual([24.001, 24.002])
    expect(places(read)).toEqual(['A2 not-a-number', 'A3 unit-in-cell'])
    expect(read.errors[1]?.message).toContain('Write 23,999 alone')
  })
  it('keeps the rows of a spreadsheet when lines are empty', () => {
    const read = paste('Reading\n\n24.001\n\nx\n24.002\n\n\n')
    expect(read.readings.map(({ row }) => row)).toEqual([3, 6])
    expect(places(read)).toEqual(['A5 not-a-number'])
  })
  it('may hold true minus signs, signs, exponents and bare fractions', () => {
    expect(values(paste('\u22120.002\n+0.001\n1e-3\n.5\n5.\n-0'))).toEqual([-0.002, 0.001, 0.001, 0.5, 5, 0])
  })
  it.each(['\n', '\r\n', '\r'])('may end its lines with %j', (end) => {
    expect(values(paste(['24.001', '24.002', '24.003'].join(end)))).toEqual([24.001, 24.002, 24.003])
  })
  it('does not take a mistyped first reading for a heading', () => {
    expect(places(paste('24.0O1\n24.002\n24.003'))).toEqual(['A1 not-a-number'])
  })
})

describe('typed readings', () => {
  it('are one per line and never split at commas', () => {
    const read = paste('1,24\n2,24\n3,25', { source: 'typed' })
    expect(values(read)).toEqual([1.24, 2.24, 3.25])
    expect(codes(read)).toEqual([])
  })
})

describe('several columns', () => {
  it('with semicolons and a decimal comma, headed, give the named column', () => {
    const read = upload('Nr;Messwert [mm];Prüfer\n1;24,001;A\n2;23,999;A\n')
    expect(values(read)).toEqual([24.001, 23.999])
    expect(read.readAs).toMatchObject({
      separator: 'semicolon',
      decimal: 'comma',
      headerRows: 1,
      columns: ['B'],
      columnNames: ['Messwert [mm]'],
    })
    expect(codes(read)).toEqual([])
  })
  it('with commas and points, headed or not', () => {
    expect(values(paste('no,reading\n1,24.001\n2,23.999'))).toEqual([24.001, 23.999])
    expect(values(paste('1,24.001\n2,23.999\n3,24.002'))).toEqual([24.001, 23.999, 24.002])
  })
  it('with commas and whole numbers are told from decimals by their heading', () => {
    const read = paste('Nr,Reading\n1,24\n2,25\n3,24')
    expect(values(read)).toEqual([24, 25, 24])
    expect(codes(read)).toContain('comma-read-as-separator')
  })
  it('with commas and whole numbers are told from decimals by a column that counts', () => {
    const read = paste('1,24\n2,25\n3,24\n4,24')
    expect(values(read)).toEqual([24, 25, 24, 24])
    expect(codes(read)).toContain('comma-read-as-separator')
  })
  it('with quoted decimal commas between commas', () => {
    const read = upload('Nr,Reading\n1,"24,001"\n2,"23,999"\n')
    expect(values(read)).toEqual([24.001, 23.999])
    expect(read.readAs).toMatchObject({ separator: 'comma', decimal: 'comma', columns: ['B'] })
  })
  it('with commas in both roles are joined where the heading proves it, and the answer says so', () => {
    const read = paste('Nr,Reading\n1,24,001\n2,23,999\n3,24,000')
    expect(values(read)).toEqual([24.001, 23.999, 24])
    expect(codes(read)).toContain('comma-both')
    // Sent back as named, it is read the same.
    const again = paste('Nr,Reading\n1,24,001\n2,23,999\n3,24,000', {
      separator: read.readAs.separator ?? undefined,
      decimal: read.readAs.decimal,
      columns: ['B'],
      headerRows: 1,
    })
    expect(values(again)).toEqual([24.001, 23.999, 24])
  })
  it('with commas in both roles are joined where a column counts and fractions begin with zero', () => {
    expect(values(paste('1,24,001\n2,23,999\n3,24,002'))).toEqual([24.001, 23.999, 24.002])
  })
  it('pasted from a spreadsheet come with tabs', () => {
    const read = paste('Time\tReading\tBy\n08:00\t24,001\tA\n08:10\t23,999\tA')
    expect(values(read)).toEqual([24.001, 23.999])
    expect(read.readAs).toMatchObject({ separator: 'tab', decimal: 'comma', columns: ['B'] })
  })
  it('keep their places when the first cell of a row is empty', () => {
    expect(values(paste('Reading\tNote\n\tlost\n24.001\t\n24.002\tok'))).toEqual([24.001, 24.002])
    expect(places(paste('\t24.001\nx\t\n\t24.002\n'))).toEqual(['B2 empty'])
  })
  it('without names offer a choice, which is obeyed', () => {
    const text = '24.001;24.101\n24.002;24.102'
    const read = paste(text)
    expect([values(read), codes(read)]).toEqual([[24.001, 24.002], ['column-chosen']])
    expect(values(paste(text, { columns: ['B'] }))).toEqual([24.101, 24.102])
    expect(read.columns).toEqual([
      { letter: 'A', name: null, numbers: 2, chosen: true },
      { letter: 'B', name: null, numbers: 2, chosen: false },
    ])
    expect(problem(() => paste(text, { columns: ['D'] }))).toMatchObject({ path: 'body.columns' })
  })
  it('are taken from beside a column that counts, also where most of them are wrong', () => {
    const read = paste('Nr;Wert\n1;24,001\n2;lost\n3;1.024,5\n4;-')
    expect(read.readAs.columns).toEqual(['B'])
    expect(places(read)).toEqual(['B3 not-a-number', 'B4 thousands-separator', 'B5 not-a-number'])
    expect(paste('Nr;x\n1;24,001\n3;24,002').readAs.columns).toEqual(['B'])
  })
  it('may stand under a title, a day and units, which are passed over', () => {
    const read = upload('Bore gauge BG-14\nDay;2026-11-02\nNr;Reading\n;mm\n1;24,001\n2;24,002\n')
    expect(values(read)).toEqual([24.001, 24.002])
    expect(read.readAs).toMatchObject({ headerRows: 4, columnNames: ['Reading'] })
    expect(codes(read)).toEqual(['rows-passed-over'])
  })
  it('may have empty cells and rows at the end', () => {
    const read = upload('Nr;Reading;;;\r\n1;24,001;;;\r\n2;24,002;;;\r\n;;;;\r\n;;;;\r\n')
    expect([values(read), read.errors, read.rows]).toEqual([[24.001, 24.002], [], 3])
  })
  it('may be a run sheet of which the last rows are still empty', () => {
    const read = upload('No.;Position;Reading (mm)\n1;90°;24,001\n2;0°;24,002\n3;270°;\n4;180°;\n')
    expect([values(read), read.errors]).toEqual([[24.001, 24.002], []])
    expect(read.notes).toMatchObject([
      { code: 'empty-at-end', message: expect.stringContaining('last 2 rows') },
    ])
  })
  it('may say their separator in a first line', () => {
    const read = upload('sep=;\nReading;Note\n24,001;a\n24,002;b')
    expect(values(read)).toEqual([24.001, 24.002])
    expect(read.readings[0]?.row).toBe(3)
  })
  it('do not take a mean below the readings for a reading', () => {
    const read = paste('1\t24.001\n2\t24.003\nMean\t24.002')
    expect(values(read)).toEqual([24.001, 24.003])
    expect(places(read)).toEqual(['B3 summary-row'])
    expect(read.mayLeaveOut).toBe(true)
  })
})

describe('one row', () => {
  it('of numbers is read from left to right, past its label', () => {
    const read = paste('Reading\t24.001\t24.002\t24.003')
    expect(values(read)).toEqual([24.001, 24.002, 24.003])
    expect(read.readAs).toMatchObject({ layout: 'wide' })
    expect(codes(read)).toEqual(['read-across'])
  })
  it('names the column of a bad cell', () => {
    expect(places(paste('24.001\t24.0O2\t24.003'))).toEqual(['B1 not-a-number'])
  })
})

describe('encodings', () => {
  const latin = (text: string) => Buffer.from(text, 'latin1')
  it('are told apart: Latin-1 with µ and ±', () => {
    const read = upload(latin('Nr;Abweichung [µm] ±\n1;0,2\n2;-0,1\n'))
    expect(values(read)).toEqual([0.2, -0.1])
    expect(read.readAs).toMatchObject({ encoding: 'windows-1252', columnNames: ['Abweichung [µm] ±'] })
    expect(codes(read)).toEqual(['read-as-latin-1'])
  })
  it('are told apart: what only Windows-1252 has', () => {
    const read = upload(Buffer.from([0x80, 0x20, 0x96, 0x0a, 0x31, 0x2e, 0x35, 0x0a]))
    expect(read.firstRows[0]?.cells).toEqual(['€ –'])
  })
  it('are told apart: UTF-8 with and without a byte order mark', () => {
    expect(upload('Wert µm\n0,2\n').readAs).toMatchObject({ encoding: 'utf-8', columnNames: ['Wert µm'] })
    const marked = upload('\ufeffReading\n24.001\n')
    expect(marked.readAs).toMatchObject({ encoding: 'utf-8', byteOrderMark: true, columnNames: ['Reading'] })
    expect(values(upload('\ufeff24.001\n24.002'))).toEqual([24.001, 24.002])
  })
  it('are told apart: UTF-16 with tabs, as spreadsheets save text', () => {
    const read = upload(Buffer.from('\ufeffNr\tReading\n1\t24,001\n2\t24,002\n', 'utf16le'))
    expect(values(read)).toEqual([24.001, 24.002])
    expect(read.readAs).toMatchObject({ encoding: 'utf-16', separator: 'tab' })
  })
  it('may be chosen, and are refused where the bytes are not of it', () => {
    expect(upload(latin('Wert µ\n1,5'), { encoding: 'windows-1252' }).readAs.columnNames).toEqual(['Wert µ'])
    expect(problem(() => upload(latin('Wert µ\n1,5'), { encoding: 'utf-8' })).path).toBe('body.encoding')
  })
})

describe('bad cells', () => {
  it.each([
    ['1.234,5', 'thousands-separator', '1234,5'],
    ['1 234,5', 'thousands-separator', '1234,5'],
    ['1.234.567', 'thousands-separator', '1234567'],
    ["12'345,6", 'thousands-separator', '12345,6'],
    ['24.001', 'other-decimal-mark', '24,001'],
    ['24,001 mm', 'unit-in-cell', '24,001'],
    ['#DIV/0!', 'not-a-number', '24,025'],
    ['=24,001', 'not-a-number', '24,025'],
    ['NaN', 'not-a-number', '24,025'],
    ['24,00,1', 'not-a-number', '24,025'],
    ['1e999', 'too-large', 'exponent'],
    ['0,' + '1'.repeat(50), 'too-long', '40'],
  ])('such as %s are %s, with a mend that names %s', (cell, code, mend) => {
    const read = paste(`a;24,001\nb;24,002\nc;${cell}\nd;24,003`)
    expect(places(read)).toEqual([`B3 ${code}`])
    expect(read.errors[0]?.message).toContain(mend)
    expect(values(read)).toEqual([24.001, 24.002, 24.003])
  })
  it('are named where a quote never ends', () => {
    const read = paste('a;24.001\nb;"24.002\nc;24.003')
    expect(places(read)).toEqual(['B2 broken-quotes'])
    expect([read.readings, read.mayLeaveOut]).toEqual([[], false])
  })
  it.each([
    ['U+0000', 'a;24.001\nb\u0000;24.002', 'A2'],
    ['half a pair', 'a;24.001\nb;24.002\ud83d', 'B2'],
  ])('with %s are refused at their place, and nothing may be left out', (_name, text, place) => {
    const read = paste(text)
    expect(places(read)).toEqual([`${place} unstorable-character`])
    expect([read.readings, read.mayLeaveOut]).toEqual([[], false])
    expect(read.errors[0]?.text).not.toMatch(/[\0\ud800-\udfff]/)
  })
  it('are everything in a text without numbers', () => {
    expect(places(paste('no\nnumbers'))).toEqual(['A1 not-a-number', 'A2 not-a-number'])
  })
})

describe('what is no text', () => {
  const send = (bytes: Buffer) => readReadings({ source: 'uploaded' }, { name: 'bore.csv', bytes })
  it.each([
    ['a PDF', Buffer.from('%PDF-1.4\n'), 'PDF'],
    ['an empty file', Buffer.alloc(0), 'empty'],
  ])('is refused: %s', async (_name, bytes, word) => {
    expect(await refusal(send(bytes))).toMatchObject({
      path: 'body.file',
      message: expect.stringContaining(word),
    })
  })
  it('is refused: nothing, and both at once', async () => {
    const nothing = (text?: string) =>
      refusal(readReadings({ source: 'typed', ...(text ? { text } : {}) }, undefined))
    expect((await nothing()).path).toBe('body.text')
    expect((await nothing('  \n ')).path).toBe('body.text')
    const both = readReadings({ source: 'uploaded', text: '1' }, { name: 'a', bytes: Buffer.from('1') })
    expect(await refusal(both)).toMatchObject({ path: 'body.text' })
  })
  it('is refused: more than 100,000 readings', () => {
    expect(paste('1.5\n'.repeat(100_000)).readings).toHaveLength(100_000)
    expect(problem(() => paste('1.5\n'.repeat(100_001))).message).toContain('100,001 readings')
  })
})

describe('every dialect', () => {
  const dialect = fc.record({
    separator: fc.constantFrom(';', '\t', ','),
    comma: fc.boolean(),
    header: fc.boolean(),
    quoted: fc.boolean(),
    end: fc.constantFrom('\n', '\r\n'),
    mark: fc.constantFrom('none', 'bom', 'latin1', 'utf16'),
    trailing: fc.boolean(),
  })
  const reading = fc.tuple(fc.boolean(), fc.nat(99), fc.integer({ min: 0, max: 999 }))
  it('gives back the readings that were written in it', () => {
    fc.assert(
      fc.property(dialect, fc.array(reading, { minLength: 3, maxLength: 40 }), (how, numbers) => {
        const decimal = how.comma ? ',' : '.'
        const written = numbers.map(
          ([negative, whole, thousandths]) =>
            `${negative ? '-' : ''}${whole}${decimal}${String(thousandths).padStart(3, '0')}`,
        )
        // A decimal comma between commas is only readable inside quotes.
        const quote = how.quoted || (how.comma && how.separator === ',') ? '"' : ''
        const rows = written.map((text, at) => [String(at + 1), `${quote}${text}${quote}`, 'größe µ'])
        const lines = (how.header ? [['Nr', 'Reading', 'Note'], ...rows] : rows).map(
          (row) => row.join(how.separator) + (how.trailing ? how.separator : ''),
        )
        const text = lines.join(how.end) + how.end
        const bytes = {
          none: Buffer.from(text),
          bom: Buffer.from(`\ufeff${text}`),
          latin1: Buffer.from(text, 'latin1'),
          utf16: Buffer.from(`\ufeff${text}`, 'utf16le'),
        }[how.mark]
        const read = upload(bytes)
        expect(read.errors).toEqual([])
        expect(texts(read)).toEqual(written)
        expect(values(read)).toEqual(written.map((each) => Number(each.replace(',', '.')) + 0))
      }),
      { numRuns: 500 },
    )
  })
  it('never throws anything but a refusal, whatever the bytes', () => {
    fc.assert(
      fc.property(fc.uint8Array({ maxLength: 300 }), (bytes) => {
        try {
          upload(Buffer.from(bytes))
        } catch (error) {
          expect(error).toBeInstanceOf(ProblemError)
        }
      }),
      { numRuns: 500 },
    )
  })
})
