import type { studies } from '@evenrule/api/contract'
import type { StudyState } from '@evenrule/api/contract/moves/study'
import { countWord, formatChance, formatCount, formatNumber, joinWords } from '../format'

const ordinals = ['', 'first', 'second', 'third', 'fourth', 'fifth', 'sixth', 'seventh', 'eighth', 'ninth']
/** "first attempt", "12th attempt". */
export const attemptText = (attempt: number): string => `${ordinals[attempt] ?? `${attempt}th`} attempt`

export const studyListWords = {
  question: 'Which studies wait for readings?',
  waiting: (count: number) =>
    count === 0
      ? 'None.'
      : `${formatCount(count, 'study', 'studies')} ${count === 1 ? 'is' : 'are'} registered and not computed yet.`,
  search: 'Search code, gauge, part or characteristic',
  caption: 'Studies',
  plan: 'Plan a study',
  code: 'Study',
  gauge: 'Gauge',
  tasks: 'Characteristic',
  more: (count: number) => `and ${count} more`,
  registered: 'Registered',
  collected: 'Collected',
  readings: 'Readings',
  outcome: 'Result',
  state: 'State',
  anyState: 'any state',
  readingsOf: (kept: number, planned: number) => `${formatNumber(kept)} of ${formatNumber(planned)}`,
  notBeforehand: 'not registered beforehand',
  noClauses: 'computed, no criteria',
  emptyTitle: 'No study yet',
  emptyText:
    'A study is planned and registered before its first reading; its readings then show whether a gauge is fit.',
  headingOfTask: 'Studies',
  emptyOfTask: 'No study of this measuring task yet',
  emptyOfTaskText:
    'Plan one of the right size and register it before its first reading. Every registered study counts as an attempt.',
} as const

export const planWords = {
  question: 'How many readings will show it?',
  questionOf: (gauge: string) => `How many readings will show that ${gauge} is fit?`,
  answerWith: (readings: number) => `${formatCount(readings, 'reading')}`,
  answerRest: (chance: string) =>
    `give each clause a chance of at least ${chance} to be met, if bias and spread are as assumed.`,
  answerSome: (chance: string) =>
    `give each clause that more readings make surer a chance of at least ${chance} to be met, if bias and spread are as assumed.`,
  noSize: 'No number of readings does, as assumed.',
  noSizeRest: 'Assume a smaller bias or spread, use a better gauge, or ask for another criterion.',
  noNeed: 'No clause asks for a number.',
  noNeedRest: 'Plan as many readings as you hold right.',
  noCriteria: 'No criteria are in force.',
  noCriteriaRest: 'The readings can be computed all the same, but no clause will judge them.',
  before: 'Choose what is measured and with which standard.',
  mustRegister:
    'Register the study before its first reading: then the criteria and limits shown here are frozen, and everybody can see that they were not chosen to fit.',
  what: 'What is measured',
  task: 'Measuring task',
  taskHint: 'Gauge and characteristic.',
  searchTask: 'Gauge, part or characteristic',
  noTask: 'No measuring task is found. Set one up on the page of the part or the gauge first.',
  chooseTask: 'Choose at least one measuring task.',
  also: 'The same readings also serve',
  alsoHint: 'Other characteristics that this gauge measures. Their criteria are frozen too.',
  standard: 'Reference standard',
  standardHint: 'The part or master of known value that is read again and again.',
  searchStandard: 'Type a code or name',
  noStandard: 'No reference standard in use is found. Register it under Gauges first.',
  chooseStandard: 'Choose the reference standard.',
  otherQuantity: 'measures something else',
  readings: 'How it is read',
  unit: 'Unit of the readings',
  measuredAs: 'Readings are',
  value: 'values, such as 24.0012',
  deviation: 'deviations from the standard, such as +0.0012',
  size: 'How large it must be',
  bias: 'Assumed bias',
  biasHint: 'Of the gauge, as far as known; 0 where nothing is known.',
  spread: 'Assumed spread',
  spreadHint: 'Standard deviation of repeated readings, from an earlier study. The resolution is the least.',
  chance: 'Wanted chance',
  chanceHint: 'To meet each clause, if bias and spread are as assumed.',
  planned: 'Planned readings',
  plannedHint: (least: number) => `${formatNumber(least)} is the least for the wanted chance.`,
  plannedBelow: (least: number) =>
    `Fewer than the ${formatNumber(least)} that give the wanted chance: a good gauge may come out as not shown.`,
  code: 'Code of the study',
  codeHint: 'A short name, unique in your organisation.',
  codeMissing: 'Give the study a short name.',
  slots: 'Positions or times',
  slotsHint:
    'One per line, such as 08:00 or position 2. The run sheet deals the readings among them in random order. Leave it empty where it does not matter.',
  history: 'The readings were taken before today',
  historyHint: 'The study is then marked as not registered beforehand, and the other side is told.',
  register: 'Register the study',
  number: 'Enter a number.',
  above: 'Enter a number above zero.',
  chanceBounds: 'Enter a chance from 1 % to 99.9 %.',
  whole: 'Enter a whole number, at least 2.',
  criteria: 'What it will be judged by',
  criteriaText: 'In force today. Registering freezes them for this study, whatever is agreed later.',
  criteriaNone: 'Nothing is agreed for this characteristic yet.',
  attempts: (before: number) =>
    before === 0
      ? 'This would be the first attempt on this task.'
      : `This would be attempt ${before + 1} on this task.`,
  waiting: 'Fill in the assumed spread to see how many readings each clause takes.',
} as const

