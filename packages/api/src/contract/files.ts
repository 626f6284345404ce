import { z } from 'zod'
import { instant, paramsWith, uuid } from './common'
import { defineEndpoint } from './define'

/** Largest file that is taken as a certificate or attachment. */
export const largestFile = 20_000_000

export const fileSchema = z.object({
  id: uuid,
  name: z.string(),
  contentType: z.string(),
  /** Bytes. */
  size: z.number().int(),
  sha256: z.string(),
  createdAt: instant,
})
export type StoredFile = z.output<typeof fileSchema>

export const readFile = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/files/:fileId',
  access: 'files.read',
  params: paramsWith('fileId'),
  response: fileSchema,
  summary: 'What is known of one file: name, size, SHA-256.',
})

export const downloadFile = defineEndpoint({
  method: 'get',
  path: '/organisations/:organisationId/files/:fileId/content',
  access: 'files.read',
  params: paramsWith('fileId'),
  summary: 'One file, byte for byte as it was uploaded, as an attachment.',
})
