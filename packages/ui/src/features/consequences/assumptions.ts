import { convert, marginInUnit, type Characteristic, type Clause } from '@evenrule/metrology'
import { shiftDecimal } from '../../format/numbers'

/** What consequences are computed for. */
export interface Assumptions {
  readings: number
  standardDeviation: number
  /** Standard uncertainty of the reference value; counts for clauses that add it. */
  referenceStandardUncertainty?: number
}

/** Stands for any characteristic where none is entered yet: its unit is one per cent of the tolerance. */
export const anyTolerance: Characteristic = { unit: '1', tolerance: { lower: -50, upper: 50 } }

const usualReadings = 25

/** The readings that the design clause asks for, of the proposal first, else the usual number. */
export function plannedReadings(...sets: readonly (readonly Clause[])[]): number {
  for (const clauses of sets)
    for (const clause of clauses) if (clause.type === 'design-minimum') return clause.parameters.readings
  return usualReadings
}

/** Rounded to two significant digits, in decimal. */
function short(value: number): number {
  const places = 1 - Math.floor(Math.log10(value))
  return shiftDecimal(Math.round(shiftDecimal(value, places)), -places)
}

/**
 * A spread to assume before one is known: of a gauge whose six standard deviations take a tenth of the tolerance, or of
 * the process variation where there is no two-sided tolerance, or three of them a margin given as a value.
 */
export function assumedSpread(characteristic: Characteristic, clauses: readonly Clause[]): number {
  for (const base of ['tolerance', 'process'] as const) {
    const width = marginInUnit({ base, share: 1 }, characteristic)
    if (width) return short(width / 60)
  }
  const margin = firstMargin(characteristic, clauses)
  return margin ? short(margin / 3) : 1
}

/** The margin of the first clause that has one, in the characteristic's unit. */
function firstMargin(characteristic: Characteristic, clauses: readonly Clause[]): number | null {
  for (const { parameters } of clauses)
    if ('margin' in parameters) {
      const margin = marginInUnit(parameters.margin, characteristic)
      if (margin) return margin
    }
  return null
}

/**
 * A standard uncertainty of the reference value to assume before one is known: of a standard whose expanded uncertainty
 * takes a tenth of the margin. Undefined where no clause adds it.
 */
export function assumedReference(
  characteristic: Characteristic,
  clauses: readonly Clause[],
): number | undefined {
  const adding = clauses.filter(({ type }) => type === 'bias-with-uncertainty')
  const margin = firstMargin(characteristic, adding)
  return adding.length === 0 ? undefined : margin ? short(margin / 20) : 0
}

/** The next finer unit, for figures that would begin with several zeros. */
const finer: Partial<Record<string, string>> = {
  m: 'mm',
  cm: 'mm',
  mm: 'µm',
  kg: 'g',
  g: 'mg',
  kN: 'N',
  N: 'mN',
  'N·m': 'N·mm',
  MPa: 'kPa',
  kPa: 'Pa',
  bar: 'mbar',
  'l/min': 'ml/min',
  s: 'ms',
  V: 'mV',
  A: 'mA',
  Ω: 'mΩ',
  kΩ: 'Ω',
}

/** The characteristic in a unit in which spreads and biases are easy to read: 0.8 µm rather than 0.0008 mm. */
export function inReadableUnit(characteristic: Characteristic, clauses: readonly Clause[]): Characteristic {
  const { unit, tolerance, processStandardDeviation } = characteristic
  const to = finer[unit]
  if (!to || assumedSpread(characteristic, clauses) >= 0.01) return characteristic
  const converted = (value: number | undefined) =>
    value === undefined ? undefined : convert(value, unit, to)
  const lower = converted(tolerance?.lower)
  const upper = converted(tolerance?.upper)
  const spread = converted(processStandardDeviation)
  return {
    unit: to,
    tolerance: { ...(lower == null ? {} : { lower }), ...(upper == null ? {} : { upper }) },
    ...(spread == null ? {} : { processStandardDeviation: spread }),
  }
}
