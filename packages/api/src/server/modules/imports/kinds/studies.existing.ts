import type { Tenant } from '../../../db/tenant'
import { selectGaugesCoded } from '../../gauges/gauges.repository'
import type { GaugeRow } from '../../gauges/gauges.repository'
import { selectStandardsCoded, type StandardRow } from '../../gauges/standards.repository'
import { todayOf } from '../../organisations/organisations.lookup.service'
import { selectTasksOfParts, type TaskListed } from '../../parts/tasks.repository'
import { selectStudiesCoded, type StudyRow } from '../../studies/studies.repository'
import { groupBy } from '../rows/context'
import { existingParts, inPortions, type ExistingPart } from './parts.existing'
import type { StudyRowRead } from './studies.read'

/** Everything of this supplier that a file of studies names. */
export interface StudyWorld {
  today: string
  /** By the customer's number and by one's own. */
  parts: Map<string, ExistingPart[]>
  /** By the characteristic they measure. */
  tasks: Map<string, TaskListed[]>
  gauges: Map<string, GaugeRow>
  standards: Map<string, StandardRow>
  studies: Map<string, StudyRow>
}

export async function studyWorld(tenant: Tenant, rows: readonly StudyRowRead[]): Promise<StudyWorld> {
  const named = (field: 'number' | 'gauge' | 'standard') =>
    new Set(rows.flatMap(({ own }) => own[field] ?? []))
  const parts = await existingParts(tenant, named('number'))
  const tasks = await inPortions(
    parts.map(({ part }) => part.id),
    (some) => selectTasksOfParts(tenant, some),
  )
  const gauges = await inPortions([...named('gauge')], (some) => selectGaugesCoded(tenant, some))
  const standards = await inPortions([...named('standard')], (some) => selectStandardsCoded(tenant, some))
  const codes = [...new Set(rows.flatMap(({ code }) => code ?? []))]
  const studies = await inPortions(codes, (some) => selectStudiesCoded(tenant, some))
  const byNumber = new Map<string, ExistingPart[]>()
  for (const each of parts)
    for (const number of new Set([each.part.number, each.part.supplierNumber ?? each.part.number]))
      byNumber.set(number, [...(byNumber.get(number) ?? []), each])
  return {
    today: await todayOf(tenant),
    parts: byNumber,
    tasks: groupBy(tasks, ({ characteristic }) => characteristic.id),
    gauges: new Map(gauges.map(({ gauge }) => [gauge.code, gauge])),
    standards: new Map(standards.map((row) => [row.code, row])),
    studies: new Map(studies.map((row) => [row.code, row])),
  }
}
