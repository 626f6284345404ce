import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { invitations, messages, organisations, record, relationships, signIn } from '@evenrule/api/contract'
import { origins, startInvitations, type InvitationsWorld } from './invitations.world'

let world: InvitationsWorld
beforeAll(async () => {
  world = await startInvitations()
})
afterAll(() => world.stop())
beforeEach(() => world.harness.moveClock('2026-11-02T09:00:00.000Z'))

const own = () => ({ organisationId: world.organisations.customer.id })
const newcomer = (number: number) => world.somebody(`Newcomer ${number} ${Math.random()}`)

describe('inviting a member', () => {
  it('sends a mail that says who asks whom to what, with a link into the app of the inviter’s side', async () => {
    const { buyer } = world.people
    const invited = await world.inviteMember({
      email: 'Audit.Or@people.example',
      roles: ['reader'],
      endsOn: '2026-12-31',
      message: 'For the yearly audit.\nSee you on Monday.',
    })
    expect(invited).toMatchObject({
      ...{ kind: 'member', state: 'pending', email: 'Audit.Or@people.example', roles: ['reader'] },
      ...{ endsOn: '2026-12-31', expiresOn: '2026-11-16', invitedBy: buyer.name, rowVersion: 1 },
    })
    const [mail, ...more] = await world.mails()
    expect(more).toEqual([])
    expect(mail?.to).toEqual({ name: '', address: 'Audit.Or@people.example' })
    expect(mail?.subject).toBe('Join Customer works in Evenrule')
    const lines = mail?.text.split('\n') ?? []
    expect(lines[0]).toBe(
      'Ada Vogt of Customer works invites you to work in Evenrule as a member of Customer works: reader, until 31 Dec 2026.',
    )
    expect(lines).toContain('> For the yearly audit.')
    expect(lines).toContain('> See you on Monday.')
    expect(mail?.text).toContain('once, until 16 Nov 2026, and only for Audit.Or@people.example')
    const link = new URL(lines.find((line) => line.startsWith('http')) ?? '')
    expect(link.origin + link.pathname + link.search).toBe(`${origins.customer}/invitation`)
    expect(link.hash).toMatch(/^#[\w-]{43}$/)
  })

  it('from the supplier app leads to the supplier app', async () => {
    await world.inviteMember(
      ...([
        { email: 'shop@people.example' },
        world.people.owner,
        'supplier',
        world.organisations.supplier,
      ] as const),
    )
    const [mail] = await world.mails()
    expect(mail?.text).toContain(`${origins.supplier}/invitation#`)
  })

  it('keeps the token nowhere: not in the database, not in the log', async () => {
    const token = await inviteAndToken('secret.keeper@people.example')
    const { rows: tables } = await world.harness.owner.query<{ name: string }>(
      `select quote_ident(schemaname) || '.' || quote_ident(tablename) as name from pg_tables where schemaname in ('public', 'session')`,
    )
    expect(tables.length).toBeGreaterThan(30)
    for (const { name } of tables) {
      const { rowCount } = await world.harness.owner.query(
        `select from ${name} t where strpos(t::text, $1) > 0`,
        [token],
      )
      expect([name, rowCount]).toEqual([name, 0])
    }
    expect(world.logged.length).toBeGreaterThan(0)
    expect(world.logged.join('')).not.toContain(token)
    expect(world.logged.join('')).not.toContain('secret.keeper')
  })

  it.each([
    [{ email: 'nobody' }, 422, 'body.email'],
    [{ email: 'a@b.example\r\nBcc: all@people.example' }, 422, 'body.email'],
    [{ roles: [] }, 422, 'body.roles'],
    [{ endsOn: '2026-11-01' }, 422, 'body.endsOn'],
    [{ message: 'x'.repeat(1001) }, 422, 'body.message'],
    // Oneself, a member in other letters, and an address that is invited already.
    [{ email: 'ADA.vogt@people.example' }, 409, 'body.email'],
    [{ email: 'Ben.KROL@people.example' }, 409, 'body.email'],
  ])('refuses %# at its field', async (wrong, status, path) => {
    const answer = await world.act('invitations', { email: 'x@people.example', roles: ['reader'], ...wrong })
    expect([answer.status, answer.body.errors?.[0]?.path]).toEqual([status, path])
  })

  it('refuses a second one to the same address, in any case and at the same time', async () => {
    const body = { email: 'Twice@people.example', roles: ['reader'] }
    const answers = await Promise.all([1, 2, 3].map(() => world.act('invitations', body)))
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409, 409])
    const again = await world.act('invitations', { ...body, email: 'tWICE@PEOPLE.example' })
    expect(again.body).toMatchObject({ status: 409, errors: [{ path: 'body.email' }] })
    expect(again.body.errors[0].message).toContain('invited already')
    // The address is free again once the first is revoked, and for an invitation of the other kind.
    const found = await list({ search: 'twice@' })
    const id = found.items[0]?.id ?? ''
    expect((await world.act(`invitations/${id}/revoke`, { expectedVersion: 1 })).status).toBe(200)
    expect((await world.act('invitations', body)).status).toBe(200)
    expect((await world.act('supplier-invitations', { ...body, supplierName: 'Twice' })).status).toBe(200)
  })

  it('is for admins alone, and lists and acts are of one organisation', async () => {
    const { representative, stranger, owner } = world.people
    const body = { email: 'y@people.example', roles: ['reader'] }
    expect((await world.act('invitations', body, representative)).body.code).toBe('not-allowed')
    expect((await world.act('invitations', body, stranger)).status).toBe(404)
    const { id } = await world.inviteMember({ email: 'ours@people.example' })
    for (const act of ['resend', 'revoke']) {
      const version = { expectedVersion: 1 }
      expect((await world.act(`invitations/${id}/${act}`, version, representative)).status).toBe(403)
      const home = world.organisations.supplier
      expect((await world.act(`invitations/${id}/${act}`, version, owner, 'supplier', home)).status).toBe(404)
      // A member's invitation is none of a supplier.
      expect((await world.act(`supplier-invitations/${id}/${act}`, version)).status).toBe(404)
    }
    const theirs = await world.harness
      .as('supplier', owner)
      .call(invitations.listInvitations, { organisationId: world.organisations.supplier.id })
    expect(theirs.items.map(({ email }) => email)).not.toContain('ours@people.example')
  })

  it('stands in the journal without the address', async () => {
    const { id } = await world.inviteMember({ email: 'journal@people.example' })
    const { items } = await world.harness
      .as('customer', world.people.buyer)
      .call(record.listEvents, own(), { query: { subjectType: 'invitation', subjectId: id } })
    expect(items).toMatchObject([
      { type: 'invitation.sent', subject: { label: 'journal@people.example' }, data: { kind: 'member' } },
    ])
    expect(items[0]?.text).not.toContain('journal@')
  })
})

