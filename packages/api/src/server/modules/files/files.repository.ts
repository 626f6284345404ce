import { and, eq } from 'drizzle-orm'
import type { Tenant } from '../../db/tenant'
import { files } from './files.table'

type NewFile = typeof files.$inferInsert
export type FileRow = typeof files.$inferSelect

export async function insertFile({ tx }: Tenant, row: NewFile): Promise<string> {
  const [inserted] = await tx.insert(files).values(row).returning({ id: files.id })
  if (!inserted) throw new Error('The file was not stored.')
  return inserted.id
}

export async function selectFile(tenant: Tenant, fileId: string): Promise<FileRow | undefined> {
  const [row] = await tenant.tx
    .select()
    .from(files)
    .where(and(eq(files.orgId, tenant.organisationId), eq(files.id, fileId)))
  return row
}
