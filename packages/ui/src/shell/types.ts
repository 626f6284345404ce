import type { RouteLocationRaw } from 'vue-router'

/** One entry of the left navigation; `count` is what waits there, left out when nothing does. */
export interface NavItem {
  to: RouteLocationRaw
  label: string
  count?: number
  /** Further pages that belong to the entry, such as those of reference standards to "Gauges". */
  also?: RouteLocationRaw[]
  /** Only the page itself belongs to the entry, not what lies below its path. */
  exact?: boolean
}

/** Entries under a small heading, such as those of the organisation one works for. */
export interface NavGroup {
  title: string
  items: NavItem[]
}

/** One step of the way to this page; the last has no `to`. */
export interface Breadcrumb {
  label: string
  to?: RouteLocationRaw
}
