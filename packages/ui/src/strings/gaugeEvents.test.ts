import { describe, expect, it } from 'vitest'
import type { gaugeEvents } from '@evenrule/api/contract'
import { carryOverAnswer, carryOverState } from './carryOvers'
import { consequenceText, effectAnswer, gaugeEventWords } from './gaugeEvents'

const acceptance = (customer: string, effect: 'suspended' | 'stays') => ({
  ...{ submissionId: 'x', number: 4, customer, effect },
  ...{ partNumber: '7741-220', characteristicNumber: 1, characteristicName: 'bore' },
})
const effect = (more: Partial<gaugeEvents.EventEffect>): gaugeEvents.EventEffect => ({
  ...{ lastGoodOn: '2026-03-02', reachesBack: true, suspended: 0, stays: 0, underReview: 0 },
  acceptances: [],
  ...more,
})

describe('what reporting an event will do', () => {
  it('is said before it is confirmed: how many, with whom, in doubt since when', () =>
    expect(
      effectAnswer(
        effect({
          ...{ suspended: 3, underReview: 1 },
          acceptances: [
            acceptance('Brackwell', 'suspended'),
            acceptance('Norvane', 'suspended'),
            acceptance('Brackwell', 'suspended'),
          ],
        }),
      ),
    ).toEqual({
      strong:
        '3 acceptances with Brackwell and Norvane will be suspended, in doubt since its last good calibration on 2 Mar 2026.',
      rest: '1 submission under review: the customer is told and decides knowing it. Every customer concerned is told.',
    }))

  it('says what stays, and that nothing is concerned', () => {
    expect(effectAnswer(effect({ reachesBack: false, stays: 2 }))).toEqual({
      strong: 'No acceptance will be suspended.',
      rest: '2 acceptances stay, as agreed. Every customer concerned is told.',
    })
    expect(effectAnswer(effect({}))).toEqual({ strong: 'No acceptance will be suspended.', rest: '' })
    expect(
      effectAnswer(
        effect({ suspended: 1, lastGoodOn: null, acceptances: [acceptance('Brackwell', 'suspended')] }),
      ).strong,
    ).toContain('in doubt from the beginning')
  })

  it('is on the button too', () => {
    expect(gaugeEventWords.send(0)).toBe('Report it')
    expect(gaugeEventWords.send(1)).toBe('Report it and suspend 1 acceptance')
  })

  it('is told afterwards', () => {
    expect(consequenceText({ suspended: 0, stays: 0 })).toBe('none concerned')
    expect(consequenceText({ suspended: 2, stays: 1 })).toBe('2 suspended, 1 stayed, as agreed')
  })
})

describe('what was accepted before a revision', () => {
  const row = (more: object) =>
    ({ limits: 'same', carriedOverOn: null, carriedOverBy: null, standing: 'stands', ...more }) as Parameters<
      typeof carryOverState
    >[0]

  it('is counted by whether it holds', () => {
    expect(carryOverAnswer('B', [row({}), row({ limits: 'differ' })])).toEqual({
      strong: 'None of it holds for revision B yet.',
      rest: '1 rests on limits that did not change. 1 needs new proof.',
    })
    expect(carryOverAnswer('B', [row({ carriedOverOn: '2026-11-10' }), row({})]).strong).toBe(
      '1 of 2 acceptances holds for revision B.',
    )
    expect(carryOverAnswer('B', [row({ carriedOverOn: '2026-11-10' })]).strong).toBe(
      'All of it holds for revision B.',
    )
  })

  it('says who carried it over, or why it does not hold', () => {
    expect(carryOverState(row({ carriedOverOn: '2026-11-10', carriedOverBy: 'Veit Sahm' }))).toBe(
      'carried over on 10 Nov 2026 by Veit Sahm',
    )
    expect(carryOverState(row({ limits: 'missing' }))).toContain('no such characteristic')
    expect(carryOverState(row({ standing: 'suspended' }))).toBe(
      'reopened; its limits did not change; it is suspended besides',
    )
  })
})
