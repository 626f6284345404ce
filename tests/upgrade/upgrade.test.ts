import { readdirSync } from 'node:fs'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { readManifest } from '../../packages/api/src/server/backup/backup.manifest'
import { readHeads } from '../../packages/api/src/server/backup/backup.snapshot'
import { openDatabase } from '../../packages/api/src/server/db/database'
import { migrateDatabase } from '../../packages/api/src/server/db/migrate'
import { openEngines } from '../../packages/api/src/server/integrations/engines'
import { verifyWholeRecord } from '../../packages/api/src/server/modules/record/record.verify'
import { differences, readCatalogue, type Catalogue } from './catalogue'
import { rowsOf } from './rows'
import { freshDatabase, migrations, releasedDatabase, releases, root, type TestDatabase } from './stand'

let fresh: Catalogue
let upgraded: TestDatabase
let clean: Catalogue

beforeAll(async () => {
  const made = await freshDatabase()
  fresh = await readCatalogue(made.admin)
  await made.drop()
})

describe.each(releases)('the database of release $version, migrated', ({ version, backup }) => {
  let before: Awaited<ReturnType<typeof rowsOf>>
  beforeAll(async () => {
    await upgraded?.drop()
    upgraded = await releasedDatabase(backup)
    before = await rowsOf(upgraded)
    await migrateDatabase(upgraded.url, migrations)
    clean = await readCatalogue(upgraded.admin)
  })

  it('has the very schema that a new one gets: tables, policies, rights, functions and all', () => {
    expect(fresh.size).toBeGreaterThan(1100)
    expect(differences(clean, fresh)).toEqual([])
  })

  it('has lost no row, nor the note that the demonstration is whole', async () => {
    const after = await rowsOf(upgraded)
    for (const [table, { count }] of before) expect([table, after.get(table)?.count]).toEqual([table, count])
    const { rows } = await upgraded.admin.query(`select obj_description('public'::regnamespace) as note`)
    expect(rows).toEqual([{ note: 'demonstration complete' }])
  })

  it('has the whole record still, ending where the release left it, every evaluation recomputed to the byte', async () => {
    const { product, record } = await readManifest(backup)
    expect(product).toBe(version)
    expect(await readHeads(upgraded.admin)).toEqual(record)
    const { database, pool } = openDatabase(upgraded.url, 1)
    const engines = await openEngines(`${root}packages/metrology/released`)
    const { chains, texts } = await verifyWholeRecord(database, engines)
    await pool.end()
    expect(chains.filter(({ broken }) => broken !== null)).toEqual([])
    expect(chains.map(({ sound }) => sound).sort()).toEqual(record.map(({ sequence }) => sequence).sort())
    expect(texts.filter(({ fault, withoutEngines }) => fault !== null || withoutEngines.length > 0)).toEqual(
      [],
    )
    expect(texts.length).toBeGreaterThanOrEqual(53)
    expect(texts.reduce((sum, { evaluations }) => sum + evaluations, 0)).toBeGreaterThanOrEqual(190)
  })
})
afterAll(() => upgraded.drop())

/** A change that a careless migration might make, and the things of the schema in which it must show. */
/** How many migrations there are, and so the id of the newest. */
const newest = readdirSync(migrations).filter((name) => name.endsWith('.sql')).length

