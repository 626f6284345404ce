import { characteristics, parts, type SentQueryOf } from '@evenrule/api/contract'
import { computed, shallowRef } from 'vue'
import { useApi } from '../../session/client'
import { useTableQuery } from '../../tables/useTableQuery'
import { useHere, useList, useLoaded } from '../common'

/** What the page of a part shows: the part, its revisions, and the characteristics of the revision chosen. */
export function usePartPage(partId: () => string) {
  const api = useApi()
  const here = useHere()
  const table = useTableQuery({
    prefix: 'c',
    size: 50,
    sort: 'number',
    filters: { archived: 'active', revision: '' },
  })
  const part = useLoaded(
    () => ({ partId: partId() }),
    (at) => api.call(parts.readPart, { params: here.params(at) }),
  )
  const revisions = useLoaded(
    () => ({ partId: partId(), version: part.data.value?.rowVersion }),
    (at) =>
      api.call(parts.listRevisions, { params: here.params({ partId: at.partId }), query: { size: 100 } }),
  )
  const shown = computed(
    () =>
      revisions.data.value?.items.find(({ label }) => label === table.query.value.revision) ??
      part.data.value?.currentRevision,
  )
  const revisionId = () => table.query.value.revision && shown.value?.id
  const list = useList(
    () => {
      const { revision: _label, ...query } = table.query.value
      return { ...query, revisionId: revisionId() || '' }
    },
    (query) =>
      api.call(characteristics.listCharacteristics, {
        params: here.params(),
        query: { ...query, partId: partId() } as SentQueryOf<typeof characteristics.listCharacteristics>,
      }),
  )
  /** All active ones of the revision, for the answer and the coverage rule. */
  const whole = useLoaded(
    () => ({ partId: partId(), ...(revisionId() ? { revisionId: revisionId() } : {}) }),
    (query) =>
      api.call(characteristics.listCharacteristics, {
        params: here.params(),
        query: { ...query, size: 100 },
      }),
  )
  const changes = shallowRef(0)
  async function reload() {
    changes.value += 1
    await Promise.all([part.reload(), list.reload(), whole.reload()])
  }
  return { part, revisions, shown, table, list, whole, reload, changes }
}
