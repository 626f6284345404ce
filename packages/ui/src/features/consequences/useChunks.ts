import { onScopeDispose, shallowReactive, shallowRef, watch } from 'vue'

/** A piece of computing: `key` says all that it rests on. */
export interface Chunk<Value> {
  key: string
  run(): Value
}

/**
 * Computes pieces one after the other, each in a turn of its own so that a frame comes between them, a moment after
 * the last change. A piece whose key has not changed is kept; one that is being computed anew stays as it was until it
 * is there. What cannot be computed is null.
 */
export function useChunks<Values extends Record<string, unknown>>(
  source: () => { [Name in keyof Values]: Chunk<Values[Name]> },
  delay = 90,
) {
  const values = shallowReactive<{ [name: string]: unknown }>({})
  const busy = shallowRef(true)
  const done = new Map<string, string>()
  let timer: ReturnType<typeof setTimeout> | undefined
  function next(waiting: [string, Chunk<unknown>][]) {
    const [first, ...rest] = waiting
    if (!first) {
      busy.value = false
      return
    }
    const [name, { key, run }] = first
    try {
      values[name] = run()
    } catch {
      // What is typed may be beyond what can be computed with; the page says so in this place.
      values[name] = null
    }
    done.set(name, key)
    timer = setTimeout(() => next(rest), 0)
  }
  watch(
    source,
    (chunks) => {
      clearTimeout(timer)
      const waiting = Object.entries(chunks).filter(([name, { key }]) => done.get(name) !== key)
      busy.value = waiting.length > 0
      timer = setTimeout(() => next(waiting), done.size > 0 ? delay : 0)
    },
    { immediate: true },
  )
  onScopeDispose(() => clearTimeout(timer))
  return { values: values as Partial<{ [Name in keyof Values]: Values[Name] | null }>, busy }
}
