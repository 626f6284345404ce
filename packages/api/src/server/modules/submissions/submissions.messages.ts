import { otherSide, type Role, type Side } from '../../../contract/access'
import type { Tenant } from '../../db/tenant'
import { workingRoles, type Notice } from '../notifications/notifications.send'
import { frozenCharacteristic, taskById } from '../parts/parts.lookup.service'
import { partiesOf } from './submissions.content.service'
import type { SubmissionRow } from './submissions.repository'

/** What a message can speak of. */
export interface MessageContext {
  /** "submission 12, BG-14 for 7741-220 C no. 5 bore"; without the number while it has none. */
  title: string
  supplier: string
  customer: string
}

export interface Words {
  subject: string
  body: string
}

/** Tells the working members of one side, or those with certain roles, of what happened to a submission. */
export async function tell(
  tenant: Tenant,
  submission: SubmissionRow,
  to: 'own side' | 'other side',
  kind: Notice['kind'],
  words: (context: MessageContext) => Words,
  roles?: readonly Role[],
): Promise<void> {
  const side: Side = to === 'own side' ? tenant.side : otherSide(tenant.side)
  const { subject, body } = words(await contextOf(tenant, submission))
  tenant.notify({
    organisationId: side === 'supplier' ? submission.supplierOrgId : submission.customerOrgId,
    side,
    roles: roles ?? workingRoles[side],
    kind,
    subject,
    body,
    path: `submissions/${submission.id}`,
  })
}

async function contextOf(tenant: Tenant, submission: SubmissionRow): Promise<MessageContext> {
  const { supplier, customer } = await partiesOf(tenant, submission.relationshipId)
  const { gaugeCode } = await taskById(tenant, submission.taskId)
  const { partNumber, revision, number, name } = await frozenCharacteristic(
    tenant,
    submission.characteristicId,
  )
  const what = `${gaugeCode} for ${partNumber} ${revision} no. ${number} ${name}`
  const title = submission.number === null ? what : `submission ${submission.number}, ${what}`
  return { title, supplier: supplier.name, customer: customer.name }
}

const countOfClauses = (met: number, total: number): string =>
  `${met} of ${total} ${total === 1 ? 'clause is' : 'clauses are'} met.`

/** What messages about the making of a submission say; `note` is what a person wrote. */
export const submissionMessages = {
  waitsForSignature: (note: string) => ({
    subject: 'Waits for your signature',
    body: ['Read it, then sign it or return it with a note. Whoever took the readings may not sign.', note],
  }),
  returned: (note: string) => ({ subject: 'Returned with a note', body: [note] }),
  signed: (criteria: 'agreed' | 'none', met: number, total: number) => ({
    subject: 'Waits for your decision',
    body:
      criteria === 'agreed'
        ? [countOfClauses(met, total), 'Accept it, accept it with conditions, or challenge a result.']
        : ['No criteria are agreed for it.', 'An approver of each side decides on this one alone.'],
  }),
  withdrawn: (reason: string) => ({
    subject: 'Taken back',
    body: ['It asks for no decision any more. The reason given:', reason],
  }),
}

/** Puts a message together: what happened and to what in the subject; who did it, and the words, in the body. */
export const about =
  (by: 'supplier' | 'customer', { subject, body }: { subject: string; body: readonly string[] }) =>
  (context: MessageContext): Words => ({
    subject: `${subject}: ${context.title}`,
    body: [`From ${context[by]}.`, ...body].filter((line) => line !== '').join('\n\n'),
  })
