import { gaugeAskedFor, type Clause } from '@evenrule/metrology'
import { describe, expect, it } from 'vitest'
import { chancesOf } from '@evenrule/metrology'
import { gaugeLines, leastLine, writtenLimit } from './askedLines'

const seen = (text: string) => text.replaceAll('\u202F', ' ')
const characteristic = { unit: 'µm', tolerance: { lower: -25, upper: 25 } }
const equivalence: Clause = {
  type: 'bias-equivalence',
  parameters: { margin: { base: 'tolerance', share: 0.05 }, confidence: 0.95 },
}
const zeroTest: Clause = { type: 'bias-zero-test', parameters: { alpha: 0.05 } }
const lines = (clause: Clause, own: number, chance = 0.9) =>
  gaugeLines(gaugeAskedFor(clause, characteristic, 25, chance, own)!, own, 'µm').map(({ text, wrong }) => ({
    text: seen(text),
    wrong,
  }))

describe('the gauge a clause asks for', () => {
  it('is told with its unit, and what is written still meets the clause', () => {
    const [spread, width, bias] = lines(equivalence, 0.8)
    const written = Number(/at most ([\d.]+) µm/.exec(spread!.text)![1])
    const rule = { type: 'equivalence' as const, alpha: 0.05, margin: 2.5 }
    const meets = (of: { bias: number; standardDeviation: number }) => chancesOf(rule, 25)(of).meets
    expect(meets({ bias: 0, standardDeviation: written })).toBeGreaterThanOrEqual(0.9)
    expect(meets({ bias: 0, standardDeviation: written * 1.01 })).toBeLessThan(0.9)
    expect(Number(/take ([\d.]+) µm/.exec(width!.text)![1])).toBeCloseTo(6 * written, 0)
    const allowed = Number(/at most ([\d.]+) µm/.exec(bias!.text)![1])
    expect(meets({ bias: allowed, standardDeviation: 0.8 })).toBeGreaterThanOrEqual(0.9)
    expect(meets({ bias: allowed * 1.01, standardDeviation: 0.8 })).toBeLessThan(0.9)
  })

  it('says that adjusting is not enough where the spread alone is too large', () =>
    expect(lines(equivalence, 6).at(-1)!.text).toMatch(
      /^With a spread of 6 µm, .* the spread must come down\.$/,
    ))

  it('says that the zero test names no gauge, and favours the worse one', () => {
    const told = lines(zeroTest, 0.8)
    expect(told[0]).toMatchObject({ wrong: true, text: expect.stringMatching(/any spread/) as string })
    expect(told.at(-1)).toMatchObject({ wrong: true, text: expect.stringMatching(/worse gauge/) as string })
  })

  it('is none where no gauge reaches the chance', () =>
    expect(lines(zeroTest, 0.8, 0.99).map(({ text }) => text)).toEqual([
      'No gauge meets it with that chance, however small its spread.',
    ]))

  it('is written to three digits, rounded down', () => {
    expect(seen(writtenLimit(3.249_9, 'µm'))).toBe('3.24 µm')
    expect(seen(writtenLimit(0.012_399, 'mm'))).toBe('0.0123 mm')
    expect(seen(writtenLimit(12_345, 'mm'))).toBe('12 300 mm')
  })
})

describe('the least study in words', () => {
  it.each([
    [
      { readings: 12, chance: 0.912, reason: 'size-found' },
      '12 readings are enough; the chance is then 91 %.',
    ],
    [{ readings: null, chance: null, reason: 'size-does-not-help' }, /do not make it surer/],
    [{ readings: null, chance: null, reason: 'no-size-suffices' }, /^No number of readings/],
    [{ readings: null, chance: null, reason: 'any-size' }, /^Any number/],
  ] as const)('%j', (needed, words) => expect(seen(leastLine(needed))).toMatch(words))
})
