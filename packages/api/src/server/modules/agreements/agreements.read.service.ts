import { clauseWarnings, safetyFlags } from '../../../contract/agreement-check'
import { allows, sides, type Side } from '../../../contract/access'
import type {
  AgreementRow as ListedAgreement,
  listAgreements,
  readAgreement,
} from '../../../contract/agreements'
import type { AnswerInputOf, QueryOf } from '../../../contract/define'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { namesOfPeople } from '../organisations/people.repository'
import { selectAgreements, type AgreementListed } from './agreements.list.repository'
import { factsOf, offersOf } from './agreements.move.service'
import {
  agreementById,
  negotiationOf,
  openVersion,
  draftVersion,
  type Negotiation,
  type VersionAtHand,
} from './agreements.negotiation.service'
import { namedScope } from './agreements.scope'

type AgreementAnswer = AnswerInputOf<typeof readAgreement>
type VersionAnswer = AgreementAnswer['versions'][number]
type Names = Map<string, string>

/** One page of this side's agreements and drafts. */
export async function listOfAgreements(tenant: Tenant, query: QueryOf<typeof listAgreements>) {
  return paged(
    query,
    (page) => selectAgreements(tenant, page),
    (rows) => rows.map(asRow),
  )
}

function asRow(listed: AgreementListed): ListedAgreement {
  const { agreement, version, standing, inForce } = listed
  const waits: Record<Side, boolean> = { supplier: listed.waitsOnSupplier, customer: listed.waitsOnCustomer }
  return {
    id: agreement.id,
    number: agreement.number,
    relationshipId: agreement.relationshipId,
    other: listed.other,
    scope: namedScope(agreement, listed),
    newest: {
      versionId: version.id,
      number: version.number,
      state: listed.state,
      proposedBy: standing.side,
      rounds: standing.number,
      effectiveOn: listed.effectiveOn,
      changedAt: listed.changedAt,
    },
    waitsOn: sides.filter((side) => waits[side]),
    inForce: inForce && asInForce(inForce),
  }
}

const asInForce = ({
  id,
  number,
  effectiveOn,
}: {
  id: string
  number: number | null
  effectiveOn: string | null
}) => {
  if (number === null || effectiveOn === null)
    throw new Error('A version in force lacks its number or its day.')
  return { versionId: id, number, effectiveOn }
}

/** One agreement with all that this side may see of it. */
export async function readAgreementOf(tenant: Tenant, agreementId: string): Promise<AgreementAnswer> {
  const negotiation = await negotiationOf(tenant, await agreementById(tenant, agreementId))
  const { agreement, parties, versions } = negotiation
  const names = await namesOfPeople(
    tenant,
    versions.flatMap(({ rounds, signatures }) => [
      ...rounds.map(({ createdBy }) => createdBy),
      ...signatures.map(({ userId }) => userId),
    ]),
  )
  const inForce = versions.find(({ state }) => state === 'in-force')
  return {
    id: agreement.id,
    number: agreement.number,
    relationshipId: agreement.relationshipId,
    scope: negotiation.scope,
    ...parties,
    timeZone: negotiation.timeZone,
    today: negotiation.today,
    inForce: inForce ? asInForce(inForce.row) : null,
    mayBegin:
      allows('agreements.propose', tenant.side, tenant.roles) &&
      openVersion(negotiation) === undefined &&
      draftVersion(negotiation) === undefined,
    versions: versions.map((version) => asVersion(tenant, negotiation, version, names)),
    characteristics: negotiation.characteristics,
  }
}

function asVersion(
  tenant: Tenant,
  negotiation: Negotiation,
  version: VersionAtHand,
  names: Names,
): VersionAnswer {
  const { characteristics } = negotiation
  const { row, state, rounds, signatures } = version
  return {
    ...row,
    state,
    waitsOn: sides.filter((side) => waitsOn(side, negotiation, version)),
    ...offersOf(tenant, negotiation, version),
    rounds: rounds.map((round) => ({
      ...round,
      by: names.get(round.createdBy) ?? null,
      warnings: clauseWarnings(round.clauses, characteristics),
      flags: safetyFlags(round.clauses, characteristics),
    })),
    signatures: signatures.map((each) => ({ ...each, name: names.get(each.userId) ?? null })),
  }
}

/** Whose step is next, seen from each side: the answer, a missing signature, or the sending of its draft. */
function waitsOn(side: Side, negotiation: Negotiation, version: VersionAtHand): boolean {
  const facts = factsOf({ side }, negotiation, version)
  switch (version.state) {
    case 'draft':
      return version.row.begunBy === side
    case 'proposed':
    case 'countered':
      return facts['answering-side']
    case 'agreed':
      return facts['own-side-has-not-signed']
    default:
      return false
  }
}
