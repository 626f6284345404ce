import { allows, sides, type Side } from '../../../contract/access'
import {
  characteristicsPerAgreement,
  type AgreementRow as ListedAgreement,
  type listAgreements,
  type listScoped,
  type readAgreement,
} from '../../../contract/agreements'
import type { AnswerInputOf, QueryOf } from '../../../contract/define'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { namesOfPeople } from '../organisations/people.repository'
import { pageOfCharacteristics } from '../parts/parts.lookup.service'
import { selectAgreements, type AgreementListed } from './agreements.list.repository'
import { agreementById, negotiationOf, openVersion, draftVersion } from './agreements.negotiation.service'
import { namedScope } from './agreements.scope'
import { peopleIn, versionAnswer } from './agreements.version.read'

type AgreementAnswer = AnswerInputOf<typeof readAgreement>

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
  const { agreement, parties, versions, characteristics } = negotiation
  const names = await namesOfPeople(tenant, versions.flatMap(peopleIn))
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
    versions: versions.map((version) => versionAnswer(tenant, negotiation, version, names)),
    characteristics: characteristics.slice(0, characteristicsPerAgreement),
    characteristicsTotal: characteristics.length,
  }
}

/** One page of the characteristics that an agreement covers now. */
export async function scopedCharacteristics(
  tenant: Tenant,
  agreementId: string,
  query: QueryOf<typeof listScoped>,
): Promise<AnswerInputOf<typeof listScoped>> {
  const { relationshipId, partId, characteristicId } = await agreementById(tenant, agreementId)
  return pageOfCharacteristics(tenant, { relationshipId, partId, characteristicId }, query)
}
