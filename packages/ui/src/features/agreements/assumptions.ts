import { marginInUnit, type Characteristic, type Clause } from '@evenrule/metrology'
import { shiftDecimal } from '../../format/numbers'

/** What consequences are computed for. */
export interface Assumptions {
  readings: number
  standardDeviation: number
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
  for (const clause of clauses)
    if (clause.type === 'bias-equivalence') {
      const margin = marginInUnit(clause.parameters.margin, characteristic)
      if (margin) return short(margin / 3)
    }
  return 1
}
