import { and, eq } from 'drizzle-orm'
import { allows, type Permission } from '../../contract/access'
import { dayIn } from '../calendar'
import type { Tenant } from '../db/tenant'
import { defineError, notFound } from '../errors'
import { hasEnded } from '../modules/organisations/organisations.lookup.service'
import { memberships, organisations } from '../modules/organisations/organisations.table'

const notAllowed = defineError(
  'not-allowed',
  403,
  'Your role in this organisation does not allow that. Ask an admin of your organisation for the role that does.',
)

/** The membership is read on every request: a role taken away, or a membership that ended, counts at once. */
export async function authorise(tenant: Tenant, permission: Permission): Promise<void> {
  const [membership] = await tenant.tx
    .select({ roles: memberships.roles, endsOn: memberships.endsOn, timeZone: organisations.timeZone })
    .from(memberships)
    .innerJoin(organisations, eq(organisations.id, memberships.orgId))
    .where(and(eq(memberships.orgId, tenant.organisationId), eq(memberships.userId, tenant.userId)))
  if (!membership) throw notFound('organisation')
  const { endsOn, timeZone } = membership
  if (hasEnded(endsOn, dayIn(timeZone, tenant.now))) throw notFound('organisation')
  if (!allows(permission, tenant.side, membership.roles)) throw notAllowed()
  tenant.roles = membership.roles
}
