/** The functions of @stdlib used here; all are deterministic: arithmetic and bit operations only. */
declare module '@stdlib/math-base-special-betainc' {
  /** Incomplete beta function; regularised by default, the lower tail by default. */
  export default function betainc(
    x: number,
    a: number,
    b: number,
    regularized?: boolean,
    upper?: boolean,
  ): number
}
declare module '@stdlib/math-base-special-gammainc' {
  /** Incomplete gamma function of x with parameter s; regularised by default, the lower tail by default. */
  export default function gammainc(x: number, s: number, regularized?: boolean, upper?: boolean): number
}
declare module '@stdlib/math-base-special-erfc' {
  export default function erfc(x: number): number
}
declare module '@stdlib/math-base-special-erfcx' {
  /** exp(x²)·erfc(x) */
  export default function erfcx(x: number): number
}
declare module '@stdlib/math-base-special-erfcinv' {
  export default function erfcinv(x: number): number
}
declare module '@stdlib/math-base-special-exp' {
  export default function exp(x: number): number
}
declare module '@stdlib/math-base-special-ln' {
  export default function ln(x: number): number
}
declare module '@stdlib/math-base-special-log1p' {
  export default function log1p(x: number): number
}
declare module '@stdlib/math-base-special-log1pmx' {
  /** ln(1 + x) − x without cancellation. */
  export default function log1pmx(x: number): number
}
declare module '@stdlib/math-base-special-gamma' {
  export default function gamma(x: number): number
}
