import {
  downloadImport,
  downloadLeftOut,
  importKinds,
  importsOf,
  listImports,
  readImport,
  type ImportKind,
} from '../../../contract/imports'
import type { Database } from '../../db/database'
import { preparedRoute, tenantRoute, type Route } from '../../http/route'
import { beginImport, repeatImport } from './imports.apply.service'
import { previewOf, readUpload } from './imports.preview.service'
import { importById, importFileOf, leftOutFileOf, listOfImports } from './imports.read.service'
import { ImportRunner } from './imports.runner'
import { templateOf } from './imports.template'

/** The routes of imports; the work itself runs beside the requests, in transactions of its own. */
export function importsRoutes(database: Database): Route[] {
  const runner = new ImportRunner(database)
  const ofKind = (kind: ImportKind): Route[] => {
    const { template, preview, apply, repeat } = importsOf[kind]
    return [
      tenantRoute(template, ({ tenant, query }) => templateOf(kind, tenant.side, query)),
      preparedRoute(preview, readUpload, ({ tenant, body, prepared }) =>
        previewOf(tenant, kind, body, prepared),
      ),
      preparedRoute(
        apply,
        async (call) => {
          const read = await readUpload(call)
          const stored = await call.services.files.put(read.file.bytes)
          return { ...read, stored: { ...read.file, contentType: read.table.contentType, stored } }
        },
        ({ tenant, body, prepared }) => beginImport(tenant, kind, body, prepared, runner.begin),
      ),
      tenantRoute(repeat, ({ tenant, params, body }) =>
        repeatImport(tenant, kind, params.importId, body.expectedVersion, runner.begin),
      ),
    ]
  }
  return [
    tenantRoute(listImports, ({ tenant, query }) => listOfImports(tenant, query)),
    ...importKinds.flatMap(ofKind),
    tenantRoute(readImport, ({ tenant, params }) => importById(tenant, params.importId)),
    tenantRoute(downloadImport, ({ tenant, params }) => importFileOf(tenant, params.importId)),
    tenantRoute(downloadLeftOut, ({ tenant, params }) => leftOutFileOf(tenant, params.importId)),
  ]
}
