import {
  mostImportReadings,
  mostImportStudies,
  type BadRow,
  type ImportCounts,
  type ImportKind,
} from '../../../contract/imports'
import { cut } from './rows/words'
import type { Tenant } from '../../db/tenant'
import { refusedFile } from '../../tables/refuse'
import { letterOf } from '../../tables/letters'
import { planGauges } from './kinds/gauges.plan'
import { planParts } from './kinds/parts.plan'
import { planStudies } from './kinds/studies.plan'
import { readAsOf } from './kinds/studies.read-as'
import type { Source } from './imports.source'
import type { RowProblem } from './rows/fields'
import type { Plan } from './rows/plan'

/** The file as it is noted; null while it is only previewed. */
export type NotedFile = { fileId: string; sha256: string } | null

/** What a file would do as everything stands now; nothing is stored by planning. */
export async function planOf(
  tenant: Tenant,
  kind: ImportKind,
  source: Source,
  kept: NotedFile,
): Promise<Plan> {
  if (source.missing.length > 0) return { things: [], problems: [], rows: source.mapped.rows.length }
  if (kind === 'parts') return planParts(tenant, source.mapped)
  if (kind === 'gauges') return planGauges(tenant, source.mapped)
  refuseTooMany(source)
  return planStudies(tenant, source.mapped, { takenBy: source.input.takenBy, readAs: readAsOf(source), kept })
}

function refuseTooMany({ mapped: { rows } }: Source): void {
  const studies = new Set(rows.map(({ cells }) => cells.code)).size
  const readings = rows.reduce((sum, { several }) => sum + several.filter(Boolean).length, 0)
  const refuse = (count: number, what: string, most: number) =>
    refusedFile(
      `This file holds ${count.toLocaleString('en-GB')} ${what}; one import takes at most ${most.toLocaleString('en-GB')}. Split it into several files.`,
    )
  if (studies > mostImportStudies) throw refuse(studies, 'studies', mostImportStudies)
  if (readings > mostImportReadings) throw refuse(readings, 'readings', mostImportReadings)
}

export function countsOf({ things, problems, rows }: Plan): ImportCounts {
  const outcome = (which: string) => things.filter((thing) => thing.outcome === which).length
  return {
    rows,
    badRows: new Set(problems.map(({ row }) => row)).size,
    new: outcome('new'),
    changed: outcome('changed'),
    unchanged: outcome('unchanged'),
  }
}

/** Every bad row in the order of the file with its column; neighbours that say the same of their whole row are one. */
export function badRowsOf(source: Source, { problems }: Pick<Plan, 'problems'>): BadRow[] {
  const labels = new Map(source.fields.map(({ key, label }) => [key, label]))
  const rows: BadRow[] = []
  for (const problem of [...problems].sort((a, b) => a.row - b.row)) {
    const last = rows.at(-1)
    if (
      last &&
      !problem.field &&
      !last.field &&
      last.message === problem.message &&
      last.lastRow === problem.row - 1
    )
      last.lastRow = problem.row
    else rows.push(badRow(source, labels, problem))
  }
  return rows
}

function badRow(
  { table, mapping }: Source,
  labels: Map<string, string>,
  { row, field, message }: RowProblem,
): BadRow {
  // Of a field in several columns: which of them.
  const [key = '', at = '0'] = field?.split('.') ?? []
  const place = mapping[key]?.[Number(at)]
  return {
    ...{ row, lastRow: row, message },
    column: place === undefined ? null : letterOf(place),
    field: field === null ? null : (labels.get(key) ?? null),
    text: place === undefined ? '' : cut(table.rows[row - 1]?.cells[place] ?? '', 60),
  }
}
