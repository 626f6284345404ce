/**
 * A variable that infra/start.mjs hands to every stand-in.
 *
 * @throws when it is missing
 */
export function required(name: string): string {
  const value = process.env[name]
  if (!value) throw new Error(`${name} is not set; the stand-ins are started by infra/start.mjs.`)
  return value
}

/** Ends the process in order when it is asked to stop; whatever is still open is not waited for longer than a second. */
export function closeOnSignal(close: () => unknown) {
  for (const signal of ['SIGTERM', 'SIGINT'] as const) {
    process.once(signal, () => {
      setTimeout(() => process.exit(0), 1000).unref()
      void Promise.resolve(close()).finally(() => process.exit(0))
    })
  }
}
