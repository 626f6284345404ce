import type { NavItem } from '../../shell/types'
import { navigationWords as words } from '../../strings/navigation'

interface Counts {
  waiting: number
  agreements: number
  /** Open requests of this side. */
  requests: number
  messages: number
}

/** The left navigation of one app: `at` makes the path of a page of the current organisation. */
export type Navigation = (
  at: (path?: string) => string,
  counts: Counts,
) => { items: NavItem[]; own: NavItem[] }

/** The entries under the organisation's own name, the same in both apps. */
const ownItems = (at: (path?: string) => string, { messages }: Counts): NavItem[] => [
  { to: at('members'), label: words.members },
  { to: at('messages'), label: words.messages, count: messages },
]

export const supplierNavigation: Navigation = (at, counts) => ({
  items: [
    { to: at(), label: words.waiting, count: counts.waiting, exact: true },
    { to: at('relationships'), label: words.customers },
    { to: at('parts'), label: words.parts, also: [at('tasks')] },
    { to: at('requests'), label: words.requests, count: counts.requests },
    { to: at('studies'), label: words.studies },
    { to: at('submissions'), label: words.submissions },
    { to: at('gauges'), label: words.gauges, also: [at('standards')] },
    { to: at('agreements'), label: words.agreements, count: counts.agreements, also: [at('criteria')] },
    { to: at('house-terms'), label: words.houseTerms },
    { to: at('record'), label: words.record },
  ],
  own: ownItems(at, counts),
})

export const customerNavigation: Navigation = (at, counts) => ({
  items: [
    { to: at(), label: words.decisions, count: counts.waiting, exact: true },
    { to: at('relationships'), label: words.suppliers },
    { to: at('parts'), label: words.parts, also: [at('tasks')] },
    { to: at('agreements'), label: words.agreements, count: counts.agreements, also: [at('criteria')] },
    { to: at('house-terms'), label: words.houseTerms },
    { to: at('requests'), label: words.requests },
    { to: at('submissions'), label: words.submissions },
    { to: at('record'), label: words.record },
  ],
  own: ownItems(at, counts),
})
