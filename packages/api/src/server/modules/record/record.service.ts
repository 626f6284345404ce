import type { Side } from '../../../contract/access'
import type { AnswerInputOf, QueryOf } from '../../../contract/define'
import type {
  listEvents,
  listRecordChoices,
  RecordEvent,
  RecordSubject,
  verifyRecord,
} from '../../../contract/record'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import { selectTimeZone } from '../organisations/organisations.repository'
import { namesOfPeople } from '../organisations/people.repository'
import { recomputeChain } from './record.chain'
import { contentOf } from './record.check'
import {
  isOwnChain,
  selectChoices,
  selectEvents,
  selectOrganisationNames,
  type EventRow,
} from './record.repository'
import { namesOfSubjects } from './record.subjects.repository'

/** One page of the record, with the names that people and things have today. */
export async function listOfEvents(tenant: Tenant, query: QueryOf<typeof listEvents>) {
  if (query.chainId && !(await isOwnChain(tenant, query.chainId))) throw notFound('record')
  const timeZone = await selectTimeZone(tenant)
  return paged(
    query,
    (page) => selectEvents(tenant, page, timeZone),
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

/** Recomputes a chain of this side; 404 for chains of others. */
export async function checkChain(
  tenant: Tenant,
  chainId: string,
  knownHash?: string,
): Promise<AnswerInputOf<typeof verifyRecord>> {
  if (!(await isOwnChain(tenant, chainId))) throw notFound('record')
  return recomputeChain(tenant, chainId, knownHash)
}

/** What the events of a chain, or of every chain of this side, can be filtered by. */
export async function choicesOf(
  tenant: Tenant,
  { chainId }: QueryOf<typeof listRecordChoices>,
): Promise<AnswerInputOf<typeof listRecordChoices>> {
  if (chainId && !(await isOwnChain(tenant, chainId))) throw notFound('record')
  const { people, taskIds, clauseKeys } = await selectChoices(tenant, chainId)
  const names = await namesOfPeople(
    tenant,
    people.map(({ id }) => id),
  )
  const companies = await selectOrganisationNames(tenant, [
    ...new Set(people.flatMap(({ organisationId }) => organisationId ?? [])),
  ])
  const tasks = await namesOfSubjects(
    tenant,
    taskIds.map((id) => ({ type: 'measuring-task', id })),
  )
  return {
    people: people.map(({ id, organisationId }) => ({
      id,
      name: names.get(id) ?? null,
      organisation: companies.get(organisationId ?? '') ?? null,
    })),
    tasks: taskIds.flatMap((id) => {
      const label = tasks.get(id)?.label
      return label === undefined ? [] : [{ id, label }]
    }),
    clauseKeys,
  }
}
