import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { parts, record } from '@evenrule/api/contract'
import {
  canonicalText,
  genesisHash,
  sha256,
  type PendingEvent,
} from '../../packages/api/src/server/modules/record/record.append'
import { sql, startHarness, type Harness, type Organisation, type Person, type Relationship } from './harness'

let harness: Harness
let supplier: Organisation, customer: Organisation, rival: Organisation
let relationship: Relationship, other: Relationship
let engineer: Person, representative: Person, competitor: Person

beforeAll(async () => {
  harness = await startHarness()
  engineer = await harness.person('Ada Vogt')
  representative = await harness.person('Cleo Marsh')
  competitor = await harness.person('Rory Finch')
  supplier = await harness.organisation('Supplier', [[engineer, ['gauge-engineer', 'reader']]])
  customer = await harness.organisation('Customer', [[representative, ['quality-representative']]])
  rival = await harness.organisation('Rival', [[competitor, ['gauge-engineer']]])
  relationship = await harness.relationship(supplier, customer)
  other = await harness.relationship(rival, customer)
})
afterAll(() => harness.stop())

const part = '0198f5a0-0000-7000-8000-000000000001'
const task = '0198f5a0-0000-7000-8000-000000000002'
const gauge = '0198f5a0-0000-7000-8000-000000000003'

const append = (
  event: Omit<PendingEvent, 'subject'> & Partial<Pick<PendingEvent, 'subject'>>,
  person = engineer,
) =>
  harness.inTenant('supplier', supplier, person, ['gauge-engineer'], async (tenant) =>
    tenant.record({ subject: { type: 'part', id: part }, ...event }),
  )
const list = (query: Record<string, unknown> = {}) =>
  harness.as('supplier', engineer).call(record.listEvents, { organisationId: supplier.id }, { query })
const check = (chainId: string, query: Record<string, unknown> = {}) =>
  harness
    .as('supplier', engineer)
    .call(record.verifyRecord, { organisationId: supplier.id, chainId }, { query })

