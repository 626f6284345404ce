import type { characteristics, proof } from '@evenrule/api/contract'
import { describe, expect, it } from 'vitest'
import { answerOfPart, coverageTicks } from './standing'

const row = (number: number, state: proof.ProofState, more: object = {}) =>
  ({
    number,
    name: 'Bore Ø',
    nominal: '24.000',
    lowerLimit: '23.975',
    upperLimit: '24.025',
    unit: 'mm',
    class: 'ordinary',
    proof: state,
    runsOutOn: null,
    ...more,
  }) as characteristics.Characteristic

describe('the answer on a part’s page', () => {
  it('says that there is nothing yet', () =>
    expect(answerOfPart('A', [])).toEqual({ plain: 'Revision A has no characteristics yet.', strong: '' }))
  it('counts what is proved and names what is not', () =>
    expect(
      answerOfPart('C', [
        row(1, 'accepted'),
        row(2, 'accepted-with-conditions', { class: 'safety' }),
        row(3, 'challenged'),
        row(4, 'waiting'),
        row(5, 'missing'),
        row(6, 'no-task'),
        row(7, 'suspended'),
        row(8, 'on-hold'),
        row(9, 'reopened'),
      ]),
    ).toEqual({
      plain: 'Revision C has 9 characteristics, 1 of class safety.',
      strong:
        '2 of 9 stand on accepted proof: 1 challenged or refused, 2 on hold or suspended, 1 expired, lapsed or reopened, 1 waiting for a decision, 2 not shown yet.',
    }))
  it('says so when all is proved, and when nothing is', () => {
    expect(answerOfPart('A', [row(1, 'accepted')]).strong).toBe('All stand on accepted proof.')
    expect(answerOfPart('A', [row(1, 'missing'), row(2, 'missing')]).strong).toBe(
      'None stands on accepted proof: 2 not shown yet.',
    )
  })
})

describe('the coverage rule of a part', () => {
  it('draws what is accepted and runs out soon with its day, and says how many', () => {
    const rows = [row(1, 'accepted', { runsOutOn: '2026-12-20' }), row(2, 'accepted-with-conditions')]
    expect(coverageTicks(rows).map(({ state, runsOutOn }) => [state, runsOutOn])).toEqual([
      ['running-out', '2026-12-20'],
      ['conditional', null],
    ])
    expect(answerOfPart('A', rows).strong).toBe('All stand on accepted proof. The proof of 1 runs out soon.')
  })

  it('stands in the order of the drawing, each tick named with its tolerance', () =>
    expect(coverageTicks([row(7, 'waiting'), row(2, 'accepted')])).toEqual([
      { number: 2, label: 'Bore Ø 24.000 ±0.025\u202Fmm', state: 'accepted', runsOutOn: null },
      { number: 7, label: 'Bore Ø 24.000 ±0.025\u202Fmm', state: 'missing', runsOutOn: null },
    ]))
})
