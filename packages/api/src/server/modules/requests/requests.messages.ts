import type { Side } from '../../../contract/access'
import { dayInWords } from '../../calendar'
import type { Tenant } from '../../db/tenant'
import { workingRoles } from '../notifications/notifications.send'
import { partiesOf, relationshipById, type Parties } from '../relationships/relationships.lookup.service'
import type { RequestRow } from './requests.answers.repository'

/** What a message says: what happened, then its lines. */
interface Words {
  subject: string
  lines: (parties: Parties) => readonly string[]
}

export const countOfTasks = (tasks: number): string => `${tasks} measuring task${tasks === 1 ? '' : 's'}`

/** The words of each message about a request. */
export const requestMessages = {
  asked: (tasks: number, dueOn: string, words: string): Words => ({
    subject: `Asks for proof by ${dayInWords(dueOn)}`,
    lines: ({ customer }) => [`${customer.name} asks for proof of ${countOfTasks(tasks)}.`, words],
  }),
  dateMoved: (from: string, to: string, reason: string): Words => ({
    subject: `Due on ${dayInWords(to)} now`,
    lines: ({ customer }) => [`${customer.name} moved the date from ${dayInWords(from)}.`, reason],
  }),
  withdrawn: (reason: string): Words => ({
    subject: 'Withdrawn',
    lines: ({ customer }) => [`${customer.name} asks for no answer any more. The reason given:`, reason],
  }),
  answered: (submission: number | null): Words => ({
    subject: 'Answered',
    lines: ({ supplier }) => [
      `With submission ${submission ?? ''}, ${supplier.name} has answered for every measuring task you asked for.`,
    ],
  }),
} as const

const tell = (side: Side) =>
  async function tellSide(tenant: Tenant, request: RequestRow, { subject, lines }: Words): Promise<void> {
    const parties = await partiesOf(tenant, await relationshipById(tenant, request.relationshipId))
    tenant.notify({
      organisationId: side === 'supplier' ? request.supplierOrgId : request.customerOrgId,
      side,
      roles: workingRoles[side],
      kind: 'request',
      subject: `${subject}: request ${request.number}`,
      body: lines(parties)
        .filter((line) => line !== '')
        .join('\n\n'),
      path: `requests/${request.id}`,
    })
  }

export const tellSupplier = tell('supplier')
export const tellCustomer = tell('customer')