describe('the record', () => {
  it('says who did what to which thing, the latest first, in the words of today', async () => {
    harness.moveClock('2026-11-02T09:00:00.000Z')
    const made = await harness.as('supplier', engineer).call(
      parts.createPart,
      { organisationId: supplier.id },
      {
        body: { relationshipId: relationship.id, number: '7741-220', name: 'Bearing seat', revision: 'A' },
      },
    )
    harness.moveClock('2026-11-02T10:00:00.000Z')
    await append({ type: 'gauge.created', subject: { type: 'gauge', id: gauge }, data: { code: 'BG-14' } })
    const page = await list()
    expect(page.total).toBe(2)
    expect(page.items.map(({ type }) => type)).toEqual(['gauge.created', 'part.created'])
    const [journal, shared] = page.items
    expect(journal).toMatchObject({
      chainId: supplier.id,
      sequence: 1,
      previousHash: genesisHash,
      subject: { type: 'gauge', id: gauge, label: null },
      data: { code: 'BG-14' },
    })
    expect(shared).toMatchObject({
      chainId: relationship.id,
      sequence: 1,
      at: '2026-11-02T09:00:00.000Z',
      actor: {
        personId: engineer.id,
        name: 'Ada Vogt',
        organisationId: supplier.id,
        organisation: 'Supplier',
        side: 'supplier',
      },
      subject: { type: 'part', id: made.id, label: '7741-220', pageId: made.id },
    })
    expect(sha256(shared?.text ?? '')).toBe(shared?.hash)
    // The other side reads the same bytes, and nothing of the journal.
    const theirs = await harness
      .as('customer', representative)
      .call(record.listEvents, { organisationId: customer.id })
    expect(theirs.items.map(({ text }) => text)).toEqual([shared?.text])
    expect(theirs.items[0]?.actor).toMatchObject({ name: 'Ada Vogt', organisation: 'Supplier' })
  })

  it('names no person in its text, so that somebody can be erased without breaking it', async () => {
    const before = await check(relationship.id)
    await harness.owner.query('delete from memberships where user_id = $1 and org_id = $2', [
      representative.id,
      customer.id,
    ])
    await harness.inTenant('customer', customer, representative, ['quality-representative'], async (tenant) =>
      tenant.record({ type: 'part.changed', relationship, subject: { type: 'part', id: part } }),
    )
    const [latest] = (await list({ chainId: relationship.id })).items
    expect(latest?.actor).toMatchObject({ personId: representative.id, name: null, organisation: 'Customer' })
    expect(latest?.text).not.toContain('Cleo')
    expect(await check(relationship.id)).toMatchObject({ broken: null, sound: before.sound + 1 })
    await harness.owner.query(
      'insert into memberships (org_id, user_id, roles, created_at) values ($1, $2, $3, now())',
      [customer.id, representative.id, ['quality-representative']],
    )
  })

  it('is filtered by chain, type, subject, task and person, and paged', async () => {
    await append({
      type: 'measuring-task.created',
      relationship,
      taskId: task,
      subject: { type: 'measuring-task', id: task },
    })
    await append({
      type: 'submission.signed',
      relationship,
      taskId: task,
      subject: { type: 'submission', id: gauge },
    })
    const types = async (query: Record<string, unknown>) => (await list(query)).items.map(({ type }) => type)
    expect(await types({ chainId: supplier.id })).toEqual(['gauge.created'])
    expect(await types({ taskId: task })).toEqual(['submission.signed', 'measuring-task.created'])
    expect(await types({ type: 'submission.signed' })).toEqual(['submission.signed'])
    expect(await types({ subjectType: 'part', subjectId: part })).toEqual(['part.changed'])
    expect(await types({ subjectType: 'measuring-task' })).toEqual(['measuring-task.created'])
    expect(await types({ personId: representative.id })).toEqual(['part.changed'])
    const all = await types({ chainId: relationship.id, sort: 'at' })
    expect(all).toHaveLength(4)
    expect(await types({ chainId: relationship.id, sort: '-at' })).toEqual([...all].reverse())
    const second = await list({ chainId: relationship.id, sort: 'at', page: 2, size: 3 })
    expect(second).toMatchObject({ total: 4, page: 2 })
    expect(second.items.map(({ sequence }) => sequence)).toEqual([4])
  })

  it('is filtered by clause and by calendar days of the organisation, and says what there is to choose', async () => {
    harness.moveClock('2026-11-03T23:30:00.000Z')
    await append({
      type: 'submission.signed',
      relationship,
      taskId: task,
      subject: { type: 'submission', id: gauge },
      data: { clauses: [{ clauseKey: 'bias/mean', verdict: 'meets' }] },
    })
    await append({
      type: 'part.changed',
      relationship,
      data: { name: 'a name with "clauseKey":"bias/index" in it' },
    })
    const types = async (query: Record<string, unknown>) => (await list(query)).items.map(({ type }) => type)
    expect(await types({ clauseKey: 'bias/mean' })).toEqual(['submission.signed'])
    expect(await types({ clauseKey: 'bias/index' })).toEqual([])
    // Half past eleven in the evening in UTC is the next day in Berlin.
    expect(await types({ from: '2026-11-04', to: '2026-11-04' })).toEqual([
      'part.changed',
      'submission.signed',
    ])
    expect((await list({ from: '2026-11-05' })).total).toBe(0)
    const choices = await harness
      .as('supplier', engineer)
      .call(
        record.listRecordChoices,
        { organisationId: supplier.id },
        { query: { chainId: relationship.id } },
      )
    expect(choices.clauseKeys).toEqual(['bias/mean'])
    expect(choices.people).toContainEqual({ id: engineer.id, name: 'Ada Vogt', organisation: 'Supplier' })
    expect(choices.tasks).toEqual([])
    harness.moveClock('2026-11-04T09:00:00.000Z')
  })

  it('keeps several events of one act in their order', async () => {
    await harness.inTenant('supplier', supplier, engineer, ['gauge-engineer'], async (tenant) => {
      for (const type of ['study.registered', 'study.computed', 'study.corrected'])
        tenant.record({ type, subject: { type: 'study', id: gauge } })
    })
    const types = (await list({ subjectType: 'study' })).items.map(({ type }) => type)
    expect(types).toEqual(['study.corrected', 'study.computed', 'study.registered'])
  })

  it('is chained without a gap when many append at once', async () => {
    const before = await check(relationship.id)
    await Promise.all(
      Array.from({ length: 12 }, (_, index) =>
        append({ type: 'part.changed', relationship, data: { index } }),
      ),
    )
    expect(await check(relationship.id)).toMatchObject({ broken: null, sound: before.sound + 12 })
  })

  it('of others cannot be read or checked', async () => {
    const outside = harness.as('supplier', competitor)
    for (const chainId of [relationship.id, supplier.id]) {
      const paths = [`record?chainId=${chainId}`, `record/${chainId}/check`]
      for (const path of paths)
        expect((await outside.send('get', `/organisations/${rival.id}/${path}`)).status).toBe(404)
    }
    expect((await outside.call(record.listEvents, { organisationId: rival.id })).total).toBe(0)
    // Nor on the side on which the organisation does not stand in that relationship.
    const wrongSide = await harness
      .as('customer', engineer)
      .send('get', `/organisations/${supplier.id}/record/${relationship.id}/check`)
    expect(wrongSide.status).toBe(404)
    const nothingYet = await outside.call(record.verifyRecord, {
      organisationId: rival.id,
      chainId: other.id,
    })
    expect(nothingYet).toMatchObject({ sound: 0, last: null, broken: null })
  })

  it('cannot be changed or cut by the program itself', async () => {
    for (const statement of [
      sql`update record_events set text = '{}' where chain_id = ${relationship.id}`,
      sql`delete from record_events where chain_id = ${relationship.id}`,
      sql`truncate record_events`,
    ]) {
      const refused = harness.inTenant('supplier', supplier, engineer, ['gauge-engineer'], (tenant) =>
        tenant.tx.execute(statement),
      )
      await expect(refused).rejects.toMatchObject({ cause: { code: '42501' } })
    }
  })
})

