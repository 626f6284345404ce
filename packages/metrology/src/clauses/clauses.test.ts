import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Characteristic, Clause, ClauseType, JudgementFacts } from '../types'
import { clauseDescriptors, clauseKey, clauseProblems, clauseTypes, judgeClause, parseClause } from '.'
import { fieldBounds } from './fields'

const width: Characteristic = { unit: 'mm', tolerance: { lower: 23.975, upper: 24.025 }, resolution: 0.005 }

const agreed: { [T in ClauseType]: Clause } = {
  'design-minimum': {
    type: 'design-minimum',
    parameters: { readings: 15, registeredBeforehand: true, attempts: 2 },
  },
  'resolution-share': { type: 'resolution-share', parameters: { share: 0.1, base: 'tolerance' } },
  'calibration-in-date': { type: 'calibration-in-date', parameters: { gauge: true, standard: true } },
  'bias-equivalence': {
    type: 'bias-equivalence',
    parameters: { margin: { base: 'tolerance', share: 0.1 }, confidence: 0.95 },
  },
  'bias-interval-inside': {
    type: 'bias-interval-inside',
    parameters: { margin: { base: 'tolerance', share: 0.1 }, confidence: 0.95 },
  },
  'bias-point': { type: 'bias-point', parameters: { margin: { base: 'tolerance', share: 0.1 } } },
  'bias-zero-test': { type: 'bias-zero-test', parameters: { alpha: 0.05 } },
  'bias-index': {
    type: 'bias-index',
    parameters: {
      ...{ share: 0.2, base: 'tolerance', sigmas: 6, leastCg: 1.33, leastCgk: 1.33 },
      ...{ basis: 'bound', confidence: 0.95 },
    },
  },
  'bias-with-uncertainty': {
    type: 'bias-with-uncertainty',
    parameters: { margin: { base: 'tolerance', share: 0.1 }, coverageFactor: 2 },
  },
  'by-hand': {
    type: 'by-hand',
    parameters: {
      subject: 'linearity',
      measure: 'Slope over the range',
      asks: 'a slope below 1 %',
    },
  },
  'does-not-apply': { type: 'does-not-apply', parameters: { key: 'bias/index', reason: 'one-off' } },
}

const study = (
  n: number,
  bias: number,
  standardDeviation: number | null,
  standardUncertainty: number | null = null,
) => ({
  n,
  bias,
  standardDeviation,
  reference: { value: 24, standardUncertainty },
})

const facts = (given: Partial<JudgementFacts> = {}): JudgementFacts => ({
  characteristic: width,
  design: null,
  calibration: null,
  study: null,
  coverageFactor: 2,
  byHand: null,
  ...given,
})

const verdict = (clause: Clause, given: Partial<JudgementFacts>) => {
  const { verdict: word, reason } = judgeClause(clause, facts(given))
  return [word, reason.code]
}

/** A clause with other parameters, also ones that the type does not allow. */
const changed = (type: ClauseType, parameters: Record<string, unknown>) => ({
  type,
  parameters: { ...agreed[type].parameters, ...parameters },
})

