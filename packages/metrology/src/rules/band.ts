/**
 * The part of (estimated bias, sample standard deviation) a rule accepts: |bias| ≤ halfWidth(s). Where halfWidth is
 * negative nothing is accepted.
 */
export interface Band {
  halfWidth(s: number): number
  /** The s at which the half width is `h`, or null where it never is. */
  spreadAt(h: number): number | null
  /** Spreads around which the half width bends sharply; integration is split there. */
  bends: readonly number[]
  /** The largest s that is accepted at all, whatever the bias; none where that follows from the half width alone. */
  largestSpread?: number
}

/** The half width at s as the rule accepts: negative where nothing is. */
export const acceptedHalfWidth = (band: Band, s: number): number =>
  band.largestSpread !== undefined && s > band.largestSpread ? -1 : band.halfWidth(s)

/** Half width `offset + slope · s`. */
export function linearBand(offset: number, slope: number): Band {
  return {
    halfWidth: (s) => offset + slope * s,
    spreadAt: (h) => {
      const s = (h - offset) / slope
      return s >= 0 && Number.isFinite(s) ? s : null
    },
    bends: [],
  }
}

/** Half width `offset + factor · √(s²/n + u²)`: a margin less, or plus, an expanded uncertainty. */
export function uncertaintyBand(offset: number, factor: number, n: number, u: number): Band {
  const rootN = Math.sqrt(n)
  return {
    halfWidth: (s) => offset + factor * rootSumOfSquares(s / rootN, u),
    spreadAt: (h) => {
      const total = (h - offset) / factor
      return total >= u ? rootN * Math.sqrt((total - u) * (total + u)) : null
    },
    // √(s²/n + u²) turns from u to s/√n around s = u·√n.
    bends: u > 0 ? [0.25, 1, 4, 16].map((times) => times * u * rootN) : [],
  }
}

/** √(a² + b²) for a, b ≥ 0 without overflow or underflow of the squares. */
export function rootSumOfSquares(a: number, b: number): number {
  const large = Math.max(a, b)
  if (large === 0 || large === Infinity) return large
  const ratio = Math.min(a, b) / large
  return large * Math.sqrt(1 + ratio * ratio)
}
