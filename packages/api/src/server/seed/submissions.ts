import {
  prepareSubmission,
  sendForSignature,
  signSubmission,
  withdrawSubmission,
} from '../../contract/submissions'
import type { Base } from './base'
import type { Ids } from './ids'
import { reviewActs, type Acts } from './review-acts'
import { withdrawalReason, type DemoEnd } from './scenario.studies'
import type { Scene } from './scenes'
import type { Stage } from './stage'
import { castOf, Played } from './submission-cast'
import { deedsOf, type Deed } from './submission-deeds'
import type { DemoTask } from './tasks'

interface Planned {
  task: DemoTask
  end: DemoEnd
  collectedDaysAgo: number
}

/** The scenes of one submission. */
export function submissionScenes(
  stage: Stage,
  base: Base,
  ids: Ids,
  { task, end, collectedDaysAgo }: Planned,
): Scene[] {
  const { relationship, limits } = task
  const { [relationship.supplier]: supplier, [relationship.customer]: customer } = base.organisations
  const isSafety = limits[6] === 'safety'
  const played = new Played(castOf(stage, supplier, customer))
  const play: Acts<Deed> = { ...makingActs(ids, task, played), ...reviewActs(stage, played) }
  return (deedsOf[end] ?? [])
    .filter((deed) => deed !== 'confirm' || isSafety)
    .map((deed, at) => {
      const daysAgo = Math.max(collectedDaysAgo - 1 - at, 0)
      return { daysAgo, play: async () => void (await play[deed](daysAgo)) }
    })
}

/** How the supplier makes a submission. */
function makingActs(
  ids: Ids,
  task: DemoTask,
  played: Played,
): Acts<'prepare' | 'send' | 'sign' | 'withdraw'> {
  const { engineer, approver } = played.cast
  return {
    prepare: async () => {
      const body = { taskId: ids.get('task', task.name) }
      played.id = (await engineer(prepareSubmission, { body })).id
    },
    send: async () => {
      const { expectedVersion } = await played.seen()
      await engineer(sendForSignature, { params: played.params(), body: { expectedVersion, note: '' } })
    },
    sign: async () => approver(signSubmission, { params: played.params(), body: await played.seen() }),
    withdraw: async () => {
      const { expectedVersion } = await played.seen()
      await engineer(withdrawSubmission, {
        params: played.params(),
        body: { expectedVersion, reason: withdrawalReason },
      })
    },
  }
}
