import { describe, expect, it } from 'vitest'
import {
  formatAge,
  formatChance,
  formatDate,
  formatDateTime,
  formatDue,
  formatInterval,
  formatLimits,
  formatNumber,
  formatShare,
  formatTolerance,
  parseNumber,
} from './index'

/** Thin spaces made visible, so that expectations can be read. */
const seen = (text: string) => text.replaceAll('\u202F', '_')

describe('formatNumber', () => {
  it('writes a true minus and a thin unbreakable space before the unit', () =>
    expect(seen(formatNumber(-0.0009, { unit: 'mm' }))).toBe('−0.0009_mm'))
  it('takes its places from the resolution', () =>
    expect(formatNumber(24.0, { resolution: 0.001 })).toBe('24.000'))
  it('reads a resolution written with an exponent', () =>
    expect(formatNumber(0, { resolution: 5e-7 })).toBe('0.0000000'))
  it('rounds half away from zero in decimal, not in binary', () => {
    expect(formatNumber(1.005, { digits: 2 })).toBe('1.01')
    expect(formatNumber(-1.005, { digits: 2 })).toBe('−1.01')
  })
  it('never writes a minus before zero', () => expect(formatNumber(-0.0004, { digits: 2 })).toBe('0.00'))
  it('shows at most five significant digits when nothing else is asked', () =>
    expect(formatNumber(0.00123456789)).toBe('0.0012346'))
  it('groups from ten thousand on', () => expect(seen(formatNumber(100000))).toBe('100_000'))
  it('leaves four figures together', () => expect(formatNumber(1000)).toBe('1000'))
  it('shows a dash for a figure that is not defined', () => {
    expect(formatNumber(null)).toBe('–')
    expect(formatNumber(Number.NaN)).toBe('–')
  })
  it('writes a plus when asked', () => expect(formatNumber(0.02, { signed: true })).toBe('+0.02'))
  it('sets degrees close to the number', () => expect(formatNumber(30, { unit: '°' })).toBe('30°'))
})

describe('formatShare', () => {
  it('writes agreed shares as entered', () => {
    expect(seen(formatShare(0.05))).toBe('5_%')
    expect(seen(formatShare(0.125))).toBe('12.5_%')
    expect(seen(formatShare(0.07))).toBe('7_%')
  })
  it('rounds computed shares to one place', () => expect(seen(formatShare(0.142347))).toBe('14.2_%'))
  it('keeps small shares readable', () => expect(seen(formatShare(0.00034567))).toBe('0.035_%'))
})

describe('formatChance', () => {
  it('never claims certainty that is not there', () => {
    expect(seen(formatChance(0.99999))).toBe('over_99.9_%')
    expect(seen(formatChance(0.00001))).toBe('under_0.1_%')
    expect(seen(formatChance(0.996))).toBe('99.6_%')
    expect(seen(formatChance(0.8049))).toBe('80_%')
  })
})

describe('intervals and limits', () => {
  it('names both ends and the unit once', () =>
    expect(seen(formatInterval({ lower: -0.0017, upper: -0.0001 }, { unit: 'mm' }))).toBe(
      '−0.0017 to −0.0001_mm',
    ))
  it('says which end is open', () => {
    expect(seen(formatInterval({ lower: null, upper: 20 }, { unit: '%' }))).toBe('at most 20_%')
    expect(formatInterval({ lower: 15 })).toBe('at least 15')
  })
  it('writes symmetric limits with ±', () =>
    expect(seen(formatLimits({ lower: -0.0025, upper: 0.0025 }, { unit: 'mm' }))).toBe('±0.0025_mm'))
  it('writes a tolerance as on the drawing', () => {
    const format = { resolution: 0.001, unit: 'mm' }
    expect(seen(formatTolerance({ nominal: 24, lower: 23.975, upper: 24.025 }, format))).toBe(
      '24.000 ±0.025_mm',
    )
    expect(seen(formatTolerance({ nominal: 24, lower: 24, upper: 24.021 }, format))).toBe(
      '24.000 +0.021/0.000_mm',
    )
    expect(seen(formatTolerance({ upper: 2 }, { digits: 1, unit: 'ml/min' }))).toBe('at most 2.0_ml/min')
  })
})

describe('dates', () => {
  it('writes a day unambiguously', () => expect(formatDate('2026-10-14')).toBe('14 Oct 2026'))
  it('keeps a bare day in every time zone', () =>
    expect(formatDate('2026-10-14', 'America/Los_Angeles')).toBe('14 Oct 2026'))
  it('shows a moment in the time zone asked for', () => {
    expect(formatDateTime('2026-10-14T23:30:00Z', 'Europe/Berlin')).toBe('15 Oct 2026, 01:30')
    expect(formatDate('2026-10-14T23:30:00Z', 'Europe/Berlin')).toBe('15 Oct 2026')
  })
  it('writes midnight as 00', () =>
    expect(formatDateTime('2026-10-14T00:00:00Z', 'UTC')).toBe('14 Oct 2026, 00:00'))
  it('shows a dash for what is no date', () => expect(formatDate('soon')).toBe('–'))
  it('counts age in calendar days of the time zone', () => {
    const now = new Date('2026-10-14T00:30:00Z')
    expect(formatAge('2026-10-13T23:30:00Z', { now, timeZone: 'UTC' })).toBe('1 day')
    expect(formatAge('2026-10-13T23:30:00Z', { now, timeZone: 'Asia/Tokyo' })).toBe('today')
    expect(formatAge('2026-10-08', { now, timeZone: 'UTC' })).toBe('6 days')
  })
  it('tells due days ahead and behind', () => {
    const now = new Date('2026-10-14T12:00:00Z')
    expect(formatDue('2026-10-26', { now, timeZone: 'UTC' })).toBe('in 12 days')
    expect(formatDue('2026-10-13', { now, timeZone: 'UTC' })).toBe('1 day overdue')
    expect(formatDue('2026-10-14', { now, timeZone: 'UTC' })).toBe('today')
  })
})

describe('parseNumber', () => {
  it.each([
    ['24.0012', 24.0012],
    ['24,0012', 24.0012],
    [' −0,5 ', -0.5],
    ['+3', 3],
    ['1e-3', 0.001],
    ['2,5E2', 250],
    ['.5', 0.5],
    ['5.', 5],
    ['10\u202F000', 10000],
  ])('reads %s', (text, value) => expect(parseNumber(text)).toEqual({ value, text, problem: null }))
  it.each([
    ['', 'empty'],
    ['  ', 'empty'],
    ['24.00.1', 'ambiguous'],
    ['1.234,5', 'ambiguous'],
    ['1,234,567', 'ambiguous'],
    ['24 mm', 'not-a-number'],
    ['0x10', 'not-a-number'],
    ['-', 'not-a-number'],
    ['.', 'not-a-number'],
    ['1e999', 'too-large'],
  ])('refuses "%s" as %s and keeps the text', (text, problem) =>
    expect(parseNumber(text)).toEqual({ value: null, text, problem }),
  )
})
