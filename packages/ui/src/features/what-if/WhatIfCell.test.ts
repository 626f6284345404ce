import { evaluate, type Clause, type ClauseOutput } from '@evenrule/metrology'
import { mount } from '@vue/test-utils'
import { describe, expect, it } from 'vitest'
import { verdictWords } from '../../strings/verdicts'
import { whatIfWords } from '../../strings/whatIf'
import WhatIfCell from './WhatIfCell.vue'
import WhatIfQuoteView from './WhatIfQuoteView.vue'

const clause: Clause = {
  type: 'bias-equivalence',
  parameters: { margin: { base: 'absolute', value: 2.5, unit: 'µm' }, confidence: 0.95 },
}
/** Readings for which the clause meets, is not shown, and falls short. */
const cases = [
  [1, 1.2, 0.8, 1.1],
  [1, 4, 2, 3.5],
  [5, 5.2, 4.8, 5.1],
]
const judged = cases.map(
  (readings) =>
    evaluate({
      kind: 'clause',
      unit: 'µm',
      clause,
      data: { kind: 'bias', readings, reference: { value: 0 } },
    } as { kind: 'clause' }) as ClauseOutput,
)
const cell = (judgement: ClauseOutput, supposed: boolean) =>
  mount(WhatIfCell, { props: { clause, judgement, unit: 'µm', heading: 'As submitted', supposed } })

describe('a supposed clause', () => {
  it('covers the three verdicts', () =>
    expect(judged.map(({ verdict }) => verdict)).toEqual(['meets', 'not-shown', 'falls-short']))

  it.each(judged)('has no verdict word and no verdict mark, and carries its own: %#', (judgement) => {
    const supposed = cell(judgement, true)
    expect(supposed.get('.heading').text()).toBe(whatIfWords.mark)
    const word = supposed.get('.word').text()
    expect(word).toMatch(/^would /)
    expect(Object.values(verdictWords)).not.toContain(word)
    expect(supposed.find('.verdict-bar').exists()).toBe(false)
    expect(supposed.get('[role=img]').attributes('aria-label')).toMatch(/would [a-z ]+$/)
    expect(supposed.classes()).toContain('supposed')
  })

  it.each(judged)('stands beside what was submitted, which has them: %#', (judgement) => {
    const stands = cell(judgement, false)
    expect(stands.get('.heading').text()).toBe('As submitted')
    expect(stands.get('.word').text()).toBe(verdictWords[judgement.verdict])
    expect(stands.find('.verdict-bar').exists()).toBe(true)
  })
})

describe('a quoted what-if that cannot be read', () => {
  it('says so under its mark, whatever the text is', () => {
    for (const text of ['', '{}', 'no json', '{"format":"evenrule.what-if/1"}']) {
      const view = mount(WhatIfQuoteView, { props: { text } })
      expect(view.text()).toContain(whatIfWords.quoted)
      expect(view.text()).toContain(whatIfWords.unreadable)
    }
  })
})
