import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { canonicalText } from './canonical'
import { evaluate, isError } from './evaluate'
import { kinds } from './kinds'

const names = Object.keys(kinds)

/** Whether every number in an answer can be written down. */
function allFinite(value: unknown): boolean {
  if (typeof value === 'number') return Number.isFinite(value) && !Object.is(value, -0)
  if (typeof value !== 'object' || value === null) return value !== undefined
  return Object.values(value).every(allFinite)
}

function answersProperly(input: unknown): boolean {
  const output = evaluate(input)
  if (!isError(output)) return allFinite(output) && Array.isArray(output.warnings)
  const { code, message, path } = output.error
  return code !== '' && message !== '' && typeof path === 'string'
}

/** A few names of fields, so that nonsense reaches every reader. */
const words = [
  'readings reference value standardUncertainty unit confidence tolerance lower upper margin resolution rule type',
  'alpha design n truth bias standardDeviation power clause parameters result data kind at name function df index',
  'share sigmas calibration collectedOn gauge standard calibratedOn dueOn registeredBeforehand attempts base',
]
  .join(' ')
  .split(' ')
const texts = [
  ...names,
  ...'zero-test equivalence point index bias-zero-test design-minimum t cdf quantile mm 2026-02-30'.split(
    ' ',
  ),
]
const leaf = fc.oneof(
  fc.constantFrom<unknown>(null, true, false, '', -1, 0, 0.5, 1, 2, 15, 1e300, 5e-324, [], {}),
  fc.constantFrom(...texts),
  fc.double(),
  fc.string(),
)
const nonsense = fc.letrec((tie) => ({
  value: fc.oneof({ depthSize: 'small' }, leaf, fc.array(tie('value'), { maxLength: 4 }), tie('object')),
  object: fc.dictionary(fc.constantFrom(...words), tie('value'), { maxKeys: 9 }),
})).object

