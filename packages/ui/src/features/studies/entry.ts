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
  sheet: string
  layout: '' | studies.ReadAs['layout']
  columns: string[]
  separator: '' | studies.ReadAs['separator']
  decimal: '' | studies.ReadAs['decimal']
  /** A table that was read before is read as then. */
  asRemembered: boolean
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

/** Everything about how to read left to be detected, as for every other file. */
export const nothingChosen = (): Pick<
  EntryValues,
  'sheet' | 'layout' | 'columns' | 'separator' | 'decimal' | 'asRemembered'
> => ({ sheet: '', layout: '', columns: [], separator: '', decimal: '', asRemembered: true })

export const entryStart = ({ planned, kept, texts, today, me, appraiser }: EntryStart): EntryValues => ({
  source: 'typed',
  typed: texts.length ? [...texts] : emptyGrid(planned, kept),
  pasted: '',
  file: '',
  append: kept > 0 && texts.length === 0,
  ...nothingChosen(),
  leaveOutBadRows: false,
  collectedOn: today,
  takenBy: me ? [me] : [],
  appraiser,
  reason: '',
})

type Chosen = Pick<
  studies.ReadingsInput,
  'sheet' | 'layout' | 'columns' | 'separator' | 'decimal' | 'encoding' | 'headerRows'
>
type Input = Pick<studies.ReadingsInput, 'source' | 'text'> & Chosen

const chosenOf = ({ sheet, layout, columns, separator, decimal }: EntryValues): Chosen => ({
  ...(sheet ? { sheet } : {}),
  ...(layout ? { layout } : {}),
  ...(columns.length ? { columns } : {}),
  ...(separator ? { separator } : {}),
  ...(decimal ? { decimal } : {}),
})

/** What is sent of the readings, or null while there are none. A typed grid is one reading a line. */
export function entryInput(values: EntryValues, hasFile: boolean): Input | null {
  const { source } = values
  if (source === 'uploaded') return hasFile ? { source, ...chosenOf(values) } : null
  if (source === 'pasted')
    return values.pasted.trim() ? { source, text: values.pasted, ...chosenOf(values) } : null
  const text = typedText(values.typed)
  return text.trim() ? { source, text } : null
}

/** The same as it was previewed: what is stored is read exactly as it was shown. */
export function shownInput(input: Input, preview: studies.ReadingsPreview | null): Input {
  if (preview === null || input.source === 'typed') return input
  const { sheet, encoding, separator, decimal, layout, headerRows, columns } = preview.readAs
  return {
    ...{ source: input.source, ...(input.text === undefined ? {} : { text: input.text }) },
    ...(sheet === null ? {} : { sheet }),
    ...(encoding === null || input.source === 'pasted' ? {} : { encoding }),
    ...(separator === null ? {} : { separator }),
    ...{ decimal, layout, headerRows },
    ...(columns.length ? { columns } : {}),
  }
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
  const { sheet, encoding, separator, decimal, headerRows, columns, columnNames } = readAs
  const parts = [
    sheet === null ? '' : words.inSheet(sheet),
    columns.length > 1
      ? words.inColumns(columns[0] ?? '', columns.at(-1) ?? '', columns.length)
      : columns[0] === undefined
        ? words.acrossRow
        : words.inColumn(columns[0], columnNames[0] ?? null),
    separator === null || separator === 'none' ? '' : words.readAs.separator[separator],
    separator === null ? '' : words.readAs.decimal[decimal],
    source === 'uploaded' && encoding !== null ? words.readAs.encoding[encoding] : '',
    headerRows ? words.headerRows(headerRows) : '',
  ]
  return parts.filter(Boolean).join(', ')
}
