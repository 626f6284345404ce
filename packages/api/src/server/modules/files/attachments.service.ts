import type { Tenant } from '../../db/tenant'
import { invalidInput } from '../../errors'
import type { PrepareCall } from '../../http/route'
import type { uploadAttachment } from '../../../contract/files'
import { contentTypeOf, notOfType } from './files.content'
import type { FileRow } from './files.repository'
import { fileById, keepFile, type FileToKeep } from './files.service'

/** Checks an uploaded file by its content and stores its bytes, before the transaction. */
export async function storeAttachment({
  file,
  services,
}: Pick<PrepareCall<typeof uploadAttachment>, 'file' | 'services'>): Promise<FileToKeep> {
  if (!file) throw invalidInput([{ path: 'body.file', message: 'Choose a file.' }])
  const contentType = contentTypeOf(file.bytes)
  if (!contentType)
    throw notOfType(file, 'PDF, PNG, JPEG, XLSX or CSV', 'Save it as one of these and choose it again.')
  return { ...file, contentType, stored: await services.files.put(file.bytes) }
}

/** Notes an uploaded file; it is its organisation's alone until it goes with something that both sides see. */
export async function keepAttachment(tenant: Tenant, file: FileToKeep): Promise<FileRow> {
  return fileById(tenant, await keepFile(tenant, file))
}

/** A file of this organisation that a body names; the field is told where there is none. */
export async function ownFile(tenant: Tenant, fileId: string, path: string): Promise<FileRow> {
  try {
    return await fileById(tenant, fileId)
  } catch {
    throw invalidInput([{ path, message: 'Upload the file first, then choose it.' }])
  }
}

/** The same for a list of them, in its order. */
export async function ownFiles(tenant: Tenant, fileIds: readonly string[]): Promise<FileRow[]> {
  const files: FileRow[] = []
  for (const [at, fileId] of fileIds.entries())
    files.push(await ownFile(tenant, fileId, `body.fileIds.${at}`))
  return files
}
