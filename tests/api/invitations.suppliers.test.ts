import type { RequestHandler } from 'express'
import request from 'supertest'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { gauges, invitations, messages, record, relationships, signIn } from '@evenrule/api/contract'
import { createApp } from '../../packages/api/src/server/app'
import { withPerson, withTenant } from '../../packages/api/src/server/db/tenant'
import { hashOf } from '../../packages/api/src/server/modules/invitations/invitations.token'
import { sql, type Organisation, type Person } from './harness'
import { origins, startInvitations, type InvitationsWorld } from './invitations.world'

let world: InvitationsWorld
beforeAll(async () => {
  world = await startInvitations()
})
afterAll(() => world.stop())
beforeEach(() => world.harness.moveClock('2026-11-02T09:00:00.000Z'))

const shop = { name: 'Gear shop GmbH', timeZone: 'Europe/Vienna', site: 'Hall 1' }
const invited = async (email: string, more: Record<string, unknown> = {}): Promise<string> => {
  await world.inviteSupplier({ email, ...more })
  return world.token(email)
}
const as = (side: 'supplier' | 'customer', person: Person) => world.harness.as(side, person)
const at = ({ id: organisationId }: Organisation) => ({ organisationId })
const count = async (table: string) =>
  (await world.harness.owner.query<{ n: number }>(`select count(*)::integer as n from ${table}`)).rows[0]?.n

describe('inviting a supplier', () => {
  it('sends a mail into the supplier app, which names the supplier as the customer does', async () => {
    const answer = await world.inviteSupplier({
      ...{
        email: 'sales@gears.example',
        supplierName: 'Gear shop',
        supplierNumber: 'B-1',
        message: 'Hello.',
      },
    })
    expect(answer).toMatchObject({
      ...{ kind: 'supplier', supplierName: 'Gear shop', supplierNumber: 'B-1', roles: [], endsOn: null },
    })
    const [mail] = await world.mails()
    expect(mail?.subject).toBe('Customer works invites you to Evenrule as a supplier')
    expect(mail?.text).toContain('Ada Vogt of Customer works invites Gear shop to supply proof')
    expect(mail?.text).toContain('> Hello.')
    expect(mail?.text).toContain(`${origins.supplier}/invitation#`)
  })

  it('is for admins on the customer’s side alone', async () => {
    const body = { email: 'z@people.example', supplierName: 'Z' }
    const { buyer, representative, stranger } = world.people
    const codes = [
      (await world.act('supplier-invitations', body, buyer, 'supplier')).body.code,
      (await world.act('supplier-invitations', body, representative)).body.code,
      (await world.act('supplier-invitations', body, stranger)).body.code,
    ]
    expect(codes).toEqual(['not-allowed', 'not-allowed', 'not-found'])
    const list = await as('customer', representative).call(
      invitations.listSupplierInvitations,
      at(world.organisations.customer),
    )
    expect(list.items).toMatchObject([{ email: 'sales@gears.example', state: 'pending' }])
    const members = await as('customer', representative).call(
      invitations.listInvitations,
      at(world.organisations.customer),
    )
    expect(members.total).toBe(0)
  })

  it.each([
    [{ supplierName: '' }, 422, 'body.supplierName'],
    [{ supplierNumber: '' }, 422, 'body.supplierNumber'],
    [{ email: 'ada.vogt@PEOPLE.example' }, 409, 'body.email'],
    [{ email: 'SALES@gears.example' }, 409, 'body.email'],
  ])('refuses %j at its field', async (wrong, status, path) => {
    const body = { email: 'q@people.example', supplierName: 'Q', ...wrong }
    const answer = await world.act('supplier-invitations', body)
    expect([answer.status, answer.body.errors?.[0]?.path]).toEqual([status, path])
  })
})

