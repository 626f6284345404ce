import type { ProblemCode, ReasonCode } from './codes'
import type { ByHandFacts, CalibrationFacts, Characteristic, DesignFacts, Limits } from './facts'
import type { BiasOutput } from './outputs'
import type { Rule } from './rules'

export type Verdict = 'meets' | 'meets-with-conditions' | 'falls-short' | 'not-shown'

/**
 * What stands in for the tolerance width where a tolerance has one limit, as agreed: the distance from that limit to a
 * natural bound (in the characteristic's unit, such as zero), the process variation (six process standard deviations),
 * or a width with its unit. Where the tolerance has two limits, its own width counts.
 */
export type AgreedBaseline =
  | { kind: 'natural-bound'; value: number }
  | { kind: 'process' }
  | { kind: 'absolute'; value: number; unit: string }

/**
 * A margin as agreed: a share of the tolerance width, a share of the process variation (six process standard
 * deviations), or a value with its unit. `share` 0.05 is 5 %.
 */
export type Margin =
  | { base: 'tolerance'; share: number; baseline?: AgreedBaseline }
  | { base: 'process'; share: number }
  | { base: 'absolute'; value: number; unit: string }

export interface DesignMinimumParameters {
  readings: number
  registeredBeforehand: boolean
  /** Most attempts allowed on the task since the agreement came into force, this one included. */
  attempts?: number
}
export interface ResolutionShareParameters {
  share: number
  base: 'tolerance' | 'process'
  /** Stands in for the width of a one-sided tolerance. */
  baseline?: AgreedBaseline
}
export interface CalibrationInDateParameters {
  gauge: boolean
  standard: boolean
}
export interface BiasEquivalenceParameters {
  margin: Margin
  /** 1 − alpha of each of the two one-sided tests. */
  confidence: number
}
export interface BiasZeroTestParameters {
  alpha: number
}
export interface BiasIntervalInsideParameters {
  margin: Margin
  /** Of the two-sided interval. */
  confidence: number
}
export interface BiasPointParameters {
  margin: Margin
}
/** Cg = share·T/(sigmas·s) and Cgk = (share·T/2 − |bias|)/(sigmas/2·s), T the width that `base` names. */
export interface BiasIndexParameters {
  share: number
  base: 'tolerance' | 'process'
  /** Stands in for the width of a one-sided tolerance. */
  baseline?: AgreedBaseline
  sigmas: number
  /** Null: Cg is not asked for. */
  leastCg: number | null
  leastCgk: number
  /** Compare the estimate, or its one-sided confidence bounds. */
  basis: 'estimate' | 'bound'
  /** Of each one-sided bound; without effect on `estimate`. */
  confidence: number
}
export interface BiasWithUncertaintyParameters {
  margin: Margin
  coverageFactor: number
}
export interface ByHandParameters {
  subject: Subject
  /** Short title of what is judged; part of the key. */
  measure: string
  /** What the document must show. */
  asks: string
}
export interface DoesNotApplyParameters {
  /** Key of the wider scope's clause that is taken away. */
  key: string
  reason: string
}

export interface ClauseParameters {
  'design-minimum': DesignMinimumParameters
  'resolution-share': ResolutionShareParameters
  'calibration-in-date': CalibrationInDateParameters
  'bias-equivalence': BiasEquivalenceParameters
  'bias-interval-inside': BiasIntervalInsideParameters
  'bias-point': BiasPointParameters
  'bias-zero-test': BiasZeroTestParameters
  'bias-index': BiasIndexParameters
  'bias-with-uncertainty': BiasWithUncertaintyParameters
  'by-hand': ByHandParameters
  'does-not-apply': DoesNotApplyParameters
}
export type ClauseType = keyof ClauseParameters
export interface ClauseOf<T extends ClauseType> {
  type: T
  parameters: ClauseParameters[T]
}
export type Clause = { [T in ClauseType]: ClauseOf<T> }[ClauseType]

/** What clauses are about, in the order of the catalogue; for some there are clauses judged by hand only. */
export const subjects = [
  'design',
  'resolution',
  'calibration',
  'bias',
  'linearity',
  'stability',
  'repeatability',
  'attribute',
  'uncertainty',
] as const
export type Subject = (typeof subjects)[number]
export type Basis = 'estimate' | 'bound' | 'document'
/** What a figure, its interval and its limits are: in the characteristic's unit, a fraction, a count, ISO days, an index. */
export type Quantity = 'value' | 'share' | 'count' | 'date' | 'ratio'

