import { z } from 'zod'
import { uuid } from './common'
import { submissionStates } from './moves/submission'

/** SHA-256 of a frozen text, in lower-case hexadecimal digits. */
export const textHash = z.string().regex(/^[0-9a-f]{64}$/, 'This is not a SHA-256 hash.')

/** Where a move has put the submission. */
export const movedSchema = z.object({
  id: uuid,
  state: z.enum(submissionStates),
  rowVersion: z.number().int(),
})
export type Moved = z.output<typeof movedSchema>
