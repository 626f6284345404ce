import { seededRandom } from '../seeded-random'

/** A seed from a name, so that each study of the demonstration has its own readings. */
export function seedOf(name: string): number {
  let hash = 2_166_136_261
  for (const character of name) hash = Math.imul(hash ^ (character.codePointAt(0) ?? 0), 16_777_619)
  return hash >>> 0
}

/** Sum of twelve uniforms less six: mean 0, variance 1, near enough to normal, and the same in every engine. */
const nearlyNormal = (random: () => number): number => {
  let sum = -6
  for (let i = 0; i < 12; i++) sum += random()
  return sum
}

/**
 * Readings of a gauge with known true bias and spread on a standard, as the gauge shows them: decimal text
 * rounded to its resolution.
 */
export function demoReadings(options: {
  name: string
  count: number
  reference: string
  resolution: string
  bias: number
  standardDeviation: number
}): string[] {
  const random = seededRandom(seedOf(options.name))
  const step = Number(options.resolution)
  const digits = options.resolution.split('.')[1]?.length ?? 0
  return Array.from({ length: options.count }, () => {
    const value = Number(options.reference) + options.bias + options.standardDeviation * nearlyNormal(random)
    return (Math.round(value / step) * step).toFixed(digits)
  })
}
