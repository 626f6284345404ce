import type { studies } from '@evenrule/api/contract'
import type { ClauseResult } from '../results'
import { countingData, resultsByTask } from '../studies/studyText'
import type { ReadSubmission } from '../submissions/reading'

/** The readings of one study that a what-if may leave some of out, each as it was entered. */
export interface WhatIfStudy {
  code: string
  texts: readonly string[]
  dataSha256: string
}

/** A clause result with the study whose readings it rests on; null where it rests on none. */
export interface WhatIfResult extends ClauseResult {
  study: string | null
}

/** What a what-if starts from: results that stand, and nothing else. */
export interface WhatIfBase {
  /** Tells one base from every other, so that what was tried is found again after a reload. */
  key: string
  /** SHA-256 of the frozen text; null where nothing is frozen, and nothing can be quoted. */
  submissionSha256: string | null
  studies: readonly WhatIfStudy[]
  results: readonly WhatIfResult[]
  /** The engine that the results name; null where nothing can be quoted. */
  engine: { version: string; sha256: string } | null
}

/** The base of a what-if on a submission: its frozen text and evaluations. */
export function submissionBase({ submission, content, results }: ReadSubmission): WhatIfBase {
  const [first] = submission.evaluations
  return {
    key: `submission.${submission.id}.${submission.sha256}`,
    submissionSha256: submission.sha256,
    studies: content.studies.map(({ code, data }) => ({
      code,
      texts: data.readings,
      dataSha256: data.sha256,
    })),
    results: results.map((result) => ({
      ...result,
      study: content.clauses.find(({ clauseKey }) => clauseKey === result.clauseKey)?.study ?? null,
    })),
    engine: first ? { version: first.engineVersion, sha256: first.engineSha256 } : null,
  }
}

/** The bases of what-ifs on a study's own result: one for each measuring task that has clauses. */
export function studyBases(study: studies.Study): { taskId: string; base: WhatIfBase }[] {
  const data = countingData(study)
  if (!data) return []
  return resultsByTask(study)
    .filter(({ results }) => results.length > 0)
    .map(({ task, results }) => ({
      taskId: task.taskId,
      base: {
        key: `study.${study.id}.${task.taskId}.${data.sha256}`,
        submissionSha256: null,
        studies: [{ code: study.code, texts: data.texts, dataSha256: data.sha256 }],
        results: results.map((result) => ({ ...result, study: result.input.data ? study.code : null })),
        engine: null,
      },
    }))
}
