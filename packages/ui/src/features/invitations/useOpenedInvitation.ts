import { invitations } from '@evenrule/api/contract'
import { computed, ref, watch } from 'vue'
import { useRoute, useRouter } from 'vue-router'
import { toShownProblem } from '../../forms/problem'
import { useApi } from '../../session/client'
import { forgetInvitation, keepInvitation, keptInvitation, tokenIn } from '../../session/invitationToken'
import { organisationPath } from '../../session/router'
import { useSession } from '../../session/useSessionStore'
import { useLoaded } from '../common'

/** The invitation that was opened in this tab: what it says, once somebody is signed in, and the way on. */
export function useOpenedInvitation() {
  const api = useApi()
  const route = useRoute()
  const router = useRouter()
  const session = useSession()
  const token = ref(keptInvitation())
  const ready = ref(false)
  void session.ensure().finally(() => (ready.value = true))

  function use(next: string): void {
    keepInvitation(next)
    token.value = next
  }
  function drop(): void {
    forgetInvitation()
    token.value = undefined
  }
  // A link that is opened while this page stands there changes the fragment alone.
  watch(
    () => route.hash,
    (hash) => {
      const found = tokenIn(hash)
      if (found) use(found)
      if (hash) void router.replace({ hash: '' })
    },
    { immediate: true },
  )

  const { data, error, loading, reload } = useLoaded(
    () => [token.value, session.person?.id],
    async () =>
      token.value && session.person && !session.signedOut
        ? api.call(invitations.openInvitation, { body: { token: token.value } })
        : undefined,
  )
  const problem = computed(() => (error.value ? toShownProblem(error.value) : undefined))

  /** Goes to the organisation an invitation has led to, in the app of its side. */
  async function goTo(organisationId: string, side: invitations.OpenedInvitation['side']): Promise<void> {
    drop()
    await session.load()
    const path = organisationPath(organisationId)
    if (side === session.side) await router.replace(path)
    else location.assign(`${session.otherApp ?? ''}${path}`)
  }

  return { session, ready, token, use, drop, opened: data, problem, loading, reload, goTo }
}