/** How many readings a clause takes, in words. */
export function planReasonText(clause: {
  reason: studies.PlanReason
  readings: number | null
  chance: number | null
}): string {
  const { reason, readings, chance } = clause
  const least = readings === null ? '' : formatCount(readings, 'reading')
  const words: Record<studies.PlanReason, string> = {
    'size-found': `at least ${least}${chance === null ? '' : `, then met with a chance of ${formatChance(chance)}`}`,
    minimum: `at least ${least}, as agreed`,
    'any-size': 'any number of readings',
    'no-size-suffices': 'no number of readings shows it with this bias and spread',
    'size-does-not-help': 'more readings make it no surer',
    'not-about-size': 'not a matter of the number of readings',
  }
  return words[reason]
}

export const collectWords = {
  question: (code: string) => `Which readings does ${code} still need?`,
  noneKept: (planned: number) => `All ${formatNumber(planned)} are still to be taken.`,
  someKept: (kept: number, planned: number) => `${formatNumber(kept)} of ${formatNumber(planned)} are kept.`,
  toCome: (count: number) => `${formatCount(count, 'reading')} more to come.`,
  enough: 'As many as planned; add the last ones or compute.',
  rule: 'Results are computed once collection is finished, and not before.',
  registered: (day: string, name: string | null) => `registered ${day}${name ? ` by ${name}` : ''}`,
  notBeforehand: 'not registered before its first reading',
  on: (standard: string) => `standard ${standard}`,
  gaugeFor: (gauge: string, characteristic: string) => `${gauge} for ${characteristic}`,
  runSheet: 'Run sheet',
  runSheetText:
    'Take the readings in this order; the slots were dealt at random. A file of it can be filled in and uploaded as it is.',
  runSheetPlain:
    'Take the readings one after the other, without looking for a pattern. A file of the sheet can be filled in and uploaded as it is.',
  print: 'Print run sheet',
  downloadXlsx: 'Download as XLSX',
  download: 'as CSV',
  downloadSemicolon: 'as CSV with semicolons',
  number: 'No.',
  slot: 'Position or time',
  reading: 'Reading',
  remark: 'Remark',
  showSheet: 'Show the run sheet',
  hideSheet: 'Hide the run sheet',
  takenByLine: 'Taken by, on',
  criteria: 'What it will be judged by',
  criteriaAbandoned: 'What it would have been judged by',
  criteriaText: 'Frozen at registration.',
  criteriaNone:
    'No criteria were in force at registration: the readings are computed, and no clause judges them.',
  abandon: 'Abandon study',
  abandonHint: 'When it cannot be finished. It still counts as an attempt.',
  abandonTitle: (code: string) => `Abandon ${code}?`,
  abandonText:
    'It ends without a result. It still counts as an attempt, and whoever sees the attempts sees the reason.',
  abandonReason: 'Reason',
  abandonReasonMissing: 'Say why it is abandoned.',
  abandonedQuestion: (code: string) => `Why was ${code} abandoned?`,
  abandonedOn: (day: string) => `Abandoned ${day}.`,
} as const

