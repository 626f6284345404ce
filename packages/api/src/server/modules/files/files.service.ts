import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import type { Download } from '../../http/route'
import { cleanFileName } from './files.content'
import { insertFile, selectFile, type FileRow } from './files.repository'

export interface FileToKeep {
  name: string
  bytes: Buffer
  contentType: string
  /** What `services.files.put()` answered; the bytes are stored before the transaction begins. */
  stored: { sha256: string; key: string }
}

/** Notes a file whose bytes already lie in the store; returns its id. The file is its organisation's alone. */
export async function keepFile(tenant: Tenant, file: FileToKeep): Promise<string> {
  return insertFile(tenant, {
    orgId: tenant.organisationId,
    name: cleanFileName(file.name),
    contentType: file.contentType,
    size: file.bytes.length,
    sha256: file.stored.sha256,
    storageKey: file.stored.key,
    createdAt: tenant.now,
    createdBy: tenant.userId,
  })
}

/** One file of this organisation; 404 for those of others. */
export async function fileById(tenant: Tenant, fileId: string): Promise<FileRow> {
  const row = await selectFile(tenant, fileId)
  if (!row) throw notFound('file')
  return row
}

/** The bytes as uploaded, to be sent as an attachment. */
export async function downloadOf(tenant: Tenant, fileId: string): Promise<Download> {
  const row = await fileById(tenant, fileId)
  return {
    name: row.name,
    contentType: row.contentType,
    bytes: await tenant.services.files.get(row.storageKey),
  }
}
