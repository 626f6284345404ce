import type { Clause } from '@evenrule/metrology'
import type {
  AdvisoryClauseResult,
  FrozenClauseResult,
  FrozenStudy,
  JudgedClause,
  SubmissionContent,
} from '../../../contract/submission-content'
import type { StoredEvaluation } from '../../integrations/engines'
import type { CalibrationOnDay } from '../gauges/gauges.lookup.service'
import { sha256 } from '../record/record.append'
import type { StudyOfTask } from '../studies/studies.results.service'
import type { FrozenClause } from '../studies/studies.table'

/** A signed clause with where it comes from, as the frozen text names it. */
export type SignedClause = Pick<
  FrozenClauseResult,
  'clauseKey' | 'clause' | 'agreementNumber' | 'versionNumber' | 'versionId' | 'scope'
>

/** A clause and what judges it: the study that answers it, or none. */
export interface ToJudge<C extends { clauseKey: string; clause: Clause } = SignedClause> {
  named: C
  study: StudyOfTask | null
}

/**
 * Which version of each clause in force judges, and on which study. The newest of the chosen studies that froze a
 * clause of the same key at its registration answers it, and then the clause as it was frozen counts: a later version
 * never judges a study again. A clause that no study answers is judged as it is in force today, on no study.
 */
export function whatJudges(
  inForce: readonly FrozenClause[],
  studies: readonly StudyOfTask[],
): ToJudge<FrozenClause>[] {
  const newestFirst = [...studies].sort((a, b) => byRegistration(b, a))
  return inForce.map((clause) => {
    for (const study of newestFirst) {
      const frozen = study.task.criteria.find((each) => each.clauseKey === clause.clauseKey)
      if (frozen) return { named: frozen, study }
    }
    return { named: clause, study: null }
  })
}

/** Order of registration; ids, which rise with time, decide within one millisecond. */
export const byRegistration = ({ study: a }: StudyOfTask, { study: b }: StudyOfTask): number =>
  a.registeredAt.localeCompare(b.registeredAt) || a.id.localeCompare(b.id)

/** The newest of some studies; undefined where there is none. */
export const newestOf = (studies: readonly StudyOfTask[]): StudyOfTask | undefined =>
  [...studies].sort((a, b) => byRegistration(b, a))[0]

const judged = (
  { named: { clauseKey, clause }, study }: ToJudge<{ clauseKey: string; clause: Clause }>,
  { inputText, outputSha256, engineVersion, engineSha256 }: StoredEvaluation,
  verdict: JudgedClause['verdict'],
): JudgedClause => ({
  ...{ clauseKey, clause, verdict },
  study: study?.study.code ?? null,
  inputSha256: sha256(inputText),
  ...{ outputSha256, engineVersion, engineSha256 },
})

/** A clause result as the frozen text names it. */
export const frozenResult = (
  each: ToJudge,
  stored: StoredEvaluation,
  verdict: JudgedClause['verdict'],
): FrozenClauseResult => {
  const { agreementNumber, versionNumber, versionId, scope } = each.named
  return { ...judged(each, stored, verdict), agreementNumber, versionNumber, versionId, scope }
}

/** The result of a clause that is judged for information only. */
export const advisoryResult = (
  each: ToJudge<{ clauseKey: string; clause: Clause }>,
  stored: StoredEvaluation,
  verdict: JudgedClause['verdict'],
): AdvisoryClauseResult => judged(each, stored, verdict)

const calibrated = (calibration: CalibrationOnDay | null) => {
  if (!calibration) return null
  const { certificateNumber, calibratedOn, dueOn } = calibration
  return { certificateNumber, calibratedOn, dueOn }
}

/** A study as the customer gets it: no names, and nothing of the supplier's working rows. */
export function frozenStudy(
  { study, task, data, standard, calibration }: StudyOfTask,
  readingsFile: { sha256: string } | undefined,
): FrozenStudy {
  const { code, kind, registeredAt, registeredBeforehand, plannedReadings, unit, measuredAs } = study
  const { revision, reason, source, collectedOn, appraiser, texts, leftOut, sha256: hash } = data
  const { certifiedValue, expandedUncertainty, coverageFactor } = standard
  const { gauge } = study
  return {
    ...{ code, kind, attempt: task.attempt, registeredAt, registeredBeforehand, plannedReadings },
    ...{ unit, measuredAs },
    gauge: { code: gauge.code, name: gauge.name, resolution: gauge.resolution, unit: gauge.unit },
    standard: {
      ...{ code: standard.code, name: standard.name, certifiedValue, unit: standard.unit },
      ...{ expandedUncertainty, coverageFactor },
    },
    calibration: { gauge: calibrated(calibration.gauge), standard: calibrated(calibration.standard) },
    data: {
      ...{ revision, reason, source, collectedOn, appraiser, readings: texts, sha256: hash },
      leftOut: leftOut.map(({ row, column, text }) => ({ row, column, text })),
      fileSha256: readingsFile?.sha256 ?? null,
    },
  }
}

/** Every version that judges a clause, once, with its first day in force. */
export function versionsOf(
  toJudge: readonly ToJudge<FrozenClause>[],
  effectiveOn: ReadonlyMap<string, string>,
): SubmissionContent['agreements'] {
  const versions = new Map<string, SubmissionContent['agreements'][number]>()
  for (const { named } of toJudge) {
    const day = effectiveOn.get(named.versionId)
    if (day === undefined) throw new Error(`The agreement version ${named.versionId} has no first day.`)
    const { agreementNumber, versionNumber, versionId, scope, versionSha256 } = named
    versions.set(versionId, {
      ...{ agreementNumber, versionNumber, versionId, scope },
      ...{ effectiveOn: day, sha256: versionSha256 },
    })
  }
  return [...versions.values()].sort(
    (a, b) => a.agreementNumber - b.agreementNumber || a.versionNumber - b.versionNumber,
  )
}