export const entryWords = {
  heading: 'Enter readings',
  correctHeading: 'Correct the readings',
  correctText:
    'The corrected readings become a new revision and are computed again; the earlier ones stay, with the reason.',
  how: 'How the readings come in',
  typed: 'Type',
  pasted: 'Paste',
  uploaded: 'Upload a file',
  append: (kept: number) => `They follow the ${formatCount(kept, 'reading')} kept so far`,
  appendHint: 'Otherwise they replace them: all readings are then entered here.',
  grid: 'Readings as they are read',
  gridHint:
    'With comma or point. Enter goes to the next; a column copied from a spreadsheet fills the cells below.',
  cell: (number: number) => `Reading ${number}`,
  moreRows: 'Add ten rows',
  paste: 'Copied cells',
  pasteHint: 'Copy the cells in your spreadsheet and paste them here, headings and all.',
  file: 'File with the readings',
  drop: 'Drop an XLSX or CSV file here, or choose one',
  dropHint:
    'A workbook, or text with comma, semicolon or tab, decimal comma or point; at most 10 MB. The file is kept byte for byte.',
  dropAgain: 'Choose another file',
  fileAgain: (name: string) => `Choose ${name} again: a file cannot be kept across a reload.`,
  fileMissing: 'Choose the file with the readings.',
  nothing: 'Enter the readings.',
  checking: 'Reading …',
  previewHeading: 'As it was read',
  previewEmpty: 'What is entered appears here as it is understood. Nothing is stored before you say so.',
  found: (count: number) => formatCount(count, 'reading'),
  readAs: {
    separator: {
      comma: 'comma between cells',
      semicolon: 'semicolon between cells',
      tab: 'tab between cells',
      none: 'one cell per row',
    },
    decimal: { point: 'decimal point', comma: 'decimal comma' },
    encoding: { 'utf-8': 'UTF-8', 'windows-1252': 'Windows-1252', 'utf-16': 'UTF-16' },
  } satisfies {
    separator: Record<NonNullable<studies.ReadAs['separator']>, string>
    decimal: Record<studies.ReadAs['decimal'], string>
    encoding: Record<NonNullable<studies.ReadAs['encoding']>, string>
  },
  inColumn: (letter: string, name: string | null) => `column ${letter}${name ? ` “${name}”` : ''}`,
  inColumns: (first: string, last: string, count: number) =>
    `${countWord(count)} columns, ${first} to ${last}, row by row`,
  inSheet: (name: string) => `sheet “${name}”`,
  acrossRow: 'across one row',
  remembered: 'Read as last time: a table with these headings came before.',
  detect: 'Read it anew',
  sheet: 'Sheet',
  sheetHidden: 'hidden in the workbook',
  layout: 'The readings stand in',
  layouts: { long: 'one column', wide: 'several columns' } satisfies Record<studies.ReadAs['layout'], string>,
  columnsWide: 'Columns with the readings',
  headerRows: (count: number) => `${formatCount(count, 'row')} passed over at the top`,
  column: 'Column with the readings',
  columnChoice: (letter: string, name: string | null) => (name ? `${letter}, ${name}` : letter),
  columnNumbers: (count: number) => formatCount(count, 'number'),
  separators: { comma: 'comma', semicolon: 'semicolon', tab: 'tab', none: 'nothing' } satisfies Record<
    NonNullable<studies.ReadAs['separator']>,
    string
  >,
  decimals: { point: 'point', comma: 'comma' } satisfies Record<studies.ReadAs['decimal'], string>,
  separator: 'Between cells',
  decimal: 'Decimal sign',
  row: 'Row',
  firstRows: 'First rows of the table',
  toRow: (rows: number) => `${formatCount(rows, 'row')} in all`,
  errors: (count: number) => `${formatCount(count, 'cell')} without a reading`,
  errorsText: 'Nothing is stored while they stand: mend them, or leave their rows out.',
  moreErrors: (count: number) => `and ${formatNumber(count)} more`,
  emptyCell: '(empty)',
  leaveOut: (count: number) => `Leave ${count === 1 ? 'this row' : `these ${formatNumber(count)} rows`} out`,
  leaveOutHint: 'The study names the rows left out, with what stands in them.',
  stillWrong: 'Mend the cells that are named, or leave their rows out.',
  notes: 'Worth a look',
  who: 'Who and when',
  collectedOn: 'Day of collection',
  collectedOnHint: 'When the readings were taken. Calibrations are judged on this day.',
  collectedOnMissing: 'Enter the day the readings were taken.',
  takenBy: 'Who took the readings',
  takenByHint: 'They may not sign the submission. Their names stay in your organisation.',
  takenByMissing: 'Say who took the readings.',
  appraiser: 'Appraiser code',
  appraiserHint: 'The other side sees this code in place of a name.',
  appraiserMissing: 'Enter a code, such as A.',
  reason: 'Reason for the correction',
  reasonHint: 'What was wrong with the readings before. It stays with them.',
  reasonMissing: 'Say why the readings are replaced.',
  keep: 'Keep, more will follow',
  compute: 'Store and compute',
  correct: 'Store corrected readings',
  computeTitle: (code: string) => `Compute ${code} now?`,
  computeText: (count: number, clauses: number) =>
    `${formatCount(count, 'reading')} become the study’s result${
      clauses ? ` under ${formatCount(clauses, 'clause')}` : ''
    }. After that nothing can be added; a correction needs a reason and leaves these readings on record.`,
  computeFewer: (planned: number) => `The plan asked for ${formatNumber(planned)}.`,
  back: 'Back to the result',
} as const

