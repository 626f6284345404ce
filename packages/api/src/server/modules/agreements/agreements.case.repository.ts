import { and, desc, eq, isNotNull } from 'drizzle-orm'
import type { AgreementCase } from '../../../contract/agreements'
import { ownSide } from '../../db/own-side'
import type { Tenant } from '../../db/tenant'
import { challenges } from '../reviews/reviews.table'
import { agreementRounds, agreementVersions } from './agreements.table'

/** Whether the challenge is one of that submission, both of this relationship. */
export async function caseExists(
  { tx }: Tenant,
  relationshipId: string,
  { submissionId, challengeId }: AgreementCase,
): Promise<boolean> {
  const rows = await tx
    .select({ id: challenges.id })
    .from(challenges)
    .where(
      and(
        eq(challenges.relationshipId, relationshipId),
        eq(challenges.submissionId, submissionId),
        eq(challenges.id, challengeId),
      ),
    )
  return rows.length > 0
}

/**
 * The versions that were proposed with a challenge attached, the newest first: by which side, and where they stand.
 * Drafts are left out, for whoever asks.
 */
export async function selectVersionsOfCase(tenant: Tenant, relationshipId: string, challengeId: string) {
  return tenant.tx
    .selectDistinct({
      agreementId: agreementVersions.agreementId,
      versionId: agreementVersions.id,
      number: agreementVersions.number,
      state: agreementVersions.state,
      proposedBy: agreementRounds.side,
    })
    .from(agreementRounds)
    .innerJoin(
      agreementVersions,
      and(
        eq(agreementVersions.relationshipId, agreementRounds.relationshipId),
        eq(agreementVersions.id, agreementRounds.versionId),
      ),
    )
    .where(
      and(
        ownSide(tenant, agreementRounds),
        eq(agreementRounds.relationshipId, relationshipId),
        eq(agreementRounds.caseChallengeId, challengeId),
        isNotNull(agreementRounds.sentAt),
      ),
    )
    .orderBy(desc(agreementVersions.id))
}
