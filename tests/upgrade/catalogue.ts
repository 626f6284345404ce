import type pg from 'pg'

/** Everything that makes up a schema, each thing by kind and name, with its whole definition as text. */
export type Catalogue = Map<string, string>

const schemas = `(select oid, nspname from pg_namespace where nspname not like 'pg\\_%' and nspname <> 'information_schema')`

/** Rights in a list of them, each with who gave it to whom, in one order; what the system would give by itself is written out. */
const rights = (list: string, kind: string, owner: string) => `(
  select string_agg(format('%s to %s%s', a.privilege_type, case when a.grantee = 0 then 'everybody' else a.grantee::regrole::text end,
    case when a.is_grantable then ' who may pass it on' else '' end), ', ' order by a.grantee::regrole::text, a.privilege_type)
  from aclexplode(coalesce(${list}, acldefault((${kind})::"char", ${owner}))) a)`

const rolesOf = (list: string) =>
  `(select string_agg(case when r = 0 then 'everybody' else r::regrole::text end, ', ' order by r::regrole::text) from unnest(${list}) r)`

/**
 * One question for each kind of thing: its name, and its definition in words that hold no number of the database's
 * own (an oid, the place of a column), so that two databases with the same schema give the same text.
 */
const questions: Record<string, string> = {
  schema: `
    select n.nspname as name, format('owner %s; %s', s.nspowner::regrole, ${rights('s.nspacl', "'n'", 's.nspowner')}) as definition
    from ${schemas} n join pg_namespace s on s.oid = n.oid`,
  relation: `
    select format('%s.%s', n.nspname, c.relname) as name,
      format('%s %s, owner %s, row security %s, forced %s, options %s, method %s; %s',
        c.relkind, c.relpersistence, c.relowner::regrole, c.relrowsecurity, c.relforcerowsecurity, coalesce(c.reloptions::text, 'none'),
        coalesce((select amname from pg_am where oid = c.relam), 'none'),
        ${rights('c.relacl', "case c.relkind when 'S' then 's' else 'r' end", 'c.relowner')}) as definition
    from pg_class c join ${schemas} n on n.oid = c.relnamespace where c.relkind in ('r', 'p', 'v', 'm', 'S', 'f')`,
  column: `
    select format('%s.%s.%s', n.nspname, c.relname, a.attname) as name,
      format('%s%s%s%s%s, collation %s; %s', format_type(a.atttypid, a.atttypmod), case when a.attnotnull then ' not null' else '' end,
        ' default ' || pg_get_expr(d.adbin, d.adrelid), ' identity ' || nullif(a.attidentity::text, ''), ' generated ' || nullif(a.attgenerated::text, ''),
        coalesce((select collname from pg_collation where oid = a.attcollation), 'none'),
        coalesce(${rights('a.attacl', "'c'", 'c.relowner')}, 'no rights of its own')) as definition
    from pg_attribute a join pg_class c on c.oid = a.attrelid join ${schemas} n on n.oid = c.relnamespace
    left join pg_attrdef d on d.adrelid = a.attrelid and d.adnum = a.attnum
    where a.attnum > 0 and not a.attisdropped and c.relkind in ('r', 'p', 'v', 'm', 'f', 'c')`,
  constraint: `
    select format('%s on %s', o.conname, coalesce(nullif(o.conrelid, 0)::regclass::text, o.contypid::regtype::text)) as name,
      format('%s%s', pg_get_constraintdef(o.oid), case when o.convalidated then '' else ' not validated' end) as definition
    from pg_constraint o join ${schemas} n on n.oid = o.connamespace`,
  index: `
    select i.indexrelid::regclass::text as name,
      format('%s%s%s', pg_get_indexdef(i.indexrelid), case when i.indisvalid then '' else ' invalid' end,
        case when i.indisclustered then ' clustered' else '' end) as definition
    from pg_index i join pg_class c on c.oid = i.indexrelid join ${schemas} n on n.oid = c.relnamespace`,
  policy: `
    select format('%s on %s', p.polname, p.polrelid::regclass) as name,
      format('%s for %s to %s using (%s) with check (%s)', case when p.polpermissive then 'permissive' else 'restrictive' end, p.polcmd,
        ${rolesOf('p.polroles')}, pg_get_expr(p.polqual, p.polrelid), pg_get_expr(p.polwithcheck, p.polrelid)) as definition
    from pg_policy p`,
  routine: `
    select p.oid::regprocedure::text as name,
      format('owner %s; %s; %s', p.proowner::regrole, ${rights('p.proacl', "'f'", 'p.proowner')},
        case when p.prokind = 'a' then 'aggregate' else pg_get_functiondef(p.oid) end) as definition
    from pg_proc p join ${schemas} n on n.oid = p.pronamespace`,
  trigger: `
    select format('%s on %s', t.tgname, t.tgrelid::regclass) as name, format('%s %s', pg_get_triggerdef(t.oid), t.tgenabled) as definition
    from pg_trigger t where not t.tgisinternal`,
  sequence: `
    select s.seqrelid::regclass::text as name,
      format('%s from %s by %s within %s and %s, cache %s, cycle %s, owned by %s', s.seqtypid::regtype, s.seqstart, s.seqincrement, s.seqmin, s.seqmax,
        s.seqcache, s.seqcycle, (select format('%s.%s', d.refobjid::regclass, a.attname) from pg_depend d
          join pg_attribute a on a.attrelid = d.refobjid and a.attnum = d.refobjsubid
          where d.objid = s.seqrelid and d.deptype in ('a', 'i') and d.refobjsubid > 0)) as definition
    from pg_sequence s`,
  view: `
    select c.oid::regclass::text as name, pg_get_viewdef(c.oid) as definition
    from pg_class c join ${schemas} n on n.oid = c.relnamespace where c.relkind in ('v', 'm')`,
  rule: `
    select format('%s on %s', r.rulename, r.ev_class::regclass) as name, pg_get_ruledef(r.oid) as definition
    from pg_rewrite r join pg_class c on c.oid = r.ev_class join ${schemas} n on n.oid = c.relnamespace where r.rulename <> '_RETURN'`,
  type: `
    select t.oid::regtype::text as name,
      format('%s, owner %s, labels %s, base %s; %s', t.typtype, t.typowner::regrole,
        (select string_agg(quote_literal(e.enumlabel), ', ' order by e.enumsortorder) from pg_enum e where e.enumtypid = t.oid),
        format_type(t.typbasetype, t.typtypmod), ${rights('t.typacl', "'T'", 't.typowner')}) as definition
    from pg_type t join ${schemas} n on n.oid = t.typnamespace
    where t.typtype in ('e', 'd', 'r') or (t.typtype = 'c' and exists (select from pg_class c where c.oid = t.typrelid and c.relkind = 'c'))`,
  statistics: `
    select format('%s.%s', n.nspname, s.stxname) as name, pg_get_statisticsobjdef(s.oid) as definition
    from pg_statistic_ext s join ${schemas} n on n.oid = s.stxnamespace`,
  extension: `select extname as name, extversion as definition from pg_extension`,
  'rights by default': `
    select format('%s in %s for %s', d.defaclobjtype, coalesce(nullif(d.defaclnamespace, 0)::regnamespace::text, 'all'), d.defaclrole::regrole) as name,
      d.defaclacl::text as definition from pg_default_acl d`,
  comment: `
    select format('%s %s', d.classoid::regclass, (pg_identify_object(d.classoid, d.objoid, d.objsubid)).identity) as name, d.description as definition
    from pg_description d where d.objoid >= 16384`,
  migration: `
    select row_number() over (order by created_at, id)::text as name, format('%s made %s', hash, created_at) as definition
    from drizzle.__drizzle_migrations`,
}

/** Reads the whole schema of a database as its connection sees it, also within a transaction that is under way. */
export async function readCatalogue(client: pg.ClientBase | pg.Pool): Promise<Catalogue> {
  const catalogue: Catalogue = new Map()
  for (const [kind, question] of Object.entries(questions)) {
    const { rows } = await client.query<{ name: string; definition: string }>(question)
    for (const { name, definition } of rows) catalogue.set(`${kind} ${name}`, definition)
  }
  return catalogue
}

/** What one schema has otherwise than another: a line for each thing, in order of names. */
export function differences(actual: Catalogue, expected: Catalogue): string[] {
  const names = [...new Set([...actual.keys(), ...expected.keys()])].sort()
  return names.flatMap((name) => {
    const [is, ought] = [actual.get(name), expected.get(name)]
    if (is === ought) return []
    if (is === undefined) return [`${name} is missing`]
    if (ought === undefined) return [`${name} is too much`]
    return [`${name} is: ${is}, and ought to be: ${ought}`]
  })
}
