import { mostNamed, type ImportKind, type ImportOrder } from '../../../contract/imports'
import { mayMoveImport } from '../../../contract/moves/import'
import type { Tenant } from '../../db/tenant'
import { changedMeanwhile, invalidInput, notFound, wrongState } from '../../errors'
import { keepFile, type FileToKeep } from '../files/files.service'
import { changedSincePreview } from './imports.errors'
import { badRowsOf, countsOf, planOf } from './imports.plan.service'
import type { ReadFile } from './imports.preview.service'
import { tenantSource } from './imports.remembered'
import { importById, importStanding } from './imports.read.service'
import { insertImport, selectImport, updateImport } from './imports.repository'
import type { Source } from './imports.source'
import { basisOf, changedRows, type Plan } from './rows/plan'

/** Begins the work of an import once its row is committed; see `ImportRunner`. */
export type Begin = (tenant: Tenant, importId: string, version: number) => void

export interface StoredUpload extends ReadFile {
  stored: FileToKeep
}

/**
 * Takes a previewed file for import: looks at it once more, refuses it where the preview no longer holds, and lets the
 * work begin once this is committed. The work itself is one transaction of its own.
 */
export async function beginImport(
  tenant: Tenant,
  kind: ImportKind,
  { sha256, basis, mode, ...input }: ImportOrder,
  { table, stored }: StoredUpload,
  begin: Begin,
) {
  if (stored.stored.sha256 !== sha256)
    throw invalidInput([
      {
        path: 'body.sha256',
        message:
          'This is another file than the one that was previewed. Look at the preview of this one first.',
      },
    ])
  if (kind === 'studies' && input.takenBy.length === 0)
    throw invalidInput([
      { path: 'body.takenBy', message: 'Say who took the readings: they may not sign the submission.' },
    ])
  const source = await tenantSource(tenant, kind, table, input)
  if (source.missing.length > 0)
    throw invalidInput([
      { path: 'body.columns', message: `Choose the column of ${source.missing.join(', ')}.` },
    ])
  const plan = await planOf(tenant, kind, source, null)
  refuseChanged(basis, plan)
  refuseBadRows(source, plan, mode)
  const fileId = await keepFile(tenant, stored)
  const row = await insertImport(tenant, {
    ...{ kind, mode, state: 'applying', fileId, sha256, input: source.input, basis },
    counts: countsOf(plan),
    leftOut: badRowsOf(source, plan),
    total: plan.things.filter(({ act }) => act).length,
  })
  tenant.afterwards(() => begin(tenant, row.id, row.rowVersion))
  return importById(tenant, row.id)
}

/** Begins an import that failed or was interrupted once more, from the file as it was kept. */
export async function repeatImport(
  tenant: Tenant,
  kind: ImportKind,
  importId: string,
  expectedVersion: number,
  begin: Begin,
) {
  const found = await selectImport(tenant, importId)
  if (!found || found.row.kind !== kind) throw notFound('import')
  const state = importStanding(found)
  if (!mayMoveImport('repeat', state)) throw wrongState('import', state)
  const updated = await updateImport(tenant, importId, expectedVersion, {
    ...{ state: 'applying', failure: null, finishedAt: null, done: 0 },
  })
  if (!updated) throw changedMeanwhile('import')
  tenant.afterwards(() => begin(tenant, importId, updated.rowVersion))
  return importById(tenant, importId)
}

/** Refuses where what the preview told no longer holds, naming the rows. */
export function refuseChanged(basis: string, plan: Plan): void {
  const changed = changedRows(basis, basisOf(plan))
  if (changed.length === 0) return
  const problems = new Map(plan.problems.map(({ row, message }) => [row, message]))
  const now = new Map(plan.things.map((thing) => [thing.row, thing]))
  throw changedSincePreview(changed, (row) => {
    const thing = now.get(row)
    return (
      problems.get(row) ??
      (thing ? `${thing.label} would be ${thing.outcome} now.` : 'What this row rests on was changed.')
    )
  })
}

function refuseBadRows(source: Source, plan: Plan, mode: ImportOrder['mode']): void {
  if (plan.problems.length === 0) return
  if (mode === 'good-rows' && plan.things.length > 0) return
  throw invalidInput(
    badRowsOf(source, plan)
      .slice(0, mostNamed)
      .map(({ row, column, message }) => ({
        ...{ path: 'body.file', row, message },
        ...(column === null ? {} : { column }),
      })),
  )
}