const list = (query: Record<string, unknown> = {}) =>
  world.harness
    .as('customer', world.people.representative)
    .call(invitations.listInvitations, own(), { query: { size: 100, ...query } })

async function inviteAndToken(email: string, more: Record<string, unknown> = {}): Promise<string> {
  await world.inviteMember({ email, ...more })
  return world.token(email)
}

describe('accepting as a member', () => {
  it('takes the verified address in any case, makes a member with the roles, and tells the inviter', async () => {
    const person = await newcomer(1)
    const token = await inviteAndToken(person.email.toUpperCase(), {
      ...{ roles: ['quality-representative', 'reader'], endsOn: '2027-01-31' },
    })
    expect((await world.open(token, person, 'customer')).body).toMatchObject({
      ...{ kind: 'member', state: 'pending', side: 'customer', organisation: 'Customer works' },
      ...{ invitedBy: 'Ada Vogt', choices: [], acceptedFor: null, endsOn: '2027-01-31' },
    })
    const accepted = await world.accept(token, person, {}, 'customer')
    expect(accepted.body).toEqual({
      ...{ organisationId: world.organisations.customer.id, side: 'customer', relationshipId: null },
    })
    const session = await world.harness.as('customer', person).call(signIn.readSession, {})
    expect(session.organisations).toMatchObject([
      { name: 'Customer works', roles: ['quality-representative', 'reader'] },
    ])
    const { items } = await world.harness
      .as('customer', world.people.buyer)
      .call(messages.listMessages, own(), { query: { kind: 'invitation' } })
    expect(items[0]).toMatchObject({
      subject: `${person.name} has joined`,
      link: expect.stringMatching(/members$/),
    })
    const mail = (await world.mails()).find(({ subject }) => subject === `${person.name} has joined`)
    expect(mail?.to.address).toBe(world.people.buyer.email)
    const events = await world.harness
      .as('customer', world.people.buyer)
      .call(record.listEvents, own(), { query: { type: 'member.joined', personId: person.id } })
    expect(events.items).toMatchObject([{ subject: { id: person.id, label: person.name } }])
    expect((await list({ search: person.email })).items).toMatchObject([
      { state: 'accepted', acceptedBy: person.name, invitedBy: 'Ada Vogt' },
    ])
    // Used once, for good; whoever accepted it is told where it led.
    expect((await world.accept(token, person)).body.code).toBe('invitation-used')
    expect((await world.open(token, person)).body).toMatchObject({
      ...{ state: 'accepted', acceptedFor: world.organisations.customer.id },
    })
  })

  it('is refused with another verified address, told only by a mask, and is not used up by it', async () => {
    const person = await newcomer(2)
    const token = await inviteAndToken(person.email)
    const { stranger } = world.people
    for (const answer of [await world.open(token, stranger), await world.accept(token, stranger)]) {
      expect(answer.body).toMatchObject({ status: 403, code: 'invitation-for-another-address' })
      expect(answer.body.detail).toContain('n•••@p•••.example')
      expect(answer.body.detail).toContain(stranger.email)
      expect(answer.text).not.toContain(person.email)
      expect(answer.text).not.toContain('Customer works')
    }
    expect((await world.accept(token, person)).status).toBe(200)
    const { rows } = await world.harness.owner.query(
      `select from security_events where kind = 'invitation-refused' and user_id = $1`,
      [stranger.id],
    )
    expect(rows).toHaveLength(2)
  })

  it('is refused with the right address while it is not verified, and goes through afterwards', async () => {
    const person = await newcomer(3)
    const token = await inviteAndToken(person.email)
    await world.setAddress(person, person.email, false)
    for (const answer of [await world.open(token, person), await world.accept(token, person)]) {
      expect(answer.body).toMatchObject({ status: 403, code: 'address-not-verified' })
      expect(answer.body.detail).toContain('Confirm the address')
    }
    await world.setAddress(person, person.email, true)
    expect((await world.accept(token, person)).status).toBe(200)
  })

  it('is possible to the end of the last day by the organisation’s calendar, and not a moment longer', async () => {
    const person = await newcomer(4)
    const token = await inviteAndToken(person.email)
    // 16 November ends in Berlin an hour before it ends in UTC.
    world.harness.moveClock('2026-11-16T23:00:00.000Z')
    const late = await world.accept(token, person)
    expect(late.body).toMatchObject({ status: 409, code: 'invitation-expired' })
    expect(late.body.detail).toContain('until 16 Nov 2026')
    expect((await world.open(token, person)).body.state).toBe('expired')
    expect((await list({ state: 'expired', search: person.email })).total).toBe(1)
    world.harness.moveClock('2026-11-16T22:59:59.000Z')
    expect((await list({ state: 'pending', search: person.email })).total).toBe(1)
    expect((await world.accept(token, person)).status).toBe(200)
  })

  it('never outlasts the last day of the membership offered', async () => {
    const person = await newcomer(5)
    const token = await inviteAndToken(person.email, { endsOn: '2026-11-04' })
    world.passDays(3)
    expect((await world.accept(token, person)).body.code).toBe('invitation-expired')
    const id = (await list({ search: person.email })).items[0]?.id ?? ''
    const again = await world.act(`invitations/${id}/resend`, { expectedVersion: 1 })
    expect(again.body).toMatchObject({ status: 409, code: 'last-day-over' })
  })

  it('is over once it is revoked', async () => {
    const person = await newcomer(6)
    const invited = await world.inviteMember({ email: person.email })
    const token = await world.token(person.email)
    const revoked = await world.act(`invitations/${invited.id}/revoke`, { expectedVersion: 1 })
    expect(revoked.body).toMatchObject({ state: 'revoked', rowVersion: 2 })
    expect((await world.accept(token, person)).body).toMatchObject({
      status: 409,
      code: 'invitation-revoked',
    })
    for (const act of ['resend', 'revoke'])
      expect(
        (await world.act(`invitations/${invited.id}/${act}`, { expectedVersion: 2 })).body,
      ).toMatchObject({
        ...{ status: 409, code: 'wrong-state' },
      })
  })

  it('takes the newest link alone: sending again kills the old one, and its mail where that still waits', async () => {
    const person = await newcomer(7)
    const invited = await world.inviteMember({ email: person.email })
    const old = await world.token(person.email)
    world.passDays(20)
    const again = await world.act(`invitations/${invited.id}/resend`, { expectedVersion: 1 })
    expect(again.body).toMatchObject({ state: 'pending', expiresOn: '2026-12-06', rowVersion: 2 })
    expect((await world.act(`invitations/${invited.id}/resend`, { expectedVersion: 1 })).body.code).toBe(
      'changed-meanwhile',
    )
    expect((await world.act(`invitations/${invited.id}/resend`, { expectedVersion: 2 })).status).toBe(200)
    // Two mails wait; only the newest is wanted.
    const mails = (await world.mails()).filter(({ to }) => to.address === person.email)
    expect(mails).toHaveLength(1)
    const token = /#([\w-]{43})$/m.exec(mails[0]?.text ?? '')?.[1] ?? ''
    expect(token).not.toBe(old)
    expect((await world.accept(old, person)).body).toMatchObject({ status: 404, code: 'invitation-unknown' })
    expect((await world.accept(token, person)).status).toBe(200)
    const { rows } = await world.harness.owner.query<{ last_error: string }>(
      'select last_error from outbox where invitation_id = $1 and sent_at is null',
      [invited.id],
    )
    expect(rows).toEqual([{ last_error: expect.stringContaining('sent again') }])
  })

  it('refuses who is a member by now, and brings back one whose membership has ended', async () => {
    const person = await newcomer(8)
    const first = await inviteAndToken(person.email)
    expect((await world.accept(first, person)).status).toBe(200)
    const token = await inviteAndToken('other.way@people.example', { roles: ['customer-approver'] })
    await world.setAddress(person, 'other.way@people.example')
    const refused = await world.accept(token, person)
    expect(refused.body).toMatchObject({ status: 409, code: 'member-already' })
    const buyer = world.harness.as('customer', world.people.buyer)
    await buyer.call(
      organisations.endMember,
      { ...own(), userId: person.id },
      { body: { expectedVersion: 1 } },
    )
    const session = await world.harness.as('customer', person).call(signIn.readSession, {})
    expect([session.organisations, session.ended]).toEqual([
      [],
      [{ name: 'Customer works', endsOn: '2026-11-01' }],
    ])
    expect((await world.accept(token, person)).status).toBe(200)
    const members = await buyer.call(organisations.listMembers, own(), { query: { search: 'other.way' } })
    expect(members.items).toMatchObject([{ roles: ['customer-approver'], endsOn: null, rowVersion: 3 }])
  })

  it('has one winner where twenty accept at once', async () => {
    const person = await newcomer(9)
    const token = await inviteAndToken(person.email)
    const answers = await Promise.all(Array.from({ length: 20 }, () => world.accept(token, person)))
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(1)
    for (const { status, body } of answers)
      if (status !== 200) expect([status, body.code]).toEqual([409, 'invitation-used'])
    const { rowCount } = await world.harness.owner.query('select from memberships where user_id = $1', [
      person.id,
    ])
    expect(rowCount).toBe(1)
    const joined = await world.harness.owner.query(
      `select from record_events where type = 'member.joined' and subject_id = $1`,
      [person.id],
    )
    expect(joined.rowCount).toBe(1)
  })

  it('and revoking at once end in one of both', async () => {
    for (let round = 0; round < 5; round += 1) {
      const person = await newcomer(10)
      const { id } = await world.inviteMember({ email: person.email })
      const token = await world.token(person.email)
      const [accepted, revoked] = await Promise.all([
        world.accept(token, person),
        world.act(`invitations/${id}/revoke`, { expectedVersion: 1 }),
      ])
      expect([accepted.status, revoked.status].sort()).toEqual([200, 409])
      const { rowCount } = await world.harness.owner.query('select from memberships where user_id = $1', [
        person.id,
      ])
      expect(rowCount).toBe(accepted.status === 200 ? 1 : 0)
    }
  })
})

