import { formatCount } from '../rows/words'
import { dayInWords } from '../../../calendar'
import type { Tenant } from '../../../db/tenant'
import { addCalibration } from '../../gauges/calibrations.service'
import { selectCalibrationsOfGauges } from '../../gauges/calibrations.repository'
import { previewOf } from '../../gauges/gauge-events.service'
import { selectGaugesCoded } from '../../gauges/gauges.repository'
import { changeGaugeOf, registerGauge } from '../../gauges/gauges.service'
import { todayOf } from '../../organisations/organisations.lookup.service'
import { groupBy, inChunks, turn, type MappedRows } from '../rows/context'
import { differencesOf } from '../rows/differences'
import type { Plan, Planned } from '../rows/plan'
import { dependentsOf, dependsOn } from '../rows/settle'
import { gaugeFields } from './gauges.fields'
import {
  gaugeValues,
  refusalOfGauge,
  settleGauge,
  type EnteredGauge,
  type ExistingGauge,
  type SettledGaugeRow,
} from './gauges.group'
import { gaugeOwnFields, readGaugeRow, type GaugeRowRead } from './gauges.read'
import { inPortions } from './parts.existing'

/** What a file of gauges would do: gauge by gauge, then its calibrations from the oldest on. */
export async function planGauges(tenant: Tenant, { rows, writing }: MappedRows): Promise<Plan> {
  const read: GaugeRowRead[] = []
  await inChunks(rows, (row) => read.push(readGaugeRow(row, writing)))
  const groups = groupBy(
    read.filter(({ code }) => code),
    ({ code }) => code ?? '',
  )
  const existing = await existingGauges(tenant, [...groups.keys()])
  const today = await todayOf(tenant)
  const things: Planned[] = []
  const problems: Plan['problems'] = []
  for (const [code, group] of groups) {
    await turn()
    const stands = existing.get(code)
    const settled = await settleGauge(group, stands, today)
    const bad = new Set(group.filter(({ cells }) => cells.problems.length > 0).map(({ cells }) => cells.row))
    problems.push(...markDependents(settled, bad))
    const good = () => settled.filter(({ row }) => !bad.has(row))
    const values = gaugeValues(code, good(), stands)
    const [first] = good()
    if (!first) continue
    const refused = await refusalOfGauge(tenant, values, stands)
    if (refused) {
      // Without the gauge none of its calibrations has a place.
      first.read.cells.refuse('unit', refused)
      for (const { row } of good().slice(1))
        problems.push({ row, field: null, message: dependsOn(first.row) })
      continue
    }
    things.push(...(await thingsOf(tenant, values, good(), stands)))
  }
  problems.push(...read.flatMap(({ cells }) => cells.problems))
  return { things, problems, rows: rows.length }
}

function markDependents(settled: readonly SettledGaugeRow[], bad: Set<number>): Plan['problems'] {
  const dependents = dependentsOf(settled, bad)
  for (const { row } of dependents) bad.add(row)
  return dependents
}

async function existingGauges(tenant: Tenant, codes: readonly string[]): Promise<Map<string, ExistingGauge>> {
  const rows = await inPortions(codes, (some) => selectGaugesCoded(tenant, some))
  const byId = new Map<string, ExistingGauge>(
    rows.map(({ gauge, site }) => [gauge.id, { gauge, site, calibrations: [] }]),
  )
  for (const row of await inPortions([...byId.keys()], (some) => selectCalibrationsOfGauges(tenant, some)))
    byId.get(row.gaugeId ?? '')?.calibrations.push(row)
  return new Map([...byId.values()].map((each) => [each.gauge.code, each]))
}

const labels = Object.fromEntries(
  gaugeFields
    .filter(({ key }) => (gaugeOwnFields as readonly string[]).includes(key))
    .map(({ key, label }) => [key, label]),
)

async function thingsOf(
  tenant: Tenant,
  values: EnteredGauge,
  good: readonly SettledGaugeRow[],
  stands: ExistingGauge | undefined,
): Promise<Planned[]> {
  const made = { id: stands?.gauge.id ?? '' }
  const dated = good
    .flatMap(({ row, calibration }) => (calibration ? [{ row, ...calibration }] : []))
    .sort((a, b) => a.values.calibratedOn.localeCompare(b.values.calibratedOn))
  const things = [gaugeThing(values, good[0]?.row ?? 0, stands, made)]
  for (const { row, values: calibration, stands: entered } of dated) {
    const thing = {
      ...{ row, what: 'calibration' as const, differences: [] },
      label: `${values.code}, certificate ${calibration.certificateNumber} of ${dayInWords(calibration.calibratedOn)}`,
      restsOn: [entered?.id ?? null],
    }
    if (entered) things.push({ ...thing, outcome: 'unchanged', notes: [] })
    else
      things.push({
        ...thing,
        outcome: 'new',
        notes: await notesOf(tenant, stands, calibration),
        act: (acting) => addCalibration(acting, { gaugeId: made.id }, calibration, null),
      })
  }
  return things
}

function gaugeThing(
  values: EnteredGauge,
  row: number,
  stands: ExistingGauge | undefined,
  made: { id: string },
): Planned {
  const thing = { row, what: 'gauge' as const, label: `${values.code} ${values.name}`, notes: [] }
  if (!stands)
    return {
      ...thing,
      ...{ outcome: 'new', differences: [], restsOn: [null] },
      async act(acting) {
        made.id = (await registerGauge(acting, values)).id
      },
    }
  const { id, rowVersion } = stands.gauge
  const differences = differencesOf(labels, { ...stands.gauge, site: stands.site }, values)
  const restsOn = [id, rowVersion]
  if (differences.length === 0) return { ...thing, outcome: 'unchanged', differences, restsOn }
  return {
    ...thing,
    ...{ outcome: 'changed', differences, restsOn },
    act: (acting) => changeGaugeOf(acting, id, { ...values, expectedVersion: rowVersion }),
  }
}

/** What a calibration that found the gauge outside its limits does to acceptances that rest on it. */
async function notesOf(
  tenant: Tenant,
  stands: ExistingGauge | undefined,
  { foundWithinLimits, calibratedOn: happenedOn }: { foundWithinLimits: boolean; calibratedOn: string },
): Promise<string[]> {
  if (foundWithinLimits) return []
  const gaugeId = stands?.gauge.id
  const effect = gaugeId
    ? await previewOf(tenant, { gaugeId }, { kind: 'reported-out-of-limits', happenedOn })
    : { suspended: 0 }
  return [
    effect.suspended > 0
      ? `Found outside its limits: ${formatCount(effect.suspended, 'acceptance')} that ${effect.suspended === 1 ? 'rests' : 'rest'} on it will be suspended, and both sides told.`
      : 'Found outside its limits; no acceptance is suspended by it.',
  ]
}