describe('reading a clause', () => {
  it.each(clauseTypes)('%s is what it was after being written down', (type) => {
    expect(parseClause(JSON.parse(JSON.stringify(agreed[type])))).toEqual(agreed[type])
    expect(clauseProblems(agreed[type], width)).toEqual([])
  })

  /** What both sides must write themselves has no default. */
  const withDefaults = clauseTypes.filter((type) =>
    clauseDescriptors[type].fields.every((field) => !field.required || field.default !== undefined),
  )

  it('only what is written in words has no defaults', () => {
    expect(clauseTypes.filter((type) => !withDefaults.includes(type))).toEqual(['by-hand', 'does-not-apply'])
  })

  it.each(withDefaults)('%s: defaults of its fields make a clause that can be agreed', (type) => {
    const parameters = Object.fromEntries(
      clauseDescriptors[type].fields.flatMap((field) =>
        field.default === undefined ? [] : [[field.name, field.default]],
      ),
    )
    expect(clauseProblems({ type, parameters }, width)).toEqual([])
  })

  it.each(clauseTypes)('%s: every required field is missed by name', (type) => {
    const required = clauseDescriptors[type].fields.filter((field) => field.required)
    expect(required.length).toBeGreaterThan(0)
    const problems = clauseProblems({ type, parameters: {} }, width)
    expect(problems.map(({ code, path }) => [code, path])).toEqual(
      required.map(({ name }) => ['missing', `parameters.${name}`]),
    )
  })

  it.each(clauseTypes)('%s: a misspelt field is named', (type) => {
    const problems = clauseProblems(changed(type, { alhpa: 0.05 }), width)
    expect(problems).toEqual([expect.objectContaining({ code: 'unknown-field', path: 'parameters.alhpa' })])
  })

  it('names everything wrong at once, each with its path', () => {
    const problems = clauseProblems(
      changed('design-minimum', { readings: 1.5, attempts: 0, registeredBeforehand: 1 }),
      width,
    )
    expect(problems.map(({ code, path }) => `${path} ${code}`)).toEqual([
      'parameters.readings too-small',
      'parameters.registeredBeforehand not-a-boolean',
      'parameters.attempts too-small',
    ])
    expect(clauseProblems(changed('design-minimum', { readings: 2.5 }), width)[0]?.code).toBe(
      'not-an-integer',
    )
  })

  it.each([
    [null, 'not-an-object', ''],
    [{ parameters: {} }, 'missing', 'type'],
    [{ type: 'gauge-is-nice', parameters: {} }, 'not-a-choice', 'type'],
    [{ type: 'bias-zero-test' }, 'missing', 'parameters'],
    [{ type: 'bias-zero-test', parameters: { alpha: 0 } }, 'too-small', 'parameters.alpha'],
    [{ type: 'bias-zero-test', parameters: { alpha: 1 } }, 'too-large', 'parameters.alpha'],
    [{ type: 'bias-zero-test', parameters: { alpha: '0.05' } }, 'not-a-number', 'parameters.alpha'],
    [changed('bias-equivalence', { confidence: 0.4 }), 'too-small', 'parameters.confidence'],
    [changed('bias-equivalence', { margin: 0.1 }), 'not-an-object', 'parameters.margin'],
    [changed('bias-equivalence', { margin: { base: 'feeling' } }), 'not-a-choice', 'parameters.margin.base'],
    [
      changed('bias-equivalence', { margin: { base: 'tolerance', share: 1.5 } }),
      'too-large',
      'parameters.margin.share',
    ],
    [
      changed('bias-equivalence', { margin: { base: 'absolute', value: 1, unit: '' } }),
      'missing',
      'parameters.margin.unit',
    ],
    [changed('resolution-share', { base: 'length' }), 'not-a-choice', 'parameters.base'],
  ])('%j: %s at %s', (clause, code, path) => {
    expect(clauseProblems(clause, width)).toEqual([expect.objectContaining({ code, path })])
  })

  it('refuses what the characteristic cannot give', () => {
    const bare: Characteristic = { unit: 'mm', tolerance: { upper: 25 } }
    const of = (clause: unknown, at: Characteristic = bare) =>
      clauseProblems(clause, at).map(({ code, path }) => `${path} ${code}`)
    const margin = (value: unknown) => changed('bias-equivalence', { margin: value })
    expect(of(agreed['bias-equivalence'])).toEqual(['parameters.margin.base no-tolerance-width'])
    expect(of(agreed['resolution-share'])).toEqual(['parameters.base no-tolerance-width'])
    expect(of(margin({ base: 'process', share: 0.1 }))).toEqual(['parameters.margin.base no-process-spread'])
    expect(of(margin({ base: 'absolute', value: 1, unit: 'mm' }))).toEqual([])
    expect(of(margin({ base: 'absolute', value: 1, unit: 'g' }))).toEqual([
      'parameters.margin.unit unit-of-another-quantity',
    ])
    expect(of(margin({ base: 'absolute', value: 1, unit: 'ell' }))).toEqual([
      'parameters.margin.unit unit-unknown',
    ])
    expect(of(margin({ base: 'absolute', value: 1e308, unit: 'in' }))).toEqual([
      'parameters.margin.value too-large',
    ])
    const thin: Characteristic = { unit: 'mm', tolerance: { lower: 0, upper: 5e-324 } }
    expect(of(margin({ base: 'tolerance', share: 0.1 }), thin)).toEqual(['parameters.margin.share too-small'])
  })

  it('never throws on anything at all', () => {
    fc.assert(
      fc.property(fc.anything(), (value) => Array.isArray(clauseProblems(value, width))),
      { seed: 41, numRuns: 500 },
    )
    const typed = fc.record({
      type: fc.constantFrom(...clauseTypes),
      parameters: fc.dictionary(fc.string(), fc.anything()),
    })
    fc.assert(
      fc.property(typed, (value) => clauseProblems(value, width).length > 0),
      { seed: 42, numRuns: 500 },
    )
  })
})

