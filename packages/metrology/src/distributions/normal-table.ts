import exp from '@stdlib/math-base-special-exp'
import { normalCdf } from './normal'

/** Cells of an eighth from −9 to 9; beyond, Φ is 0 or 1 to 1e-19. */
const perUnit = 8
export const normalReach = 9
const terms = 9
const cells = 2 * normalReach * perUnit + 1

/** Taylor coefficients of Φ about the middle of each cell: φ⁽ᵏ⁾ = (−1)ᵏ·He_k·φ with the polynomials of Hermite. */
const coefficients = (() => {
  const table = new Float64Array(cells * terms)
  for (let cell = 0; cell < cells; cell++) {
    const z = cell / perUnit - normalReach
    const density = exp(-0.5 * z * z) / 2.5066282746310002
    table[cell * terms] = normalCdf(z)
    let [before, hermite, factorial] = [0, 1, 1]
    for (let k = 0; k + 1 < terms; k++) {
      factorial *= k + 1
      table[cell * terms + k + 1] = ((k % 2 === 0 ? density : -density) * hermite) / factorial
      ;[before, hermite] = [hermite, z * hermite - k * before]
    }
  }
  return table
})()

/**
 * Φ(z) to 1e-14 absolutely, without a transcendental function: for sums of many terms, where the relative accuracy
 * that `normalCdf` keeps in the lower tail does not count. Any real z.
 */
export function normalCdfWithin(z: number): number {
  if (z <= -normalReach) return 0
  if (z >= normalReach) return 1
  const cell = Math.round((z + normalReach) * perUnit)
  const d = z - (cell / perUnit - normalReach)
  const from = cell * terms
  let sum = 0
  for (let at = from + terms - 1; at >= from; at--) sum = sum * d + (coefficients[at] as number)
  return sum
}
