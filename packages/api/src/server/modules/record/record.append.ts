import { createHash } from 'node:crypto'
import canonicalize from 'canonicalize'
import { sql } from 'drizzle-orm'
import type { RecordSubject } from '../../../contract/record'
import type { Tenant } from '../../db/tenant'
import { recordEvents, recordHeads } from './record.table'

export type EventSubject = RecordSubject

/** An event that a service asks for. People appear by id only, so that a person can be erased later. */
export interface PendingEvent {
  /** Past tense, dotted: `submission.signed`. */
  type: string
  /** The relationship whose chain gets it; without one it goes to the organisation's own journal. */
  relationship?: { id: string; supplierOrgId: string; customerOrgId: string }
  subject: { type: EventSubject; id: string }
  taskId?: string
  /** JSON data of the event: ids, hashes, verdicts; never names of people. */
  data?: Record<string, unknown>
}

/** The hash that stands before the first event of a chain. */
export const genesisHash = '0'.repeat(64)

/** Canonical JSON (RFC 8785): the same bytes for the same data, everywhere. */
export function canonicalText(value: unknown): string {
  const text = canonicalize(value)
  if (text === undefined) throw new Error('Only JSON data can be made canonical.')
  return text
}

export const sha256 = (text: string | Uint8Array): string => createHash('sha256').update(text).digest('hex')

/** Appends events to their chains: heads locked in id order, each event holding the hash of the one before. */
export async function appendEvents(tenant: Tenant, events: readonly PendingEvent[]): Promise<void> {
  const byChain = new Map<string, PendingEvent[]>()
  for (const event of events) {
    const chain = event.relationship?.id ?? tenant.organisationId
    const own = byChain.get(chain)
    if (own) own.push(event)
    else byChain.set(chain, [event])
  }
  for (const chainId of [...byChain.keys()].sort()) {
    const own = byChain.get(chainId) ?? []
    const first = own[0]
    if (first) await appendToChain(tenant, chainId, ownersOf(tenant, first), own)
  }
}

const ownersOf = (tenant: Tenant, event: PendingEvent) =>
  event.relationship
    ? {
        orgId: null,
        supplierOrgId: event.relationship.supplierOrgId,
        customerOrgId: event.relationship.customerOrgId,
      }
    : { orgId: tenant.organisationId, supplierOrgId: null, customerOrgId: null }

/** One statement takes 65,535 values; an import appends thousands of events. */
const insertedAtOnce = 1000

async function appendToChain(
  tenant: Tenant,
  chainId: string,
  owners: ReturnType<typeof ownersOf>,
  events: readonly PendingEvent[],
): Promise<void> {
  const { tx } = tenant
  await tx
    .insert(recordHeads)
    .values({ chainId, ...owners, sequence: 0, hash: genesisHash })
    .onConflictDoNothing()
  const locked = await tx.execute<{ sequence: number; hash: string }>(
    sql`select sequence, hash from record_heads where chain_id = ${chainId} for update`,
  )
  const head = locked.rows[0]
  if (!head) throw new Error('The chain of the record is not visible to this organisation.')
  let { sequence, hash } = head
  const rows = events.map((event) => {
    sequence += 1
    const previousHash = hash
    const text = canonicalText({
      chain: chainId,
      sequence,
      previousHash,
      at: tenant.now,
      type: event.type,
      actor: { organisation: tenant.organisationId, person: tenant.userId, side: tenant.side },
      subject: event.subject,
      ...(event.taskId ? { task: event.taskId } : {}),
      data: event.data ?? {},
    })
    hash = sha256(text)
    return {
      chainId,
      ...owners,
      sequence,
      at: tenant.now,
      type: event.type,
      actorUserId: tenant.userId,
      actorOrgId: tenant.organisationId,
      subjectType: event.subject.type,
      subjectId: event.subject.id,
      taskId: event.taskId ?? null,
      text,
      previousHash,
      hash,
    }
  })
  for (let at = 0; at < rows.length; at += insertedAtOnce)
    await tx.insert(recordEvents).values(rows.slice(at, at + insertedAtOnce))
  await tx.execute(
    sql`update record_heads set sequence = ${sequence}, hash = ${hash} where chain_id = ${chainId}`,
  )
}
