import { clauseDescriptor, clauseKey, judgeClause, readClause } from '../clauses'
import { characteristicOf, readCommon, type CommonFields } from '../input/common'
import { InvalidInput } from '../input/invalid-input'
import type { Reader } from '../input/reader'
import type { BiasOutput, Characteristic, Clause, ClauseOutput, StudyOptions, WarningCode } from '../types'
import { bias, readReference } from './bias'
import { readByHand, readCalibration, readDesignFacts } from './judge'

/** Warnings of a study about inputs that its clause does not use. */
const aboutUnusedInputs: readonly WarningCode[] = ['no-margin', 'no-tolerance', 'one-sided-tolerance']

/**
 * One clause of a submission, from the raw readings to the verdict: the study is evaluated with the confidence and
 * the margin of the clause, then judged. What server and browser compute and compare byte for byte.
 */
export function clause(reader: Reader): ClauseOutput {
  const common = readCommon(reader)
  if (common.unit === undefined)
    throw new InvalidInput('missing', 'Give the unit of the readings.', reader.at('unit'))
  const wanted = readClause(reader.object('clause'))
  const characteristic = characteristicOf(common)
  const study = readStudy(reader, common, optionsOf(wanted, characteristic))
  const judgement = judgeClause(wanted, {
    characteristic,
    design: readDesignFacts(reader),
    calibration: readCalibration(reader),
    study,
    coverageFactor: common.coverageFactor,
    byHand: readByHand(reader),
  })
  const needsStudy = clauseDescriptor(wanted).studyKind !== null
  const warnings = needsStudy && study ? study.warnings : []
  return {
    kind: 'clause',
    clauseKey: clauseKey(wanted),
    ...judgement,
    study,
    warnings: warnings.filter(({ code }) => !aboutUnusedInputs.includes(code)),
  }
}

function optionsOf(wanted: Clause, characteristic: Characteristic): StudyOptions {
  return clauseDescriptor(wanted).options?.(wanted, characteristic) ?? {}
}

function readStudy(reader: Reader, common: CommonFields, options: StudyOptions): BiasOutput | null {
  const data = reader.optionalObject('data')
  if (!data) return null
  data.choice('kind', ['bias'])
  return bias({
    ...common,
    index: { share: 0.2, sigmas: 6 },
    ...options,
    readings: data.numbers('readings', 1),
    reference: readReference(data),
  })
}
