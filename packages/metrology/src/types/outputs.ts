import type { Clause, Judgement } from './clauses'
import type { WarningCode } from './codes'
import type { ByHandFacts, CalibrationFacts, Characteristic, DesignFacts, Interval, StudyData } from './facts'
import type { Truth } from './rules'

/** `readings` are zero-based places in the data the warning is about. */
export interface Warning {
  code: WarningCode
  message: string
  readings?: number[]
  path?: string
  figures?: Record<string, number>
}

export interface SummaryOutput {
  kind: 'summary'
  n: number
  mean: number
  standardDeviation: number | null
  lag1Autocorrelation: number | null
  minimum: number
  maximum: number
  median: number
  warnings: Warning[]
}

export interface BiasOutput {
  kind: 'bias'
  n: number
  /** Mean and bias are null only where they are beyond what a number can hold. */
  mean: number | null
  reference: { value: number; standardUncertainty: number | null }
  bias: number | null
  standardDeviation: number | null
  standardError: number | null
  degreesOfFreedom: number
  confidence: number
  t: number | null
  pValue: number | null
  interval: Interval | null
  zeroTest: {
    alpha: number
    criticalValue: number | null
    allowedBias: number | null
    accepts: boolean | null
  }
  equivalence: {
    alpha: number
    margin: number | null
    criticalValue: number | null
    pLower: number | null
    pUpper: number | null
    pValue: number | null
    interval: Interval | null
    accepts: boolean | null
  }
  intervalInside: { accepts: boolean | null }
  /** Conventions of the indices; without a width they are not defined. */
  index: { share: number; sigmas: number; width: number | null }
  cg: number | null
  cgk: number | null
  cgLowerBound: number | null
  cgkLowerBound: number | null
  cgUpperBound: number | null
  cgkUpperBound: number | null
  shareOfTolerance: number | null
  shareOfProcess: number | null
  resolutionUsed: boolean
  withUncertainty: {
    /** Standard deviation that stands for repeatability: the larger of s and resolution/√12. */
    repeatability: number | null
    resolutionUsed: boolean
    coverageFactor: number
    standardUncertainty: number | null
    expandedUncertainty: number | null
    insideMargin: boolean | null
  }
  minimum: number
  maximum: number
  lag1Autocorrelation: number | null
  warnings: Warning[]
}

export interface OperatingCharacteristicOutput {
  kind: 'operatingCharacteristic'
  meets: number[]
  fallsShort: number[]
  notShown: number[]
  warnings: Warning[]
}

export interface SampleSizeOutput {
  kind: 'sampleSize'
  n: number
  power: number
  warnings: Warning[]
}

export type IncentiveChange = 'worse-repeatability' | 'more-readings' | 'stricter-risk'
export interface IncentivesOutput {
  kind: 'incentives'
  worseRepeatabilityHelps: boolean
  moreReadingsHurt: boolean
  stricterRiskHelps: boolean | null
  /** The chance to meet the clause before and after each change, at the truth where its effect is most perverse. */
  shown: { change: IncentiveChange; truth: Truth; before: number; after: number }[]
  warnings: Warning[]
}

export interface JudgeOutput extends Judgement {
  kind: 'judge'
  warnings: Warning[]
}

export interface DistributionOutput {
  kind: 'distribution'
  values: (number | null)[]
  warnings: Warning[]
}

/** What server and browser compute for one clause of a submission. */
export interface ClauseInput extends Characteristic {
  kind: 'clause'
  clause: Clause
  design?: DesignFacts | null
  calibration?: CalibrationFacts | null
  data?: StudyData | null
  byHand?: ByHandFacts | null
}
export interface ClauseOutput extends Judgement {
  kind: 'clause'
  clauseKey: string
  study: BiasOutput | null
  warnings: Warning[]
}

export interface OutputByKind {
  summary: SummaryOutput
  bias: BiasOutput
  operatingCharacteristic: OperatingCharacteristicOutput
  sampleSize: SampleSizeOutput
  incentives: IncentivesOutput
  judge: JudgeOutput
  distribution: DistributionOutput
  clause: ClauseOutput
}
export type Kind = keyof OutputByKind
export type Output = OutputByKind[Kind]

/** The answer to an input that cannot be computed: what is wrong and where. */
export interface ErrorOutput {
  error: { code: string; message: string; path: string }
}
