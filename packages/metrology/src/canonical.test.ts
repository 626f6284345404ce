import canonicalize from 'canonicalize'
import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { canonicalText } from './canonical'

describe('canonical text (RFC 8785)', () => {
  it('is that of an independent implementation for every JSON value', () => {
    const value = fc.jsonValue({ maxDepth: 4 }).filter((each) => !/\p{Surrogate}/u.test(JSON.stringify(each)))
    fc.assert(
      fc.property(value, (each) => canonicalText(each) === canonicalize(each)),
      { seed: 71, numRuns: 1000 },
    )
  })

  it('orders members by code units, writes numbers in their shortest form and no white space', () => {
    expect(
      canonicalText({ b: [1e21, 0.1, -0, 1e-7], a: { '\u20ac': 1, '\r': 2, '\ud83d\ude00': 3, 1: 4 } }),
    ).toBe('{"a":{"\\r":2,"1":4,"€":1,"😀":3},"b":[1e+21,0.1,0,1e-7]}')
  })

  it('reads back as what it was written from', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (each) => {
        const text = (() => {
          try {
            return canonicalText(each)
          } catch {
            return null
          }
        })()
        if (text !== null) expect(canonicalText(JSON.parse(text))).toBe(text)
      }),
      { seed: 72, numRuns: 500 },
    )
  })

  it('refuses what JSON cannot hold and leaves out what is undefined', () => {
    for (const value of [NaN, Infinity, '\ud800', 1n, () => 1, undefined, [undefined], Symbol('a')]) {
      expect(() => canonicalText(value)).toThrow(TypeError)
    }
    expect(canonicalText({ a: undefined, b: null })).toBe('{"b":null}')
  })
})
