import type { submissions } from '@evenrule/api/contract'
import { underReview } from '@evenrule/api/contract/moves/submission'
import { submissionStateWords } from '../../strings/states'
import { sectionWords as words } from '../../strings/submissions'

/** One step of a submission's way, as a tick on a ruled line. */
export interface Step {
  label: string
  /** When it was taken; null while it is to come. */
  at: string | null
  /** It stands here now. */
  current: boolean
}

type Times = Pick<
  submissions.Submission,
  'state' | 'createdAt' | 'sentForSignatureAt' | 'submittedAt' | 'decidedAt'
>

/**
 * The way of a submission: prepared, sent for signature, submitted, under review, decided. What was skipped (the
 * customer does not see when it was sent for signature) or is no longer to come is left out.
 */
export function stepsOf({ state, createdAt, sentForSignatureAt, submittedAt, decidedAt }: Times): Step[] {
  const reviewing = underReview.includes(state)
  const ended = !reviewing && state !== 'draft' && state !== 'for-signature'
  const step = (label: string, at: string | null, current: boolean): Step => ({ label, at, current })
  return [
    step(words.prepared, createdAt, state === 'draft'),
    ...(sentForSignatureAt !== null || !submittedAt
      ? [
          step(
            words.sentForSignature,
            state === 'draft' ? null : sentForSignatureAt,
            state === 'for-signature',
          ),
        ]
      : []),
    ...(submittedAt !== null || !ended ? [step(words.signed, submittedAt, state === 'submitted')] : []),
    ...(reviewing && state !== 'submitted' ? [step(submissionStateWords[state], null, true)] : []),
    ...(ended ? [step(submissionStateWords[state], decidedAt, true)] : [step(words.decided, null, false)]),
  ]
}
