/** Reads `a.b.0` out of nested objects and lists; undefined where the way ends early. */
export function getPath(values: unknown, path: string): unknown {
  return path
    .split('.')
    .reduce<unknown>(
      (at, key) => (at === null || at === undefined ? undefined : (at as Record<string, unknown>)[key]),
      values,
    )
}

/** Sets `a.b.0` in nested objects and lists, making objects on the way. */
export function setPath(values: object, path: string, value: unknown): void {
  const keys = path.split('.')
  const last = keys.pop()
  if (last === undefined) return
  let at = values as Record<string, unknown>
  for (const key of keys) {
    if (typeof at[key] !== 'object' || at[key] === null) at[key] = {}
    at = at[key] as Record<string, unknown>
  }
  at[last] = value
}

/** A deep copy of plain form values, without Vue's proxies. */
export const copy = <T>(values: T): T =>
  values === undefined ? values : (JSON.parse(JSON.stringify(values)) as T)

/** Whether two sets of plain form values are the same. */
export const same = (a: unknown, b: unknown): boolean => JSON.stringify(a) === JSON.stringify(b)
