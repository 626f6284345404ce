import {
  accept,
  acceptWithConditions,
  answerChallenge,
  confirm,
  openChallenge,
  refuse,
  settleChallenge,
} from '../../contract/reviews'
import {
  prepareSubmission,
  readSubmission,
  sendForSignature,
  signSubmission,
  withdrawSubmission,
} from '../../contract/submissions'
import { memberWith, type Base, type SeededOrganisation, type SeededPerson } from './base'
import type { Ids } from './ids'
import {
  answerText,
  challengeText,
  conditions,
  refusalReason,
  withdrawalReason,
  type DemoEnd,
} from './scenario.studies'
import type { Scene } from './scenes'
import type { Act, Stage } from './stage'
import type { DemoTask } from './tasks'

interface Planned {
  task: DemoTask
  end: DemoEnd
  collectedDaysAgo: number
}

/** What happens to a submission, by how far it comes; each act a day or more after the one before. */
type Deed =
  | 'prepare'
  | 'send'
  | 'sign'
  | 'withdraw'
  | 'challenge'
  | 'answer'
  | 'settle'
  | 'refuse'
  | 'accept'
  | 'accept-with-conditions'
  | 'confirm'

const signed: Deed[] = ['prepare', 'send', 'sign']
const deeds: Partial<Record<DemoEnd, Deed[]>> = {
  draft: ['prepare'],
  'for-signature': ['prepare', 'send'],
  submitted: signed,
  withdrawn: [...signed, 'withdraw'],
  challenged: [...signed, 'challenge'],
  answered: [...signed, 'challenge', 'answer'],
  refused: [...signed, 'refuse'],
  'awaiting-second-person': [...signed, 'accept'],
  accepted: [...signed, 'accept', 'confirm'],
  'accepted-after-challenge': [...signed, 'challenge', 'answer', 'settle', 'accept', 'confirm'],
  'accepted-with-conditions': [...signed, 'accept-with-conditions', 'confirm'],
}

/** The scenes of one submission. */
export function submissionScenes(
  stage: Stage,
  base: Base,
  ids: Ids,
  { task, end, collectedDaysAgo }: Planned,
): Scene[] {
  const { relationship, limits } = task
  const supplier = base.organisations[relationship.supplier]
  const customer = base.organisations[relationship.customer]
  const isSafety = limits[6] === 'safety'
  const cast = castOf(stage, supplier, customer)
  let submissionId = ''
  const seen = async () => {
    const { rowVersion, sha256, evaluations, challenges } = await cast.engineer(readSubmission, {
      params: { submissionId },
    })
    return { expectedVersion: rowVersion, sha256, evaluations, challenges }
  }
  const params = () => ({ submissionId })
  const challengeParams = async () => ({ ...params(), challengeId: (await seen()).challenges[0]?.id ?? '' })
  const play: Record<Deed, () => Promise<unknown>> = {
    prepare: async () => {
      submissionId = (
        await cast.engineer(prepareSubmission, { body: { taskId: ids.get('task', task.name) } })
      ).id
    },
    send: async () => {
      const { expectedVersion } = await seen()
      await cast.engineer(sendForSignature, { params: params(), body: { expectedVersion, note: '' } })
    },
    sign: async () => {
      const { expectedVersion, sha256 } = await seen()
      await cast.approver(signSubmission, { params: params(), body: { expectedVersion, sha256 } })
    },
    withdraw: async () => {
      const { expectedVersion } = await seen()
      await cast.engineer(withdrawSubmission, {
        params: params(),
        body: { expectedVersion, reason: withdrawalReason },
      })
    },
    challenge: async () => {
      const { expectedVersion, evaluations } = await seen()
      const clauseKey = evaluations.find((each) => each.clauseKey.startsWith('bias'))?.clauseKey
      await cast.reviewer(openChallenge, {
        params: params(),
        body: { expectedVersion, clauseKey, reasonKind: 'readings', text: challengeText },
      })
    },
    answer: async () => {
      const { challenges } = await seen()
      await cast.engineer(answerChallenge, {
        params: await challengeParams(),
        body: { expectedVersion: challenges[0]?.rowVersion, text: answerText },
      })
    },
    settle: async () => {
      const { challenges } = await seen()
      await cast.reviewer(settleChallenge, {
        params: await challengeParams(),
        body: { expectedVersion: challenges[0]?.rowVersion, text: '' },
      })
    },
    refuse: async () => {
      const { expectedVersion, sha256 } = await seen()
      await cast.reviewer(refuse, {
        params: params(),
        body: { expectedVersion, sha256, reason: refusalReason },
      })
    },
    accept: async () => {
      const { expectedVersion, sha256 } = await seen()
      await cast.reviewer(accept, { params: params(), body: { expectedVersion, sha256, reason: '' } })
    },
    'accept-with-conditions': async () => {
      const { expectedVersion, sha256 } = await seen()
      await cast.customerApprover(acceptWithConditions, {
        params: params(),
        body: { expectedVersion, sha256, conditions, conditionsDueOn: stage.day(-90), reason: '' },
      })
    },
    confirm: async () => {
      const { expectedVersion, sha256 } = await seen()
      await cast.second(confirm, { params: params(), body: { expectedVersion, sha256 } })
    },
  }
  return (deeds[end] ?? [])
    .filter((deed) => deed !== 'confirm' || isSafety)
    .map((deed, at) => ({
      daysAgo: Math.max(collectedDaysAgo - 1 - at, 0),
      play: async () => void (await play[deed]()),
    }))
}

/** Who plays which part: whoever took the readings does not sign, and the second person is another one. */
function castOf(stage: Stage, supplier: SeededOrganisation, customer: SeededOrganisation) {
  const engineer = memberWith(supplier, 'gauge-engineer')
  const reviewer = memberWith(customer, 'quality-representative')
  const other = (
    organisation: SeededOrganisation,
    roles: SeededPerson['roles'],
    not: SeededPerson,
  ): SeededPerson =>
    organisation.people.find(
      (person) => person !== not && person.roles.some((role) => roles.includes(role)),
    ) ?? not
  const as = (side: 'supplier' | 'customer', person: SeededPerson): Act =>
    stage.as(side, side === 'supplier' ? supplier : customer, person)
  return {
    engineer: as('supplier', engineer),
    approver: as('supplier', other(supplier, ['supplier-approver'], engineer)),
    reviewer: as('customer', reviewer),
    customerApprover: as('customer', memberWith(customer, 'customer-approver')),
    second: as('customer', other(customer, ['quality-representative', 'customer-approver'], reviewer)),
  }
}
