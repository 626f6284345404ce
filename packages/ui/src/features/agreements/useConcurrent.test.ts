import { mount } from '@vue/test-utils'
import { beforeEach, describe, expect, it } from 'vitest'
import { defineComponent, h, nextTick, shallowRef } from 'vue'
import { useForm, type Form } from '../../forms'
import { clearDrafts } from '../../forms/drafts'
import type { TypedProposal } from './proposalDraft'
import { proposalTarget, snapshotOf, type ProposalTarget } from './proposalTarget'
import { agreement, design, equivalence, resolution, round, version } from './rooms.fixture'
import { useConcurrent } from './useConcurrent'

/** A draft of ours as the server has it after so many savings. */
function draftTarget(rowVersion: number, readings: number, comment = ''): ProposalTarget {
  const draft = round(1, [equivalence, design(readings), resolution(0.1)], {
    state: 'draft',
    rowVersion,
    comment,
    by: 'Sanna Reve',
  })
  const at = version('v', 'draft', [draft], { moves: ['keep-draft'] })
  const target = proposalTarget(agreement([at]), at, null)
  if (!target) throw new Error('A draft can be written.')
  return target
}

function room(first: ProposalTarget) {
  const target = shallowRef(first)
  let form!: Form<TypedProposal>
  let concurrent!: ReturnType<typeof useConcurrent<TypedProposal>>
  const wrapper = mount(
    defineComponent({
      setup() {
        form = useForm<TypedProposal>({
          initial: target.value.initial,
          storageKey: 'room',
          submit: async () => undefined,
        })
        concurrent = useConcurrent(() => snapshotOf(target.value), form, 'room')
        return () => h('div')
      },
    }),
  )
  return { target, form, concurrent, wrapper }
}

beforeEach(clearDrafts)

describe('two people on one round', () => {
  it('goes on silently where the other changed nothing that one did not', async () => {
    const { target, form, concurrent } = room(draftTarget(1, 15))
    form.values.comment = 'Ours'
    await nextTick()
    target.value = draftTarget(2, 15)
    await nextTick()
    expect(concurrent.theirs.value).toBeUndefined()
    expect(concurrent.basis.value.rowVersion).toBe(2)
    expect(form.values.comment).toBe('Ours')
  })

  it('shows both where the other saved something else, and puts together what is chosen', async () => {
    const { target, form, concurrent } = room(draftTarget(1, 15))
    form.values.comment = 'Ours'
    await nextTick()
    target.value = draftTarget(2, 30)
    await nextTick()
    expect(concurrent.rows.value.map(({ key, changedBy }) => [key, changedBy])).toEqual([
      ['clause:design/readings', 'theirs'],
      ['comment', 'mine'],
    ])
    concurrent.choose({ 'clause:design/readings': 'theirs', comment: 'mine' })
    await nextTick()
    expect(concurrent.theirs.value).toBeUndefined()
    expect(concurrent.basis.value.rowVersion).toBe(2)
    expect(form.values.comment).toBe('Ours')
    expect(form.values.clauses.find(({ type }) => type === 'design-minimum')?.parameters.readings).toBe('30')
    expect(form.dirty.value).toBe(true)
  })

  it('shows both after a reload too, with what was typed', async () => {
    const before = room(draftTarget(1, 15))
    before.form.values.comment = 'Ours'
    await nextTick()
    before.wrapper.unmount()
    const { form, concurrent } = room(draftTarget(2, 30))
    expect(form.values.comment).toBe('Ours')
    expect(concurrent.theirs.value).toBeDefined()
    expect(concurrent.basis.value.rowVersion).toBe(1)
    expect(concurrent.rows.value.map(({ key }) => key)).toEqual(['clause:design/readings', 'comment'])
  })

  it('does not take one’s own saving for somebody else’s', async () => {
    const { target, form, concurrent } = room(draftTarget(1, 15))
    form.values.comment = 'Ours'
    await nextTick()
    concurrent.ownSave()
    target.value = draftTarget(2, 15, 'Ours')
    await nextTick()
    expect(concurrent.theirs.value).toBeUndefined()
    expect(concurrent.basis.value.rowVersion).toBe(2)
  })
})
