import { describe, expect, it } from 'vitest'
import { standingOn } from '../contract/calibrations'
import { addDays, dayIn } from './calendar'

describe('calendar days', () => {
  it('are those of the time zone, not of UTC', () => {
    expect(dayIn('Europe/Berlin', '2026-11-02T22:59:59.000Z')).toBe('2026-11-02')
    expect(dayIn('Europe/Berlin', '2026-11-02T23:00:00.000Z')).toBe('2026-11-03')
    expect(dayIn('America/Los_Angeles', '2026-11-02T07:00:00.000Z')).toBe('2026-11-01')
  })
  it('are added across months, leap days and the changes of summer time', () => {
    expect(addDays('2028-02-28', 1)).toBe('2028-02-29')
    expect(addDays('2026-03-28', 2)).toBe('2026-03-30')
    expect(addDays('2026-01-01', -1)).toBe('2025-12-31')
  })
})

describe('the standing of a calibration', () => {
  it.each([
    [null, 'none'],
    ['2026-11-01', 'overdue'],
    ['2026-11-02', 'due-soon'],
    ['2026-12-02', 'due-soon'],
    ['2026-12-03', 'in-date'],
  ])('due %s, seen on 2 Nov 2026, is %s', (dueOn, standing) =>
    expect(standingOn(dueOn, '2026-11-02')).toBe(standing),
  )
})
