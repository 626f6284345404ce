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
