import type { AgreementCase, answerRound } from '../../../contract/agreements'
import type { BodyOf } from '../../../contract/define'
import type { Tenant } from '../../db/tenant'
import { invalidInput } from '../../errors'
import { publishedFor } from '../house-terms/house-terms.lookup.service'
import { caseExists } from './agreements.case.repository'
import type { VersionRow } from './agreements.repository'
import { insertRound, type RoundRow } from './agreements.rounds.repository'

type Written = Pick<BodyOf<typeof answerRound>, 'clauses' | 'terms' | 'effectiveOn' | 'comment'>
type Origin = Pick<RoundRow, 'houseTermsId' | 'houseTermsNumber' | 'caseSubmissionId' | 'caseChallengeId'>

/** Writes a draft of this side into a version. */
export async function writeDraft(
  tenant: Tenant,
  { relationshipId, supplierOrgId, customerOrgId, id: versionId }: VersionRow,
  place: Pick<RoundRow, 'number' | 'answersRound'>,
  written: Written & Origin,
): Promise<RoundRow> {
  const { clauses, terms, effectiveOn, comment } = written
  const { houseTermsId, houseTermsNumber, caseSubmissionId, caseChallengeId } = written
  return insertRound(tenant, {
    relationshipId,
    supplierOrgId,
    customerOrgId,
    versionId,
    ...place,
    side: tenant.side,
    state: 'draft',
    ...{ clauses, terms, effectiveOn, comment },
    ...{ houseTermsId, houseTermsNumber, caseSubmissionId, caseChallengeId },
    createdAt: tenant.now,
    createdBy: tenant.userId,
    savedAt: tenant.now,
  })
}

/** What a proposal was begun from, refused at its field where it is not of this relationship. */
export async function originOf(
  tenant: Tenant,
  relationship: { customerOrgId: string } & ({ relationshipId: string } | { id: string }),
  { houseTermsId, caseOf }: { houseTermsId: string | null; caseOf: AgreementCase | null },
): Promise<Origin> {
  const relationshipId = 'relationshipId' in relationship ? relationship.relationshipId : relationship.id
  const houseTerms = houseTermsId && (await publishedFor(tenant, relationship, houseTermsId))
  if (houseTermsId && !houseTerms)
    throw invalidInput([
      { path: 'body.houseTermsId', message: 'Choose published house terms of this customer.' },
    ])
  return {
    houseTermsId: houseTerms ? houseTerms.id : null,
    houseTermsNumber: houseTerms ? houseTerms.number : null,
    ...(await caseAsEntered(tenant, { relationshipId }, caseOf)),
  }
}

/** The challenge attached to a proposal, refused at its field where it is not of this relationship. */
export async function caseAsEntered(
  tenant: Tenant,
  { relationshipId }: { relationshipId: string },
  caseOf: AgreementCase | null,
): Promise<Pick<Origin, 'caseSubmissionId' | 'caseChallengeId'>> {
  if (caseOf && !(await caseExists(tenant, relationshipId, caseOf)))
    throw invalidInput([{ path: 'body.caseOf', message: 'Attach a challenge of this relationship.' }])
  return {
    caseSubmissionId: caseOf?.submissionId ?? null,
    caseChallengeId: caseOf?.challengeId ?? null,
  }
}
