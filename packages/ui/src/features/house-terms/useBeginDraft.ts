import { houseTerms } from '@evenrule/api/contract'
import { ref } from 'vue'
import { useRouter } from 'vue-router'
import { useApi } from '../../session/client'
import { usualClauses } from '../agreements/proposalDraft'
import { useHere } from '../common'

/** Begins the draft of the next house terms, from published ones where there are any, and opens it. */
export function useBeginDraft() {
  const api = useApi()
  const here = useHere()
  const router = useRouter()
  const busy = ref(false)

  async function contentOf(fromId: string | undefined) {
    if (!fromId) return { clauses: usualClauses() }
    const from = await api.call(houseTerms.readHouseTerms, { params: here.params({ houseTermsId: fromId }) })
    return { clauses: from.clauses, terms: from.terms }
  }
  async function begin(fromId?: string) {
    busy.value = true
    try {
      const body = await contentOf(fromId)
      const draft = await api.call(houseTerms.beginHouseTerms, { params: here.params(), body })
      await router.push(here.at(`house-terms/${draft.id}`))
    } finally {
      busy.value = false
    }
  }
  return { begin, busy }
}
