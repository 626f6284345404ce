import { record, relationships, type SentQueryOf } from '@evenrule/api/contract'
import { computed } from 'vue'
import { useApi } from '../../session/client'
import { useTableQuery } from '../../tables/useTableQuery'
import { chosen, useHere, useLoaded } from '../common'

/** State of the record's page: which chain, which filters, and the events they give. */
export function useRecordPage() {
  const api = useApi()
  const here = useHere()
  const { query, state } = useTableQuery({
    filters: { chain: '', about: '', subject: '', task: '', person: '' },
    size: 50,
  })

  /** The relationships there are; the first is shown until another record is chosen. */
  const { data: partners, error: partnersError } = useLoaded(
    () => here.organisationId.value,
    () => api.call(relationships.listRelationships, { params: here.params(), query: { size: 100 } }),
  )
  const chainId = computed(
    () =>
      query.value.chain ||
      (partners.value ? (partners.value.items[0]?.id ?? here.organisationId.value) : undefined),
  )
  const isJournal = computed(() => chainId.value === here.organisationId.value)
  const partner = computed(() => partners.value?.items.find(({ id }) => id === chainId.value)?.partner.name)

  const isFiltered = computed(() => {
    const { about, subject, task, person } = query.value
    return Boolean(about || subject || task || person)
  })
  const { data, error, loading, reload } = useLoaded(
    () => ({ ...query.value, chainId: chainId.value }),
    async ({ chainId: chain, page, size, about, subject, task, person }) =>
      chain === undefined
        ? undefined
        : api.call(record.listEvents, {
            params: here.params(),
            query: chosen({
              chainId: chain,
              page,
              size,
              subjectType: about,
              subjectId: subject,
              taskId: task,
              personId: person,
            }) as SentQueryOf<typeof record.listEvents>,
          }),
  )

  /** Back to every event of the chain. */
  function showAll(): void {
    Object.assign(state, { about: '', subject: '', task: '', person: '' })
  }
  return {
    query,
    state,
    chainId,
    isJournal,
    partner,
    isFiltered,
    showAll,
    events: data,
    error: computed(() => error.value ?? partnersError.value),
    loading,
    reload,
  }
}
