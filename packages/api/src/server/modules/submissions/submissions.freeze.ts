import type { Clause, ByHandFacts } from '@evenrule/metrology'
import { summaryOf, type SubmissionContent } from '../../../contract/submission-content'
import type { Tenant } from '../../db/tenant'
import { fileById } from '../files/files.service'
import { canonicalText, sha256 } from '../record/record.append'
import { clauseInputOf } from '../studies/clause-input'
import type { StudyOfTask } from '../studies/studies.results.service'
import { advisoryResult, frozenResult, frozenStudy, type ToJudge } from './submissions.content'
import type { ChosenStudy } from './submissions.draft.repository'
import type { FileToFreeze, ToFreeze } from './submissions.frozen.repository'

/** A file of a text to be frozen, and the file of the supplier's own that it is. */
export interface FileOfText extends FileToFreeze {
  ownFileId?: string
}

/** What a signature would freeze, with what the signing has to know of it. */
export interface Frozen extends ToFreeze, ReturnType<typeof summaryOf> {
  content: SubmissionContent
  files: FileOfText[]
  /** The studies it rests on, in the revisions it would freeze. */
  chosen: ChosenStudy[]
  /** Those who took the readings. */
  takenBy: string[]
}

/** Everything that a text is made from, but for what follows from it: results, studies and files. */
export interface Basis {
  content: Omit<SubmissionContent, 'clauses' | 'advisory' | 'studies' | 'files'>
  judged: readonly ToJudge[]
  advisory: readonly ToJudge<{ clauseKey: string; clause: Clause }>[]
  studies: readonly StudyOfTask[]
  /** The documents on which clauses were judged by hand. */
  documents: readonly FileOfText[]
}

/** Judges every clause and puts the text together; stores nothing. */
export async function freeze(tenant: Tenant, basis: Basis): Promise<Frozen> {
  const { judged, advisory, studies, documents } = basis
  const results = await evaluateAll(tenant, basis.content, judged)
  const informing = await evaluateAll(tenant, basis.content, advisory)
  const files = [...(await filesOf(tenant, studies)), ...documents]
  const readingsOf = await readingsFiles(tenant, studies)
  const content: SubmissionContent = {
    ...basis.content,
    clauses: results.map(({ each, stored, verdict }) => frozenResult(each, stored, verdict)),
    advisory: informing.map(({ each, stored, verdict }) => advisoryResult(each, stored, verdict)),
    studies: studies.map((study) => frozenStudy(study, readingsOf.get(study.study.id))),
    files: files.map(({ role, name, contentType, size, sha256: hash }) => ({
      ...{ role, name, contentType, size, sha256: hash },
    })),
  }
  const text = canonicalText(content)
  const rowsOf = (evaluated: typeof results | typeof informing, isAdvisory: boolean) =>
    evaluated.map(({ each: { named }, stored, verdict }) => ({
      ...{ clauseKey: named.clauseKey, advisory: isAdvisory, verdict },
      ...stored,
    }))
  return {
    ...{ content, text, sha256: sha256(text), revision: content.revision, files },
    ...summaryOf(content),
    clauses: [...rowsOf(results, false), ...rowsOf(informing, true)],
    chosen: studies.map(({ study, data }) => ({ studyId: study.id, dataId: data.id })),
    takenBy: [...new Set(studies.flatMap(({ data }) => data.takenBy))],
  }
}

async function evaluateAll<C extends { clauseKey: string; clause: Clause }>(
  tenant: Tenant,
  content: Basis['content'],
  toJudge: readonly ToJudge<C>[],
) {
  const evaluated = []
  for (const each of toJudge) {
    const { named, study } = each
    const { output, stored } = await tenant.services.engines.evaluateClause(
      clauseInputOf({
        clause: named.clause,
        characteristic: study?.task.characteristic ?? content.characteristic,
        // What is judged is what the text names: of each study its own, of the rest the task's.
        gauge: study?.study.gauge ?? {
          resolution: content.task.gaugeResolution,
          unit: content.task.gaugeUnit,
        },
        study,
        attempts: content.attempts.length,
        byHand: byHandOf(content, named.clauseKey),
      }),
    )
    evaluated.push({ each, stored, verdict: output.verdict })
  }
  return evaluated
}

function byHandOf({ byHand }: Pick<SubmissionContent, 'byHand'>, key: string): ByHandFacts | null {
  const found = byHand.find(({ clauseKey }) => clauseKey === key)
  return found
    ? { verdict: found.verdict, reason: found.reason, documentSha256: found.document.sha256 }
    : null
}

/** The file that the readings of each study were read from, where there is one. */
async function readingsFiles(tenant: Tenant, studies: readonly StudyOfTask[]) {
  const files = new Map<string, { sha256: string }>()
  for (const { study, data } of studies)
    if (data.fileId) files.set(study.id, await fileById(tenant, data.fileId))
  return files
}

/** The files that go with the studies, each once: readings as uploaded, and the certificates of the day. */
async function filesOf(tenant: Tenant, studies: readonly StudyOfTask[]): Promise<FileOfText[]> {
  const roles = ['readings', 'gauge-certificate', 'standard-certificate'] as const
  const found: FileOfText[] = []
  for (const role of roles) {
    const ids = studies.map(({ data, calibration }) =>
      role === 'readings'
        ? data.fileId
        : (role === 'gauge-certificate' ? calibration.gauge : calibration.standard)?.fileId,
    )
    for (const id of new Set(ids)) if (id) found.push({ role, ...asFrozenFile(await fileById(tenant, id)) })
  }
  return found
}

/** What is frozen of a file of this organisation. */
export const asFrozenFile = ({
  id: ownFileId,
  name,
  contentType,
  size,
  sha256: hash,
  storageKey,
}: Awaited<ReturnType<typeof fileById>>): Omit<FileOfText, 'role'> => ({
  ...{ ownFileId, name, contentType, size, sha256: hash, storageKey },
})
