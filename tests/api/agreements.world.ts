import { agreements, characteristics, parts, type Side } from '@evenrule/api/contract'
import type { Clause } from '@evenrule/metrology'
import { startHarness, type Harness, type Organisation, type Person, type Relationship } from './harness'

/** Clauses that tests agree on. */
export const zeroTest = (alpha = 0.05): Clause => ({ type: 'bias-zero-test', parameters: { alpha } })
export const equivalence = (share = 0.05): Clause => ({
  type: 'bias-equivalence',
  parameters: { margin: { base: 'tolerance', share }, confidence: 0.95 },
})
export const readings = (least = 15): Clause => ({
  type: 'design-minimum',
  parameters: { readings: least, registeredBeforehand: true },
})
export const ruleOfTen: Clause = { type: 'resolution-share', parameters: { share: 0.1, base: 'tolerance' } }

export interface Actor {
  side: Side
  organisation: Organisation
  person: Person
}

export type Answer = agreements.Agreement
export type Version = agreements.AgreementVersion

/** Two companies with an engineer or representative and an approver each, and the acts of a negotiation. */
export async function startWorld() {
  const harness: Harness = await startHarness()
  const people = {
    engineer: await harness.person('Grit Falk'),
    supplierApprover: await harness.person('Tove Lund'),
    quality: await harness.person('Ola Brandt'),
    customerApprover: await harness.person('Ida Roth'),
    reader: await harness.person('Pim Rehn'),
    stranger: await harness.person('Sten Uhl'),
  }
  const supplier = await harness.organisation('Halm Turning', [
    [people.engineer, ['gauge-engineer']],
    [people.supplierApprover, ['supplier-approver']],
    [people.reader, ['reader']],
  ])
  const customer = await harness.organisation('Nordhof Drives', [
    [people.quality, ['quality-representative']],
    [people.customerApprover, ['customer-approver']],
  ])
  const strangers = await harness.organisation('Ufer Springs', [
    [people.stranger, ['gauge-engineer', 'supplier-approver', 'customer-approver', 'quality-representative']],
  ])
  const relationship: Relationship = await harness.relationship(supplier, customer)
  const actor = (side: Side, organisation: Organisation, person: Person): Actor => ({
    side,
    organisation,
    person,
  })
  const actors = {
    engineer: actor('supplier', supplier, people.engineer),
    supplierApprover: actor('supplier', supplier, people.supplierApprover),
    reader: actor('supplier', supplier, people.reader),
    quality: actor('customer', customer, people.quality),
    customerApprover: actor('customer', customer, people.customerApprover),
    stranger: actor('supplier', strangers, people.stranger),
    strangerAsCustomer: actor('customer', strangers, people.stranger),
  }
  const as = ({ side, person }: Actor) => harness.as(side, person)
  const inside = ({ organisation }: Actor, more: Record<string, string> = {}) => ({
    organisationId: organisation.id,
    ...more,
  })
  const at = (version: Version, agreement: Answer) => ({ agreementId: agreement.id, versionId: version.id })

  return {
    harness,
    people,
    supplier,
    customer,
    strangers,
    relationship,
    actors,
    as,
    inside,

    async part(number: string, relationshipId = relationship.id): Promise<parts.Part> {
      return as(actors.quality).call(parts.createPart, inside(actors.quality), {
        body: { relationshipId, number, name: 'Pump housing', revision: 'A' },
      })
    },
    async characteristic(part: parts.Part, number: number, more: object = {}) {
      return as(actors.quality).call(
        characteristics.createCharacteristic,
        inside(actors.quality, { partId: part.id, revisionId: part.currentRevision.id }),
        {
          body: {
            number,
            name: 'Bore Ø',
            nominal: '24.000',
            lowerLimit: '23.975',
            upperLimit: '24.025',
            unit: 'mm',
            class: 'significant',
            ...more,
          },
        },
      )
    },
    read: (who: Actor, agreementId: string): Promise<Answer> =>
      as(who).call(agreements.readAgreement, inside(who, { agreementId })),
    list: (who: Actor, query: Record<string, unknown> = {}) =>
      as(who).call(agreements.listAgreements, inside(who), { query }),
    begin: (who: Actor, body: object): Promise<Answer> =>
      as(who).call(agreements.beginVersion, inside(who), {
        body: { relationshipId: relationship.id, ...body },
      }),
    answer: (who: Actor, agreement: Answer, version: Version, body: object): Promise<Answer> =>
      as(who).call(agreements.answerRound, inside(who, at(version, agreement)), {
        body: { expectedVersion: version.rowVersion, ...body },
      }),
    accept: (who: Actor, agreement: Answer, version: Version): Promise<Answer> =>
      as(who).call(agreements.acceptRound, inside(who, at(version, agreement)), {
        body: { expectedVersion: version.rowVersion },
      }),
    withdraw: (who: Actor, agreement: Answer, version: Version, reason = 'Another idea.'): Promise<Answer> =>
      as(who).call(agreements.withdrawVersion, inside(who, at(version, agreement)), {
        body: { expectedVersion: version.rowVersion, reason },
      }),
    sign(who: Actor, agreement: Answer, version: Version, sha256 = version.sha256): Promise<Answer> {
      harness.signInAfresh(who.person)
      return as(who).call(agreements.signVersion, inside(who, at(version, agreement)), {
        body: { expectedVersion: version.rowVersion, sha256 },
      })
    },
    /** Path of a version's act, for calls that are to be refused. */
    path: (who: Actor, agreement: Answer, version: Version, act: string) =>
      `/organisations/${who.organisation.id}/agreements/${agreement.id}/versions/${version.id}/${act}`,

    /** A signed version: proposed by the customer, accepted by the supplier, signed by an approver of each. */
    async agree(body: object): Promise<Answer> {
      const proposed = await this.begin(actors.quality, { send: true, ...body })
      const version = (of: Answer) => {
        const [newest] = of.versions
        if (!newest) throw new Error('no version')
        return newest
      }
      const agreed = await this.accept(actors.engineer, proposed, version(proposed))
      const once = await this.sign(actors.supplierApprover, agreed, version(agreed))
      return this.sign(actors.customerApprover, once, version(once))
    },
  }
}

export type World = Awaited<ReturnType<typeof startWorld>>

/** The first of the versions: a draft of one's own, else the newest. */
export function newest(agreement: Answer): Version {
  const [version] = agreement.versions
  if (!version) throw new Error('The agreement has no version.')
  return version
}
