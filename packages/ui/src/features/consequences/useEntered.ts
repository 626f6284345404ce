import { computedCharacteristic, type agreements } from '@evenrule/api/contract'
import type { Clause } from '@evenrule/metrology'
import { computed, ref } from 'vue'
import { consequenceWords as words } from '../../strings/consequences'
import { anyTolerance, inReadableUnit } from './assumptions'
import { useAssumptions } from './useAssumptions'

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
 * What consequences are computed for, as the reader enters it: one characteristic of the scope, in a unit that is easy
 * to read, and the assumptions about study and gauge.
 */
export function useEntered(
  source: () => {
    before: readonly Clause[]
    after: readonly Clause[]
    characteristics: readonly Scoped[]
  },
  first = '',
) {
  const chosenId = ref(first)
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
  return {
    ...entered,
    chosen,
    choose(id: string) {
      chosenId.value = id
      entered.forgetValues()
    },
    characteristic,
    unit,
  }
}
export type Entered = ReturnType<typeof useEntered>