export interface Reason {
  code: ReasonCode
  [parameter: string]: number | string | boolean | null
}

/** What is wrong with a clause for a characteristic, with the path of the offending field. */
export interface Problem {
  code: ProblemCode
  path: string
  message: string
}

/** A verdict with what it rests on; figure, interval and limits are of `quantity`. */
export interface Judgement {
  verdict: Verdict
  figure: number | string | null
  interval: Limits | null
  limits: Limits | null
  quantity: Quantity
  reason: Reason
}

/** The part of a study's result that verdicts rest on. */
export type BiasFigures = Pick<BiasOutput, 'n' | 'bias' | 'standardDeviation' | 'reference'> & {
  /** Where the study was evaluated in full: its standard uncertainty is formed without rounding in between. */
  withUncertainty?: Pick<BiasOutput['withUncertainty'], 'standardUncertainty'>
}

/** Everything a clause is judged on; the characteristic's limits are in its unit. */
export interface JudgementFacts {
  characteristic: Characteristic
  design: DesignFacts | null
  calibration: CalibrationFacts | null
  study: BiasFigures | null
  coverageFactor: number
  byHand: ByHandFacts | null
}

/** One field of a clause; forms and validation are made from it. */
export interface FieldDescriptor {
  name: string
  kind:
    | 'integer'
    | 'number'
    /** A number or, on purpose, none: null is a value of its own. */
    | 'nullable-number'
    | 'share'
    | 'confidence'
    | 'alpha'
    | 'boolean'
    | 'choice'
    | 'text'
    | 'margin'
    /** What stands in for the width of a one-sided tolerance (`AgreedBaseline`). */
    | 'baseline'
    /** The key of another clause: one of `choices`, or that of a clause judged by hand. */
    | 'clause-key'
  required: boolean
  minimum?: number
  maximum?: number
  exclusiveMinimum?: number
  exclusiveMaximum?: number
  choices?: readonly string[]
  /** Most characters of a text. */
  longest?: number
  /** A text of several lines. */
  lines?: boolean
  default?: number | boolean | string | Margin | null
}

/** The plan a clause asks for: the least readings, or why no number of readings makes it surer. */
export interface ReadingsNeeded {
  readings: number | null
  chance: number | null
  reason: 'size-found' | 'minimum' | 'any-size' | 'no-size-suffices' | 'size-does-not-help'
}

/** What a clause hands to the evaluation of its study (margin in the unit, width of the index in the unit). */
export interface StudyOptions {
  confidence?: number
  margin?: number
  coverageFactor?: number
  index?: { share: number; sigmas: number; width?: number }
}

/** What is assumed beside the characteristic to compute chances. */
export interface RuleAssumptions {
  /** Standard uncertainty of the reference value, in the characteristic's unit; none where not given. */
  referenceStandardUncertainty?: number
}

/** Everything forms, checks, consequences and verdicts need to know of one clause type. */
export interface ClauseDescriptor<T extends ClauseType = ClauseType> {
  type: T
  /** Null where each clause names its own; see `clauseSubject`. */
  subject: Subject | null
  /** Null where each clause names its own; see `clauseKey`. */
  measure: string | null
  /** What the clause rests on, unless its parameters say so: see `clauseBasis`. */
  basis: Basis
  /** The clause's own subject, key and basis, where they follow from its parameters. */
  subjectOf?(clause: ClauseOf<T>): Subject
  keyOf?(clause: ClauseOf<T>): string
  basisOf?(clause: ClauseOf<T>): Basis
  /** Kind of study whose result the clause is judged on; null where none is needed. */
  studyKind: 'bias' | null
  fields: readonly FieldDescriptor[]
  /** What is wrong with the clause for this characteristic; empty when it can be agreed. */
  check(clause: ClauseOf<T>, characteristic: Characteristic): Problem[]
  /** The rule of `operatingCharacteristic` it stands for, or null where the characteristic does not define it. */
  rule?(clause: ClauseOf<T>, characteristic: Characteristic, assumed?: RuleAssumptions): Rule | null
  /** Options the clause gives to the evaluation of its study. */
  options?(clause: ClauseOf<T>, characteristic: Characteristic): StudyOptions
  judge(clause: ClauseOf<T>, facts: JudgementFacts): Judgement
  /** The least number of readings that gives the wanted chance to meet the clause at an assumed truth. */
  readingsNeeded?(
    clause: ClauseOf<T>,
    characteristic: Characteristic,
    truth: { bias: number; standardDeviation: number },
    power: number,
    assumed?: RuleAssumptions,
  ): ReadingsNeeded
}
