import { clauseKey } from '@evenrule/metrology'
import { dayIn } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { criteriaFor, criteriaSince, termsFor } from '../agreements/agreements.apply.service'
import { gaugeById } from '../gauges/gauges.lookup.service'
import { houseTermsFor } from '../house-terms/house-terms.lookup.service'
import { frozenCharacteristic, taskById } from '../parts/parts.lookup.service'
import { partRow } from '../parts/parts.service'
import { partiesOf as partyNames, relationshipById } from '../relationships/relationships.lookup.service'
import { openRequestsOf } from '../requests/requests.answers.service'
import { attemptsOn, resultsForTask, type StudyOfTask } from '../studies/studies.results.service'
import { byHandOf } from './submissions.by-hand.repository'
import { byRegistration, newestOf, versionsOf, whatJudges, type ToJudge } from './submissions.content'
import { selectChosen, selectEffectiveDays } from './submissions.draft.repository'
import { asFrozenFile, freeze, type Basis, type Frozen } from './submissions.freeze'
import { nextNumber, type SubmissionRow } from './submissions.repository'

/** What signing now would freeze. */
export interface Prepared extends Frozen {
  /** Every computed study of the task, to choose from. */
  studies: StudyOfTask[]
  taskInUse: boolean
}

/** Computes everything that signing now would freeze; stores nothing. The supplier's alone. */
export async function whatSigningFreezes(tenant: Tenant, submission: SubmissionRow): Promise<Prepared> {
  const { relationshipId, taskId } = submission
  const studies = await resultsForTask(tenant, taskId)
  const chosenIds = (await selectChosen(tenant, submission.id)).map(({ studyId }) => studyId)
  const chosen = studies.filter(({ study }) => chosenIds.includes(study.id)).sort(byRegistration)
  const { timeZone, ...parties } = await partiesOf(tenant, relationshipId)
  const on = dayIn(timeZone, tenant.now)
  const criteria = await judgedBy(tenant, submission, on, chosen)
  const byHand = (await byHandOf(tenant, submission.id)).filter(({ entry }) =>
    criteria.judged.some(({ named }) => named.clauseKey === entry.clauseKey),
  )
  const task = await taskById(tenant, taskId)
  const frozen = await freeze(tenant, {
    content: {
      format: 'evenrule.submission/1',
      number: await nextNumber(tenant, relationshipId),
      ...{ revision: 1, corrects: null, criteriaOn: on },
      relationship: { ...parties, timeZone },
      ...(await whatItIsAbout(tenant, submission, chosen)),
      ...criteria.content,
      byHand: byHand.map(({ entry: { clauseKey: key, verdict, reason }, file: { name, sha256 } }) => ({
        ...{ clauseKey: key, verdict, reason, document: { name, sha256 } },
      })),
      requests: (await openRequestsOf(tenant, taskId)).map(({ id, number }) => ({ id, number })),
    },
    judged: criteria.judged,
    advisory: criteria.advisory,
    studies: chosen,
    documents: byHand.map(({ file }) => ({ role: 'document' as const, ...asFrozenFile(file) })),
  })
  return { ...frozen, studies, taskInUse: task.archivedAt === null }
}

/** Part, characteristic and measuring task; the gauge is the one that the newest study was registered with. */
async function whatItIsAbout(
  tenant: Tenant,
  { taskId, partId, characteristicId }: SubmissionRow,
  chosen: readonly StudyOfTask[],
): Promise<Pick<Basis['content'], 'part' | 'characteristic' | 'task'>> {
  const task = await taskById(tenant, taskId)
  const gauge = newestOf(chosen)?.study.gauge ?? (await gaugeById(tenant, task.gaugeId))
  const part = await partRow(tenant, partId)
  return {
    characteristic: await frozenCharacteristic(tenant, characteristicId),
    part: { id: part.id, name: part.name },
    task: {
      ...{ id: task.id, gaugeCode: gauge.code, gaugeName: gauge.name },
      ...{ gaugeResolution: gauge.resolution, gaugeUnit: gauge.unit },
      ...{ site: task.site, processStep: task.processStep },
    },
  }
}

type Criteria = Pick<Basis, 'judged' | 'advisory'> & {
  content: Pick<
    Basis['content'],
    'criteria' | 'agreements' | 'terms' | 'houseTerms' | 'attemptsSince' | 'attempts'
  >
}

/**
 * What judges it on a day: the signed clauses that apply. Where there are none, the customer's house terms are judged
 * for information, on the newest study.
 */
async function judgedBy(
  tenant: Tenant,
  { relationshipId, taskId, partId, characteristicId }: SubmissionRow,
  on: string,
  chosen: readonly StudyOfTask[],
): Promise<Criteria> {
  const scope = { relationshipId, partId, characteristicId, on }
  const judged = whatJudges(await criteriaFor(tenant, scope), chosen)
  const agreed = judged.length > 0
  const attemptsSince = await criteriaSince(tenant, scope)
  const attempts = await attemptsOn(tenant, taskId, attemptsSince)
  const house = agreed ? null : await houseTermsFor(tenant, relationshipId)
  return {
    content: {
      criteria: agreed ? 'agreed' : 'none',
      agreements: versionsOf(judged, await effectiveDays(tenant, relationshipId, judged)),
      terms: (await termsFor(tenant, scope)).values,
      houseTerms: house && { id: house.id, number: house.number, sha256: house.sha256 },
      attemptsSince,
      attempts: attempts.map(
        ({ code, registeredAt, registeredBeforehand, state, collectedOn, abandonReason }) => ({
          ...{ code, registeredAt, registeredBeforehand, state, collectedOn, abandonReason },
        }),
      ),
    },
    judged,
    advisory: (house?.clauses ?? []).map((clause) => ({
      named: { clauseKey: clauseKey(clause), clause },
      study: newestOf(chosen) ?? null,
    })),
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

const effectiveDays = (tenant: Tenant, relationshipId: string, judged: readonly Pick<ToJudge, 'named'>[]) =>
  selectEffectiveDays(
    tenant,
    relationshipId,
    judged.map(({ named }) => named.versionId),
  )
