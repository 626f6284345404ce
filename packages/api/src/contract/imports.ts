import { z } from 'zod'
import type { Permission } from './access'
import { instant, organisationParams, pageOf, pageQuery, paramsWith, sortBy, uuid } from './common'
import { defineEndpoint } from './define'
import { importStates } from './moves/import'
import { columnLetter, mostTableColumns, tableChoice } from './tables'

export const importKinds = ['parts', 'gauges', 'studies'] as const
export const importKind = z.enum(importKinds)
export type ImportKind = z.output<typeof importKind>

/** Largest file of an import in bytes, and the most rows, studies and readings that one brings in. */
export const largestImport = 20_000_000
export const mostImportRows = 10_000
export const mostImportStudies = 2_000
export const mostImportReadings = 200_000

/** Most bad rows and things that one answer names; the counts tell of all of them. */
export const mostNamed = 200

/** Letters of the columns by field. */
export const importColumns = z.record(z.string().max(40), z.array(columnLetter).max(mostTableColumns))

/** How the table of a file is read; what is left out is detected. */
const importInput = tableChoice.extend({
  /** Number of the row that names the columns. */
  headerRow: z.number().int().min(1).max(1000).optional(),
  /** Left out, they are as for the last file with the same names, or guessed from the names. */
  columns: importColumns.optional(),
  /** Studies alone: members who took the readings, and may not sign what is submitted of them. */
  takenBy: z.array(uuid).max(20, 'Name at most 20 people.').default([]),
})
export type ImportInput = z.output<typeof importInput>

export const importModes = ['all', 'good-rows'] as const

const applyInput = importInput.extend({
  /** SHA-256 of the file that was previewed. */
  sha256: z.string().regex(/^[0-9a-f]{64}$/, 'Send the hash that the preview told.'),
  /** What the preview rested on, as it told it. */
  basis: z.string().max(4_000_000),
  /** `all` refuses a file with a bad row; `good-rows` leaves bad rows out. */
  mode: z.enum(importModes, 'Choose all or good-rows.'),
})
export type ImportOrder = z.output<typeof applyInput>

export const importFieldSchema = z.object({
  key: z.string(),
  label: z.string(),
  required: z.boolean(),
  /** May lie in several columns, as the readings of a study in one row. */
  several: z.boolean(),
})
export type ImportField = z.output<typeof importFieldSchema>

export const badRowSchema = z.object({
  row: z.number().int(),
  /** Last of the rows that say the same; equal to `row` for a single one. */
  lastRow: z.number().int(),
  /** Letter and field of the cell; null where it is about the row as a whole. */
  column: z.string().nullable(),
  field: z.string().nullable(),
  /** The cell as it stands there. */
  text: z.string(),
  /** What is wrong and how to mend it. */
  message: z.string(),
})
export type BadRow = z.output<typeof badRowSchema>

export const importOutcomes = ['new', 'changed', 'unchanged'] as const
export const importThings = ['part', 'revision', 'characteristic', 'gauge', 'calibration', 'study'] as const
export const importThingSchema = z.object({
  row: z.number().int(),
  what: z.enum(importThings),
  label: z.string(),
  outcome: z.enum(importOutcomes),
  differences: z.array(z.object({ field: z.string(), from: z.string(), to: z.string() })),
  /** What else it brings about, in words. */
  notes: z.array(z.string()),
})
export type ImportThing = z.output<typeof importThingSchema>

export const importCountsSchema = z.object({
  rows: z.number().int(),
  badRows: z.number().int(),
  new: z.number().int(),
  changed: z.number().int(),
  unchanged: z.number().int(),
})
export type ImportCounts = z.output<typeof importCountsSchema>

export const importPreviewSchema = z.object({
  file: z.object({ name: z.string(), size: z.number().int(), sha256: z.string() }),
  sheets: z.array(z.string()),
  sheet: z.string().nullable(),
  headerRow: z.number().int(),
  columns: z.array(
    z.object({
      letter: z.string(),
      name: z.string(),
      /** The first few cells below the name. */
      samples: z.array(z.string()),
      field: z.string().nullable(),
    }),
  ),
  fields: z.array(importFieldSchema),
  /** Labels of fields that no column was found for, and without which nothing can be read. */
  missing: z.array(z.string()),
  counts: importCountsSchema,
  /** The first 200 bad rows, and the first 200 things of each outcome. */
  bad: z.array(badRowSchema),
  things: z.array(importThingSchema),
  basis: z.string(),
})
export type ImportPreview = z.output<typeof importPreviewSchema>

