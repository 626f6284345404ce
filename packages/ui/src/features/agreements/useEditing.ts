import type { agreements, Side } from '@evenrule/api/contract'
import { ref, shallowRef, watch } from 'vue'
import { writeDraft } from '../../forms/drafts'
import { ownDraft, standingRound, versionInForce, type WiderClause } from './negotiation'
import { dayAfter, startingTypes, typedClause, typedClauses } from './proposalDraft'
import { proposalKey, type ProposalTarget } from './useProposalForm'

interface Edited {
  agreement: agreements.Agreement | undefined
  version: agreements.AgreementVersion | undefined
  side: Side
  wider: readonly WiderClause[]
}

/** Days from today that a new proposal offers as its first day: time for an answer and two signatures. */
const usualLead = 30

/** Which proposal is being written on the page, if any: an unsent one opens for writing by itself. */
export function useEditing(source: () => Edited) {
  const target = shallowRef<ProposalTarget>()
  const stopped = ref<string>()

  /** The proposal that `start` writes: one's own draft, else an answer to the round that stands. */
  function targetOf({ agreement, version }: Edited): ProposalTarget | undefined {
    if (!agreement || !version?.moves.includes('keep-draft')) return undefined
    const draft = ownDraft(version)
    const from = draft ?? standingRound(version)
    const unit = agreement.characteristics[0]?.unit
    const initial = {
      clauses: typedClauses(from?.clauses ?? [], unit),
      effectiveOn:
        from && from.effectiveOn >= agreement.today ? from.effectiveOn : dayAfter(agreement.today, usualLead),
      comment: draft?.comment ?? '',
    }
    return draft ? { kind: 'draft', version, round: draft, initial } : { kind: 'answer', version, initial }
  }

  const start = () => (target.value = targetOf(source()))

  /** A new version: it starts from what is in force. */
  function begin() {
    const { agreement, wider } = source()
    if (!agreement) return
    const unit = agreement.characteristics[0]?.unit
    const inForce = versionInForce(agreement)
    const clauses = inForce && standingRound(inForce)?.clauses
    target.value = {
      kind: 'begin',
      initial: {
        clauses: clauses
          ? typedClauses(clauses, unit)
          : wider.length > 0
            ? []
            : startingTypes.map((type) => typedClause(type, unit)),
        effectiveOn: dayAfter(agreement.today, usualLead),
        comment: '',
      },
    }
  }

  function stop() {
    stopped.value = source().version?.id
    target.value = undefined
  }

  /** After a draft was discarded: closes the form, and forgets what was typed into it. */
  function forget() {
    const { agreement, version } = source()
    stop()
    for (const id of [agreement?.id, version?.id]) if (id) writeDraft(proposalKey(id), undefined)
  }

  /** After a draft was kept: the same form goes on with the draft as the server has it now. */
  function goOn() {
    const next = targetOf(source())
    if (next) target.value = next
  }

  watch(
    () => source().version,
    (version, before) => {
      if (version?.id !== before?.id && target.value && before) target.value = undefined
      if (version?.state === 'draft' && !target.value && stopped.value !== version.id) start()
    },
    { immediate: true },
  )
  return { target, start, begin, stop, forget, goOn }
}
