import type { ChallengePrecondition } from '../../../contract/moves/challenge'
import { defineError, invalidInput, type ProblemError } from '../../errors'
import { refusals as ofSubmission } from '../submissions/submissions.errors'

const targetUnderChallenge = defineError(
  'target-under-challenge',
  409,
  'This is under challenge already. Go on with that challenge.',
)
const nothingCorrected = defineError(
  'nothing-corrected',
  409,
  'Nothing differs from what was signed. Store the corrected readings in the study first, then sign the correction.',
)
const filesMissing = (): ProblemError =>
  invalidInput([{ path: 'body.fileIds', message: 'Attach at least one file as evidence.' }])
const wordsMissing = (): ProblemError => invalidInput([{ path: 'body.text', message: 'Say it in words.' }])

/** What to say where a condition of a challenge's move does not hold; null where only the state can be at fault. */
export const refusals: Record<ChallengePrecondition, (() => ProblemError) | null> = {
  'submission-under-review': null,
  'target-not-under-challenge': targetUnderChallenge,
  'words-given': wordsMissing,
  'files-given': filesMissing,
  'data-corrected': nothingCorrected,
  'did-not-take-readings': ofSubmission['did-not-take-readings'],
  'as-seen': ofSubmission['as-seen'],
  corrected: null,
  'not-corrected': null,
  'submission-refused': null,
}
