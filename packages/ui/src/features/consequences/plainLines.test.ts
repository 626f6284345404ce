import { clauseDescriptors, type Clause } from '@evenrule/metrology'
import { describe, expect, it } from 'vitest'
import { plainLines } from './plainLines'

const characteristic = { unit: 'mm', tolerance: { lower: 23.975, upper: 24.025 } }
const told = (clause: Clause, of: Parameters<typeof plainLines>[1] = characteristic) =>
  plainLines(clause, of, of.unit).join(' ').replaceAll('\u202F', ' ')

describe('a clause without chances', () => {
  const clauses: Clause[] = [
    { type: 'design-minimum', parameters: { readings: 25, registeredBeforehand: true, attempts: 2 } },
    { type: 'resolution-share', parameters: { share: 0.05, base: 'tolerance' } },
    { type: 'calibration-in-date', parameters: { gauge: true, standard: true } },
    {
      type: 'by-hand',
      parameters: { subject: 'linearity', measure: 'Slope', asks: 'A line over the range.' },
    },
    { type: 'does-not-apply', parameters: { key: 'bias/mean', reason: 'Judged elsewhere.' } },
  ]

  it('is every one that has no rule, and says what it asks', () => {
    const without = Object.values(clauseDescriptors)
      .filter(({ rule }) => rule === undefined)
      .map(({ type }) => type)
    expect(clauses.map(({ type }) => type).sort()).toEqual(without.sort())
    for (const clause of clauses) expect(told(clause).length).toBeGreaterThan(20)
  })

  it('names the step of the gauge to buy', () => {
    expect(told(clauses[1]!)).toContain('steps of 0.0025 mm or finer')
    expect(told(clauses[1]!, { unit: 'mm', tolerance: { upper: 2 } })).toContain('not defined')
    expect(
      told(
        {
          type: 'resolution-share',
          parameters: { share: 0.05, base: 'tolerance', baseline: { kind: 'natural-bound', value: 0 } },
        },
        { unit: 'mm', tolerance: { upper: 2 } },
      ),
    ).toContain('steps of 0.1 mm or finer')
  })

  it('counts attempts and hands on what a document must show', () => {
    expect(told(clauses[0]!)).toContain('At most 2 attempts')
    expect(told(clauses[3]!)).toContain('A line over the range.')
  })
})
