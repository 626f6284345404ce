import type { AnswerInputOf } from '../../../contract/define'
import type { readStudy } from '../../../contract/studies'
import { csvText } from '../../csv-export'
import { seededRandom } from '../../seeded-random'
import { cleanFileName } from '../files/files.content'
import type { StudyRow } from './studies.repository'

type RunSheet = AnswerInputOf<typeof readStudy>['runSheet']

/**
 * The order to take the readings in. Positions or times are dealt in rounds, each round in an order of its own, so
 * that a drift during collection bears on all of them alike; the same seed always gives the same sheet.
 */
export function runSheetOf({
  plannedReadings,
  slots,
  runSheetSeed,
}: Pick<StudyRow, 'plannedReadings' | 'slots' | 'runSheetSeed'>): RunSheet {
  const random = seededRandom(runSheetSeed)
  const sheet: RunSheet = []
  while (sheet.length < plannedReadings) {
    const round = slots.length === 0 ? [null] : shuffled(slots, random)
    for (const slot of round)
      if (sheet.length < plannedReadings) sheet.push({ number: sheet.length + 1, slot })
  }
  return sheet
}

/** Fisher and Yates's shuffle. */
function shuffled<T>(items: readonly T[], random: () => number): T[] {
  const rest = [...items]
  const dealt: T[] = []
  while (rest.length > 0) dealt.push(...rest.splice(Math.floor(random() * rest.length), 1))
  return dealt
}

/** The run sheet as a file: one row per reading, with an empty cell to fill in. */
export function runSheetFile(study: StudyRow, separator: 'comma' | 'semicolon' | 'tab') {
  const withSlots = study.slots.length > 0
  const reading = study.measuredAs === 'deviation' ? 'Deviation' : 'Reading'
  const header = ['No.', ...(withSlots ? ['Position or time'] : []), `${reading} (${study.unit})`]
  const rows = runSheetOf(study).map(({ number, slot }) => [
    String(number),
    ...(withSlots ? [slot ?? ''] : []),
    '',
  ])
  return {
    name: cleanFileName(`${study.code} run sheet.csv`),
    contentType: 'text/csv; charset=utf-8',
    bytes: csvText([header, ...rows], separator),
  }
}
