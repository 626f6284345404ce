import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { organisations, record } from '@evenrule/api/contract'
import { startHarness, type Harness, type Organisation, type Person } from './harness'

let harness: Harness
let own: Organisation, other: Organisation
let admin: Person, deputy: Person, engineer: Person, reader: Person, stranger: Person

beforeAll(async () => {
  harness = await startHarness()
  admin = await harness.person('Ada Vogt')
  deputy = await harness.person('Ben Krol')
  engineer = await harness.person('Cleo Marsh')
  reader = await harness.person('Dan Osei')
  stranger = await harness.person('Rory Finch')
  own = await harness.organisation('Own works')
  other = await harness.organisation('Other works', [[stranger, ['admin']]])
  await harness.relationship(own, other)
})
afterAll(() => harness.stop())

beforeEach(async () => {
  harness.moveClock('2026-11-02T09:00:00.000Z')
  await harness.owner.query('delete from memberships where org_id = $1', [own.id])
  for (const [person, roles] of [
    [admin, ['admin']],
    [deputy, ['admin', 'supplier-approver']],
    [engineer, ['gauge-engineer']],
    [reader, ['reader']],
  ] as const)
    await harness.owner.query(
      'insert into memberships (org_id, user_id, roles, created_at) values ($1, $2, $3, $4)',
      [own.id, person.id, roles, harness.now()],
    )
})

const at = <P extends Record<string, string>>(more?: P) => ({ organisationId: own.id, ...more })
const as = (person: Person) => harness.as('supplier', person)
const members = (query: Record<string, unknown> = {}, person = admin) =>
  as(person).call(organisations.listMembers, at(), { query })
const change = (person: Person, of: Person, body: Record<string, unknown>) =>
  as(person)
    .send('put', `/organisations/${own.id}/members/${of.id}`)
    .send({ roles: ['reader'], endsOn: null, expectedVersion: 1, ...body })

describe('members', () => {
  it('are listed with name, e-mail and roles, for every role, in either app', async () => {
    const page = await members({}, reader)
    expect(page.total).toBe(4)
    expect(page.items[0]).toMatchObject({
      id: admin.id,
      name: 'Ada Vogt',
      email: admin.email,
      roles: ['admin'],
      endsOn: null,
      ended: false,
    })
    expect(page.items.map(({ name }) => name)).toEqual(['Ada Vogt', 'Ben Krol', 'Cleo Marsh', 'Dan Osei'])
    const otherApp = await harness.as('customer', reader).call(organisations.listMembers, at())
    expect(otherApp.total).toBe(4)
  })

  it('are searched, filtered by role, sorted and paged', async () => {
    const names = async (query: Record<string, unknown>) =>
      (await members(query)).items.map(({ name }) => name)
    expect(await names({ search: 'CLEO' })).toEqual(['Cleo Marsh'])
    expect(await names({ search: 'ben.krol@' })).toEqual(['Ben Krol'])
    expect(await names({ search: '%' })).toEqual([])
    expect(await names({ role: 'admin' })).toEqual(['Ada Vogt', 'Ben Krol'])
    expect(await names({ sort: '-name', size: 2 })).toEqual(['Dan Osei', 'Cleo Marsh'])
    expect(await names({ sort: 'name', size: 3, page: 2 })).toEqual(['Dan Osei'])
    expect(await names({ search: 'Rory' })).toEqual([])
  })

  it('get a set of roles, in the order of the product, and it stands in the journal', async () => {
    const answer = await change(admin, engineer, {
      roles: ['reader', 'supplier-approver', 'gauge-engineer', 'reader'],
    })
    expect(answer.body).toMatchObject({
      roles: ['gauge-engineer', 'supplier-approver', 'reader'],
      rowVersion: 2,
    })
    const { items } = await as(admin).call(record.listEvents, at(), { query: { subjectType: 'member' } })
    expect(items[0]).toMatchObject({
      type: 'member.changed',
      chainId: own.id,
      subject: { id: engineer.id, label: 'Cleo Marsh' },
      data: { roles: ['gauge-engineer', 'supplier-approver', 'reader'], endsOn: null },
    })
    expect(items[0]?.text).not.toContain('Cleo')
  })

  it('whose role is taken away lose it with the next request', async () => {
    expect((await change(deputy, admin, { roles: ['reader'] })).status).toBe(200)
    expect((await change(admin, deputy, { roles: ['reader'] })).body).toMatchObject({
      status: 403,
      code: 'not-allowed',
    })
  })

  it.each([
    [{ roles: [] }, 'body.roles'],
    [{ roles: ['owner'] }, 'body.roles.0'],
    [{ endsOn: '2026-11-01' }, 'body.endsOn'],
    [{ endsOn: 'soon' }, 'body.endsOn'],
  ])('refuse %j at its field', async (wrong, path) => {
    const answer = await change(admin, engineer, wrong)
    expect(answer.status).toBe(422)
    expect(answer.body.errors[0].path).toBe(path)
  })

  it('refuse a stale version', async () => {
    expect((await change(admin, engineer, {})).status).toBe(200)
    expect((await change(deputy, engineer, {})).body).toMatchObject({
      status: 409,
      code: 'changed-meanwhile',
    })
  })

  it('are changed by admins of the same organisation alone', async () => {
    for (const person of [engineer, reader]) expect((await change(person, reader, {})).status).toBe(403)
    expect((await change(stranger, reader, {})).status).toBe(404)
    expect((await change(admin, stranger, {})).status).toBe(404)
    const foreign = await harness
      .as('supplier', admin)
      .send('put', `/organisations/${other.id}/members/${stranger.id}`)
      .send({ roles: ['reader'], endsOn: null, expectedVersion: 1 })
    expect(foreign.status).toBe(404)
  })
})

