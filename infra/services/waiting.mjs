import { setTimeout as pause } from 'node:timers/promises'
import { Stopped } from './say.mjs'

/**
 * Asks again and again until the answer is yes.
 *
 * @param {() => unknown} check answers truthy when done; may be asynchronous; what it throws ends the waiting
 * @param {{ seconds: number, every?: number, signal?: AbortSignal }} options `every` in milliseconds
 * @returns whether the answer came in time
 */
export async function until(check, { seconds, every = 50, signal }) {
  const end = performance.now() + seconds * 1000
  for (;;) {
    if (signal?.aborted) throw new Stopped()
    if (await check()) return true
    if (performance.now() > end) return false
    await pause(every)
  }
}

/** Whether an address answers with success within two seconds. */
export async function answers(url) {
  try {
    const response = await fetch(url, { signal: AbortSignal.timeout(2000), redirect: 'manual' })
    await response.arrayBuffer()
    return response.ok
  } catch {
    return false
  }
}
