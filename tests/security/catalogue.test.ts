import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { startHarness, type Harness } from '../api/harness'
import { allTables, notOfTenants, tenantTables } from './tables'

let harness: Harness
let tables: string[]
beforeAll(async () => {
  harness = await startHarness()
  tables = await allTables(harness.owner)
})
afterAll(() => harness.stop())

const query = async <Row extends object>(text: string, ...values: unknown[]): Promise<Row[]> =>
  (await harness.owner.query<Row>(text, values)).rows
const app = 'evenrule_app'

it('looks at the tables there are', () => {
  expect(tables.length).toBeGreaterThan(30)
  for (const name of Object.keys(notOfTenants)) expect(tables).toContain(name)
})

describe('every table', () => {
  it('has row security switched on, and forced on its owner too', async () => {
    const open = await query<{ name: string }>(
      `select relname as name from pg_class where relnamespace = 'public'::regnamespace and relkind in ('r', 'p')
       and not (relrowsecurity and relforcerowsecurity)`,
    )
    expect(open).toEqual([])
  })

  it('has a policy for every act that a role may do', async () => {
    interface Policy {
      table: string
      act: string
      roles: string[]
    }
    const policies = await query<Policy>(
      `select tablename as table, cmd as act, roles::text[] as roles from pg_policies
       where schemaname = 'public' and permissive = 'PERMISSIVE'`,
    )
    const lacking: string[] = []
    for (const table of tables)
      for (const role of [app, 'evenrule_system'])
        for (const act of ['SELECT', 'INSERT', 'UPDATE', 'DELETE'])
          if (await may(role, table, act)) {
            const covered = policies.some(
              (policy) =>
                policy.table === table && policy.roles.includes(role) && ['ALL', act].includes(policy.act),
            )
            if (!covered) lacking.push(`${role} ${act} ${table}`)
          }
    expect(lacking).toEqual([])
  })

  it('checks what is read and what is written, by the organisation or the person', async () => {
    interface Policy {
      table: string
      name: string
      act: string
      qual: string | null
      check: string | null
      permissive: string
      roles: string[]
    }
    const policies = await query<Policy>(
      `select tablename as table, policyname as name, cmd as act, qual, with_check as check, permissive, roles::text[] as roles
       from pg_policies where schemaname = 'public'`,
    )
    const byOwner = /current_setting\('app\.(org|user)_id'/
    /** Policies that name no organisation of themselves, with the reason. */
    const excused: Record<string, string> = {
      organisations_partners: 'looks into relationships, whose own policy names the organisation',
      security_events_append: 'anybody’s refusal is logged; nobody reads it here',
    }
    const faulty = policies.flatMap(({ table, name, act, qual, check, permissive, roles }) => {
      const faults: string[] = []
      if (roles.includes('public')) faults.push('is for everybody')
      if (['ALL', 'UPDATE', 'INSERT'].includes(act) && !check) faults.push('has no check of what is written')
      if (act !== 'INSERT' && !qual) faults.push('has no condition on what is read')
      const condition = `${qual ?? ''} ${check ?? ''}`
      const forApp = roles.includes(app) && permissive === 'PERMISSIVE'
      if (forApp && !byOwner.test(condition) && !excused[name]) faults.push('does not ask whose the row is')
      return faults.map((fault) => `${table}: ${name} ${fault}`)
    })
    expect(faulty).toEqual([])
    expect(policies.length).toBeGreaterThan(tables.length)
  })
})

describe('tables of organisations', () => {
  interface Constraint {
    table: string
    name: string
    columns: string[]
    target: string | null
    targetColumns: string[] | null
  }
  const constraints = (kind: 'f' | 'u') =>
    query<Constraint>(
      `select c.conrelid::regclass::text as table, c.conname as name,
         array(select attname::text from pg_attribute where attrelid = c.conrelid and attnum = any(c.conkey)) as columns,
         nullif(c.confrelid, 0)::regclass::text as target,
         array(select attname::text from pg_attribute where attrelid = c.confrelid and attnum = any(c.confkey)) as "targetColumns"
       from pg_constraint c where c.connamespace = 'public'::regnamespace and c.contype = $1`,
      kind,
    )
  const tenantColumns = ['org_id', 'supplier_org_id', 'customer_org_id', 'relationship_id', 'chain_id']
  const ofTenant = (columns: readonly string[]) => columns.some((column) => tenantColumns.includes(column))

  it('say whose each row is', async () => {
    const columns = await query<{ table: string; columns: string[] }>(
      `select table_name as table, array_agg(column_name::text) as columns from information_schema.columns
       where table_schema = 'public' group by 1`,
    )
    const unowned = (await tenantTables(harness.owner)).filter(
      (table) =>
        table !== 'organisations' && !ofTenant(columns.find((each) => each.table === table)?.columns ?? []),
    )
    expect(unowned).toEqual([])
  })

  it('refer to one another by keys that hold the organisation or the relationship', async () => {
    // Checks of foreign keys pass row security: a key of the bare id would reach into other organisations.
    const own = await tenantTables(harness.owner)
    const bare = (await constraints('f')).filter(
      ({ table, target, columns, targetColumns }) =>
        own.includes(table) &&
        own.includes(target ?? '') &&
        !(ofTenant(columns) && (target === 'organisations' || columns.length > 1)) &&
        targetColumns,
    )
    expect(bare.map(({ table, name }) => `${table}: ${name}`)).toEqual([])
  })

  it('that two organisations share name both parties in the key to their relationship', async () => {
    const shared = await query<{ table: string }>(
      `select table_name as table from information_schema.columns
       where table_schema = 'public' and column_name = 'customer_org_id' and table_name <> 'relationships'`,
    )
    const keys = (await constraints('f')).filter(
      ({ target, columns }) => target === 'relationships' && columns.length === 3,
    )
    expect(shared.length).toBeGreaterThan(15)
    const lacking = shared.filter(({ table }) => !keys.some((key) => key.table === table))
    // Study's tasks name the relationship through the task, whose key they hold in full.
    const throughTask = (await constraints('f')).filter(
      ({ table, target, columns }) =>
        table === 'study_tasks' && target === 'measuring_tasks' && columns.includes('relationship_id'),
    )
    expect(
      lacking.map(({ table }) => table).filter((table) => !(table === 'study_tasks' && throughTask.length)),
    ).toEqual([])
  })

  it('have unique values within the organisation, so that a refusal tells nothing of others', async () => {
    const unique = await query<{ table: string; name: string; columns: string[] }>(
      `select t.relname as table, i.relname as name,
         array(select attname::text from pg_attribute a where a.attrelid = t.oid and a.attnum = any(x.indkey::int2[])) as columns
       from pg_index x join pg_class i on i.oid = x.indexrelid join pg_class t on t.oid = x.indrelid
       where x.indisunique and not x.indisprimary and t.relnamespace = 'public'::regnamespace`,
    )
    expect(unique.length).toBeGreaterThan(20)
    const own = await tenantTables(harness.owner)
    const global = unique.filter(({ table, columns }) => own.includes(table) && !ofTenant(columns))
    expect(global.map(({ table, name }) => `${table}: ${name}`)).toEqual([])
  })
})

async function may(role: string, table: string, act: string): Promise<boolean> {
  const [row] = await query<{ may: boolean }>(
    ['SELECT', 'INSERT', 'UPDATE'].includes(act)
      ? 'select has_any_column_privilege($1, $2, $3) as may'
      : 'select has_table_privilege($1, $2, $3) as may',
    role,
    `public.${table}`,
    act,
  )
  return row?.may ?? false
}

describe('the running program', () => {
  /** What is written once: no column may be changed, no row removed. */
  const writtenOnce = [
    'agreement_comments',
    'agreement_marks',
    'agreement_signatures',
    'challenge_messages',
    'files',
    'record_events',
    'study_data',
    'study_evaluations',
    'submission_clauses',
    'submission_files',
    'submission_notes',
    'submission_signatures',
    'submission_texts',
    'condition_reports',
    'review_files',
  ]
  /** What may be removed: drafts, their parts, and memberships. */
  const removable = [
    'agreement_rounds',
    'agreement_versions',
    'agreements',
    'column_mappings',
    'house_terms',
    'memberships',
    'submission_by_hand',
    'submission_studies',
  ]
  /** Rows that come to be by invitation or by functions of the database. */
  const notInserted = ['messages', 'organisations', 'outbox', 'relationships', 'users']
  const notRead = ['outbox', 'security_events']

  const allowed = async (act: string) => {
    const result: string[] = []
    for (const table of tables) if (await may(app, table, act)) result.push(table)
    return result
  }
  const without = (names: readonly string[]) => tables.filter((table) => !names.includes(table))

  it('may not change or remove what is written once', async () => {
    const changed = await allowed('UPDATE')
    expect(writtenOnce.filter((table) => changed.includes(table))).toEqual([])
    expect(writtenOnce.filter((table) => !tables.includes(table))).toEqual([])
  })

  it('may remove drafts, memberships and habits of reading files, nothing else', async () => {
    expect(await allowed('DELETE')).toEqual(removable)
  })

  it('may not make organisations, relationships, people, messages or mail by itself', async () => {
    expect(await allowed('INSERT')).toEqual(without(notInserted))
  })

  it('may read neither the mail nor the security log', async () => {
    expect(await allowed('SELECT')).toEqual(without(notRead))
  })

  it.each(['TRUNCATE', 'REFERENCES', 'TRIGGER'])('may never %s', async (act) => {
    expect(await allowed(act)).toEqual([])
  })

  it('may change only where a decided thing stands, not what it is', async () => {
    const columns = async (table: string) =>
      (
        await query<{ column: string }>(
          `select attname::text as column from pg_attribute where attrelid = $1::regclass and attnum > 0
             and not attisdropped and has_column_privilege($2, $1::regclass, attnum, 'UPDATE') order by 1`,
          `public.${table}`,
          app,
        )
      ).map(({ column }) => column)
    expect(await columns('record_heads')).toEqual(['hash', 'sequence'])
    expect(await columns('decisions')).toEqual([
      ...['declined_reason', 'other_side_at', 'other_side_by'],
      ...['second_at', 'second_by', 'sent_back_reason', 'state'],
    ])
    expect(await columns('conditions')).toEqual(['confirmed_at', 'row_version', 'state'])
    expect(await columns('challenges')).toEqual([
      'answered_at',
      'closed_at',
      'closed_by',
      'laboratory',
      'row_version',
      'state',
    ])
    expect(await columns('requests')).toEqual([
      ...['due_on', 'row_version', 'withdrawal_reason', 'withdrawn_at', 'withdrawn_by'],
    ])
    expect(await columns('invitations')).toEqual([
      ...['expires_on', 'nonce', 'revoked_at', 'revoked_by', 'row_version', 'sent_at', 'token_hash'],
    ])
    expect(await columns('messages')).toEqual(['read_at'])
    expect(await columns('users')).toEqual(['muted_mail', 'name'])
    expect(await columns('organisations')).toEqual(['name', 'row_version', 'time_zone'])
    for (const column of ['supplier_org_id', 'customer_org_id', 'task_id', 'created_by', 'id'])
      expect(await columns('submissions')).not.toContain(column)
  })
})

describe('roles', () => {
  it('own nothing, pass no row security, make no roles or databases, and belong to no other', async () => {
    const roles = await query<{ name: string; right: boolean; owns: number; within: number }>(
      `select rolname as name, rolsuper or rolbypassrls or rolcreaterole or rolcreatedb or rolreplication as right,
         (select count(*)::integer from pg_class where relowner = r.oid) as owns,
         (select count(*)::integer from pg_auth_members where member = r.oid) as within
       from pg_roles r where rolname in ('evenrule_app', 'evenrule_system', 'evenrule_session') order by 1`,
    )
    expect(roles).toEqual(
      ['evenrule_app', 'evenrule_session', 'evenrule_system'].map((name) => ({
        ...{ name, right: false, owns: 0, within: 0 },
      })),
    )
  })

  it('of the migrations own the tables but are no superuser', async () => {
    const [migrator] = await query<{ super: boolean }>(
      `select rolsuper as super from pg_roles where rolname = 'evenrule_migrator'`,
    )
    expect(migrator).toEqual({ super: false })
    const others = await query(
      `select relname from pg_class where relnamespace = 'public'::regnamespace and relkind in ('r', 'p')
       and relowner <> (select oid from pg_roles where rolname = 'evenrule_migrator')`,
    )
    expect(others).toEqual([])
  })

  it('of the worker reach the mail and whom it is for, and read what reminders follow from, nothing else', async () => {
    const held: string[] = []
    for (const table of tables)
      for (const act of ['SELECT', 'INSERT', 'UPDATE', 'DELETE', 'TRUNCATE'])
        if (await may('evenrule_system', table, act)) held.push(`${act} ${table}`)
    // Read as one organisation after the other: the row security of each binds this role too.
    const read = [
      ...['agreement_signatures', 'agreement_versions', 'agreements', 'calibrations', 'carry_overs'],
      ...['challenges', 'characteristics', 'conditions', 'decisions', 'gauges', 'measuring_tasks'],
      ...[
        'invitations',
        'messages',
        'organisations',
        'outbox',
        'part_revisions',
        'parts',
        'reference_standards',
      ],
      ...['reinstatements', 'relationships', 'reminders', 'request_answers', 'request_tasks', 'requests'],
      ...['standing_calibrations', 'standing_events', 'submission_texts', 'submissions', 'users'],
    ]
    expect(held.sort()).toEqual(
      [...read.map((table) => `SELECT ${table}`), 'INSERT reminders', 'UPDATE outbox'].sort(),
    )
  })

  it('of the worker write the mail of invitations without the hash of a token', async () => {
    const [row] = await query<{ hash: boolean; nonce: boolean }>(
      `select has_column_privilege('evenrule_system', 'invitations', 'token_hash', 'SELECT') as hash,
         has_column_privilege('evenrule_system', 'invitations', 'nonce', 'SELECT') as nonce`,
    )
    expect(row).toEqual({ hash: false, nonce: true })
  })

  it('of the sessions reach the sessions, nothing else, and no other role reaches those', async () => {
    for (const table of tables)
      for (const act of ['SELECT', 'INSERT', 'UPDATE', 'DELETE'])
        expect(await may('evenrule_session', table, act), `${act} ${table}`).toBe(false)
    for (const role of [app, 'evenrule_system']) {
      const [row] = await query<{ usage: boolean }>(
        `select has_schema_privilege($1, 'session', 'USAGE') as usage`,
        role,
      )
      expect(row).toEqual({ usage: false })
    }
  })

  it('may make nothing in any schema', async () => {
    for (const role of [app, 'evenrule_system', 'evenrule_session']) {
      const [row] = await query<{ any: boolean }>(
        `select bool_or(has_schema_privilege($1, nspname, 'CREATE')) as any from pg_namespace
         where nspname in ('public', 'session', 'drizzle')`,
        role,
      )
      expect(row).toEqual({ any: false })
    }
  })
})

describe('functions', () => {
  it('that run with the owner’s rights are these, each with a fixed search path', async () => {
    const definers = await query<{ name: string; settings: string[] | null; open: boolean }>(
      `select p.proname as name, p.proconfig as settings, has_function_privilege('evenrule_session', p.oid, 'EXECUTE') as open
       from pg_proc p where p.pronamespace = 'public'::regnamespace and p.prosecdef order by 1`,
    )
    expect(definers.map(({ name }) => name)).toEqual([
      'accept_invitation',
      'ended_memberships_of_person',
      'found_organisation',
      'invitation_by_token',
      'is_invited',
      'mail_invitation',
      'members_of_current',
      'memberships_of_person',
      'names_of_people',
      'notify_party',
      'organisations_with_sides',
      'sign_in_person',
    ])
    for (const { name, settings, open } of definers) {
      expect(settings, name).toEqual(['search_path=public, pg_temp'])
      expect(open, name).toBe(false)
    }
  })

  it('are open to nobody without being granted', async () => {
    const open = await query<{ name: string }>(
      `select p.proname as name from pg_proc p, aclexplode(coalesce(p.proacl, acldefault('f', p.proowner))) a
       where p.pronamespace = 'public'::regnamespace and a.grantee = 0`,
    )
    expect(open).toEqual([])
  })
})
