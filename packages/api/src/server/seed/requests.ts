import { askForProof, moveRequestDate, readRequest, withdrawRequest } from '../../contract/requests'
import { memberWith, relationshipOf, type Base } from './base'
import { taskName, type Ids } from './ids'
import { requests } from './scenario.requests'
import type { Scene } from './scenes'
import type { Stage } from './stage'

/** What customers ask for: asked, moved, withdrawn; the answers come from the submissions played meanwhile. */
export const requestScenes = (stage: Stage, base: Base, ids: Ids): Scene[] =>
  requests.flatMap((asked): Scene[] => {
    const { customer, supplier, askedDaysAgo, dueDaysAgo, occasion, words, tasks, moved, withdrawn } = asked
    const organisation = base.organisations[customer]
    const act = stage.as('customer', organisation, memberWith(organisation, 'quality-representative'))
    let requestId = ''
    const now = async () => {
      const params = { requestId }
      return { params, expectedVersion: (await act(readRequest, { params })).rowVersion }
    }
    const ask = async () => {
      const { id: relationshipId } = relationshipOf(base, supplier, customer)
      const taskIds = tasks.map((task) => ids.get('task', taskName(...task)))
      const body = { relationshipId, taskIds, dueOn: stage.day(dueDaysAgo), occasion, words }
      requestId = (await act(askForProof, { body })).id
    }
    const moveTo = (dueOn: string, reason: string) => async () => {
      const { params, expectedVersion } = await now()
      await act(moveRequestDate, { params, body: { expectedVersion, dueOn, reason } })
    }
    const withdraw = (reason: string) => async () => {
      const { params, expectedVersion } = await now()
      await act(withdrawRequest, { params, body: { expectedVersion, reason } })
    }
    return [
      { daysAgo: askedDaysAgo, play: ask },
      ...(moved ? [{ daysAgo: moved.daysAgo, play: moveTo(stage.day(moved.dueDaysAgo), moved.reason) }] : []),
      ...(withdrawn ? [{ daysAgo: withdrawn.daysAgo, play: withdraw(withdrawn.reason) }] : []),
    ]
  })
