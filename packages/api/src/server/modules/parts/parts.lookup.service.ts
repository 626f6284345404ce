import { convert, type Characteristic } from '@evenrule/metrology'
import { computedCharacteristic } from '../../../contract/agreement-check'
import type { listScoped, ScopedCharacteristic } from '../../../contract/agreements'
import type { QueryOf } from '../../../contract/define'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import type { FrozenCharacteristic } from '../studies/studies.table'
import {
  lockInScope,
  selectCharacteristic,
  selectCharacteristics,
  selectInScope,
  type CharacteristicInPart,
  type ScopeOfCharacteristics,
} from './characteristics.repository'
import { selectTask, type TaskRow } from './tasks.repository'

/** One measuring task that this organisation may see, archived or not; 404 otherwise. */
export async function taskById(tenant: Tenant, taskId: string): Promise<TaskRow> {
  const row = await selectTask(tenant, taskId)
  if (!row) throw notFound('measuring task')
  return row
}

/** A characteristic as it stands now, in the shape that studies and submissions freeze. */
export async function frozenCharacteristic(
  tenant: Tenant,
  characteristicId: string,
): Promise<FrozenCharacteristic> {
  const row = await selectCharacteristic(tenant, characteristicId)
  if (!row) throw notFound('characteristic')
  return asFrozen(row)
}

/**
 * Every characteristic that an agreement of this scope covers now: the one it is about, or the active ones of the
 * current revisions. `locked` keeps their limits, and the list of them, as they are until the transaction ends.
 */
export async function characteristicsInScope(
  tenant: Tenant,
  scope: ScopeOfCharacteristics,
  { locked = false } = {},
): Promise<ScopedCharacteristic[]> {
  if (locked) await lockInScope(tenant, scope)
  const rows = await selectInScope(tenant, scope)
  return rows.map((row) => ({ ...asFrozen(row), partId: row.part.id }))
}

/** One page of them. */
export async function pageOfCharacteristics(
  tenant: Tenant,
  { relationshipId, partId, characteristicId }: ScopeOfCharacteristics,
  query: QueryOf<typeof listScoped>,
) {
  const scope = { relationshipId, ...(partId ? { partId } : {}) }
  return paged(
    query,
    async (page) => {
      if (characteristicId === null)
        return selectCharacteristics(tenant, { ...page, ...scope, archived: 'active' })
      const one = await selectCharacteristic(tenant, characteristicId)
      return one && page.page === 1 ? [{ ...one, total: 1 }] : []
    },
    (rows) => rows.map((row) => ({ ...asFrozen(row), partId: row.part.id })),
  )
}

const asFrozen = ({ characteristic, part, revision }: CharacteristicInPart): FrozenCharacteristic => ({
  characteristicId: characteristic.id,
  partNumber: part.number,
  revision: revision.label,
  number: characteristic.number,
  name: characteristic.name,
  nominal: characteristic.nominal,
  lowerLimit: characteristic.lowerLimit,
  upperLimit: characteristic.upperLimit,
  unit: characteristic.unit,
  class: characteristic.class,
  processStandardDeviation: characteristic.processStandardDeviation,
})

/**
 * The characteristic as the computation takes it, in its own unit. A gauge's resolution is given in the gauge's
 * unit and converted exactly; it is left out where the units are of different quantities.
 */
export function toCharacteristic(
  frozen: FrozenCharacteristic,
  { resolution, gaugeUnit }: { resolution?: string; gaugeUnit?: string } = {},
): Characteristic {
  const { unit } = frozen
  const converted = resolution === undefined ? null : convert(Number(resolution), gaugeUnit ?? unit, unit)
  return {
    ...computedCharacteristic(frozen),
    ...(converted === null ? {} : { resolution: converted }),
  }
}
