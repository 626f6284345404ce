import { sql } from 'drizzle-orm'
import type { Request, RequestHandler, Response, Router } from 'express'
import type { Side } from '../../contract/access'
import type { Database } from '../db/database'
import { defineError } from '../errors'
import type { Services } from '../services'
import { parse } from './parse'
import { isDownload, type Download, type Route } from './route'
import type { SignedIn } from './session'
import { callTenantRoute } from './tenant-call'
import { acceptFile, uploaded } from './upload'

const notSignedIn = defineError('not-signed-in', 401, 'Sign in first. What you typed is kept in this window.')

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

  return callTenantRoute(
    route,
    {
      params: params as { organisationId: string },
      rest,
      file: request.file ? uploaded(request.file) : undefined,
      person,
      side,
    },
    { database, services },
  )
}

function sendDownload(response: Response, download: Download): void {
  response.setHeader('Content-Type', download.contentType)
  response.setHeader('X-Content-Type-Options', 'nosniff')
  if (download.inline) {
    // Named by the hash of its content: it can never come to mean anything else.
    response.setHeader('Cache-Control', 'private, max-age=31536000, immutable')
  } else {
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
