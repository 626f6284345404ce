import { computed } from 'vue'
import { useSession } from '../../session/useSessionStore'

/** Members who may have taken readings. */
export function usePeople() {
  const session = useSession()
  const people = computed(() =>
    session.person ? [{ id: session.person.id, name: session.person.name }] : [],
  )
  return { people }
}
