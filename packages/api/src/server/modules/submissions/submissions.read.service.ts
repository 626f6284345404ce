import { contentOf, summaryOf } from '../../../contract/submission-content'
import type { Submission } from '../../../contract/submissions'
import { dayIn } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import { namesOfPeople } from '../organisations/people.repository'
import { readReview } from '../reviews/reviews.read.service'
import { reviewFacts } from '../reviews/reviews.facts.service'
import { standingsOf } from '../standing/standing.service'
import { byHandAsked } from './submissions.by-hand.service'
import { byRegistration } from './submissions.content'
import { partiesOf, whatSigningFreezes, type Prepared } from './submissions.content.service'
import { selectNotes } from './submissions.draft.repository'
import { selectClauses, selectFiles, selectSignatures, selectTexts } from './submissions.frozen.repository'
import { hindrancesOf } from './submissions.hindrances'
import { ageInDays } from './submissions.list.service'
import { submissionById, type SubmissionFacts } from './submissions.move.service'
import { preparedFacts } from './submissions.prepare.service'
import { selectNumber, type SubmissionRow } from './submissions.repository'
import { maySignFor } from './submissions.sign.service'

type Content = Pick<
  Submission,
  | 'text'
  | 'sha256'
  | 'verdict'
  | 'clausesMet'
  | 'clausesTotal'
  | 'safety'
  | 'evaluations'
  | 'files'
  | 'choices'
  | 'criteria'
  | 'revision'
  | 'revisions'
  | 'byHand'
> & { facts: SubmissionFacts }

/** One submission with everything in it, as far as the reader's side may see it; of the newest text or an earlier. */
export async function readSubmissionOf(tenant: Tenant, id: string, revision?: number): Promise<Submission> {
  const submission = await submissionById(tenant, id)
  const { timeZone } = await partiesOf(tenant, submission.relationshipId)
  const { facts, ...content } =
    submission.number === null
      ? await asPrepared(tenant, submission)
      : await asFrozen(tenant, submission, revision)

  const signatures = await selectSignatures(tenant, submission)
  const notes = tenant.side === 'supplier' ? await selectNotes(tenant, id) : []
  const today = dayIn(timeZone, tenant.now)
  const review = await readReview(tenant, submission, today)
  const names = await namesOfPeople(tenant, [
    ...signatures.map(({ userId }) => userId),
    ...notes.map(({ userId }) => userId),
  ])
  const nameOf = (userId: string) => names.get(userId) ?? null

  const { number, state, rowVersion, relationshipId, taskId, partId, characteristicId } = submission
  const { createdAt, sentForSignatureAt, submittedAt, decidedAt, withdrawalReason } = submission
  return {
    ...{ id, number, state, rowVersion, relationshipId, taskId, partId, characteristicId },
    ...{ createdAt, sentForSignatureAt, submittedAt, decidedAt, withdrawalReason },
    ageDays: ageInDays(tenant, timeZone, submission.stateSince),
    today,
    supersededBy: await newer(tenant, submission),
    standing: (await standingsOf(tenant, [id])).get(id) ?? null,
    ...content,
    signatures: signatures.map(({ side, userId, meaning, revision: of, sha256, signedAt }) => ({
      ...{ side, name: nameOf(userId), meaning, revision: of, sha256, signedAt },
    })),
    ...review,
    notes: notes.map((note) => ({
      ...{ id: note.id, name: nameOf(note.userId), text: note.text, createdAt: note.createdAt },
    })),
    hindrances: hindrancesOf(tenant, state, facts),
  }
}

/** Before signing: what signing now would freeze, and what a draft may choose from. */
async function asPrepared(tenant: Tenant, submission: SubmissionRow): Promise<Content> {
  const prepared = await whatSigningFreezes(tenant, submission)
  const { text, sha256, verdict, clausesMet, clausesTotal, content, clauses } = prepared
  const isDraft = submission.state === 'draft'
  return {
    ...{ text, sha256, verdict, clausesMet, clausesTotal },
    ...{ criteria: content.criteria, revision: prepared.revision, revisions: [] },
    safety: content.characteristic.class === 'safety',
    evaluations: clauses,
    files: prepared.files.map(({ ownFileId = null, ...file }) => ({ ...file, id: null, ownFileId })),
    choices: isDraft ? choicesOf(prepared) : [],
    byHand: isDraft ? await byHandAsked(tenant, submission.id, prepared) : [],
    facts: { ...preparedFacts(prepared), 'did-not-take-readings': maySignFor(tenant, prepared) },
  }
}

/** After signing: what was frozen, and nothing else. Verdict and counts are read from the signed text. */
async function asFrozen(tenant: Tenant, submission: SubmissionRow, revision?: number): Promise<Content> {
  const texts = await selectTexts(tenant, submission)
  const frozen = revision === undefined ? texts.at(-1) : texts.find((each) => each.revision === revision)
  if (!frozen) {
    if (revision !== undefined) throw notFound('revision of this submission')
    throw new Error(`The signed submission ${submission.id} has no text.`)
  }
  // Nothing counts as met where a text is no submission any more; the check says so loudly.
  const readable = (text: string) => contentOf(text) ?? { clauses: [], corrects: null }
  return {
    ...{ text: frozen.text, sha256: frozen.sha256, revision: frozen.revision },
    ...summaryOf(readable(frozen.text)),
    revisions: texts.map((each) => ({
      ...{ revision: each.revision, sha256: each.sha256, frozenAt: each.frozenAt },
      ...summaryOf(readable(each.text)),
      challenge: readable(each.text).corrects?.challenge ?? null,
    })),
    criteria: submission.criteria ?? 'agreed',
    safety: submission.safety,
    evaluations: await selectClauses(tenant, submission, frozen.revision),
    files: (await selectFiles(tenant, submission, frozen.revision)).map((file) => ({
      ...file,
      ownFileId: null,
    })),
    choices: [],
    byHand: [],
    facts: await reviewFacts(tenant, submission),
  }
}

const choicesOf = ({ studies, chosen }: Prepared): Submission['choices'] =>
  [...studies]
    .sort((a, b) => byRegistration(b, a))
    .map(({ study, data }) => ({
      studyId: study.id,
      code: study.code,
      registeredAt: study.registeredAt,
      collectedOn: data.collectedOn,
      readings: data.texts.length,
      chosen: chosen.some(({ studyId }) => studyId === study.id),
    }))

async function newer(
  tenant: Tenant,
  { supersededBy: id }: SubmissionRow,
): Promise<Submission['supersededBy']> {
  if (id === null) return null
  const number = await selectNumber(tenant, id)
  return number === null ? null : { id, number }
}
