import { absolute, divide, rational, subtract, toNumber } from '../decimal'
import { eatsMargin, intervalAround } from '../statistics/mean-interval'
import type {
  BiasWithUncertaintyParameters,
  Characteristic,
  ClauseDescriptor,
  ReasonCode,
  Rule,
  RuleAssumptions,
  Verdict,
} from '../types'
import { marginInUnit, marginProblems } from './baselines'
import { biasFacts, isReason, notShown, readingsFor, standardUncertaintyOf } from './bias-facts'

/**
 * Bias plus its expanded uncertainty within a margin: U = k·√(s²/n + u²) with the standard uncertainty u of the
 * reference value, which no number of readings makes smaller. Meets when |bias| + U ≤ margin, falls short when
 * |bias| − U is above it.
 */
export const biasWithUncertainty: ClauseDescriptor<'bias-with-uncertainty'> = {
  type: 'bias-with-uncertainty',
  subject: 'bias',
  measure: 'with-uncertainty',
  basis: 'bound',
  studyKind: 'bias',
  fields: [
    { name: 'margin', kind: 'margin', required: true, default: { base: 'tolerance', share: 0.1 } },
    { name: 'coverageFactor', kind: 'number', required: true, minimum: 1, maximum: 10, default: 2 },
  ],
  check: ({ parameters }, characteristic) =>
    marginProblems(parameters.margin, characteristic, 'parameters.margin'),
  rule: ({ parameters }, characteristic, assumed) => uncertaintyRule(parameters, characteristic, assumed),
  options: ({ parameters }, characteristic) => {
    const margin = marginInUnit(parameters.margin, characteristic)
    return { coverageFactor: parameters.coverageFactor, ...(margin === null ? {} : { margin }) }
  },
  judge: ({ parameters }, facts) => {
    const { coverageFactor } = parameters
    const margin = marginInUnit(parameters.margin, facts.characteristic)
    if (margin === null) return notShown(facts, null, { code: 'margin-undefined' })
    const limits = { lower: -margin, upper: margin }
    const of = biasFacts(facts.study)
    if (isReason(of)) return notShown(facts, limits, of)
    const u = of.referenceStandardUncertainty
    if (u === null) return notShown(facts, limits, { code: 'reference-uncertainty-unknown' })
    if (eatsMargin(u, coverageFactor, margin)) {
      const expandedUncertainty = coverageFactor * u
      return notShown(facts, limits, { code: 'reference-uncertainty-too-large', expandedUncertainty, margin })
    }
    const standardUncertainty = standardUncertaintyOf(of, u, facts)
    // How many standard uncertainties of room there are to the margin; rounded once, as the uncertainty itself is.
    const room = toNumber(
      divide(subtract(rational(margin), absolute(rational(of.bias))), rational(coverageFactor)),
    )
    const { verdict, code } = against(standardUncertainty, room)
    const expandedUncertainty = coverageFactor * standardUncertainty
    return {
      verdict,
      figure: of.bias,
      interval: intervalAround(of.bias, expandedUncertainty),
      limits,
      quantity: 'value',
      reason: { code, margin, expandedUncertainty },
    }
  },
  readingsNeeded: ({ parameters }, characteristic, truth, power, assumed) =>
    readingsFor(uncertaintyRule(parameters, characteristic, assumed), truth, power),
}

function against(standardUncertainty: number, room: number): { verdict: Verdict; code: ReasonCode } {
  if (standardUncertainty <= room) return { verdict: 'meets', code: 'bias-with-uncertainty-inside' }
  return room < -standardUncertainty
    ? { verdict: 'falls-short', code: 'bias-with-uncertainty-outside' }
    : { verdict: 'not-shown', code: 'bias-with-uncertainty-crosses' }
}

function uncertaintyRule(
  { margin: agreed, coverageFactor }: BiasWithUncertaintyParameters,
  characteristic: Characteristic,
  assumed: RuleAssumptions = {},
): Rule | null {
  const margin = marginInUnit(agreed, characteristic)
  const { referenceStandardUncertainty = 0 } = assumed
  return margin === null
    ? null
    : { type: 'with-uncertainty', margin, referenceStandardUncertainty, coverageFactor }
}
