import type { record, Side } from '@evenrule/api/contract'

const pages: Record<record.RecordSubject, { path: (id: string) => string; side?: Side }> = {
  'agreement-version': { path: (id) => `agreements/${id}` },
  study: { path: (id) => `studies/${id}`, side: 'supplier' },
  submission: { path: (id) => `submissions/${id}` },
  challenge: { path: (id) => `submissions/${id}` },
  request: { path: (id) => `requests/${id}` },
  'house-terms': { path: (id) => `house-terms/${id}`, side: 'customer' },
  part: { path: (id) => `parts/${id}` },
  characteristic: { path: (id) => `parts/${id}` },
  'measuring-task': { path: (id) => `tasks/${id}` },
  gauge: { path: (id) => `gauges/${id}`, side: 'supplier' },
  'reference-standard': { path: (id) => `standards/${id}`, side: 'supplier' },
  import: { path: (id) => `imports/${id}` },
  member: { path: () => 'members' },
  organisation: { path: () => 'members' },
  invitation: { path: () => 'members' },
  relationship: { path: () => 'relationships' },
}

/** Where the page of an event's subject lies in this side's app; undefined where it has none. */
export function subjectPage(
  { type, pageId }: Pick<record.RecordEvent['subject'], 'type' | 'pageId'>,
  side: Side,
): string | undefined {
  const page = pages[type]
  return pageId && (page.side ?? side) === side ? page.path(pageId) : undefined
}
