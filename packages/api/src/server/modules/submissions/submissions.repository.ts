import { and, desc, eq, inArray, max, ne, sql } from 'drizzle-orm'
import { acceptedStates, type SubmissionState } from '../../../contract/moves/submission'
import { ownSide } from '../../db/own-side'
import type { Tenant } from '../../db/tenant'
import { submissions } from './submissions.table'

export type SubmissionRow = typeof submissions.$inferSelect
type SubmissionChange = Partial<
  Pick<
    SubmissionRow,
    | 'number'
    | 'state'
    | 'stateSince'
    | 'sentForSignatureAt'
    | 'submittedAt'
    | 'decidedAt'
    | 'withdrawalReason'
    | 'criteria'
    | 'verdict'
    | 'clausesMet'
    | 'clausesTotal'
    | 'safety'
    | 'supersededBy'
  >
>

/** One submission of this organisation on its side; the customer's are those that are signed. */
export async function selectSubmission(tenant: Tenant, id: string): Promise<SubmissionRow | undefined> {
  const [row] = await tenant.tx
    .select()
    .from(submissions)
    .where(and(ownSide(tenant, submissions), eq(submissions.id, id)))
  return row
}

/** The same, locked until the transaction ends: of two moves at once the second sees what the first did. */
export async function lockSubmission(tenant: Tenant, id: string): Promise<SubmissionRow | undefined> {
  const [row] = await tenant.tx
    .select()
    .from(submissions)
    .where(and(ownSide(tenant, submissions), eq(submissions.id, id)))
    .for('update')
  return row
}

/**
 * Lets one transaction of a relationship pass at a time: those that give a number, or that accept one of several
 * submissions of the same task. Taken before any row is locked.
 */
export async function lockRelationship({ tx }: Tenant, relationshipId: string): Promise<void> {
  await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${relationshipId}, 1))`)
}

export async function insertSubmission(
  { tx }: Tenant,
  row: typeof submissions.$inferInsert,
): Promise<SubmissionRow> {
  const [inserted] = await tx.insert(submissions).values(row).returning()
  if (!inserted) throw new Error('The submission was not stored.')
  return inserted
}

/** Changes a submission that still has the version the sender saw; undefined where it has not. */
export async function updateSubmission(
  tenant: Tenant,
  { id, rowVersion }: Pick<SubmissionRow, 'id' | 'rowVersion'>,
  values: SubmissionChange,
): Promise<SubmissionRow | undefined> {
  const [updated] = await tenant.tx
    .update(submissions)
    .set({ ...values, rowVersion: rowVersion + 1 })
    .where(and(ownSide(tenant, submissions), eq(submissions.id, id), eq(submissions.rowVersion, rowVersion)))
    .returning()
  return updated
}

/** The number that the next signed submission of a relationship gets. */
export async function nextNumber({ tx }: Tenant, relationshipId: string): Promise<number> {
  const [row] = await tx
    .select({ highest: max(submissions.number) })
    .from(submissions)
    .where(eq(submissions.relationshipId, relationshipId))
  return (row?.highest ?? 0) + 1
}

/** The accepted submissions of the same measuring task, other than this one, the newest first. */
export async function selectAccepted(
  { tx }: Tenant,
  { relationshipId, taskId, id }: Pick<SubmissionRow, 'relationshipId' | 'taskId' | 'id'>,
): Promise<SubmissionRow[]> {
  return tx
    .select()
    .from(submissions)
    .where(
      and(
        eq(submissions.relationshipId, relationshipId),
        eq(submissions.taskId, taskId),
        inArray(submissions.state, acceptedStates as SubmissionState[]),
        ne(submissions.id, id),
      ),
    )
    .orderBy(desc(submissions.number))
}

/** Whether a submission of the task is being prepared. */
export async function hasUnsigned(tenant: Tenant, taskId: string): Promise<boolean> {
  const [row] = await tenant.tx
    .select({ id: submissions.id })
    .from(submissions)
    .where(
      and(
        ownSide(tenant, submissions),
        eq(submissions.taskId, taskId),
        inArray(submissions.state, ['draft', 'for-signature']),
      ),
    )
    .limit(1)
  return row !== undefined
}

/** The number of a submission that both sides see. */
export async function selectNumber({ tx }: Tenant, id: string): Promise<number | null> {
  const [row] = await tx
    .select({ number: submissions.number })
    .from(submissions)
    .where(eq(submissions.id, id))
  return row?.number ?? null
}
