import type { Bounds } from './reader'

/**
 * Sizes that chances are computed with: their products and ratios stay within what a number can hold. Readings,
 * limits and reference values are not bound by them; those are formed exactly.
 */
const [smallest, largest] = [1e-100, 1e100]

export const positiveSize: Bounds = { above: 0, least: smallest, most: largest }
export const notNegativeSize: Bounds = { least: 0, most: largest }
export const anySize: Bounds = { least: -largest, most: largest }
