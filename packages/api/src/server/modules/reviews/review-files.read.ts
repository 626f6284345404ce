import type { Attachment } from '../../../contract/files'
import type { ReviewFileRow } from './review-files.repository'

/** Files as both sides see them listed. */
export const attachmentsOf = (files: readonly ReviewFileRow[]): Attachment[] =>
  files.map(({ id, name, contentType, size, sha256 }) => ({ id, name, contentType, size, sha256 }))
