import { otherSide, type Role, type Side } from '../../../contract/access'
import { dayInWords } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { workingRoles } from '../notifications/notifications.send'
import type { Negotiation } from './agreements.negotiation.service'
import { scopeWords } from './agreements.scope'

export interface AgreementMessage {
  subject: string
  body: readonly string[]
}

/** Those who sign for a side. */
export const approver: Record<Side, Role> = { supplier: 'supplier-approver', customer: 'customer-approver' }

/** What messages say; `comment` and `reason` are what a person wrote. */
export const agreementMessages = {
  proposed: (effectiveOn: string, comment: string): AgreementMessage => ({
    subject: 'Criteria are proposed to you',
    body: [
      `They would be in force from ${dayInWords(effectiveOn)}. Accept them, or answer with a changed proposal.`,
      comment,
    ],
  }),
  countered: (effectiveOn: string, comment: string): AgreementMessage => ({
    subject: 'Your proposal was answered with a changed one',
    body: [
      `It would be in force from ${dayInWords(effectiveOn)}. Accept it, or answer with a changed proposal.`,
      comment,
    ],
  }),
  clausesWithdrawn: (count: number, words: string): AgreementMessage => ({
    subject:
      count === 1
        ? 'A clause was taken out of what is proposed'
        : 'Clauses were taken out of what is proposed',
    body: ['What is left stands as a new proposal. Accept it, or answer with a changed one.', words],
  }),
  commented: (text: string): AgreementMessage => ({
    subject: 'A comment on what is being negotiated',
    body: [text],
  }),
  everythingMarked: {
    subject: 'Everything you proposed is marked as accepted',
    body: ['What is left is that the other side accepts it as a whole; then both sides sign.'],
  } satisfies AgreementMessage,
  accepted: (effectiveOn: string): AgreementMessage => ({
    subject: 'Criteria are agreed and wait for signatures',
    body: [
      `An approver of each side signs them by ${dayInWords(effectiveOn)}, the first day in force; otherwise they lapse.`,
    ],
  }),
  withdrawn: (reason: string): AgreementMessage => ({
    subject: 'Proposed criteria were withdrawn',
    body: ['What was in force stays in force. The reason given:', reason],
  }),
  signedByOne: (effectiveOn: string): AgreementMessage => ({
    subject: 'Criteria wait for the signature of your side',
    body: [
      `The other side has signed. Sign by ${dayInWords(effectiveOn)}, the first day in force; otherwise they lapse.`,
    ],
  }),
  signed: (effectiveOn: string): AgreementMessage => ({
    subject: 'Criteria are signed by both sides',
    body: [
      `They are in force from ${dayInWords(effectiveOn)}. Studies registered before are judged by what was in force then.`,
    ],
  }),
}

/** Tells the working members of a side, or its approvers alone, of what happened to an agreement. */
export function tell(
  tenant: Tenant,
  { agreement, parties, scope }: Negotiation,
  version: { number: number | null },
  to: { side: 'own' | 'other'; approversOnly?: boolean },
  { subject, body }: AgreementMessage,
): void {
  const side = to.side === 'own' ? tenant.side : otherSide(tenant.side)
  const title = `Agreement ${agreement.number}, version ${version.number}: ${scopeWords(scope)}`
  tenant.notify({
    organisationId: parties[side].id,
    side,
    roles: to.approversOnly ? [approver[side]] : workingRoles[side],
    kind: 'agreement',
    subject: `${subject}. ${title}`,
    body: [`From ${parties[tenant.side].name}.`, ...body].filter((line) => line !== '').join('\n\n'),
    path: `agreements/${agreement.id}`,
  })
}
