import { ApiProblem } from '@evenrule/api/client'
import { allows as roleAllows, signIn, type AnswerOf, type Permission } from '@evenrule/api/contract'
import { defineStore } from 'pinia'
import { computed, ref } from 'vue'
import { useApi, useSide } from './client'
import { lastOrganisation, rememberOrganisation } from './lastOrganisation'
import { resetOrganisationStores } from './stores'

type Session = AnswerOf<typeof signIn.readSession>

/** Who is signed in, which organisation they work for, and what their roles allow. */
export const useSessionStore = defineStore('session', () => {
  const api = useApi()
  const side = useSide()

  const session = ref<Session>()
  const organisationId = ref<string>()
  /** Set once the server has said that nobody is signed in. */
  const signedOut = ref(false)
  /** Why the session could not be read: the server is away, not that the person is a stranger. */
  const failure = ref<ApiProblem>()
  let loading: Promise<void> | undefined

  const person = computed(() => session.value?.person)
  const everyOrganisation = computed(() => session.value?.organisations ?? [])
  /** Those with work on this side; a new one, without any relationship, counts on both. */
  const organisations = computed(() =>
    everyOrganisation.value.filter(({ sides }) => sides.length === 0 || sides.includes(side)),
  )
  /** Those that work in the other side's app only. */
  const elsewhere = computed(() =>
    everyOrganisation.value.filter((each) => !organisations.value.includes(each)),
  )
  /** Of those the ones whose admin may make a customer of them here, by inviting their first supplier. */
  const foundable = computed(() =>
    elsewhere.value.filter((each) => roleAllows('suppliers.invite', side, each.roles)),
  )
  /** Memberships that have ended. */
  const ended = computed(() => session.value?.ended ?? [])
  const organisation = computed(() => everyOrganisation.value.find(({ id }) => id === organisationId.value))
  const roles = computed(() => organisation.value?.roles ?? [])
  const otherApp = computed(() => session.value?.apps[side === 'supplier' ? 'customer' : 'supplier'])
  /** Where `/` leads: the organisation open last, else the first. */
  const home = computed(
    () => organisations.value.find(({ id }) => id === lastOrganisation()) ?? organisations.value[0],
  )

  async function read(): Promise<void> {
    failure.value = undefined
    try {
      session.value = await api.call(signIn.readSession, {})
      signedOut.value = false
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error
      if (error.status === 401) signedOut.value = true
      else failure.value = error
    }
  }

  /** Reads the session again, as after a change of one's own roles. */
  function load(): Promise<void> {
    loading ??= read().finally(() => (loading = undefined))
    return loading
  }

  /** Reads the session unless it is known already; after it ended, whether there is a new one meanwhile. */
  async function ensure(): Promise<void> {
    if (!session.value || signedOut.value) await load()
  }

  /** Makes an organisation the current one; what the stores hold of another is dropped. */
  function enter(id: string): void {
    if (organisationId.value === id) return
    if (organisationId.value !== undefined) resetOrganisationStores()
    organisationId.value = id
    rememberOrganisation(id)
  }

  /** Whether the person may do this in the current organisation, on this side. */
  const allows = (permission: Permission): boolean => roleAllows(permission, side, roles.value)

  /** The server no longer knows the session: the page stays, so that nothing typed is lost. */
  function expire(): void {
    if (session.value) signedOut.value = true
  }

  /** Ends the session here, or everywhere; resolves with the address that ends the provider's session too. */
  async function leave(everywhere = false): Promise<string> {
    const { next } = await api.call(everywhere ? signIn.signOutEverywhere : signIn.signOut, {})
    return next
  }

  function $reset(): void {
    resetOrganisationStores()
    session.value = undefined
    organisationId.value = undefined
    signedOut.value = false
    failure.value = undefined
  }

  return {
    side,
    session,
    person,
    organisations,
    elsewhere,
    foundable,
    ended,
    organisation,
    roles,
    otherApp,
    home,
    signedOut,
    failure,
    load,
    ensure,
    enter,
    allows,
    expire,
    leave,
    $reset,
  }
})

/** Short name for components: `const { organisation, allows } = useSession()`. */
export const useSession = useSessionStore
