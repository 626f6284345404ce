import { mostNamed, type listImports, type readImport } from '../../../contract/imports'
import type { AnswerInputOf, QueryOf } from '../../../contract/define'
import type { ImportState } from '../../../contract/moves/import'
import { csvText } from '../../csv-export'
import { paged } from '../../db/paging'
import type { Tenant } from '../../db/tenant'
import { notFound } from '../../errors'
import type { Download } from '../../http/route'
import { readTable } from '../../tables/read-table'
import { downloadOf } from '../files/files.service'
import { namesOfPeople } from '../organisations/people.repository'
import { selectImport, selectImports, type ImportListed } from './imports.repository'

type ImportAnswer = AnswerInputOf<typeof readImport>

/** One page of the imports of this side. */
export async function listOfImports(tenant: Tenant, query: QueryOf<typeof listImports>) {
  return paged(
    query,
    (page) => selectImports(tenant, page),
    (rows) => withNames(tenant, rows),
  )
}

/** One import of this side; 404 for those of others. */
export async function importById(tenant: Tenant, importId: string): Promise<ImportAnswer> {
  const [answer] = await withNames(tenant, [await listed(tenant, importId)])
  if (!answer) throw notFound('import')
  return answer
}

/** The file of an import as it was uploaded. */
export const importFileOf = async (tenant: Tenant, importId: string): Promise<Download> =>
  downloadOf(tenant, (await listed(tenant, importId)).row.fileId)

const mendHeading = 'What to mend'

/** The rows that were left out, under the names of their columns, each with what to mend. */
export async function leftOutFileOf(tenant: Tenant, importId: string): Promise<Download> {
  const { row, file } = await listed(tenant, importId)
  const { bytes } = await downloadOf(tenant, row.fileId)
  const table = await readTable({ name: file.name, bytes: Buffer.from(bytes) }, row.input)
  const cellsOf = (at: number) => table.rows[at - 1]?.cells ?? []
  const header = cellsOf(row.input.headerRow ?? 1)
  const width = header.length
  const messages = new Map<number, string[]>()
  for (const { row: first, lastRow, column, message } of row.leftOut)
    for (let at = first; at <= lastRow; at += 1)
      messages.set(at, [...(messages.get(at) ?? []), column ? `${column}: ${message}` : message])
  const lines = [...messages].map(([at, told]) => [
    ...Array.from({ length: width }, (_, place) => cellsOf(at)[place] ?? ''),
    told.join(' '),
  ])
  return {
    name: `${file.name.replace(/\.(csv|xlsx)$/i, '')} left out.csv`,
    contentType: 'text/csv; charset=utf-8',
    bytes: csvText([[...header, mendHeading], ...lines], separatorOf(table.dialect?.separator)),
  }
}

/** As the file itself was separated, so that the same program opens both. */
const separatorOf = (separator: string | undefined) =>
  separator === 'semicolon' || separator === 'tab' ? separator : 'comma'

/** How an import stands: one of which nothing is heard any more was interrupted. */
export const importStanding = ({ row, silent }: Pick<ImportListed, 'row' | 'silent'>): ImportState =>
  row.state === 'applying' && silent ? 'interrupted' : row.state

async function listed(tenant: Tenant, importId: string): Promise<ImportListed> {
  const found = await selectImport(tenant, importId)
  if (!found) throw notFound('import')
  return found
}

async function withNames(tenant: Tenant, rows: readonly ImportListed[]): Promise<ImportAnswer[]> {
  const names = await namesOfPeople(
    tenant,
    rows.map(({ row }) => row.createdBy),
  )
  return rows.map(({ row, file, silent }) => ({
    ...row,
    state: importStanding({ row, silent }),
    file,
    leftOut: row.leftOut.slice(0, mostNamed),
    createdBy: { id: row.createdBy, name: names.get(row.createdBy) ?? null },
  }))
}
