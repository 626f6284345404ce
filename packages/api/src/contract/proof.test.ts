import { describe, expect, it } from 'vitest'
import { proofOfCharacteristic, proofOfTask, runsOutOfTask } from './proof'
import type { StandingState } from './standing'

const of = (states: readonly string[], standing: StandingState = 'stands') =>
  states.map((state) => ({ state, standing: state.startsWith('accepted') ? standing : null }))

describe('the proof of a measuring task', () => {
  it.each([
    [[], 'missing'],
    [['draft', 'for-signature'], 'missing'],
    [['withdrawn'], 'missing'],
    [['submitted'], 'waiting'],
    [['answered'], 'waiting'],
    [['awaiting-second-person'], 'waiting'],
    [['challenged'], 'challenged'],
    [['refused', 'challenged'], 'refused'],
    [['withdrawn', 'refused'], 'refused'],
    [['accepted'], 'accepted'],
    [['accepted-with-conditions', 'superseded'], 'accepted-with-conditions'],
  ])('with submissions %j, newest first, is %s', (states, proof) =>
    expect(proofOfTask(of(states))).toBe(proof),
  )

  it('stays accepted while a newer submission is looked at', () =>
    expect(proofOfTask(of(['submitted', 'accepted', 'superseded']))).toBe('accepted'))

  it.each(['on-hold', 'suspended', 'expired', 'lapsed', 'reopened'] as const)(
    'is %s where the acceptance is, until something newer is put before the customer',
    (standing) => {
      expect(proofOfTask(of(['accepted', 'superseded'], standing))).toBe(standing)
      expect(proofOfTask(of(['submitted', 'accepted'], standing))).toBe('waiting')
    },
  )

  it('counts an older acceptance that still stands', () =>
    expect(
      proofOfTask([
        { state: 'accepted', standing: 'suspended' },
        { state: 'accepted-with-conditions', standing: 'stands' },
      ]),
    ).toBe('accepted-with-conditions'))
})

describe('the proof of a characteristic', () => {
  it('is that of the task that is least far', () => {
    expect(proofOfCharacteristic(['accepted', 'missing', 'challenged'])).toBe('missing')
    expect(proofOfCharacteristic(['accepted', 'accepted-with-conditions'])).toBe('accepted-with-conditions')
    expect(proofOfCharacteristic(['accepted'])).toBe('accepted')
  })
  it('says that nothing measures it where it has no task', () =>
    expect(proofOfCharacteristic([])).toBe('no-task'))
})

describe('accepted proof that runs out soon', () => {
  const accepted = (runsOutOn: string | null, standing: StandingState = 'stands') => ({
    state: 'accepted',
    standing,
    runsOutOn,
  })
  it.each([
    [[accepted('2027-01-31')], '2027-01-31'],
    [[accepted(null)], null],
    [[accepted('2027-01-31'), accepted(null)], null],
    [[accepted('2027-01-10'), accepted('2027-01-31')], '2027-01-31'],
    [[accepted('2027-01-31'), accepted(null, 'suspended')], '2027-01-31'],
    [[accepted(null, 'expired')], null],
    [[], null],
  ])('of %j is %s', (submissions, day) => expect(runsOutOfTask(submissions)).toBe(day))
})
