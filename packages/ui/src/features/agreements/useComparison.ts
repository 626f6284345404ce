import {
  clauseWarnings,
  noTerms,
  safetyFlags,
  type agreements,
  type Side,
  type Terms,
} from '@evenrule/api/contract'
import { clauseKey, type Clause } from '@evenrule/metrology'
import { computed, ref } from 'vue'
import { comparisonWords as words } from '../../strings/agreements'
import type { ComparisonRow } from './ClauseComparison.vue'
import { hasConsequences } from '../consequences/consequenceRows'
import { effectText } from '../consequences/effectText'
import { useConsequences } from '../consequences/useConsequences'
import { acceptanceWords } from '../../strings/rounds'
import { aboutClause, aboutFirstDay, itemOf } from './acceptance'
import { comparisonNotes } from './comparisonRows'
import { compareClauses } from './differences'
import {
  effectiveClauses,
  otherOf,
  roundsBefore,
  standingRound,
  versionInForce,
  type WiderClause,
} from './negotiation'
import { clausePoint, firstDayPoint, termsPoint, type PointRow } from './pointRows'

/** What is being typed, as far as it can be read. */
export interface TypedContent {
  clauses: readonly Clause[]
  terms: Terms
}

interface Compared {
  agreement: agreements.Agreement | undefined
  version: agreements.AgreementVersion | undefined
  wider: readonly WiderClause[]
  side: Side
  /** What is being typed, where a proposal is being written. */
  typed: TypedContent | undefined
}

