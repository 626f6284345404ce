import type { QueryOf } from '../../../contract/define'
import type { listRelationships } from '../../../contract/relationships'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { selectRelationships } from './relationships.repository'

/** One page of this organisation's customers, or of its suppliers. */
export async function listOfRelationships(tenant: Tenant, query: QueryOf<typeof listRelationships>) {
  return paged(
    query,
    (page) => selectRelationships(tenant, page),
    (rows) => rows.map(({ relationship, partner }) => ({ ...relationship, partner })),
  )
}
