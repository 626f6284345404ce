import type { z } from 'zod'
import type { Tenant } from '../../db/tenant'
import { deleteMapping, selectMappings, upsertMapping } from './mappings.repository'

/** What this organisation remembers for a purpose, by signature; what an older release wrote differently is left out. */
export async function mappingsOf<T>(
  tenant: Tenant,
  purpose: string,
  schema: z.ZodType<T>,
): Promise<Record<string, T>> {
  const rows = await selectMappings(tenant, purpose)
  return Object.fromEntries(
    rows.flatMap(({ signature, mapping }) => {
      const parsed = schema.safeParse(mapping)
      return parsed.success ? [[signature, parsed.data]] : []
    }),
  )
}

/** Remembers how a file with this signature is read, or forgets it where the mapping is null. */
export async function rememberMapping(
  tenant: Tenant,
  { purpose, signature, mapping }: { purpose: string; signature: string; mapping: unknown },
): Promise<void> {
  if (mapping === null) await deleteMapping(tenant, purpose, signature)
  else await upsertMapping(tenant, { purpose, signature, mapping })
}
