import type { AnswerInputOf, QueryOf } from '../../../contract/define'
import type { HouseTerms, listHouseTerms, readHouseTerms } from '../../../contract/house-terms'
import { saysNothing } from '../../../contract/terms'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import { namesOfPeople } from '../organisations/people.repository'
import { selectPage, selectVisible, type HouseTermsListed } from './house-terms.list.repository'
import { movesOf } from './house-terms.move'
import type { HouseTermsRow } from './house-terms.repository'

/** One page of this customer's house terms; for a supplier, of the published ones of its customers. */
export const listOfHouseTerms = (
  tenant: Tenant,
  query: QueryOf<typeof listHouseTerms>,
): Promise<AnswerInputOf<typeof listHouseTerms>> =>
  paged(
    query,
    (page) => selectPage(tenant, page),
    (rows) => rows.map(asListed),
  )

const asListed = ({ row, customer, current }: HouseTermsListed) => ({
  id: row.id,
  customer,
  number: row.number,
  state: row.state,
  current,
  clauseCount: row.clauses.length,
  words: row.words,
  savedAt: row.savedAt,
  publishedAt: row.publishedAt,
})

/** One version with its clauses and terms; 404 where this organisation may not see it. */
export async function houseTermsById(
  tenant: Tenant,
  houseTermsId: string,
): Promise<AnswerInputOf<typeof readHouseTerms>> {
  const listed = await selectVisible(tenant, houseTermsId)
  if (!listed) throw notFound('version of house terms')
  const { row } = listed
  const { clauses, terms, sha256, rowVersion } = row
  const names = await namesOfPeople(tenant, [row.savedBy])
  return {
    ...asListed(listed),
    clauses,
    terms,
    by: names.get(row.savedBy) ?? null,
    sha256,
    rowVersion,
    moves: tenant.side === 'customer' ? movesOf(tenant, row.state, factsOf(row)) : [],
  } satisfies HouseTerms
}

/** What is known of the conditions of moves from a version. */
export const factsOf = ({ clauses, terms }: Pick<HouseTermsRow, 'clauses' | 'terms'>) => ({
  'says-something': clauses.length > 0 || !saysNothing(terms),
})
