import { InvalidInput } from '../input/invalid-input'
import type { Reader } from '../input/reader'
import { readRule, ruleDescriptor } from '../rules'
import { chancesOf, chanceToMeet, leastChanceToMeet } from '../rules/chances'
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
  /** Far from the answer, a smaller chance that is formed faster settles it; the margin is that of its accuracy. */
  const surely = (n: number) =>
    powerOf === 'meets' && (leastChanceToMeet(rule, n)?.(truth) ?? 0) >= power + 1e-9
  const reaches = (n: number) => surely(n) || chance(n) >= power
  let held: number | null = null
  for (const n of searchedDownwards()) {
    if (reaches(n)) {
      held = n
      continue
    }
    if (held !== null) held = leastBetween(reaches, n, held)
    break
  }
  return held === null ? null : { n: held, power: chance(held) }
}

/** The least number above `tooFew`, and at most `enough`, that reaches the power. */
function leastBetween(reaches: (n: number) => boolean, tooFew: number, enough: number): number {
  let [low, high] = [tooFew, enough]
  while (high - low > 1) {
    const middle = Math.floor((low + high) / 2)
    if (reaches(middle)) high = middle
    else low = middle
  }
  return high
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
