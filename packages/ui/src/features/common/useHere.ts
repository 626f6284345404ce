import { computed } from 'vue'
import { organisationPath } from '../../session/router'
import { useSession } from '../../session/useSessionStore'

/** The organisation one is in: its id for requests, and paths of its pages. */
export function useHere() {
  const session = useSession()
  const organisationId = computed(() => session.organisation?.id ?? '')
  return {
    side: session.side,
    allows: session.allows,
    organisationId,
    /** Params of an endpoint inside the organisation. */
    params: <P extends Record<string, string>>(more?: P) =>
      ({ organisationId: organisationId.value, ...more }) as { organisationId: string } & P,
    /** Path of a page of the organisation. */
    at: (path = '') => organisationPath(organisationId.value, path),
  }
}