describe('descriptors', () => {
  it('tell apart what is judged, so that only like replaces like', () => {
    expect(clauseTypes.map((type) => clauseKey(agreed[type]))).toEqual([
      'design/readings',
      'resolution/share',
      'calibration/date',
      'bias/mean',
      'bias/mean',
      'bias/mean',
      'bias/mean',
      'bias/index',
      'bias/with-uncertainty',
      'linearity/by-hand/slope-over-the-range',
      'bias/index',
    ])
  })

  it('have bounds that a form can show', () => {
    const bounds = Object.fromEntries(
      clauseTypes.flatMap((type) =>
        clauseDescriptors[type].fields.map((field) => [`${type}.${field.name}`, fieldBounds(field)]),
      ),
    )
    expect(bounds).toMatchObject({
      'design-minimum.readings': { least: 2, most: 100_000 },
      'resolution-share.share': { above: 0, most: 1 },
      'bias-equivalence.confidence': { least: 0.5, below: 1 },
      'bias-zero-test.alpha': { above: 0, below: 1 },
    })
  })
})

describe('least number of readings', () => {
  const clause = agreed['design-minimum']
  const design = { registeredBeforehand: true, attempts: 1 }
  const of = (n: number, more: object = {}) =>
    verdict(clause, { study: study(n, 0, 1), design: { ...design, ...more } })

  it('meets with exactly the readings and attempts agreed', () => {
    expect(of(15, { attempts: 2 })).toEqual(['meets', 'design-as-agreed'])
    expect(of(14)).toEqual(['falls-short', 'too-few-readings'])
    expect(of(15, { attempts: 3 })).toEqual(['falls-short', 'too-many-attempts'])
    expect(of(15, { registeredBeforehand: false })).toEqual(['falls-short', 'not-registered-beforehand'])
  })

  it('is not shown without a study, or without knowing how it came about', () => {
    expect(verdict(clause, { design })).toEqual(['not-shown', 'no-study'])
    expect(verdict(clause, { study: study(15, 0, 1) })).toEqual(['not-shown', 'design-unknown'])
    const readingsAlone: Clause = {
      type: 'design-minimum',
      parameters: { readings: 15, registeredBeforehand: false },
    }
    expect(verdict(readingsAlone, { study: study(15, 0, 1) })).toEqual(['meets', 'design-as-agreed'])
    // Too few readings fall short whatever else is unknown.
    expect(verdict(clause, { study: study(3, 0, 1) })).toEqual(['falls-short', 'too-few-readings'])
  })
})