describe('the one entry of the computation', () => {
  it('answers anything at all without throwing', () => {
    fc.assert(
      fc.property(
        fc.anything({ withBigInt: true, withDate: true, withSparseArray: true, withNullPrototype: true }),
        answersProperly,
      ),
      {
        seed: 81,
        numRuns: 2000,
      },
    )
  })

  it('answers nonsense in the right places without throwing', () => {
    fc.assert(
      fc.property(nonsense, fc.constantFrom(...names), (object, kind) =>
        answersProperly({ ...object, kind }),
      ),
      { seed: 82, numRuns: 3000 },
    )
  })

  it('answers the hardest numbers in the right places without throwing, and never with a number that is none', () => {
    const number = fc.oneof(
      fc.double({ noNaN: true, noDefaultInfinity: true }),
      fc.constantFrom(0, -0, 5e-324, 1e-300, 1e308, -1e308, 1e6, 1e6 + 1e-3),
    )
    const positive = number.map((value) => Math.abs(value) || 1)
    const small = fc.constantFrom(5e-324, 1e-300, 1e-17, 1e-12, 0.05, 0.4999)
    const rule = fc.oneof(
      fc.record({ type: fc.constant('zero-test'), alpha: small }),
      fc.record({ type: fc.constantFrom('equivalence', 'interval-inside'), alpha: small, margin: positive }),
      fc.record({ type: fc.constant('point'), margin: positive }),
      fc.record({
        type: fc.constant('index'),
        share: positive,
        sigmas: positive,
        least: positive,
        toleranceWidth: positive,
      }),
      fc.record({
        ...{ type: fc.constant('index'), share: positive, sigmas: positive, least: positive },
        ...{ toleranceWidth: positive, leastCg: positive, alpha: fc.constantFrom(1e-12, 0.05, 0.5) },
      }),
      fc.record({
        type: fc.constant('with-uncertainty'),
        margin: positive,
        referenceStandardUncertainty: positive,
        coverageFactor: positive,
      }),
    )
    const study = fc.record({
      readings: fc.array(number, { minLength: 1, maxLength: 12 }),
      reference: fc.record({ value: number, standardUncertainty: positive }),
    })
    const baseline = fc.oneof(
      fc.record({ kind: fc.constant('natural-bound'), value: number }),
      fc.record({ kind: fc.constant('process') }),
      fc.record({ kind: fc.constant('absolute'), value: positive, unit: fc.constantFrom('mm', 'in') }),
      fc.constant(null),
    )
    const margin = fc.oneof(
      fc.record({ base: fc.constantFrom('tolerance', 'process'), share: fc.constantFrom(5e-324, 0.05, 1) }),
      fc.record({ base: fc.constant('tolerance'), share: fc.constantFrom(5e-324, 0.05, 1), baseline }),
      fc.record({ base: fc.constant('absolute'), value: positive, unit: fc.constantFrom('mm', 'in') }),
    )
    const clause = fc.oneof(
      fc.record({
        type: fc.constant('bias-equivalence'),
        parameters: fc.record({ margin, confidence: fc.constantFrom(0.5, 0.95, 1 - 1e-16) }),
      }),
      fc.record({ type: fc.constant('bias-zero-test'), parameters: fc.record({ alpha: small }) }),
      fc.record({
        type: fc.constant('bias-interval-inside'),
        parameters: fc.record({ margin, confidence: fc.constantFrom(0.5, 0.95, 1 - 1e-16) }),
      }),
      fc.record({ type: fc.constant('bias-point'), parameters: fc.record({ margin }) }),
      fc.record({
        type: fc.constant('bias-with-uncertainty'),
        parameters: fc.record({ margin, coverageFactor: fc.constantFrom(1, 2, 10) }),
      }),
      fc.record({
        type: fc.constant('bias-index'),
        parameters: fc.record({
          ...{ share: fc.constantFrom(5e-324, 0.2, 1), base: fc.constantFrom('tolerance', 'process') },
          ...{ baseline, sigmas: fc.constantFrom(1, 6, 12), leastCg: fc.constantFrom(null, 5e-324, 100) },
          ...{ leastCgk: fc.constantFrom(5e-324, 1.33, 100), basis: fc.constantFrom('estimate', 'bound') },
          confidence: fc.constantFrom(0.5, 0.95, 1 - 1e-16),
        }),
      }),
      fc.record({
        type: fc.constant('resolution-share'),
        parameters: fc.record({
          share: fc.constantFrom(5e-324, 1),
          base: fc.constantFrom('tolerance', 'process'),
        }),
      }),
    )
    const common = fc.record(
      {
        confidence: fc.constantFrom(5e-324, 0.5, 0.95, 1 - 1e-16),
        tolerance: fc
          .tuple(number, number)
          .map(([lower, upper]) => (lower < upper ? { lower, upper } : { upper })),
        processStandardDeviation: positive,
        resolution: positive,
        margin: positive,
        coverageFactor: positive,
        sigmas: positive,
      },
      { requiredKeys: [] },
    )
    const truth = fc.record({ bias: number, standardDeviation: positive })
    const design = fc.record({ n: fc.constantFrom(2, 3, 15, 100_000) })
    const kind = <K extends string>(name: K) => ({ kind: fc.constant(name) })
    const input = fc.oneof(
      fc
        .record({ ...kind('bias'), study, common })
        .map(({ kind: name, study: data, common: rest }) => ({ ...rest, ...data, kind: name })),
      fc
        .record({ ...kind('clause'), unit: fc.constant('mm'), clause, study, common })
        .map(({ study: data, common: rest, ...more }) => ({
          ...rest,
          ...more,
          data: { kind: 'bias', ...data },
        })),
      fc.record({ ...kind('operatingCharacteristic'), rule, design, truth: truth.map((each) => [each]) }),
      fc.record({ ...kind('incentives'), rule, design, truth }),
      fc.record({ ...kind('sampleSize'), rule, truth, power: fc.constantFrom(1e-9, 0.9, 1 - 1e-9) }),
    )
    fc.assert(fc.property(input, answersProperly), { seed: 83, numRuns: 250 })
  }, 120_000)

  it('keeps no state: the same input has the same bytes, whatever came between', () => {
    const input = { kind: 'bias', readings: [1, 2, 4], reference: { value: 2 }, margin: 3 }
    const first = canonicalText(evaluate(input))
    evaluate({ kind: 'bias', readings: [7, 9], reference: { value: 1 } })
    expect(canonicalText(evaluate(input))).toBe(first)
    expect(input).toEqual({ kind: 'bias', readings: [1, 2, 4], reference: { value: 2 }, margin: 3 })
  })

  it('names a field that it does not know, with its path, and uses nothing of it', () => {
    const input = {
      kind: 'bias',
      readings: [1, 2],
      reference: { value: 1, standardUncertanty: 3 },
      confidance: 0.9,
    }
    const output = evaluate(input)
    const unknown = !isError(output) && output.warnings.filter(({ code }) => code === 'unknown-field')
    expect(unknown).toEqual([
      expect.objectContaining({ path: 'confidance' }),
      expect.objectContaining({ path: 'reference.standardUncertanty' }),
    ])
  })

  it('takes null for not given, and refuses what is inherited', () => {
    expect(evaluate({ kind: 'bias', readings: [1, 2], reference: { value: 1 }, margin: null })).toMatchObject(
      {
        equivalence: { margin: null },
      },
    )
    expect(evaluate({ kind: 'constructor' })).toMatchObject({ error: { code: 'unknown-kind', path: 'kind' } })
    expect(evaluate(Object.create({ kind: 'summary', readings: [1] }))).toMatchObject({
      error: { code: 'missing' },
    })
  })

  it.each([
    [undefined, 'not-an-object', ''],
    [[], 'not-an-object', ''],
    [{}, 'missing', 'kind'],
    [{ kind: 5 }, 'not-text', 'kind'],
    [{ kind: 'summary', readings: 'five' }, 'not-a-list', 'readings'],
    [{ kind: 'summary', readings: [1, , 2] }, 'not-a-number', 'readings[1]'], // eslint-disable-line no-sparse-arrays -- the hole is the bad input
    [{ kind: 'summary', readings: [1, Infinity] }, 'not-finite', 'readings[1]'],
    [{ kind: 'summary', readings: [1], confidence: 1 }, 'too-large', 'confidence'],
    [{ kind: 'summary', readings: [1], tolerance: {} }, 'missing', 'tolerance'],
    [{ kind: 'summary', readings: [1], tolerance: { lower: 2, upper: 2 } }, 'limits-inverted', 'tolerance'],
  ])('%j is refused: %s at “%s”', (input, code, path) => {
    expect(evaluate(input)).toMatchObject({ error: { code, path } })
  })
})
