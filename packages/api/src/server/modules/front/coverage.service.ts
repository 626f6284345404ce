import type { QueryOf } from '../../../contract/define'
import type { CoveredPart, listCoverage } from '../../../contract/front'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { selectActiveOfRevisions } from '../parts/characteristics.repository'
import { selectParts } from '../parts/parts.repository'
import { proofOfCharacteristics } from '../parts/proof.service'

/** One page of active parts with the proof of every active characteristic of the current revision. */
export async function listOfCoverage(tenant: Tenant, query: QueryOf<typeof listCoverage>) {
  return paged(
    query,
    (page) => selectParts(tenant, { ...page, archived: 'active' }),
    async (rows): Promise<CoveredPart[]> => {
      const all = await selectActiveOfRevisions(
        tenant,
        rows.map(({ revision }) => revision.id),
      )
      const proofs = await proofOfCharacteristics(
        tenant,
        all.map(({ id }) => id),
      )
      return rows.map(({ part, revision, supplierName, customerName }) => ({
        partId: part.id,
        partNumber: part.number,
        partName: part.name,
        revision: revision.label,
        partner: tenant.side === 'supplier' ? customerName : supplierName,
        characteristics: all
          .filter(({ revisionId }) => revisionId === revision.id)
          .map((row) => ({
            ...row,
            proof: proofs.get(row.id)?.proof ?? 'no-task',
            runsOutOn: proofs.get(row.id)?.runsOutOn ?? null,
            taskId: proofs.get(row.id)?.leastFar ?? null,
          })),
      }))
    },
  )
}
