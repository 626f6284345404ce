import {
  clauseDescriptor,
  consequences,
  incentives,
  type Characteristic,
  type Clause,
  type Consequences,
  type IncentiveChange,
  type Truth,
} from '@evenrule/metrology'
import { describeIncentive, type IncentiveSentence } from '../../strings/incentives'
import type { Assumptions } from './assumptions'

/** What one clause does, with its incentives in words. */
export interface ClauseEffect {
  clause: Clause
  computed: Consequences
  incentives: IncentiveRow[]
  /** It rewards the wrong thing somewhere. */
  perverse: boolean
}

export interface IncentiveRow extends IncentiveSentence {
  kind: IncentiveChange
  /** The true bias at which the chances are given. */
  bias: number
}

/** Whether the chance to meet a clause can be computed: it has consequences to be seen before signing. */
export const hasConsequences = (clause: Clause): boolean => clauseDescriptor(clause).rule !== undefined

const ruleMargin = ({ rule }: Pick<Consequences, 'rule'>): number | null =>
  'margin' in rule ? rule.margin : null

const isWrong = ({ incentives: found }: Consequences, change: IncentiveChange): boolean =>
  ({
    'worse-repeatability': found.worseRepeatabilityHelps,
    'more-readings': found.moreReadingsHurt,
    'stricter-risk': found.stricterRiskHelps === true,
  })[change]

/** The bias of the curve at which the chance to meet the clause is nearest to one half: where a change shows most. */
const tellingBias = ({ curve }: Consequences): number =>
  curve.reduce((near, point) => (Math.abs(point.meets - 0.5) < Math.abs(near.meets - 0.5) ? point : near))
    .bias

/**
 * The incentive check of one clause. What is wrong is shown at the truth where it is worst, as computed over all the
 * rule is meant to accept; what is right at the assumed spread, where the chance is about one half.
 */
function incentiveRows(computed: Consequences, { readings, standardDeviation }: Assumptions): IncentiveRow[] {
  const telling: Truth = { bias: tellingBias(computed), standardDeviation }
  const atTelling = incentives(computed.rule, readings, telling).shown
  return computed.incentives.shown.map((worst) => {
    const wrong = isWrong(computed, worst.change)
    const shown = wrong ? worst : (atTelling.find(({ change }) => change === worst.change) ?? worst)
    // A rule without a margin knows the bias in spreads only.
    const scale =
      wrong && ruleMargin(computed) === null ? standardDeviation / worst.truth.standardDeviation : 1
    return {
      kind: shown.change,
      bias: shown.truth.bias * scale,
      ...describeIncentive(shown.change, shown.before, shown.after),
      wrong,
    }
  })
}

/** True biases of the curves: from none to beyond what matters to any of the clauses compared. */
function sharedBiases(
  clauses: readonly Clause[],
  characteristic: Characteristic,
  standardDeviation: number,
): number[] {
  const most = Math.max(
    2.4 * standardDeviation,
    ...clauses.map((clause) => {
      const rule = clauseDescriptor(clause).rule?.(clause, characteristic)
      return rule && 'margin' in rule ? 1.6 * rule.margin : 0
    }),
  )
  return Array.from({ length: 101 }, (_, at) => (most * at) / 100)
}

/** Numbers of readings from a few to four times the planned one; with two or three the zero test allows anything. */
function numbersOfReadings(planned: number): number[] {
  const sizes = new Set([planned])
  const most = Math.max(50, 4 * planned)
  for (let size = Math.min(5, planned); size <= most; size = Math.max(size + 1, Math.round(size * 1.1)))
    sizes.add(size)
  return [...sizes].sort((a, b) => a - b)
}

/** The effects of the clause in force and of the one proposed for it, on the same biases; null without a rule. */
export function clauseEffects(
  pair: { before: Clause | null; after: Clause | null },
  characteristic: Characteristic,
  assumptions: Assumptions,
): { before: ClauseEffect | null; after: ClauseEffect | null } {
  const clauses = [pair.before, pair.after].filter((clause) => clause !== null)
  const biases = sharedBiases(clauses, characteristic, assumptions.standardDeviation)
  const sizes = numbersOfReadings(assumptions.readings)
  const effect = (clause: Clause | null): ClauseEffect | null => {
    const computed = clause && consequences({ clause, characteristic, biases, sizes, ...assumptions })
    if (!computed) return null
    const rows = incentiveRows(computed, assumptions)
    return { clause, computed, incentives: rows, perverse: rows.some(({ wrong }) => wrong) }
  }
  return { before: effect(pair.before), after: effect(pair.after) }
}

/** The margin to mark on a plot: the proposal's, else that of the clause in force. */
export const shownMargin = (effects: ReturnType<typeof clauseEffects>): number | null =>
  [effects.after, effects.before].map((effect) => effect && ruleMargin(effect.computed)).find(Boolean) ?? null
