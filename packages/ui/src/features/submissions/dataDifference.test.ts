import { describe, expect, it } from 'vitest'
import { readingChanges } from './dataDifference'

const told = (before: string[], after: string[]) => {
  const { changes, kept } = readingChanges(before, after)
  return {
    kept,
    changes: changes.map(
      ({ before: was, after: is }) =>
        `${was ? `${was.number}:${was.text}` : ''}>${is ? `${is.number}:${is.text}` : ''}`,
    ),
  }
}

describe('the difference of two revisions of readings', () => {
  it('is nothing where nothing changed', () =>
    expect(told(['1.0', '1.1'], ['1.0', '1.1'])).toEqual({ kept: 2, changes: [] }))
  it('names a reading that was changed, with both texts', () =>
    expect(told(['1.0', '9.9', '1.1'], ['1.0', '1.2', '1.1'])).toEqual({ kept: 2, changes: ['2:9.9>2:1.2'] }))
  it('does not call the rest changed when one was taken out', () =>
    expect(told(['1.0', '9.9', '1.1', '1.2'], ['1.0', '1.1', '1.2'])).toEqual({
      kept: 3,
      changes: ['2:9.9>'],
    }))
  it('names what was added at the end and in between', () =>
    expect(told(['1.0', '1.1'], ['1.0', '1.5', '1.1', '1.6'])).toEqual({
      kept: 2,
      changes: ['>2:1.5', '>4:1.6'],
    }))
  it('tells the zeros that were written apart', () =>
    expect(told(['1.0'], ['1.00']).changes).toEqual(['1:1.0>1:1.00']))
  it('takes a thousand readings', () => {
    const before = Array.from({ length: 1000 }, (_, at) => String(at))
    expect(told(before, before.slice(1)).changes).toEqual(['1:0>'])
  })
})
