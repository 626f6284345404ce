import { reviews, type Permission, type Side } from '@evenrule/api/contract'
import type { Condition } from '@evenrule/api/contract/conditions'
import { conditionMoves, type ConditionState } from '@evenrule/api/contract/moves/condition'
import { possibleMoves, type Move } from '@evenrule/api/contract/moves/define'
import { acceptedStates, type SubmissionState } from '@evenrule/api/contract/moves/submission'
import type { Client } from '../../session/client'

export type { Condition }
export const conditionActNames = ['report', 'confirm', 'return'] as const
export type ConditionActName = (typeof conditionActNames)[number]

/** What a person may do with a condition: only its owner reports it, the customer confirms it or not. */
export function possibleConditionActs(
  submission: SubmissionState,
  { state, owner }: Pick<Condition, 'state' | 'owner'>,
  side: Side,
  holds: (permission: Permission) => boolean,
): ConditionActName[] {
  if (!acceptedStates.includes(submission)) return []
  const names = possibleMoves<Move<ConditionState>>(conditionMoves, state, side, holds).map(
    ({ name }) => name,
  )
  return conditionActNames.filter((name) => names.includes(name) && (name !== 'report' || owner === side))
}

type Params = { organisationId: string; submissionId: string; conditionId: string }
interface ConditionAct {
  words: boolean
  files: boolean
  send(
    api: Client,
    params: Params,
    expectedVersion: number,
    values: { text: string; fileIds: string[] },
  ): Promise<Condition>
}

/** How each is sent. */
export const conditionSends: Record<ConditionActName, ConditionAct> = {
  report: {
    words: true,
    files: true,
    send: (api, params, expectedVersion, { text, fileIds }) =>
      api.call(reviews.reportCondition, { params, body: { expectedVersion, text, fileIds } }),
  },
  confirm: {
    words: false,
    files: false,
    send: (api, params, expectedVersion, { text }) =>
      api.call(reviews.confirmCondition, { params, body: { expectedVersion, text } }),
  },
  return: {
    words: true,
    files: false,
    send: (api, params, expectedVersion, { text }) =>
      api.call(reviews.returnCondition, { params, body: { expectedVersion, text } }),
  },
}
