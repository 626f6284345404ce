import type { Clause } from '@evenrule/metrology'
import { describe, expect, it } from 'vitest'
import { clauseEffects } from './consequenceRows'
import { compareClauses } from '../agreements/differences'
import { effectText } from './effectText'

const characteristic = { unit: 'µm', tolerance: { lower: -25, upper: 25 } }
const zeroTest: Clause = { type: 'bias-zero-test', parameters: { alpha: 0.05 } }
const equivalence: Clause = {
  type: 'bias-equivalence',
  parameters: { margin: { base: 'tolerance', share: 0.05 }, confidence: 0.95 },
}
const design = (readings: number): Clause => ({
  type: 'design-minimum',
  parameters: { readings, registeredBeforehand: true },
})

function told(before: Clause[], after: Clause[]) {
  const row = compareClauses(before, after)[0]!
  return effectText(
    row,
    clauseEffects(row, characteristic, { readings: 15, standardDeviation: 0.8 }),
    characteristic.unit,
  )
}

describe('what a row does, in a sentence', () => {
  it('warns of a proposal that a worse gauge passes more easily', () => {
    const { text, wrong } = told([equivalence], [zeroTest])
    expect(text).toMatch(/^A worse gauge passes the zero test more easily: at a bias of 0\.\d+\u202Fµm /)
    expect(wrong).toBe(true)
  })
  it('says what is wrong with the rule that is replaced', () => {
    const { text, wrong } = told([zeroTest], [equivalence])
    expect(text).toMatch(/zero test/)
    expect(wrong).toBe(false)
  })
  it('says that a sound rule rewards better work', () =>
    expect(told([], [equivalence]).text).toBe('A better gauge and more readings make it easier to meet.'))
  it('counts readings', () => {
    expect(told([design(15)], [design(25)]).text).toBe('Needs 25 readings instead of 15.')
    expect(told([design(25)], [design(15)]).text).toBe('15 readings are enough instead of 25.')
    expect(told([design(25)], [design(25)]).text).toBe('')
  })
  it('is silent about what falls away', () => expect(told([zeroTest], []).text).toBe(''))
})
