/** Decision rules on a bias whose chances can be computed; margins and spreads are in one unit. */
export interface RuleParameters {
  'zero-test': { alpha: number }
  equivalence: { alpha: number; margin: number }
  'interval-inside': { alpha: number; margin: number }
  point: { margin: number }
  /** Cgk at least `least` and, where given, Cg at least `leastCg`; on one-sided bounds at alpha where that is given. */
  index: {
    share: number
    sigmas: number
    least: number
    toleranceWidth: number
    leastCg?: number
    alpha?: number
  }
  'with-uncertainty': { margin: number; referenceStandardUncertainty: number; coverageFactor: number }
}
export type RuleType = keyof RuleParameters
export type RuleOf<T extends RuleType> = { type: T } & RuleParameters[T]
export type Rule = { [T in RuleType]: RuleOf<T> }[RuleType]

/** An assumed truth: true bias and true repeatability standard deviation, in one unit. */
export interface Truth {
  bias: number
  standardDeviation: number
}

/** Chances of the three verdicts at one truth; they add to one. */
export interface Chances {
  meets: number
  fallsShort: number
  notShown: number
}
