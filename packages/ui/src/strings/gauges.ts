import type { calibrations } from '@evenrule/api/contract'
import type { UnitQuantity } from '@evenrule/metrology'
import { formatCount } from '../format'

export const quantityWords: Record<UnitQuantity, string> = {
  length: 'length',
  angle: 'angle',
  mass: 'mass',
  force: 'force',
  torque: 'torque',
  pressure: 'pressure',
  flow: 'flow',
  time: 'time',
  temperature: 'temperature',
  voltage: 'voltage',
  current: 'current',
  resistance: 'resistance',
  'hardness-rockwell-c': 'Rockwell hardness C',
  'hardness-vickers': 'Vickers hardness',
  fraction: 'share',
  count: 'count',
}

/** How a calibration stands today. */
export const calibrationStandingWords: Record<calibrations.CalibrationStanding, string> = {
  none: 'no calibration',
  'in-date': 'in date',
  'due-soon': 'due soon',
  overdue: 'overdue',
}

export const calibrationWords = {
  heading: 'Calibrations',
  caption: 'Calibrations',
  standing: 'Calibration',
  due: 'Due',
  dueIn: (when: string) => `due ${when}`,
  until: (day: string) => `until ${day}`,
  add: 'Enter calibration',
  addTitle: (code: string) => `Enter a calibration of ${code}`,
  certificateNumber: 'Certificate number',
  laboratory: 'Laboratory',
  calibratedOn: 'Calibrated on',
  dueOn: 'Due on',
  found: 'Found',
  foundWithin: 'within its limits',
  foundOutside: 'outside its limits',
  foundOutsideShort: 'found outside its limits',
  foundField: 'Found within its limits, before any adjustment',
  foundHint: 'As the certificate says. Leave it off where it was found outside.',
  certificate: 'Certificate',
  certificateHint: 'PDF, PNG or JPEG, at most 20 MB. It is kept as it is.',
  search: 'Search certificate or laboratory',
  noFile: 'no file',
  calibratedOnMissing: 'Enter the day of the calibration.',
  dueOnMissing: 'Enter the day it is due.',
  fileTooLarge: 'This file is larger than 20 MB. Choose a smaller one.',
  fileAgain: (name: string) => `Choose ${name} again: a file cannot be kept across a reload.`,
  emptyTitle: 'No calibration yet',
  emptyText:
    'Enter the latest calibration from its certificate. Without one, criteria on calibration are not shown.',
} as const

export const gaugeWords = {
  listQuestion: 'Are our gauges in calibration?',
  listAnswerFine: 'No gauge in use is overdue.',
  listAnswerOverdue: (count: number) => `${formatCount(count, 'gauge')} overdue for calibration.`,
  search: 'Search code, name or site',
  caption: 'Gauges',
  register: 'Register gauge',
  registerTitle: 'Register a gauge',
  editTitle: (code: string) => `Edit ${code}`,
  code: 'Code',
  codeHint: 'As it is marked on the gauge. The customer sees code and name.',
  name: 'Name',
  resolution: 'Resolution',
  resolutionHint: 'The smallest difference it shows.',
  unit: 'Unit',
  site: 'Site',
  siteHint: 'Where it stands. A new name becomes a site of your organisation.',
  tasks: 'Measures',
  taskCount: (count: number) => formatCount(count, 'characteristic'),
  emptyTitle: 'No gauge yet',
  emptyText:
    'Register the first gauge with its resolution and its latest calibration. Then say which characteristics it measures.',
  question: (gauge: string) => `Is ${gauge} in calibration?`,
  answers: {
    none: ['No calibration is entered.', 'Enter the latest one from its certificate.'],
    'in-date': ['Yes.', 'It is due on '],
    'due-soon': ['Yes, but due soon.', 'It is due on '],
    overdue: ['No, overdue.', 'It was due on '],
  } as Record<calibrations.CalibrationStanding, [string, string]>,
  foundOutside: 'It was found outside its limits at the last calibration.',
  resolves: (resolution: string) => `resolution ${resolution}`,
  measures: 'What it measures',
  archiveTitle: (code: string) => `Archive ${code}?`,
  archiveText:
    'The gauge leaves the lists. Its calibrations and studies stay. It must measure nothing any more.',
  restoreTitle: (code: string) => `Restore ${code}?`,
  restoreText: 'The gauge comes back into the lists as it was.',
  standardsLink: 'Reference standards',
} as const

export const standardWords = {
  listQuestion: 'Are our reference standards in calibration?',
  listAnswerFine: 'No reference standard in use is overdue.',
  listAnswerOverdue: (count: number) =>
    `${formatCount(count, 'reference standard')} overdue for calibration.`,
  search: 'Search code or name',
  caption: 'Reference standards',
  register: 'Register reference standard',
  registerTitle: 'Register a reference standard',
  editTitle: (code: string) => `Edit ${code}`,
  code: 'Code',
  codeHint: 'As it is marked on the standard.',
  name: 'Name',
  certifiedValue: 'Certified value',
  certifiedValueHint: 'With all the digits of the certificate.',
  unit: 'Unit',
  uncertainty: 'Expanded uncertainty',
  uncertaintyHint: 'U of the certified value, in the same unit. Leave it empty where none is stated.',
  factor: 'Coverage factor k',
  factorHint:
    'Stated beside U, often 2. Where the certificate states no k, ask the laboratory: a guess would change verdicts.',
  value: (value: string, uncertainty: string | null, factor: string | null) =>
    uncertainty === null ? value : `${value}, U ${uncertainty} (k = ${factor ?? '?'})`,
  stated: (uncertainty: string, factor: string | null) => `${uncertainty} (k = ${factor ?? '?'})`,
  noUncertainty: 'no uncertainty stated',
  emptyTitle: 'No reference standard yet',
  emptyText:
    'Register the master, ring, block or sample whose certified value your studies compare with, with its uncertainty.',
  question: (standard: string) => `Is ${standard} in calibration?`,
  archiveTitle: (code: string) => `Archive ${code}?`,
  archiveText: 'The reference standard leaves the lists. Its calibrations and studies stay.',
  restoreTitle: (code: string) => `Restore ${code}?`,
  restoreText: 'The reference standard comes back into the lists as it was.',
  gaugesLink: 'Gauges',
} as const
