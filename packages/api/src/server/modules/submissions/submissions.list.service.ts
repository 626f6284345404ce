import { waitsOn } from '../../../contract/moves/submission'
import { verdictSchema } from '../../../contract/submission-content'
import type { SubmissionQuery, SubmissionRow as SubmissionInList } from '../../../contract/submissions'
import { dayIn, daysBetween } from '../../calendar'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { selectSubmissions, type SubmissionListed } from './submissions.list.repository'

/** Calendar days, in the relationship's time zone, from an instant until now. */
export const ageInDays = (tenant: Tenant, timeZone: string, since: string): number =>
  daysBetween(dayIn(timeZone, since), dayIn(timeZone, tenant.now))

/** One page of this side's submissions. */
export async function listOfSubmissions(tenant: Tenant, query: SubmissionQuery) {
  return paged(
    query,
    (page) => selectSubmissions(tenant, page),
    (rows) => rows.map((row) => asItem(tenant, row)),
  )
}

function asItem(tenant: Tenant, row: SubmissionListed): SubmissionInList {
  const { submission, task, characteristic, partNumber, revision, other, timeZone } = row
  const { id, number, state, taskId, partId, safety, clausesMet, clausesTotal } = submission
  const { nominal, lowerLimit, upperLimit, unit } = characteristic
  return {
    ...{ id, number, state, taskId, partId, safety, clausesMet, clausesTotal },
    ageDays: ageInDays(tenant, timeZone, submission.stateSince),
    waitsOn: waitsOn[state],
    gaugeCode: task.gaugeCode,
    gaugeName: task.gaugeName,
    partNumber,
    revision,
    characteristicNumber: characteristic.number,
    characteristicName: characteristic.name,
    ...{ nominal, lowerLimit, upperLimit, unit, other },
    verdict: submission.verdict === null ? null : verdictSchema.parse(submission.verdict),
    createdAt: submission.createdAt,
    submittedAt: submission.submittedAt,
  }
}
