import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { messages } from '@evenrule/api/contract'
import type { MessageKind } from '../../packages/api/src/contract/messages'
import { startHarness, type Harness, type Organisation, type Person } from './harness'

let harness: Harness
let supplier: Organisation, customer: Organisation
let engineer: Person, representative: Person, colleague: Person, both: Person

beforeAll(async () => {
  harness = await startHarness()
  engineer = await harness.person('Ada Vogt')
  representative = await harness.person('Cleo Marsh')
  colleague = await harness.person('Dan Osei')
  both = await harness.person('Eva Lind')
  supplier = await harness.organisation('Supplier', [[engineer, ['gauge-engineer']]])
  customer = await harness.organisation('Customer', [
    [representative, ['quality-representative']],
    [colleague, ['quality-representative']],
    [both, ['gauge-engineer', 'reader']],
  ])
  await harness.relationship(supplier, customer)
})
afterAll(() => harness.stop())
beforeEach(async () => {
  harness.moveClock('2026-11-02T09:00:00.000Z')
  await harness.owner.query('delete from outbox')
  await harness.owner.query('delete from messages')
  await harness.owner.query(`update users set muted_mail = '[]'`)
  await harness.owner.query('update memberships set roles = $1 where user_id = $2', [
    ['gauge-engineer', 'reader'],
    both.id,
  ])
})

const tell = (
  subject: string,
  more: { kind?: MessageKind; body?: string; side?: 'supplier' | 'customer' } = {},
) =>
  harness.inTenant('supplier', supplier, engineer, ['gauge-engineer'], async (tenant) =>
    tenant.notify({
      organisationId: customer.id,
      side: more.side ?? 'customer',
      roles: more.side === 'supplier' ? ['gauge-engineer'] : ['quality-representative'],
      kind: more.kind ?? 'submission',
      subject,
      body: more.body ?? 'It waits for your decision.',
      path: 'submissions/0198f5a0-0000-7000-8000-000000000001',
    }),
  )
const at = <P extends Record<string, string>>(more?: P) => ({ organisationId: customer.id, ...more })
const inbox = (
  person = representative,
  query: Record<string, unknown> = {},
  side: 'supplier' | 'customer' = 'customer',
) => harness.as(side, person).call(messages.listMessages, at(), { query })