describe('a check of the record', () => {
  interface Row {
    sequence: number
    text: string
    previous_hash: string
    hash: string
  }
  let chain: Relationship
  let rows: Row[]

  /** A chain of six events in a relationship of its own, and its rows as the owner of the database sees them. */
  const freshChain = async () => {
    const buyer = await harness.organisation('Buyer')
    chain = await harness.relationship(supplier, buyer)
    for (let number = 1; number <= 6; number++)
      await append({ type: 'part.changed', relationship: chain, data: { number } })
    rows = (
      await harness.owner.query<Row>(
        'select sequence, text, previous_hash, hash from record_events where chain_id = $1 order by sequence',
        [chain.id],
      )
    ).rows
    expect(await check(chain.id)).toMatchObject({
      sound: 6,
      broken: null,
      last: { sequence: 6, hash: rows[5]?.hash },
    })
  }
  const row = (sequence: number): Row => {
    const found = rows[sequence - 1]
    if (!found) throw new Error(`no event ${sequence}`)
    return found
  }
  const tamper = (statement: string, ...values: unknown[]) =>
    harness.owner.query(statement, [chain.id, ...values])

  /** What somebody would write who changes an event and its hash, and knows how the chain is made. */
  const forged = (sequence: number, change: Record<string, unknown>) => {
    const text = canonicalText({ ...(JSON.parse(row(sequence).text) as object), ...change })
    return { text, hash: sha256(text) }
  }

  const cases: [string, () => Promise<unknown>, number, record.RecordFault][] = [
    [
      'a changed text',
      () =>
        tamper(
          `update record_events set text = replace(text, '"number":3', '"number":9') where chain_id = $1 and sequence = 3`,
        ),
      3,
      'text-changed',
    ],
    [
      'a changed hash',
      () => tamper(`update record_events set hash = $2 where chain_id = $1 and sequence = 4`, '0'.repeat(64)),
      4,
      'text-changed',
    ],
    [
      'a changed text with a hash that fits it',
      async () => {
        const { text, hash } = forged(3, { data: { number: 9 } })
        await tamper(
          'update record_events set text = $2, hash = $3 where chain_id = $1 and sequence = 3',
          text,
          hash,
        )
      },
      4,
      'link-broken',
    ],
    [
      'the same data written in another way',
      async () => {
        const text = JSON.stringify(JSON.parse(row(2).text), null, 1)
        await tamper(
          'update record_events set text = $2, hash = $3 where chain_id = $1 and sequence = 2',
          text,
          sha256(text),
        )
      },
      2,
      'text-changed',
    ],
    [
      'another person in the columns that lists show',
      () =>
        tamper(
          'update record_events set actor_user_id = $2 where chain_id = $1 and sequence = 5',
          representative.id,
        ),
      5,
      'columns-changed',
    ],
    [
      'another day in the columns that lists show',
      () =>
        tamper(`update record_events set at = at - interval '1 day' where chain_id = $1 and sequence = 1`),
      1,
      'columns-changed',
    ],
    [
      'an event taken out of the middle',
      () => tamper('delete from record_events where chain_id = $1 and sequence = 3'),
      3,
      'missing',
    ],
    [
      'an event taken out, the later ones moved up',
      async () => {
        await tamper('delete from record_events where chain_id = $1 and sequence = 3')
        for (const sequence of [4, 5, 6])
          await tamper(
            'update record_events set sequence = $2 - 1 where chain_id = $1 and sequence = $2::integer',
            sequence,
          )
      },
      3,
      'misplaced',
    ],
    [
      'the last event taken out',
      () => tamper('delete from record_events where chain_id = $1 and sequence = 6'),
      6,
      'missing',
    ],
    ['every event taken out', () => tamper('delete from record_events where chain_id = $1'), 1, 'missing'],
    [
      'the last event taken out and the head set back to the one before, by a wrong hash',
      async () => {
        await tamper('delete from record_events where chain_id = $1 and sequence = 6')
        await tamper('update record_heads set sequence = 5 where chain_id = $1')
      },
      5,
      'end-changed',
    ],
    [
      'two events that changed places',
      async () => {
        await tamper('update record_events set sequence = 99 where chain_id = $1 and sequence = 2')
        await tamper('update record_events set sequence = 2 where chain_id = $1 and sequence = 4')
        await tamper('update record_events set sequence = 4 where chain_id = $1 and sequence = 99')
      },
      2,
      'misplaced',
    ],
    [
      'an event put in between, the later ones moved down',
      async () => {
        for (const sequence of [6, 5, 4])
          await tamper(
            'update record_events set sequence = $2 + 1 where chain_id = $1 and sequence = $2::integer',
            sequence,
          )
        const { text, hash } = forged(3, { sequence: 4, previousHash: row(3).hash })
        await insertAs(4, text, row(3).hash, hash)
      },
      5,
      'misplaced',
    ],
    [
      'an event put after the last one',
      async () => {
        const { text, hash } = forged(6, { sequence: 7, previousHash: row(6).hash })
        await insertAs(7, text, row(6).hash, hash)
      },
      7,
      'added',
    ],
    [
      'an event of another chain in this place',
      async () => {
        const stranger = forged(2, { chain: other.id })
        await tamper(
          'update record_events set text = $2, hash = $3 where chain_id = $1 and sequence = 2',
          stranger.text,
          stranger.hash,
        )
      },
      2,
      'misplaced',
    ],
    [
      'a changed head',
      () => tamper('update record_heads set hash = $2 where chain_id = $1', '1'.repeat(64)),
      6,
      'end-changed',
    ],
    ['a head that is gone', () => tamper('delete from record_heads where chain_id = $1'), 6, 'end-missing'],
  ]

  const insertAs = (sequence: number, text: string, previousHash: string, hash: string) =>
    tamper(
      `insert into record_events
         (chain_id, supplier_org_id, customer_org_id, sequence, at, type, actor_user_id, actor_org_id, subject_type, subject_id, text, previous_hash, hash)
       select chain_id, supplier_org_id, customer_org_id, $2, at, type, actor_user_id, actor_org_id, subject_type, subject_id, $3, $4, $5
       from record_events where chain_id = $1 and sequence = 3`,
      sequence,
      text,
      previousHash,
      hash,
    )

  it.each(cases)('finds %s', async (_what, act, sequence, fault) => {
    await freshChain()
    await act()
    const result = await check(chain.id)
    expect(result.broken).toMatchObject({ sequence, fault })
    // What stands before the fault is still proved.
    expect(result.sound).toBe(fault === 'end-changed' || fault === 'end-missing' ? sequence : sequence - 1)
  })

  it('finds a chain that was rewritten as a whole, by a hash that somebody kept', async () => {
    await freshChain()
    const kept = row(6).hash
    expect((await check(chain.id, { hash: kept })).known).toMatchObject({ sequence: 6 })
    let previousHash = row(2).hash
    for (const sequence of [3, 4, 5, 6]) {
      const { text, hash } = forged(sequence, {
        previousHash,
        ...(sequence === 3 ? { data: { number: 9 } } : {}),
      })
      await tamper(
        'update record_events set text = $3, previous_hash = $4, hash = $5 where chain_id = $1 and sequence = $2',
        sequence,
        text,
        previousHash,
        hash,
      )
      previousHash = hash
    }
    await tamper('update record_heads set hash = $2 where chain_id = $1', previousHash)
    expect(await check(chain.id, { hash: kept })).toMatchObject({ broken: null, sound: 6, known: null })
    expect((await check(chain.id, { hash: row(2).hash })).known).toMatchObject({ sequence: 2 })
  })

  it('goes through chains longer than it reads at a time', async () => {
    const buyer = await harness.organisation('Large buyer')
    const long = await harness.relationship(supplier, buyer)
    await harness.inTenant('supplier', supplier, engineer, ['gauge-engineer'], async (tenant) => {
      for (let number = 1; number <= 1203; number++)
        tenant.record({
          type: 'part.changed',
          relationship: long,
          subject: { type: 'part', id: part },
          data: { number },
        })
    })
    expect(await check(long.id)).toMatchObject({ sound: 1203, broken: null })
    await harness.owner.query(
      `update record_events set text = replace(text, '"number":1001', '"number":1002') where chain_id = $1 and sequence = 1001`,
      [long.id],
    )
    expect(await check(long.id)).toMatchObject({
      sound: 1000,
      broken: { sequence: 1001, fault: 'text-changed' },
    })
  })

  it('refuses what is no hash', async () => {
    const answer = await harness
      .as('supplier', engineer)
      .send('get', `/organisations/${supplier.id}/record/${relationship.id}/check?hash=abc`)
    expect(answer.body).toMatchObject({ status: 422, errors: [{ path: 'query.hash' }] })
  })
})