describe('tokens', () => {
  it.each(['', 'x', 'A'.repeat(43), 'A'.repeat(200), "' or 1=1 --", 'é'.repeat(43)])(
    'that nobody was given open nothing: number %#',
    async (token) => {
      for (const answer of [
        await world.open(token, world.people.newcomer),
        await world.accept(token, world.people.newcomer),
      ])
        expect([answer.status, answer.body.code]).toEqual([404, 'invitation-unknown'])
    },
  )

  it('are worth nothing when their hash was put into the database without the secret', async () => {
    const person = await newcomer(11)
    const { id } = await world.inviteMember({ email: person.email })
    const token = await world.token(person.email)
    // Whoever can write to the table, but does not hold the secret, makes up a token with its hash.
    await world.harness.owner.query(
      `update invitations set token_hash = encode(sha256('guessed'::bytea), 'hex') where id = $1`,
      [id],
    )
    expect((await world.accept('guessed', person)).body.code).toBe('invitation-unknown')
    expect((await world.accept(token, person)).body.code).toBe('invitation-unknown')
    expect((await list({ search: person.email })).items).toMatchObject([
      { id, state: 'pending', rowVersion: 1 },
    ])
  })

  it('of more than a text’s length, or none, are refused at their field', async () => {
    for (const wrong of [{ token: 'x'.repeat(201) }, {}, { token: 7 }]) {
      const answer = await world.harness
        .as('supplier', world.people.newcomer)
        .send('post', '/invitations/open')
        .send(wrong)
      expect([answer.status, answer.body.errors?.[0]?.path]).toEqual([422, 'body.token'])
    }
  })
})

describe('lists', () => {
  it('are paged, sorted, searched and told by state', async () => {
    const page = await list({ size: 2, sort: 'email' })
    expect(page.items).toHaveLength(2)
    expect(page.total).toBeGreaterThan(10)
    const emails = async (sort: string) => (await list({ sort })).items.map(({ email }) => email)
    expect(await emails('-email')).toEqual((await emails('email')).reverse())
    const counts = await Promise.all(
      (['pending', 'accepted', 'expired', 'revoked'] as const).map(async (state) => {
        const { items, total } = await list({ state })
        for (const each of items) expect(each.state).toBe(state)
        return total
      }),
    )
    expect(counts.reduce((sum, each) => sum + each, 0)).toBe((await list()).total)
    const relationshipsOf = await world.harness
      .as('customer', world.people.buyer)
      .call(relationships.listRelationships, own())
    expect(relationshipsOf.total).toBe(0)
  })
})