describe('resolution', () => {
  const clause = agreed['resolution-share']
  const of = (characteristic: Characteristic, of: Clause = clause) => verdict(of, { characteristic })

  it('equal to the share agreed meets it, in decimal: 0.005 is a tenth of 24.025 − 23.975', () => {
    expect(0.005 / (24.025 - 23.975)).toBeGreaterThan(0.1 - 1e-15)
    expect(of(width)).toEqual(['meets', 'resolution-fine-enough'])
    expect(of({ ...width, resolution: 0.0050000001 })).toEqual(['falls-short', 'resolution-too-coarse'])
    const shown = judgeClause(clause, facts())
    expect(shown).toMatchObject({ figure: 0.1, limits: { lower: null, upper: 0.1 }, quantity: 'share' })
  })

  it('a tenth of any decimal width meets a tenth, the next digit does not', () => {
    const lower = fc.integer({ min: -1e6, max: 1e6 })
    fc.assert(
      fc.property(
        lower,
        fc.integer({ min: 1, max: 1e4 }),
        fc.integer({ min: 0, max: 6 }),
        (from, tenth, digits) => {
          const decimal = (whole: number) => Number(`${whole}e-${digits}`)
          const tolerance = { lower: decimal(from), upper: decimal(from + 10 * tenth) }
          expect(of({ unit: 'mm', tolerance, resolution: decimal(tenth) })[0]).toBe('meets')
          const finer = Number(`${tenth}1e-${digits + 1}`)
          expect(of({ unit: 'mm', tolerance, resolution: finer })[0]).toBe('falls-short')
        },
      ),
      { seed: 43, numRuns: 300 },
    )
  })

  it('refers to six standard deviations of the process where agreed', () => {
    const process: Clause = { type: 'resolution-share', parameters: { share: 0.1, base: 'process' } }
    const of = (processStandardDeviation: number) =>
      verdict(process, { characteristic: { ...width, resolution: 0.006, processStandardDeviation } })
    expect(of(0.01)).toEqual(['meets', 'resolution-fine-enough'])
    expect(of(0.0099999)).toEqual(['falls-short', 'resolution-too-coarse'])
    expect(verdict(process, {})).toEqual(['not-shown', 'no-process-spread'])
  })

  it('is not shown where it or the width is unknown', () => {
    expect(of({ unit: 'mm', tolerance: { lower: 1, upper: 2 } })).toEqual(['not-shown', 'resolution-unknown'])
    expect(of({ unit: 'mm', tolerance: { upper: 2 }, resolution: 0.1 })).toEqual([
      'not-shown',
      'no-tolerance-width',
    ])
  })
})

describe('calibration in date', () => {
  const clause = agreed['calibration-in-date']
  const window = { calibratedOn: '2026-01-10', dueOn: '2027-01-09' }
  const on = (collectedOn: string, more: object = {}) =>
    verdict(clause, { calibration: { collectedOn, gauge: window, standard: window, ...more } })

  it('meets on the first and on the last day', () => {
    expect(on('2026-01-10')).toEqual(['meets', 'in-calibration'])
    expect(on('2027-01-09')).toEqual(['meets', 'in-calibration'])
    expect(on('2026-01-09')).toEqual(['falls-short', 'gauge-out-of-calibration'])
    expect(on('2027-01-10')).toEqual(['falls-short', 'gauge-out-of-calibration'])
  })

  it('names the item that is out or unknown, and falling short comes first', () => {
    const old = { calibratedOn: '2024-01-10', dueOn: '2025-01-09' }
    expect(on('2026-06-01', { standard: old })).toEqual(['falls-short', 'standard-out-of-calibration'])
    expect(on('2026-06-01', { gauge: null })).toEqual(['not-shown', 'gauge-calibration-unknown'])
    expect(on('2026-06-01', { standard: null })).toEqual(['not-shown', 'standard-calibration-unknown'])
    expect(on('2026-06-01', { gauge: null, standard: old })).toEqual([
      'falls-short',
      'standard-out-of-calibration',
    ])
    expect(verdict(clause, {})).toEqual(['not-shown', 'calibration-unknown'])
  })

  it('asks only for what was agreed, and shows the days common to it', () => {
    const gaugeAlone: Clause = { type: 'calibration-in-date', parameters: { gauge: true, standard: false } }
    const calibration = { collectedOn: '2026-06-01', gauge: window, standard: null }
    expect(verdict(gaugeAlone, { calibration })).toEqual(['meets', 'in-calibration'])
    const later = { calibratedOn: '2026-03-01', dueOn: '2026-12-31' }
    const shown = judgeClause(clause, facts({ calibration: { ...calibration, standard: later } }))
    expect(shown).toMatchObject({
      limits: { lower: '2026-03-01', upper: '2026-12-31' },
      figure: '2026-06-01',
    })
  })
})

