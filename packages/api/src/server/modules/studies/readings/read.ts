import type { ReadingsInput } from '../../../../contract/readings'
import { invalidInput } from '../../../errors'
import type { UploadedFile } from '../../../http/route'
import { readText } from '../../../tables/csv/read-text'
import { light } from '../../../tables/limits'
import { parseTable } from '../../../tables/parse-table'
import { isLight } from '../../../tables/read-table'
import type { Table } from '../../../tables/table'
import { runOnThread } from '../../../thread/run'
import type { LeftOutRow } from '../studies.table'
import { nothingRemembered, recalledSheet, sheetLesson, type Remembered } from './memory'
import { readingsOf, type ReadReadings } from './take'

/**
 * Reads typed, pasted or uploaded readings. What the sender does not say about the dialect is detected and named;
 * every cell without a number is named with its row, its column and how to mend it. Nothing is stored. What is large
 * is read on a thread of its own.
 */
export async function readReadings(
  input: ReadingsInput,
  file: UploadedFile | undefined,
  remembered: Remembered = nothingRemembered,
): Promise<ReadReadings> {
  refuseNothing(input, file)
  const small = file ? await isLight(file) : (input.text ?? '').length <= light.text
  return small ? readNow(input, file, remembered) : runOnThread('readings', input, file, remembered)
}

function refuseNothing({ text }: ReadingsInput, file: UploadedFile | undefined): void {
  if (file && text !== undefined)
    throw invalidInput([{ path: 'body.text', message: 'Send either a file or text, not both.' }])
  if (!file && (text === undefined || text.trim() === ''))
    throw invalidInput([
      { path: 'body.text', message: 'There are no readings. Type or paste them, or choose a file.' },
    ])
}

/** The same on the thread it is called on. */
export async function readNow(
  input: ReadingsInput,
  file: UploadedFile | undefined,
  remembered: Remembered,
): Promise<ReadReadings> {
  const { text = '', separator, source } = input
  if (!file)
    return readingsOf(
      readText(text, separator ?? (source === 'typed' ? 'none' : undefined)),
      input,
      remembered,
    )
  const table = await parseTable(file, input)
  const recalled = input.sheet === undefined ? recalledSheet(table, remembered) : undefined
  if (recalled !== undefined) {
    const read = readingsOf(
      await parseTable(file, { ...input, sheet: recalled }),
      { ...input, sheet: recalled },
      remembered,
    )
    return { ...read, remembered: true }
  }
  const read = readingsOf(table, input, remembered)
  const better =
    read.readings.length === 0 && input.sheet === undefined ? await elsewhere(input, file, table) : read
  return { ...better, lessons: [...better.lessons, ...sheetLesson(table, input)] }
}

/** How many sheets are looked into where the first holds no reading. */
const mostSheets = 5

/** The first visible sheet that holds readings, where the one that comes first is a cover without any. */
async function elsewhere(input: ReadingsInput, file: UploadedFile, first: Table): Promise<ReadReadings> {
  const others = first.sheets.filter(({ name, hidden }) => !hidden && name !== first.sheet)
  for (const { name } of others.slice(0, mostSheets)) {
    const read = readingsOf(await parseTable(file, { ...input, sheet: name }), input)
    if (read.readings.length > 0) return read
  }
  return readingsOf(first, input)
}

/** Rows that were left out because they hold no number where a reading belongs. */
export const leftOutOf = ({ errors }: Pick<ReadReadings, 'errors'>): LeftOutRow[] =>
  errors.map(({ row, column, text }) => ({ row, column, text }))
