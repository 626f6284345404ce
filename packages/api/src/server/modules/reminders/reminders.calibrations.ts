import { and, desc, eq, isNull, lte } from 'drizzle-orm'
import { dayInWords, daysBetween } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { calibrations, gauges, referenceStandards } from '../gauges/gauges.table'
import { todayOf } from '../organisations/organisations.lookup.service'
import { inDays, stageOf } from './reminders.stages'
import type { Reminder } from './reminders.types'

const daysBefore = [30, 7]

/** The supplier's gauges and standards whose calibration is due soon, or overdue. */
export async function remindOfCalibrations(tenant: Tenant): Promise<Reminder[]> {
  if (tenant.side === 'customer') return []
  const today = await todayOf(tenant)
  const due = [
    ...(await selectDue(tenant, gauges, calibrations.gaugeId, today)).map((row) => ({
      ...row,
      at: 'gauges',
    })),
    ...(await selectDue(tenant, referenceStandards, calibrations.standardId, today)).map((row) => ({
      ...row,
      at: 'standards',
    })),
  ]
  return due.flatMap(({ id, code, name, dueOn, at }) => {
    const stage = stageOf(dueOn, today, daysBefore)
    if (stage === null) return []
    const left = daysBetween(today, dueOn)
    return [
      {
        kind: stage === 'over' ? 'calibration-overdue' : `calibration-due-${stage}`,
        subjectId: id,
        day: dueOn,
        notice: {
          kind: 'reminder',
          subject:
            stage === 'over'
              ? `Calibration overdue: ${code} ${name}`
              : `Calibration due ${inDays(left)}: ${code} ${name}`,
          body:
            stage === 'over'
              ? `It was due on ${dayInWords(dueOn)}. Readings taken since then are not shown to be in calibration, and acceptances that rest on it are on hold where that is agreed.`
              : `It is due on ${dayInWords(dueOn)}. Enter the new calibration when you have the certificate.`,
          path: `${at}/${id}`,
        },
      } satisfies Reminder,
    ]
  })
}

/** What is in use with the day on which its newest calibration is due. */
async function selectDue(
  { tx, organisationId }: Tenant,
  things: typeof gauges | typeof referenceStandards,
  ofThing: typeof calibrations.gaugeId | typeof calibrations.standardId,
  today: string,
) {
  return tx
    .selectDistinctOn([things.id], {
      id: things.id,
      code: things.code,
      name: things.name,
      dueOn: calibrations.dueOn,
    })
    .from(things)
    .innerJoin(calibrations, and(eq(calibrations.orgId, things.orgId), eq(ofThing, things.id)))
    .where(
      and(eq(things.orgId, organisationId), isNull(things.archivedAt), lte(calibrations.calibratedOn, today)),
    )
    .orderBy(things.id, desc(calibrations.calibratedOn), desc(calibrations.createdAt), desc(calibrations.id))
}
