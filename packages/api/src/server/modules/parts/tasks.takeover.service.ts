import { areCompatible } from '@evenrule/metrology'
import type { Tenant } from '../../db/tenant'
import { selectActiveOfRevisions } from './characteristics.repository'
import { isArchived, noEarlierRevision } from './parts.errors'
import { partRow } from './parts.service'
import { selectNewestRevisions } from './revisions.repository'
import { insertTask, selectSameTask, selectTasksOfRevision } from './tasks.repository'
import { recordTask } from './tasks.service'

/**
 * Sets up the measuring tasks of the revision before the current one anew for the characteristics of the same
 * numbers. They are new tasks: what was proved for the old revision stays with it. Left are those whose number the
 * current revision does not have, whose unit became one of another quantity, or that are there already.
 */
export async function takeOverTasksOf(
  tenant: Tenant,
  partId: string,
): Promise<{ taken: number; left: number }> {
  const part = await partRow(tenant, partId)
  if (part.archivedAt) throw isArchived('part')
  const [current, before] = await selectNewestRevisions(tenant, part, 2)
  if (!current || !before) throw noEarlierRevision()
  const targets = new Map(
    (await selectActiveOfRevisions(tenant, [current.id])).map((row) => [row.number, row]),
  )
  const tasks = await selectTasksOfRevision(tenant, before.id)
  let taken = 0
  for (const { task, characteristic } of tasks) {
    const target = targets.get(characteristic.number)
    if (!target || !areCompatible(characteristic.unit, target.unit)) continue
    const { id: _id, archivedAt: _archivedAt, rowVersion: _version, ...kept } = task
    const row = { ...kept, characteristicId: target.id }
    if (await selectSameTask(tenant, row)) continue
    const made = await insertTask(tenant, { ...row, createdAt: tenant.now, createdBy: tenant.userId })
    recordTask(tenant, made, 'measuring-task.created')
    taken += 1
  }
  return { taken, left: tasks.length - taken }
}
