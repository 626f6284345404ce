import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { addDays, addMonths } from './days'
import {
  gaugeEventKinds,
  standingOf,
  termOfEvent,
  type CalibrationFact,
  type GaugeEventFact,
  type StandingFacts,
} from './standing'

const suspendAll = {
  validityMonths: 12,
  calibrationOverdue: 'on-hold',
  outOfLimits: 'suspended',
  repaired: 'suspended',
  moved: 'suspended',
  changed: 'suspended',
} as const

const accepted: StandingFacts = {
  acceptedAt: '2026-01-31T09:00:00.000Z',
  acceptedOn: '2026-01-31',
  terms: suspendAll,
  conditions: [],
  calibrations: [
    { of: 'gauge', thingId: 'g', code: 'BG-14', calibratedOn: '2025-11-02', dueOn: '2026-11-02' },
  ],
  events: [],
  reinstatements: [],
  revisions: [],
}

const repaired: GaugeEventFact = {
  of: 'gauge',
  thingId: 'g',
  code: 'BG-14',
  eventId: '01990000-0000-7000-8000-000000000001',
  kind: 'repaired',
  happenedOn: '2026-03-10',
  enteredAt: '2026-03-12T08:00:00.000Z',
  inDoubtSince: null,
  words: 'New guide.',
}

const stateOn = (facts: StandingFacts, day: string) => standingOf(facts, day).state