export const studyResultWords = {
  question: (gauge: string, count: number) =>
    `Is ${gauge} fit for these ${countWord(count)} characteristics?`,
  prepare: 'Prepare a submission',
  correct: 'Correct readings',
  taskHeading: (characteristic: string, part: string, customer: string) =>
    `${characteristic}, ${part}, ${customer}`,
  registered: (day: string, agreements: string) =>
    `Registered ${day}${agreements ? ` under ${agreements}` : ''}`,
  agreements: (numbers: readonly number[]) =>
    `agreement${numbers.length > 1 ? 's' : ''} ${joinWords(numbers.map(String))}`,
  taken: (count: number, appraiser: string, day: string) =>
    `${formatCount(count, 'reading')} by ${appraiser} on ${day}`,
  revision: (number: number) => `corrected, revision ${number}`,
  data: 'The data',
  dataText: 'As entered, and kept. Anyone with the readings can recompute every figure.',
  source: 'Came in as',
  sources: { typed: 'typed', pasted: 'pasted', uploaded: 'uploaded file' } satisfies Record<
    studies.StudyRevision['source'],
    string
  >,
  file: 'File, byte for byte',
  fileSize: (kilobytes: string) => `${kilobytes}`,
  fileHash: 'SHA-256 of the file',
  dataHash: 'SHA-256 of the readings',
  takenBy: 'Taken by',
  takenByText: (names: string, code: string) => `${names} (${code} to the other side)`,
  erased: 'a person since erased',
  standard: 'Reference standard',
  measuredAs: 'Readings are',
  measuredAsWords: { value: 'values', deviation: 'deviations from the standard' },
  readAs: 'Read as',
  leftOut: 'Left out',
  leftOutRow: (row: number, text: string) => `row ${row} “${text}”`,
  engine: 'Computed by',
  engineText: (version: string, hash: string) => `engine ${version}, ${hash.slice(0, 12)}…`,
  gaugeCalibration: 'Gauge in calibration',
  standardCalibration: 'Standard in calibration',
  calibrationOf: (from: string, until: string, certificate: string) =>
    `${from} to ${until}, certificate ${certificate}`,
  calibrationNone: 'not on record for that day',
  revisions: 'Earlier readings',
  revisionsText: 'Replaced by a correction, or kept while more were to follow.',
  revisionNumber: 'Revision',
  revisionWhen: 'Stored',
  revisionWho: 'By',
  revisionCount: 'Readings',
  revisionWhy: 'Replaced because',
  revisionKept: 'more were to follow',
  attempts: 'Attempts on this task',
  attemptsText: 'Every registered study counts, those without a good result too.',
  attempt: 'Attempt',
  attemptState: 'State',
  thisStudy: 'this study',
} as const

/** What can be told of a study in one cell of a list, where it is not computed. */
export const studyStepWords: Record<StudyState, string> = {
  registered: 'waits for readings',
  collecting: 'more to come',
  computed: 'computed',
  abandoned: 'abandoned',
}
