import { judgeClause, readClause } from '../clauses'
import { characteristicOf, readCommon } from '../input/common'
import { asDay } from '../input/days'
import { InvalidInput } from '../input/invalid-input'
import type { Reader } from '../input/reader'
import type {
  BiasFigures,
  ByHandFacts,
  CalibrationFacts,
  CalibrationWindow,
  DesignFacts,
  JudgeOutput,
} from '../types'

/**
 * The verdict of a clause on a result computed before. `result` is a `bias` output of this contract (or absent);
 * design and calibration clauses are judged on `design` and `calibration`.
 */
export function judge(reader: Reader): JudgeOutput {
  const clause = readClause(reader.object('clause'))
  const common = readCommon(reader)
  const judgement = judgeClause(clause, {
    characteristic: characteristicOf(common),
    design: readDesignFacts(reader),
    calibration: readCalibration(reader),
    study: readResult(reader),
    coverageFactor: common.coverageFactor,
    byHand: readByHand(reader),
  })
  return { kind: 'judge', ...judgement, warnings: [] }
}

function readResult(reader: Reader): BiasFigures | null {
  const source = reader.optionalObject('result')?.ignoreRest()
  if (!source) return null
  source.choice('kind', ['bias'])
  const reference = source.optionalObject('reference')?.ignoreRest()
  const uncertain = source.optionalObject('withUncertainty')?.ignoreRest()
  return {
    n: source.integer('n', { least: 1 }),
    bias: source.optionalNumber('bias') ?? null,
    standardDeviation: source.optionalNumber('standardDeviation', { least: 0 }) ?? null,
    reference: {
      value: reference?.optionalNumber('value') ?? 0,
      standardUncertainty: reference?.optionalNumber('standardUncertainty', { least: 0 }) ?? null,
    },
    withUncertainty: {
      standardUncertainty: uncertain?.optionalNumber('standardUncertainty', { least: 0 }) ?? null,
    },
  }
}

const handVerdicts: readonly ByHandFacts['verdict'][] = ['meets', 'falls-short', 'not-shown']

/** Reads `byHand`, what somebody judged on a document; null where it is not given. */
export function readByHand(reader: Reader): ByHandFacts | null {
  const source = reader.optionalObject('byHand')
  if (!source) return null
  const documentSha256 = source.text('documentSha256')
  if (!/^[0-9a-f]{64}$/.test(documentSha256)) {
    throw new InvalidInput(
      'not-a-hash',
      'Write the SHA-256 of the document as 64 hexadecimal digits.',
      source.at('documentSha256'),
    )
  }
  return { verdict: source.choice('verdict', handVerdicts), reason: source.text('reason'), documentSha256 }
}

/** Reads `design`, how the study came about; null where it is not given. */
export function readDesignFacts(reader: Reader): DesignFacts | null {
  const source = reader.optionalObject('design')
  if (!source) return null
  return {
    registeredBeforehand: source.boolean('registeredBeforehand'),
    attempts: source.integer('attempts', { least: 1 }),
  }
}

/** Reads `calibration`: ISO 8601 days, each window from calibration to due day; null where it is not given. */
export function readCalibration(reader: Reader): CalibrationFacts | null {
  const source = reader.optionalObject('calibration')
  if (!source) return null
  return {
    collectedOn: asDay(source.text('collectedOn'), source.at('collectedOn')),
    gauge: readWindow(source, 'gauge'),
    standard: readWindow(source, 'standard'),
  }
}

function readWindow(reader: Reader, name: string): CalibrationWindow | null {
  const source = reader.optionalObject(name)
  if (!source) return null
  const calibratedOn = asDay(source.text('calibratedOn'), source.at('calibratedOn'))
  const dueOn = asDay(source.text('dueOn'), source.at('dueOn'))
  if (dueOn < calibratedOn) {
    throw new InvalidInput(
      'limits-inverted',
      'The due day must not be before the day of calibration.',
      source.at('dueOn'),
    )
  }
  return { calibratedOn, dueOn }
}
