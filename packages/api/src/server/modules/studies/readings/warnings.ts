import { convert } from '@evenrule/metrology'
import { isMultipleOf } from '../../../../contract/decimal'
import type { ReadingsNote } from '../../../../contract/readings'
import type { StudyRow } from '../studies.repository'
import type { FrozenCharacteristic, FrozenStandard } from '../studies.table'
import { asWritten } from '../../../tables/numbers'

export interface ReadAgainst {
  study: Pick<StudyRow, 'plannedReadings' | 'unit' | 'measuredAs' | 'gauge'>
  standard: Pick<FrozenStandard, 'certifiedValue' | 'unit' | 'code'>
  characteristics: readonly FrozenCharacteristic[]
  /** Readings kept before, which these follow. */
  before: number
}

interface Reading {
  text: string
  value: number
}

const named = 5

const warning = (code: ReadingsNote['code'], message: string, readings: number[] = []): ReadingsNote => ({
  code,
  message,
  readings: readings.slice(0, named),
})

/** What is odd about readings in the light of their study; nothing of it keeps them from being stored. */
export function warningsOf(readings: readonly Reading[], against: ReadAgainst): ReadingsNote[] {
  if (readings.length === 0) return []
  return [
    ...againstPlan(readings.length + against.before, against.study.plannedReadings),
    ...againstResolution(readings, against),
    ...againstReference(readings, against),
  ]
}

function againstPlan(count: number, planned: number): ReadingsNote[] {
  if (count === planned) return []
  const these = count === 1 ? 'This is one reading' : `These are ${count} readings`
  return count > planned
    ? [warning('more-than-planned', `${these}; the study planned ${planned}.`)]
    : [warning('fewer-than-planned', `${these} of the ${planned} planned.`)]
}

/** Numbers, from 1, of the readings for which something holds. */
const numbersWhere = (readings: readonly Reading[], holds: (reading: Reading) => boolean): number[] =>
  readings.flatMap((reading, at) => (holds(reading) ? [at + 1] : []))

function againstResolution(readings: readonly Reading[], { study }: ReadAgainst): ReadingsNote[] {
  const { resolution, unit } = study.gauge
  const step = convert(Number(resolution), unit, study.unit)
  if (step === null) return []
  const finer = numbersWhere(readings, ({ text }) => {
    const digits = asWritten(text)?.digits
    return digits !== undefined && !isMultipleOf(digits, String(step))
  })
  if (finer.length === 0) return []
  return [
    warning(
      'finer-than-resolution',
      `${finer.length === 1 ? 'One reading is' : `${finer.length} readings are`} no multiple of the resolution of ${study.gauge.code}, ${resolution} ${unit}. Check the readings, or the resolution entered for the gauge.`,
      finer,
    ),
  ]
}

/** Readings that look like values where deviations belong, the other way round, or far from the certified value. */
function againstReference(
  readings: readonly Reading[],
  { study, standard, characteristics }: ReadAgainst,
): ReadingsNote[] {
  const certified = convert(Number(standard.certifiedValue), standard.unit, study.unit)
  if (certified === null || certified === 0) return []
  const like = `${standard.code} is certified at ${standard.certifiedValue} ${standard.unit}`
  const nearZero = numbersWhere(readings, ({ value }) => Math.abs(value) < Math.abs(value - certified))
  const most = readings.length / 2
  if (study.measuredAs === 'value' && nearZero.length > most)
    return [
      warning(
        'looks-like-deviations',
        `${like}, but most readings are nearer to zero. If they are deviations from the standard, register the study so.`,
      ),
    ]
  if (study.measuredAs === 'deviation' && readings.length - nearZero.length > most)
    return [
      warning(
        'looks-like-values',
        `Deviations from the standard are expected, but most readings look like values: ${like}.`,
      ),
    ]
  const widths = characteristics.flatMap((each) => widthIn(study.unit, each))
  if (widths.length === 0) return []
  const width = Math.min(...widths)
  const reference = study.measuredAs === 'value' ? certified : 0
  const far = numbersWhere(readings, ({ value }) => Math.abs(value - reference) > width)
  if (far.length === 0) return []
  return [
    warning(
      'far-from-reference',
      `${far.length === 1 ? 'One reading lies' : `${far.length} readings lie`} further from the certified value than the whole tolerance is wide. Check the unit, ${study.unit}, and the decimal marks.`,
      far,
    ),
  ]
}

function widthIn(unit: string, { lowerLimit, upperLimit, unit: own }: FrozenCharacteristic): number[] {
  if (lowerLimit === null || upperLimit === null) return []
  const width = convert(Number(upperLimit) - Number(lowerLimit), own, unit)
  return width === null ? [] : [width]
}
