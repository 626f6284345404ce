/** A one- or two-sided tolerance, in the unit of the readings. */
export interface Tolerance {
  lower?: number
  upper?: number
}

/** Both ends of an interval or of limits; null where an end is open. Days are ISO 8601 text. */
export interface Limits<T = number | string> {
  lower: T | null
  upper: T | null
}

/** A closed interval of numbers. */
export interface Interval {
  lower: number
  upper: number
}

/** The characteristic as far as computation needs it; everything is in `unit`. */
export interface Characteristic {
  unit: string
  tolerance?: Tolerance
  processStandardDeviation?: number
  /** Of the measuring system. */
  resolution?: number
}

export interface DesignFacts {
  registeredBeforehand: boolean
  /** Attempts on the measuring task since the agreement came into force, this one included. */
  attempts: number
}

/** ISO 8601 days. */
export interface CalibrationWindow {
  calibratedOn: string
  dueOn: string
}
export interface CalibrationFacts {
  collectedOn: string
  gauge: CalibrationWindow | null
  standard: CalibrationWindow | null
}

/** What somebody judged on an attached document, where a method is not computed here. */
export interface ByHandFacts {
  verdict: 'meets' | 'falls-short' | 'not-shown'
  /** Why, in their own words. */
  reason: string
  /** SHA-256 of the document, in hexadecimal. */
  documentSha256: string
}

/** Readings and reference value of one bias study, both in the characteristic's unit. */
export interface BiasData {
  kind: 'bias'
  readings: number[]
  reference: { value: number; standardUncertainty?: number }
}
export type StudyData = BiasData
export type StudyKind = StudyData['kind']
