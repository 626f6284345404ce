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
/** Lower bounds of Cg and Cgk, for a fifth of the tolerance over six standard deviations. */
export const indices = (leastCg: number, leastCgk: number): Clause => ({
  type: 'bias-index',
  parameters: {
    ...{ share: 0.2, base: 'tolerance', sigmas: 6, leastCg, leastCgk },
    ...{ basis: 'bound', confidence: 0.95 },
  },
})
export const withUncertainty = (share: number): Clause => ({
  type: 'bias-with-uncertainty',
  parameters: { margin: { base: 'tolerance', share }, coverageFactor: 2 },
})
export const zeroTest = (alpha: number): Clause => ({ type: 'bias-zero-test', parameters: { alpha } })

export const standardTerms = [design(25, 3), resolution, calibration, equivalence(0.1)]
/** Takes away what a wider agreement asks for. */
export const doesNotApply = (key: string, reason: string): Clause => ({
  type: 'does-not-apply',
  parameters: { key, reason },
})
