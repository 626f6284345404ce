import { contentOf, summaryOf } from '../../../contract/submission-content'
import type { Submission } from '../../../contract/submissions'
import type { Tenant } from '../../db/tenant'
import { namesOfPeople } from '../organisations/people.repository'
import { selectChallenges, selectMessages } from '../reviews/challenges.repository'
import { challengeAnswers } from '../reviews/challenges.read'
import { selectDecisions } from '../reviews/decisions.repository'
import { decisionAnswers } from '../reviews/decisions.read'
import { reviewFacts } from '../reviews/reviews.facts.service'
import { byRegistration } from './submissions.content'
import { partiesOf, whatSigningFreezes, type Prepared } from './submissions.content.service'
import { selectNotes } from './submissions.draft.repository'
import { selectClauses, selectFiles, selectSignatures, selectText } from './submissions.frozen.repository'
import { hindrancesOf } from './submissions.hindrances'
import { ageInDays } from './submissions.list.service'
import { submissionById, type SubmissionFacts } from './submissions.move.service'
import { selectNumber, type SubmissionRow } from './submissions.repository'

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
> & { facts: SubmissionFacts }

/** One submission with everything in it, as far as the reader's side may see it. */
export async function readSubmissionOf(tenant: Tenant, id: string): Promise<Submission> {
  const submission = await submissionById(tenant, id)
  const { timeZone } = await partiesOf(tenant, submission.relationshipId)
  const { facts, ...content } =
    submission.number === null ? await asPrepared(tenant, submission) : await asFrozen(tenant, submission)

  const signatures = await selectSignatures(tenant, submission)
  const decisions = await selectDecisions(tenant, submission)
  const challenges = await selectChallenges(tenant, submission)
  const messages = await selectMessages(
    tenant,
    submission,
    challenges.map((challenge) => challenge.id),
  )
  const notes = tenant.side === 'supplier' ? await selectNotes(tenant, id) : []
  const names = await namesOfPeople(tenant, [
    ...signatures.map(({ userId }) => userId),
    ...decisions.flatMap(({ decidedBy, secondBy }) => [decidedBy, secondBy]),
    ...challenges.map(({ closedBy }) => closedBy),
    ...messages.map(({ userId }) => userId),
    ...notes.map(({ userId }) => userId),
  ])
  const nameOf = (userId: string | null) => (userId === null ? null : (names.get(userId) ?? null))

  const { number, state, rowVersion, relationshipId, taskId, partId, characteristicId } = submission
  const { createdAt, sentForSignatureAt, submittedAt, decidedAt, withdrawalReason } = submission
  return {
    ...{ id, number, state, rowVersion, relationshipId, taskId, partId, characteristicId },
    ...{ createdAt, sentForSignatureAt, submittedAt, decidedAt, withdrawalReason },
    ageDays: ageInDays(tenant, timeZone, submission.stateSince),
    supersededBy: await newer(tenant, submission),
    ...content,
    signatures: signatures.map(({ side, userId, meaning, sha256, signedAt }) => ({
      ...{ side, name: nameOf(userId), meaning, sha256, signedAt },
    })),
    decisions: decisionAnswers(tenant, submission, decisions, nameOf),
    challenges: challengeAnswers(challenges, messages, nameOf),
    notes: notes.map((note) => ({
      ...{ id: note.id, name: nameOf(note.userId), text: note.text, createdAt: note.createdAt },
    })),
    hindrances: hindrancesOf(tenant, state, facts),
  }
}

/** Before signing: what signing now would freeze, and what a draft may choose from. */
async function asPrepared(tenant: Tenant, submission: SubmissionRow): Promise<Content> {
  const prepared = await whatSigningFreezes(tenant, submission)
  const { text, sha256, verdict, clausesMet, clausesTotal, content, clauses, takenBy } = prepared
  return {
    ...{ text, sha256, verdict, clausesMet, clausesTotal },
    safety: content.characteristic.class === 'safety',
    evaluations: clauses,
    files: prepared.files.map((file) => ({ ...file, id: null })),
    choices: submission.state === 'draft' ? choicesOf(prepared) : [],
    facts: {
      'criteria-in-force': clausesTotal > 0,
      'did-not-take-readings': !takenBy.includes(tenant.userId),
    },
  }
}

/** After signing: what was frozen, and nothing else. Verdict and counts are read from the signed text. */
async function asFrozen(tenant: Tenant, submission: SubmissionRow): Promise<Content> {
  const frozen = await selectText(tenant, submission)
  if (!frozen) throw new Error(`The signed submission ${submission.id} has no text.`)
  return {
    ...frozen,
    // Nothing counts as met where the text is no submission any more; the check says so loudly.
    ...summaryOf(contentOf(frozen.text) ?? { clauses: [] }),
    safety: submission.safety,
    evaluations: await selectClauses(tenant, submission),
    files: await selectFiles(tenant, submission),
    choices: [],
    facts: tenant.side === 'customer' ? await reviewFacts(tenant, submission) : {},
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