export const importSchema = z.object({
  id: uuid,
  kind: importKind,
  mode: z.enum(importModes),
  state: z.enum(importStates),
  file: z.object({ id: uuid, name: z.string(), size: z.number().int(), sha256: z.string() }),
  /** Things done so far of all there are. */
  done: z.number().int(),
  total: z.number().int(),
  counts: importCountsSchema,
  /** Rows that were left out: the first 200; the file of them holds all. */
  leftOut: z.array(badRowSchema),
  /** Why it failed: code, words and the rows concerned. */
  failure: z
    .object({
      code: z.string(),
      detail: z.string(),
      errors: z.array(z.object({ row: z.number().int().optional(), message: z.string() })),
    })
    .nullable(),
  createdAt: instant,
  createdBy: z.object({ id: uuid, name: z.string().nullable() }),
  finishedAt: instant.nullable(),
  rowVersion: z.number().int(),
})
export type Import = z.output<typeof importSchema>

const path = '/organisations/:organisationId/imports'
const importPath = `${path}/:importId`

export const listImports = defineEndpoint({
  method: 'get',
  path,
  access: 'imports.read',
  params: organisationParams,
  query: pageQuery.extend({
    sort: sortBy(['createdAt', 'kind'], '-createdAt'),
    kind: importKind.optional(),
  }),
  response: pageOf(importSchema.omit({ leftOut: true })),
  summary: 'Imports of this side, searched by the name of the file, the latest first.',
})

export const readImport = defineEndpoint({
  method: 'get',
  path: importPath,
  access: 'imports.read',
  params: paramsWith('importId'),
  response: importSchema,
  summary: 'One import: how far it is, what it brought in and which rows were left out.',
})

export const downloadImport = defineEndpoint({
  method: 'get',
  path: `${importPath}/file`,
  access: 'imports.read',
  params: paramsWith('importId'),
  summary: 'The file of an import, byte for byte as it was uploaded.',
})

export const downloadLeftOut = defineEndpoint({
  method: 'get',
  path: `${importPath}/left-out.csv`,
  access: 'imports.read',
  params: paramsWith('importId'),
  summary: 'The rows that were left out as CSV, each with what to mend, to be uploaded again.',
})

/** What each kind of import offers, under the permission that the single act asks for. */
const endpointsOf = <const K extends ImportKind, const P extends Permission>(kind: K, access: P) => ({
  template: defineEndpoint({
    method: 'get',
    path: `${path}/${kind}/template`,
    access,
    params: organisationParams,
    query: z.object({
      format: z.enum(['csv', 'xlsx'], 'Choose csv or xlsx.').default('xlsx'),
      /** Studies alone: one row for each study, or one for each reading. */
      layout: z.enum(['wide', 'long']).default('wide'),
    }),
    summary: `A file to fill in with ${kind} and to upload again.`,
  }),
  preview: defineEndpoint({
    method: 'post',
    path: `${path}/${kind}/preview`,
    access,
    params: organisationParams,
    body: importInput,
    upload: { maximumBytes: largestImport },
    response: importPreviewSchema,
    summary: `What a file of ${kind} would make new, change and leave, and every bad row; nothing is stored.`,
  }),
  apply: defineEndpoint({
    method: 'post',
    path: `${path}/${kind}`,
    access,
    params: organisationParams,
    body: applyInput,
    upload: { maximumBytes: largestImport },
    response: importSchema,
    summary: `Begins to import a previewed file of ${kind}: all of it or nothing, or its good rows.`,
  }),
  repeat: defineEndpoint({
    method: 'post',
    path: `${path}/${kind}/:importId/repeat`,
    access,
    params: paramsWith('importId'),
    body: z.object({ expectedVersion: z.number().int().min(1) }),
    response: importSchema,
    summary: `Begins an import of ${kind} that failed or was interrupted once more.`,
  }),
})

export const importsOf = {
  parts: endpointsOf('parts', 'parts.change'),
  gauges: endpointsOf('gauges', 'gauges.change'),
  studies: endpointsOf('studies', 'studies.change'),
} as const
