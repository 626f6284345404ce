import exp from '@stdlib/math-base-special-exp'
import ln from '@stdlib/math-base-special-ln'
import log1p from '@stdlib/math-base-special-log1p'
import { scaledGamma } from './scaled-gamma'

/**
 * ln of the density of V = s/σ, the sample standard deviation over the true one, with df degrees of freedom, less its
 * constant: df·(ln v − (v² − 1)/2) − ln v. Domain: v > 0.
 */
export function logChiShape(v: number, df: number): number {
  return df * (ln(v) - 0.5 * (v - 1) * (v + 1)) - ln(v)
}

/** The constant of that density: √(df/π) / Γ*(df/2). */
export function chiConstant(df: number): number {
  return Math.sqrt(df / pi) / scaledGamma(df / 2)
}

/** Density of V = s/σ at v > 0. */
export function chiDensity(v: number, df: number): number {
  return chiConstant(df) * exp(logChiShape(v, df))
}

/** Mean of V = s/σ, √(2/df)·Γ((df + 1)/2)/Γ(df/2), which tends to 1. */
export function chiMean(df: number): number {
  const exponent = 0.5 * (df * log1p(1 / df) - 1)
  return (scaledGamma((df + 1) / 2) / scaledGamma(df / 2)) * exp(exponent)
}

const pi = 3.141592653589793
