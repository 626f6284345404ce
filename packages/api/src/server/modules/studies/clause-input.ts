import {
  convert,
  type ByHandFacts,
  type CalibrationFacts,
  type Clause,
  type ClauseInput,
  type StudyData,
} from '@evenrule/metrology'
import { toCharacteristic } from '../parts/parts.lookup.service'
import type { StudyOfTask } from './studies.results.service'
import type { FrozenCharacteristic } from './studies.table'

export interface ClauseInputFacts {
  clause: Clause
  characteristic: FrozenCharacteristic
  gauge: { resolution: string; unit: string }
  /** The study the clause is judged on; null where there is none. */
  study: StudyOfTask | null
  /** Studies registered on the task since criteria came into force, this one included. */
  attempts: number
  /** What a person judged on a document; null where nobody has. */
  byHand?: ByHandFacts | null
}

/**
 * The computation's input for one clause: the one home of turning frozen rows into numbers. Everything is converted
 * exactly, in decimal, into the characteristic's unit.
 */
export function clauseInputOf({
  clause,
  characteristic,
  gauge,
  study,
  attempts,
  byHand = null,
}: ClauseInputFacts): ClauseInput {
  return {
    kind: 'clause',
    clause,
    ...toCharacteristic(characteristic, { resolution: gauge.resolution, gaugeUnit: gauge.unit }),
    design: study && { registeredBeforehand: study.study.registeredBeforehand, attempts },
    calibration: study && calibrationOf(study),
    data: study && dataOf(study, characteristic.unit),
    // Only a clause that is judged by hand knows of it.
    ...(clause.type === 'by-hand' ? { byHand } : {}),
  }
}

function calibrationOf({ data, calibration }: StudyOfTask): CalibrationFacts {
  const windowOf = (of: StudyOfTask['calibration']['gauge']) =>
    of && { calibratedOn: of.calibratedOn, dueOn: of.dueOn }
  return {
    collectedOn: data.collectedOn,
    gauge: windowOf(calibration.gauge),
    standard: windowOf(calibration.standard),
  }
}

/**
 * Readings and reference value. Deviations from the standard are differences from its certified value already, so
 * they are judged against a reference of 0 as they were read; the standard's uncertainty counts all the same.
 */
function dataOf({ study, data, standard }: StudyOfTask, unit: string): StudyData {
  const reference =
    study.measuredAs === 'deviation' ? 0 : converted(Number(standard.certifiedValue), standard.unit, unit)
  const { expandedUncertainty, coverageFactor } = standard
  return {
    kind: 'bias',
    readings: data.values.map((value) => converted(value, study.unit, unit)),
    reference: {
      value: reference,
      ...(expandedUncertainty === null
        ? {}
        : {
            standardUncertainty:
              converted(Number(expandedUncertainty), standard.unit, unit) / Number(coverageFactor),
          }),
    },
  }
}

/** Registration refuses units of different quantities, so a value that cannot be converted is a fault of ours. */
function converted(value: number, from: string, to: string): number {
  const result = convert(value, from, to)
  if (result === null) throw new Error(`A study in ${from} was registered for a characteristic in ${to}.`)
  return result
}