describe('bias by equivalence', () => {
  // A tenth of the width is 0.005.
  const clause = agreed['bias-equivalence']
  const of = (...given: Parameters<typeof study>) => verdict(clause, { study: study(...given) })

  it('meets inside, falls short wholly outside, and is not shown across the margin', () => {
    expect(of(15, 0.001, 0.002)).toEqual(['meets', 'interval-inside-margin'])
    expect(of(15, -0.012, 0.002)).toEqual(['falls-short', 'interval-outside-margin'])
    expect(of(15, 0.0045, 0.002)).toEqual(['not-shown', 'interval-crosses-margin'])
    // A bias of nothing and a gauge that is all spread shows nothing.
    expect(of(15, 0, 0.1)).toEqual(['not-shown', 'interval-crosses-margin'])
  })

  it('at 50 % the interval is the estimate, and a bias equal to the margin meets it in decimal', () => {
    const half: Clause = {
      type: 'bias-equivalence',
      parameters: { margin: { base: 'tolerance', share: 0.1 }, confidence: 0.5 },
    }
    expect(verdict(half, { study: study(15, 0.005, 0.002) })).toEqual(['meets', 'interval-inside-margin'])
    expect(verdict(half, { study: study(15, 0.005000001, 0.002) })).toEqual([
      'falls-short',
      'interval-outside-margin',
    ])
  })

  it('is not shown without a spread, with one reading, or without a study', () => {
    expect(of(15, 0, 0)).toEqual(['not-shown', 'zero-spread'])
    expect(of(1, 0, null)).toEqual(['not-shown', 'one-reading'])
    expect(verdict(clause, {})).toEqual(['not-shown', 'no-study'])
  })

  it('is not shown, never failed, on a reference whose uncertainty uses up the margin', () => {
    expect(of(15, 0.001, 0.002, 0.0025)).toEqual(['not-shown', 'reference-uncertainty-too-large'])
    expect(of(15, 0.5, 0.002, 0.0025)).toEqual(['not-shown', 'reference-uncertainty-too-large'])
    expect(of(15, 0.001, 0.002, 0.00249)).toEqual(['meets', 'interval-inside-margin'])
    expect(verdict(clause, { study: study(15, 0.001, 0.002, 0.00249), coverageFactor: 3 })).toEqual([
      'not-shown',
      'reference-uncertainty-too-large',
    ])
  })

  it('is not shown where the margin cannot be formed', () => {
    const characteristic = { unit: 'mm', tolerance: { upper: 25 } }
    expect(verdict(clause, { characteristic, study: study(15, 0.001, 0.002) })).toEqual([
      'not-shown',
      'margin-undefined',
    ])
  })

  it('takes a margin in another unit of the same quantity exactly: 0.001 in is 0.0254 mm', () => {
    const inches: Clause = {
      type: 'bias-equivalence',
      parameters: { margin: { base: 'absolute', value: 0.001, unit: 'in' }, confidence: 0.95 },
    }
    expect(judgeClause(inches, facts({ study: study(15, 0, 0.01) })).limits).toEqual({
      lower: -0.0254,
      upper: 0.0254,
    })
  })
})

describe('bias by the zero test', () => {
  const clause = agreed['bias-zero-test']
  const of = (...given: Parameters<typeof study>) => verdict(clause, { study: study(...given) })

  it('meets within the allowed bias, t(0.975, 14)·s/√15, and falls short beyond: nothing is left not shown', () => {
    const { limits } = judgeClause(clause, facts({ study: study(15, 0, 1) }))
    expect(limits?.upper).toBeCloseTo(0.5537815, 6)
    expect(of(15, 0.5537, 1)).toEqual(['meets', 'bias-within-allowed'])
    expect(of(15, -0.5538, 1)).toEqual(['falls-short', 'bias-beyond-allowed'])
  })

  it('rewards the worse gauge and punishes more readings', () => {
    expect(of(15, 0.6, 1)[0]).toBe('falls-short')
    expect(of(15, 0.6, 2)[0]).toBe('meets')
    expect(of(10, 0.6, 1)[0]).toBe('meets')
  })

  it('is not shown without a spread, with one reading, or without a study', () => {
    expect(of(15, 0, 0)).toEqual(['not-shown', 'zero-spread'])
    expect(of(1, 0, null)).toEqual(['not-shown', 'one-reading'])
    expect(verdict(clause, {})).toEqual(['not-shown', 'no-study'])
  })
})
