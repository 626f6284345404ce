import {
  clauseDescriptor,
  incentives,
  type Characteristic,
  type Clause,
  type CurvePoint,
  type IncentiveChange,
  type IncentivesOutput,
  type Rule,
} from '@evenrule/metrology'
import { describeIncentive, type IncentiveSentence } from '../../strings/incentives'
import type { Assumptions } from './assumptions'
import { biasCurve, biasReach, markedMargin, meantMargin, ruleOf, steps } from './chances'

/** What one clause does, with its incentives in words. */
export interface ClauseEffect {
  clause: Clause
  rule: Rule
  /** Chances of the three verdicts against the true bias. */
  curve: CurvePoint[]
  found: IncentivesOutput
  incentives: IncentiveRow[]
  /** It rewards the wrong thing somewhere. */
  perverse: boolean
}

export interface IncentiveRow extends IncentiveSentence {
  kind: IncentiveChange
  /** The true bias and the true spread at which the chances are given. */
  bias: number
  spread: number
  /** Chances to meet the clause before and after the change. */
  before: number
  after: number
}

/** Whether the chance to meet a clause can be computed: it has consequences to be seen before signing. */
export const hasConsequences = (clause: Clause): boolean => clauseDescriptor(clause).rule !== undefined

const isWrong = (found: IncentivesOutput, change: IncentiveChange): boolean =>
  ({
    'worse-repeatability': found.worseRepeatabilityHelps,
    'more-readings': found.moreReadingsHurt,
    'stricter-risk': found.stricterRiskHelps === true,
  })[change]

type Shown = IncentivesOutput['shown'][number]

/** Which way the chance to meet a sound clause goes. */
const soundSign: Record<IncentiveChange, 1 | -1> = {
  'worse-repeatability': -1,
  'more-readings': 1,
  'stricter-risk': -1,
}
const soundly = ({ change, before, after }: Shown): number => soundSign[change] * (after - before)

/** At the assumed spread, the true bias of those the rule is meant to accept at which each change shows most. */
function telling(rule: Rule, { readings, standardDeviation }: Assumptions): Map<IncentiveChange, Shown> {
  const reach = meantMargin(rule) ?? 3 * standardDeviation
  const most = new Map<IncentiveChange, Shown>()
  for (const bias of steps(0.95 * reach, 12))
    for (const shown of incentives(rule, readings, { bias, standardDeviation }).shown) {
      const best = most.get(shown.change)
      if (!best || soundly(shown) > soundly(best)) most.set(shown.change, shown)
    }
  return most
}

/**
 * The incentive check of one clause. What is wrong is shown at the truth where it is worst, as computed over all the
 * rule is meant to accept; what is right at the assumed spread, at the bias where it shows most.
 */
export function incentiveRows(
  rule: Rule,
  assumptions: Assumptions,
  found: IncentivesOutput = incentives(rule, assumptions.readings),
): IncentiveRow[] {
  const { standardDeviation } = assumptions
  const right = telling(rule, assumptions)
  return found.shown.map((worst) => {
    const wrong = isWrong(found, worst.change)
    const { change, truth, before, after } = wrong ? worst : (right.get(worst.change) ?? worst)
    // A rule without a margin knows the bias in spreads only.
    const scale = wrong && meantMargin(rule) === null ? standardDeviation / truth.standardDeviation : 1
    return {
      kind: change,
      bias: truth.bias * scale,
      spread: truth.standardDeviation * scale,
      before,
      after,
      ...describeIncentive(change, before, after),
      wrong,
    }
  })
}

const curvePoints = 200

/** The effects of the clause in force and of the one proposed for it, on the same biases; null without a rule. */
export function clauseEffects(
  pair: { before: Clause | null; after: Clause | null },
  characteristic: Characteristic,
  assumptions: Assumptions,
): { before: ClauseEffect | null; after: ClauseEffect | null } {
  const rule = (clause: Clause | null) => clause && ruleOf(clause, characteristic, assumptions)
  const rules = { before: rule(pair.before), after: rule(pair.after) }
  const known = [rules.before, rules.after].filter((each) => each !== null)
  const biases = steps(biasReach(known, assumptions.standardDeviation), curvePoints)
  const effect = (which: 'before' | 'after'): ClauseEffect | null => {
    const [clause, of] = [pair[which], rules[which]]
    if (!clause || !of) return null
    const found = incentives(of, assumptions.readings)
    const rows = incentiveRows(of, assumptions, found)
    return {
      clause,
      rule: of,
      curve: biasCurve(of, assumptions, biases),
      found,
      incentives: rows,
      perverse: rows.some(({ wrong }) => wrong),
    }
  }
  return { before: effect('before'), after: effect('after') }
}

/** The margin to mark on a plot: the proposal's, else that of the clause in force. */
export const shownMargin = (rules: {
  before: { rule: Rule } | null
  after: { rule: Rule } | null
}): number | null =>
  [rules.after, rules.before].map((each) => each && markedMargin(each.rule)).find(Boolean) ?? null
