import { InvalidInput } from '../input/invalid-input'
import type { Reader } from '../input/reader'
import { readRule, ruleDescriptor } from '../rules'
import { chancesOf, chanceToMeet } from '../rules/chances'
import type { Rule, SampleSizeOutput, Truth } from '../types'
import { readTruth } from './operating-characteristic'

/** The largest number of readings a study is planned for. */
export const mostReadings = 100_000

/**
 * The least number of readings, at least 2, from which the chance a rule is after reaches `power` and holds it for
 * every larger number up to 100,000, with the chance there; null where none does. The chance is that of meeting the
 * rule, for the zero test that of being refused. It may fall again with more readings, so the search comes from the
 * large end, over every number up to 32 and steps of 8 % above, between which the chance crosses the power once.
 */
export function sampleSize(rule: Rule, truth: Truth, power: number): { n: number; power: number } | null {
  const { powerOf } = ruleDescriptor(rule)
  const chance = (n: number) =>
    powerOf === 'meets' ? chanceToMeet(rule, n)(truth) : chancesOf(rule, n)(truth)[powerOf]
  let held: { n: number; power: number } | null = null
  for (const n of searchedDownwards()) {
    const here = chance(n)
    if (here >= power) held = { n, power: here }
    else return held && refine(chance, power, n, held)
  }
  return held
}

function refine(
  chance: (n: number) => number,
  power: number,
  tooFew: number,
  enough: { n: number; power: number },
): { n: number; power: number } {
  let low = tooFew
  let held = enough
  while (held.n - low > 1) {
    const middle = Math.floor((low + held.n) / 2)
    const here = chance(middle)
    if (here >= power) held = { n: middle, power: here }
    else low = middle
  }
  return held
}

function* searchedDownwards(): Generator<number> {
  let n = mostReadings
  while (n > 32) {
    yield n
    n = Math.max(32, Math.floor(n / 1.08))
  }
  for (; n >= 2; n--) yield n
}

/** Reads the input of `sampleSize` and answers it. Throws `InvalidInput` `no-sample-size` where no number suffices. */
export function readSampleSize(reader: Reader): SampleSizeOutput {
  const rule = readRule(reader)
  const truth = readTruth(reader.object('truth'))
  const power = reader.number('power', { above: 0, below: 1 })
  const found = sampleSize(rule, truth, power)
  if (!found) {
    throw new InvalidInput(
      'no-sample-size',
      `No number of readings up to ${mostReadings} gives this chance at this truth; assume a smaller bias or spread, or ask for less.`,
      'power',
    )
  }
  return { kind: 'sampleSize', ...found, warnings: [] }
}
