import type { studies } from '@evenrule/api/contract'
import { entryWords as words } from '../../strings/studies'
import { emptyGrid, typedText } from './typedGrid'

export type EntrySource = studies.StudyRevision['source']

/** Everything typed into the entry of readings; the file itself cannot be kept, its name says which it was. */
export interface EntryValues {
  source: EntrySource
  typed: string[]
  pasted: string
  file: string
  append: boolean
  /** Empty where it is left to be detected. */
  column: string
  separator: '' | studies.ReadAs['separator']
  decimal: '' | studies.ReadAs['decimal']
  leaveOutBadRows: boolean
  collectedOn: string
  takenBy: string[]
  appraiser: string
  reason: string
}

export interface EntryStart {
  planned: number
  kept: number
  /** Readings to correct. */
  texts: readonly string[]
  today: string
  me: string
  appraiser: string
}

export const entryStart = ({ planned, kept, texts, today, me, appraiser }: EntryStart): EntryValues => ({
  source: 'typed',
  typed: texts.length ? [...texts] : emptyGrid(planned, kept),
  pasted: '',
  file: '',
  append: kept > 0 && texts.length === 0,
  column: '',
  separator: '',
  decimal: '',
  leaveOutBadRows: false,
  collectedOn: today,
  takenBy: me ? [me] : [],
  appraiser,
  reason: '',
})

type Input = Pick<studies.ReadingsInput, 'source' | 'text' | 'column' | 'separator' | 'decimal'>

/** What is sent of the readings, or null while there are none. A typed grid is one reading a line. */
export function entryInput(values: EntryValues, hasFile: boolean): Input | null {
  const { source, column, separator, decimal } = values
  const how = {
    ...(column ? { column } : {}),
    ...(separator ? { separator } : {}),
    ...(decimal ? { decimal } : {}),
  }
  if (source === 'uploaded') return hasFile ? { source, ...how } : null
  if (source === 'pasted') return values.pasted.trim() ? { source, text: values.pasted, ...how } : null
  const text = typedText(values.typed)
  return text.trim() ? { source, text } : null
}

/** What keeps the readings from being stored, by field; checks that need no server. */
export function entryProblems(
  values: EntryValues,
  {
    hasInput,
    preview,
    correcting,
  }: { hasInput: boolean; preview: studies.ReadingsPreview | null; correcting: boolean },
): Record<string, string | undefined> {
  const readable =
    preview === null || preview.errorCount === 0 || (values.leaveOutBadRows && preview.mayLeaveOut)
  const nothing =
    values.source === 'uploaded'
      ? values.file
        ? words.fileAgain(values.file)
        : words.fileMissing
      : words.nothing
  return {
    source: hasInput ? (readable ? undefined : words.stillWrong) : nothing,
    collectedOn: values.collectedOn ? undefined : words.collectedOnMissing,
    takenBy: values.takenBy.length ? undefined : words.takenByMissing,
    appraiser: values.appraiser.trim() ? undefined : words.appraiserMissing,
    reason: correcting && !values.reason.trim() ? words.reasonMissing : undefined,
  }
}

/** How a text or a file was read, as one sentence for reading. */
export function readAsText(readAs: studies.ReadAs, source: EntrySource): string {
  const parts = [
    readAs.direction === 'across'
      ? words.acrossRow
      : readAs.column === null
        ? ''
        : words.inColumn(readAs.column, readAs.columnName),
    readAs.separator === 'none' ? '' : words.readAs.separator[readAs.separator],
    words.readAs.decimal[readAs.decimal],
    source === 'uploaded' ? words.readAs.encoding[readAs.encoding] : '',
    readAs.headerRows ? words.headerRows(readAs.headerRows) : '',
  ]
  return parts.filter(Boolean).join(', ')
}
