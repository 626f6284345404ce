import { daysBetween } from '../../calendar'

/** How a day stands to be told: over, or within so many days. */
export type Stage = 'over' | number

/**
 * Which reminder of a day is due today; null where none is. `before` are the days ahead on which to remind. After
 * down time only the nearest is told: nobody needs to read of seven days when one is left. `since` is the day it was
 * set: who was told of it then needs no reminder of the same stretch.
 */
export function stageOf(
  day: string,
  today: string,
  before: readonly number[],
  since: string | null = null,
): Stage | null {
  const left = daysBetween(today, day)
  if (left < 0) return 'over'
  const stage = [...before].sort((a, b) => a - b).find((days) => left <= days)
  if (stage === undefined) return null
  return since !== null && daysBetween(since, day) <= stage ? null : stage
}

/** Days left, in words: today, tomorrow, in 6 days. */
export function inDays(left: number): string {
  if (left === 0) return 'today'
  return left === 1 ? 'tomorrow' : `in ${left} days`
}