const changes: [string, string, string[]][] = [
  [
    'a dropped policy',
    'drop policy submissions_parties on submissions',
    ['policy submissions_parties on submissions'],
  ],
  [
    'a policy that lets more be read',
    'alter policy files_owner on files using (true)',
    ['policy files_owner on files'],
  ],
  [
    'a policy that lets more be written',
    'alter policy files_owner on files with check (true)',
    ['policy files_owner on files'],
  ],
  ['a policy for everybody', 'alter policy files_owner on files to public', ['policy files_owner on files']],
  [
    'a restrictive policy made permissive',
    `drop policy conditions_by_customer on conditions;
     create policy conditions_by_customer on conditions for insert to evenrule_app, evenrule_system
       with check (customer_org_id = nullif(current_setting('app.org_id', true), '')::uuid)`,
    ['policy conditions_by_customer on conditions'],
  ],
  [
    'row security no longer forced',
    'alter table files no force row level security',
    ['relation public.files'],
  ],
  ['row security off', 'alter table files disable row level security', ['relation public.files']],
  ['a missing grant', 'revoke insert on files from evenrule_app', ['relation public.files']],
  ['a grant too much', 'grant delete on record_events to evenrule_app', ['relation public.record_events']],
  [
    'a missing grant on a column',
    'revoke update (hash) on record_heads from evenrule_app',
    ['column public.record_heads.hash'],
  ],
  [
    'a grant on a column too much',
    'grant update (text) on submission_texts to evenrule_app',
    ['column public.submission_texts.text'],
  ],
  [
    'a grant that may be passed on',
    'grant select on files to evenrule_app with grant option',
    ['relation public.files'],
  ],
  ['another owner', 'alter table files owner to evenrule_app', ['relation public.files']],
  [
    'a changed function',
    `create or replace function organisations_with_sides() returns table (org_id uuid, side text)
     language sql stable security definer set search_path = public, pg_temp as $$ select id, 'supplier' from organisations $$`,
    ['routine organisations_with_sides()'],
  ],
  [
    'a function without its search path',
    'alter function members_of_current() reset search_path',
    ['routine members_of_current()'],
  ],
  [
    'a function with the caller’s rights',
    'alter function members_of_current() security invoker',
    ['routine members_of_current()'],
  ],
  [
    'a function open to everybody',
    'grant execute on function members_of_current() to public',
    ['routine members_of_current()'],
  ],
  [
    'a function closed to the app',
    'revoke execute on function members_of_current() from evenrule_app',
    ['routine members_of_current()'],
  ],
  [
    'a function too much',
    'create function extra() returns integer language sql as $$ select 1 $$',
    ['routine extra()'],
  ],
  ['another type of a column', 'alter table files alter size type bigint', ['column public.files.size']],
  ['a default too much', 'alter table files alter size set default 0', ['column public.files.size']],
  ['a column that may be empty', 'alter table files alter size drop not null', ['column public.files.size']],
  ['a column too much', 'alter table files add extra text', ['column public.files.extra']],
  [
    'a missing constraint',
    'alter table calibrations drop constraint calibrations_file_fk',
    ['constraint calibrations_file_fk on calibrations'],
  ],
  [
    'a constraint that deletes along',
    `alter table calibrations drop constraint calibrations_file_fk;
     alter table calibrations add constraint calibrations_file_fk foreign key (org_id, file_id) references files (org_id, id) on delete cascade`,
    ['constraint calibrations_file_fk on calibrations'],
  ],
  [
    'a constraint never validated',
    'alter table files add constraint extra check (size >= 0) not valid',
    ['constraint extra on files'],
  ],
  ['a missing index', 'drop index session.session_expire', ['index session.session_expire']],
  ['an index too much', 'create index extra on files (name)', ['index extra']],
  [
    'a trigger',
    `create function extra() returns trigger language plpgsql as $$ begin return new; end $$;
     create trigger extra before insert on files for each row execute function extra()`,
    ['routine extra()', 'trigger extra on files'],
  ],
  [
    'a sequence that counts otherwise',
    'alter sequence drizzle.__drizzle_migrations_id_seq increment 2',
    ['sequence drizzle.__drizzle_migrations_id_seq'],
  ],
  ['a type too much', `create type extra as enum ('a', 'b')`, ['type extra']],
  [
    'a view too much',
    'create view extra as select 1 as one',
    ['column public.extra.one', 'relation public.extra', 'view extra'],
  ],
  ['sessions open to the app', 'grant usage on schema session to evenrule_app', ['schema session']],
  [
    'sessions closed to their role',
    'revoke delete on session.session from evenrule_session',
    ['relation session.session'],
  ],
  ['a schema too much', 'create schema extra', ['schema extra']],
  [
    'rights by default',
    'alter default privileges for role evenrule_migrator grant select on tables to evenrule_app',
    ['rights by default r in all for evenrule_migrator'],
  ],
  [
    'a migration noted otherwise',
    `update drizzle.__drizzle_migrations set hash = 'x' where id = 2`,
    ['migration 2'],
  ],
  // The newest: taking an earlier one out would move all that came later by one.
  [
    'a migration not noted',
    `delete from drizzle.__drizzle_migrations where id = ${newest}`,
    [`migration ${newest}`],
  ],
]

describe('the comparison of two schemas', () => {
  it.each(changes)('finds %s', async (_name, statements, expected) => {
    const { admin } = upgraded
    await admin.query('begin')
    try {
      await admin.query(statements)
      const found = differences(await readCatalogue(admin), clean)
      const missed = expected.filter((name) => !found.some((line) => line.startsWith(`${name} is`)))
      expect([missed, found]).toEqual([[], found])
      // Nothing else shows than what was changed and what hangs on it.
      expect(found.length).toBeLessThanOrEqual(expected.length + 3)
    } finally {
      await admin.query('rollback')
    }
  })
})
