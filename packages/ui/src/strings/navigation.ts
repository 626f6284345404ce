/** Entries of the left navigation. */
export const navigationWords = {
  waiting: 'Waiting on us',
  decisions: 'For our decision',
  customers: 'Customers',
  suppliers: 'Suppliers',
  parts: 'Parts',
  requests: 'Requests',
  studies: 'Studies',
  submissions: 'Submissions',
  gauges: 'Gauges',
  agreements: 'Agreements',
  houseTerms: 'House terms',
  record: 'Record',
  members: 'Members',
  messages: 'Messages',
} as const
