import { shallowRef, watch, type ShallowRef } from 'vue'

export interface Loaded<T> {
  data: ShallowRef<T | undefined>
  error: ShallowRef<unknown>
  loading: ShallowRef<boolean>
  /** Loads again; the data shown so far stays meanwhile. */
  reload(): Promise<void>
}

/**
 * Loads something now and whenever `source` changes; the latest request wins. After a failure the data of before
 * stays, with the error beside it.
 */
export function useLoaded<S, T>(source: () => S, load: (from: S) => Promise<T>): Loaded<T> {
  const data = shallowRef<T>()
  const error = shallowRef<unknown>()
  const loading = shallowRef(false)
  let asked = 0

  async function reload(): Promise<void> {
    const mine = (asked += 1)
    loading.value = true
    try {
      const answer = await load(source())
      if (mine !== asked) return
      data.value = answer
      error.value = undefined
    } catch (thrown) {
      if (mine === asked) error.value = thrown
    } finally {
      if (mine === asked) loading.value = false
    }
  }

  watch(
    () => JSON.stringify(source()),
    () => void reload(),
    { immediate: true },
  )
  return { data, error, loading, reload }
}
