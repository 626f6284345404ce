import { describe, expect, it } from 'vitest'
import { proofOfCharacteristic, proofOfTask } from './proof'

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
  ])('with submissions %j, newest first, is %s', (states, proof) => expect(proofOfTask(states)).toBe(proof))

  it('stays accepted while a newer submission is looked at', () =>
    expect(proofOfTask(['submitted', 'accepted', 'superseded'])).toBe('accepted'))
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
