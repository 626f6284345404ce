import { pipeline } from 'node:stream/promises'
import { BackupProblem } from './backup.problem'
import { asOwner } from './owner'
import { startProgram } from './postgres-program'

/**
 * Removes everything that the migrator owns in the database, so that also what came after the backup goes. What
 * others own there, such as extensions, stays; so does the schema `public`, which belongs to the database.
 */
const wipe = `
do $wipe$
declare
  thing record;
  me oid := (select oid from pg_roles where rolname = current_user);
begin
  for thing in select nspname as name from pg_namespace where nspowner = me and nspname <> 'public'
  loop execute format('drop schema %I cascade', thing.name); end loop;
  for thing in select relname as name, case relkind when 'v' then 'view' when 'm' then 'materialized view' else 'table' end as kind
    from pg_class where relnamespace = 'public'::regnamespace and relowner = me and relkind in ('r', 'p', 'v', 'm') and not relispartition
  loop execute format('drop %s if exists public.%I cascade', thing.kind, thing.name); end loop;
  for thing in select relname as name from pg_class where relnamespace = 'public'::regnamespace and relowner = me and relkind = 'S'
  loop execute format('drop sequence if exists public.%I cascade', thing.name); end loop;
  for thing in select oid::regprocedure::text as name from pg_proc where pronamespace = 'public'::regnamespace and proowner = me
  loop execute format('drop routine if exists %s cascade', thing.name); end loop;
  for thing in select typname as name from pg_type
    where typnamespace = 'public'::regnamespace and typowner = me and typtype in ('e', 'd', 'r', 'c')
  loop execute format('drop type if exists public.%I cascade', thing.name); end loop;
  for thing in select distinct grantee::regrole::text as name from pg_namespace n, aclexplode(n.nspacl) a
    where n.nspname = 'public' and a.grantee not in (0, n.nspowner)
  loop execute format('revoke all on schema public from %s', thing.name); end loop;
  grant usage on schema public to public;
  comment on schema public is 'standard public schema';
end $wipe$;
`

/** What the migrator has in a database; undefined where that is nothing. */
export async function contentOf(ownerUrl: string): Promise<string | undefined> {
  return asOwner(ownerUrl, async (client) => {
    const { rows } = await client.query<{ tables: number; record: boolean }>(
      `select count(*)::integer as tables, to_regclass('public.record_events') is not null as record from pg_class c
       where c.relkind in ('r', 'p') and pg_get_userbyid(c.relowner) = current_user`,
    )
    const found = rows[0] ?? { tables: 0, record: false }
    if (found.tables === 0) return undefined
    if (!found.record) return `${found.tables} tables`
    const counted = await client.query<{ organisations: number; events: number }>(
      `select (select count(*) from organisations)::integer as organisations,
         (select count(*) from record_events)::integer as events`,
    )
    const { organisations, events } = counted.rows[0] ?? { organisations: 0, events: 0 }
    return `${organisations} organisations and ${events} events of the record`
  })
}

/**
 * Makes sure that nobody works on the database: what they wrote meanwhile would be lost.
 *
 * @throws {BackupProblem} naming who is connected
 */
export async function requireAlone(ownerUrl: string): Promise<void> {
  await asOwner(ownerUrl, async (client) => {
    const { rows } = await client.query<{ who: string; count: number }>(
      `select usename as who, count(*)::integer as count from pg_stat_activity
       where datname = current_database() and pid <> pg_backend_pid() and usename is not null group by 1 order by 1`,
    )
    if (rows.length === 0) return
    const who = rows.map(({ who, count }) => `${who} (${count})`).join(', ')
    throw new BackupProblem(
      `Others are connected to the database: ${who}. Stop the API and the worker first; nothing was changed.`,
    )
  })
}

/**
 * Puts a dump in the place of all that is in the database, in one transaction: cut off at any moment it leaves
 * what was, or the dump whole.
 *
 * @throws {BackupProblem} with what PostgreSQL said; the database is as it was
 */
export async function restoreDatabase(
  ownerUrl: string,
  dump: string,
  bin: string | undefined,
): Promise<void> {
  const script = startProgram('pg_restore', ['--no-owner', '--file=-', dump], { bin })
  script.child.stdin.end()
  const target = startProgram('psql', ['-X', '-q', '-v', 'ON_ERROR_STOP=1', '-o', '/dev/null', '-f', '-'], {
    bin,
    url: ownerUrl,
  })
  target.child.stdout.resume()
  target.child.stdin.write(`begin;\nset local lock_timeout = '20s';\n${wipe}`)
  const [written, read] = await Promise.allSettled([
    pipeline(script.child.stdout, target.child.stdin, { end: false }),
    script.ended,
  ])
  const isWhole = written.status === 'fulfilled' && read.status === 'fulfilled'
  // Without the commit everything is rolled back, also where this program is killed meanwhile.
  target.child.stdin.end(isWhole ? '\ncommit;\n' : undefined)
  const [done] = await Promise.allSettled([target.ended])
  // A dump that breaks off is the cause where everything it gave was taken; otherwise what PostgreSQL refused is.
  const cause = [written.status === 'fulfilled' ? read : done, done, read, written]
  const failed = cause.find((outcome) => outcome.status === 'rejected')
  if (failed) throw failed.reason
  // A dump holds no statistics, without which the first questions would be slow.
  await asOwner(ownerUrl, (client) => client.query('analyze'))
}