/** The clauses at hand beside those they are held against, and what they do. */
export function useComparison(source: () => Compared) {
  /** Number of the earlier round to compare with; empty for what is in force. */
  const against = ref('')
  const round = computed(() => {
    const { version } = source()
    return version && standingRound(version)
  })
  const earlier = computed(() => {
    const { version, typed } = source()
    if (!version) return []
    return typed
      ? version.rounds.filter(({ state }) => state !== 'draft').reverse()
      : roundsBefore(version, round.value)
  })
  const other = computed(() => {
    const { agreement, side } = source()
    return agreement ? otherOf(agreement, side) : ''
  })
  const inForce = computed(() => {
    const { agreement, version } = source()
    const of = agreement && versionInForce(agreement)
    return of && of.id !== version?.id ? of : undefined
  })
  const anythingInForce = computed(() => Boolean(inForce.value) || (isNew.value && source().wider.length > 0))
  /** A version that is or was in force stands for itself; any other is held against what is. */
  const isNew = computed(() => {
    const { version, typed } = source()
    return Boolean(typed) || (version?.state !== 'in-force' && version?.state !== 'superseded')
  })

  const bases = computed(() => [
    ...(!isNew.value || anythingInForce.value
      ? [{ value: '', title: isNew.value ? words.inForce : words.alone }]
      : []),
    ...earlier.value.map(({ number, side }) => ({
      value: String(number),
      title: words.round(number, side, source().side, other.value),
    })),
  ])
  const base = computed(() => bases.value.find(({ value }) => value === against.value) ?? bases.value[0])
  const baseRound = computed(() => earlier.value.find(({ number }) => String(number) === base.value?.value))
  const before = computed<Clause[]>(() => {
    const { wider } = source()
    if (!base.value || (!isNew.value && !baseRound.value)) return []
    const own = baseRound.value?.clauses ?? (inForce.value && standingRound(inForce.value)?.clauses) ?? []
    return effectiveClauses(own, wider)
  })
  const after = computed<Clause[]>(() => {
    const { typed, wider } = source()
    return effectiveClauses(typed?.clauses ?? round.value?.clauses ?? [], wider)
  })
  const differences = computed(() => compareClauses(before.value, after.value))
  const characteristics = computed(() => source().agreement?.characteristics ?? [])
  const consequences = useConsequences(() => ({
    rows: differences.value,
    before: before.value,
    after: after.value,
    characteristics: characteristics.value,
  }))

  const notes = computed(() =>
    comparisonNotes(
      clauseWarnings(after.value, characteristics.value),
      safetyFlags(after.value, characteristics.value),
    ),
  )
  const noteOf = (clause: Clause | null) => {
    const from = source().wider.find((each) => each.clause === clause)
    return from ? words.wider(from.agreementNumber, from.scope) : ''
  }
  const beforeLabel = computed(() => {
    const { agreement } = source()
    if (!base.value || baseRound.value) return base.value?.title ?? ''
    if (!isNew.value) return ''
    return inForce.value
      ? words.inForceOf(agreement?.number ?? null, inForce.value.number ?? 0)
      : words.inForce
  })
  /** What an earlier round of the version said about something the standing one leaves out. */
  const leftOut = computed<PointRow[]>(() => {
    const { version, typed } = source()
    const keys = new Set(differences.value.map(({ key }) => key))
    const items = (!typed && version?.acceptance?.items) || []
    return items.flatMap(({ kind, clauseKey: key, present }): PointRow[] => {
      if (kind !== 'clause' || key === null || present || keys.has(key)) return []
      const clause = version?.rounds
        .flatMap(({ clauses }) => clauses)
        .findLast((each) => clauseKey(each) === key)
      if (!clause) return []
      const [row] = compareClauses([clause], [])
      return row
        ? [{ ...clausePoint(row), about: aboutClause(key), before: null, after: null, change: 'removed' }]
        : []
    })
  })
  /** The standing round leaves it out; what a wider agreement says about it stays. */
  const isLeftOut = (key: string): boolean => {
    const { version, typed } = source()
    return !typed && version !== undefined && itemOf(version, aboutClause(key))?.present === false
  }
  const otherPoints = computed<PointRow[]>(() => {
    const { version, typed } = source()
    const of = baseRound.value ?? (isNew.value && inForce.value ? standingRound(inForce.value) : undefined)
    const terms = termsPoint(of?.terms ?? null, typed?.terms ?? round.value?.terms ?? noTerms)
    const day =
      !typed && version && round.value && itemOf(version, aboutFirstDay)
        ? [firstDayPoint(of?.effectiveOn ?? null, round.value.effectiveOn)]
        : []
    return [...(terms ? [terms] : []), ...day]
  })
  const bare = { beforeNote: '', afterNote: '', effect: { text: '', wrong: false }, flag: '', warnings: [] }
  const rows = computed<ComparisonRow[]>(() => [
    ...differences.value.map((row) => ({
      ...clausePoint(row),
      beforeNote: noteOf(row.before),
      afterNote: isLeftOut(row.key)
        ? acceptanceWords.leftOut
        : row.change === 'same' && beforeLabel.value
          ? ''
          : noteOf(row.after),
      effect: effectText(row, consequences.effects.value?.get(row.key), consequences.unit.value),
      hasRule: [row.before, row.after].some((clause) => clause && hasConsequences(clause)),
      ...notes.value(row.after ? after.value.indexOf(row.after) : -1),
    })),
    ...leftOut.value.map((row) => ({ ...row, ...bare, hasRule: false, afterNote: acceptanceWords.leftOut })),
    ...otherPoints.value.map((row) => ({ ...row, ...bare, hasRule: false })),
  ])
  const afterLabel = computed(() => {
    const { version, side, typed } = source()
    if (typed) return words.draft
    if (version?.state === 'in-force') return words.inForce
    return round.value ? words.round(round.value.number, round.value.side, side, other.value) : words.draft
  })
  return {
    against,
    bases,
    base,
    rows,
    differences,
    consequences,
    beforeLabel,
    afterLabel,
    after,
    /** Short names for the curves. */
    names: computed(() => ({
      before: baseRound.value ? words.roundShort(baseRound.value.number) : words.inForce.toLowerCase(),
      after: source().typed
        ? words.draft.toLowerCase()
        : source().version?.state === 'in-force'
          ? words.inForce.toLowerCase()
          : words.roundShort(round.value?.number ?? 1),
    })),
  }
}
