import {
  acceptRound,
  answerRound,
  beginVersion,
  signVersion,
  withdrawVersion,
  type Agreement,
} from '../../contract/agreements'
import { approverOf, memberWith, relationshipOf, workerOf, type Base } from './base'
import { characteristicName, type Ids } from './ids'
import type { DemoAgreement, DemoStep, DemoVersion } from './scenario.agreements'
import { agreements } from './scenario.agreements'
import type { Stage } from './stage'
import type { Scene } from './scenes'

/** The scenes of every negotiation, to be played in the order of their days. */
export function agreementScenes(stage: Stage, base: Base, ids: Ids): Scene[] {
  return agreements.flatMap((agreement) => {
    // The answer of each act carries what the next one needs.
    let current: Agreement | undefined
    return agreement.versions.flatMap((version) =>
      version.steps.map((step): Scene => ({
        daysAgo: step.daysAgo,
        play: async () => {
          const scope = scopeOf(base, ids, agreement)
          current = await playStep(stage, base, { agreement, version, step, scope, current })
        },
      })),
    )
  })
}

interface Played {
  agreement: DemoAgreement
  version: DemoVersion
  step: DemoStep
  scope: { relationshipId: string; partId: string | null; characteristicId: string | null }
  current: Agreement | undefined
}

async function playStep(
  stage: Stage,
  base: Base,
  { agreement, version, step, scope, current }: Played,
): Promise<Agreement> {
  const organisation = base.organisations[agreement[step.side]]
  const role = step.act === 'sign' ? approverOf[step.side] : workerOf[step.side]
  const act = stage.as(step.side, organisation, memberWith(organisation, role))
  const effectiveOn = stage.day(version.effectiveDaysAgo)
  if (step.act === 'propose') {
    const { clauses, comment, send = true } = step
    return act(beginVersion, { body: { ...scope, clauses, effectiveOn, comment, send } })
  }
  const newest = current?.versions[0]
  if (!current || !newest) throw new Error('An act of a negotiation that was not begun.')
  const params = { agreementId: current.id, versionId: newest.id }
  const expectedVersion = newest.rowVersion
  switch (step.act) {
    case 'answer': {
      const { clauses, comment } = step
      return act(answerRound, {
        params,
        body: { clauses, comment, effectiveOn, send: true, expectedVersion },
      })
    }
    case 'accept':
      return act(acceptRound, { params, body: { expectedVersion } })
    case 'sign':
      return act(signVersion, { params, body: { expectedVersion, sha256: newest.sha256 } })
    case 'withdraw':
      return act(withdrawVersion, { params, body: { expectedVersion, reason: step.reason } })
  }
}

function scopeOf(
  base: Base,
  ids: Ids,
  { supplier, customer, part, characteristic }: DemoAgreement,
): Played['scope'] {
  const relationshipId = relationshipOf(base, supplier, customer).id
  return {
    relationshipId,
    partId: part ? ids.get('part', part) : null,
    characteristicId:
      part && characteristic ? ids.get('characteristic', characteristicName(part, characteristic)) : null,
  }
}
