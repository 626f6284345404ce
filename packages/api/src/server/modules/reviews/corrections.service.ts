import { allows } from '../../../contract/access'
import type { BodyOf } from '../../../contract/define'
import type { askForCorrection, Challenge, Correction, signCorrection } from '../../../contract/reviews'
import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import { sha256 } from '../record/record.append'
import { shareAtSigning } from '../standing/standing.share.service'
import { whatCorrectionFreezes, type Corrected } from '../submissions/submissions.correction.service'
import { replaceChosen } from '../submissions/submissions.draft.repository'
import { insertFrozen, insertSignature } from '../submissions/submissions.frozen.repository'
import { about, tell } from '../submissions/submissions.messages'
import { recordSubmission, submissionById } from '../submissions/submissions.move.service'
import { frozenData, maySignFor } from '../submissions/submissions.sign.service'
import {
  moveChallenge,
  openForAnswer,
  permittedChallengeMove,
  type ChallengeFacts,
} from './challenges.move.service'
import { selectChallenges } from './challenges.repository'
import { reviewMessages } from './reviews.messages'
import { readChallenge } from './reviews.read.service'

/** What the corrected readings of a submission would freeze; stores nothing. */
export async function correctionOf(tenant: Tenant, id: string, challengeId: string): Promise<Correction> {
  const submission = await submissionById(tenant, id)
  const row = (await selectChallenges(tenant, submission)).find((each) => each.id === challengeId)
  if (!row) throw notFound('challenge')
  const corrected = await whatCorrectionFreezes(tenant, submission, row.number)
  const { revision, text, sha256: hash, verdict, clausesMet, clausesTotal, clauses, studies } = corrected
  return {
    ...{ revision, text, sha256: hash, verdict, clausesMet, clausesTotal, studies },
    evaluations: clauses,
    hindrances: hindrancesOf(tenant, corrected),
  }
}

function hindrancesOf(tenant: Tenant, corrected: Corrected): Correction['hindrances'] {
  const hindrances: Correction['hindrances'] = []
  if (!corrected.differs) hindrances.push('nothing-corrected')
  if (!maySignFor(tenant, corrected)) hindrances.push('took-the-readings')
  if (!allows('submissions.sign', tenant.side, tenant.roles)) hindrances.push('not-an-approver')
  return hindrances
}

/** Tells the supplier's approvers that a correction waits for their signature; the customer learns nothing of it. */
export async function askToSign(
  tenant: Tenant,
  id: string,
  challengeId: string,
  { expectedVersion, note }: BodyOf<typeof askForCorrection>,
): Promise<Challenge> {
  const { submission, row } = await openForAnswer(tenant, id, challengeId, expectedVersion)
  const corrected = await whatCorrectionFreezes(tenant, submission, row.number)
  // What the approver could not sign is not put before them.
  permittedChallengeMove({ ...tenant, roles: ['supplier-approver'] }, 'correct', submission, row.state, {
    ...factsOf(corrected),
    'did-not-take-readings': true,
    'as-seen': true,
    'words-given': true,
  })
  tenant.record({
    type: 'challenge.correction-sent-for-signature',
    subject: { type: 'challenge', id: row.id },
    taskId: submission.taskId,
    data: { submissionId: id, challenge: row.number, sha256: corrected.sha256 },
  })
  const words = about('supplier', reviewMessages.correctionWaits(note))
  await tell(tenant, submission, 'own side', 'challenge', words, ['supplier-approver'])
  return readChallenge(tenant, submission, row.id)
}

const factsOf = ({ differs }: Corrected): ChallengeFacts => ({ 'data-corrected': differs })

/** Signs the corrected content as the next revision and answers the challenge by it; earlier revisions stay. */
export async function correct(
  tenant: Tenant,
  id: string,
  challengeId: string,
  { expectedVersion, sha256: seen, text }: BodyOf<typeof signCorrection>,
): Promise<Challenge> {
  const { submission, row } = await openForAnswer(tenant, id, challengeId, expectedVersion)
  const corrected = await whatCorrectionFreezes(tenant, submission, row.number)
  const facts: ChallengeFacts = {
    ...factsOf(corrected),
    'did-not-take-readings': maySignFor(tenant, corrected),
    'as-seen': corrected.sha256 === seen,
    'words-given': text !== '',
  }
  permittedChallengeMove(tenant, 'correct', submission, row.state, facts)
  const { revision, verdict, clausesMet, clausesTotal } = corrected
  await replaceChosen(tenant, submission, corrected.chosen)
  await insertFrozen(tenant, submission, corrected)
  await insertSignature(tenant, submission, { meaning: 'corrects', revision, sha256: corrected.sha256 })
  recordSubmission(tenant, submission, 'submission.corrected', {
    ...{ revision, challenge: row.number, textSha256: sha256(text) },
    ...frozenData(corrected),
  })
  await shareAtSigning(tenant, submission)
  return moveChallenge(
    tenant,
    { submission, row },
    'correct',
    { expectedVersion, text },
    {
      facts,
      message: { answerKind: 'correction', revision },
      change: { answeredAt: tenant.now },
      data: { revision, sha256: corrected.sha256 },
      values: { verdict, clausesMet, clausesTotal },
    },
  )
}
