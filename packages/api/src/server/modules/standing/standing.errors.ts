import { defineError } from '../../errors'

export const notSuspended = defineError(
  'not-suspended',
  409,
  'This acceptance is not suspended, so there is nothing to reinstate. Load the page again to see how it stands.',
)
export const newerRevision = defineError(
  'newer-revision',
  409,
  'The part has a newer revision by now. Load the page again and choose what to carry over to that one.',
)
export const notToCarryOver = defineError(
  'not-to-carry-over',
  409,
  (submission: number | null) =>
    `Submission ${submission ?? ''} cannot be carried over: its limits are not those of the current revision, or it is carried over already. Load the page again.`,
)