describe('a new supplier', () => {
  it('is founded by whoever accepts, who becomes its admin; the record of both begins with it', async () => {
    const person = await world.somebody('Nia Brook Founder')
    const token = await invited(person.email, { supplierNumber: 'B-77', supplierName: 'Gear shop' })
    expect((await world.open(token, person)).body).toMatchObject({
      ...{ kind: 'supplier', supplierName: 'Gear shop', choices: [], side: 'supplier' },
    })
    const answer = await world.accept(token, person, { newOrganisation: shop })
    expect(answer.status).toBe(200)
    const { organisationId, relationshipId } = answer.body as {
      organisationId: string
      relationshipId: string
    }
    const session = await as('supplier', person).call(signIn.readSession, {})
    expect(session.organisations).toMatchObject([
      {
        id: organisationId,
        name: shop.name,
        timeZone: 'Europe/Vienna',
        roles: ['admin'],
        sides: ['supplier'],
      },
    ])
    const sites = await as('supplier', person).call(gauges.listSites, { organisationId })
    expect(sites.items.map(({ name }) => name)).toEqual(['Hall 1'])
    const customer = world.organisations.customer
    const suppliers = await as('customer', world.people.representative).call(
      relationships.listRelationships,
      at(customer),
    )
    expect(suppliers.items).toMatchObject([
      {
        ...{ id: relationshipId, partner: { name: shop.name }, supplierNumber: 'B-77' },
        timeZone: 'Europe/Berlin',
      },
    ])
    for (const [reader, organisation, side] of [
      [person, { id: organisationId }, 'supplier'],
      [world.people.representative, customer, 'customer'],
    ] as const) {
      const chain = await as(side, reader).call(
        record.listEvents,
        { organisationId: organisation.id },
        { query: { chainId: relationshipId } },
      )
      expect(chain.items).toMatchObject([
        {
          ...{ sequence: 1, type: 'relationship.begun', actor: { name: person.name, side: 'supplier' } },
          subject: { label: 'Gear shop GmbH and Customer works' },
        },
      ])
      expect(chain.items[0]?.text).not.toContain(person.email)
    }
    const journal = await as('supplier', person).call(
      record.listEvents,
      { organisationId },
      { query: { chainId: organisationId } },
    )
    expect(journal.items.map(({ type }) => type)).toEqual(['organisation.founded'])
    const told = await as('customer', world.people.buyer).call(messages.listMessages, at(customer), {
      query: { kind: 'invitation' },
    })
    expect(told.items[0]).toMatchObject({ subject: 'Gear shop GmbH is your supplier now' })
    expect(told.items[0]?.body).toContain('You invited it as Gear shop.')
    const mail = (await world.mails()).find(({ to }) => to.address === world.people.buyer.email)
    expect(mail?.text).toContain(`${origins.customer}/organisations/${customer.id}/relationships`)
  })

  it.each([
    [{}, 'body.organisationId'],
    [{ newOrganisation: { ...shop, name: ' ' } }, 'body.newOrganisation.name'],
    [{ newOrganisation: { ...shop, timeZone: 'Mars/Base' } }, 'body.newOrganisation.timeZone'],
    [{ newOrganisation: { ...shop, site: '' } }, 'body.newOrganisation.site'],
    [
      { newOrganisation: shop, organisationId: '0198f5a0-0000-7000-8000-000000000001' },
      'body.organisationId',
    ],
  ])('is refused with %j at its field, and nothing is left of it', async (more, path) => {
    const person = await world.somebody(`Careless ${Math.random()}`)
    const token = await invited(person.email)
    const before = await count('organisations')
    const answer = await world.accept(token, person, more)
    expect([answer.status, answer.body.errors?.[0]?.path]).toEqual([422, path])
    expect(await count('organisations')).toBe(before)
    expect((await world.open(token, person)).body.state).toBe('pending')
  })

  it('comes once, where two windows accept at once', async () => {
    const person = await world.somebody('Two Windows')
    const token = await invited(person.email)
    const before = [await count('organisations'), await count('relationships')]
    const answers = await Promise.all(
      [1, 2, 3, 4].map((number) =>
        world.accept(token, person, { newOrganisation: { ...shop, name: `Window ${number}` } }),
      ),
    )
    expect(answers.map(({ status, body }) => body.code ?? status).sort()).toEqual([
      ...[200, 'invitation-used', 'invitation-used', 'invitation-used'],
    ])
    expect([await count('organisations'), await count('relationships')]).toEqual(
      before.map((each) => (each ?? 0) + 1),
    )
  })

  it('leaves nothing behind where the invitation is another’s', async () => {
    const person = await world.somebody('Right Person')
    const token = await invited(person.email)
    const before = await count('organisations')
    const answer = await world.accept(token, world.people.newcomer, { newOrganisation: shop })
    expect(answer.body.code).toBe('invitation-for-another-address')
    expect(await count('organisations')).toBe(before)
  })
})

