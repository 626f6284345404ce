import type { Challenge, Condition, Decision } from '../../../contract/reviews'
import type { Tenant } from '../../db/tenant'
import { namesOfPeople } from '../organisations/people.repository'
import { relationshipById, todayIn } from '../relationships/relationships.lookup.service'
import type { SubmissionRow } from '../submissions/submissions.repository'
import { challengeAnswers } from './challenges.read'
import { selectChallenges, selectMessages } from './challenges.repository'
import { conditionAnswers } from './conditions.read'
import { selectConditions, selectReports } from './conditions.repository'
import { decisionAnswers } from './decisions.read'
import { selectDecisions } from './decisions.repository'
import { selectReviewFiles } from './review-files.repository'

interface Review {
  challenges: Challenge[]
  decisions: Decision[]
}

const idOf = ({ id }: { id: string }): string => id

/** Everything said and decided in the review of a submission, as far as the reader's side may see it. */
export async function readReview(
  tenant: Tenant,
  submission: SubmissionRow,
  today: string,
): Promise<Review & { conditions: Condition[] }> {
  const challenges = await selectChallenges(tenant, submission)
  const messages = await selectMessages(tenant, submission, challenges.map(idOf))
  const decisions = await selectDecisions(tenant, submission)
  const conditions = await selectConditions(tenant, submission)
  const reports = await selectReports(tenant, submission, conditions.map(idOf))
  const files = await selectReviewFiles(tenant, submission)
  const names = await namesOfPeople(tenant, [
    ...challenges.flatMap(({ openedBy, closedBy }) => [openedBy, closedBy]),
    ...[...messages, ...reports].map(({ userId }) => userId),
    ...decisions.flatMap(({ decidedBy, secondBy, otherSideBy }) => [decidedBy, secondBy, otherSideBy]),
  ])
  const nameOf = (userId: string | null) => (userId === null ? null : (names.get(userId) ?? null))
  const conditionsOf = (decisionId: string) =>
    conditionAnswers(
      conditions.filter((each) => each.decisionId === decisionId),
      reports,
      files,
      nameOf,
      today,
    )
  return {
    challenges: challengeAnswers(challenges, messages, files, nameOf, today),
    decisions: decisionAnswers(tenant, submission, decisions, conditionsOf, nameOf),
    conditions: conditionAnswers(conditions, reports, files, nameOf, today),
  }
}

/** One challenge as it stands now. */
export async function readChallenge(
  tenant: Tenant,
  submission: SubmissionRow,
  challengeId: string,
): Promise<Challenge> {
  const { challenges } = await readReview(tenant, submission, await todayOf(tenant, submission))
  const found = challenges.find(({ id }) => id === challengeId)
  if (!found) throw new Error('A challenge was lost on its way out.')
  return found
}

/** One condition as it stands now. */
export async function readCondition(
  tenant: Tenant,
  submission: SubmissionRow,
  conditionId: string,
): Promise<Condition> {
  const { conditions } = await readReview(tenant, submission, await todayOf(tenant, submission))
  const found = conditions.find(({ id }) => id === conditionId)
  if (!found) throw new Error('A condition was lost on its way out.')
  return found
}

/** Today in the calendar of the submission's relationship. */
export const todayOf = async (tenant: Tenant, { relationshipId }: SubmissionRow): Promise<string> =>
  todayIn(await relationshipById(tenant, relationshipId), tenant)
