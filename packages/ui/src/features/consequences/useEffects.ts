import type { Characteristic, Clause } from '@evenrule/metrology'
import { onScopeDispose, shallowRef, watch } from 'vue'
import type { Assumptions } from './assumptions'
import { clauseEffects } from './consequenceRows'

type Effects = ReturnType<typeof clauseEffects>

export interface EffectsInput {
  pairs: readonly { key: string; before: Clause | null; after: Clause | null }[]
  characteristic: Characteristic
  assumptions: Assumptions
}

/**
 * The effects of pairs of clauses by key, computed in the browser a moment after the last change of what they rest on;
 * undefined until the first are there.
 */
export function useEffects(input: () => EffectsInput, delay = 150) {
  const effects = shallowRef<ReadonlyMap<string, Effects>>()
  const failed = shallowRef(false)
  let timer: ReturnType<typeof setTimeout> | undefined
  function compute() {
    const { pairs, characteristic, assumptions } = input()
    try {
      effects.value = new Map(
        pairs.map(({ key, ...pair }) => [key, clauseEffects(pair, characteristic, assumptions)]),
      )
      failed.value = false
    } catch {
      // What is typed may be beyond what can be computed with; the page says so and keeps what was typed.
      failed.value = true
    }
  }
  watch(
    () => JSON.stringify(input()),
    () => {
      clearTimeout(timer)
      timer = setTimeout(compute, effects.value ? delay : 0)
    },
    { immediate: true },
  )
  onScopeDispose(() => clearTimeout(timer))
  return { effects, failed }
}
