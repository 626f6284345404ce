import { agreements } from '@evenrule/api/contract'
import { computed } from 'vue'
import { useRoute } from 'vue-router'
import { useApi } from '../../session/client'
import { useHere, useLoaded } from '../common'
import { versionAtHand, widerClauses } from './negotiation'

/** Everything the negotiation room shows of one agreement, and the clauses of wider scopes that it stands upon. */
export function useRoom() {
  const api = useApi()
  const here = useHere()
  const route = useRoute()
  const loaded = useLoaded(
    () => ({ agreementId: String(route.params.agreementId) }),
    (at) => api.call(agreements.readAgreement, { params: here.params(at) }),
  )
  const agreement = loaded.data

  /** The agreements of the wider scopes that are in force. */
  const others = useLoaded(
    () => {
      const of = agreement.value
      return of && of.scope.kind !== 'relationship'
        ? { relationshipId: of.relationshipId, partId: of.scope.partId, kind: of.scope.kind, id: of.id }
        : undefined
    },
    async (of) => {
      if (!of) return []
      const { items } = await api.call(agreements.listAgreements, {
        params: here.params(),
        query: { relationshipId: of.relationshipId, state: 'in-force', size: 100 },
      })
      const found = items.filter(
        ({ id, scope, inForce }) =>
          id !== of.id &&
          inForce &&
          (scope.kind === 'relationship' ||
            (of.kind === 'characteristic' && scope.kind === 'part' && scope.partId === of.partId)),
      )
      return Promise.all(
        found.map(({ id }) =>
          api.call(agreements.readAgreement, { params: here.params({ agreementId: id }) }),
        ),
      )
    },
  )

  const wider = computed(() => widerClauses(others.data.value ?? []))
  const version = computed(
    () => agreement.value && versionAtHand(agreement.value, String(route.query.version ?? '')),
  )
  return { ...loaded, agreement, version, wider }
}
