import exp from '@stdlib/math-base-special-exp'
import gamma from '@stdlib/math-base-special-gamma'
import ln from '@stdlib/math-base-special-ln'

/**
 * Γ*(a) = Γ(a) / (√(2π/a)·(a/e)^a), which tends to 1 as a grows: the part of Γ(a) that Stirling's formula leaves.
 * Densities written with it keep their digits where a^a·e^(−a)/Γ(a) would lose them. Domain: a > 0; relative error
 * about 1e-15. Series: NIST Digital Library of Mathematical Functions, 5.11.
 */
export function scaledGamma(a: number): number {
  if (a >= 10) {
    const r = 1 / (a * a)
    const series =
      1 / 12 - r * (1 / 360 - r * (1 / 1260 - r * (1 / 1680 - r * (1 / 1188 - (r * 691) / 360360))))
    return exp(series / a)
  }
  return gamma(a) * Math.sqrt(a / twoPi) * exp(a * (1 - ln(a)))
}

const twoPi = 6.283185307179586
