import { randomUUID } from 'node:crypto'
import pg from 'pg'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { allTables, notOfTenants, tenantTables } from './tables'
import { startWorld, type World } from './world'

let world: World
/** A connection under the role of the running program, as somebody would have it who gets SQL past the services. */
let app: pg.Client
let tables: string[]

beforeAll(async () => {
  world = await startWorld()
  app = new pg.Client({ connectionString: world.harness.urlAs('evenrule_app') })
  await app.connect()
  tables = await tenantTables(world.harness.owner)
}, 240_000)
afterAll(async () => {
  await app.end()
  await world.stop()
})

interface Setting {
  org?: string
  user?: string
}

/** Runs work in a transaction with these settings, which is never committed. */
async function within<T>({ org, user }: Setting, work: () => Promise<T>): Promise<T> {
  await app.query('begin')
  try {
    if (org !== undefined) await app.query(`select set_config('app.org_id', $1, true)`, [org])
    if (user !== undefined) await app.query(`select set_config('app.user_id', $1, true)`, [user])
    return await work()
  } finally {
    await app.query('rollback')
  }
}

const mayRead = async (table: string): Promise<boolean> =>
  (
    await world.harness.owner.query<{ may: boolean }>(
      `select has_table_privilege('evenrule_app', $1, 'select') as may`,
      [table],
    )
  ).rows[0]?.may ?? false

/** How many rows of each table the program's role sees; tables that it may not read are left out. */
async function seen(setting: Setting): Promise<Record<string, number>> {
  const counts: Record<string, number> = {}
  for (const table of tables) {
    if (!(await mayRead(table))) continue
    counts[table] = await within(setting, async () => {
      const { rows } = await app.query<{ count: number }>(`select count(*)::integer as count from "${table}"`)
      return rows[0]?.count ?? NaN
    })
  }
  return counts
}
const total = (counts: Record<string, number>) => Object.values(counts).reduce((sum, count) => sum + count, 0)

it('the prepared world has rows in every table, so that none is proved by being empty', async () => {
  const empty: string[] = []
  for (const table of await allTables(world.harness.owner)) {
    const { rowCount } = await world.harness.owner.query(`select from "${table}" limit 1`)
    if (!rowCount && table !== 'security_events') empty.push(table)
  }
  expect(empty).toEqual([])
})

describe('without an organisation set', () => {
  it.each<[string, Setting]>([
    ['nothing set', {}],
    ['empty settings', { org: '', user: '' }],
    ['a person alone', { user: '0198f5a0-0000-7000-8000-000000000001' }],
  ])('there are no rows: %s', async (_what, setting) => {
    const counts = await seen(setting)
    expect(Object.keys(counts).length).toBeGreaterThan(20)
    expect(Object.entries(counts).filter(([, count]) => count !== 0)).toEqual([])
  })

  it('nothing can be written', async () => {
    const { rows } = await world.harness.owner.query<{ row: object }>(
      'select to_json(s) as row from sites s limit 1',
    )
    for (const setting of [{}, { org: '' }])
      await expect(
        within(setting, () =>
          app.query('insert into sites select * from json_populate_record(null::sites, $1)', [rows[0]?.row]),
        ),
      ).rejects.toMatchObject({ code: '42501' })
  })

  it('a person alone sees their own row among people, and no other', async () => {
    const { rows } = await within({ user: world.insider.id }, () =>
      app.query<{ id: string }>('select id from users'),
    )
    expect(rows).toEqual([{ id: world.insider.id }])
  })
})

describe('the worker', () => {
  it('sees no row of an organisation without naming it, and of others none when it does', async () => {
    const worker = new pg.Client({ connectionString: world.harness.urlAs('evenrule_system') })
    await worker.connect()
    try {
      const count = async (org: string | null, table: string) => {
        await worker.query('begin')
        if (org) await worker.query(`select set_config('app.org_id', $1, true)`, [org])
        const { rowCount } = await worker.query(`select from "${table}"`)
        await worker.query('rollback')
        return rowCount
      }
      const foreign = world.attackers.find(({ name }) => name === 'a foreigner')?.home.id ?? ''
      for (const table of [
        'requests',
        'submissions',
        'gauges',
        'relationships',
        'calibrations',
        'reminders',
      ]) {
        expect([table, await count(null, table), await count(foreign, table)]).toEqual([table, 0, 0])
        expect([table, await count(world.victims.supplier.id, table)]).not.toEqual([table, 0])
      }
    } finally {
      await worker.end()
    }
  })
})

