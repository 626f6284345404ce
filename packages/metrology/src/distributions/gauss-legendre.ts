/**
 * Nodes and weights of 16-point Gauss–Legendre quadrature on [−1, 1], the positive half (computed with 40 digits as
 * the roots of the Legendre polynomial; the test integrates polynomials up to degree 31 with them).
 */
export const nodes: readonly (readonly [node: number, weight: number])[] = [
  [0.09501250983763744, 0.1894506104550685],
  [0.2816035507792589, 0.18260341504492358],
  [0.45801677765722737, 0.16915651939500254],
  [0.6178762444026438, 0.14959598881657674],
  [0.755404408355003, 0.12462897125553388],
  [0.8656312023878318, 0.09515851168249279],
  [0.9445750230732326, 0.062253523938647894],
  [0.9894009349916499, 0.027152459411754096],
]

/** ∫ f over [lower, upper] in one panel; exact to rounding for polynomials up to degree 31. */
export function integratePanel(f: (x: number) => number, lower: number, upper: number): number {
  const center = 0.5 * (lower + upper)
  const half = 0.5 * (upper - lower)
  let sum = 0
  for (const [node, weight] of nodes) sum += weight * (f(center - half * node) + f(center + half * node))
  return half * sum
}

/** ∫ f over panels between ascending break points. */
export function integrate(f: (x: number) => number, breakPoints: readonly number[]): number {
  let sum = 0
  for (let i = 1; i < breakPoints.length; i++) {
    sum += integratePanel(f, breakPoints[i - 1] as number, breakPoints[i] as number)
  }
  return sum
}
