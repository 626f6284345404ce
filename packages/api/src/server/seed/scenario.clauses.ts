import type { Clause } from '@evenrule/metrology'

export const design = (readings: number, attempts?: number): Clause => ({
  type: 'design-minimum',
  parameters: { readings, registeredBeforehand: true, ...(attempts === undefined ? {} : { attempts }) },
})
export const resolution: Clause = { type: 'resolution-share', parameters: { share: 0.1, base: 'tolerance' } }
export const calibration: Clause = {
  type: 'calibration-in-date',
  parameters: { gauge: true, standard: true },
}
export const equivalence = (share: number): Clause => ({
  type: 'bias-equivalence',
  parameters: { margin: { base: 'tolerance', share }, confidence: 0.95 },
})
export const within = (value: number, unit: string): Clause => ({
  type: 'bias-equivalence',
  parameters: { margin: { base: 'absolute', value, unit }, confidence: 0.95 },
})
export const zeroTest = (alpha: number): Clause => ({ type: 'bias-zero-test', parameters: { alpha } })

export const standardTerms = [design(25, 3), resolution, calibration, equivalence(0.1)]
/** Takes away what a wider agreement asks for. */
export const doesNotApply = (key: string, reason: string): Clause => ({
  type: 'does-not-apply',
  parameters: { key, reason },
})
