import { computed, ref, shallowRef, toRaw, watch } from 'vue'
import type { Form } from '../../forms'
import { readDraft, writeDraft } from '../../forms/drafts'
import { copy } from '../../forms/paths'
import { differingPieces, mergedPieces, type Choice } from './merging'
import type { TypedProposal } from './proposalDraft'
import { piecesOf, proposalOf } from './proposalPieces'
import { basisOf, sameBasis, type Basis, type ProposalTarget } from './proposalTarget'

const isBasis = (value: unknown): value is Basis =>
  typeof value === 'object' && value !== null && 'rowVersion' in value && 'typed' in value

/**
 * Two people on one round. Beside what is typed the form keeps what it was begun from, also across a reload; when what
 * stands on the server is no longer that, both are shown side by side, and nothing is saved before one has chosen.
 */
export function useConcurrent(target: () => ProposalTarget, form: Form<TypedProposal>, storageKey: string) {
  const basisKey = `${storageKey}.basis`
  const kept = readDraft(basisKey)
  const basis = shallowRef<Basis>(form.restored.value && isBasis(kept) ? kept : basisOf(target()))
  /** What somebody else saved meanwhile, as the form would have offered it. */
  const theirs = shallowRef<ProposalTarget>()
  const ownSaving = ref(false)

  const rows = computed(() => {
    const other = theirs.value
    return other
      ? differingPieces(piecesOf(basis.value.typed), piecesOf(other.initial), piecesOf(form.values))
      : []
  })

  /** Takes up what stands now: silently where only one's own changes differ, else to be chosen between. */
  function meet(next: ProposalTarget) {
    if (sameBasis(basis.value, basisOf(next))) return
    theirs.value = next
    if (rows.value.some(({ changedBy }) => changedBy !== 'mine')) {
      form.problem.value = undefined
      return
    }
    settle(copy(toRaw(form.values)))
  }

  function settle(typed: TypedProposal) {
    const next = theirs.value
    if (!next) return
    theirs.value = undefined
    basis.value = basisOf(next)
    form.reset(next.initial)
    Object.assign(form.values, typed)
  }

  watch(target, (next) => {
    if (ownSaving.value) {
      ownSaving.value = false
      basis.value = basisOf(next)
    } else meet(next)
  })
  watch([form.dirty, basis], ([dirty]) => writeDraft(basisKey, dirty ? basis.value : undefined), {
    immediate: true,
    flush: 'post',
  })
  meet(target())

  return {
    basis,
    theirs,
    rows,
    /** The next target is what this form itself has saved. */
    ownSave: () => (ownSaving.value = true),
    choose(choices: Readonly<Record<string, Choice>>) {
      const other = theirs.value
      if (other)
        settle(proposalOf(mergedPieces(piecesOf(other.initial), copy(piecesOf(form.values)), choices)))
    },
  }
}
