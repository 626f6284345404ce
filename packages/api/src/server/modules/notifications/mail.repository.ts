import { and, asc, eq, isNull, lt, lte } from 'drizzle-orm'
import type { Side } from '../../../contract/access'
import type { Database } from '../../db/database'
import { users } from '../sign-in/sign-in.table'
import { messages, outbox } from './notifications.table'

/** A mail that this worker has taken, with everything needed to write it. */
export interface TakenMail {
  id: string
  messageId: string
  /** Which try this is, from 1. */
  attempt: number
  to: { name: string; address: string }
  side: Side
  subject: string
  body: string
  link: string
  createdAt: string
}

/**
 * Takes the mail that has waited longest, and keeps others off it until `until`. The claim is committed before
 * the mail goes out: no lock is held while a mail server answers, and a worker that dies gives its mail back by
 * time alone.
 */
export async function takeDueMail(
  database: Database,
  { now, until, attempts }: { now: string; until: string; attempts: number },
): Promise<TakenMail | undefined> {
  return database.transaction(async (tx) => {
    const [row] = await tx
      .select({
        id: outbox.id,
        messageId: outbox.messageId,
        attempts: outbox.attempts,
        name: users.name,
        address: users.email,
        side: messages.side,
        subject: messages.subject,
        body: messages.body,
        link: messages.link,
        createdAt: messages.createdAt,
      })
      .from(outbox)
      .innerJoin(messages, and(eq(messages.orgId, outbox.orgId), eq(messages.id, outbox.messageId)))
      .innerJoin(users, eq(users.id, messages.userId))
      .where(and(isNull(outbox.sentAt), lte(outbox.nextAttemptAt, now), lt(outbox.attempts, attempts)))
      .orderBy(asc(outbox.nextAttemptAt), asc(outbox.id))
      .limit(1)
      .for('update', { of: outbox, skipLocked: true })
    if (!row) return undefined
    const { attempts: before, name, address, ...mail } = row
    await tx
      .update(outbox)
      .set({ attempts: before + 1, nextAttemptAt: until })
      .where(eq(outbox.id, row.id))
    return { ...mail, attempt: before + 1, to: { name, address } }
  })
}

/** Notes that a mail has left. */
export async function markSent(database: Database, id: string, at: string): Promise<void> {
  await database.update(outbox).set({ sentAt: at, lastError: null }).where(eq(outbox.id, id))
}

/** Notes why a mail did not leave, and when to try again. */
export async function markFailed(
  database: Database,
  id: string,
  failure: { error: string; nextAttemptAt: string },
): Promise<void> {
  await database
    .update(outbox)
    .set({ lastError: failure.error, nextAttemptAt: failure.nextAttemptAt })
    .where(and(eq(outbox.id, id), isNull(outbox.sentAt)))
}
