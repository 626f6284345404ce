import { and, eq } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import { agreementVersions } from '../agreements/agreements.table'
import { submissionClauses, submissionTexts } from '../submissions/submissions.table'
import type { FrozenText, Sealed } from './record.frozen'

/** What an event froze, as it lies in the database now; null where it is gone. */
export async function selectFrozen(reader: Pick<Tenant, 'tx'>, sealed: Sealed): Promise<FrozenText | null> {
  return sealed.kind === 'agreement'
    ? selectAgreementText(reader, sealed.id)
    : selectSubmissionText(reader, sealed)
}

async function selectAgreementText({ tx }: Pick<Tenant, 'tx'>, id: string): Promise<FrozenText | null> {
  const [row] = await tx
    .select({ text: agreementVersions.text, sha256: agreementVersions.sha256 })
    .from(agreementVersions)
    .where(eq(agreementVersions.id, id))
  return row?.text == null || row.sha256 === null ? null : { text: row.text, sha256: row.sha256, clauses: [] }
}

async function selectSubmissionText(
  reader: Pick<Tenant, 'tx'>,
  { id, revision }: { id: string; revision: number },
): Promise<FrozenText | null> {
  const [row] = await reader.tx
    .select({ text: submissionTexts.text, sha256: submissionTexts.sha256 })
    .from(submissionTexts)
    .where(and(eq(submissionTexts.submissionId, id), eq(submissionTexts.revision, revision)))
  return row
    ? { ...row, clauses: await selectSubmissionEvaluations(reader, { submissionId: id, revision }) }
    : null
}

/** The evaluations that one revision of a submission froze. */
export async function selectSubmissionEvaluations(
  { tx }: Pick<Tenant, 'tx'>,
  { submissionId, revision }: { submissionId: string; revision: number },
) {
  return tx
    .select()
    .from(submissionClauses)
    .where(and(eq(submissionClauses.submissionId, submissionId), eq(submissionClauses.revision, revision)))
}
