import { and, asc, eq, isNull, lt, lte } from 'drizzle-orm'
import type { Side } from '../../../contract/access'
import type { Database, Transaction } from '../../db/database'
import { selectInvitationToMail, type InvitationToMail } from '../invitations/invitations.mail.repository'
import { users } from '../sign-in/sign-in.table'
import { messages, outbox } from './notifications.table'

/** A message as its mail is written from it. */
export interface MessageToMail {
  of: 'message'
  messageId: string
  to: { name: string; address: string }
  side: Side
  subject: string
  body: string
  link: string
  createdAt: string
}

/** A mail that this worker has taken, with everything needed to write it. */
export interface TakenMail {
  id: string
  /** Which try this is, from 1. */
  attempt: number
  /** Null for the mail of an invitation that was sent again, used, revoked or has run out meanwhile. */
  content: MessageToMail | InvitationToMail | null
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
      .select()
      .from(outbox)
      .where(and(isNull(outbox.sentAt), lte(outbox.nextAttemptAt, now), lt(outbox.attempts, attempts)))
      .orderBy(asc(outbox.nextAttemptAt), asc(outbox.id))
      .limit(1)
      .for('update', { skipLocked: true })
    if (!row) return undefined
    const { id, orgId, messageId, invitationId, invitationNonce } = row
    const attempt = row.attempts + 1
    await tx.update(outbox).set({ attempts: attempt, nextAttemptAt: until }).where(eq(outbox.id, id))
    const content =
      invitationId && invitationNonce
        ? await selectInvitationToMail(tx, { orgId, invitationId, nonce: invitationNonce }, now)
        : await selectMessageToMail(tx, orgId, messageId ?? '')
    return { id, attempt, content }
  })
}

async function selectMessageToMail(
  tx: Transaction,
  orgId: string,
  messageId: string,
): Promise<MessageToMail> {
  const { side, subject, body, link, createdAt } = messages
  const [row] = await tx
    .select({ name: users.name, address: users.email, mail: { side, subject, body, link, createdAt } })
    .from(messages)
    .innerJoin(users, eq(users.id, messages.userId))
    .where(and(eq(messages.orgId, orgId), eq(messages.id, messageId)))
  if (!row) throw new Error('The message of a mail is not there.')
  const { name, address, mail } = row
  return { of: 'message', messageId, to: { name, address }, ...mail }
}

/** Notes that a mail has left. */
export async function markSent(database: Database, id: string, at: string): Promise<void> {
  await database.update(outbox).set({ sentAt: at, lastError: null }).where(eq(outbox.id, id))
}

/** Notes why a mail did not leave, and when to try again; `attempts` where it is the last word. */
export async function markFailed(
  database: Database,
  id: string,
  failure: { error: string; nextAttemptAt?: string; attempts?: number },
): Promise<void> {
  const { error: lastError, ...when } = failure
  await database
    .update(outbox)
    .set({ lastError, ...when })
    .where(and(eq(outbox.id, id), isNull(outbox.sentAt)))
}
