import fc from 'fast-check'
import { expect, it } from 'vitest'
import { defaultTerms, enteredTerms, noTerms, resolveTerms, termFields, type Terms } from './terms'

const aTerms: fc.Arbitrary<Terms> = fc.record({
  validityMonths: fc.option(fc.oneof(fc.integer({ min: 1, max: 120 }), fc.constant('no-expiry' as const))),
  calibrationOverdue: fc.option(fc.constantFrom('on-hold' as const, 'stays' as const)),
  outOfLimits: fc.option(fc.constantFrom('suspended' as const, 'stays' as const)),
  repaired: fc.option(fc.constantFrom('suspended' as const, 'stays' as const)),
  moved: fc.option(fc.constantFrom('suspended' as const, 'stays' as const)),
  changed: fc.option(fc.constantFrom('suspended' as const, 'stays' as const)),
  readingsTakerMaySign: fc.option(fc.boolean()),
})

it('terms that nobody said are the defaults, from nowhere', () => {
  const { values, from } = resolveTerms([{ terms: noTerms, source: 'wide' }])
  expect(values).toEqual(defaultTerms)
  expect(from.every(({ source }) => source === null)).toBe(true)
})

it('each field is that of the first layer that says it, and names that layer', () => {
  fc.assert(
    fc.property(fc.array(aTerms, { maxLength: 3 }), (layers) => {
      const { values, from } = resolveTerms(layers.map((terms, source) => ({ terms, source })))
      for (const [place, field] of termFields.entries()) {
        const first = layers.findIndex((terms) => terms[field] !== null)
        const said = layers[first]?.[field]
        expect(values[field]).toBe(first < 0 ? defaultTerms[field] : said === 'no-expiry' ? null : said)
        expect(from[place]).toEqual({ field, value: values[field], source: first < 0 ? null : first })
      }
    }),
  )
})

it('no expiry, said narrowly, counts against a wider validity and names where it is said', () => {
  const { values, from } = resolveTerms([
    { terms: { ...noTerms, validityMonths: 'no-expiry' }, source: 'characteristic' },
    { terms: { ...noTerms, validityMonths: 24 }, source: 'relationship' },
  ])
  expect(values.validityMonths).toBeNull()
  expect(from[0]).toEqual({ field: 'validityMonths', value: null, source: 'characteristic' })
})

it('what is left out when terms are sent is not said', () => {
  expect(enteredTerms.parse(undefined)).toEqual(noTerms)
  expect(enteredTerms.parse({ readingsTakerMaySign: false })).toEqual({
    ...noTerms,
    readingsTakerMaySign: false,
  })
  expect(enteredTerms.parse({ validityMonths: 'no-expiry' }).validityMonths).toBe('no-expiry')
  for (const validityMonths of [0, 121, 1.5, '12', 'never'])
    expect(enteredTerms.safeParse({ validityMonths }).success, String(validityMonths)).toBe(false)
})