describe('an organisation that is there', () => {
  it('accepts through one of its admins, and through nobody else', async () => {
    const { owner, engineer } = world.people
    const { supplier, elsewhere, customer } = world.organisations
    const ofEngineer = await invited(engineer.email)
    expect((await world.open(ofEngineer, engineer)).body.choices).toEqual([
      { id: supplier.id, name: supplier.name, hindrance: 'not-admin' },
    ])
    expect((await world.accept(ofEngineer, engineer, { organisationId: supplier.id })).body.code).toBe(
      'not-allowed',
    )
    expect((await world.accept(ofEngineer, engineer, { organisationId: elsewhere.id })).status).toBe(404)

    const token = await invited(owner.email)
    const { choices } = (await world.open(token, owner)).body as { choices: unknown[] }
    expect(choices).toEqual([{ id: supplier.id, name: supplier.name, hindrance: null }])
    expect((await world.accept(token, owner, { organisationId: supplier.id })).body).toMatchObject({
      organisationId: supplier.id,
    })

    // The second time there is a relationship already, whoever was invited.
    const again = await invited(owner.email)
    expect((await world.open(again, owner)).body.choices).toMatchObject([{ hindrance: 'supplies-already' }])
    const refused = await world.accept(again, owner, { organisationId: supplier.id })
    expect(refused.body).toMatchObject({ status: 409, code: 'supplies-already' })
    expect(refused.body.detail).toContain('Supplier works supplies Customer works here already')
    const { rowCount } = await world.harness.owner.query(
      'select from relationships where supplier_org_id = $1 and customer_org_id = $2',
      [supplier.id, customer.id],
    )
    expect(rowCount).toBe(1)
  })

  it('cannot be its own supplier', async () => {
    const second = await world.somebody('Second Admin')
    await world.harness.owner.query(
      'insert into memberships (org_id, user_id, roles, created_at) values ($1, $2, $3, $4)',
      [world.organisations.customer.id, second.id, ['admin'], world.harness.now()],
    )
    const token = await invited(second.email)
    const itself = world.organisations.customer
    expect((await world.open(token, second)).body.choices).toMatchObject([{ hindrance: 'inviter-itself' }])
    const refused = await world.accept(token, second, { organisationId: itself.id })
    expect(refused.body).toMatchObject({ status: 409, code: 'supplier-itself' })
    // Founding another with it is possible.
    expect(
      (await world.accept(token, second, { newOrganisation: { ...shop, name: 'Own shop' } })).status,
    ).toBe(200)
  })

  it('gets one relationship where its admins accept two invitations at once', async () => {
    const { stranger } = world.people
    const { elsewhere } = world.organisations
    const partner = await world.somebody('Partner Admin')
    await world.harness.owner.query(
      'insert into memberships (org_id, user_id, roles, created_at) values ($1, $2, $3, $4)',
      [elsewhere.id, partner.id, ['admin'], world.harness.now()],
    )
    const tokens = [await invited(stranger.email), await invited(partner.email)]
    const answers = await Promise.all([
      world.accept(tokens[0] ?? '', stranger, { organisationId: elsewhere.id }),
      world.accept(tokens[1] ?? '', partner, { organisationId: elsewhere.id }),
    ])
    expect(answers.map(({ body, status }) => body.code ?? status).sort()).toEqual([200, 'supplies-already'])
  })

  it('two that invite each other and accept at the same moment do not lock each other out', async () => {
    const first = await world.somebody('First Maker')
    const second = await world.somebody('Second Maker')
    const [one, two] = [
      await world.harness.organisation('First maker', [[first, ['admin']]]),
      await world.harness.organisation('Second maker', [[second, ['admin']]]),
    ]
    await world.inviteSupplier({ email: second.email }, first, one)
    const ofSecond = await world.token(second.email)
    await world.inviteSupplier({ email: first.email }, second, two)
    const ofFirst = await world.token(first.email)
    const answers = await Promise.all([
      world.accept(ofSecond, second, { organisationId: two.id }),
      world.accept(ofFirst, first, { organisationId: one.id }),
    ])
    expect(answers.map(({ status }) => status)).toEqual([200, 200])
  })
})

