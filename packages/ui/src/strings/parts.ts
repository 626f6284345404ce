import type { proof } from '@evenrule/api/contract'
import { formatCount } from '../format'

export const toleranceWords = {
  between: (lower: string, upper: string) => `${lower} to ${upper}`,
  atMost: (limit: string) => `at most ${limit}`,
  atLeast: (limit: string) => `at least ${limit}`,
} as const

/** How far the proof of a task or characteristic has come, in a table cell. */
export const proofWords: Record<proof.ProofState, string> = {
  'no-task': 'not measured',
  missing: 'not shown yet',
  refused: 'refused',
  reopened: 'reopened by a new revision',
  expired: 'acceptance expired',
  lapsed: 'lapsed, a condition was not kept',
  suspended: 'suspended',
  challenged: 'challenged',
  'on-hold': 'on hold, calibration overdue',
  waiting: 'waits for a decision',
  'accepted-with-conditions': 'accepted with conditions',
  accepted: 'accepted',
}

/** Words that lists and pages of parts, gauges and standards share. */
export const listWords = {
  show: 'Show',
  active: 'in use',
  archived: 'archived',
  all: 'all',
  clear: 'Clear search and filters',
  nothingFound: 'Nothing found',
  nothingFoundText: 'No row matches the search and the filters together.',
  archivedOn: (day: string) => `Archived ${day}`,
  edit: 'Edit',
  archive: 'Archive',
  restore: 'Restore',
  saveChanges: 'Save changes',
  loadAgain: 'Load it again',
  none: '–',
  acts: 'Change',
} as const

export const partWords = {
  listQuestion: 'Which parts need proof of their measuring systems?',
  listAnswer: (total: number) => `${formatCount(total, 'part number')} in the list.`,
  search: 'Search number or name',
  caption: 'Part numbers',
  enter: 'Enter part number',
  number: 'Part number',
  numberHint: 'The customer’s number, as on the drawing.',
  supplierNumber: 'Supplier’s own number',
  supplierNumberHint: 'The number under which the supplier keeps this part. Only the supplier changes it.',
  name: 'Name',
  partner: { supplier: 'Customer', customer: 'Supplier' },
  partnerMissing: { supplier: 'Choose the customer.', customer: 'Choose the supplier.' },
  partnerHint: { supplier: 'Whose part it is.', customer: 'Who makes it.' },
  noPartners: {
    supplier: 'You have no customer yet. An admin opens the relationship first.',
    customer: 'You have no supplier yet. An admin opens the relationship first.',
  },
  revision: 'Revision',
  firstRevision: 'First revision',
  firstRevisionHint: 'The label on the drawing, such as A.',
  characteristics: 'Characteristics',
  unconfirmed: (count: number) => `${count} unconfirmed`,
  emptyTitle: 'No part number yet',
  emptyText:
    'Enter the first part number with the revision of its drawing. Its characteristics, and the criteria for measuring them, come next.',
  editTitle: (number: string) => `Edit ${number}`,
  archiveTitle: (number: string) => `Archive ${number}?`,
  archiveText:
    'The part leaves the lists of both sides. Its characteristics, agreements and submissions stay, and either side can restore it.',
  restoreTitle: (number: string) => `Restore ${number}?`,
  restoreText: 'The part comes back into the lists of both sides as it was.',
  question: (number: string) => `What does ${number} ask of its measuring systems?`,
  meta: (name: string, maker: string, buyer: string) => `${name}, made by ${maker} for ${buyer}`,
  own: (number: string) => `supplier’s number ${number}`,
} as const

export const revisionWords = {
  select: 'Revision shown',
  current: (label: string) => `${label} (current)`,
  add: 'Add revision',
  addTitle: (number: string) => `Add a revision of ${number}`,
  label: 'Label',
  labelHint: (current: string) => `As on the new drawing. The current one is ${current}.`,
  copy: 'Copy the characteristics of the current revision',
  copyHint:
    'The copies can be changed, and what was agreed and proved for the current revision stays with it. Measuring tasks are set up anew, and acceptances are reopened until the customer carries over those whose limits stay.',
  noLonger: (label: string, current: string) =>
    `Revision ${label} is no longer the current one; that is ${current}.`,
} as const

export const characteristicWords = {
  add: 'Add characteristic',
  addTitle: (number: string, revision: string) => `Add a characteristic to ${number}, revision ${revision}`,
  editTitle: (number: number) => `Edit characteristic ${number}`,
  caption: 'Characteristics of the revision',
  search: 'Search number or name',
  number: 'Number',
  numberHint: 'Its number on the drawing.',
  name: 'Name',
  nameHint: 'With its symbol where it has one: Bore Ø.',
  nominal: 'Nominal',
  lowerLimit: 'Lower limit',
  upperLimit: 'Upper limit',
  limitHint: 'The limit itself, not the deviation. At least one of the two.',
  unit: 'Unit',
  class: 'Class',
  classHints: {
    ordinary: 'no special demand',
    significant: 'matters to fit or function',
    safety: 'matters to safety; acceptance needs a second person',
  },
  process: 'Process standard deviation',
  processHint: 'Of the process that makes it, where both sides know one; for criteria by process variation.',
  tolerance: 'Tolerance',
  tasks: 'Tasks',
  proof: 'Proof',
  safety: 'safety',
  unconfirmed: 'waits for the customer to confirm it',
  confirm: 'Confirm',
  confirmTitle: (name: string) => `Confirm ${name}?`,
  confirmText: (tolerance: string, characteristicClass: string) =>
    `You confirm ${tolerance}, class ${characteristicClass}, as the demand of your drawing.`,
  frozen: 'limits frozen by what rests on them',
  frozenText:
    'A signed agreement or a submission rests on these limits. Number, name and process standard deviation can change; for other limits add a revision.',
  willWait: 'What you enter waits for the customer to confirm it.',
  archiveTitle: (name: string) => `Archive ${name}?`,
  archiveText: 'The characteristic leaves the lists of both sides. What was agreed and proved for it stays.',
  restoreTitle: (name: string) => `Restore ${name}?`,
  restoreText: 'The characteristic comes back into the lists of both sides as it was.',
  emptyTitle: 'No characteristics yet',
  emptyText: 'Enter them from the drawing first: number, name, limits and class.',
  noneOf: (revision: string) => `Revision ${revision} has no characteristics yet.`,
  has: (revision: string, count: number, safety: number) =>
    `Revision ${revision} has ${formatCount(count, 'characteristic')}${safety > 0 ? `, ${safety} of class safety` : ''}.`,
  accepted: (count: number, total: number) =>
    count === total
      ? 'All stand on accepted proof.'
      : `${count === 0 ? 'None stands' : `${count} of ${total} stand`} on accepted proof`,
  open: (parts: string[]) => `: ${parts.join(', ')}.`,
  runsOutCount: (count: number) =>
    count === 1 ? 'The proof of 1 runs out soon.' : `The proof of ${count} runs out soon.`,
  runsOutOn: (day: string) => `runs out on ${day}`,
  challengedCount: (count: number) => `${count} challenged or refused`,
  stoppedCount: (count: number) => `${count} on hold or suspended`,
  endedCount: (count: number) => `${count} expired, lapsed or reopened`,
  waitingCount: (count: number) => `${count} waiting for a decision`,
  missingCount: (count: number) => `${count} not shown yet`,
  waitForYou: (count: number) => `${formatCount(count, 'characteristic')} to be confirmed by you.`,
  waitForCustomer: (count: number) =>
    `${formatCount(count, 'characteristic')} to be confirmed by the customer.`,
} as const
