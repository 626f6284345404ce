import { z } from 'zod'
import { uuid } from './common'
import { submissionStates } from './moves/submission'

/** Where a move has put the submission. */
export const movedSchema = z.object({
  id: uuid,
  state: z.enum(submissionStates),
  rowVersion: z.number().int(),
})
export type Moved = z.output<typeof movedSchema>
