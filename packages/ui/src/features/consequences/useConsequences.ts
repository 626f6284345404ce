import { computedCharacteristic, type agreements } from '@evenrule/api/contract'
import type { Clause } from '@evenrule/metrology'
import { computed, ref } from 'vue'
import { consequenceWords as words } from '../../strings/consequences'
import { anyTolerance, inReadableUnit } from './assumptions'
import { hasConsequences } from './consequenceRows'
import type { ClauseDifference } from '../agreements/differences'
import { useAssumptions } from './useAssumptions'
import { useEffects } from './useEffects'

type Scoped = agreements.ScopedCharacteristic

/** A characteristic whose consequences tell most: of class safety, with a two-sided tolerance, the first. */
function telling(characteristics: readonly Scoped[]): Scoped | undefined {
  const rank = (of: Scoped) =>
    (of.lowerLimit !== null && of.upperLimit !== null ? 2 : 0) + (of.class === 'safety' ? 1 : 0)
  return characteristics.reduce<Scoped | undefined>(
    (best, each) => (best === undefined || rank(each) > rank(best) ? each : best),
    undefined,
  )
}

/**
 * What the clauses of a comparison do, for one characteristic of the scope, at a number of readings and a spread that
 * the reader can change.
 */
export function useConsequences(
  source: () => {
    rows: readonly ClauseDifference[]
    before: readonly Clause[]
    after: readonly Clause[]
    characteristics: readonly Scoped[]
  },
) {
  const chosenId = ref('')
  const chosen = computed(() => {
    const { characteristics } = source()
    return (
      characteristics.find(({ characteristicId }) => characteristicId === chosenId.value) ??
      telling(characteristics)
    )
  })
  const characteristic = computed(() => {
    const { before, after } = source()
    return chosen.value
      ? inReadableUnit(computedCharacteristic(chosen.value), [...after, ...before])
      : anyTolerance
  })
  const unit = computed(() => (chosen.value ? characteristic.value.unit : words.anyUnit))
  const entered = useAssumptions(() => {
    const { before, after } = source()
    return { before, after, characteristic: characteristic.value }
  })
  const pairs = computed(() =>
    source().rows.filter(({ before, after }) =>
      [before, after].some((clause) => clause && hasConsequences(clause)),
    ),
  )
  const { effects, failed } = useEffects(() => ({
    pairs: pairs.value.map(({ key, before, after }) => ({ key, before, after })),
    characteristic: characteristic.value,
    assumptions: entered.assumptions.value,
  }))
  return {
    ...entered,
    chosen,
    characteristic,
    choose(id: string) {
      chosenId.value = id
      entered.forgetValues()
    },
    unit,
    pairs,
    effects,
    failed,
  }
}

export type ConsequencesView = ReturnType<typeof useConsequences>
