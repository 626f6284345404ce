import { nextTick, onScopeDispose } from 'vue'
import { START_LOCATION, useRouter } from 'vue-router'

/** How long a page may take to show its heading before the focus is left where it is, in milliseconds. */
const patience = 4000

/** Resolves with the page's heading as soon as there is one; `undefined` when none comes in time. */
function heading(signal: AbortSignal): Promise<HTMLElement | undefined> {
  return new Promise((resolve) => {
    const find = () => document.querySelector<HTMLElement>('main h1') ?? undefined
    const finish = (found: HTMLElement | undefined) => {
      observer.disconnect()
      clearTimeout(timer)
      resolve(found)
    }
    const observer = new MutationObserver(() => {
      const found = find()
      if (found) finish(found)
    })
    const timer = setTimeout(() => finish(undefined), patience)
    signal.addEventListener('abort', () => finish(undefined), { once: true })
    const found = find()
    if (found) finish(found)
    else observer.observe(document.body, { childList: true, subtree: true })
  })
}

/**
 * After a change of page the focus goes to its heading, so that a screen reader says where one is and the
 * Tab key starts there. Changes of the query alone (sorting, paging) move nothing. Call once, in App.vue.
 */
export function useRouteFocus(): void {
  let pending: AbortController | undefined
  const stop = useRouter().afterEach(async (to, from, failure) => {
    if (failure || from === START_LOCATION || to.path === from.path) return
    pending?.abort()
    const { signal } = (pending = new AbortController())
    const before = document.activeElement
    await nextTick()
    const found = await heading(signal)
    // Whoever has meanwhile put the cursor into a field keeps it.
    const moved = document.activeElement !== before && document.activeElement !== document.body
    if (!found || signal.aborted || moved) return
    if (!found.hasAttribute('tabindex')) found.tabIndex = -1
    found.focus()
  })
  onScopeDispose(() => {
    pending?.abort()
    stop()
  })
}
