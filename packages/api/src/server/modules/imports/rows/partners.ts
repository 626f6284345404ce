import type { Tenant } from '../../../db/tenant'
import { cut } from './words'
import { selectRelationships } from '../../relationships/relationships.repository'
import type { RowCells } from './cells'

export interface Partner {
  relationshipId: string
  name: string
}

/** Everybody this organisation supplies, or who supplies it. */
export async function partnersOf(tenant: Tenant): Promise<Partner[]> {
  const rows = await selectRelationships(tenant, { page: 1, size: 10_000, sort: 'partner' })
  return rows.map(({ relationship, partner }) => ({ relationshipId: relationship.id, name: partner.name }))
}

const alike = (name: string) => name.normalize('NFKC').toLowerCase().replace(/\s+/g, ' ').trim()

/** The partner a row names; the only one where it names none. Refuses a name that is not among them. */
export function partnerOf(
  cells: RowCells,
  partners: readonly Partner[],
  side: Tenant['side'],
): Partner | null {
  const text = cells.text('partner')
  const [who, whose] = side === 'supplier' ? ['customer', 'customers'] : ['supplier', 'suppliers']
  const names = partners
    .slice(0, 5)
    .map(({ name }) => name)
    .join(', ')
  if (text === null)
    return partners.length === 1 && partners[0]
      ? partners[0]
      : cells.refuse('partner', `Name the ${who}: ${names || 'there is none yet'}.`)
  const found = partners.filter(({ name }) => alike(name) === alike(text))
  return found.length === 1 && found[0]
    ? found[0]
    : cells.refuse(
        'partner',
        `“${cut(text, 60)}” is none of your ${whose}. Write the name as it stands in your list: ${names || 'there is none yet'}.`,
      )
}