describe('the standing of an acceptance', () => {
  it('stands from the day it was accepted to the last day of its validity', () => {
    const on = (day: string) => stateOn({ ...accepted, calibrations: [] }, day)
    expect(on('2026-01-31')).toBe('stands')
    expect(on('2027-01-31')).toBe('stands')
    expect(on('2027-02-01')).toBe('expired')
    expect(standingOf(accepted, '2026-05-01')).toMatchObject({
      since: '2026-01-31',
      until: '2027-01-31',
      calibrationDueOn: '2026-11-02',
      cause: null,
    })
  })

  it('ends on the last day of a shorter month', () => {
    expect(addMonths('2026-01-31', 1)).toBe('2026-02-28')
    expect(addMonths('2024-01-31', 1)).toBe('2024-02-29')
    expect(addMonths('2026-11-30', 3)).toBe('2027-02-28')
    expect(addMonths('2026-12-01', 1)).toBe('2027-01-01')
  })

  it('runs out soon from sixty days before its last day, while it stands', () => {
    const on = (day: string, facts = { ...accepted, calibrations: [] as StandingFacts['calibrations'] }) =>
      standingOf(facts, day).runsOutOn
    expect(on('2026-12-01')).toBeNull()
    expect(on('2026-12-02')).toBe('2027-01-31')
    expect(on('2027-01-31')).toBe('2027-01-31')
    expect(on('2027-02-01')).toBeNull()
    expect(on('2026-12-15', accepted)).toBeNull()
    const endless = { ...accepted, calibrations: [], terms: { ...suspendAll, validityMonths: null } }
    expect(on('2036-12-15', endless)).toBeNull()
  })

  it('is on hold from the day after the calibration was due until one finds it within limits', () => {
    expect(stateOn(accepted, '2026-11-02')).toBe('stands')
    expect(standingOf(accepted, '2026-11-03')).toMatchObject({
      state: 'on-hold',
      since: '2026-11-03',
      cause: { kind: 'calibration-overdue', code: 'BG-14', dueOn: '2026-11-02' },
    })
    const again: CalibrationFact = {
      of: 'gauge',
      thingId: 'g',
      code: 'BG-14',
      calibratedOn: '2026-11-20',
      dueOn: '2027-11-20',
    }
    const lifted = { ...accepted, calibrations: [...accepted.calibrations, again] }
    expect(stateOn(lifted, '2026-11-19')).toBe('on-hold')
    expect(stateOn(lifted, '2026-11-20')).toBe('stands')
  })

  it('is on hold while any piece of equipment is overdue', () => {
    const master: CalibrationFact = {
      of: 'standard',
      thingId: 's',
      code: 'RS-2',
      calibratedOn: '2025-06-01',
      dueOn: '2026-06-01',
    }
    expect(
      standingOf({ ...accepted, calibrations: [...accepted.calibrations, master] }, '2026-06-02'),
    ).toMatchObject({ state: 'on-hold', cause: { of: 'standard', code: 'RS-2' } })
  })

  it('is suspended by an event reported after the acceptance, and by none that the customer knew', () => {
    expect(standingOf({ ...accepted, events: [repaired] }, '2026-03-10')).toMatchObject({
      state: 'suspended',
      since: '2026-03-10',
      cause: { kind: 'gauge-event', event: 'repaired' },
    })
    const known = { ...repaired, happenedOn: '2026-01-20', enteredAt: '2026-01-21T08:00:00.000Z' }
    expect(stateOn({ ...accepted, events: [known] }, '2026-03-10')).toBe('stands')
    const reported = { ...known, enteredAt: '2026-02-01T08:00:00.000Z' }
    expect(standingOf({ ...accepted, events: [reported] }, '2026-03-10')).toMatchObject({
      state: 'suspended',
      since: '2026-01-31',
    })
  })

  it('tells a suspension before a hold, and stands again once reinstated and calibrated', () => {
    const facts = { ...accepted, events: [repaired] }
    expect(stateOn(facts, '2026-11-10')).toBe('suspended')
    const reinstated = {
      ...facts,
      reinstatements: [{ at: '2026-04-01T08:00:00.000Z', on: '2026-04-01' }],
    }
    expect(stateOn(reinstated, '2026-03-31')).toBe('suspended')
    expect(stateOn(reinstated, '2026-04-01')).toBe('stands')
    expect(stateOn(reinstated, '2026-11-10')).toBe('on-hold')
    const moved = {
      ...repaired,
      kind: 'moved',
      happenedOn: '2026-03-01',
      enteredAt: '2026-05-01T08:00:00.000Z',
    } as const
    expect(stateOn({ ...reinstated, events: [repaired, moved] }, '2026-05-02')).toBe('suspended')
  })

  it('lapses the day after a condition was due and not confirmed', () => {
    const open = { ...accepted, conditions: [{ dueOn: '2026-02-10', confirmedOn: null }] }
    expect(stateOn(open, '2026-02-10')).toBe('stands')
    expect(standingOf(open, '2026-02-11')).toMatchObject({
      state: 'lapsed',
      since: '2026-02-11',
      cause: { kind: 'condition', dueOn: '2026-02-10' },
    })
    const kept = { ...accepted, conditions: [{ dueOn: '2026-02-10', confirmedOn: '2026-02-09' }] }
    expect(stateOn(kept, '2026-02-11')).toBe('stands')
  })

  it('is reopened by a newer revision until it is carried over with unchanged limits', () => {
    const b = { label: 'B', addedOn: '2026-02-01', limits: 'same', carriedOverOn: null } as const
    expect(standingOf({ ...accepted, revisions: [b] }, '2026-02-03')).toMatchObject({
      state: 'reopened',
      since: '2026-02-01',
      cause: { kind: 'revision', label: 'B', limits: 'same' },
    })
    const carried = { ...b, carriedOverOn: '2026-02-04' }
    expect(stateOn({ ...accepted, revisions: [carried] }, '2026-02-03')).toBe('reopened')
    expect(stateOn({ ...accepted, revisions: [carried] }, '2026-02-04')).toBe('stands')
    expect(stateOn({ ...accepted, revisions: [{ ...carried, limits: 'differ' }] }, '2026-02-04')).toBe(
      'reopened',
    )
    const c = { label: 'C', addedOn: '2026-05-01', limits: 'same', carriedOverOn: null } as const
    expect(standingOf({ ...accepted, revisions: [carried, c] }, '2026-06-01')).toMatchObject({
      state: 'reopened',
      since: '2026-05-01',
    })
  })

  it('tells the end that came first', () => {
    const facts: StandingFacts = {
      ...accepted,
      conditions: [{ dueOn: '2026-06-30', confirmedOn: null }],
      revisions: [{ label: 'B', addedOn: '2026-09-01', limits: 'differ', carriedOverOn: null }],
    }
    expect(stateOn(facts, '2028-01-01')).toBe('lapsed')
  })
})

