import { readSubmission, type Submission } from '../../contract/submissions'
import { memberWith, type SeededOrganisation, type SeededPerson } from './base'
import type { Act, Stage } from './stage'

/** Who plays which part: whoever took the readings does not sign, and the second person is another one. */
export function castOf(stage: Stage, supplier: SeededOrganisation, customer: SeededOrganisation) {
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
    engineerId: engineer.id,
    engineer: as('supplier', engineer),
    approver: as('supplier', other(supplier, ['supplier-approver'], engineer)),
    reviewer: as('customer', reviewer),
    customerApprover: as('customer', memberWith(customer, 'customer-approver')),
    second: as('customer', other(customer, ['quality-representative', 'customer-approver'], reviewer)),
  }
}

export type Cast = ReturnType<typeof castOf>

/** The submission that is played, once it was prepared. */
export class Played {
  id = ''
  constructor(readonly cast: Cast) {}

  params = (more: Record<string, string> = {}) => ({ submissionId: this.id, ...more })
  see = (): Promise<Submission> => this.cast.engineer(readSubmission, { params: this.params() })

  /** What a decision or a signature names: the version and the bytes. */
  async seen(): Promise<{ expectedVersion: number; sha256: string }> {
    const { rowVersion: expectedVersion, sha256 } = await this.see()
    return { expectedVersion, sha256 }
  }

  /** The newest challenge, as its moves name it. */
  async challenge() {
    const found = (await this.see()).challenges.at(-1)
    if (!found) throw new Error('There is no challenge to go on with.')
    return { params: this.params({ challengeId: found.id }), expectedVersion: found.rowVersion }
  }

  /** The last condition of the acceptance. */
  async condition() {
    const found = (await this.see()).decisions.at(-1)?.conditions.at(-1)
    if (!found) throw new Error('There is no condition to go on with.')
    return { params: this.params({ conditionId: found.id }), expectedVersion: found.rowVersion }
  }
}
