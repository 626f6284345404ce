import { addGaugeCalibration } from '../../../../contract/calibrations'
import type { BodyOf } from '../../../../contract/define'
import type { createGauge } from '../../../../contract/gauges'
import { dayInWords } from '../../../calendar'
import type { Tenant } from '../../../db/tenant'
import type { CalibrationRow } from '../../gauges/calibrations.repository'
import { refuseDayToCome } from '../../gauges/calibrations.service'
import { refuseGaugeChange } from '../../gauges/gauges.service'
import type { GaugeRow } from '../../gauges/gauges.repository'
import { isArchived } from '../../parts/parts.errors'
import { CarriedTexts, type Carried } from '../rows/carry'
import { keptDecimal } from '../rows/decimals'
import { refusalOf } from '../rows/refused'
import { gaugeOwnFields, type GaugeField, type GaugeRowRead } from './gauges.read'

export type EnteredGauge = BodyOf<typeof createGauge>
export type EnteredCalibration = BodyOf<typeof addGaugeCalibration>

export interface ExistingGauge {
  gauge: GaugeRow
  site: string | null
  calibrations: CalibrationRow[]
}

/** A row of a gauge with what counts of the gauge itself up to it. */
export interface SettledGaugeRow {
  read: GaugeRowRead
  row: number
  own: Record<GaugeField, Carried | null>
  takesFrom: number[]
  calibration: { values: EnteredCalibration; stands: CalibrationRow | undefined } | null
}

/** Settles the rows of one gauge against each other and against what is there; problems are noted at the cells. */
export async function settleGauge(
  rows: readonly GaugeRowRead[],
  existing: ExistingGauge | undefined,
  today: string,
): Promise<SettledGaugeRow[]> {
  const carried = new CarriedTexts()
  const first = new Map<string, number>()
  const settled: SettledGaugeRow[] = []
  for (const read of rows) {
    const { cells, own } = read
    const taken = Object.fromEntries(
      gaugeOwnFields.map((field) => [field, carried.take(cells, field, own[field])]),
    ) as SettledGaugeRow['own']
    if (existing?.gauge.archivedAt) cells.refuse('code', isArchived('gauge').message)
    for (const field of ['name', 'resolution', 'unit'] as const)
      if (!existing && !taken[field])
        cells.refuse(field, `This gauge is new. Enter its ${field} in its first row.`)
    settled.push({
      ...{ read, row: cells.row, own: taken },
      takesFrom: existing ? [] : gaugeOwnFields.flatMap((field) => taken[field]?.row ?? []),
      calibration: await calibrationOf(read, existing, today, first),
    })
  }
  return settled
}

/** The gauge as its good rows have it, merged with how it stands. */
export const gaugeValues = (
  code: string,
  good: readonly SettledGaugeRow[],
  existing: ExistingGauge | undefined,
): EnteredGauge => {
  const said = (field: GaugeField) =>
    good.find(({ row, own }) => own[field]?.row === row)?.own[field]?.value ?? null
  const stands = existing?.gauge
  return {
    code,
    name: said('name') ?? stands?.name ?? '',
    resolution: keptDecimal(stands?.resolution, said('resolution')) ?? stands?.resolution ?? '',
    unit: (said('unit') ?? stands?.unit ?? 'mm') as EnteredGauge['unit'],
    site: said('site') ?? existing?.site ?? null,
  }
}

/** What the rules of the single act refuse of the gauge as the file has it. */
export const refusalOfGauge = async (
  tenant: Tenant,
  values: EnteredGauge,
  existing: ExistingGauge | undefined,
): Promise<string | undefined> =>
  existing && (await refusalOf(() => refuseGaugeChange(tenant, existing.gauge, values)))

const sameFields = ['dueOn', 'laboratory', 'foundWithinLimits'] as const

async function calibrationOf(
  { cells, calibration }: GaugeRowRead,
  existing: ExistingGauge | undefined,
  today: string,
  first: Map<string, number>,
): Promise<SettledGaugeRow['calibration']> {
  if (!calibration) return null
  const { certificateNumber, calibratedOn } = calibration
  const key = `${certificateNumber} ${calibratedOn}`
  const twice = first.get(key)
  if (twice !== undefined)
    cells.refuse(
      'certificateNumber',
      `Row ${twice} enters this calibration already. Remove one of the two rows.`,
    )
  else first.set(key, cells.row)
  const values = cells.check(addGaugeCalibration.body, calibration)
  if (!values) return null
  const toCome = await refusalOf(() => refuseDayToCome(values, today))
  if (toCome) cells.refuse('calibratedOn', toCome)
  const stands = existing?.calibrations.find(
    (each) => each.certificateNumber === certificateNumber && each.calibratedOn === calibratedOn,
  )
  if (stands && sameFields.some((field) => stands[field] !== values[field] && values[field] !== null))
    cells.refuse(
      'certificateNumber',
      `Calibration ${certificateNumber} of ${dayInWords(calibratedOn)} is entered otherwise: due ${dayInWords(stands.dueOn)}, found ${stands.foundWithinLimits ? 'within' : 'outside'} its limits${stands.laboratory ? `, by ${stands.laboratory}` : ''}. Calibrations are never changed; make the row agree, or enter another certificate.`,
    )
  return { values, stands }
}
