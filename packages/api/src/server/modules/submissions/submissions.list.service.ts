import { waitsOn } from '../../../contract/moves/submission'
import type { Standing } from '../../../contract/standing'
import { verdictSchema } from '../../../contract/submission-content'
import type { SubmissionQuery, SubmissionRow as SubmissionInList } from '../../../contract/submissions'
import { dayIn, daysBetween } from '../../calendar'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { standingsOf, submissionsThat } from '../standing/standing.service'
import { selectSubmissions, type SubmissionListed } from './submissions.list.repository'

/** Calendar days, in the relationship's time zone, from an instant until now. */
export const ageInDays = (tenant: Tenant, timeZone: string, since: string): number =>
  daysBetween(dayIn(timeZone, since), dayIn(timeZone, tenant.now))

/** One page of this side's submissions. */
export async function listOfSubmissions(tenant: Tenant, query: SubmissionQuery) {
  // A standing follows from dates, so those that stand so are found by looking at every accepted one.
  const ids = query.standing && (await submissionsThat(tenant, query.standing))
  return paged(
    query,
    (page) => selectSubmissions(tenant, page, ids),
    async (rows) => {
      const standings = await standingsOf(
        tenant,
        rows.map(({ submission }) => submission.id),
      )
      return rows.map((row) => asItem(tenant, row, standings.get(row.submission.id) ?? null))
    },
  )
}

function asItem(tenant: Tenant, row: SubmissionListed, standing: Standing | null): SubmissionInList {
  const { submission, task, characteristic, partNumber, revision, other, timeZone } = row
  const { id, number, state, taskId, partId, safety, criteria, clausesMet, clausesTotal } = submission
  const { nominal, lowerLimit, upperLimit, unit } = characteristic
  return {
    ...{ id, number, state, taskId, partId, safety, criteria, clausesMet, clausesTotal, standing },
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
