import { standingOf } from '../../../contract/standing'
import type { CarryOver } from '../../../contract/standings'
import { dayIn } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import { namesOfPeople } from '../organisations/people.repository'
import { selectActiveOfRevisions } from '../parts/characteristics.repository'
import type { PartRow } from '../parts/parts.repository'
import { selectNewestRevisions, type RevisionRow } from '../parts/revisions.repository'
import { relationshipById } from '../relationships/relationships.lookup.service'
import { selectEarlierAcceptances, type EarlierAcceptance } from './standing.carry.repository'
import { compareLimits, standingFactsOf } from './standing.facts'
import { selectAccepted, selectCarryOvers } from './standing.repository'

/** The revision of a part that counts now. */
export async function currentOf(tenant: Tenant, part: PartRow): Promise<RevisionRow> {
  const [current] = await selectNewestRevisions(tenant, part, 1)
  if (!current) throw notFound('revision')
  return current
}

export interface Earlier extends Pick<EarlierAcceptance, 'submission'> {
  row: CarryOver
}

/** Acceptances of the revisions before the current one, with how their limits compare with it. */
export async function earlierOf(tenant: Tenant, part: PartRow): Promise<Earlier[]> {
  const current = await currentOf(tenant, part)
  const rows = await selectEarlierAcceptances(tenant, part, current)
  const ids = rows.map(({ submission }) => submission.id)
  const { timeZone } = await relationshipById(tenant, part.relationshipId)
  const now = await selectActiveOfRevisions(tenant, [current.id])
  const accepted = new Map((await selectAccepted(tenant, ids)).map((each) => [each.submissionId, each]))
  // A carry-over lifts nothing but the revision, so what else stops an acceptance is told beside it.
  const standings = new Map(
    (await standingFactsOf(tenant, ids)).map(({ submissionId, facts }) => [
      submissionId,
      standingOf({ ...facts, revisions: [] }, dayIn(timeZone, tenant.now)),
    ]),
  )
  const carried = (await selectCarryOvers(tenant, ids)).filter(({ revisionId }) => revisionId === current.id)
  const names = await namesOfPeople(
    tenant,
    carried.map(({ carriedBy }) => carriedBy),
  )
  return rows.flatMap(({ submission, task, characteristic, revision }) => {
    const { limits } = accepted.get(submission.id) ?? {}
    const standing = standings.get(submission.id)
    if (!limits || !standing) return []
    const target = now.find(({ number }) => number === characteristic.number)
    const carry = carried.find(({ submissionId }) => submissionId === submission.id)
    const row: CarryOver = {
      submissionId: submission.id,
      number: submission.number ?? 0,
      revision: revision.label,
      characteristicNumber: characteristic.number,
      characteristicName: characteristic.name,
      gaugeCode: task.gaugeCode,
      gaugeName: task.gaugeName,
      site: task.site,
      processStep: task.processStep,
      limits: compareLimits(limits, target ?? null),
      characteristicId: target?.id ?? null,
      standing: standing.state,
      carriedOverOn: carry ? dayIn(timeZone, carry.carriedAt) : null,
      carriedOverBy: carry ? (names.get(carry.carriedBy) ?? null) : null,
    }
    return [{ row, submission }]
  })
}
