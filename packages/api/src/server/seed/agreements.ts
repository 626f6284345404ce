import {
  acceptRound,
  answerRound,
  beginVersion,
  signVersion,
  withdrawVersion,
  type Agreement,
} from '../../contract/agreements'
import { approverOf, memberWith, workerOf, type Base } from './base'
import { characteristicKey, relationshipOf, type SeededCharacteristics } from './parts'
import type { DemoAgreement, DemoStep, DemoVersion } from './scenario.agreements'
import { agreements } from './scenario.agreements'
import type { Stage } from './stage'
import type { Scene } from './scenes'

/** The scenes of every negotiation, to be played in the order of their days. */
export function agreementScenes(stage: Stage, base: Base, characteristics: SeededCharacteristics): Scene[] {
  return agreements.flatMap((agreement) => {
    const scope = scopeOf(base, characteristics, agreement)
    // The answer of each act carries what the next one needs.
    let current: Agreement | undefined
    return agreement.versions.flatMap((version) =>
      version.steps.map((step): Scene => ({
        daysAgo: step.daysAgo,
        play: async () => {
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
  characteristics: SeededCharacteristics,
  { supplier, customer, part, characteristic }: DemoAgreement,
): Played['scope'] {
  const relationshipId = relationshipOf(base, supplier, customer).id
  if (!part) return { relationshipId, partId: null, characteristicId: null }
  const inPart = characteristics.get(characteristicKey(part, characteristic ?? 1))
  if (!inPart) throw new Error(`${part} has no characteristic ${characteristic ?? 1}.`)
  return {
    relationshipId,
    partId: inPart.partId,
    characteristicId: characteristic === undefined ? null : inPart.id,
  }
}
