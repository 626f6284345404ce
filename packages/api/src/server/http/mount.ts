import { sql } from 'drizzle-orm'
import { and, eq } from 'drizzle-orm'
import type { NextFunction, Request, RequestHandler, Response, Router } from 'express'
import multer from 'multer'
import type { z } from 'zod'
import { allows, type Permission, type Side } from '../../contract/access'
import type { Database } from '../db/database'
import { withTenant, type Tenant } from '../db/tenant'
import { defineError, invalidInput, notFound, ProblemError, type FieldError } from '../errors'
import { memberships } from '../modules/organisations/organisations.table'
import { securityEvents } from '../modules/sign-in/sign-in.table'
import { newId } from '../db/columns'
import type { Services } from '../services'
import { isDownload, type Download, type Route, type UploadedFile } from './route'
import { freshFor, type SignedIn } from './session'

const notSignedIn = defineError('not-signed-in', 401, 'Sign in first. What you typed is kept in this window.')
const notAllowed = defineError(
  'not-allowed',
  403,
  'Your role in this organisation does not allow that. Ask an admin of your organisation for the role that does.',
)
const signInAfresh = defineError(
  'sign-in-afresh',
  403,
  'A signature needs a fresh sign-in. Sign in again; this page comes back as it was.',
)
const tooLarge = defineError(
  'file-too-large',
  413,
  (megabytes: number) => `This file is larger than ${megabytes} MB. Send a smaller one, or split it.`,
)

export interface MountDependencies {
  side: Side
  database: Database
  services: Services
}

/** Puts a route on the router: parse with the contract, authorise, run, strip the answer. */
export function mount(router: Router, route: Route, dependencies: MountDependencies): void {
  const { endpoint } = route
  const before: RequestHandler[] = endpoint.upload ? [acceptFile(endpoint.upload.maximumBytes)] : []
  router[endpoint.method](endpoint.path, authenticate(route), ...before, async (request, response) => {
    const answer = await run(route, request, response, dependencies)
    if (response.headersSent) return
    if (isDownload(answer)) return sendDownload(response, answer)
    if (!endpoint.response) {
      response.status(204).end()
      return
    }
    // Through JSON first, so that the contract sees what the client will see.
    response.json(endpoint.response.parse(JSON.parse(JSON.stringify(answer ?? null))))
  })
}

/** Refuses strangers before a body is read. */
const authenticate =
  (route: Route): RequestHandler =>
  (request, _response, next) => {
    if (route.scope !== 'public' && !request.session?.person) throw notSignedIn()
    next()
  }

async function run(
  route: Route,
  request: Request,
  response: Response,
  { side, database, services }: MountDependencies,
): Promise<unknown> {
  const { endpoint } = route
  const params = parse(endpoint.params, request.params, 'params')
  // Query and body are read after authorisation: a stranger learns nothing about what an endpoint expects.
  const rest = () => ({
    params,
    query: parse(endpoint.query, request.query, 'query'),
    body: parse(endpoint.body, request.body, 'body'),
  })
  const handle = route.handle as (call: unknown) => Promise<unknown>
  if (route.scope === 'public') return handle({ ...rest(), side, services, request, response })
  const person = request.session.person as SignedIn
  if (route.scope === 'person') return handle({ ...rest(), person, side, services, request, response })

  const organisationId = (params as { organisationId: string }).organisationId
  const context = {
    organisationId,
    userId: person.userId,
    side,
    roles: [],
    authenticatedAt: person.authenticatedAt,
  }
  const permission = endpoint.access as Permission
  const isFresh = () => services.clock().getTime() - Date.parse(person.authenticatedAt) <= freshFor
  try {
    let prepared: unknown
    if (route.prepare) {
      await withTenant(database, services, context, (tenant) => authorise(tenant, permission))
      const file = request.file ? uploaded(request.file) : undefined
      prepared = await (route.prepare as (call: unknown) => Promise<unknown>)({ ...rest(), file, services })
    }
    return await withTenant(database, services, context, async (tenant) => {
      await authorise(tenant, permission)
      if (endpoint.fresh && !isFresh()) throw signInAfresh()
      return handle({ ...rest(), tenant, prepared })
    })
  } catch (error) {
    if (error instanceof ProblemError && error.code === 'not-allowed') {
      await logRefusal(database, services, person.userId, organisationId, permission)
    }
    throw error
  }
}

