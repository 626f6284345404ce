import { readNow } from '../modules/studies/readings/read'
import { runSheetWorkbook } from '../modules/studies/run-sheet.workbook'
import { parseTable } from '../tables/parse-table'

/** What may run on a thread of its own: pure work on one upload. Input and outcome are copied between threads. */
export const jobs = { table: parseTable, readings: readNow, runSheet: runSheetWorkbook }

export type JobName = keyof typeof jobs
export type JobInput<N extends JobName> = Parameters<(typeof jobs)[N]>
export type JobOutcome<N extends JobName> = Awaited<ReturnType<(typeof jobs)[N]>>
