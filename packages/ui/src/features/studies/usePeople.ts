import { organisations } from '@evenrule/api/contract'
import { computed, type ComputedRef } from 'vue'
import { useApi } from '../../session/client'
import { useSession } from '../../session/useSessionStore'
import { useHere, useLoaded } from '../common'

export interface Person {
  id: string
  name: string
}

const pageSize = 100

/** Members who may have taken readings; oneself is there at once. */
export function usePeople(): { people: ComputedRef<Person[]> } {
  const api = useApi()
  const here = useHere()
  const session = useSession()

  async function allFrom(page: number): Promise<Person[]> {
    const { items, total } = await api.call(organisations.listMembers, {
      params: here.params(),
      query: { page, size: pageSize },
    })
    const rest = page * pageSize < total ? await allFrom(page + 1) : []
    return [...items.map(({ id, name }) => ({ id, name })), ...rest]
  }
  const { data } = useLoaded(
    () => here.organisationId.value,
    () => allFrom(1),
  )
  const people = computed<Person[]>(() => {
    if (data.value) return data.value
    return session.person ? [{ id: session.person.id, name: session.person.name }] : []
  })
  return { people }
}
