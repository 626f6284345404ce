import type { AnswerInputOf } from '../../../contract/define'
import type { readStudy } from '../../../contract/studies'
import { csvText } from '../../csv-export'
import { seededRandom } from '../../seeded-random'
import type { Download } from '../../http/route'
import { tableTypes } from '../../tables/content'
import { asWritten } from '../../tables/numbers'
import { runOnThread } from '../../thread/run'
import { cleanFileName } from '../files/files.content'
import { runSheetNumber, runSheetReading, runSheetTitle } from './readings/run-sheet-file'
import { runSheetWorkbook } from './run-sheet.workbook'
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

/** What stands on a run sheet: its title, what is measured, the headings, and one row per reading. */
export interface RunSheetTable {
  title: string
  about: string
  headings: string[]
  /** Number, position or time where the study has any, and the reading as far as it is kept. */
  rows: { number: number; slot: string | null; reading: string | null }[]
}

/** The run sheet with the readings kept so far, so that it can be filled in further and uploaded as it is. */
export function runSheetTable(study: StudyRow, kept: readonly string[]): RunSheetTable {
  const withSlots = study.slots.length > 0
  return {
    title: runSheetTitle(study.code),
    about: `${study.gauge.code} ${study.gauge.name}: ${study.measuredAs === 'deviation' ? 'deviations from the standard' : 'values'} in ${study.unit}`,
    headings: [
      runSheetNumber,
      ...(withSlots ? ['Position or time'] : []),
      runSheetReading(study.measuredAs, study.unit),
      'Remark',
    ],
    rows: runSheetOf({ ...study, plannedReadings: Math.max(study.plannedReadings, kept.length) }).map(
      ({ number, slot }) => ({
        number,
        slot: withSlots ? (slot ?? '') : null,
        reading: asWritten(kept[number - 1] ?? '')?.digits ?? null,
      }),
    ),
  }
}

/** Decimal commas where the separator is the one of spreadsheets that use them. */
const decimalFor = (separator: 'comma' | 'semicolon' | 'tab') => (separator === 'semicolon' ? ',' : '.')

/** The run sheet as CSV. */
export function runSheetCsv(
  study: StudyRow,
  kept: readonly string[],
  separator: 'comma' | 'semicolon' | 'tab',
): Download {
  const { title, about, headings, rows } = runSheetTable(study, kept)
  const lines = rows.map(({ number, slot, reading }) => [
    String(number),
    ...(slot === null ? [] : [slot]),
    reading?.replace('.', decimalFor(separator)) ?? '',
    '',
  ])
  return {
    name: cleanFileName(`${study.code} run sheet.csv`),
    contentType: 'text/csv; charset=utf-8',
    bytes: csvText([[title], [about], headings, ...lines], separator),
  }
}

/** How many readings a workbook may hold that is made on the server's own thread. */
const fewReadings = 500

/** The run sheet as XLSX, with the headings in view, cells to fill in, and a page that prints. */
export async function runSheetXlsx(study: StudyRow, kept: readonly string[]): Promise<Download> {
  const table = runSheetTable(study, kept)
  const decimals = study.gauge.unit === study.unit ? decimalsOf(study.gauge.resolution) : null
  const bytes =
    table.rows.length <= fewReadings
      ? await runSheetWorkbook(table, decimals)
      : await runOnThread('runSheet', table, decimals)
  return {
    name: cleanFileName(`${study.code} run sheet.xlsx`),
    contentType: tableTypes.xlsx,
    bytes: Buffer.from(bytes),
  }
}

const decimalsOf = (resolution: string): number => /[.](\d+)$/.exec(resolution)?.[1]?.length ?? 0
