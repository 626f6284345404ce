import type { AnswerInputOf, QueryOf } from '../../../contract/define'
import type { ProofState } from '../../../contract/proof'
import type { listRequestChoices, listRequests, readRequest, RequestTask } from '../../../contract/requests'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import { namesOfPeople } from '../organisations/people.repository'
import { proofOfTasks } from '../parts/proof.service'
import { selectListedTasks, type TaskListed } from '../parts/tasks.repository'
import { relationshipById } from '../relationships/relationships.lookup.service'
import { selectAcceptedIds } from '../standing/standing.repository'
import { standingsOf } from '../standing/standing.service'
import { selectAnswers, selectTasksOf } from './requests.answers.repository'
import { openRequestsOfTasks, taskStateIn } from './requests.answers.service'
import { selectChoices } from './requests.choices.repository'
import { selectListedRequest, selectRequests, type RequestListed } from './requests.list.repository'
import { selectDraftsOf, selectStudiesOf } from './requests.work.repository'

/** One page of this side's requests. */
export const listOfRequests = async (tenant: Tenant, query: QueryOf<typeof listRequests>) =>
  paged(
    query,
    (page) => selectRequests(tenant, page),
    (rows) => rows.map(asRow),
  )

const asRow = ({ request, total: _, ...row }: RequestListed) => ({ ...request, ...row })

/** One page of a supplier's tasks to ask proof of, with the requests that ask for each already. */
export async function listOfChoices(tenant: Tenant, query: QueryOf<typeof listRequestChoices>) {
  await relationshipById(tenant, query.relationshipId)
  const standings = await standingsOf(tenant, await selectAcceptedIds(tenant))
  const fallen = [...standings].filter(([, { state }]) => state !== 'stands').map(([id]) => id)
  return paged(
    query,
    (page) => selectChoices(tenant, page, fallen),
    async (rows) => {
      const ids = rows.map(({ task }) => task.id)
      const [proofs, asked] = [await proofOfTasks(tenant, ids), await openRequestsOfTasks(tenant, ids)]
      return rows.map((row) => ({
        ...asTask(row, proofs.get(row.task.id)),
        askedIn: (asked.get(row.task.id) ?? []).map(({ number }) => number),
      }))
    },
  )
}

/** One request with the state of each task; 404 where this organisation does not have it on this side. */
export async function readRequestOf(
  tenant: Tenant,
  requestId: string,
): Promise<AnswerInputOf<typeof readRequest>> {
  const row = await selectListedRequest(tenant, requestId)
  if (!row) throw notFound('request')
  const { request } = row
  const names = await namesOfPeople(tenant, [request.askedBy, request.withdrawnBy])
  return {
    ...asRow(row),
    askedBy: names.get(request.askedBy) ?? null,
    withdrawnBy: (request.withdrawnBy && names.get(request.withdrawnBy)) ?? null,
    list: await tasksOf(tenant, requestId),
  }
}

async function tasksOf(tenant: Tenant, requestId: string): Promise<RequestTask[]> {
  const ids = (await selectTasksOf(tenant, [requestId])).map(({ taskId }) => taskId)
  const rows = await selectListedTasks(tenant, ids)
  const [proofs, answers] = [await proofOfTasks(tenant, ids), await selectAnswers(tenant, [requestId])]
  const work = await workOn(tenant, ids)
  return ids.flatMap((taskId) => {
    const row = rows.find(({ task }) => task.id === taskId)
    if (!row) return []
    const newest = answers.find((answer) => answer.taskId === taskId)
    return {
      ...asTask(row, proofs.get(taskId)),
      archived: row.task.archivedAt !== null,
      state: taskStateIn(answers, { requestId, taskId }),
      submission: newest ?? null,
      work: work(taskId),
    }
  })
}

/** What the supplier has begun for each task; the customer sees none of it. */
async function workOn(
  tenant: Tenant,
  taskIds: readonly string[],
): Promise<(taskId: string) => RequestTask['work']> {
  if (tenant.side === 'customer') return () => null
  const [studies, drafts] = [await selectStudiesOf(tenant, taskIds), await selectDraftsOf(tenant, taskIds)]
  return (taskId) => ({
    study: studies.find((each) => each.taskId === taskId) ?? null,
    draft: drafts.find((each) => each.taskId === taskId) ?? null,
  })
}

function asTask({ task, characteristic, part, revision }: TaskListed, proof: ProofState = 'missing') {
  const { gaugeCode, gaugeName, site, processStep, partId } = task
  const { nominal, lowerLimit, upperLimit, unit, class: kind } = characteristic
  return {
    ...{ taskId: task.id, gaugeCode, gaugeName, site, processStep, partId, proof },
    partNumber: part.number,
    partName: part.name,
    revision: revision.label,
    characteristicNumber: characteristic.number,
    characteristicName: characteristic.name,
    ...{ nominal, lowerLimit, upperLimit, unit, class: kind },
  }
}
