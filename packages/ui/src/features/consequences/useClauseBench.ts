import {
  chancesOf,
  clauseDescriptor,
  gaugeAskedFor,
  type Characteristic,
  type Clause,
  type Rule,
} from '@evenrule/metrology'
import { computed, type ComputedRef } from 'vue'
import {
  allowedCurve,
  biasCurve,
  biasReach,
  markedMargin,
  ruleOf,
  sizesUpTo,
  spreadCurve,
  steps,
} from './chances'
import { incentiveRows, type IncentiveRow } from './consequenceRows'
import { curveNames } from './curveNames'
import { useChunks, type Chunk } from './useChunks'
import { mostReadings, unchanged, type AssumptionsView } from './useAssumptions'

export type Which = 'before' | 'after'
const both: readonly Which[] = ['after', 'before']
const curvePoints = 200
const spreadPoints = 60

/** An axis that grows by doubling, so that it stands still while a slide moves along it. */
export function grown(most: number, value: number, share = 0.85): number {
  let end = most
  while (value > share * end) end *= 2
  return end
}

export interface BenchInput {
  pair: { before: Clause | null; after: Clause | null }
  names: { before: string; after: string }
  characteristic: Characteristic
}

/**
 * Everything the page of one clause computes, for it and the clause it would replace. The curves over the bias come at
 * once, within a frame of every move; what takes longer comes piece by piece after the last move.
 */
export function useClauseBench(source: () => BenchInput, entered: AssumptionsView) {
  const rule = (which: Which): ComputedRef<Rule | null> =>
    computed<Rule | null>((before) => {
      const { pair, characteristic } = source()
      const clause = pair[which]
      return unchanged(before, clause && ruleOf(clause, characteristic, entered.assumptions.value))
    })
  const rules = { before: rule('before'), after: rule('after') }
  const assumed = entered.assumptions
  const known = computed(() => both.map((which) => rules[which].value).filter((each) => each !== null))

  const usualSpread = computed(() => entered.usual('spread'))
  const most = {
    bias: computed(() => {
      const reach = biasReach(known.value, grown(usualSpread.value, assumed.value.standardDeviation, 1.5))
      return grown(reach, entered.bias.value, 1)
    }),
    spread: computed(() => grown(5 * usualSpread.value, assumed.value.standardDeviation)),
    readings: computed(() =>
      Math.min(mostReadings, grown(Math.max(50, 4 * entered.usual('readings')), assumed.value.readings, 0.9)),
    ),
  }
  const biases = computed(() => steps(most.bias.value, curvePoints))
  const spreads = computed(() => steps(most.spread.value, spreadPoints + 1).slice(1))
  const sizes = computed(() => sizesUpTo(most.readings.value, Math.min(5, assumed.value.readings)))

  const curve = (which: Which) =>
    computed(() => {
      const of = rules[which].value
      return of && biasCurve(of, assumed.value, biases.value)
    })
  const curves = { before: curve('before'), after: curve('after') }

  const chunks = useChunks(() => {
    const { pair, characteristic } = source()
    const { readings, standardDeviation, referenceStandardUncertainty } = assumed.value
    const [bias, chance] = [entered.bias.value, entered.chance.value]
    const of = <Value>(which: Which, rests: unknown[], run: (rule: Rule, clause: Clause) => Value) => {
      const [clause, own] = [pair[which], rules[which].value]
      return {
        key: JSON.stringify([clause, own, ...rests]),
        run: () => (clause && own ? run(own, clause) : null),
      } satisfies Chunk<Value | null>
    }
    const incentives = (which: Which) =>
      of(which, [readings, standardDeviation], (own): IncentiveRow[] => incentiveRows(own, assumed.value))
    const spread = (which: Which) =>
      of(which, [readings, bias, most.spread.value], (own) =>
        spreadCurve(own, assumed.value, bias, spreads.value),
      )
    const allowed = (which: Which) =>
      of(which, [sizes.value.length, most.readings.value, standardDeviation], (own) => ({
        sizes: sizes.value,
        allowed: allowedCurve(own, sizes.value, standardDeviation),
      }))
    const reference = referenceStandardUncertainty === undefined ? {} : { referenceStandardUncertainty }
    const gauge = (which: Which) =>
      of(which, [readings, chance, standardDeviation], (_, clause) =>
        gaugeAskedFor(clause, characteristic, readings, chance, standardDeviation, reference),
      )
    const least = (which: Which) =>
      of(
        which,
        [standardDeviation, bias, chance],
        (_, clause) =>
          clauseDescriptor(clause).readingsNeeded?.(
            clause,
            characteristic,
            { bias, standardDeviation },
            chance,
            reference,
          ) ?? null,
      )
    return {
      incentivesAfter: incentives('after'),
      incentivesBefore: incentives('before'),
      spreadAfter: spread('after'),
      spreadBefore: spread('before'),
      allowedAfter: allowed('after'),
      allowedBefore: allowed('before'),
      gaugeAfter: gauge('after'),
      gaugeBefore: gauge('before'),
      leastAfter: least('after'),
      leastBefore: least('before'),
    }
  })
  const { values } = chunks

  const named = computed(() => {
    const { pair, names } = source()
    const one = (which: Which) => {
      const clause = pair[which]
      const rows = which === 'after' ? values.incentivesAfter : values.incentivesBefore
      if (!clause || !rules[which].value) return null
      return { which, clause, rule: rules[which].value, perverse: rows?.some(({ wrong }) => wrong) ?? false }
    }
    return curveNames({ before: one('before'), after: one('after') }, names)
  })
  return {
    rules,
    named,
    curves,
    most,
    values,
    busy: chunks.busy,
    margin: computed(
      () => both.map((which) => rules[which].value && markedMargin(rules[which].value)).find(Boolean) ?? null,
    ),
    /** The chance to meet a clause at the bias looked at. */
    chance: (which: Which): number | null => {
      const of = rules[which].value
      const { readings, standardDeviation } = assumed.value
      return of && chancesOf(of, readings)({ bias: entered.bias.value, standardDeviation }).meets
    },
  }
}
export type ClauseBench = ReturnType<typeof useClauseBench>
