import type { Side } from '../../../contract/access'
import type { AnswerInputOf, QueryOf } from '../../../contract/define'
import type { listEvents, RecordEvent, RecordSubject, verifyRecord } from '../../../contract/record'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import { namesOfPeople } from '../organisations/people.repository'
import { genesisHash } from './record.append'
import { contentOf, faultOf, type Link } from './record.check'
import {
  isOwnChain,
  selectChainAfter,
  selectChainEnd,
  selectEvents,
  selectOrganisationNames,
  type ChainEnd,
  type EventRow,
} from './record.repository'
import { namesOfSubjects } from './record.subjects.repository'

/** One page of the record, with the names that people and things have today. */
export async function listOfEvents(tenant: Tenant, query: QueryOf<typeof listEvents>) {
  if (query.chainId && !(await isOwnChain(tenant, query.chainId))) throw notFound('record')
  return paged(
    query,
    (page) => selectEvents(tenant, page),
    (rows) =>
      withNames(
        tenant,
        rows.map(({ event }) => event),
      ),
  )
}

async function withNames(tenant: Tenant, events: readonly EventRow[]): Promise<RecordEvent[]> {
  const people = await namesOfPeople(
    tenant,
    events.map((event) => event.actorUserId),
  )
  const companies = await selectOrganisationNames(tenant, [
    ...new Set(events.flatMap((event) => event.actorOrgId ?? [])),
  ])
  const subjects = await namesOfSubjects(tenant, events.map(subjectOf))
  return events.map((event) => {
    const { chainId, sequence, at, type, text, previousHash, hash, taskId } = event
    const content = contentOf(text)
    const subject = subjectOf(event)
    const named = subjects.get(subject.id)
    return {
      ...{ chainId, sequence, at, type, text, previousHash, hash, taskId },
      actor: {
        personId: event.actorUserId,
        name: people.get(event.actorUserId ?? '') ?? null,
        organisationId: event.actorOrgId,
        organisation: companies.get(event.actorOrgId ?? '') ?? null,
        side: (content?.actor?.side as Side | undefined) ?? null,
      },
      subject: { ...subject, label: named?.label ?? null, pageId: named?.pageId ?? null },
      data: content?.data ?? {},
    }
  })
}

const subjectOf = ({ subjectType, subjectId }: EventRow) => ({
  type: subjectType as RecordSubject,
  id: subjectId,
})

/** Events read at a time while a chain is recomputed. */
const batch = 500

type Check = AnswerInputOf<typeof verifyRecord>

/** Recomputes a chain from its first event and compares its end with the head; 404 for chains of others. */
export async function checkChain(tenant: Tenant, chainId: string, knownHash?: string): Promise<Check> {
  if (!(await isOwnChain(tenant, chainId))) throw notFound('record')
  const link: Link = { chainId, sequence: 0, hash: genesisHash }
  let last: Check['last'] = null
  let known: Check['known'] = null
  const broken = (sequence: number, fault: NonNullable<Check['broken']>['fault'], type: string | null) => ({
    ...{ chainId, sound: link.sequence, last, known },
    broken: { sequence, fault, type },
  })
  for (;;) {
    const events = await selectChainAfter(tenant, chainId, link.sequence, batch)
    for (const event of events) {
      const fault = faultOf(event, link)
      if (fault === 'missing') return broken(link.sequence + 1, fault, null)
      if (fault) return broken(event.sequence, fault, event.type)
      Object.assign(link, { sequence: event.sequence, hash: event.hash })
      last = lastOf(event)
      if (event.hash === knownHash) known = { sequence: event.sequence, at: event.at }
    }
    if (events.length === batch) continue
    const end = await selectChainEnd(tenant, chainId)
    // Somebody appended while this read: go on with what is new.
    if (end.last > link.sequence) continue
    const fault = faultAtEnd(end, link)
    if (!fault) return { chainId, sound: link.sequence, last, known, broken: null }
    if (fault.fault === 'added') {
      // Events past the head follow from each other, but nobody vouches for them.
      const [sound] = await selectChainAfter(tenant, chainId, fault.sequence - 2, 1)
      link.sequence = fault.sequence - 1
      last = sound && sound.sequence < fault.sequence ? lastOf(sound) : null
    }
    return broken(fault.sequence, fault.fault, null)
  }
}

const lastOf = ({ sequence, at, hash }: EventRow) => ({ sequence, at, hash })

/** Whether the head tells of the same last event: one cut off, or one added past it, shows here. */
function faultAtEnd({ head }: ChainEnd, { sequence, hash }: Link) {
  if (!head) return sequence === 0 ? null : { sequence, fault: 'end-missing' as const }
  if (head.sequence > sequence) return { sequence: sequence + 1, fault: 'missing' as const }
  if (head.sequence < sequence) return { sequence: head.sequence + 1, fault: 'added' as const }
  return head.hash === hash ? null : { sequence, fault: 'end-changed' as const }
}
