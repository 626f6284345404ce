import type { files } from '@evenrule/api/contract'

/** A file that was sent already and goes with what is being written. */
export type Attached = Pick<files.Attachment, 'id' | 'name' | 'size'>
