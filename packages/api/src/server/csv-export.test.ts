import { describe, expect, it } from 'vitest'
import { csvText } from './csv-export'

describe('CSV for spreadsheets', () => {
  it('quotes what must be quoted and begins with a byte order mark', () => {
    expect(
      csvText([
        ['a', 'b,c'],
        ['say "x"', 'two\nlines'],
      ]),
    ).toBe('\ufeffa,"b,c"\r\n"say ""x""","two\nlines"\r\n')
    expect(csvText([['a', 'b,c']], 'semicolon')).toBe('\ufeffa;b,c\r\n')
    expect(csvText([['24,001', 'x;y']], 'semicolon')).toBe('\ufeff24,001;"x;y"\r\n')
  })
  it.each(['=1+1', '+cmd', '-top', '@sum', '\tx'])('defuses the cell %j', (cell) => {
    expect(csvText([[cell]], 'comma').slice(1)).toBe(`'${cell}\r\n`)
  })
  it.each(['-0.002', '+0,5', '-1e-3', '24.001'])('leaves the number %s alone', (cell) => {
    expect(csvText([[cell]], 'tab').slice(1)).toBe(`${cell}\r\n`)
  })
})
