import { and, eq, sql } from 'drizzle-orm'
import type { QueryOf } from '../../../contract/define'
import type { listImports } from '../../../contract/imports'
import { silentAfter } from '../../../contract/moves/import'
import { containing, orderOf, totalOverPages, windowOf } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { files } from '../files/files.table'
import { imports } from './imports.table'

export type ImportRow = typeof imports.$inferSelect

const own = (tenant: Tenant) => and(eq(imports.orgId, tenant.organisationId), eq(imports.side, tenant.side))

const fields = {
  row: imports,
  file: files,
  /** Nothing was heard of it for so long that its program must have stopped. */
  silent: sql<boolean>`${imports.aliveAt} < now() - make_interval(secs => ${silentAfter / 1000})`,
  total: totalOverPages,
}
const fromImports = ({ tx }: Tenant) =>
  tx
    .select(fields)
    .from(imports)
    .innerJoin(files, and(eq(files.orgId, imports.orgId), eq(files.id, imports.fileId)))
    .$dynamic()
export type ImportListed = Awaited<ReturnType<typeof selectImports>>[number]

/** One page of imports of this side; every row carries the total. */
export async function selectImports(tenant: Tenant, query: QueryOf<typeof listImports>) {
  const { createdAt, kind, id } = imports
  return fromImports(tenant)
    .where(
      and(own(tenant), query.kind ? eq(kind, query.kind) : undefined, containing(query.search, files.name)),
    )
    .orderBy(...orderOf({ createdAt, kind }, query.sort, id))
    .limit(windowOf(query).limit)
    .offset(windowOf(query).offset)
}

export async function selectImport(tenant: Tenant, importId: string): Promise<ImportListed | undefined> {
  const [row] = await fromImports(tenant).where(and(own(tenant), eq(imports.id, importId)))
  return row
}

export async function insertImport(
  tenant: Tenant,
  row: Omit<typeof imports.$inferInsert, 'orgId' | 'side' | 'createdAt' | 'createdBy'>,
): Promise<ImportRow> {
  const { organisationId: orgId, side, now: createdAt, userId: createdBy } = tenant
  const [inserted] = await tenant.tx
    .insert(imports)
    .values({ ...row, orgId, side, createdAt, createdBy })
    .returning()
  if (!inserted) throw new Error('The import was not stored.')
  return inserted
}

/** Changes an import that still has the version the sender saw; undefined where it has not. */
export async function updateImport(
  tenant: Tenant,
  importId: string,
  expectedVersion: number,
  values: Partial<Pick<ImportRow, 'state' | 'counts' | 'leftOut' | 'done' | 'failure' | 'finishedAt'>>,
): Promise<ImportRow | undefined> {
  const [updated] = await tenant.tx
    .update(imports)
    .set({ ...values, aliveAt: sql`now()`, rowVersion: expectedVersion + 1 })
    .where(and(own(tenant), eq(imports.id, importId), eq(imports.rowVersion, expectedVersion)))
    .returning()
  return updated
}

/** A sign of life of a running import, and how far it is. */
export async function noteProgress(
  tenant: Tenant,
  importId: string,
  version: number,
  done: number,
): Promise<void> {
  await tenant.tx
    .update(imports)
    .set({ done, aliveAt: sql`now()` })
    .where(
      and(
        ...[own(tenant), eq(imports.id, importId), eq(imports.rowVersion, version)],
        eq(imports.state, 'applying'),
      ),
    )
}

/** Lets imports that may touch the same things pass one after the other; kept until the transaction ends. */
export async function lockImports({ tx }: Tenant, keys: readonly string[]): Promise<void> {
  for (const key of [...keys].sort())
    await tx.execute(sql`select pg_advisory_xact_lock(hashtextextended(${`import ${key}`}, 0))`)
}
