import type { Permission, Side } from '../../contract/access'
import { newId } from '../db/columns'
import type { Database } from '../db/database'
import { withTenant, type Tenant } from '../db/tenant'
import { defineError, ProblemError } from '../errors'
import { securityEvents } from '../modules/sign-in/sign-in.table'
import type { Services } from '../services'
import { authorise } from './authorise'
import type { Route, UploadedFile } from './route'
import { freshFor, type SignedIn } from './session'

const signInAfresh = defineError(
  'sign-in-afresh',
  403,
  'A signature needs a fresh sign-in. Sign in again; this page comes back as it was.',
)
/** One call of a tenant route, whoever brings it: a request, or the program that lays out the demonstration. */
export interface TenantCallInput {
  params: { organisationId: string }
  /** Reads params, query and body with the contract; called only once the caller is authorised. */
  rest: () => { params: unknown; query: unknown; body: unknown }
  file: UploadedFile | undefined
  person: Pick<SignedIn, 'userId' | 'authenticatedAt'>
  side: Side
}

/** Authorises, prepares outside the transaction where the route asks for it, and handles inside one. */
export async function callTenantRoute(
  route: Extract<Route, { scope: 'tenant' }>,
  { params, rest, file, person, side }: TenantCallInput,
  { database, services }: { database: Database; services: Services },
): Promise<unknown> {
  const { endpoint } = route
  const { organisationId } = params
  const context = {
    organisationId,
    userId: person.userId,
    side,
    roles: [],
    authenticatedAt: person.authenticatedAt,
  }
  const permission = endpoint.access as Permission
  const isFresh = () => services.clock().getTime() - Date.parse(person.authenticatedAt) <= freshFor
  const handle = route.handle as (call: unknown) => Promise<unknown>
  try {
    let prepared: unknown
    if (route.prepare) {
      await withTenant(database, services, context, (tenant) => authorise(tenant, permission))
      prepared = await (route.prepare as (call: unknown) => Promise<unknown>)({
        ...{ ...rest(), file, services },
        ask: <T>(question: (tenant: Tenant) => Promise<T>) =>
          withTenant(database, services, context, question),
      })
    }
    return await withTenant(database, services, context, async (tenant) => {
      await authorise(tenant, permission)
      if (endpoint.fresh && !isFresh()) throw signInAfresh()
      return handle({ ...rest(), tenant, prepared })
    })
  } catch (error) {
    if (error instanceof ProblemError && error.code === 'not-allowed') {
      await logRefusal(database, services, person.userId, organisationId, permission)
    }
    throw error
  }
}

async function logRefusal(
  database: Database,
  services: Services,
  userId: string,
  orgId: string,
  permission: string,
): Promise<void> {
  await database.insert(securityEvents).values({
    id: newId(),
    at: services.clock().toISOString(),
    kind: 'refused',
    userId,
    orgId,
    detail: { permission },
  })
}
