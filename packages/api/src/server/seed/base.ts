import pg from 'pg'
import { newId } from '../db/columns'
import { organisations, relationships, type OrganisationKey } from './scenario.organisations'
import type { Role, Side } from '../../contract/access'

export interface SeededPerson {
  id: string
  subject: string
  name: string
  roles: Role[]
}
export interface SeededOrganisation {
  id: string
  name: string
  sites: Record<string, string>
  people: SeededPerson[]
}
export interface SeededRelationship {
  id: string
  supplier: OrganisationKey
  customer: OrganisationKey
  supplierOrgId: string
  customerOrgId: string
}
export interface Base {
  organisations: Record<OrganisationKey, SeededOrganisation>
  relationships: SeededRelationship[]
}

const begun = 'demonstration begun'
const complete = 'demonstration complete'

/**
 * What the demonstration begins with: organisations, people, memberships, relationships.
 * Written by the owner of the database in one transaction; undefined when the demonstration is there already.
 * One that was cut off is begun anew: nothing but it can be in the database then.
 */
export async function seedBase(ownerUrl: string, issuer: string, at: string): Promise<Base | undefined> {
  return asOwner(ownerUrl, async (client) => {
    // Two starts at once must not seed twice.
    await client.query('select pg_advisory_xact_lock(4310)')
    const { rows } = await client.query<{ mark: string | null; there: boolean }>(
      "select obj_description('public'::regnamespace, 'pg_namespace') as mark, exists (select 1 from organisations) as there",
    )
    if (rows[0]?.mark === begun) await emptyAll(client)
    else if (rows[0]?.there) return undefined
    await client.query(`comment on schema public is '${begun}'`)
    return insertBase(client, issuer, at)
  })
}

/**
 * Notes that the demonstration is whole. Its mail is marked as sent at the time it is of: the people are to find a
 * year of messages in the app, not hundreds of mails that nobody waited for. Mail of what follows goes out, and that of
 * invitations too: without it nobody could accept them.
 */
export async function finishSeed(ownerUrl: string): Promise<void> {
  await asOwner(ownerUrl, async (client) => {
    await client.query(
      'update outbox set sent_at = next_attempt_at, attempts = 1 where sent_at is null and message_id is not null',
    )
    await client.query(`comment on schema public is '${complete}'`)
  })
}

async function asOwner<T>(ownerUrl: string, work: (client: pg.Client) => Promise<T>): Promise<T> {
  const client = new pg.Client({ connectionString: ownerUrl })
  await client.connect()
  try {
    await client.query('begin')
    const result = await work(client)
    await client.query('commit')
    return result
  } finally {
    // Closing without a commit rolls back.
    await client.end()
  }
}

async function emptyAll(client: pg.Client): Promise<void> {
  const { rows } = await client.query<{ name: string }>(
    "select quote_ident(tablename) as name from pg_tables where schemaname = 'public'",
  )
  await client.query(`truncate ${rows.map(({ name }) => name).join(', ')} cascade`)
}

async function insertBase(client: pg.Client, issuer: string, at: string): Promise<Base> {
  const seeded = {} as Record<OrganisationKey, SeededOrganisation>
  for (const organisation of organisations) {
    const id = newId()
    await client.query(
      'insert into organisations (id, name, time_zone, created_at) values ($1, $2, $3, $4)',
      [id, organisation.name, organisation.timeZone, at],
    )
    const sites: Record<string, string> = {}
    for (const name of organisation.sites) {
      sites[name] = newId()
      await client.query('insert into sites (org_id, id, name) values ($1, $2, $3)', [id, sites[name], name])
    }
    const people: SeededPerson[] = []
    for (const { person, roles } of organisation.members) {
      const userId = newId()
      await client.query(
        'insert into users (id, issuer, subject, email, email_verified, name, created_at) values ($1, $2, $3, $4, true, $5, $6)',
        [userId, issuer, person.subject, person.email, person.name, at],
      )
      await client.query(
        'insert into memberships (org_id, user_id, roles, created_at) values ($1, $2, $3, $4)',
        [id, userId, roles, at],
      )
      people.push({ id: userId, subject: person.subject, name: person.name, roles })
    }
    seeded[organisation.key] = { id, name: organisation.name, sites, people }
  }
  const pairs: SeededRelationship[] = []
  for (const { supplier, customer, supplierNumber } of relationships) {
    const id = newId()
    const supplierOrgId = seeded[supplier].id
    const customerOrgId = seeded[customer].id
    await client.query(
      'insert into relationships (id, supplier_org_id, customer_org_id, time_zone, supplier_number, created_at) values ($1, $2, $3, $4, $5, $6)',
      [id, supplierOrgId, customerOrgId, 'Europe/Berlin', supplierNumber, at],
    )
    pairs.push({ id, supplier, customer, supplierOrgId, customerOrgId })
  }
  return { organisations: seeded, relationships: pairs }
}

/** The first member of an organisation who holds one of the roles. */
export function memberWith(organisation: SeededOrganisation, ...roles: Role[]): SeededPerson {
  const found = organisation.people.find((person) => person.roles.some((role) => roles.includes(role)))
  if (!found) throw new Error(`${organisation.name} has nobody with the role ${roles.join(' or ')}.`)
  return found
}

export const approverOf: Record<Side, Role> = { supplier: 'supplier-approver', customer: 'customer-approver' }
export const workerOf: Record<Side, Role> = { supplier: 'gauge-engineer', customer: 'quality-representative' }

/** The relationship of two organisations of the scenario. */
export function relationshipOf(
  base: Base,
  supplier: OrganisationKey,
  customer: OrganisationKey,
): SeededRelationship {
  const found = base.relationships.find((each) => each.supplier === supplier && each.customer === customer)
  if (!found) throw new Error(`${supplier} does not supply ${customer}.`)
  return found
}
