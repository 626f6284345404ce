import { describe, expect, it } from 'vitest'
import { calendarTicks, dayIso, dayNumber } from './calendar'

const labels = (from: string, to: string, most: number) =>
  calendarTicks(dayNumber(from), dayNumber(to), most).flatMap(({ label }) => (label ? [label] : []))

describe('calendar ticks', () => {
  it('turn days into numbers and back', () => {
    expect(dayNumber('1970-01-02')).toBe(1)
    expect(dayIso(dayNumber('2026-10-14'))).toBe('2026-10-14')
    expect(dayNumber('2026-10-14T23:59:00Z')).toBe(dayNumber('2026-10-14'))
  })
  it('stand at firsts of months and label what fits', () =>
    expect(labels('2026-01-15', '2027-04-02', 6)).toEqual([
      'Apr 2026',
      'Jul 2026',
      'Oct 2026',
      'Jan 2027',
      'Apr 2027',
    ]))
  it('label every month where there is room', () =>
    expect(labels('2026-01-01', '2026-03-31', 6)).toEqual(['Jan 2026', 'Feb 2026', 'Mar 2026']))
  it('reach over decades with years only', () =>
    expect(labels('2000-01-01', '2030-01-01', 4)).toEqual(['Jan 2000', 'Jan 2010', 'Jan 2020', 'Jan 2030']))
})
