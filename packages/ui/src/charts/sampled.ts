/** At most about `most` values of a list, evenly taken and with both ends, with their places. */
export function sampled<T>(values: readonly T[], most = 25): { value: T; at: number }[] {
  if (values.length <= most) return values.map((value, at) => ({ value, at }))
  return Array.from({ length: most }, (_, step) => {
    const at = Math.round((step * (values.length - 1)) / (most - 1))
    return { value: values[at] as T, at }
  })
}
