import type { Clause } from '@evenrule/metrology'
import { describe, expect, it } from 'vitest'
import { anyTolerance, assumedSpread, inReadableUnit, plannedReadings } from './assumptions'

const twoSided = { unit: 'mm', tolerance: { lower: 23.975, upper: 24.025 } }
const absolute: Clause = {
  type: 'bias-equivalence',
  parameters: { margin: { base: 'absolute', value: 6, unit: 'µm' }, confidence: 0.95 },
}

describe('what consequences are computed for', () => {
  it('plans the readings of the first design clause, else 25', () => {
    const design = (readings: number): Clause => ({
      type: 'design-minimum',
      parameters: { readings, registeredBeforehand: true },
    })
    expect(plannedReadings([absolute], [design(12)])).toBe(12)
    expect(plannedReadings([design(30)], [design(12)])).toBe(30)
    expect(plannedReadings([absolute])).toBe(25)
  })

  it('assumes six standard deviations in a tenth of the tolerance, to two digits', () => {
    expect(assumedSpread(twoSided, [])).toBe(0.00083)
    expect(assumedSpread(anyTolerance, [])).toBe(1.7)
  })

  it('falls back on process variation, then on the margin, then on one', () => {
    const oneSided = { unit: 'mm', tolerance: { upper: 24.025 } }
    const withProcess = { ...oneSided, processStandardDeviation: 0.005 }
    expect(assumedSpread(withProcess, [absolute])).toBe(0.0005)
    expect(assumedSpread(oneSided, [absolute])).toBe(0.002)
    expect(assumedSpread(oneSided, [])).toBe(1)
  })

  it('is shown in a finer unit where figures would begin with zeros', () => {
    expect(inReadableUnit({ ...twoSided, processStandardDeviation: 0.004 }, [])).toEqual({
      unit: 'µm',
      tolerance: { lower: 23975, upper: 24025 },
      processStandardDeviation: 4,
    })
    const wide = { unit: 'mm', tolerance: { lower: 0, upper: 5 } }
    expect(inReadableUnit(wide, [])).toBe(wide)
    expect(inReadableUnit(anyTolerance, [])).toBe(anyTolerance)
  })
})