describe('hostile settings', () => {
  it.each(['nobody', "' or true --", '*', 'null', '{}', '%'])(
    'end in an error, never in rows: %s',
    async (org) => {
      await expect(within({ org }, () => app.query('select * from parts'))).rejects.toMatchObject({
        code: '22P02',
      })
    },
  )

  it('of an organisation that does not exist give nothing', async () => {
    expect(total(await seen({ org: '00000000-0000-0000-0000-000000000000' }))).toBe(0)
  })

  it('do not outlive their transaction', async () => {
    const org = world.victims.supplier.id
    expect(await within({ org }, () => app.query('select from gauges'))).toMatchObject({
      rowCount: expect.any(Number),
    })
    const after = await app.query(
      `select current_setting('app.org_id', true) as org, (select count(*)::integer from gauges) as gauges`,
    )
    expect(after.rows).toEqual([{ org: '', gauges: 0 }])
  })

  it('cannot be helped by another role or by switching row security off', async () => {
    for (const role of ['evenrule_migrator', 'evenrule_system', 'evenrule_session', 'postgres'])
      await expect(app.query(`set role ${role}`)).rejects.toMatchObject({ code: '42501' })
    await app.query('set row_security = off')
    await expect(app.query('select * from parts')).rejects.toMatchObject({ code: '42501' })
    await app.query('set row_security = on')
  })
})

describe('another organisation', () => {
  /** Where a row says whose it is. */
  const belongs = (table: string) =>
    world.harness.owner.query<{ column: string }>(
      `select column_name as column from information_schema.columns
       where table_schema = 'public' and table_name = $1 and column_name in ('org_id', 'supplier_org_id', 'customer_org_id')`,
      [table],
    )

  /** What a customer publishes for everybody who supplies it is no secret among those. */
  const secret = (table: string, name: string) =>
    table === 'house_terms' && name === 'a competitor' ? `and state <> 'published'` : ''

  it('sees no row of any table in which it is no party', async () => {
    for (const { home, name } of world.attackers)
      for (const table of tables) {
        if (!(await mayRead(table))) continue
        const columns = (await belongs(table)).rows.map(({ column }) => column)
        const foreign = await within({ org: home.id, user: world.insider.id }, () =>
          app.query(
            columns.length > 0
              ? `select from "${table}" where $1::uuid not in (${columns.map((each) => `coalesce(${each}, '00000000-0000-0000-0000-000000000000')`).join(', ')}) ${secret(table, name)}`
              : // Organisations: oneself, and those one deals with.
                `select from "${table}" where id <> $1 and name = 'Halm Turning'`,
            [home.id],
          ),
        )
        expect([name, table, foreign.rowCount]).toEqual([name, table, 0])
      }
  })

  it('can write no row in the victim’s name, and change or delete none of the victim’s', async () => {
    const proved: string[] = []
    for (const { home } of world.attackers)
      for (const table of tables) {
        const victim = await world.harness.owner.query<{ row: Record<string, unknown> }>(
          `select to_json(t) as row from "${table}" t limit 1`,
        )
        const row = victim.rows[0]?.row
        const attempt = async (statement: string, values: unknown[] = []): Promise<string> => {
          try {
            const { rowCount } = await within({ org: home.id, user: world.insider.id }, () =>
              app.query(statement, values),
            )
            return `${rowCount} rows`
          } catch (error) {
            return String((error as { code?: string }).code)
          }
        }
        // 42501: the role may not, or row security refuses; either way nothing was written.
        const inserted = await attempt(
          `insert into "${table}" select * from json_populate_record(null::"${table}", $1)`,
          [row],
        )
        expect([table, 'insert', inserted]).toEqual([table, 'insert', '42501'])
        const column =
          Object.keys(row ?? {}).find((each) => each === 'row_version') ?? Object.keys(row ?? {})[0]
        const key = (await belongs(table)).rows[0]?.column ?? 'id'
        const where = `where ${key} = (json_populate_record(null::"${table}", $1)).${key}`
        const updated = await attempt(`update "${table}" set "${column}" = "${column}" ${where}`, [row])
        expect([table, 'update', ['42501', '0 rows'].includes(updated), updated]).toEqual([
          table,
          'update',
          true,
          updated,
        ])
        const deleted = await attempt(`delete from "${table}" ${where}`, [row])
        expect([table, 'delete', ['42501', '0 rows'].includes(deleted), deleted]).toEqual([
          table,
          'delete',
          true,
          deleted,
        ])
        proved.push(table)
      }
    expect(new Set(proved).size).toBe(tables.length)
  })

  it('cannot bring a row into the relationship of others by naming itself as a party', async () => {
    const proved: string[] = []
    for (const { home } of world.attackers)
      for (const table of tables) {
        const columns = (await belongs(table)).rows.map(({ column }) => column)
        if (!columns.includes('supplier_org_id') || !columns.includes('customer_org_id')) continue
        if (table === 'relationships') continue
        const { rows } = await world.harness.owner.query<{ row: Record<string, unknown> }>(
          `select to_json(t) as row from "${table}" t where supplier_org_id = $1 limit 1`,
          [world.victims.supplier.id],
        )
        const row = {
          ...rows[0]?.row,
          supplier_org_id: home.id,
          ...(rows[0]?.row.id ? { id: randomUUID() } : {}),
          // Past the numbers that are taken, so that nothing but the rule for parties stands in the way.
          ...Object.fromEntries(
            Object.entries(rows[0]?.row ?? {}).flatMap(([name, value]) =>
              typeof value === 'number' ? [[name, 9999]] : [],
            ),
          ),
          ...(table === 'record_heads' ? { chain_id: world.samples.supplier.otherRelationshipId } : {}),
        }
        const code = await within({ org: home.id, user: world.insider.id }, () =>
          app.query(`insert into "${table}" select * from json_populate_record(null::"${table}", $1)`, [row]),
        ).then(
          () => 'written',
          (error: unknown) => (error as { code?: string }).code,
        )
        // 23503: the key to the relationship names both parties. 42501: a narrower policy came first. 23505: one
        // row per thing and it is there; the catalogue test proves that such tables have the key.
        expect(['23503', '42501', '23505'], table).toContain(code)
        if (code !== '23505') proved.push(table)
      }
    expect(proved).toContain('record_events')
    expect(proved).toContain('record_heads')
    expect(new Set(proved).size).toBeGreaterThan(10)
  })

  it('learns nothing through the functions that look across organisations', async () => {
    const [first] = world.attackers.filter(({ name }) => name === 'a foreigner')
    const org = first?.home.id ?? ''
    const people = [world.insider.id, ...Object.values(world.withOnly).map(({ id }) => id)]
    const names = await within({ org }, () =>
      app.query('select * from names_of_people($1::uuid[])', [people]),
    )
    expect(names.rows).toEqual([])
    const members = await within({ org }, () =>
      app.query<{ user_id: string }>('select user_id from members_of_current()'),
    )
    expect(members.rows).toEqual([{ user_id: first?.person.id }])
    await expect(
      within({ org }, () =>
        app.query(
          `select notify_party($1, 'customer', array['admin'], null, 'decision', 's', 'b', '/', now())`,
          [world.victims.customer.id],
        ),
      ),
    ).rejects.toMatchObject({ code: '42501' })
  })
})

