import { divide, multiply, rational, toNumber } from '../decimal'
import { capabilityIndices, type Indices } from '../kinds/bias-indices'
import { complement } from '../statistics/mean-interval'
import type {
  BiasIndexParameters,
  Characteristic,
  ClauseDescriptor,
  Judgement,
  ReasonCode,
  Rule,
  Verdict,
} from '../types'
import { baselineProblems, baselineWidth, missingBaseline } from './baselines'
import { factsWithin, isReason, notShown, readingsFor } from './bias-facts'

/** One index against the least agreed for it. */
interface Part {
  index: 'cg' | 'cgk'
  least: number
  figure: number
  lower: number | null
  upper: number | null
}

/**
 * Capability of the gauge on its reference: Cgk at least `leastCgk` and, where asked for, Cg at least `leastCg`. On
 * `estimate` they meet or fall short; on `bound` the one-sided lower bounds must reach the least, and where an upper
 * bound stays below it the clause falls short (see `capabilityIndices`). The figure shown is the index that decides.
 */
export const biasIndex: ClauseDescriptor<'bias-index'> = {
  type: 'bias-index',
  subject: 'bias',
  measure: 'index',
  basis: 'estimate',
  basisOf: ({ parameters }) => parameters.basis,
  studyKind: 'bias',
  fields: [
    { name: 'share', kind: 'share', required: true, default: 0.2 },
    { name: 'base', kind: 'choice', required: true, choices: ['tolerance', 'process'], default: 'tolerance' },
    { name: 'baseline', kind: 'baseline', required: false },
    { name: 'sigmas', kind: 'number', required: true, minimum: 1, maximum: 12, default: 6 },
    {
      name: 'leastCg',
      kind: 'nullable-number',
      required: false,
      exclusiveMinimum: 0,
      maximum: 100,
      default: 1.33,
    },
    {
      name: 'leastCgk',
      kind: 'number',
      required: true,
      exclusiveMinimum: 0,
      maximum: 100,
      default: 1.33,
    },
    { name: 'basis', kind: 'choice', required: true, choices: ['estimate', 'bound'], default: 'bound' },
    { name: 'confidence', kind: 'confidence', required: true, default: 0.95 },
  ],
  check: ({ parameters }, characteristic) =>
    baselineProblems(
      parameters.base,
      characteristic,
      { base: 'parameters.base', agreed: 'parameters.baseline' },
      parameters.baseline,
    ),
  rule: ({ parameters }, characteristic) => indexRule(parameters, characteristic),
  options: ({ parameters }, characteristic) => {
    const { share, sigmas, confidence } = parameters
    const width = widthOf(parameters, characteristic)
    return { confidence, index: { share, sigmas, ...(width !== null && { width }) } }
  },
  judge: ({ parameters }, facts) => {
    const { share, sigmas, confidence, basis, base, leastCg, leastCgk } = parameters
    const limits = { lower: leastCgk, upper: null }
    const asIndex = (judgement: Judgement): Judgement => ({ ...judgement, figure: null, quantity: 'ratio' })
    const inUnit = widthOf(parameters, facts.characteristic)
    if (inUnit === null) return asIndex(notShown(facts, limits, { code: missingBaseline(base) }))
    const width = rational(inUnit)
    // Half of the allowance is what a bias may take up when there is no spread at all.
    const most = toNumber(divide(multiply(rational(share), width), rational(2)))
    const of = factsWithin(most, facts)
    if (isReason(of)) return asIndex(notShown(facts, limits, of))
    const found = capabilityIndices({ share, sigmas, width }, confidence, of.bias, of.standardDeviation, of.n)
    const parts = partsOf(found, leastCg, leastCgk)
    const judged = parts.map((part) => ({ part, ...(basis === 'bound' ? onBound(part) : onEstimate(part)) }))
    const decisive = judged.reduce((worst, each) =>
      severity[each.verdict] > severity[worst.verdict] ? each : worst,
    )
    const { part, verdict, code } = decisive
    return {
      verdict,
      figure: part.figure,
      interval: basis === 'bound' ? { lower: part.lower, upper: part.upper } : null,
      limits: { lower: part.least, upper: null },
      quantity: 'ratio',
      reason: { code, index: part.index, least: part.least, cg: found.cg, cgk: found.cgk },
    }
  },
  readingsNeeded: ({ parameters }, characteristic, truth, power) =>
    readingsFor(indexRule(parameters, characteristic), truth, power),
}

const severity: Record<Verdict, number> = {
  meets: 0,
  'meets-with-conditions': 1,
  'not-shown': 2,
  'falls-short': 3,
}

/** The width in the characteristic's unit; null where there is none, or no number holds it. */
function widthOf({ base, baseline }: BiasIndexParameters, of: Characteristic): number | null {
  const exact = baselineWidth(base, of, baseline)
  const width = exact && toNumber(exact)
  return width !== null && width > 0 && Number.isFinite(width) ? width : null
}

function indexRule(parameters: BiasIndexParameters, of: Characteristic): Rule | null {
  const { share, sigmas, leastCg, leastCgk, basis, confidence } = parameters
  const width = widthOf(parameters, of)
  if (width === null) return null
  return {
    ...{ type: 'index', share, sigmas, least: leastCgk, toleranceWidth: width },
    ...(leastCg !== null && { leastCg }),
    ...(basis === 'bound' && { alpha: complement(confidence) }),
  }
}

/** Cgk first: it decides where both come out alike. */
function partsOf(found: Indices, leastCg: number | null, leastCgk: number): [Part, ...Part[]] {
  const cgk: Part = {
    index: 'cgk',
    least: leastCgk,
    figure: found.cgk ?? NaN,
    lower: found.cgkLowerBound,
    upper: found.cgkUpperBound,
  }
  if (leastCg === null) return [cgk]
  return [
    cgk,
    {
      index: 'cg',
      least: leastCg,
      figure: found.cg ?? NaN,
      lower: found.cgLowerBound,
      upper: found.cgUpperBound,
    },
  ]
}

const undefinedFigure = { verdict: 'not-shown', code: 'not-representable' } as const

function onEstimate({ figure, least }: Part): { verdict: Verdict; code: ReasonCode } {
  if (!Number.isFinite(figure)) return undefinedFigure
  return figure >= least
    ? { verdict: 'meets', code: 'index-high-enough' }
    : { verdict: 'falls-short', code: 'index-too-low' }
}

function onBound({ figure, lower, upper, least }: Part): { verdict: Verdict; code: ReasonCode } {
  const figures = [figure, lower, upper]
  if (lower === null || upper === null || !figures.every(Number.isFinite)) return undefinedFigure
  if (lower >= least) return { verdict: 'meets', code: 'index-bound-high-enough' }
  return upper < least
    ? { verdict: 'falls-short', code: 'index-bound-too-low' }
    : { verdict: 'not-shown', code: 'index-bound-open' }
}
