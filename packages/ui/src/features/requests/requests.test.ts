import type { requests } from '@evenrule/api/contract'
import { describe, expect, it } from 'vitest'
import { daysLeftText } from '../../strings/requests'
import { answerOf, gaugeText, nextStepOf, taskText } from './requestText'

const task: requests.RequestTask = {
  ...{ taskId: 't', gaugeCode: 'BG-14', gaugeName: 'Bore gauge', site: 'Hall 2', processStep: null },
  ...{ partId: 'p', partNumber: '7741-220', partName: 'Shaft', revision: 'C' },
  ...{ characteristicNumber: 1, characteristicName: 'Bore Ø', nominal: '24.000' },
  ...{ lowerLimit: '23.975', upperLimit: '24.025', unit: 'mm', class: 'ordinary' },
  ...{ proof: 'missing', archived: false, state: 'open', submission: null },
  work: { study: null, draft: null },
}
const request = (more: Partial<requests.RequestRow>): requests.RequestRow => ({
  ...{ id: 'r', relationshipId: 'x', number: 4, state: 'open', occasion: 'yearly', words: '' },
  ...{ dueOn: '2026-11-20', daysLeft: 6, partner: { id: 'o', name: 'Osmere' } },
  ...{ askedAt: '2026-11-02T09:00:00.000Z', tasks: 3, owed: 2, answered: 1, accepted: 0 },
  ...more,
})

describe('what a request answers', () => {
  it.each([
    [{}, 'Not yet: 2 of 3 measuring tasks have no answer. 6 days are left.'],
    [{ owed: 1, daysLeft: -1 }, 'Not yet: 1 of 3 measuring tasks has no answer. It is 1 day overdue.'],
    [
      { owed: 3, daysLeft: 0 },
      'Not yet: none of the 3 measuring tasks has an answer. Today is the last day.',
    ],
    [{ tasks: 1, owed: 1, daysLeft: 1 }, 'Not yet: the measuring task has no answer. 1 day is left.'],
    [{ state: 'answered', owed: 0, answered: 1 }, 'Everything is answered; 1 waits for the decision.'],
    [{ state: 'closed', owed: 0 }, 'Yes: all 3 measuring tasks are accepted.'],
    [{ state: 'closed', owed: 0, tasks: 1 }, 'Yes: it is accepted.'],
    [{ state: 'withdrawn' }, 'It asks for no answer any more.'],
  ] as const)('%j', (more, sentence) => {
    const { strong, rest } = answerOf(request(more))
    expect(`${strong} ${rest}`.trim()).toBe(sentence)
  })

  it('names the day by how far it is', () => {
    expect([9, 1, 0, -1, -12].map(daysLeftText)).toEqual([
      ...['in 9 days', 'in 1 day', 'today', '1 day overdue', '12 days overdue'],
    ])
  })

  it('names task and gauge as both sides do', () => {
    expect(taskText(task)).toBe('7741-220 C / Bore Ø 24.000 ±0.025\u202fmm')
    expect(gaugeText(task)).toBe('BG-14 Bore gauge, Hall 2')
  })
})

describe('the supplier’s next step', () => {
  const study = { id: 's', code: 'BS-3', registeredAt: '2026-11-03T09:00:00.000Z' }
  const step = (more: Partial<requests.RequestTask>, side: 'supplier' | 'customer' = 'supplier') =>
    nextStepOf({ ...task, ...more }, 'open', side)

  it('is to plan, to go on with the study, to prepare, or to go on with the draft', () => {
    expect(step({})).toEqual({ kind: 'plan', to: 'studies/new?taskId=t' })
    expect(step({ work: { study: { ...study, state: 'collecting' }, draft: null } })).toEqual({
      ...{ kind: 'study', to: 'studies/s', code: 'BS-3' },
    })
    expect(step({ work: { study: { ...study, state: 'computed' }, draft: null } })).toEqual({
      kind: 'prepare',
    })
    expect(step({ work: { study: null, draft: { id: 'd', state: 'draft' } } })).toEqual({
      ...{ kind: 'draft', to: 'submissions/d' },
    })
  })

  it('is none for the customer, for what is answered, for an ended task, for a closed request', () => {
    expect(step({}, 'customer')).toBeNull()
    expect(step({ state: 'answered' })).toBeNull()
    expect(step({ archived: true })).toBeNull()
    expect(nextStepOf(task, 'withdrawn', 'supplier')).toBeNull()
    expect(step({ state: 'refused' })).not.toBeNull()
  })
})
