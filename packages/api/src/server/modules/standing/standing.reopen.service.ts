import type { Tenant } from '../../db/tenant'
import type { PartRow } from '../parts/parts.repository'
import { recordSubmission } from '../submissions/submissions.move.service'
import { earlierOf } from './standing.carry.read'
import { tellOfReopened } from './standing.messages'
import { selectAcceptedOfPart } from './standing.carry.repository'
import { standingsOf } from './standing.service'

/**
 * Adds a revision by `add` and tells both sides which acceptances it reopened: those that had not ended before. Each
 * keeps an event in the record.
 */
export async function reopening<T>(
  tenant: Tenant,
  part: PartRow,
  label: string,
  add: () => Promise<T>,
): Promise<T> {
  const before = await standingsOf(tenant, await selectAcceptedOfPart(tenant, part))
  const result = await add()
  const ended = ['reopened', 'expired', 'lapsed']
  const reopened = (await earlierOf(tenant, part)).filter(({ submission }) => {
    const state = before.get(submission.id)?.state
    return state !== undefined && !ended.includes(state)
  })
  for (const { submission, row } of reopened)
    recordSubmission(tenant, submission, 'submission.reopened', { revision: label, limits: row.limits })
  if (reopened.length > 0)
    tellOfReopened(
      tenant,
      part,
      label,
      reopened.map(({ row }) => ({ number: row.number, unchanged: row.limits === 'same' })),
    )
  return result
}
