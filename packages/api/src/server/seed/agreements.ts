import {
  acceptRound,
  answerRound,
  beginVersion,
  commentOnRound,
  markAccepted,
  signVersion,
  withdrawClauses,
  withdrawVersion,
  type Agreement,
  type AgreementVersion,
} from '../../contract/agreements'
import { approverOf, memberWith, relationshipOf, workerOf, type Base } from './base'
import { characteristicName, houseTermsName, type Ids } from './ids'
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
          current = await playStep(stage, base, ids, { agreement, version, step, scope, current })
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
  ids: Ids,
  { agreement, version, step, scope, current }: Played,
): Promise<Agreement> {
  const organisation = base.organisations[agreement[step.side]]
  const role = step.act === 'sign' ? approverOf[step.side] : workerOf[step.side]
  const act = stage.as(step.side, organisation, memberWith(organisation, role))
  const effectiveOn = stage.day(version.effectiveDaysAgo)
  if (step.act === 'propose') {
    const { clauses, terms, comment, send = true, houseTerms } = step
    const houseTermsId = houseTerms
      ? ids.get('house terms', houseTermsName(agreement.customer, houseTerms))
      : null
    return act(beginVersion, {
      body: { ...scope, clauses, terms, effectiveOn, comment, send, houseTermsId },
    })
  }
  const newest = current?.versions[0]
  if (!current || !newest) throw new Error('An act of a negotiation that was not begun.')
  const params = { agreementId: current.id, versionId: newest.id }
  const expectedVersion = newest.rowVersion
  switch (step.act) {
    case 'answer': {
      const { clauses, terms, comment } = step
      return act(answerRound, {
        params,
        body: { clauses, terms, comment, effectiveOn, send: true, expectedVersion },
      })
    }
    case 'comment': {
      const { about } = thingIn(newest, step.about)
      return act(commentOnRound, { params, body: { round: standingIn(newest), about, text: step.text } })
    }
    case 'mark': {
      const items = step.about.map((name) => thingIn(newest, name))
      return act(markAccepted, { params, body: { round: standingIn(newest), items } })
    }
    case 'take-out': {
      const { about: clauseKeys, words } = step
      return act(withdrawClauses, { params, body: { clauseKeys, words, expectedVersion } })
    }
    case 'accept':
      return act(acceptRound, { params, body: { expectedVersion } })
    case 'sign':
      return act(signVersion, { params, body: { expectedVersion, sha256: newest.sha256 } })
    case 'withdraw':
      return act(withdrawVersion, { params, body: { expectedVersion, reason: step.reason } })
  }
}

const standingIn = ({ acceptance }: AgreementVersion): number => acceptance?.round ?? 1

/** What the scenario names by the key of a clause, `terms` or `effective-on`. */
function thingIn({ acceptance }: AgreementVersion, name: string) {
  const found = acceptance?.items.find(({ kind, clauseKey }) => (clauseKey ?? kind) === name)
  if (!found) throw new Error(`Nothing named ${name} stands in a proposal of the demonstration.`)
  const { kind, clauseKey, sha256 } = found
  return { about: { kind, clauseKey }, sha256 }
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
