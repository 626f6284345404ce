import type { SubmissionPrecondition, SubmissionState } from '../../../contract/moves/submission'
import { defineError, wrongState, type ProblemError } from '../../errors'

const taskArchived = defineError(
  'task-archived',
  409,
  'This measuring task was archived meanwhile, so it needs no proof. Discard the submission, or use the task again.',
)
const nothingToJudge = defineError(
  'nothing-to-judge',
  409,
  'No criteria are agreed and no study is chosen, so there is nothing to submit. Choose a study first.',
)
const needsApprover = defineError(
  'needs-approver',
  403,
  'No criteria are agreed for this submission, so an approver decides. Ask an approver of your organisation.',
)
const otherDraft = defineError(
  'other-draft',
  409,
  'A submission for this measuring task is being prepared already. Go on with that one, or discard it first.',
)
const reasonMissing = defineError('reason-missing', 422, 'Say why, in words.')
const tookTheReadings = defineError(
  'took-the-readings',
  403,
  'You took readings of this submission, so somebody else must sign it. Ask another approver.',
)
const notAsSeen = defineError(
  'not-as-seen',
  409,
  'What you had before you is not what stands here now. Load it again, look at it, then decide.',
)
const challengeOpen = defineError(
  'challenge-open',
  409,
  'A challenge is open. Wait for its answer, or withdraw the challenge.',
)
const challengeUnsettled = defineError(
  'challenge-unsettled',
  409,
  'A challenge is not settled yet. Settle it, or withdraw it, then accept.',
)
const newerAccepted = defineError(
  'newer-accepted',
  409,
  'A newer submission for this measuring task is accepted already, so this one cannot be.',
)
const samePerson = defineError(
  'same-person',
  403,
  'You proposed this acceptance, so somebody else must confirm it. Ask a second person.',
)
export const notSigned = defineError(
  'not-signed',
  409,
  'This submission is not signed yet, so nothing of it is frozen that could be checked.',
)

/** States as a sentence names them. */
export const stateWords: Record<SubmissionState, string> = {
  draft: 'a draft',
  'for-signature': 'waiting for signature',
  submitted: 'submitted',
  challenged: 'challenged',
  answered: 'answered',
  'awaiting-second-person': 'waiting for the second person',
  'awaiting-other-side': 'waiting for the supplier’s approver',
  accepted: 'accepted',
  'accepted-with-conditions': 'accepted with conditions',
  refused: 'refused',
  withdrawn: 'withdrawn',
  superseded: 'superseded',
}

export const wrongSubmissionState = (state: SubmissionState): ProblemError =>
  wrongState('submission', stateWords[state])

/** What to say where a condition of a move does not hold; null where only the state can be at fault. */
export const refusals: Record<SubmissionPrecondition, (() => ProblemError) | null> = {
  'task-in-use': taskArchived,
  'something-to-judge': nothingToJudge,
  'no-other-draft': otherDraft,
  'reason-given': reasonMissing,
  'did-not-take-readings': tookTheReadings,
  'as-seen': notAsSeen,
  'a-challenge-is-open': null,
  'no-challenge-open': challengeOpen,
  'no-challenge-was-answered': null,
  'challenges-settled': challengeUnsettled,
  'safety-class': null,
  'not-safety-class': null,
  'criteria-agreed': needsApprover,
  'no-criteria-agreed': null,
  'no-newer-accepted': newerAccepted,
  'newer-accepted': null,
  'without-conditions': null,
  'with-conditions': null,
  'another-person': samePerson,
}
