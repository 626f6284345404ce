import type { ImportState, imports } from '@evenrule/api/contract'
import { formatCount } from '../format'

type Kind = imports.ImportKind

/** What each kind brings in. */
export const importKindWords: Record<Kind, string> = {
  parts: 'parts with characteristics',
  gauges: 'gauges with calibrations',
  studies: 'past studies',
}
export const importKindShort: Record<Kind, string> = { parts: 'parts', gauges: 'gauges', studies: 'studies' }

export const importThingWords: Record<imports.ImportThing['what'], string> = {
  part: 'part',
  revision: 'revision',
  characteristic: 'characteristic',
  gauge: 'gauge',
  calibration: 'calibration',
  study: 'study',
}

export const importStateWords: Record<ImportState, string> = {
  applying: 'running',
  applied: 'imported',
  failed: 'nothing imported',
  interrupted: 'interrupted',
}

const rows = (count: number) => formatCount(count, 'row')

/** What a file makes new and changes, in one sentence. */
export const countsWords = ({ new: made, changed, unchanged }: imports.ImportCounts): string =>
  `${made} new, ${changed} changed, ${unchanged} unchanged.`

export const newImportWords = {
  link: 'Import from a file',
  question: (kind: Kind) => `What would a file of ${importKindShort[kind]} bring in?`,
  answer: 'Choose a file and look. Nothing is stored until you say so.',
  missing: (labels: string) => `No column was found for: ${labels}. Choose it below.`,
  badRows: (count: number) =>
    count === 1 ? '1 row cannot be taken as it is.' : `${rows(count)} cannot be taken as they are.`,
  nothing: 'All of it is here already; nothing would change.',
  templates: 'A file to fill in',
  templateText: {
    parts: 'One row for each characteristic. The second sheet of the workbook explains every column.',
    gauges: 'One row for each calibration. The second sheet of the workbook explains every column.',
    studies:
      'One row for each study with its readings side by side, or one row for each reading. The customer is told that these studies were not registered beforehand.',
  } as Record<Kind, string>,
  template: { xlsx: 'Template, XLSX', csv: 'Template, CSV' },
  templateLong: { xlsx: 'A row for each reading, XLSX', csv: 'A row for each reading, CSV' },
  file: 'Your file',
  drop: 'Drop an XLSX or CSV file here, or choose one',
  dropHint: (kind: Kind) =>
    kind === 'studies'
      ? 'At most 20 MB, 2,000 studies and 200,000 readings. The columns may have other names.'
      : 'At most 20 MB and 10,000 rows. The columns may have other names.',
  takenBy: 'Who took the readings',
  takenByHint: 'They may not sign what is submitted of these studies.',
  columns: 'Columns',
  columnsFound: (found: number, all: number) => `${found} of ${all} columns are used.`,
  columnsCaption: 'Columns of the file and what they hold',
  column: 'Column',
  inFile: 'In the file',
  samples: 'First cells',
  holds: 'Holds',
  unused: 'not used',
  headerRow: 'The names of the columns stand in row',
  sheet: 'Sheet',
  bad: 'Rows to mend',
  badText: 'Mend them in the file and choose it again, or import the other rows without them.',
  badCaption: 'Rows that cannot be taken',
  row: 'Row',
  rowsFromTo: (from: number, to: number) => (from === to ? String(from) : `${from}–${to}`),
  cell: 'Cell',
  wholeRow: 'whole row',
  mend: 'What to mend',
  more: (count: number) => `and ${rows(count)} more`,
  things: { new: 'New', changed: 'Changed', unchanged: 'Unchanged' },
  firstOf: (shown: number, all: number) => `the first ${shown} of ${all}`,
  difference: (field: string, from: string, to: string) =>
    `${field}: ${from === '' ? 'nothing' : from} becomes ${to === '' ? 'nothing' : to}`,
  all: (count: number) => `Import ${count === 1 ? 'the row' : `all ${count} rows`}`,
  good: (good: number, bad: number) => `Import ${rows(good)}, leave out ${bad}`,
  importing: 'Importing …',
  lookAgain: 'Look at it again',
  notYours: 'This is not for this side',
  notYoursText: 'Your role, or this app, does not import these.',
} as const

export const importListWords = {
  question: 'What did we import from files?',
  answer: (count: number) => `${formatCount(count, 'file')}. Each is kept as it was uploaded.`,
  caption: 'Imports',
  breadcrumb: 'Imports',
  link: 'Past imports',
  search: 'Search file name',
  kind: 'Kind',
  file: 'File',
  when: 'When',
  who: 'Who',
  outcome: 'Outcome',
  state: 'State',
  leftOut: (count: number) => `${rows(count)} left out`,
  erased: 'a former member',
  emptyTitle: 'Nothing was imported yet',
  emptyText: 'Parts, gauges and past studies can be taken over from XLSX and CSV files.',
} as const

export const importWords = {
  question: (name: string) => `What did ${name} bring in?`,
  applying: (done: number, total: number) => `It is being imported: ${done} of ${total} done.`,
  applyingText: 'You may leave this page; it goes on.',
  applied: 'It is imported.',
  leftOut: (count: number) => (count === 1 ? '1 row was left out.' : `${rows(count)} were left out.`),
  failed: 'Nothing was imported.',
  interrupted: 'The program stopped while it was imported. Nothing of it was stored.',
  interruptedText: 'Import it again: the file is kept.',
  repeat: 'Import it again',
  newLook: 'Look at the preview again',
  download: 'Download the file',
  downloadLeftOut: 'Download the rows left out',
  leftOutText: 'As CSV, each row with what to mend. Mend them there and import that file.',
  leftOutHeading: 'Rows left out',
  facts: 'Of this import',
  size: 'Size',
  bytes: (count: number) => formatCount(count, 'byte'),
  sha256: 'SHA-256',
  rows: 'Rows',
  progress: 'How far the import is',
} as const
