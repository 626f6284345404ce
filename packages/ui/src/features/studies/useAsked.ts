import { useLoaded, type Loaded } from '../common'

const pause = 350

/**
 * Asks the server about what is being typed, a moment after the last change; null where there is nothing to ask. The
 * last answer stays while the next one is under way.
 */
export function useAsked<S, T>(source: () => S | null, load: (from: S) => Promise<T>): Loaded<T | null> {
  let latest = 0
  return useLoaded(source, async (asked) => {
    const mine = (latest += 1)
    if (asked === null) return null
    await new Promise((resolve) => setTimeout(resolve, pause))
    // Overtaken while typing: this answer would not be shown.
    return mine === latest ? load(asked) : null
  })
}
