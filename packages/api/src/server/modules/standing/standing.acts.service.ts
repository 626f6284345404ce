import type { AnswerInputOf, BodyOf } from '../../../contract/define'
import { allows } from '../../../contract/access'
import type { readStanding, reinstate, StandingEntry } from '../../../contract/standings'
import type { Standing } from '../../../contract/standing'
import { dayIn } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { namesOfPeople } from '../organisations/people.repository'
import { sha256 } from '../record/record.append'
import { relationshipById } from '../relationships/relationships.lookup.service'
import { about, tell } from '../submissions/submissions.messages'
import { lockedSubmission, recordSubmission, submissionById } from '../submissions/submissions.move.service'
import { insertReinstatement } from './standing.acts.repository'
import { notSuspended } from './standing.errors'
import {
  selectCalibrationFacts,
  selectCarryOvers,
  selectEventFacts,
  selectNewerRevisions,
  selectReinstatements,
} from './standing.repository'
import { standingsOf } from './standing.service'

/** How a submission stands today and what happened to it since it was signed, the latest first. */
export async function readStandingOf(
  tenant: Tenant,
  submissionId: string,
): Promise<AnswerInputOf<typeof readStanding>> {
  const submission = await submissionById(tenant, submissionId)
  const { timeZone } = await relationshipById(tenant, submission.relationshipId)
  const standing = (await standingsOf(tenant, [submissionId])).get(submissionId) ?? null
  return {
    standing,
    entries: await entriesOf(tenant, submissionId, timeZone),
    mayReinstate: standing?.state === 'suspended' && allows('reviews.approve', tenant.side, tenant.roles),
  }
}

/** The customer's approver lets a suspended acceptance stand again; that lifts what was reported until now. */
export async function reinstateSubmission(
  tenant: Tenant,
  submissionId: string,
  { words }: BodyOf<typeof reinstate>,
): Promise<{ standing: Standing }> {
  const submission = await lockedSubmission(tenant, submissionId)
  const before = (await standingsOf(tenant, [submissionId])).get(submissionId)
  if (before?.state !== 'suspended') throw notSuspended()
  await insertReinstatement(tenant, submission, words)
  const eventId = before.cause?.kind === 'gauge-event' ? before.cause.eventId : null
  recordSubmission(tenant, submission, 'submission.reinstated', {
    eventId,
    wordsSha256: sha256(words),
  })
  await tell(
    tenant,
    submission,
    'other side',
    'standing',
    about('customer', {
      subject: 'Stands again',
      body: ['The acceptance was reinstated. The reason given:', words],
    }),
  )
  const standing = (await standingsOf(tenant, [submissionId])).get(submissionId)
  if (!standing) throw notSuspended()
  return { standing }
}

async function entriesOf(tenant: Tenant, submissionId: string, timeZone: string): Promise<StandingEntry[]> {
  const ids = [submissionId]
  const day = (instant: string) => dayIn(timeZone, instant)
  const reinstated = await selectReinstatements(tenant, ids)
  const carried = await selectCarryOvers(tenant, ids)
  const names = await namesOfPeople(tenant, [
    ...reinstated.map(({ reinstatedBy }) => reinstatedBy),
    ...carried.map(({ carriedBy }) => carriedBy),
  ])
  const labels = new Map(
    (await selectNewerRevisions(tenant, ids)).map(({ revision }) => [revision.id, revision.label]),
  )
  const entries: StandingEntry[] = [
    ...(await selectCalibrationFacts(tenant, ids)).map((row) => ({
      ...row,
      kind: 'calibration' as const,
      on: row.calibratedOn,
    })),
    ...(await selectEventFacts(tenant, ids)).map((row) => ({
      ...row,
      kind: 'gauge-event' as const,
      event: row.kind,
      on: row.happenedOn,
    })),
    ...reinstated.map(({ words, reinstatedBy, reinstatedAt }) => ({
      ...{ kind: 'reinstated' as const, on: day(reinstatedAt), words },
      ...{ by: names.get(reinstatedBy) ?? null, enteredAt: reinstatedAt },
    })),
    ...carried.map(({ revisionId, carriedBy, carriedAt }) => ({
      ...{ kind: 'carried-over' as const, on: day(carriedAt), revision: labels.get(revisionId) ?? '' },
      ...{ by: names.get(carriedBy) ?? null, enteredAt: carriedAt },
    })),
  ]
  return entries.sort((a, b) => (a.enteredAt < b.enteredAt ? 1 : a.enteredAt > b.enteredAt ? -1 : 0))
}
