import { record, relationships, type SentQueryOf } from '@evenrule/api/contract'
import { computed } from 'vue'
import { useApi } from '../../session/client'
import { useTableQuery } from '../../tables/useTableQuery'
import { chosen, useHere, useLoaded } from '../common'

/** What narrows the list, all of it in the address. */
const nothing = { about: '', subject: '', task: '', person: '', clause: '', from: '', to: '' }
const filters = Object.keys(nothing) as (keyof typeof nothing)[]
export type RecordFilterState = Record<keyof typeof nothing, string>

/** A day that is half typed narrows nothing yet. */
const dayOr = (text: string): string => (/^\d{4}-\d{2}-\d{2}$/.test(text) ? text : '')

/** State of the record's page: which chain, which filters, and the events they give. */
export function useRecordPage() {
  const api = useApi()
  const here = useHere()
  const { query, state } = useTableQuery({
    filters: { chain: '', ...nothing },
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

  const isFiltered = computed(() => filters.some((name) => query.value[name] !== ''))
  const { data, error, loading, reload } = useLoaded(
    () => ({ ...query.value, chainId: chainId.value }),
    async ({ chainId: chain, page, size, about, subject, task, person, clause, from, to }) =>
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
              clauseKey: clause,
              ...{ from: dayOr(from), to: dayOr(to) },
            }) as SentQueryOf<typeof record.listEvents>,
          }),
  )

  /** Back to every event of the chain. */
  function showAll(): void {
    Object.assign(state, nothing)
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
