import { describe, expect, it } from 'vitest'
import { toleranceText, withUnit } from './tolerance'

/** Thin spaces made visible, so that expectations can be read. */
const seen = (text: string) => text.replaceAll('\u202F', '_')
const text = (nominal: string | null, lowerLimit: string | null, upperLimit: string | null, unit = 'mm') =>
  seen(toleranceText({ nominal, lowerLimit, upperLimit, unit }))

describe('a tolerance as on the drawing', () => {
  it('keeps the zeros that were entered', () =>
    expect(text('24.000', '23.975', '24.025')).toBe('24.000 ±0.025_mm'))
  it('takes the places of the finer number', () =>
    expect(text('24', '23.975', '24.025')).toBe('24 ±0.025_mm'))
  it('forms differences in decimal, where doubles would show 0.09999999999999432', () =>
    expect(text('100.1', '100.0', '100.2')).toBe('100.1 ±0.1_mm'))
  it('writes unequal deviations one over the other, zero as 0', () => {
    expect(text('24.000', '24.000', '24.021')).toBe('24.000 +0.021/0_mm')
    expect(text('24.000', '23.980', '23.993')).toBe('24.000 −0.007/−0.020_mm')
  })
  it('names both limits where there is no nominal', () =>
    expect(text(null, '-0.5', '1.5')).toBe('−0.5 to 1.5_mm'))
  it('says which limit there is of a one-sided tolerance', () => {
    expect(text(null, null, '2.0', 'ml/min')).toBe('at most 2.0_ml/min')
    expect(text(null, '15', null, 'N')).toBe('at least 15_N')
    expect(text('0', null, '0.02')).toBe('0, at most 0.02_mm')
  })
  it('sets degrees close and leaves pure counts without a unit', () => {
    expect(text('30', '29.5', '30.5', '°')).toBe('30 ±0.5°')
    expect(seen(withUnit('3', '1'))).toBe('3')
    expect(seen(withUnit('-0.0006', 'mm'))).toBe('−0.0006_mm')
  })
})
