/** Readings are counted from one where people read and write them, from zero everywhere else. */

/** "3, 7–9" for the places 2, 6, 7, 8. */
export function writeNumbers(places: readonly number[]): string {
  const numbers = [...new Set(places)].sort((a, b) => a - b).map((at) => at + 1)
  const runs: [number, number][] = []
  for (const number of numbers) {
    const last = runs.at(-1)
    if (last && last[1] === number - 1) last[1] = number
    else runs.push([number, number])
  }
  return runs
    .map(([from, to]) => (from === to ? `${from}` : to === from + 1 ? `${from}, ${to}` : `${from}–${to}`))
    .join(', ')
}

/** The places that a text such as "3, 7-9" names, and the first piece that names none of the readings. */
export function readNumbers(text: string, count: number): { places: number[]; wrong: string | null } {
  const places = new Set<number>()
  const pieces = text
    .replace(/\s*[-–]\s*/g, '-')
    .split(/[,;\s]+/)
    .filter(Boolean)
  for (const piece of pieces) {
    const [, first, second] = /^(\d{1,6})(?:-(\d{1,6}))?$/.exec(piece) ?? []
    const from = Number(first)
    const to = Number(second ?? first)
    if (!first || from < 1 || to < from || to > count) return { places: [...places], wrong: piece }
    for (let number = from; number <= to; number += 1) places.add(number - 1)
  }
  return { places: [...places].sort((a, b) => a - b), wrong: null }
}
