import type { proof } from '@evenrule/api/contract'

/** The standing of a measuring task: the decisive part, and the rest of the answer. */
export const taskStandings: Record<proof.ProofState, (customer: string) => [string, string]> = {
  'no-task': () => ['Nothing measures it.', ''],
  missing: (customer) => [
    'Not shown yet.',
    `Nothing has been put before ${customer} for this measuring task.`,
  ],
  refused: (customer) => [`Refused by ${customer}.`, 'A new submission can show it.'],
  reopened: () => [
    'Not any more: a new revision reopened it.',
    'The customer carries the acceptance over where the limits stayed, or looks at new proof.',
  ],
  expired: (customer) => ['Not any more: the acceptance expired.', `New proof goes to ${customer}.`],
  lapsed: (customer) => [
    'Not any more: a condition of the acceptance was not kept in time.',
    `The submission says which; ${customer} can still confirm it.`,
  ],
  suspended: () => [
    'In doubt: the acceptance is suspended.',
    'The submission says what happened to the gauge; new proof, or an approver of the customer, lifts it.',
  ],
  'on-hold': () => [
    'On hold: a calibration is overdue.',
    'A calibration that finds it within limits lifts the hold.',
  ],
  challenged: (customer) => [
    'Challenged.',
    `${customer} objects to a named result; the submission says which.`,
  ],
  waiting: (customer) => ['Not decided yet.', `A submission waits for ${customer}.`],
  'accepted-with-conditions': (customer) => [
    `Accepted with conditions by ${customer}.`,
    'The submission says what must follow.',
  ],
  accepted: (customer) => [`Yes, accepted by ${customer}.`, ''],
}

export const taskWords = {
  heading: 'What measures it',
  question: (gauge: string, characteristic: string) => `Is ${gauge} fit for ${characteristic}?`,
  caption: 'Measuring tasks',
  search: 'Search gauge, part or characteristic',
  part: 'Part',
  characteristic: 'Characteristic',
  gauge: 'Gauge',
  site: 'Site',
  siteHint: 'Where the gauge stands, as both sides name it.',
  processStep: 'Process step',
  processStepHint: 'Such as OP 40 or final inspection.',
  proof: 'Proof',
  add: 'Add measuring task',
  addTitle: 'Which gauge measures what?',
  gaugeHint: 'It must read in a unit of the characteristic’s quantity.',
  chooseGauge: 'Choose the gauge.',
  chooseCharacteristic: 'Choose the characteristic.',
  openGauge: (code: string) => `Open gauge ${code}`,
  oldRevision: (label: string) =>
    `The characteristic belongs to revision ${label}, which is no longer the current one.`,
  searchGauge: 'Type a code or name',
  searchCharacteristic: 'Type a part number or name',
  noGauge: 'No gauge in use is found. Register it under Gauges first.',
  noCharacteristic: 'No active characteristic is found.',
  editTitle: 'Edit site and process step',
  archiveTitle: 'Archive this measuring task?',
  archiveText:
    'The gauge no longer counts as measuring this characteristic. Its studies and submissions stay in the record.',
  restoreTitle: 'Restore this measuring task?',
  restoreText: 'The gauge counts as measuring this characteristic again.',
  emptyTitle: 'Nothing measures this part yet',
  emptyText: {
    supplier: 'Say which gauge measures a characteristic; then studies can show that it is fit.',
    customer: 'The supplier has not said yet which gauges measure these characteristics.',
  },
  takeOver: (revision: string) => `Take over from revision ${revision}`,
  takeOverHint: (revision: string) =>
    `Or take over what measured revision ${revision}, by the numbers of the characteristics.`,
  emptyOfGauge: 'This gauge measures nothing yet',
  emptyOfGaugeText: 'Say which characteristic it measures; then studies can show that it is fit.',
  revision: (part: string, revision: string) => `${part} revision ${revision}`,
  class: (word: string) => `class ${word}`,
} as const
