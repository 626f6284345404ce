import { ApiProblem } from '@evenrule/api/client'
import { agreements } from '@evenrule/api/contract'
import { ref } from 'vue'
import { useForm } from '../../forms'
import { useApi } from '../../session/client'
import { editorWords as words } from '../../strings/agreementActs'
import { useHere } from '../common'
import { standingRound } from './negotiation'
import { readTyped, type TypedProposal } from './proposalDraft'
import { proposalKey, snapshotOf, type ProposalTarget } from './proposalTarget'
import { readTerms } from './typedTerms'
import { useConcurrent } from './useConcurrent'

/** Refusals that say that somebody else has saved, sent, discarded or replaced what is being written. */
const meanwhile = ['changed-meanwhile', 'draft-exists', 'round-replaced', 'not-found']
export const isMeanwhile = (thrown: unknown): boolean =>
  thrown instanceof ApiProblem && meanwhile.includes(thrown.code)

/** The form of a proposal; `save(true)` sends it to the other side. */
export function useProposalForm(
  source: () => { agreement: agreements.Agreement; target: ProposalTarget },
  on: { saved: (agreement: agreements.Agreement, sent: boolean) => void; stale: () => void },
) {
  const api = useApi()
  const here = useHere()
  const { agreement, target } = source()
  const sending = ref(false)
  const saved = ref(false)

  function submit({ clauses, terms, effectiveOn, comment }: TypedProposal): Promise<agreements.Agreement> {
    const now = source()
    const body = {
      clauses: readTyped(clauses).clauses,
      terms: readTerms(terms).terms,
      effectiveOn,
      comment,
      send: sending.value,
    }
    const params = (versionId: string) => here.params({ agreementId: now.agreement.id, versionId })
    const expectedVersion = concurrent.basis.value.rowVersion ?? 0
    const { caseOf } = now.target
    if (now.target.kind === 'draft') {
      const { version } = now.target
      // What stands on the page is what the writer has before them.
      const answersRound = version.state === 'draft' ? undefined : standingRound(version)?.number
      return api.call(agreements.saveDraft, {
        params: params(version.id),
        body: {
          ...body,
          expectedVersion,
          ...(answersRound ? { answersRound } : {}),
          ...(caseOf ? { caseOf } : {}),
        },
      })
    }
    if (now.target.kind === 'answer')
      return api.call(agreements.answerRound, {
        params: params(now.target.version.id),
        body: { ...body, caseOf, expectedVersion },
      })
    const { relationshipId, scope } = now.agreement
    return api.call(agreements.beginVersion, {
      params: here.params(),
      body: {
        relationshipId,
        partId: scope.kind === 'part' ? scope.partId : null,
        characteristicId: scope.characteristicId,
        caseOf,
        ...body,
      },
    })
  }

  const storageKey = proposalKey(target.kind === 'begin' ? agreement.id : target.version.id)
  const form = useForm<TypedProposal, agreements.Agreement>({
    initial: target.initial,
    storageKey,
    validate: ({ clauses, terms, effectiveOn }) => ({
      ...readTyped(clauses).problems,
      ...readTerms(terms).problems,
      effectiveOn: !effectiveOn
        ? words.effectiveOnMissing
        : sending.value && effectiveOn < source().agreement.today
          ? words.effectiveOnPast
          : undefined,
    }),
    async submit(typed) {
      try {
        return await submit(typed)
      } catch (thrown) {
        if (isMeanwhile(thrown)) on.stale()
        throw thrown
      }
    },
    done(answer) {
      saved.value = true
      concurrent.ownSave()
      on.saved(answer, sending.value)
    },
  })
  const concurrent = useConcurrent(() => snapshotOf(source().target), form, storageKey)

  return {
    form,
    saved,
    concurrent,
    save(send: boolean) {
      sending.value = send
      return form.submit()
    },
  }
}
