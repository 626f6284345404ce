import { z } from 'zod'
import { instant, organisationParams, paramsWith, uuid } from './common'
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

/** Most files that one challenge, answer or report carries. */
export const mostAttachments = 10

/** Ids of files that were uploaded by one's own organisation. */
export const attachmentIds = z
  .array(uuid)
  .max(mostAttachments, `Attach at most ${mostAttachments} files.`)
  .refine((ids) => new Set(ids).size === ids.length, 'Name each file once.')

/** A file as it is listed with what was said. */
export const attachmentSchema = z.object({
  id: uuid,
  name: z.string(),
  contentType: z.string(),
  size: z.number().int(),
  sha256: z.string(),
})
export type Attachment = z.output<typeof attachmentSchema>

export const uploadAttachment = defineEndpoint({
  method: 'post',
  path: '/organisations/:organisationId/files',
  access: 'attachments.add',
  params: organisationParams,
  body: z.object({}).default({}),
  upload: { maximumBytes: largestFile },
  response: fileSchema,
  summary:
    'Takes a PDF, PNG, JPEG, XLSX or CSV file that is to go with a challenge, an answer, a report or a judgement by hand.',
})
