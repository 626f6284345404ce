import { describe, expect, it } from 'vitest'
import {
  describeClause,
  describeIncentive,
  describeRule,
  describeTerms,
  describeWarning,
  nameReadings,
} from './index'

const seen = (text: string) => text.replaceAll('\u202F', '_')

describe('clause sentences', () => {
  it.each([
    [
      {
        type: 'bias-equivalence',
        parameters: { margin: { base: 'tolerance', share: 0.05 }, confidence: 0.95 },
      },
      'Bias within ±5_% of tolerance, shown at 95_%',
      'equivalence within ±5_% of tolerance, 95_%',
    ],
    [
      {
        type: 'bias-equivalence',
        parameters: { margin: { base: 'absolute', value: 0.0025, unit: 'mm' }, confidence: 0.9 },
      },
      'Bias within ±0.0025_mm, shown at 90_%',
      'equivalence within ±0.0025_mm, 90_%',
    ],
    [
      { type: 'bias-zero-test', parameters: { alpha: 0.05 } },
      'Bias not told from zero by the zero-difference test, α 0.05',
      'zero-difference test, α 0.05',
    ],
    [
      { type: 'resolution-share', parameters: { share: 0.1, base: 'process' } },
      'Resolution at most 10_% of process variation',
      '≤ 10_% of process variation',
    ],
    [
      { type: 'calibration-in-date', parameters: { gauge: true, standard: true } },
      'Gauge and reference standard in calibration on the day of collection',
      'gauge and reference standard in date on the day of collection',
    ],
    [
      { type: 'design-minimum', parameters: { readings: 15, registeredBeforehand: true, attempts: 1 } },
      'At least 15 readings, registered beforehand, at most 1 attempt',
      'at least 15 readings, registered beforehand, at most 1 attempt',
    ],
    [
      {
        type: 'bias-interval-inside',
        parameters: { margin: { base: 'process', share: 0.05 }, confidence: 0.95 },
      },
      'Whole 95_% interval of the bias within ±5_% of process variation',
      'whole 95_% interval within ±5_% of process variation',
    ],
    [
      {
        type: 'bias-point',
        parameters: {
          margin: { base: 'tolerance', share: 0.1, baseline: { kind: 'natural-bound', value: 0 } },
        },
      },
      'Estimated bias within ±10_% of tolerance (one-sided: of the distance to 0)',
      'estimate within ±10_% of tolerance (one-sided: of the distance to 0)',
    ],
    [
      {
        type: 'bias-index',
        parameters: {
          share: 0.2,
          base: 'tolerance',
          sigmas: 6,
          leastCg: 1.33,
          leastCgk: 1.33,
          basis: 'bound',
          confidence: 0.95,
        },
      },
      'Cg and Cgk at least 1.33 for 20_% of tolerance over 6_s, on the lower bound at 95_%',
      'Cg and Cgk at least 1.33, 20_% of tolerance over 6_s, on the lower bound at 95_%',
    ],
    [
      {
        type: 'bias-index',
        parameters: {
          share: 0.15,
          base: 'process',
          sigmas: 4,
          leastCg: null,
          leastCgk: 1,
          basis: 'estimate',
          confidence: 0.95,
        },
      },
      'Cgk at least 1 for 15_% of process variation over 4_s, on the estimate',
      'Cgk at least 1, 15_% of process variation over 4_s, on the estimate',
    ],
    [
      {
        type: 'bias-with-uncertainty',
        parameters: { margin: { base: 'tolerance', share: 0.1 }, coverageFactor: 2 },
      },
      'Bias and its expanded uncertainty (k = 2) within ±10_% of tolerance',
      'with uncertainty (k = 2) within ±10_% of tolerance',
    ],
    [
      {
        type: 'by-hand',
        parameters: { subject: 'linearity', measure: 'Slope', asks: 'a slope below 1 %' },
      },
      'Linearity, judged by hand: Slope',
      'Slope, judged by hand on a document that shows: a slope below 1 %',
    ],
    [
      { type: 'does-not-apply', parameters: { key: 'bias/index', reason: 'one-off part' } },
      'Does not apply: capability indices Cg and Cgk',
      'does not apply: one-off part',
    ],
  ] as const)('say what $type asks for', (clause, sentence, terms) => {
    expect(seen(describeClause(clause))).toBe(sentence)
    expect(seen(describeTerms(clause))).toBe(terms)
  })
})

describe('the margin rule in words', () => {
  const rule = {
    label: 'bias',
    estimate: -0.0009,
    interval: { lower: -0.0017, upper: -0.0001 },
    limits: { lower: -0.0025, upper: 0.0025 },
    verdict: 'meets' as const,
    unit: 'mm',
    write: (value: number) => String(value).replace('-', '−'),
  }
  it('names estimate, interval, limits and verdict', () =>
    expect(seen(describeRule(rule))).toBe(
      'bias −0.0009_mm, interval −0.0017 to −0.0001_mm, limits ±0.0025_mm, meets',
    ))
  it('says when the figure is not defined', () =>
    expect(seen(describeRule({ ...rule, estimate: null, interval: null, verdict: 'not-shown' }))).toBe(
      'bias not defined, limits ±0.0025_mm, not shown',
    ))
})

describe('incentives in words', () => {
  it('flags a clause that a worse gauge passes more easily', () =>
    expect(describeIncentive('worse-repeatability', 0.38, 0.8)).toMatchObject({
      change: 'A gauge with twice the spread',
      wrong: true,
    }))
  it('finds nothing wrong when more readings help', () =>
    expect(describeIncentive('more-readings', 0.6, 0.9).wrong).toBe(false))
  it('calls equal chances equal', () =>
    expect(describeIncentive('stricter-risk', 0.5, 0.5)).toMatchObject({ wrong: false }))
})

describe('warnings', () => {
  it('name the readings they are about, counted from one', () => {
    expect(nameReadings([3])).toBe('Reading 4')
    expect(nameReadings([0, 3, 8])).toBe('Readings 1, 4 and 9')
    expect(describeWarning({ code: 'outlying-reading', readings: [3] })).toMatch(/^Reading 4: /)
  })
})
