import { and, asc, eq, inArray } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import type { SubmissionRow } from '../submissions/submissions.repository'
import { challengeMessages, challenges } from './reviews.table'

export type ChallengeRow = typeof challenges.$inferSelect
export type MessageRow = typeof challengeMessages.$inferSelect
type Key = Pick<SubmissionRow, 'relationshipId' | 'id'>

/** Challenges of a submission in the order of their numbers. */
export async function selectChallenges({ tx }: Tenant, { relationshipId, id }: Key): Promise<ChallengeRow[]> {
  return tx
    .select()
    .from(challenges)
    .where(and(eq(challenges.relationshipId, relationshipId), eq(challenges.submissionId, id)))
    .orderBy(asc(challenges.number))
}

/** What was said under challenges, the oldest first. */
export async function selectMessages(
  { tx }: Tenant,
  { relationshipId }: Pick<Key, 'relationshipId'>,
  challengeIds: readonly string[],
): Promise<MessageRow[]> {
  if (challengeIds.length === 0) return []
  return tx
    .select()
    .from(challengeMessages)
    .where(
      and(
        eq(challengeMessages.relationshipId, relationshipId),
        inArray(challengeMessages.challengeId, [...challengeIds]),
      ),
    )
    .orderBy(asc(challengeMessages.createdAt), asc(challengeMessages.id))
}

type Opened = Pick<ChallengeRow, 'number' | 'target' | 'reasonKind' | 'revision' | 'dueOn' | 'state'>

export async function insertChallenge(
  { tx, userId, now }: Tenant,
  { id, relationshipId, supplierOrgId, customerOrgId }: SubmissionRow,
  challenge: Opened,
): Promise<ChallengeRow> {
  const [inserted] = await tx
    .insert(challenges)
    .values({
      ...{ submissionId: id, relationshipId, supplierOrgId, customerOrgId },
      ...challenge,
      openedBy: userId,
      openedAt: now,
    })
    .returning()
  if (!inserted) throw new Error('The challenge was not stored.')
  return inserted
}

export type ChallengeChange = Pick<ChallengeRow, 'state'> &
  Partial<Pick<ChallengeRow, 'answeredAt' | 'laboratory' | 'closedBy' | 'closedAt'>>

/** Changes a challenge whose submission is locked. */
export async function updateChallenge(
  { tx }: Tenant,
  { relationshipId, id, rowVersion }: ChallengeRow,
  values: ChallengeChange,
): Promise<ChallengeRow> {
  const [updated] = await tx
    .update(challenges)
    .set({ ...values, rowVersion: rowVersion + 1 })
    .where(and(eq(challenges.relationshipId, relationshipId), eq(challenges.id, id)))
    .returning()
  if (!updated) throw new Error('The challenge was not stored.')
  return updated
}

export type NewMessage = Pick<MessageRow, 'move' | 'text'> &
  Partial<Pick<MessageRow, 'answerKind' | 'revision' | 'agreementId' | 'versionId' | 'whatIf'>>

export async function insertMessage(
  { tx, side, userId, now }: Tenant,
  { id, relationshipId, supplierOrgId, customerOrgId }: ChallengeRow,
  message: NewMessage,
): Promise<MessageRow> {
  const [inserted] = await tx
    .insert(challengeMessages)
    .values({
      ...{ challengeId: id, relationshipId, supplierOrgId, customerOrgId },
      ...{ side, userId, createdAt: now },
      ...message,
    })
    .returning()
  if (!inserted) throw new Error('What was said was not stored.')
  return inserted
}