describe('past the services', () => {
  const inTransaction = (person: Person, statement: ReturnType<typeof sql>, organisationId = '') =>
    organisationId
      ? withTenant(
          world.harness.database,
          world.harness.services,
          { organisationId, userId: person.id, side: 'supplier', roles: [], authenticatedAt: '' },
          ({ tx }) => tx.execute(statement),
        )
      : withPerson(world.harness.database, person.id, (tx) => tx.execute(statement))
  const refusedBy = async (work: Promise<unknown>) =>
    work.then(
      () => 'done',
      (error: { cause?: { code?: string } }) => error.cause?.code,
    )

  it('nobody uses an invitation of another, founds without one, or accepts for an organisation of others', async () => {
    const person = await world.somebody('Invited Alone')
    const { stranger } = world.people
    const hash = hashOf(await invited(person.email))
    const fresh = '0198f5a0-0000-7000-8000-0000000000aa'
    const accept = sql`select accept_invitation(${hash}, ${fresh}::uuid, now())`
    const found = (of: string) => sql`select found_organisation(${of}, 'X', 'Europe/Berlin', now())`
    const home = world.organisations.elsewhere.id
    expect(await refusedBy(inTransaction(stranger, accept, home))).toBe('42501')
    expect(await refusedBy(inTransaction(stranger, found(hash), fresh))).toBe('42501')
    expect(await refusedBy(inTransaction(person, found(hashOf('none')), fresh))).toBe('42501')
    // The right person, for an organisation that is not theirs.
    expect(await refusedBy(inTransaction(person, accept, home))).toBe('42501')
    await world.setAddress(person, person.email, false)
    expect(await refusedBy(inTransaction(person, found(hash), fresh))).toBe('42501')
  })

  it('nobody writes down an acceptance, or mails an invitation of another organisation', async () => {
    const { id } = await world.inviteSupplier({ email: 'direct@people.example' })
    const home = world.organisations.customer.id
    const used = sql`update invitations set accepted_at = now() where id = ${id}`
    expect(await refusedBy(inTransaction(world.people.buyer, used, home))).toBe('42501')
    await world.mails()
    await inTransaction(
      world.people.stranger,
      sql`select mail_invitation(${id}::uuid, now())`,
      world.organisations.elsewhere.id,
    )
    expect(await world.mails()).toEqual([])
  })
})

it('a person can try only so many links in a minute, and others are not held up by it', async () => {
  const session: RequestHandler = (req, _res, next) => {
    const userId = req.headers['x-person']
    Object.assign(req, {
      session: { person: { userId, name: '', email: '', authenticatedAt: '', signedInAt: '' } },
    })
    next()
  }
  const app = createApp({
    ...{ side: 'supplier' as const, origin: origins.supplier, session, routes: world.harness.routes },
    ...{ database: world.harness.database, services: world.harness.services },
  })
  const attempt = (person: Person, path = 'open') =>
    request(app)
      .post(`/api/v1/invitations/${path}`)
      .set({ origin: origins.supplier, 'x-evenrule-client': '1', 'x-person': person.id })
      .send({ token: 'guess' })
  const { newcomer, stranger } = world.people
  for (let number = 0; number < 30; number += 1)
    expect((await attempt(newcomer, number % 2 ? 'open' : 'accept')).status).toBe(404)
  for (const path of ['open', 'accept'])
    expect((await attempt(newcomer, path)).body).toMatchObject({ status: 429, code: 'too-many' })
  expect((await attempt(stranger)).status).toBe(404)
})
