import { createGauge } from '../../../../contract/gauges'
import { RowCells } from '../rows/cells'
import type { Writing } from '../rows/context'
import type { FieldRow } from '../rows/fields'

export interface ReadCalibration {
  certificateNumber: string
  laboratory: string | null
  calibratedOn: string
  dueOn: string
  foundWithinLimits: boolean
  words: string
}

export interface GaugeRowRead {
  cells: RowCells
  code: string | null
  /** What belongs to the gauge itself, as the row says it; null where a cell says nothing. */
  own: Record<GaugeField, string | null>
  calibration: ReadCalibration | null
}

export const gaugeOwnFields = ['name', 'resolution', 'unit', 'site'] as const
export type GaugeField = (typeof gaugeOwnFields)[number]

const ofCalibration = [
  'certificateNumber',
  'laboratory',
  'calibratedOn',
  'dueOn',
  'foundWithinLimits',
  'words',
] as const

/** Reads one row of gauges by itself. */
export function readGaugeRow(source: FieldRow, writing: Writing): GaugeRowRead {
  const cells = new RowCells(source, writing)
  const code = cells.text('code')
  if (code === null) cells.refuse('code', 'Enter the code of the gauge; every row names its gauge.')
  const { shape } = createGauge.body
  const own = (field: GaugeField, text: string | null) =>
    text === null ? null : cells.check(shape[field], text, { '': field })
  return {
    cells,
    code: code && cells.check(shape.code, code, { '': 'code' }),
    own: {
      name: own('name', cells.text('name')),
      resolution: own('resolution', cells.decimal('resolution')),
      unit: cells.unit('unit'),
      site: own('site', cells.text('site')),
    },
    calibration: readCalibration(cells),
  }
}

function readCalibration(cells: RowCells): ReadCalibration | null {
  if (ofCalibration.every((field) => cells.text(field) === null)) return null
  const needed = (field: string, what: string): string => {
    if (cells.text(field) === null)
      cells.refuse(field, `Enter ${what}, or leave every cell of the calibration empty.`)
    return cells.text(field) ?? ''
  }
  const certificateNumber = needed('certificateNumber', 'the number of the certificate')
  needed('calibratedOn', 'the day of the calibration')
  needed('dueOn', 'the day on which the next calibration is due')
  needed('foundWithinLimits', 'yes or no, as the certificate says')
  const calibratedOn = cells.day('calibratedOn')
  const dueOn = cells.day('dueOn')
  const foundWithinLimits = cells.yesNo('foundWithinLimits')
  if (calibratedOn === null || dueOn === null || foundWithinLimits === null) return null
  return {
    ...{ certificateNumber, calibratedOn, dueOn, foundWithinLimits },
    laboratory: cells.text('laboratory'),
    words: cells.text('words') ?? '',
  }
}
