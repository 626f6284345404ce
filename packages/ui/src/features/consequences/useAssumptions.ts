import type { Characteristic, Clause } from '@evenrule/metrology'
import { computed, ref } from 'vue'
import { parseNumber } from '../../format'
import { shiftDecimal } from '../../format/numbers'
import { consequenceWords as words } from '../../strings/consequences'
import { assumedReference, assumedSpread, plannedReadings, type Assumptions } from './assumptions'

export const mostReadings = 1000
export const leastReadings = 2
const usualChance = 0.9

/** The value there was where the new one says the same, so that nothing is drawn anew for it. */
export const unchanged = <Value>(before: Value | undefined, now: Value): Value =>
  before !== undefined && JSON.stringify(before) === JSON.stringify(now) ? before : now

/** A number that may be typed, with what counts while nothing good is. */
interface Entry {
  usual: number
  /** The number as it is written in its field. */
  text: (value: number) => string
  /** The number that a text stands for, as it is computed with; undefined where it is not good. */
  read: (typed: number) => number | undefined
  problem: string
}

export type EntryName = 'readings' | 'spread' | 'reference' | 'bias' | 'chance'

const plain = { text: String }
const within = (least: number, most: number) => (value: number) =>
  value >= least && value <= most ? value : undefined

/**
 * Everything consequences are computed for: sensible until somebody types or drags others. An entry that cannot be
 * computed with keeps the last good figure and says what is wrong.
 */
export function useAssumptions(
  source: () => { after: readonly Clause[]; before: readonly Clause[]; characteristic: Characteristic },
) {
  const typed = ref<Partial<Record<EntryName, string>>>({})
  const entries = computed<Record<EntryName, Entry>>(() => {
    const { after, before, characteristic } = source()
    const clauses = [...after, ...before]
    return {
      readings: {
        ...plain,
        usual: Math.min(plannedReadings(after, before), mostReadings),
        read: (value) => (Number.isInteger(value) ? within(leastReadings, mostReadings)(value) : undefined),
        problem: words.readingsProblem,
      },
      spread: {
        ...plain,
        usual: assumedSpread(characteristic, clauses),
        read: (value) => (value > 0 ? value : undefined),
        problem: words.spreadProblem,
      },
      reference: {
        ...plain,
        usual: assumedReference(characteristic, clauses) ?? 0,
        read: within(0, Infinity),
        problem: words.notNegative,
      },
      bias: { ...plain, usual: 0, read: within(0, Infinity), problem: words.notNegative },
      chance: {
        usual: usualChance,
        text: (value) => String(shiftDecimal(value, 2)),
        read: (value) => within(0.01, 0.999)(shiftDecimal(value, -2)),
        problem: words.chanceProblem,
      },
    }
  })
  const good = (name: EntryName): number | undefined => {
    const text = typed.value[name]
    const value = text === undefined ? undefined : parseNumber(text).value
    return value == null ? undefined : entries.value[name].read(value)
  }
  const value = (name: EntryName): number => good(name) ?? entries.value[name].usual
  const addsReference = computed(() => {
    const { after, before, characteristic } = source()
    return assumedReference(characteristic, [...after, ...before]) !== undefined
  })
  return {
    assumptions: computed<Assumptions>((before) =>
      // A move of the bias leaves them as they are, and so everything that is drawn from them.
      unchanged(before, {
        readings: value('readings'),
        standardDeviation: value('spread'),
        ...(addsReference.value ? { referenceStandardUncertainty: value('reference') } : {}),
      }),
    ),
    /** Whether a clause adds the uncertainty of the reference value, so that it must be assumed. */
    addsReference,
    /** The true bias of the gauge looked at, and the wanted chance to meet a clause. */
    bias: computed(() => value('bias')),
    chance: computed(() => value('chance')),
    usual: (name: EntryName) => entries.value[name].usual,
    text: (name: EntryName) => typed.value[name] ?? entries.value[name].text(entries.value[name].usual),
    type: (name: EntryName, text: string) => void (typed.value = { ...typed.value, [name]: text }),
    put: (name: EntryName, number: number) =>
      void (typed.value = { ...typed.value, [name]: entries.value[name].text(number) }),
    error: (name: EntryName) =>
      typed.value[name] === undefined || good(name) !== undefined ? undefined : entries.value[name].problem,
    /** Another characteristic: what was typed in the unit of the one before means nothing there. */
    forgetValues: () => (typed.value = { readings: typed.value.readings, chance: typed.value.chance }),
  }
}
export type AssumptionsView = ReturnType<typeof useAssumptions>
