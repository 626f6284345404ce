import { allows } from '../../../contract/access'
import type { BodyOf } from '../../../contract/define'
import { chooseMove, type Facts } from '../../../contract/moves/define'
import {
  conditionMovesNamed,
  type ConditionMove,
  type ConditionMoveName,
  type ConditionPrecondition,
} from '../../../contract/moves/condition'
import type { Condition, confirmCondition, reportCondition, returnCondition } from '../../../contract/reviews'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile, invalidInput, notFound, wrongState } from '../../errors'
import { ownFiles } from '../files/attachments.service'
import { sha256 } from '../record/record.append'
import { about, tell } from '../submissions/submissions.messages'
import { wrongSubmissionState } from '../submissions/submissions.errors'
import { lockedSubmission, recordSubmission } from '../submissions/submissions.move.service'
import type { SubmissionRow } from '../submissions/submissions.repository'
import { insertReport, selectConditions, updateCondition, type ConditionRow } from './conditions.repository'
import { selectDecisions } from './decisions.repository'
import { insertReviewFiles } from './review-files.repository'
import { conditionMessages } from './reviews.messages'
import { readCondition } from './reviews.read.service'

/** Whoever owes a condition reports it done. */
export const report = (
  tenant: Tenant,
  id: string,
  conditionId: string,
  body: BodyOf<typeof reportCondition>,
): Promise<Condition> => moveCondition(tenant, id, conditionId, 'report', body)

/** The customer confirms that a condition is fulfilled. */
export const confirm = (
  tenant: Tenant,
  id: string,
  conditionId: string,
  body: BodyOf<typeof confirmCondition>,
): Promise<Condition> => moveCondition(tenant, id, conditionId, 'confirm', { ...body, fileIds: [] })

/** The customer does not take a condition for fulfilled. */
export const giveBack = (
  tenant: Tenant,
  id: string,
  conditionId: string,
  body: BodyOf<typeof returnCondition>,
): Promise<Condition> => moveCondition(tenant, id, conditionId, 'return', { ...body, fileIds: [] })

async function moveCondition(
  tenant: Tenant,
  id: string,
  conditionId: string,
  name: ConditionMoveName,
  { expectedVersion, text, fileIds }: BodyOf<typeof reportCondition>,
): Promise<Condition> {
  const submission = await lockedSubmission(tenant, id)
  const row = (await selectConditions(tenant, submission)).find((each) => each.id === conditionId)
  if (!row) throw notFound('condition')
  if (row.rowVersion !== expectedVersion) throw changedMeanwhile('condition')
  const move = permitted(tenant, name, submission, row, {
    'acceptance-holds': await acceptanceHolds(tenant, submission, row),
    'owed-by-supplier': row.owner === 'supplier',
    'owed-by-customer': row.owner === 'customer',
    'words-given': text !== '',
  })
  const files = await ownFiles(tenant, fileIds)
  await updateCondition(tenant, row, {
    state: move.to,
    confirmedAt: move.to === 'confirmed' ? tenant.now : null,
  })
  const { id: reportId } = await insertReport(tenant, row, { move: move.name, text })
  await insertReviewFiles(tenant, submission, { reportId }, files)
  recordSubmission(tenant, submission, move.event, {
    ...{ conditionId, condition: row.number },
    ...(text === '' ? {} : { textSha256: sha256(text) }),
    ...(files.length > 0 ? { files: files.map((file) => file.sha256) } : {}),
  })
  const words = about(tenant.side, conditionMessages[move.name](text, row))
  await tell(tenant, submission, 'other side', 'decision', words)
  return readCondition(tenant, submission, conditionId)
}

const stateWords: Record<ConditionRow['state'], string> = {
  open: 'not reported yet',
  reported: 'reported',
  confirmed: 'confirmed',
}

function permitted(
  tenant: Tenant,
  name: ConditionMoveName,
  submission: SubmissionRow,
  row: ConditionRow,
  facts: Facts<ConditionPrecondition>,
): ConditionMove {
  const candidates = conditionMovesNamed(name, row.state).filter(
    ({ side, permission }) => side === tenant.side && allows(permission, side, tenant.roles),
  )
  const { move, lacking } = chooseMove<ConditionPrecondition, ConditionMove>(candidates, facts)
  if (move) return move
  if (!facts['acceptance-holds']) throw wrongSubmissionState(submission.state)
  if (lacking.includes('words-given'))
    throw invalidInput([{ path: 'body.text', message: 'Say it in words.' }])
  // Of what the other side owes, this side has nothing to report.
  throw wrongState('condition', candidates.length > 0 ? 'the other side’s to report' : stateWords[row.state])
}

async function acceptanceHolds(
  tenant: Tenant,
  submission: SubmissionRow,
  { decisionId }: ConditionRow,
): Promise<boolean> {
  if (submission.state !== 'accepted-with-conditions') return false
  const decisions = await selectDecisions(tenant, submission)
  return decisions.some(({ id, state }) => id === decisionId && state === 'final')
}
