import { agreements } from '@evenrule/api/contract'
import { ref } from 'vue'
import { useForm } from '../../forms'
import { useApi } from '../../session/client'
import { editorWords as words } from '../../strings/agreementActs'
import { useHere } from '../common'
import { readTyped, type TypedProposal } from './proposalDraft'

/** What a proposal is written for: an unsent round of one's own, an answer to the other side, a new version. */
export type ProposalTarget = { initial: TypedProposal } & (
  | { kind: 'draft'; version: agreements.AgreementVersion; round: agreements.AgreementRound }
  | { kind: 'answer'; version: agreements.AgreementVersion }
  | { kind: 'begin' }
)

/** Where what is typed is kept, by the version or, for one that is not begun, the agreement. */
export const proposalKey = (id: string): string => `agreement.proposal.${id}`

/** The form of a proposal; `save(true)` sends it to the other side. */
export function useProposalForm(
  source: () => { agreement: agreements.Agreement; target: ProposalTarget },
  done: (agreement: agreements.Agreement, sent: boolean) => void,
) {
  const api = useApi()
  const here = useHere()
  const { agreement, target } = source()
  const sending = ref(false)
  const saved = ref(false)

  function submit({ clauses, effectiveOn, comment }: TypedProposal): Promise<agreements.Agreement> {
    const now = source()
    const body = { clauses: readTyped(clauses).clauses, effectiveOn, comment, send: sending.value }
    const params = (versionId: string) => here.params({ agreementId: now.agreement.id, versionId })
    if (now.target.kind === 'draft')
      return api.call(agreements.saveDraft, {
        params: params(now.target.version.id),
        body: { ...body, expectedVersion: now.target.round.rowVersion },
      })
    if (now.target.kind === 'answer')
      return api.call(agreements.answerRound, {
        params: params(now.target.version.id),
        body: { ...body, expectedVersion: now.target.version.rowVersion },
      })
    const { relationshipId, scope } = now.agreement
    return api.call(agreements.beginVersion, {
      params: here.params(),
      body: {
        relationshipId,
        partId: scope.kind === 'part' ? scope.partId : null,
        characteristicId: scope.characteristicId,
        ...body,
      },
    })
  }

  const form = useForm<TypedProposal, agreements.Agreement>({
    initial: target.initial,
    storageKey: proposalKey(target.kind === 'begin' ? agreement.id : target.version.id),
    validate: ({ clauses, effectiveOn }) => ({
      ...readTyped(clauses).problems,
      clauses: sending.value && clauses.length === 0 ? words.noClauses : undefined,
      effectiveOn: !effectiveOn
        ? words.effectiveOnMissing
        : sending.value && effectiveOn < source().agreement.today
          ? words.effectiveOnPast
          : undefined,
    }),
    submit,
    done: (answer) => {
      saved.value = true
      done(answer, sending.value)
    },
  })
  return {
    form,
    saved,
    save(send: boolean) {
      sending.value = send
      return form.submit()
    },
  }
}
