/** Words of the shared interface parts; sentences about results live beside the things they describe. */

export const shellWords = {
  navigation: 'Main',
  breadcrumbs: 'Where you are',
  skip: 'Skip to the content',
  openMenu: 'Open the menu',
  waiting: 'waiting',
} as const

export const resultWords = {
  how: 'how it was judged',
} as const

export const tableWords = {
  loading: 'The list is loading.',
  loadingPage: 'Loading.',
  empty: 'Nothing here yet.',
  pages: 'Pages',
  previous: 'Previous',
  next: 'Next',
  range: (from: string, to: string, total: string) => `${from}–${to} of ${total}`,
  sortBy: 'Order',
  usualOrder: 'usual order',
  ascending: 'ascending',
  descending: 'descending',
} as const

export const problemNoticeWords = {
  retry: 'Try again',
  reference: 'Reference',
  row: 'row',
  column: 'column',
  titles: {
    'invalid-input': 'Some entries need a change',
    'not-found': 'This is not here',
    'changed-meanwhile': 'Somebody changed this meanwhile',
    'wrong-state': 'That is no longer possible',
    unreachable: 'The server cannot be reached',
    unavailable: 'The service is not ready',
    forbidden: 'This is not yours to do',
    'signed-out': 'You are signed out',
    'already-taken': 'This exists already',
    archived: 'This is archived',
    'limits-frozen': 'These limits are agreed',
    'spread-frozen': 'A clause rests on this spread',
    'draft-exists': 'Your side has a draft already',
    'negotiation-open': 'A proposal is under negotiation',
    'not-your-turn': 'The other side answers next',
    'clauses-cannot-be-agreed': 'A clause cannot be computed',
    'effective-date-past': 'The first day in force has passed',
    'limits-changed': 'The limits have changed since',
    'not-as-seen': 'This is not what you saw',
    'changed-since-preview': 'The preview no longer holds',
    'own-side-has-signed': 'Your side has signed',
    'confirmed-by-customer': 'The customer stands behind this',
    'gauge-in-use': 'This gauge is in use',
    'last-admin': 'An admin must stay',
    'file-too-large': 'This file is too large',
    'too-many': 'Too many requests',
    'no-criteria': 'No criteria apply',
    'other-draft': 'One is being prepared already',
    'took-the-readings': 'Another person must sign',
    'same-person': 'Another person must confirm',
    'challenge-open': 'A challenge is open',
    'challenge-unsettled': 'A challenge is not settled',
    'newer-accepted': 'A later one is accepted already',
  } as Record<string, string>,
  other: 'That did not work',
  kept: 'What you typed is kept.',
  more: (count: number) => `and ${count} more`,
} as const

export const formWords = {
  required: 'required',
  optional: 'optional',
  save: 'Save',
  cancel: 'Cancel',
  saving: 'Saving …',
  choose: 'Choose',
  restored: 'What you typed before is back.',
  startOver: 'Start over',
  leaveTitle: 'Leave without saving?',
  leaveText: 'What you changed on this page has not been saved and will be discarded.',
  leave: 'Discard and leave',
  stay: 'Stay here',
  unsaved: 'Not saved yet',
  seeFields: 'See the marked fields. Nothing was sent yet.',
  close: 'Close',
} as const

export const plotWords = {
  showNumbers: 'Show the numbers',
  hideNumbers: 'Hide the numbers',
  numbers: 'Numbers of the plot',
  inUnit: (name: string, unit: string | null | undefined) => (unit ? `${name}, ${unit}` : name),
  margin: (value: string) => `margin ${value}`,
  marginWord: 'margin',
  mean: 'mean',
  reference: 'reference',
  reading: 'reading',
  readings: 'number of readings',
  value: 'value',
  entered: 'as entered',
  note: 'in question',
  band: 'interval of the mean',
  order: 'in the order taken',
  trueBias: 'true bias',
  trueSpread: 'true spread (standard deviation)',
  spreadTitle: 'Chance to meet the clause, by true spread',
  spreadOf: (name: string, first: string, from: string, last: string, to: string) =>
    `${name}: ${first} at ${from}, ${last} at ${to}`,
  bandsTitle: (name: string) => `Chance of each verdict by true bias, ${name}`,
  bandsOf: (meets: string, notShown: string, fallsShort: string) =>
    `without bias: meets ${meets}, not shown ${notShown}, falls short ${fallsShort}`,
  allowedBias: 'allowed bias',
  planned: (count: number) => `planned, ${count} readings`,
  marked: (readings: string) => `marked: ${readings.toLowerCase()}`,
  framed: (readings: string) => `in a frame: ${readings.toLowerCase()}`,
  runTitle: (count: number) => `${count} readings in the order taken`,
  runRange: (low: string, high: string) => `, from ${low} to ${high}`,
  chanceTitle: 'Chance to meet the clause, by true bias',
  chanceOf: (name: string, atZero: string, atMargin: string) =>
    `${name}: ${atZero} without bias${atMargin ? `, ${atMargin} at the margin` : ''}`,
  allowedTitle: 'Bias the clause allows, by number of readings',
  allowedOf: (name: string, first: string, from: number, last: string, to: number) =>
    `${name}: ${first} with ${from} readings, ${last} with ${to}`,
} as const

export const coverageRuleWords = {
  covered: (covered: number, total: number) => `${covered} of ${total} characteristics covered`,
  runsOutOn: (day: string) => `accepted, runs out on ${day}`,
  key: 'one tick per characteristic, numbered as on the drawing: full accepted, half conditional, broken running out, crossed on hold or suspended, flagged challenged, ring missing, ring under a broken line ended',
} as const
