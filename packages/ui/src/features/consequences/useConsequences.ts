import type { agreements } from '@evenrule/api/contract'
import type { Clause } from '@evenrule/metrology'
import { computed } from 'vue'
import type { ClauseDifference } from '../agreements/differences'
import { hasConsequences } from './consequenceRows'
import { useEffects } from './useEffects'
import { useEntered } from './useEntered'

/** The two clauses to set beside each other: one alone where nothing about it changes. */
export const compared = ({
  before,
  after,
  change,
}: Pick<ClauseDifference, 'before' | 'after' | 'change'>) => ({
  before: change === 'same' ? null : before,
  after,
})

/**
 * What the clauses of a comparison do, for one characteristic of the scope, at a number of readings and a spread that
 * the reader can change.
 */
export function useConsequences(
  source: () => {
    rows: readonly ClauseDifference[]
    before: readonly Clause[]
    after: readonly Clause[]
    characteristics: readonly agreements.ScopedCharacteristic[]
  },
) {
  const entered = useEntered(source)
  const pairs = computed(() =>
    source().rows.filter(({ before, after }) =>
      [before, after].some((clause) => clause && hasConsequences(clause)),
    ),
  )
  const { effects, failed } = useEffects(() => ({
    pairs: pairs.value.map((row) => ({ key: row.key, ...compared(row) })),
    characteristic: entered.characteristic.value,
    assumptions: entered.assumptions.value,
  }))
  return { ...entered, pairs, effects, failed }
}

export type ConsequencesView = ReturnType<typeof useConsequences>
