import { describe, expect, it } from 'vitest'
import { readNumbers, writeNumbers } from './readingNumbers'

describe('numbers of readings', () => {
  it.each([
    [[], ''],
    [[2], '3'],
    [[6, 2, 7], '3, 7, 8'],
    [[2, 6, 7, 8, 20], '3, 7–9, 21'],
  ])('%j are written "%s" and read back', (places, text) => {
    expect(writeNumbers(places)).toBe(text)
    expect(readNumbers(text, 25)).toEqual({ places: [...places].sort((a, b) => a - b), wrong: null })
  })
  it('may be typed with spaces, semicolons and a hyphen', () =>
    expect(readNumbers(' 3 7 - 9;21 ', 25)).toEqual({ places: [2, 6, 7, 8, 20], wrong: null }))
  it.each(['0', '26', '9-7', 'x', '3-', '1.5'])('“%s” names no reading', (piece) =>
    expect(readNumbers(`2, ${piece}`, 25)).toEqual({ places: [1], wrong: piece }),
  )
})
