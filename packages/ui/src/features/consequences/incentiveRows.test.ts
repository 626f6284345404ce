import type { Clause, Margin } from '@evenrule/metrology'
import { describe, expect, it } from 'vitest'
import { ruleOf } from './chances'
import { incentiveRows } from './consequenceRows'

const characteristic = { unit: 'µm', tolerance: { lower: -25, upper: 25 } }
const margin: Margin = { base: 'tolerance', share: 0.05 }
const usual = { readings: 25, standardDeviation: 0.8 }

function told(clause: Clause, assumptions: typeof usual & { referenceStandardUncertainty?: number } = usual) {
  const rule = ruleOf(clause, characteristic, assumptions)
  if (!rule) throw new Error('The clause has no rule.')
  return incentiveRows(rule, assumptions)
}
const faults = (clause: Clause, assumptions?: Parameters<typeof told>[1]) =>
  told(clause, assumptions).map(({ kind, wrong, effect }) => [kind, wrong, effect.split(':')[0]])

const sound = [
  ['worse-repeatability', false, 'passes less often'],
  ['more-readings', false, 'passes more often'],
]
const withRisk = [...sound, ['stricter-risk', false, 'passes less often']]

describe('the incentive check, said for each kind of clause on a bias', () => {
  it('finds everything wrong with the zero-difference test', () =>
    expect(faults({ type: 'bias-zero-test', parameters: { alpha: 0.05 } })).toEqual([
      ['worse-repeatability', true, 'passes more often'],
      ['more-readings', true, 'passes less often'],
      ['stricter-risk', true, 'passes more often'],
    ]))

  it('finds equivalence and the interval inside a margin sound', () => {
    expect(faults({ type: 'bias-equivalence', parameters: { margin, confidence: 0.95 } })).toEqual(withRisk)
    expect(faults({ type: 'bias-interval-inside', parameters: { margin, confidence: 0.95 } })).toEqual(
      withRisk,
    )
  })

  it('finds the point limit sound, which knows no risk level', () =>
    expect(faults({ type: 'bias-point', parameters: { margin } })).toEqual(sound))

  it('says of Cgk on its estimate that fewer readings can help a gauge near the limit', () => {
    const index = {
      share: 0.2,
      base: 'tolerance' as const,
      sigmas: 6,
      leastCg: null,
      leastCgk: 1.33,
      confidence: 0.95,
    }
    const onEstimate = told({ type: 'bias-index', parameters: { ...index, basis: 'estimate' } })
    expect(onEstimate.find(({ kind }) => kind === 'worse-repeatability')!.wrong).toBe(false)
    expect(onEstimate.some(({ kind }) => kind === 'stricter-risk')).toBe(false)
    const onBound = told({ type: 'bias-index', parameters: { ...index, basis: 'bound' } })
    expect(onBound.find(({ kind }) => kind === 'stricter-risk')).toMatchObject({
      wrong: false,
      effect: expect.stringMatching(/^passes less often/) as string,
    })
  })

  it('warns where more readings or a worse gauge change the bias with its uncertainty for the worse', () => {
    const clause: Clause = { type: 'bias-with-uncertainty', parameters: { margin, coverageFactor: 2 } }
    const small = told(clause, { ...usual, readings: 5, referenceStandardUncertainty: 0.3 })
    expect(small.map(({ kind, wrong }) => [kind, wrong])).toEqual([
      ['worse-repeatability', true],
      ['more-readings', true],
    ])
    for (const { effect, before, after, spread } of small) {
      expect(effect).toMatch(after > before ? /^passes more often/ : /^passes less often/)
      // Chances that round alike are written with the places that tell them apart.
      const [from, to] = effect.split(': ')[1]!.split(' → ')
      expect(from).not.toBe(to)
      // Found at another spread than the assumed one, which the row must name.
      expect(spread).not.toBe(usual.standardDeviation)
    }
    const enough = told(clause, { ...usual, referenceStandardUncertainty: 0.3 })
    expect(enough.some(({ wrong }) => wrong)).toBe(false)
  })

  it('shows what is right where it shows most, never as no difference at all', () => {
    const clauses: Clause[] = [
      { type: 'bias-equivalence', parameters: { margin, confidence: 0.95 } },
      { type: 'bias-point', parameters: { margin } },
    ]
    for (const clause of clauses)
      for (const { before, after, bias } of told(clause)) {
        expect(Math.abs(after - before)).toBeGreaterThan(0.01)
        expect(bias).toBeLessThanOrEqual(2.5)
      }
  })
})
