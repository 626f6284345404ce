import { submissions } from '@evenrule/api/contract'
import { computed } from 'vue'
import { useRoute } from 'vue-router'
import { useApi } from '../../session/client'
import { useHere, useLoaded } from '../common'
import { useCountsStore } from '../shell/useCountsStore'
import { partiesOf, readContent } from './reading'

/**
 * The submission that the address names, and the earlier revision of it that the address may name, read and ready to
 * be shown; and how to load it again after a move.
 */
export function useSubmission() {
  const api = useApi()
  const here = useHere()
  const route = useRoute()
  const counts = useCountsStore()
  const { data, error, loading, reload } = useLoaded(
    () => ({
      submissionId: String(route.params.submissionId),
      revision: Number(route.query.revision) || undefined,
    }),
    async ({ submissionId, revision }) =>
      readContent(
        await api.call(submissions.readSubmission, {
          params: here.params({ submissionId }),
          query: { revision },
        }),
      ),
  )
  return {
    read: data,
    error,
    loading,
    reload,
    parties: computed(() => data.value && partiesOf(data.value.content, here.side)),
    /** The number of the newest revision, where an earlier one is shown. */
    newer: computed(() => {
      const last = data.value?.submission.revisions.at(-1)?.revision
      return last !== undefined && data.value && last > data.value.revision ? last : undefined
    }),
    /** After a move: the page and the counts beside the navigation. */
    async moved() {
      await reload()
      await counts.refresh(here.organisationId.value)
    },
  }
}