describe('the end of a membership', () => {
  it('comes after its last day, by the organisation’s own calendar', async () => {
    expect((await change(admin, reader, { endsOn: '2026-11-03' })).body).toMatchObject({
      endsOn: '2026-11-03',
      ended: false,
    })
    // In Berlin the day ends an hour before it does in UTC.
    harness.moveClock('2026-11-03T22:59:00.000Z')
    expect((await members({}, reader)).total).toBe(4)
    harness.moveClock('2026-11-03T23:00:00.000Z')
    expect((await as(reader).send('get', `/organisations/${own.id}/members`)).status).toBe(404)
    expect((await members()).items.map(({ name }) => name)).not.toContain('Dan Osei')
    expect((await members({ show: 'ended' })).items).toMatchObject([{ name: 'Dan Osei', ended: true }])
    expect((await members({ show: 'all' })).total).toBe(4)
  })

  it('can be at once, and taken back', async () => {
    const params = at({ userId: engineer.id })
    const ended = await as(admin).call(organisations.endMember, params, { body: { expectedVersion: 1 } })
    expect(ended).toMatchObject({ ended: true, endsOn: '2026-11-01', roles: ['gauge-engineer'] })
    expect((await as(engineer).send('get', `/organisations/${own.id}/members`)).status).toBe(404)
    const back = await as(admin).call(organisations.changeMember, params, {
      body: { roles: ['gauge-engineer'], endsOn: null, expectedVersion: 2 },
    })
    expect(back).toMatchObject({ ended: false, rowVersion: 3 })
    expect((await members({}, engineer)).total).toBe(4)
  })
})

describe('an organisation', () => {
  const end = (person: Person, of: Person) =>
    as(person).send('post', `/organisations/${own.id}/members/${of.id}/end`).send({ expectedVersion: 1 })

  it('keeps one admin without a last day', async () => {
    expect((await change(admin, deputy, { roles: ['supplier-approver'] })).status).toBe(200)
    for (const answer of [
      await change(admin, admin, { roles: ['reader'] }),
      await change(admin, admin, { roles: ['admin'], endsOn: '2027-01-01' }),
      await end(admin, admin),
    ])
      expect(answer.body).toMatchObject({ status: 409, code: 'last-admin' })
    expect((await members({ role: 'admin' })).items).toMatchObject([{ id: admin.id, rowVersion: 1 }])
  })

  it('keeps one even when two admins take each other’s role away at the same time', async () => {
    for (let round = 1; round <= 5; round++) {
      await harness.owner.query(
        `update memberships set roles = '{admin}', row_version = 1, ends_on = null where org_id = $1 and user_id = any($2)`,
        [own.id, [admin.id, deputy.id]],
      )
      const answers = await Promise.all([
        round % 2 ? change(admin, deputy, {}) : end(admin, deputy),
        change(deputy, admin, {}),
      ])
      expect(answers.map(({ status }) => status).sort()).toEqual([200, expect.any(Number)])
      expect(answers.some(({ status }) => status === 403 || status === 404 || status === 409)).toBe(true)
      const { rows } = await harness.owner.query(
        `select user_id from memberships where org_id = $1 and 'admin' = any(roles) and ends_on is null`,
        [own.id],
      )
      expect(rows).toHaveLength(1)
    }
  })

  it('has a name and a time zone, which an admin changes', async () => {
    const before = await as(reader).call(organisations.readOrganisation, at())
    expect(before).toMatchObject({ id: own.id, name: 'Own works', timeZone: 'Europe/Berlin', rowVersion: 1 })
    const changed = await as(admin).call(organisations.changeOrganisation, at(), {
      body: { name: 'Own works and sons', timeZone: 'America/Toronto', expectedVersion: 1 },
    })
    expect(changed).toMatchObject({ name: 'Own works and sons', timeZone: 'America/Toronto', rowVersion: 2 })
    const stale = await as(admin)
      .send('put', `/organisations/${own.id}`)
      .send({ name: 'X', timeZone: 'UTC', expectedVersion: 1 })
    expect(stale.body).toMatchObject({ status: 409, code: 'changed-meanwhile' })
    const refused = await as(deputy)
      .send('put', `/organisations/${other.id}`)
      .send({ name: 'X', timeZone: 'UTC', expectedVersion: 1 })
    expect(refused.status).toBe(404)
    const { items } = await as(admin).call(record.listEvents, at(), {
      query: { type: 'organisation.changed' },
    })
    expect(items[0]?.data).toEqual({ name: 'Own works and sons', timeZone: 'America/Toronto' })
  })

  it.each(['Europe/Atlantis', '+01:00', '', 'Berlin'])('refuses the time zone “%s”', async (timeZone) => {
    const answer = await as(admin)
      .send('put', `/organisations/${own.id}`)
      .send({ name: 'X', timeZone, expectedVersion: 1 })
    expect(answer.body).toMatchObject({ status: 422, errors: [{ path: 'body.timeZone' }] })
  })
})
