import { computed, ref, watch } from 'vue'
import { readDraft, writeDraft } from '../../forms/drafts'
import type { WhatIfBase } from './base'
import { changesAnything, readChanges, typedClause, unchanged, type TypedWhatIf } from './changes'
import { changedOf } from './quote'
import { comesOutDifferently, suppose } from './suppose'

const isTyped = (value: unknown): value is TypedWhatIf =>
  typeof value === 'object' && value !== null && 'leftOut' in value && 'clauses' in value

const storageKey = (base: WhatIfBase) => `what-if.${base.key}`

/** A what-if on a base: what is tried, kept in this tab across a reload, and what it would come to. */
export function useWhatIf(source: () => WhatIfBase) {
  const kept = (): TypedWhatIf => {
    const stored = readDraft(storageKey(source()))
    return isTyped(stored) ? { ...unchanged(source()), ...stored } : unchanged(source())
  }
  const typed = ref(kept())
  // Another text, such as a corrected one: what was tried on the old one is not tried on the new.
  watch(
    () => source().key,
    () => (typed.value = kept()),
  )
  const read = computed(() => readChanges(source(), typed.value))
  const active = computed(() => changesAnything(read.value.changes))
  watch(
    typed,
    (value) => writeDraft(storageKey(source()), active.value || hasProblems.value ? value : undefined),
    { deep: true },
  )
  const hasProblems = computed(() => Object.keys(read.value.problems).length > 0)
  const supposed = computed(() => (active.value ? suppose(source(), read.value.changes) : []))
  return {
    typed,
    changes: computed(() => read.value.changes),
    problems: computed(() => read.value.problems),
    /** Anything is changed that can be computed. */
    active,
    changed: computed(() => changedOf(source(), read.value.changes)),
    supposed,
    different: computed(() => supposed.value.filter(comesOutDifferently).length),
    change: (part: Partial<TypedWhatIf>) => void (typed.value = { ...typed.value, ...part }),
    /** Another study's readings: those of the one before are whole again. */
    chooseStudy: (code: string) => {
      const { leftOut, reference } = unchanged(source(), code)
      typed.value = { ...typed.value, study: code, leftOut, reference }
    },
    exchange(clauseKey: string, type: Parameters<typeof typedClause>[0] | null) {
      const result = source().results.find((each) => each.clauseKey === clauseKey)
      if (!result) return
      const { [clauseKey]: own, ...others } = typed.value.clauses
      const same = type === result.clause.type
      typed.value.clauses =
        type === null
          ? others
          : own?.type === type
            ? typed.value.clauses
            : {
                ...others,
                [clauseKey]: typedClause(
                  type,
                  result.input.unit,
                  same ? result.clause.parameters : undefined,
                ),
              }
    },
    reset: () => (typed.value = unchanged(source(), typed.value.study)),
  }
}
export type WhatIf = ReturnType<typeof useWhatIf>
