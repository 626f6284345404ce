import type { Clause } from '@evenrule/metrology'
import type { Terms } from '../../../contract/terms'
import type { Tenant } from '../../db/tenant'
import { relationshipById } from '../relationships/relationships.lookup.service'
import { selectCurrent, selectPublished, type HouseTermsRow } from './house-terms.repository'

/** Published house terms as others rest on them. */
export interface PublishedHouseTerms {
  id: string
  number: number
  clauses: Clause[]
  terms: Terms
  words: string
  sha256: string
}

/** Published house terms of a relationship's customer; undefined where there are none of that id. */
export async function publishedFor(
  tenant: Tenant,
  { customerOrgId }: { customerOrgId: string },
  houseTermsId: string,
): Promise<PublishedHouseTerms | undefined> {
  const row = await selectPublished(tenant, customerOrgId, houseTermsId)
  return row && asPublished(row)
}

/** The house terms that a relationship's customer offers now; null where it has published none. */
export async function houseTermsFor(
  tenant: Tenant,
  relationshipId: string,
): Promise<PublishedHouseTerms | null> {
  const { customerOrgId } = await relationshipById(tenant, relationshipId)
  const row = await selectCurrent(tenant, customerOrgId)
  return row ? asPublished(row) : null
}

function asPublished({ id, number, clauses, terms, words, sha256 }: HouseTermsRow): PublishedHouseTerms {
  if (number === null || sha256 === null) throw new Error('Published house terms lack their number or hash.')
  return { id, number, clauses, terms, words, sha256 }
}