const day = fc.integer({ min: 0, max: 900 }).map((n) => addDays('2026-01-01', n))
const instant = day.map((each) => `${each}T10:00:00.000Z`)
const equipment = fc.constantFrom(
  { of: 'gauge', thingId: 'g', code: 'BG-14' } as const,
  { of: 'standard', thingId: 's', code: 'RS-2' } as const,
)
const consequence = fc.constantFrom('suspended', 'stays')
const anyFacts: fc.Arbitrary<StandingFacts> = fc.record({
  acceptedOn: fc.constant('2026-06-15'),
  acceptedAt: fc.constant('2026-06-15T10:00:00.000Z'),
  terms: fc.record({
    validityMonths: fc.option(fc.integer({ min: 1, max: 18 })),
    calibrationOverdue: fc.constantFrom('on-hold', 'stays'),
    outOfLimits: consequence,
    repaired: consequence,
    moved: consequence,
    changed: consequence,
  }),
  conditions: fc.array(fc.record({ dueOn: day, confirmedOn: fc.option(day) }), { maxLength: 3 }),
  calibrations: fc.array(
    fc
      .tuple(equipment, day, fc.integer({ min: 0, max: 400 }))
      .map(([thing, on, months]) => ({ ...thing, calibratedOn: on, dueOn: addDays(on, months) })),
    { maxLength: 5 },
  ),
  events: fc.array(
    fc
      .tuple(equipment, fc.constantFrom(...gaugeEventKinds), day, instant, fc.option(day))
      .map(([thing, kind, happenedOn, enteredAt, inDoubtSince]) => ({
        ...{ ...thing, kind, happenedOn, enteredAt, inDoubtSince },
        ...{ eventId: repaired.eventId, words: 'x' },
      })),
    { maxLength: 4 },
  ),
  reinstatements: fc.array(
    day.map((on) => ({ on, at: `${on}T10:00:00.000Z` })),
    { maxLength: 2 },
  ),
  revisions: fc
    .array(
      fc.record({
        label: fc.constantFrom('B', 'C', 'D'),
        addedOn: day,
        limits: fc.constantFrom('same', 'differ', 'missing'),
        carriedOverOn: fc.option(day),
      }),
      { maxLength: 3 },
    )
    .map((all) => all.sort((a, b) => a.addedOn.localeCompare(b.addedOn))),
})
const later = fc.integer({ min: 0, max: 800 }).map((n) => addDays('2026-06-15', n))

describe('for any facts and any day', () => {
  it('depends on nothing else, and on no order of the facts', () => {
    fc.assert(
      fc.property(anyFacts, later, (facts, on) => {
        const copy = JSON.parse(JSON.stringify(facts)) as StandingFacts
        const turned = {
          ...copy,
          conditions: [...copy.conditions].reverse(),
          reinstatements: [...copy.reinstatements].reverse(),
        }
        expect(standingOf(turned, on)).toEqual(standingOf(facts, on))
        expect(facts).toEqual(copy)
      }),
    )
  })

  it('never stands, is held or suspended after its validity has run out', () => {
    fc.assert(
      fc.property(anyFacts, later, (facts, on) => {
        const { state, until } = standingOf(facts, on)
        if (until !== null && on > until) expect(['expired', 'lapsed', 'reopened']).toContain(state)
        if (state === 'expired') expect(until !== null && until < on).toBe(true)
      }),
    )
  })

  it('is suspended rather than on hold whenever both hold', () => {
    fc.assert(
      fc.property(anyFacts, later, (facts, on) => {
        const heldAlone = stateOn({ ...facts, events: [] }, on) === 'on-hold'
        const suspendedAlone = stateOn({ ...facts, calibrations: [] }, on) === 'suspended'
        if (heldAlone && suspendedAlone) expect(stateOn(facts, on)).toBe('suspended')
      }),
    )
  })

  it('is never on hold when a calibration within limits of the day covers all its equipment', () => {
    fc.assert(
      fc.property(anyFacts, later, (facts, on) => {
        const fresh = (['gauge', 'standard'] as const).map((of) => ({
          ...{ of, thingId: of === 'gauge' ? 'g' : 's', code: 'x' },
          ...{ calibratedOn: on, dueOn: addDays(on, 30) },
        }))
        const covered = {
          ...facts,
          calibrations: [...facts.calibrations.filter(({ calibratedOn }) => calibratedOn !== on), ...fresh],
        }
        expect(stateOn(covered, on)).not.toBe('on-hold')
      }),
    )
  })

  it('is only suspended by what the terms say suspends', () => {
    fc.assert(
      fc.property(anyFacts, later, (facts, on) => {
        const { state, cause, since } = standingOf(facts, on)
        if (state === 'suspended' && cause?.kind === 'gauge-event')
          expect(facts.terms[termOfEvent[cause.event]]).toBe('suspended')
        expect(since >= facts.acceptedOn && since <= on).toBe(true)
        expect(cause === null).toBe(state === 'stands')
      }),
    )
  })
})
