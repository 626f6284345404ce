import { defineStore } from 'pinia'
import { onScopeDispose, shallowRef, toValue, watchEffect, type MaybeRefOrGetter } from 'vue'
import type { Breadcrumb } from '../shell/types'

/** What the frame around a page shows of it. */
export const usePageStore = defineStore('page', () => {
  const breadcrumbs = shallowRef<Breadcrumb[]>([])
  function $reset(): void {
    breadcrumbs.value = []
  }
  return { breadcrumbs, $reset }
})

export interface PageOptions {
  /** The way to this page; the last entry is the page itself and needs no `to`. */
  breadcrumbs?: Breadcrumb[]
  /** Sets the window's title where the page has no PageHeading, which does it otherwise. */
  title?: string
}

/** Tells the frame what the page is called and where it lies. Call once in the setup of a view. */
export function usePage(options: MaybeRefOrGetter<PageOptions>): void {
  const page = usePageStore()
  let own: Breadcrumb[] = []
  watchEffect(() => {
    const { breadcrumbs, title } = toValue(options)
    own = breadcrumbs ?? (title ? [{ label: title }] : [])
    page.breadcrumbs = own
    if (title && typeof document !== 'undefined') document.title = `${title} · Evenrule`
  })
  // The next page may have set its own before this one goes.
  onScopeDispose(() => {
    if (page.breadcrumbs === own) page.breadcrumbs = []
  })
}