describe('the other side', () => {
  it('sees nothing of a supplier’s own work: gauges, studies, drafts, notes, journal', async () => {
    const org = world.victims.customer.id
    for (const table of [
      'gauges',
      'reference_standards',
      'calibrations',
      'gauge_events',
      'studies',
      'study_data',
      'study_evaluations',
      'study_tasks',
      'submission_studies',
      'submission_by_hand',
      'submission_notes',
    ]) {
      const { rowCount } = await within({ org }, () => app.query(`select from ${table}`))
      expect([table, rowCount]).toEqual([table, 0])
    }
    // A customer has files and imports of its own.
    for (const table of ['files', 'imports']) {
      const { rowCount } = await within({ org }, () =>
        app.query(`select from ${table} where org_id <> $1`, [org]),
      )
      expect([table, rowCount]).toEqual([table, 0])
    }
    const drafts = await within({ org }, () =>
      app.query(`select from submissions where state in ('draft', 'for-signature')`),
    )
    expect(drafts.rowCount).toBe(0)
    const { rowCount } = await world.harness.owner.query(
      `select from submissions where state in ('draft', 'for-signature')`,
    )
    expect(rowCount).toBeGreaterThan(0)
    const journal = await within({ org }, () =>
      app.query('select from record_events where org_id is not null and org_id <> $1', [org]),
    )
    expect(journal.rowCount).toBe(0)
  })
})

it('tables outside the organisations are named with a reason', () => {
  for (const reason of Object.values(notOfTenants)) expect(reason.length).toBeGreaterThan(20)
})
