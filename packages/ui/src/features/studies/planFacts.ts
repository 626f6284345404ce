import type { studies } from '@evenrule/api/contract'
import { formatChance } from '../../format'
import { planWords as words } from '../../strings/studies'

/** What a plan says in one answer: the decisive part and the rest. */
export function planAnswer(plan: studies.StudyPlanned, chance: number): [string, string] {
  const clauses = plan.tasks.flatMap((task) => task.clauses)
  if (clauses.length === 0) return [words.noCriteria, words.noCriteriaRest]
  if (plan.readings !== null) {
    const rest = clauses.some(({ reason }) => reason === 'size-does-not-help')
      ? words.answerSome
      : words.answerRest
    return [words.answerWith(plan.readings), rest(formatChance(chance))]
  }
  return clauses.some(({ reason }) => reason === 'no-size-suffices')
    ? [words.noSize, words.noSizeRest]
    : [words.noNeed, words.noNeedRest]
}

/** "14" percent and the like as typed, as a share; undefined where it is no chance. */
export function chanceOf(text: string): number | undefined {
  const percent = Number(text.trim().replace(',', '.'))
  if (text.trim() === '' || !(percent >= 1 && percent <= 99.9)) return undefined
  // In decimal: 99.9 % is 0.999.
  return Number(`${percent}e-2`)
}

/** Positions or times, one a line, without empty lines. */
export const slotsOf = (text: string): string[] =>
  text
    .split('\n')
    .map((line) => line.trim())
    .filter(Boolean)

/** A short name for the next study of a gauge: "BG-14 S3". */
export const suggestedCode = (gaugeCode: string, studiesBefore: number): string =>
  `${gaugeCode.slice(0, 34)} S${studiesBefore + 1}`
