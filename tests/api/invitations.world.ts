import { pino } from 'pino'
import { invitations, type Side } from '@evenrule/api/contract'
import { openDatabase } from '../../packages/api/src/server/db/database'
import type { OutgoingMail } from '../../packages/api/src/server/integrations/mail'
import { sendDueMail } from '../../packages/api/src/server/modules/notifications/mail.service'
import { invitationSecret, startHarness, type Organisation, type Person } from './harness'

export const origins: Record<Side, string> = {
  supplier: 'http://supplier.test',
  customer: 'http://customer.test',
}

/** A customer and a supplier that know nothing of each other yet, people without an organisation, and a mailbox. */
export async function startInvitations() {
  const harness = await startHarness()
  const people = {
    buyer: await harness.person('Ada Vogt'),
    representative: await harness.person('Ben Krol'),
    owner: await harness.person('Cleo Marsh'),
    engineer: await harness.person('Dan Osei'),
    newcomer: await harness.person('Nia Brook'),
    stranger: await harness.person('Rory Finch'),
  }
  const customer = await harness.organisation('Customer works', [
    [people.buyer, ['admin']],
    [people.representative, ['quality-representative']],
  ])
  const supplier = await harness.organisation('Supplier works', [
    [people.owner, ['admin', 'gauge-engineer']],
    [people.engineer, ['gauge-engineer']],
  ])
  const elsewhere = await harness.organisation('Elsewhere', [[people.stranger, ['admin']]])
  const system = openDatabase(harness.urlAs('evenrule_system'), 2)
  const logged: string[] = []

  /** What the worker sends now. */
  async function mails(): Promise<OutgoingMail[]> {
    const sent: OutgoingMail[] = []
    await sendDueMail({
      ...{ database: system.database, origins, invitationSecret, clock: harness.now },
      transport: { send: async (mail) => void sent.push(mail), close: () => undefined },
      logger: pino({ level: 'trace' }, { write: (line) => void logged.push(line) }),
    })
    return sent
  }

  const at = (organisation: Organisation, more: Record<string, string> = {}) => ({
    organisationId: organisation.id,
    ...more,
  })
  return {
    harness,
    people,
    organisations: { customer, supplier, elsewhere },
    mails,
    /** Every line the worker has logged. */
    logged,
    inviteMember: (
      body: Record<string, unknown>,
      by = people.buyer,
      side: Side = 'customer',
      of = customer,
    ) =>
      harness.as(side, by).call(invitations.inviteMember, at(of), { body: { roles: ['reader'], ...body } }),
    inviteSupplier: (body: Record<string, unknown>, by = people.buyer, of = customer) =>
      harness.as('customer', by).call(invitations.inviteSupplier, at(of), {
        body: { supplierName: 'Gear shop', ...body },
      }),
    /** The raw answer to an act on an invitation, as its path below the organisation names it. */
    act: (
      path: string,
      body: Record<string, unknown>,
      by = people.buyer,
      side: Side = 'customer',
      of = customer,
    ) => harness.as(side, by).send('post', `/organisations/${of.id}/${path}`).send(body),
    /** The token of the newest mail to an address. */
    async token(address: string): Promise<string> {
      const mail = (await mails()).filter(({ to }) => to.address === address).pop()
      const link = /^https?:\S+$/m.exec(mail?.text ?? '')?.[0]
      if (!link) throw new Error(`No mail to ${address} came.`)
      return new URL(link).hash.slice(1)
    },
    open: (token: string, person: Person, side: Side = 'supplier') =>
      harness.as(side, person).send('post', '/invitations/open').send({ token }),
    accept: (token: string, person: Person, more: Record<string, unknown> = {}, side: Side = 'supplier') =>
      harness
        .as(side, person)
        .send('post', '/invitations/accept')
        .send({ token, ...more }),
    /** Gives a person an address that the provider has, or has not, verified. */
    setAddress: (person: Person, email: string, verified = true) =>
      harness.owner.query('update users set email = $1, email_verified = $2 where id = $3', [
        ...[email, verified, person.id],
      ]),
    /** A verified person of a new address, without an organisation. */
    async somebody(name: string): Promise<Person> {
      return harness.person(name)
    },
    passDays: (days: number) => harness.moveClock(new Date(harness.now().getTime() + days * 86_400_000)),
    async stop() {
      await system.pool.end()
      await harness.stop()
    },
  }
}

export type InvitationsWorld = Awaited<ReturnType<typeof startInvitations>>
