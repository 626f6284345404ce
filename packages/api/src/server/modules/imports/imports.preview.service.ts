import {
  importOutcomes,
  mostNamed,
  type ImportInput,
  type ImportKind,
  type ImportPreview,
} from '../../../contract/imports'
import type { Tenant } from '../../db/tenant'
import { invalidInput } from '../../errors'
import type { PrepareCall, UploadedFile } from '../../http/route'
import { readTable } from '../../tables/read-table'
import type { Table } from '../../tables/table'
import { sha256 } from '../record/record.append'
import { badRowsOf, countsOf, planOf } from './imports.plan.service'
import { tenantSource } from './imports.remembered'
import { columnsOf } from './imports.source'
import { basisOf } from './rows/plan'

/** A file with its table, read before the transaction begins. */
export interface ReadFile {
  file: UploadedFile
  table: Table
}

/** Reads the table of the uploaded file; refuses a request without one. */
export async function readUpload({
  file,
  body,
}: Pick<PrepareCall<{ method: 'post'; path: string; access: 'signed-in'; summary: string }>, 'file'> & {
  body: ImportInput
}): Promise<ReadFile> {
  if (!file) throw invalidInput([{ path: 'body.file', message: 'Choose the XLSX or CSV file to import.' }])
  return { file, table: await readTable(file, body) }
}

/** What a file would make new, change and leave as it is, and every bad row; nothing is stored. */
export async function previewOf(
  tenant: Tenant,
  kind: ImportKind,
  input: ImportInput,
  { file, table }: ReadFile,
): Promise<ImportPreview> {
  const source = await tenantSource(tenant, kind, table, input)
  const plan = await planOf(tenant, kind, source, null)
  const things = importOutcomes.flatMap((outcome) =>
    plan.things.filter((thing) => thing.outcome === outcome).slice(0, mostNamed),
  )
  return {
    file: { name: file.name, size: file.bytes.length, sha256: sha256(file.bytes) },
    sheets: table.sheets.map(({ name }) => name),
    sheet: table.sheet,
    headerRow: source.headerRow,
    columns: columnsOf(source),
    fields: source.fields.map(({ key, label, required = false, type }) => ({
      ...{ key, label, required, several: type === 'decimals' },
    })),
    missing: source.missing,
    counts: countsOf(plan),
    bad: badRowsOf(source, plan).slice(0, mostNamed),
    things,
    basis: basisOf(plan),
  }
}
