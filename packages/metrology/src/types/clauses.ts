import type { ProblemCode, ReasonCode } from './codes'
import type { CalibrationFacts, Characteristic, DesignFacts, Limits } from './facts'
import type { BiasOutput } from './outputs'
import type { Rule } from './rules'

export type Verdict = 'meets' | 'meets-with-conditions' | 'falls-short' | 'not-shown'

/**
 * A margin as agreed: a share of the tolerance width, a share of the process variation (six process standard
 * deviations), or a value with its unit. `share` 0.05 is 5 %.
 */
export type Margin =
  { base: 'tolerance' | 'process'; share: number } | { base: 'absolute'; value: number; unit: string }

export interface DesignMinimumParameters {
  readings: number
  registeredBeforehand: boolean
  /** Most attempts allowed on the task since the agreement came into force, this one included. */
  attempts?: number
}
export interface ResolutionShareParameters {
  share: number
  base: 'tolerance' | 'process'
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

export interface ClauseParameters {
  'design-minimum': DesignMinimumParameters
  'resolution-share': ResolutionShareParameters
  'calibration-in-date': CalibrationInDateParameters
  'bias-equivalence': BiasEquivalenceParameters
  'bias-zero-test': BiasZeroTestParameters
}
export type ClauseType = keyof ClauseParameters
export interface ClauseOf<T extends ClauseType> {
  type: T
  parameters: ClauseParameters[T]
}
export type Clause = { [T in ClauseType]: ClauseOf<T> }[ClauseType]

export type Subject = 'design' | 'resolution' | 'calibration' | 'bias'
export type Basis = 'estimate' | 'bound' | 'document'
/** What a figure, its interval and its limits are: in the characteristic's unit, a fraction, a count, ISO days. */
export type Quantity = 'value' | 'share' | 'count' | 'date'

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
export type BiasFigures = Pick<BiasOutput, 'n' | 'bias' | 'standardDeviation' | 'reference'>

/** Everything a clause is judged on; the characteristic's limits are in its unit. */
export interface JudgementFacts {
  characteristic: Characteristic
  design: DesignFacts | null
  calibration: CalibrationFacts | null
  study: BiasFigures | null
  coverageFactor: number
}

/** One field of a clause; forms and validation are made from it. */
export interface FieldDescriptor {
  name: string
  kind: 'integer' | 'number' | 'share' | 'boolean' | 'choice' | 'margin' | 'confidence' | 'alpha'
  required: boolean
  minimum?: number
  maximum?: number
  exclusiveMinimum?: number
  exclusiveMaximum?: number
  choices?: readonly string[]
  default?: number | boolean | string | Margin
}

/** The plan a clause asks for: the least readings, or why no number of readings makes it surer. */
export interface ReadingsNeeded {
  readings: number | null
  chance: number | null
  reason: 'size-found' | 'minimum' | 'any-size' | 'no-size-suffices' | 'size-does-not-help'
}

/** Figures by name that `clauseOptions` hands to the study's evaluation (confidence, margin in the unit). */
export interface StudyOptions {
  confidence?: number
  margin?: number
}

/** Everything forms, checks, consequences and verdicts need to know of one clause type. */
export interface ClauseDescriptor<T extends ClauseType = ClauseType> {
  type: T
  subject: Subject
  measure: string
  basis: Basis
  /** Kind of study whose result the clause is judged on; null where none is needed. */
  studyKind: 'bias' | null
  fields: readonly FieldDescriptor[]
  /** What is wrong with the clause for this characteristic; empty when it can be agreed. */
  check(clause: ClauseOf<T>, characteristic: Characteristic): Problem[]
  /** The rule of `operatingCharacteristic` it stands for, or null where the characteristic does not define it. */
  rule?(clause: ClauseOf<T>, characteristic: Characteristic): Rule | null
  /** Options the clause gives to the evaluation of its study. */
  options?(clause: ClauseOf<T>, characteristic: Characteristic): StudyOptions
  judge(clause: ClauseOf<T>, facts: JudgementFacts): Judgement
  /** The least number of readings that gives the wanted chance to meet the clause at an assumed truth. */
  readingsNeeded?(
    clause: ClauseOf<T>,
    characteristic: Characteristic,
    truth: { bias: number; standardDeviation: number },
    power: number,
  ): ReadingsNeeded
}
