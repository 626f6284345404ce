import { aliveEvery } from '../../../contract/moves/import'
import type { Import } from '../../../contract/imports'
import type { Database } from '../../db/database'
import { withTenant, type Tenant, type TenantContext } from '../../db/tenant'
import { changedMeanwhile, notFound, ProblemError } from '../../errors'
import { toProblem } from '../../middleware/problem'
import type { Services } from '../../services'
import { readTable } from '../../tables/read-table'
import { downloadOf } from '../files/files.service'
import { refuseChanged } from './imports.apply.service'
import { refusedAtRow } from './imports.errors'
import { badRowsOf, countsOf, planOf } from './imports.plan.service'
import { lockImports, noteProgress, selectImport, updateImport, type ImportRow } from './imports.repository'
import { rememberColumns } from './imports.remembered'
import { sourceOf } from './imports.source'
import { turn } from './rows/context'
import { partnersOf } from './rows/partners'

/**
 * Does the work of imports, one after the other, beside the requests. Everything that an import brings in, its events and
 * its own end are one transaction, so a process that stops leaves none of it. Meanwhile signs of life go out on
 * another connection.
 */
export class ImportRunner {
  #queue: Promise<void> = Promise.resolve()

  constructor(private readonly database: Database) {}

  readonly begin = (tenant: Tenant, importId: string, version: number): void => {
    const { organisationId, userId, side, roles, authenticatedAt, services } = tenant
    const context = { organisationId, userId, side, roles, authenticatedAt }
    const running = new Running(this.database, services, context, importId, version)
    this.#queue = this.#queue.then(() => running.toItsEnd())
  }
}

class Running {
  readonly #heart: NodeJS.Timeout
  #done = 0
  #beating = false

  constructor(
    private readonly database: Database,
    private readonly services: Services,
    private readonly context: TenantContext,
    private readonly importId: string,
    private readonly version: number,
  ) {
    // From now on, so that one that waits for its turn does not count as interrupted.
    this.#heart = setInterval(() => void this.#beat(), Math.min(aliveEvery, 700))
  }

  async toItsEnd(): Promise<void> {
    try {
      await this.#within((tenant) => this.#apply(tenant))
    } catch (error) {
      await this.#fail(error).catch((thrown: unknown) => this.#log(thrown))
    } finally {
      clearInterval(this.#heart)
    }
  }

  #within<T>(work: (tenant: Tenant) => Promise<T>): Promise<T> {
    return withTenant(this.database, this.services, this.context, work)
  }

  async #apply(tenant: Tenant): Promise<void> {
    const { row, bytes, name } = await this.#read(tenant)
    const table = await readTable({ name, bytes }, row.input)
    await lockImports(tenant, await lockKeys(tenant, row))
    const source = await sourceOf(row.kind, tenant.side, table, row.input)
    const plan = await planOf(tenant, row.kind, source, { fileId: row.fileId, sha256: row.sha256 })
    refuseChanged(row.basis, plan)
    for (const { act, row: at } of plan.things) {
      if (!act) continue
      await atRow(at, () => act(tenant))
      this.#done += 1
      await turn()
    }
    await rememberColumns(tenant, row.kind, source)
    const counts = countsOf(plan)
    tenant.record({
      type: 'import.applied',
      subject: { type: 'import', id: this.importId },
      data: { kind: row.kind, mode: row.mode, fileSha256: row.sha256, ...counts },
    })
    const values = { state: 'applied', counts, leftOut: badRowsOf(source, plan), done: this.#done } as const
    const updated = await updateImport(tenant, this.importId, this.version, {
      ...values,
      finishedAt: this.services.clock().toISOString(),
    })
    // Somebody took it for interrupted and began it once more: that one counts.
    if (!updated) throw changedMeanwhile('import')
  }

  async #read(tenant: Tenant): Promise<{ row: ImportRow; bytes: Buffer; name: string }> {
    const found = await selectImport(tenant, this.importId)
    if (!found) throw notFound('import')
    const { bytes } = await downloadOf(tenant, found.row.fileId)
    return { row: found.row, bytes: Buffer.from(bytes), name: found.file.name }
  }

  async #fail(error: unknown): Promise<void> {
    if (!(error instanceof ProblemError)) this.#log(error)
    await this.#within((tenant) =>
      updateImport(tenant, this.importId, this.version, {
        ...{ state: 'failed', failure: failureOf(error), done: 0 },
        finishedAt: this.services.clock().toISOString(),
      }),
    )
  }

  async #beat(): Promise<void> {
    if (this.#beating) return
    this.#beating = true
    try {
      await this.#within((tenant) => noteProgress(tenant, this.importId, this.version, this.#done))
    } catch (error) {
      this.#log(error)
    } finally {
      this.#beating = false
    }
  }

  #log(error: unknown): void {
    this.services.logger.error({ err: error, importId: this.importId }, 'import failed')
  }
}

async function atRow(row: number, act: () => Promise<unknown>): Promise<void> {
  try {
    await act()
  } catch (error) {
    throw error instanceof ProblemError ? refusedAtRow(row, error) : error
  }
}

/** Parts belong to a relationship, in which the other side may import too; the rest is the organisation's own. */
const lockKeys = async (tenant: Tenant, { kind }: ImportRow): Promise<string[]> =>
  kind === 'parts'
    ? (await partnersOf(tenant)).map(({ relationshipId }) => relationshipId)
    : [tenant.organisationId]

/** What is told of it, as an answer would tell it. */
function failureOf(error: unknown): Import['failure'] {
  const { code, detail = '', errors = [] } = toProblem(error)
  return {
    ...{ code, detail },
    errors: errors.map(({ row, message }) => ({ message, ...(row === undefined ? {} : { row }) })),
  }
}
