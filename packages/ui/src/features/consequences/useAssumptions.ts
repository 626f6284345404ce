import type { Characteristic, Clause } from '@evenrule/metrology'
import { computed, ref } from 'vue'
import { parseNumber } from '../../format'
import { consequenceWords as words } from '../../strings/consequences'
import { assumedSpread, plannedReadings, type Assumptions } from './assumptions'

const mostReadings = 1000

/**
 * The number of readings and the spread that consequences are computed for: sensible until somebody types others. An
 * entry that cannot be computed with keeps the last good figure and says what is wrong.
 */
export function useAssumptions(
  source: () => { after: readonly Clause[]; before: readonly Clause[]; characteristic: Characteristic },
) {
  const typed = ref<{ readings?: string; spread?: string }>({})
  const usual = computed<Assumptions>(() => {
    const { after, before, characteristic } = source()
    return {
      readings: Math.min(plannedReadings(after, before), mostReadings),
      standardDeviation: assumedSpread(characteristic, [...after, ...before]),
    }
  })
  const readings = computed(() => {
    const value = typed.value.readings === undefined ? undefined : parseNumber(typed.value.readings).value
    const good = value != null && Number.isInteger(value) && value >= 2 && value <= mostReadings
    return { good: value === undefined || good, value: good ? value : usual.value.readings }
  })
  const spread = computed(() => {
    const value = typed.value.spread === undefined ? undefined : parseNumber(typed.value.spread).value
    const good = value != null && value > 0
    return { good: value === undefined || good, value: good ? value : usual.value.standardDeviation }
  })
  return {
    assumptions: computed<Assumptions>(() => ({
      readings: readings.value.value,
      standardDeviation: spread.value.value,
    })),
    readingsText: computed(() => typed.value.readings ?? String(usual.value.readings)),
    spreadText: computed(() => typed.value.spread ?? String(usual.value.standardDeviation)),
    typeReadings: (text: string) => void (typed.value = { ...typed.value, readings: text }),
    typeSpread: (text: string) => void (typed.value = { ...typed.value, spread: text }),
    readingsError: computed(() => (readings.value.good ? undefined : words.readingsProblem)),
    spreadError: computed(() => (spread.value.good ? undefined : words.spreadProblem)),
    /** Another characteristic: a spread typed for the one before means nothing there. */
    forgetSpread: () => (typed.value = { readings: typed.value.readings }),
  }
}
