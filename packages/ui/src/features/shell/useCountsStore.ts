import { front, type AnswerOf } from '@evenrule/api/contract'
import { ApiProblem } from '@evenrule/api/client'
import { defineStore } from 'pinia'
import { ref } from 'vue'
import { useApi } from '../../session/client'

type Counts = AnswerOf<typeof front.readCounts>

const none: Counts = { waiting: 0, agreements: 0, requests: 0, messages: 0 }

/** What waits, in numbers, for the navigation. */
export const useCountsStore = defineStore('counts', () => {
  const api = useApi()
  const counts = ref<Counts>(none)
  let asked = 0

  /** Reads the counts again; a failure keeps the last ones, because the page itself will say what is wrong. */
  async function refresh(organisationId: string): Promise<void> {
    const mine = (asked += 1)
    try {
      const answer = await api.call(front.readCounts, { params: { organisationId } })
      if (mine === asked) counts.value = answer
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error
    }
  }

  function $reset(): void {
    asked += 1
    counts.value = none
  }

  return { counts, refresh, $reset }
})