describe('messages', () => {
  it('come to every member with the role, the latest first, with a link into their app', async () => {
    await tell('First')
    harness.moveClock('2026-11-02T10:00:00.000Z')
    await tell('Second')
    for (const person of [representative, colleague]) {
      const page = await inbox(person)
      expect(page).toMatchObject({ total: 2, unread: 2 })
      expect(page.items.map(({ subject }) => subject)).toEqual(['Second', 'First'])
      expect(page.items[0]).toMatchObject({
        kind: 'submission',
        body: 'It waits for your decision.',
        link: `/organisations/${customer.id}/submissions/0198f5a0-0000-7000-8000-000000000001`,
        createdAt: '2026-11-02T10:00:00.000Z',
        readAt: null,
      })
    }
    expect((await inbox(both)).total).toBe(0)
  })

  it('are searched, filtered by kind and by unread, sorted and paged', async () => {
    await tell('Agreement for 7741', { kind: 'agreement', body: 'Nineteen clauses.' })
    harness.moveClock('2026-11-02T10:00:00.000Z')
    await tell('Proof for 7741')
    const subjects = async (query: Record<string, unknown>) =>
      (await inbox(representative, query)).items.map(({ subject }) => subject)
    expect(await subjects({ search: 'nineteen' })).toEqual(['Agreement for 7741'])
    expect(await subjects({ kind: 'submission' })).toEqual(['Proof for 7741'])
    expect(await subjects({ sort: 'subject' })).toEqual(['Agreement for 7741', 'Proof for 7741'])
    expect(await subjects({ size: 1, page: 2 })).toEqual(['Agreement for 7741'])
    const first = (await inbox()).items[0]
    await harness
      .as('customer', representative)
      .call(messages.markMessageRead, at({ messageId: first?.id ?? '' }))
    expect(await subjects({ show: 'unread' })).toEqual(['Agreement for 7741'])
    expect(await inbox(representative, { kind: 'submission' })).toMatchObject({ total: 1, unread: 1 })
    const wrong = await harness
      .as('customer', representative)
      .send('get', `/organisations/${customer.id}/messages?sort=body`)
    expect(wrong.status).toBe(422)
  })

  it('are marked read once, for the reader alone', async () => {
    await tell('Read me')
    const message = (await inbox()).items[0]
    const mark = () =>
      harness
        .as('customer', representative)
        .call(messages.markMessageRead, at({ messageId: message?.id ?? '' }))
    harness.moveClock('2026-11-02T11:00:00.000Z')
    expect((await mark()).readAt).toBe('2026-11-02T11:00:00.000Z')
    harness.moveClock('2026-11-02T12:00:00.000Z')
    expect((await mark()).readAt).toBe('2026-11-02T11:00:00.000Z')
    expect((await inbox()).unread).toBe(0)
    expect((await inbox(colleague)).unread).toBe(1)
  })

  it('are marked read all at once, on this side alone', async () => {
    await tell('For the customer side')
    await tell('For the customer side again')
    await harness.owner.query('update memberships set roles = $1 where user_id = $2', [
      ['gauge-engineer', 'quality-representative'],
      both.id,
    ])
    await tell('To both sides of one person')
    await tell('As a supplier', { side: 'supplier' })
    const all = () => harness.as('customer', both).call(messages.markAllMessagesRead, at())
    expect(await all()).toEqual({ marked: 1 })
    expect(await all()).toEqual({ marked: 0 })
    expect(await inbox(both, {}, 'supplier')).toMatchObject({ total: 1, unread: 1 })
    expect(await inbox()).toMatchObject({ unread: 3 })
  })

  it('of others are not there, even for members of the same organisation', async () => {
    await tell('Mine')
    const mine = (await inbox()).items[0]
    for (const [person, side] of [
      [colleague, 'customer'],
      [representative, 'supplier'],
    ] as const)
      for (const [method, path] of [
        ['get', ''],
        ['post', '/read'],
      ] as const) {
        const answer = await harness
          .as(side, person)
          .send(method, `/organisations/${customer.id}/messages/${mine?.id}${path}`)
        expect(answer.status).toBe(404)
      }
    expect((await inbox()).unread).toBe(1)
  })
})

describe('mail', () => {
  it('of a kind that somebody does not want is not written; the message is', async () => {
    const mine = harness.as('customer', representative)
    expect(await mine.call(messages.readMailChoice, at())).toEqual({ email: representative.email, muted: [] })
    const chosen = await mine.call(messages.changeMailChoice, at(), {
      body: { muted: ['submission', 'agreement', 'submission'] },
    })
    expect(chosen.muted).toEqual(['agreement', 'submission'])
    await tell('Only in the app')
    const mailed = await harness.owner.query<{ user_id: string }>(
      'select m.user_id from outbox o join messages m on m.id = o.message_id',
    )
    expect(mailed.rows).toEqual([{ user_id: colleague.id }])
    expect((await inbox()).total).toBe(1)
    await mine.call(messages.changeMailChoice, at(), { body: { muted: [] } })
    await tell('By mail too')
    expect((await harness.owner.query('select from outbox')).rowCount).toBe(3)
  })

  it('refuses kinds there are not', async () => {
    const answer = await harness
      .as('customer', representative)
      .send('put', `/organisations/${customer.id}/mail-choice`)
      .send({ muted: ['advertising'] })
    expect(answer.status).toBe(422)
    expect(answer.body.errors[0].path).toBe('body.muted.0')
  })
})
