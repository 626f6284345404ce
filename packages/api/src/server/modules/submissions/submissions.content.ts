import type { FrozenClauseResult, FrozenStudy, SubmissionContent } from '../../../contract/submission-content'
import type { StoredEvaluation } from '../../integrations/engines'
import type { FileRow } from '../files/files.repository'
import type { CalibrationOnDay } from '../gauges/gauges.lookup.service'
import { sha256 } from '../record/record.append'
import type { StudyOfTask } from '../studies/studies.results.service'
import type { FrozenClause } from '../studies/studies.table'

/** One clause in force and what judges it: the study that answers it, or none. */
export interface ToJudge {
  frozen: FrozenClause
  study: StudyOfTask | null
}

/**
 * Which version of each clause in force judges, and on which study. The newest of the chosen studies that froze a
 * clause of the same key at its registration answers it, and then the clause as it was frozen counts: a later version
 * never judges a study again. A clause that no study answers is judged as it is in force today, on no study.
 */
export function whatJudges(inForce: readonly FrozenClause[], studies: readonly StudyOfTask[]): ToJudge[] {
  const newestFirst = [...studies].sort((a, b) => byRegistration(b, a))
  return inForce.map((clause) => {
    for (const study of newestFirst) {
      const frozen = study.task.criteria.find((each) => each.clauseKey === clause.clauseKey)
      if (frozen) return { frozen, study }
    }
    return { frozen: clause, study: null }
  })
}

/** Order of registration; ids, which rise with time, decide within one millisecond. */
export const byRegistration = ({ study: a }: StudyOfTask, { study: b }: StudyOfTask): number =>
  a.registeredAt.localeCompare(b.registeredAt) || a.id.localeCompare(b.id)

/** A clause result as the frozen text names it. */
export function frozenResult(
  { frozen, study }: ToJudge,
  stored: StoredEvaluation,
  verdict: FrozenClauseResult['verdict'],
): FrozenClauseResult {
  const { clauseKey, clause, agreementNumber, versionNumber, versionId, scope } = frozen
  const { inputText, outputSha256, engineVersion, engineSha256 } = stored
  return {
    ...{ clauseKey, clause, agreementNumber, versionNumber, versionId, scope },
    study: study?.study.code ?? null,
    verdict,
    inputSha256: sha256(inputText),
    ...{ outputSha256, engineVersion, engineSha256 },
  }
}

const calibrated = (calibration: CalibrationOnDay | null) => {
  if (!calibration) return null
  const { certificateNumber, calibratedOn, dueOn } = calibration
  return { certificateNumber, calibratedOn, dueOn }
}

/** A study as the customer gets it: no names, and nothing of the supplier's working rows. */
export function frozenStudy(
  { study, task, data, standard, calibration }: StudyOfTask,
  readingsFile: FileRow | undefined,
): FrozenStudy {
  const { code, kind, registeredAt, registeredBeforehand, plannedReadings, unit, measuredAs } = study
  const { revision, source, collectedOn, appraiser, texts, sha256: hash } = data
  const { certifiedValue, expandedUncertainty, coverageFactor } = standard
  return {
    ...{ code, kind, attempt: task.attempt, registeredAt, registeredBeforehand, plannedReadings },
    ...{ unit, measuredAs },
    standard: {
      ...{ code: standard.code, name: standard.name, certifiedValue, unit: standard.unit },
      ...{ expandedUncertainty, coverageFactor },
    },
    calibration: { gauge: calibrated(calibration.gauge), standard: calibrated(calibration.standard) },
    data: {
      ...{ revision, source, collectedOn, appraiser, readings: texts, sha256: hash },
      fileSha256: readingsFile?.sha256 ?? null,
    },
  }
}

/** Every version that judges a clause, once, with its first day in force. */
export function versionsOf(
  judged: readonly ToJudge[],
  effectiveOn: ReadonlyMap<string, string>,
): SubmissionContent['agreements'] {
  const versions = new Map<string, SubmissionContent['agreements'][number]>()
  for (const { frozen } of judged) {
    const day = effectiveOn.get(frozen.versionId)
    if (day === undefined) throw new Error(`The agreement version ${frozen.versionId} has no first day.`)
    const { agreementNumber, versionNumber, versionId, scope, versionSha256 } = frozen
    versions.set(versionId, {
      ...{ agreementNumber, versionNumber, versionId, scope },
      ...{ effectiveOn: day, sha256: versionSha256 },
    })
  }
  return [...versions.values()].sort(
    (a, b) => a.agreementNumber - b.agreementNumber || a.versionNumber - b.versionNumber,
  )
}
