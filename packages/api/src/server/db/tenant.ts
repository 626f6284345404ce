import { sql } from 'drizzle-orm'
import type { Role, Side } from '../../contract/access'
import { appendEvents, type PendingEvent } from '../modules/record/record.append'
import { sendNotices, type Notice } from '../modules/notifications/notifications.send'
import type { Services } from '../services'
import type { Database, Transaction } from './database'

/** Who acts, for which organisation, on which side. */
export interface TenantContext {
  organisationId: string
  userId: string
  side: Side
  roles: readonly Role[]
  /** When the person last signed in afresh; signatures carry it. */
  authenticatedAt: string
}

/** A running transaction of one organisation: everything a service may use. */
export interface Tenant extends TenantContext {
  tx: Transaction
  services: Services
  /** The instant of this request, ISO 8601 in UTC. */
  now: string
  /** Adds an event to the record; it is chained when the transaction ends, after all other writes. */
  record(event: PendingEvent): void
  /** Tells people in the app and by mail; written when the transaction ends. */
  notify(notice: Notice): void
  /** Begins something of its own once all of this is committed; not at all where it is not. */
  afterwards(begin: () => void): void
}

/**
 * Runs `work` in one transaction with the organisation set for row-level security, then appends the events and
 * messages it asked for. Nothing slow (files, mail, evaluation) may happen after the first event is appended:
 * the heads of the chains are locked last, in id order, so that two transactions cannot deadlock.
 */
export async function withTenant<T>(
  database: Database,
  services: Services,
  context: TenantContext,
  work: (tenant: Tenant) => Promise<T>,
): Promise<T> {
  const afterwards: (() => void)[] = []
  const answer = await database.transaction(async (tx) => {
    await tx.execute(
      sql`select set_config('app.org_id', ${context.organisationId}, true), set_config('app.user_id', ${context.userId}, true)`,
    )
    const events: PendingEvent[] = []
    const notices: Notice[] = []
    const tenant: Tenant = {
      ...context,
      tx,
      services,
      now: services.clock().toISOString(),
      record: (event) => void events.push(event),
      notify: (notice) => void notices.push(notice),
      afterwards: (begin) => void afterwards.push(begin),
    }
    const result = await work(tenant)
    await sendNotices(tenant, notices)
    await appendEvents(tenant, events)
    return result
  })
  for (const begin of afterwards) begin()
  return answer
}

/** Runs `work` with only the person known: sign-in, the switcher. Sees no organisation's rows. */
export async function withPerson<T>(
  database: Database,
  userId: string,
  work: (tx: Transaction) => Promise<T>,
): Promise<T> {
  return database.transaction(async (tx) => {
    await tx.execute(
      sql`select set_config('app.org_id', '', true), set_config('app.user_id', ${userId}, true)`,
    )
    return work(tx)
  })
}
