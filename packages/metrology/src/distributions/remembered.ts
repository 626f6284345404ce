/**
 * A function of numbers that remembers its newest answers, up to `most` of them: for what takes long and is asked for
 * again and again, such as a quantile while a slide moves.
 */
export function remembered<Answer>(
  most: number,
  answer: (...of: number[]) => Answer,
): (...of: number[]) => Answer {
  const known = new Map<string, Answer>()
  return (...of) => {
    const key = of.join('/')
    const found = known.get(key)
    if (found !== undefined) return found
    const made = answer(...of)
    if (known.size >= most) known.delete(known.keys().next().value as string)
    known.set(key, made)
    return made
  }
}
