import { getCurrentInstance, onBeforeUnmount, onMounted, ref, type Ref } from 'vue'
import { routerKey, type Router } from 'vue-router'

export interface LeaveGuard {
  /** True while somebody wants to leave and must be asked. */
  asking: Readonly<Ref<boolean>>
  /** Stays on the page. */
  stay(): void
  /** Discards and goes where they wanted to go. */
  leave(): void
  /** A component that can ask says so; without one nobody is held back inside the app. */
  attach(): void
}

/**
 * Asks before unsaved work is left: by a dialog inside the app, by the browser's own question on closing or
 * reloading the tab. `discard` forgets the work once leaving is confirmed.
 */
export function useLeaveGuard(dirty: Readonly<Ref<boolean>>, discard: () => void): LeaveGuard {
  const asking = ref(false)
  let answer: ((leave: boolean) => void) | undefined
  let attached = false
  let remove: (() => void) | undefined

  function finish(leave: boolean) {
    asking.value = false
    answer?.(leave)
    answer = undefined
    if (leave) discard()
  }
  const beforeUnload = (event: BeforeUnloadEvent) => {
    if (dirty.value) event.preventDefault()
  }

  const router = getCurrentInstance()?.appContext.provides[routerKey as symbol] as Router | undefined
  onMounted(() => {
    addEventListener('beforeunload', beforeUnload)
    remove = router?.beforeEach((to, from) => {
      if (!dirty.value || !attached || to.path === from.path) return true
      asking.value = true
      return new Promise<boolean>((resolve) => (answer = resolve))
    })
  })
  onBeforeUnmount(() => {
    removeEventListener('beforeunload', beforeUnload)
    remove?.()
  })

  return {
    asking,
    stay: () => finish(false),
    leave: () => finish(true),
    attach: () => void (attached = true),
  }
}
