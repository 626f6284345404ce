import { importColumns, type ImportInput, type ImportKind } from '../../../contract/imports'
import type { Tenant } from '../../db/tenant'
import type { Table } from '../../tables/table'
import { mappingsOf, rememberMapping } from '../mappings/mappings.service'
import { sourceOf, type Source } from './imports.source'

const purposeOf = (kind: ImportKind, side: Tenant['side']) => `import-${kind}-${side}`

/** The file with its columns as this organisation used them for files of the same names, or as they are guessed. */
export const tenantSource = (
  tenant: Tenant,
  kind: ImportKind,
  table: Table,
  input: ImportInput,
): Promise<Source> =>
  sourceOf(kind, tenant.side, table, input, async (signature) => {
    const known = await mappingsOf(tenant, purposeOf(kind, tenant.side), importColumns)
    return known[signature]
  })

/** Remembers the columns of a file that was imported, for the next one with the same names. */
export async function rememberColumns(
  tenant: Tenant,
  kind: ImportKind,
  { input, signature }: Source,
): Promise<void> {
  await rememberMapping(tenant, {
    purpose: purposeOf(kind, tenant.side),
    signature,
    mapping: input.columns ?? {},
  })
}
