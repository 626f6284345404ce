import type { BodyOf, QueryOf } from '../../../contract/define'
import type { carryOver, listCarryOvers } from '../../../contract/standings'
import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import { isArchived } from '../parts/parts.errors'
import { partRow } from '../parts/parts.service'
import { recordSubmission } from '../submissions/submissions.move.service'
import { insertCarryOver } from './standing.acts.repository'
import { currentOf, earlierOf } from './standing.carry.read'
import { newerRevision, notToCarryOver } from './standing.errors'
import { tellOfCarryOver } from './standing.messages'

/** One page of the acceptances of earlier revisions of a part, with how their limits compare with today's. */
export async function carryOversOf(tenant: Tenant, partId: string, query: QueryOf<typeof listCarryOvers>) {
  const part = await partRow(tenant, partId)
  const all = await earlierOf(tenant, part)
  const sorted = query.sort.endsWith('number') ? [...all].sort((a, b) => a.row.number - b.row.number) : all
  if (query.sort.startsWith('-')) sorted.reverse()
  const { page, size } = query
  const items = sorted.slice((page - 1) * size, page * size).map(({ row }) => row)
  return { items, total: all.length, page, size }
}

/** The customer's approver carries acceptances over to the revision they had before them. */
export async function carryOverTo(
  tenant: Tenant,
  partId: string,
  { revisionId, submissionIds }: BodyOf<typeof carryOver>,
): Promise<{ carried: number }> {
  const part = await partRow(tenant, partId)
  if (part.archivedAt) throw isArchived('part')
  const current = await currentOf(tenant, part)
  if (current.id !== revisionId) throw newerRevision()
  const all = await earlierOf(tenant, part)
  const chosen = [...new Set(submissionIds)].map((id) => {
    const found = all.find(({ row }) => row.submissionId === id)
    if (!found) throw notFound('submission')
    return found
  })
  for (const { row, submission } of chosen) {
    if (row.limits !== 'same' || row.carriedOverOn !== null || row.characteristicId === null)
      throw notToCarryOver(row.number)
    const to = { revisionId: current.id, characteristicId: row.characteristicId }
    await insertCarryOver(tenant, submission, to)
    recordSubmission(tenant, submission, 'submission.carried-over', { ...to, revision: current.label })
  }
  tellOfCarryOver(
    tenant,
    part,
    current.label,
    chosen.map(({ row }) => row),
  )
  return { carried: chosen.length }
}
