import type { BodyOf, QueryOf } from '../../../contract/define'
import type {
  changeMember,
  changeOrganisation,
  listMembers,
  Member,
  OrganisationProfile,
} from '../../../contract/organisations'
import { addDays } from '../../calendar'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile, invalidInput, notFound } from '../../errors'
import {
  countLastingAdmins,
  lockOrganisation,
  selectMember,
  selectMembers,
  updateMember,
  type MemberListed,
} from './members.repository'
import { lastAdmin } from './organisations.errors'
import { hasEnded, todayOf } from './organisations.lookup.service'
import { selectOrganisation, updateOrganisation } from './organisations.repository'

/** One page of this organisation's members. */
export async function listOfMembers(tenant: Tenant, query: QueryOf<typeof listMembers>) {
  const today = await todayOf(tenant)
  return paged(
    query,
    (page) => selectMembers(tenant, page, today),
    (rows) => rows.map((row) => asMember(row, today)),
  )
}

/** Sets the roles of a member and the last day. */
export async function changeMemberOf(
  tenant: Tenant,
  userId: string,
  { expectedVersion, ...values }: BodyOf<typeof changeMember>,
): Promise<Member> {
  if (values.endsOn !== null && values.endsOn < (await todayOf(tenant)))
    throw invalidInput([
      { path: 'body.endsOn', message: 'Enter today or a later day. To end it now, end it at once.' },
    ])
  return setMember(tenant, userId, expectedVersion, values)
}

/** Ends a membership: the very next request of that person is refused. */
export const endMemberOf = async (tenant: Tenant, userId: string, expectedVersion: number): Promise<Member> =>
  setMember(tenant, userId, expectedVersion, { endsOn: addDays(await todayOf(tenant), -1) })

async function setMember(
  tenant: Tenant,
  userId: string,
  expectedVersion: number,
  values: Parameters<typeof updateMember>[3],
): Promise<Member> {
  // Two admins who take each other's role away at the same time must not both succeed.
  await lockOrganisation(tenant)
  await memberById(tenant, userId)
  if (!(await updateMember(tenant, userId, expectedVersion, values))) throw changedMeanwhile('member')
  if ((await countLastingAdmins(tenant)) === 0) throw lastAdmin()
  const after = await memberById(tenant, userId)
  const { roles, endsOn } = after.membership
  tenant.record({ type: 'member.changed', subject: { type: 'member', id: userId }, data: { roles, endsOn } })
  return asMember(after, await todayOf(tenant))
}

async function memberById(tenant: Tenant, userId: string): Promise<MemberListed> {
  const row = await selectMember(tenant, userId)
  if (!row) throw notFound('member')
  return row
}

function asMember({ membership, name, email }: MemberListed, today: string): Member {
  const { userId, roles, createdAt, endsOn, rowVersion } = membership
  return { id: userId, name, email, roles, createdAt, endsOn, ended: hasEnded(endsOn, today), rowVersion }
}

/** Name and time zone of this organisation. */
export const organisationOf = (tenant: Tenant): Promise<OrganisationProfile> => selectOrganisation(tenant)

export async function changeOrganisationOf(
  tenant: Tenant,
  { expectedVersion, ...values }: BodyOf<typeof changeOrganisation>,
): Promise<OrganisationProfile> {
  const updated = await updateOrganisation(tenant, expectedVersion, values)
  if (!updated) throw changedMeanwhile('organisation')
  tenant.record({
    type: 'organisation.changed',
    subject: { type: 'organisation', id: updated.id },
    data: values,
  })
  return updated
}
