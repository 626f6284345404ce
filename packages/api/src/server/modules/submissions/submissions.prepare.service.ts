import type { BodyOf } from '../../../contract/define'
import type { Moved } from '../../../contract/reviews'
import type { chooseStudies, prepareSubmission, sendForSignature } from '../../../contract/submissions'
import type { Tenant } from '../../db/tenant'
import { uniqueOr409 } from '../../db/unique'
import { changedMeanwhile, invalidInput } from '../../errors'
import { frozenCharacteristic, taskById } from '../parts/parts.lookup.service'
import { resultsForTask, type StudyOfTask } from '../studies/studies.results.service'
import { newestOf } from './submissions.content'
import { whatSigningFreezes, type Prepared } from './submissions.content.service'
import { insertNote, replaceChosen } from './submissions.draft.repository'
import { wrongSubmissionState } from './submissions.errors'
import { about, submissionMessages, tell } from './submissions.messages'
import {
  asMoved,
  makeMove,
  openForMove,
  permittedMove,
  recordSubmission,
  type SubmissionFacts,
} from './submissions.move.service'
import { hasUnsigned, insertSubmission, updateSubmission } from './submissions.repository'

// Two at once both see none: the database has the last word.
const meanwhile = {
  submissions_one_draft: {
    path: 'body.taskId',
    message: 'Somebody else has just begun a submission for this measuring task. Go on with that one.',
  },
}

/** Prepares a submission of a measuring task from its studies; without a choice from the newest computed one. */
export async function prepare(tenant: Tenant, body: BodyOf<typeof prepareSubmission>): Promise<Moved> {
  const task = await taskById(tenant, body.taskId)
  const { relationshipId, supplierOrgId, customerOrgId, partId, characteristicId } = task
  const move = permittedMove(tenant, 'prepare', null, {
    'task-in-use': task.archivedAt === null,
    'no-other-draft': !(await hasUnsigned(tenant, task.id)),
  })
  const studies = await resultsForTask(tenant, task.id)
  const newest = newestOf(studies)
  const chosen = pick(studies, body.studyIds ?? (newest ? [newest.study.id] : []))
  const { class: ofClass } = await frozenCharacteristic(tenant, characteristicId)
  const submission = await uniqueOr409(meanwhile, () =>
    insertSubmission(tenant, {
      ...{ relationshipId, supplierOrgId, customerOrgId, taskId: task.id, partId, characteristicId },
      state: move.to,
      stateSince: tenant.now,
      createdAt: tenant.now,
      createdBy: tenant.userId,
      safety: ofClass === 'safety',
    }),
  )
  await replaceChosen(tenant, submission, chosen)
  recordSubmission(tenant, submission, move.event, { studies: chosen.map(({ studyId }) => studyId) })
  return asMoved(submission)
}

/** Lets a draft rest on other studies of its task. */
export async function choose(
  tenant: Tenant,
  id: string,
  { expectedVersion, studyIds }: BodyOf<typeof chooseStudies>,
): Promise<Moved> {
  const submission = await openForMove(tenant, id, expectedVersion)
  if (submission.state !== 'draft') throw wrongSubmissionState(submission.state)
  const chosen = pick(await resultsForTask(tenant, submission.taskId), studyIds)
  await replaceChosen(tenant, submission, chosen)
  const updated = await updateSubmission(tenant, submission, {})
  if (!updated) throw changedMeanwhile('submission')
  recordSubmission(tenant, updated, 'submission.studies-chosen', {
    studies: chosen.map(({ studyId }) => studyId),
  })
  return asMoved(updated)
}

/** Hands a draft to the approvers. */
export async function send(
  tenant: Tenant,
  id: string,
  { expectedVersion, note }: BodyOf<typeof sendForSignature>,
): Promise<Moved> {
  const submission = await openForMove(tenant, id, expectedVersion)
  const prepared = await whatSigningFreezes(tenant, submission)
  const move = permittedMove(tenant, 'send-for-signature', submission, preparedFacts(prepared))
  await replaceChosen(tenant, submission, prepared.chosen)
  if (note) await insertNote(tenant, submission, note)
  const moved = await makeMove(
    tenant,
    submission,
    move,
    { sentForSignatureAt: tenant.now },
    { sha256: prepared.sha256 },
  )
  const words = about('supplier', submissionMessages.waitsForSignature(note))
  await tell(tenant, moved, 'own side', 'submission', words, ['supplier-approver'])
  return asMoved(moved)
}

/** What stands in the way of handing on what would be frozen now. */
export const preparedFacts = ({ taskInUse, clausesTotal, chosen }: Prepared): SubmissionFacts => ({
  'task-in-use': taskInUse,
  'something-to-judge': clausesTotal > 0 || chosen.length > 0,
})

/** Returns what waits for signature to its draft, with a note. */
export async function giveBack(
  tenant: Tenant,
  id: string,
  { expectedVersion, note }: { expectedVersion: number; note: string },
): Promise<Moved> {
  const submission = await openForMove(tenant, id, expectedVersion)
  const move = permittedMove(tenant, 'return', submission, { 'reason-given': note !== '' })
  await insertNote(tenant, submission, note)
  const moved = await makeMove(tenant, submission, move, { sentForSignatureAt: null })
  const words = about('supplier', submissionMessages.returned(note))
  await tell(tenant, moved, 'own side', 'submission', words, ['gauge-engineer'])
  return asMoved(moved)
}

/** Discards what was not signed; the customer never learns of it. */
export async function discard(tenant: Tenant, id: string, expectedVersion: number): Promise<Moved> {
  const submission = await openForMove(tenant, id, expectedVersion)
  const move = permittedMove(tenant, 'discard', submission, {})
  return asMoved(await makeMove(tenant, submission, move))
}

/** The chosen studies with their newest readings; only computed studies of the task can be chosen. */
function pick(studies: readonly StudyOfTask[], ids: readonly string[]) {
  const chosen = ids.map((studyId, at) => {
    const found = studies.find(({ study }) => study.id === studyId)
    if (!found)
      throw invalidInput([
        { path: `body.studyIds.${at}`, message: 'Choose computed studies of this measuring task.' },
      ])
    return { studyId, dataId: found.data.id }
  })
  return [...new Map(chosen.map((each) => [each.studyId, each])).values()]
}
