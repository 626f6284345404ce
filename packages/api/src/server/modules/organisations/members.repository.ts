import { and, arrayContains, eq, gte, isNull, lt, or, sql, type SQL } from 'drizzle-orm'
import type { Role } from '../../../contract/access'
import type { QueryOf } from '../../../contract/define'
import type { listMembers } from '../../../contract/organisations'
import { containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { memberships, organisations } from './organisations.table'

// Names and addresses of members come through the database function that may read them.
const person = { name: sql<string>`person.name`, email: sql<string>`person.email` }

const fromMembers = ({ tx, organisationId }: Tenant, more?: SQL) =>
  tx
    .select({ membership: memberships, ...person, total: totalOverPages })
    .from(memberships)
    .innerJoin(sql`members_of_current() as person`, sql`person.user_id = ${memberships.userId}`)
    .where(and(eq(memberships.orgId, organisationId), more))
    .$dynamic()

export type MemberListed = Awaited<ReturnType<typeof selectMembers>>[number]

const goesOn = (day: string) => or(isNull(memberships.endsOn), gte(memberships.endsOn, day))

/** One page of members; every row carries the total. `day` is today, by which memberships end. */
export async function selectMembers(tenant: Tenant, query: QueryOf<typeof listMembers>, day: string) {
  const { createdAt, endsOn, userId } = memberships
  const shown = { current: goesOn(day), ended: lt(endsOn, day), all: undefined }[query.show]
  return fromMembers(
    tenant,
    and(
      shown,
      query.role ? arrayContains(memberships.roles, [query.role]) : undefined,
      containing(query.search, person.name, person.email),
    ),
  )
    .orderBy(...orderOf({ ...person, createdAt, endsOn }, query.sort, userId))
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}

export async function selectMember(tenant: Tenant, userId: string): Promise<MemberListed | undefined> {
  const [row] = await fromMembers(tenant, eq(memberships.userId, userId))
  return row
}

/** The member whose membership goes on by this day and who has this address, in whatever case. */
export async function selectMemberWithAddress(
  tenant: Tenant,
  email: string,
  day: string,
): Promise<MemberListed | undefined> {
  const [row] = await fromMembers(
    tenant,
    and(eq(sql`lower(${person.email})`, email.toLowerCase()), goesOn(day)),
  )
  return row
}

/** Changes a membership that still has the version the sender saw; false where it has not. */
export async function updateMember(
  { tx, organisationId }: Tenant,
  userId: string,
  expectedVersion: number,
  values: { roles?: Role[]; endsOn: string | null },
): Promise<boolean> {
  const updated = await tx
    .update(memberships)
    .set({ ...values, rowVersion: expectedVersion + 1 })
    .where(
      and(
        eq(memberships.orgId, organisationId),
        eq(memberships.userId, userId),
        eq(memberships.rowVersion, expectedVersion),
      ),
    )
    .returning({ userId: memberships.userId })
  return updated.length > 0
}

/** Locks the organisation until the transaction ends, so that changes of its members follow one another. */
export async function lockOrganisation({ tx, organisationId }: Tenant): Promise<void> {
  await tx
    .select({ id: organisations.id })
    .from(organisations)
    .where(eq(organisations.id, organisationId))
    .for('update')
}

/** Admins whose membership has no end. */
export async function countLastingAdmins({ tx, organisationId }: Tenant): Promise<number> {
  return tx.$count(
    memberships,
    and(
      eq(memberships.orgId, organisationId),
      arrayContains(memberships.roles, ['admin']),
      isNull(memberships.endsOn),
    ),
  )
}
