import type { Reader } from '../input/reader'
import { readRule, ruleDescriptor } from '../rules'
import { chanceToMeet } from '../rules/chances'
import type { IncentiveChange, IncentivesOutput, Rule, Truth } from '../types'
import { readDesign, readTruth } from './operating-characteristic'

/** A change of a chance up to this counts as none: it is within the accuracy of the chances. */
const threshold = 1e-9

/**
 * Whether the chance to meet a rule rises with twice the spread, falls with twice the readings, or rises at half the
 * risk level. Computed from the exact chances, at the truth given or, without one, at the truth among those the rule
 * is meant to accept where the wrong incentive is strongest. Domain: n ≥ 2, a truth with a standard deviation above 0 in
 * the unit of the rule. The flaws it looks for are those of the zero-difference test (see `zeroTest`).
 */
export function incentives(rule: Rule, n: number, truth?: Truth): IncentivesOutput {
  const truths = truth ? [truth] : truthsMeantToBeAccepted(rule)
  const stricterRule = ruleDescriptor(rule).stricter(rule) as Rule | null
  const now = chanceToMeet(rule, n)
  const before = truths.map(now)
  const strongest = (change: IncentiveChange, rises: boolean, changed: (at: Truth) => number) => {
    let worst = { change, truth: truths[0] as Truth, before: 0, after: 0 }
    let largest = -Infinity
    truths.forEach((at, index) => {
      const shown = { change, truth: at, before: before[index] ?? 0, after: changed(at) }
      const wrong = rises ? shown.after - shown.before : shown.before - shown.after
      if (wrong > largest) [worst, largest] = [shown, wrong]
    })
    return { shown: worst, wrong: largest > threshold }
  }
  const worse = strongest('worse-repeatability', true, (at) => now(doubled(at)))
  const moreReadings = chanceToMeet(rule, 2 * n)
  const more = strongest('more-readings', false, moreReadings)
  const atHalfTheRisk = stricterRule && chanceToMeet(stricterRule, n)
  const stricter = atHalfTheRisk && strongest('stricter-risk', true, atHalfTheRisk)
  return {
    kind: 'incentives',
    worseRepeatabilityHelps: worse.wrong,
    moreReadingsHurt: more.wrong,
    stricterRiskHelps: stricter ? stricter.wrong : null,
    shown: [worse.shown, more.shown, ...(stricter ? [stricter.shown] : [])],
    warnings: [],
  }
}

const doubled = ({ bias, standardDeviation }: Truth): Truth => ({
  bias,
  standardDeviation: 2 * standardDeviation,
})

/**
 * Truths by spread, so that those that share one follow each other and share its integration points (see `chancesOf`).
 * Biases from zero to just inside the margin, each with spreads up to the largest the rule is meant to accept; for a
 * rule without a margin biases up to three standard deviations, whose size does not matter then.
 */
function truthsMeantToBeAccepted(rule: Rule): Truth[] {
  const { margin, largestSpread } = ruleDescriptor(rule)
  const inside = margin(rule)
  const steps = 20
  if (inside === null) {
    return Array.from({ length: 3 * steps + 1 }, (_, i) => ({ bias: i / steps, standardDeviation: 1 }))
  }
  const shares = [0.02, 0.05, 0.1, 0.2, 0.3, 0.4, 0.5, 0.65, 0.8, 1]
  const biases = Array.from({ length: steps }, (_, i) => (inside * i) / steps)
  return shares.flatMap((share) =>
    biases.map((bias) => ({ bias, standardDeviation: share * (largestSpread(rule, bias) ?? inside) })),
  )
}

/** Reads the input of `incentives` and answers it. Throws `InvalidInput` with the path of what is wrong. */
export function readIncentives(reader: Reader): IncentivesOutput {
  const rule = readRule(reader)
  const n = readDesign(reader)
  const truth = reader.optionalObject('truth')
  return incentives(rule, n, truth && readTruth(truth))
}
