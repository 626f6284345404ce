/**
 * A root of a continuous function that changes sign between `low` and `high`, to `relative` of its size (by default
 * the resolution of doubles), by Brent's method (Brent, Algorithms for Minimization without Derivatives, 1973, chapter 4).
 */
export function findRoot(f: (x: number) => number, low: number, high: number, relative?: number): number {
  return rootBetween(f, { x: low, y: f(low) }, { x: high, y: f(high) }, relative)
}

/** A place where a function is known. */
interface Known {
  x: number
  y: number
}

function rootBetween(f: (x: number) => number, low: Known, high: Known, relative = 2.3e-16): number {
  let [a, b] = [low.x, high.x]
  let [fa, fb] = [low.y, high.y]
  let [c, fc] = [a, fa]
  let step = b - a
  let previous = step
  for (let i = 0; i < 200 && fb !== 0; i++) {
    if (fb > 0 === fc > 0) {
      ;[c, fc] = [a, fa]
      step = previous = b - a
    }
    if (Math.abs(fc) < Math.abs(fb)) {
      ;[a, b, c] = [b, c, b]
      ;[fa, fb, fc] = [fb, fc, fb]
    }
    const tolerance = relative * Math.abs(b) + 1e-300
    const middle = 0.5 * (c - b)
    if (Math.abs(middle) <= tolerance) break
    const proposed = interpolated(a, b, c, fa, fb, fc, middle, previous, tolerance)
    previous = proposed === null ? middle : step
    step = proposed ?? middle
    ;[a, fa] = [b, fb]
    b += Math.abs(step) > tolerance ? step : middle > 0 ? tolerance : -tolerance
    fb = f(b)
  }
  return b
}

/** The secant or inverse quadratic step from b, or null where bisection is safer. */
function interpolated(
  a: number,
  b: number,
  c: number,
  fa: number,
  fb: number,
  fc: number,
  middle: number,
  previous: number,
  tolerance: number,
): number | null {
  if (Math.abs(previous) < tolerance || Math.abs(fa) <= Math.abs(fb)) return null
  const s = fb / fa
  let p: number
  let q: number
  if (a === c) {
    p = 2 * middle * s
    q = 1 - s
  } else {
    const r = fb / fc
    const t = fa / fc
    p = s * (2 * middle * t * (t - r) - (b - a) * (r - 1))
    q = (t - 1) * (r - 1) * (s - 1)
  }
  if (p > 0) q = -q
  else p = -p
  const fits = 2 * p < Math.min(3 * middle * q - Math.abs(tolerance * q), Math.abs(previous * q))
  return fits ? p / q : null
}

/**
 * A root of a strictly rising function on the whole line, from a first guess and a typical width: the bracket grows
 * by doubling until it holds the root.
 */
export function findRisingRoot(
  f: (x: number) => number,
  guess: number,
  width: number,
  relative?: number,
): number {
  const at = (x: number): Known => ({ x, y: f(x) })
  let low = at(guess - width)
  let high: Known | null = null
  let reach = width
  for (let i = 0; i < 1100 && !(low.y <= 0); i++) {
    high = low
    low = at(low.x - (reach *= 2))
  }
  high ??= at(guess + width)
  reach = width
  for (let i = 0; i < 1100 && !(high.y >= 0); i++) {
    low = high
    high = at(high.x + (reach *= 2))
  }
  return rootBetween(f, low, high, relative)
}
