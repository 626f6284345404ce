import type { agreements, Side } from '@evenrule/api/contract'
import { ref, shallowRef, watch } from 'vue'
import { writeDraft } from '../../forms/drafts'
import { standingRound, versionInForce, type WiderClause } from './negotiation'
import { dayAfter, startingTypes, typedClause, typedClauses } from './proposalDraft'
import { proposalKey, proposalTarget, usualLead, type ProposalTarget } from './proposalTarget'
import { typedTerms } from './typedTerms'

interface Edited {
  agreement: agreements.Agreement | undefined
  version: agreements.AgreementVersion | undefined
  side: Side
  wider: readonly WiderClause[]
  /** The challenge from which one came here to change the criterion. */
  caseOf: agreements.AgreementCase | null
}

/** Which proposal is being written on the page, if any: an unsent one opens for writing by itself. */
export function useEditing(source: () => Edited) {
  const target = shallowRef<ProposalTarget>()
  const stopped = ref<string>()
  /** The round was sent or discarded by somebody else while it was being written. */
  const gone = ref(false)
  /** The draft that was being written was discarded by somebody else; saving begins the answer anew. */
  const discarded = ref(false)

  const targetOf = ({ agreement, version, caseOf }: Edited) => proposalTarget(agreement, version, caseOf)
  const start = () => (target.value = targetOf(source()))

  /** A new version: it starts from what is in force. */
  function begin() {
    const { agreement, wider, caseOf } = source()
    if (!agreement) return
    const unit = agreement.characteristics[0]?.unit
    const inForce = versionInForce(agreement)
    const from = inForce && standingRound(inForce)
    target.value = {
      kind: 'begin',
      caseOf,
      initial: {
        clauses: from
          ? typedClauses(from.clauses, unit)
          : wider.length > 0
            ? []
            : startingTypes.map((type) => typedClause(type, unit)),
        terms: typedTerms(from?.terms),
        effectiveOn: dayAfter(agreement.today, usualLead),
        comment: '',
      },
    }
  }

  function stop() {
    stopped.value = source().version?.id
    target.value = undefined
    gone.value = false
    discarded.value = false
  }

  /** After a draft was discarded: closes the form, and forgets what was typed into it. */
  function forget() {
    const { agreement, version } = source()
    stop()
    for (const id of [agreement?.id, version?.id]) if (id) writeDraft(proposalKey(id), undefined)
  }

  /** After a draft was kept, or somebody else changed it: the same form goes on with what the server has now. */
  function goOn() {
    const next = targetOf(source())
    discarded.value = next?.kind === 'answer' && (discarded.value || target.value?.kind === 'draft')
    if (next) target.value = next
    gone.value = !next
  }

  /** Whether what is being written was taken away with its version, and the page shows another in its place. */
  function tookAway(): boolean {
    const now = target.value
    if (!now || now.kind === 'begin') return false
    return !source().agreement?.versions.some(({ id }) => id === now.version.id)
  }

  watch(
    () => source().version,
    (version, before) => {
      if (version?.id !== before?.id && target.value && before && target.value.kind !== 'begin') {
        if (tookAway()) gone.value = true
        else target.value = undefined
      }
      if (!version || target.value || stopped.value === version.id) return
      const { agreement, caseOf } = source()
      if (version.state === 'draft' || (caseOf && version.moves.includes('keep-draft'))) start()
      else if (caseOf && agreement?.mayBegin) begin()
    },
    { immediate: true },
  )
  return { target, gone, discarded, tookAway, start, begin, stop, forget, goOn }
}