/** The membership is read on every request: a role taken away, or a membership that ended, counts at once. */
async function authorise(tenant: Tenant, permission: Permission): Promise<void> {
  const [membership] = await tenant.tx
    .select({ roles: memberships.roles, endsOn: memberships.endsOn })
    .from(memberships)
    .where(and(eq(memberships.orgId, tenant.organisationId), eq(memberships.userId, tenant.userId)))
  if (!membership || (membership.endsOn && membership.endsOn < tenant.now.slice(0, 10)))
    throw notFound('organisation')
  if (!allows(permission, tenant.side, membership.roles)) throw notAllowed()
  tenant.roles = membership.roles
}

async function logRefusal(
  database: Database,
  services: Services,
  userId: string,
  orgId: string,
  permission: string,
): Promise<void> {
  await database.insert(securityEvents).values({
    id: newId(),
    at: services.clock().toISOString(),
    kind: 'refused',
    userId,
    orgId,
    detail: { permission },
  })
}

function parse(schema: z.ZodType | undefined, value: unknown, where: string): unknown {
  if (!schema) return undefined
  const result = schema.safeParse(value ?? {})
  if (result.success) return result.data
  // A malformed id in the address is an address that leads nowhere.
  if (where === 'params') throw notFound('page')
  throw invalidInput(
    result.error.issues.map((issue): FieldError => ({
      path: [where, ...issue.path].join('.'),
      message: issue.message,
    })),
  )
}

function acceptFile(maximumBytes: number): RequestHandler {
  const upload = multer({
    storage: multer.memoryStorage(),
    limits: { fileSize: maximumBytes, files: 1, fields: 40, fieldSize: 4_000_000, parts: 60 },
    defParamCharset: 'utf8',
  }).single('file')
  return (request: Request, response: Response, next: NextFunction) =>
    upload(request, response, (error: unknown) => {
      if (error instanceof multer.MulterError) {
        if (error.code === 'LIMIT_FILE_SIZE') return next(tooLarge(Math.round(maximumBytes / 1_000_000)))
        return next(
          invalidInput([{ path: error.field ? `body.${error.field}` : 'body', message: error.message }]),
        )
      }
      if (error)
        return next(
          invalidInput([
            { path: 'body', message: 'The upload was cut off or is not a form. Choose the file again.' },
          ]),
        )
      // Structured fields travel as JSON in the field `data`.
      const body = request.body as { data?: string } | undefined
      if (typeof body?.data === 'string') {
        try {
          request.body = JSON.parse(body.data) as unknown
        } catch {
          return next(invalidInput([{ path: 'body.data', message: 'This is not JSON.' }]))
        }
      }
      next()
    })
}

const uploaded = (file: Express.Multer.File): UploadedFile => ({
  name: ownName(file.originalname),
  bytes: file.buffer,
})

/** A file's name without any path, control characters or quotes; never used as a path. */
const ownName = (name: string): string =>
  (name.split(/[\\/]/).pop() ?? '')
    // eslint-disable-next-line no-control-regex -- the control characters are what is removed
    .replace(/[\u0000-\u001f\u007f"\u2028\u2029\ud800-\udfff]/g, '')
    .slice(0, 200) || 'file'

function sendDownload(response: Response, download: Download): void {
  response.setHeader('Content-Type', download.contentType)
  response.setHeader('X-Content-Type-Options', 'nosniff')
  if (!download.inline) {
    const plain = download.name.replace(/[^\x20-\x7e]|["\\%]/g, '_')
    response.setHeader(
      'Content-Disposition',
      `attachment; filename="${plain}"; filename*=UTF-8''${encodeURIComponent(download.name)}`,
    )
  }
  response.send(download.bytes)
}

/** Whether the database answers. */
export async function checkDatabase(database: Database): Promise<void> {
  await database.execute(sql`select 1`)
}
