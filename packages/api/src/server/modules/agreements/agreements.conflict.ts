import type { DraftConflict } from '../../../contract/agreements'
import type { Tenant } from '../../db/tenant'
import { namesOfPeople } from '../organisations/people.repository'
import type { Negotiation, VersionAtHand } from './agreements.negotiation.service'
import { roundAnswer } from './agreements.version.read'

/**
 * What somebody else of one's own side saved meanwhile: their draft, or what they sent of it; null where they
 * discarded it. It goes with a refusal, so that both texts can be put together and none is lost.
 */
export async function conflictIn(
  tenant: Tenant,
  { agreement }: Negotiation,
  { row, draft, standing }: VersionAtHand,
): Promise<DraftConflict> {
  const theirs = draft ?? (standing.side === tenant.side ? standing : null)
  const names = await namesOfPeople(tenant, theirs ? [theirs.createdBy] : [])
  return {
    agreementId: agreement.id,
    versionId: row.id,
    draft: theirs && conflicting(roundAnswer(theirs, (userId) => names.get(userId) ?? null)),
  }
}

const conflicting = ({
  id,
  state,
  clauses,
  terms,
  effectiveOn,
  comment,
  answersRound,
  by,
  savedAt,
  rowVersion,
}: ReturnType<typeof roundAnswer>): DraftConflict['draft'] => ({
  id,
  state,
  clauses: [...clauses],
  terms,
  effectiveOn,
  comment,
  answersRound,
  by,
  savedAt,
  rowVersion,
})
