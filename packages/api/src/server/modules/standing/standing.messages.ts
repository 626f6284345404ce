import type { Side } from '../../../contract/access'
import type { GaugeEventKind } from '../../../contract/standing'
import type { CarryOver } from '../../../contract/standings'
import { dayInWords } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import type { GaugeEventRow } from '../gauges/gauge-events.repository'
import { workingRoles } from '../notifications/notifications.send'
import { sha256 } from '../record/record.append'
import type { PartRow } from '../parts/parts.repository'
import { recordSubmission } from '../submissions/submissions.move.service'
import type { ConcernedSubmission } from './standing.share.repository'

/** What happened to a gauge, in the past tense. */
export const eventInWords: Record<GaugeEventKind, string> = {
  'reported-out-of-limits': 'was found out of limits',
  repaired: 'was repaired',
  moved: 'was moved',
  changed: 'was changed (software or fixture)',
}

type Effect = 'suspended' | 'stays' | null
type Affected = ConcernedSubmission & { effect: Effect }

const countOf = (n: number, one: string, many: string): string => `${n} ${n === 1 ? one : many}`

const lineOf = ({ submission, partNumber, characteristicNumber, characteristicName }: ConcernedSubmission) =>
  `Submission ${submission.number}: ${partNumber} no. ${characteristicNumber} ${characteristicName}`

const effectWords: Record<'suspended' | 'stays' | 'review', string> = {
  suspended: 'is suspended',
  stays: 'stays accepted, as agreed',
  review: 'is under review; decide knowing it',
}

/**
 * Tells both sides of what happened to a gauge: the customers each of their own submissions, the supplier's people of
 * all. Every submission concerned keeps an event in the record.
 */
export function tellOfEvent(
  tenant: Tenant,
  { code }: { code: string },
  event: GaugeEventRow & { inDoubtSince: string | null },
  affected: readonly Affected[],
): void {
  const { kind, happenedOn, inDoubtSince, words } = event
  const said = `${code} ${eventInWords[kind]} on ${dayInWords(happenedOn)}.`
  const doubt = inDoubtSince
    ? `What was measured since ${dayInWords(inDoubtSince)}, the day of its last good calibration, is in doubt.`
    : ''
  for (const { submission, effect } of affected)
    recordSubmission(
      tenant,
      submission,
      effect === 'suspended' ? 'submission.suspended' : 'submission.gauge-event',
      {
        ...{ eventId: event.id, kind, happenedOn, inDoubtSince, gauge: code },
        // Words of people stay outside the chain; their hash proves them.
        wordsSha256: sha256(words),
      },
    )
  for (const own of byRelationship(affected)) {
    const suspended = own.filter(({ effect }) => effect === 'suspended').length
    const subject =
      suspended > 0
        ? `${countOf(suspended, 'acceptance', 'acceptances')} suspended: ${said.slice(0, -1)}`
        : said.slice(0, -1)
    const lines = own.map((each) => `${lineOf(each)} ${effectWords[each.effect ?? 'review']}.`)
    notifyOf(tenant, 'customer', own, subject, [said, `“${words}”`, doubt, ...lines])
  }
  const suspended = affected.filter(({ effect }) => effect === 'suspended')
  if (affected.length > 0)
    notifyOf(
      tenant,
      'supplier',
      affected,
      `${said.slice(0, -1)}: ${countOf(suspended.length, 'acceptance', 'acceptances')} suspended`,
      [
        said,
        `“${words}”`,
        doubt,
        ...affected.map(
          (each) => `${each.customer}: ${lineOf(each)} ${effectWords[each.effect ?? 'review']}.`,
        ),
      ],
    )
}

/** Tells both sides of acceptances that were on hold and stand again by a calibration. */
export function tellOfStandingAgain(
  tenant: Tenant,
  code: string,
  { calibratedOn, dueOn }: { calibratedOn: string; dueOn: string },
  lifted: readonly ConcernedSubmission[],
): void {
  const said = `${code} was calibrated on ${dayInWords(calibratedOn)} and found within limits; due again ${dayInWords(dueOn)}.`
  for (const { submission } of lifted)
    recordSubmission(tenant, submission, 'submission.hold-lifted', { calibratedOn, dueOn, gauge: code })
  for (const own of byRelationship(lifted)) {
    const subject = `${countOf(own.length, 'acceptance stands', 'acceptances stand')} again: ${code} calibrated`
    const lines = own.map((each) => `${lineOf(each)} is no longer on hold.`)
    for (const side of ['customer', 'supplier'] as const)
      notifyOf(tenant, side, own, subject, [said, ...lines])
  }
}

/** Tells the supplier which acceptances the customer carried over to a newer revision of a part. */
export function tellOfCarryOver(
  tenant: Tenant,
  part: PartRow,
  revision: string,
  carried: readonly CarryOver[],
): void {
  tenant.notify({
    organisationId: part.supplierOrgId,
    side: 'supplier',
    roles: workingRoles.supplier,
    kind: 'standing',
    subject: `${countOf(carried.length, 'acceptance', 'acceptances')} carried over to ${part.number} ${revision}`,
    body: [
      'The limits of these characteristics did not change, so what was accepted holds for the new revision too.',
      ...carried.map(
        ({ number, characteristicNumber, characteristicName }) =>
          `Submission ${number}: no. ${characteristicNumber} ${characteristicName}`,
      ),
    ].join('\n\n'),
    path: `parts/${part.id}`,
  })
}

/** Tells the other side that a newer revision of a part reopened what was accepted for the one before. */
export function tellOfReopened(
  tenant: Tenant,
  part: PartRow,
  revision: string,
  reopened: readonly { number: number | null; unchanged: boolean }[],
): void {
  const unchanged = reopened.filter((each) => each.unchanged).length
  for (const side of ['supplier', 'customer'] as const)
    tenant.notify({
      organisationId: side === 'supplier' ? part.supplierOrgId : part.customerOrgId,
      side,
      roles: workingRoles[side],
      kind: 'standing',
      subject: `${part.number} ${revision}: ${countOf(reopened.length, 'acceptance', 'acceptances')} reopened`,
      body: [
        `Revision ${revision} of ${part.number} was added. What was accepted for the revision before does not hold for it by itself.`,
        unchanged > 0
          ? `${countOf(unchanged, 'acceptance rests', 'acceptances rest')} on limits that did not change: an approver of the customer can carry ${unchanged === 1 ? 'it' : 'them'} over on the page of the part.`
          : '',
      ]
        .filter((line) => line !== '')
        .join('\n\n'),
      path: `parts/${part.id}`,
    })
}

/** One message about submissions of one relationship (or, to the supplier, of several). */
function notifyOf(
  tenant: Tenant,
  side: Side,
  about: readonly ConcernedSubmission[],
  subject: string,
  body: readonly string[],
): void {
  const [first] = about
  if (!first) return
  const { submission } = first
  tenant.notify({
    organisationId: side === 'supplier' ? submission.supplierOrgId : submission.customerOrgId,
    side,
    roles: workingRoles[side],
    kind: 'standing',
    subject,
    body: body.filter((line) => line !== '').join('\n\n'),
    path: about.length === 1 ? `submissions/${submission.id}` : 'submissions',
  })
}

function byRelationship<C extends ConcernedSubmission>(all: readonly C[]): C[][] {
  const ids = [...new Set(all.map(({ submission }) => submission.relationshipId))]
  return ids.map((id) => all.filter(({ submission }) => submission.relationshipId === id))
}
