import { computed, ref, shallowRef, toRaw, watch } from 'vue'
import type { Form } from '../../forms'
import { readDraft, writeDraft } from '../../forms/drafts'
import { copy } from '../../forms/paths'
import { differingPieces, mergedPieces, type Choice } from './merging'
import type { TypedCriteria } from './proposalDraft'
import { fromPieces, piecesOf } from './proposalPieces'

/** What stands on the server, as the form offers it, and what must still be so when it is saved. */
export interface Snapshot<T> {
  kind: string
  rowVersion: number | null
  typed: T
  /** Who of one's own side saved it; undefined where the other side's round is meant. */
  by: string | null | undefined
  savedAt: string | null
}

const isSnapshot = <T>(value: unknown): value is Snapshot<T> =>
  typeof value === 'object' && value !== null && 'rowVersion' in value && 'typed' in value
const sameRow = (a: Snapshot<unknown>, b: Snapshot<unknown>): boolean =>
  a.kind === b.kind && a.rowVersion === b.rowVersion

/**
 * Two people on one round. Beside what is typed the form keeps what it was begun from, also across a reload; when what
 * stands on the server is no longer that, both are shown side by side, and nothing is saved before one has chosen.
 */
export function useConcurrent<T extends TypedCriteria>(
  current: () => Snapshot<T>,
  form: Form<T>,
  storageKey: string,
) {
  const basisKey = `${storageKey}.basis`
  const kept = readDraft(basisKey)
  const basis = shallowRef<Snapshot<T>>(form.restored.value && isSnapshot<T>(kept) ? kept : current())
  /** What somebody else saved meanwhile. */
  const theirs = shallowRef<Snapshot<T>>()
  const ownSaving = ref(false)

  const rows = computed(() => {
    const other = theirs.value
    return other
      ? differingPieces(piecesOf(basis.value.typed), piecesOf(other.typed), piecesOf(form.values))
      : []
  })

  /** Takes up what stands now: silently where only one's own changes differ, else to be chosen between. */
  function meet(next: Snapshot<T>) {
    if (sameRow(basis.value, next)) return
    theirs.value = next
    if (!form.dirty.value) return settle(next.typed)
    // A draft that was discarded leaves nothing of theirs to choose.
    if (basis.value.kind === 'draft' && next.kind !== 'draft') return settle(copy(toRaw(form.values)))
    if (rows.value.some(({ changedBy }) => changedBy !== 'mine')) {
      form.problem.value = undefined
      return
    }
    settle(copy(toRaw(form.values)))
  }

  function settle(typed: T) {
    const next = theirs.value
    if (!next) return
    theirs.value = undefined
    basis.value = next
    form.reset(next.typed)
    Object.assign(form.values, typed)
  }

  watch(current, (next) => {
    if (ownSaving.value) {
      ownSaving.value = false
      basis.value = next
    } else meet(next)
  })
  watch([form.dirty, basis], ([dirty]) => writeDraft(basisKey, dirty ? basis.value : undefined), {
    immediate: true,
    flush: 'post',
  })
  meet(current())

  function joined(other: T, choices: Readonly<Record<string, Choice>>): T {
    const mine = copy(toRaw(form.values))
    return fromPieces(mergedPieces(piecesOf(other), piecesOf(mine), choices), mine)
  }

  return {
    basis,
    theirs,
    rows,
    /** The next target is what this form itself has saved. */
    ownSave: () => (ownSaving.value = true),
    choose(choices: Readonly<Record<string, Choice>>) {
      const other = theirs.value
      if (other) settle(joined(other.typed, choices))
    },
  }
}
