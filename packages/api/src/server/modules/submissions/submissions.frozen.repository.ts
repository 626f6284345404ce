import { and, asc, desc, eq } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import type { SubmissionRow } from './submissions.repository'
import {
  submissionClauses,
  submissionFiles,
  submissionSignatures,
  submissionTexts,
} from './submissions.table'

type Key = Pick<SubmissionRow, 'relationshipId' | 'id'>
type Shared = Pick<SubmissionRow, 'relationshipId' | 'supplierOrgId' | 'customerOrgId' | 'id'>

export type FrozenTextRow = typeof submissionTexts.$inferSelect
export type FrozenClauseRow = typeof submissionClauses.$inferSelect
export type FrozenFileRow = typeof submissionFiles.$inferSelect
export type SignatureRow = typeof submissionSignatures.$inferSelect
type NewOf<T, K extends keyof T> = Omit<
  T,
  'id' | 'relationshipId' | 'supplierOrgId' | 'customerOrgId' | 'submissionId' | 'revision' | K
>
export type FileToFreeze = NewOf<FrozenFileRow, never>

/** One revision of what a submission freezes. */
export interface ToFreeze {
  revision: number
  text: string
  sha256: string
  clauses: NewOf<FrozenClauseRow, 'position'>[]
  files: FileToFreeze[]
}

const sharedOf = ({ id, relationshipId, supplierOrgId, customerOrgId }: Shared) => ({
  submissionId: id,
  relationshipId,
  supplierOrgId,
  customerOrgId,
})

/** Everything frozen, in the one order that row security allows: clauses and files, then the text that closes it. */
export async function insertFrozen(
  { tx, now }: Tenant,
  submission: Shared,
  { revision, text, sha256, clauses, files }: ToFreeze,
): Promise<void> {
  const shared = { ...sharedOf(submission), revision }
  if (clauses.length > 0)
    await tx
      .insert(submissionClauses)
      .values(clauses.map((clause, position) => ({ ...shared, ...clause, position })))
  if (files.length > 0) await tx.insert(submissionFiles).values(files.map((file) => ({ ...shared, ...file })))
  const corrects = revision === 1 ? null : revision - 1
  await tx.insert(submissionTexts).values({ ...shared, corrects, text, sha256, frozenAt: now })
}

/** Every signed text of a submission, the first first. */
export async function selectTexts({ tx }: Tenant, { relationshipId, id }: Key): Promise<FrozenTextRow[]> {
  return tx
    .select()
    .from(submissionTexts)
    .where(and(eq(submissionTexts.relationshipId, relationshipId), eq(submissionTexts.submissionId, id)))
    .orderBy(asc(submissionTexts.revision))
}

/** The newest signed text of a submission. */
export async function selectText(
  { tx }: Tenant,
  { relationshipId, id }: Key,
): Promise<FrozenTextRow | undefined> {
  const [row] = await tx
    .select()
    .from(submissionTexts)
    .where(and(eq(submissionTexts.relationshipId, relationshipId), eq(submissionTexts.submissionId, id)))
    .orderBy(desc(submissionTexts.revision))
    .limit(1)
  return row
}

export async function selectClauses(
  { tx }: Tenant,
  { relationshipId, id }: Key,
  revision: number,
): Promise<FrozenClauseRow[]> {
  return tx
    .select()
    .from(submissionClauses)
    .where(
      and(
        eq(submissionClauses.relationshipId, relationshipId),
        eq(submissionClauses.submissionId, id),
        eq(submissionClauses.revision, revision),
      ),
    )
    .orderBy(asc(submissionClauses.position))
}

/** Files of one revision, or of all of them. */
export async function selectFiles(
  { tx }: Tenant,
  { relationshipId, id }: Key,
  revision?: number,
): Promise<FrozenFileRow[]> {
  return tx
    .select()
    .from(submissionFiles)
    .where(
      and(
        eq(submissionFiles.relationshipId, relationshipId),
        eq(submissionFiles.submissionId, id),
        revision === undefined ? undefined : eq(submissionFiles.revision, revision),
      ),
    )
    .orderBy(asc(submissionFiles.role), asc(submissionFiles.name), asc(submissionFiles.id))
}

export async function selectSignatures({ tx }: Tenant, { relationshipId, id }: Key): Promise<SignatureRow[]> {
  return tx
    .select()
    .from(submissionSignatures)
    .where(
      and(eq(submissionSignatures.relationshipId, relationshipId), eq(submissionSignatures.submissionId, id)),
    )
    .orderBy(asc(submissionSignatures.signedAt), asc(submissionSignatures.id))
}

/** Puts the signature of the person who acts under a submission's frozen bytes. */
export async function insertSignature(
  tenant: Tenant,
  submission: Shared,
  signature: Pick<SignatureRow, 'meaning' | 'revision' | 'sha256'> & { decisionId?: string },
): Promise<void> {
  await tenant.tx.insert(submissionSignatures).values({
    ...sharedOf(submission),
    ...signature,
    side: tenant.side,
    userId: tenant.userId,
    signedAt: tenant.now,
    authenticatedAt: tenant.authenticatedAt,
  })
}
