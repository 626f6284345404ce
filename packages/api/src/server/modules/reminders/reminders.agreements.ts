import { and, eq, inArray, sql } from 'drizzle-orm'
import { dayIn, dayInWords, daysBetween } from '../../calendar'
import { ownSide } from '../../db/own-side'
import type { Tenant } from '../../db/tenant'
import { approver } from '../agreements/agreements.messages'
import { stateToday } from '../agreements/agreements.states'
import { agreements, agreementSignatures, agreementVersions } from '../agreements/agreements.table'
import { relationships } from '../relationships/relationships.table'
import { inDays, stageOf } from './reminders.stages'
import type { Reminder } from './reminders.types'

const daysBefore = [3]
/** Criteria in force for longer than this are no news to anybody. */
const newsFor = 30

/** Criteria that come into force, for both sides, and agreed ones that lapse soon for want of a signature. */
export async function remindOfAgreements(tenant: Tenant): Promise<Reminder[]> {
  return (await selectVersions(tenant)).flatMap((row) => {
    if (row.effectiveOn === null) return []
    const today = dayIn(row.timeZone, tenant.now)
    return row.state === 'in-force'
      ? inForce(row, row.effectiveOn, today)
      : lapsesSoon(tenant, row, row.effectiveOn, today)
  })
}

type Version = Awaited<ReturnType<typeof selectVersions>>[number]

function inForce(
  { versionId, agreementId, number, ...row }: Version,
  day: string,
  today: string,
): Reminder[] {
  // Signed on its first day or later, the signature itself told of it.
  const signedOn = row.signedAt === null ? day : dayIn(row.timeZone, row.signedAt)
  if (signedOn >= day || daysBetween(day, today) > newsFor) return []
  return [
    {
      kind: 'agreement-in-force',
      subjectId: versionId,
      day,
      notice: {
        kind: 'reminder',
        subject: `In force now: agreement ${number}, version ${row.version}`,
        body: `Since ${dayInWords(day)} these criteria count for studies that are registered from then on.`,
        path: `agreements/${agreementId}`,
      },
    },
  ]
}

function lapsesSoon(tenant: Tenant, row: Version, day: string, today: string): Reminder[] {
  const { versionId, agreementId, number, version, signed, agreedAt, timeZone } = row
  const agreedOn = agreedAt === null ? null : dayIn(timeZone, agreedAt)
  const stage = stageOf(day, today, daysBefore, agreedOn)
  if (stage === null || stage === 'over' || signed) return []
  return [
    {
      kind: `agreement-lapses-${stage}`,
      subjectId: versionId,
      day,
      notice: {
        kind: 'reminder',
        roles: [approver[tenant.side]],
        subject: `Lapses without your signature: agreement ${number}, version ${version}`,
        body: `It is agreed to be in force from ${dayInWords(day)}, ${inDays(daysBetween(today, day))}. Unless an approver of each side has signed it by then, it lapses.`,
        path: `agreements/${agreementId}`,
      },
    },
  ]
}

async function selectVersions(tenant: Tenant) {
  const state = stateToday(tenant)
  const { effectiveOn, agreedAt, signedAt } = agreementVersions
  return tenant.tx
    .select({
      versionId: agreementVersions.id,
      version: agreementVersions.number,
      agreementId: agreements.id,
      number: agreements.number,
      timeZone: relationships.timeZone,
      ...{ state, effectiveOn, agreedAt, signedAt },
      signed: sql<boolean>`exists (select 1 from ${agreementSignatures} g
        where g.relationship_id = ${agreementVersions.relationshipId} and g.version_id = ${agreementVersions.id}
          and g.side = ${tenant.side})`,
    })
    .from(agreementVersions)
    .innerJoin(relationships, eq(relationships.id, agreementVersions.relationshipId))
    .innerJoin(
      agreements,
      and(
        eq(agreements.relationshipId, agreementVersions.relationshipId),
        eq(agreements.id, agreementVersions.agreementId),
      ),
    )
    .where(and(ownSide(tenant, agreementVersions), inArray(state, ['in-force', 'agreed'])))
}
