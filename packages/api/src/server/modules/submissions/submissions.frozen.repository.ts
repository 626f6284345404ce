import { and, asc, eq } from 'drizzle-orm'
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

export type FrozenClauseRow = typeof submissionClauses.$inferSelect
export type FrozenFileRow = typeof submissionFiles.$inferSelect
export type SignatureRow = typeof submissionSignatures.$inferSelect
type NewOf<T, K extends keyof T> = Omit<
  T,
  'id' | 'relationshipId' | 'supplierOrgId' | 'customerOrgId' | 'submissionId' | K
>

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
  frozen: {
    text: string
    sha256: string
    clauses: NewOf<FrozenClauseRow, 'position'>[]
    files: NewOf<FrozenFileRow, never>[]
  },
): Promise<void> {
  const shared = sharedOf(submission)
  if (frozen.clauses.length > 0)
    await tx
      .insert(submissionClauses)
      .values(frozen.clauses.map((clause, position) => ({ ...shared, ...clause, position })))
  if (frozen.files.length > 0)
    await tx.insert(submissionFiles).values(frozen.files.map((file) => ({ ...shared, ...file })))
  const { text, sha256 } = frozen
  await tx.insert(submissionTexts).values({ ...shared, text, sha256, frozenAt: now })
}

export async function selectText(
  { tx }: Tenant,
  { relationshipId, id }: Key,
): Promise<{ text: string; sha256: string } | undefined> {
  const [row] = await tx
    .select({ text: submissionTexts.text, sha256: submissionTexts.sha256 })
    .from(submissionTexts)
    .where(and(eq(submissionTexts.relationshipId, relationshipId), eq(submissionTexts.submissionId, id)))
  return row
}

export async function selectClauses({ tx }: Tenant, { relationshipId, id }: Key): Promise<FrozenClauseRow[]> {
  return tx
    .select()
    .from(submissionClauses)
    .where(and(eq(submissionClauses.relationshipId, relationshipId), eq(submissionClauses.submissionId, id)))
    .orderBy(asc(submissionClauses.position))
}

export async function selectFiles({ tx }: Tenant, { relationshipId, id }: Key): Promise<FrozenFileRow[]> {
  return tx
    .select()
    .from(submissionFiles)
    .where(and(eq(submissionFiles.relationshipId, relationshipId), eq(submissionFiles.submissionId, id)))
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
  signature: Pick<SignatureRow, 'meaning' | 'sha256'> & { decisionId?: string },
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
