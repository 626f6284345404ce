import { summaryOf, type SubmissionContent } from '../../../contract/submission-content'
import { dayIn } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { criteriaFor, criteriaSince } from '../agreements/agreements.apply.service'
import { fileById } from '../files/files.service'
import { gaugeById } from '../gauges/gauges.lookup.service'
import { frozenCharacteristic, taskById } from '../parts/parts.lookup.service'
import { partRow } from '../parts/parts.service'
import { canonicalText, sha256 } from '../record/record.append'
import { partiesOf as partyNames, relationshipById } from '../relationships/relationships.lookup.service'
import { clauseInputOf } from '../studies/clause-input'
import { attemptsOn, resultsForTask, type StudyOfTask } from '../studies/studies.results.service'
import {
  byRegistration,
  frozenResult,
  frozenStudy,
  versionsOf,
  whatJudges,
  type ToJudge,
} from './submissions.content'
import { selectChosen, selectEffectiveDays, type ChosenStudy } from './submissions.draft.repository'
import type { insertFrozen } from './submissions.frozen.repository'
import { nextNumber, type SubmissionRow } from './submissions.repository'

type ToFreeze = Parameters<typeof insertFrozen>[2]

/** What signing now would freeze. */
export interface Prepared extends ToFreeze, ReturnType<typeof summaryOf> {
  content: SubmissionContent
  /** The studies it rests on, in the revisions it would freeze. */
  chosen: ChosenStudy[]
  /** Those who took the readings; none of them may sign. */
  takenBy: string[]
  /** Every computed study of the task, to choose from. */
  studies: StudyOfTask[]
}

/** Computes everything that signing now would freeze; stores nothing. The supplier's alone. */
export async function whatSigningFreezes(tenant: Tenant, submission: SubmissionRow): Promise<Prepared> {
  const { relationshipId, taskId, partId, characteristicId } = submission
  const relationship = await partiesOf(tenant, relationshipId)
  const criteriaOn = dayIn(relationship.timeZone, tenant.now)
  const scope = { relationshipId, partId, characteristicId, on: criteriaOn }
  const task = await taskById(tenant, taskId)
  const gauge = await gaugeById(tenant, task.gaugeId)
  const characteristic = await frozenCharacteristic(tenant, characteristicId)
  const part = await partRow(tenant, partId)

  const studies = await resultsForTask(tenant, taskId)
  const chosenIds = (await selectChosen(tenant, submission.id)).map(({ studyId }) => studyId)
  const chosen = studies.filter(({ study }) => chosenIds.includes(study.id)).sort(byRegistration)
  const attemptsSince = await criteriaSince(tenant, scope)
  const attempts = await attemptsOn(tenant, taskId, attemptsSince)

  const judged = whatJudges(await criteriaFor(tenant, scope), chosen)
  const clauses = []
  for (const each of judged) {
    const { output, stored } = await tenant.services.engines.evaluateClause(
      clauseInputOf({
        clause: each.frozen.clause,
        characteristic: each.study?.task.characteristic ?? characteristic,
        gauge: each.study?.study.gauge ?? gauge,
        study: each.study,
        attempts: attempts.length,
      }),
    )
    clauses.push({ judged: each, stored, verdict: output.verdict })
  }
  const files = await filesOf(tenant, chosen)

  const content: SubmissionContent = {
    format: 'evenrule.submission/1',
    number: await nextNumber(tenant, relationshipId),
    criteriaOn,
    relationship,
    characteristic,
    part: { id: part.id, name: part.name },
    task: {
      id: task.id,
      gaugeCode: gauge.code,
      gaugeName: gauge.name,
      gaugeResolution: gauge.resolution,
      gaugeUnit: gauge.unit,
      site: task.site,
      processStep: task.processStep,
    },
    agreements: versionsOf(judged, await effectiveDays(tenant, relationshipId, judged)),
    clauses: clauses.map((each) => frozenResult(each.judged, each.stored, each.verdict)),
    studies: chosen.map((study) =>
      frozenStudy(study, files.find(({ row }) => row.id === study.data.fileId)?.row),
    ),
    attemptsSince,
    attempts: attempts.map(
      ({ code, registeredAt, registeredBeforehand, state, collectedOn, abandonReason }) => ({
        ...{ code, registeredAt, registeredBeforehand, state, collectedOn, abandonReason },
      }),
    ),
    files: files.map(({ role, row: { name, contentType, size, sha256: hash } }) => ({
      ...{ role, name, contentType, size, sha256: hash },
    })),
  }
  const text = canonicalText(content)
  return {
    content,
    text,
    sha256: sha256(text),
    ...summaryOf(content),
    clauses: clauses.map(({ judged: { frozen }, stored, verdict }) => ({
      clauseKey: frozen.clauseKey,
      verdict,
      ...stored,
    })),
    files: files.map(({ role, row }) => ({
      ...{ role, name: row.name, contentType: row.contentType, size: row.size },
      ...{ sha256: row.sha256, storageKey: row.storageKey },
    })),
    chosen: chosen.map(({ study, data }) => ({ studyId: study.id, dataId: data.id })),
    takenBy: [...new Set(chosen.flatMap(({ data }) => data.takenBy))],
    studies,
  }
}

/** The relationship of a submission with the names of its parties, as the text freezes it. */
export async function partiesOf(tenant: Tenant, relationshipId: string) {
  const relationship = await relationshipById(tenant, relationshipId)
  return {
    id: relationship.id,
    ...(await partyNames(tenant, relationship)),
    timeZone: relationship.timeZone,
  }
}

const effectiveDays = (tenant: Tenant, relationshipId: string, judged: readonly ToJudge[]) =>
  selectEffectiveDays(
    tenant,
    relationshipId,
    judged.map(({ frozen }) => frozen.versionId),
  )

/** The files that go with the chosen studies, each once: readings as uploaded, and the certificates of the day. */
async function filesOf(tenant: Tenant, chosen: readonly StudyOfTask[]) {
  const roles = ['readings', 'gauge-certificate', 'standard-certificate'] as const
  const found = []
  for (const role of roles) {
    const ids = chosen.map(({ data, calibration }) =>
      role === 'readings'
        ? data.fileId
        : (role === 'gauge-certificate' ? calibration.gauge : calibration.standard)?.fileId,
    )
    for (const id of new Set(ids)) if (id) found.push({ role, row: await fileById(tenant, id) })
  }
  return found
}
