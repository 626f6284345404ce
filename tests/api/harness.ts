import { randomUUID } from 'node:crypto'
import { readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { sql } from 'drizzle-orm'
import type { Express, RequestHandler } from 'express'
import pg from 'pg'
import { pino } from 'pino'
import request from 'supertest'
import type { AnswerOf, EndpointShape } from '@evenrule/api/contract'
import type { Role, Side } from '@evenrule/api/contract'
import { createApp } from '../../packages/api/src/server/app'
import { newId } from '../../packages/api/src/server/db/columns'
import { openDatabase, type Database } from '../../packages/api/src/server/db/database'
import { withTenant, type Tenant } from '../../packages/api/src/server/db/tenant'
import type { SignedIn } from '../../packages/api/src/server/http/session'
import { openEngines } from '../../packages/api/src/server/integrations/engines'
import type { FileStore } from '../../packages/api/src/server/integrations/file-store'
import { openIdentity } from '../../packages/api/src/server/integrations/oidc'
import { sha256 } from '../../packages/api/src/server/modules/record/record.append'
import { allRoutes } from '../../packages/api/src/server/routes'
import type { Services } from '../../packages/api/src/server/services'

/** Keeps files in memory, under the same rule as the real store: one key, one content. */
export function memoryFiles(): FileStore {
  const objects = new Map<string, Buffer>()
  return {
    async put(bytes) {
      const hash = sha256(bytes)
      objects.set(`files/${hash}`, bytes)
      return { sha256: hash, key: `files/${hash}` }
    },
    async get(key) {
      const bytes = objects.get(key)
      if (!bytes) throw new Error(`no object ${key}`)
      return bytes
    },
    check: async () => undefined,
  }
}

export interface Organisation {
  id: string
  name: string
}
export interface Person {
  id: string
  name: string
  email: string
}
export interface Relationship {
  id: string
  supplierOrgId: string
  customerOrgId: string
}

const need = (name: string): string => {
  const value = process.env[name]
  if (!value) throw new Error(`${name} is missing: run the tests through npm test.`)
  return value
}

export const invitationSecret = 'a secret of the tests'
const origins: Record<Side, string> = { supplier: 'http://supplier.test', customer: 'http://customer.test' }

/**
 * A product of its own: a database cloned from the migrated template (or from another one), both apps, a clock that
 * the test moves.
 */
export async function startHarness({
  template = need('TEST_TEMPLATE_DATABASE'),
  files = memoryFiles(),
}: { template?: string; files?: FileStore } = {}) {
  const adminUrl = need('TEST_POSTGRES_ADMIN_URL')
  const name = `test_${randomUUID().replaceAll('-', '')}`
  await onAdmin(adminUrl, `create database ${name} template ${template} owner evenrule_migrator`)
  const urlAs = (role: string): string => {
    const url = new URL(adminUrl)
    url.username = role
    url.password = ''
    url.pathname = `/${name}`
    return url.href
  }
  const { database, pool } = openDatabase(urlAs('evenrule_app'), 4)
  const owner = new pg.Pool({ connectionString: urlAs('evenrule_migrator'), max: 2 })
  let now = new Date('2026-11-02T09:00:00.000Z')
  const services: Services = {
    clock: () => now,
    files,
    engines: await openEngines(fileURLToPath(new URL('../../packages/metrology/released', import.meta.url))),
    logger: pino({ level: 'silent' }),
  }
  const routes = allRoutes({
    database,
    config: { origins, invitationSecret },
    // Nothing answers at this address: signing in for real is proved in sign-in.test.ts.
    identity: openIdentity({
      origins,
      oidc: {
        issuer: 'http://127.0.0.1:9',
        supplier: { id: 's', secret: 's' },
        customer: { id: 'c', secret: 'c' },
      },
    }),
    sessions: {
      end: async (req) => void Object.assign(req, { session: {} }),
      endAllOf: async () => 0,
    },
  })
  const apps = { supplier: appOf('supplier'), customer: appOf('customer') } satisfies Record<Side, Express>

  function appOf(side: Side): Express {
    return createApp({
      side,
      origin: origins[side],
      database,
      services,
      session: testSession,
      routes,
      rateLimitPerMinute: 0,
    })
  }

  /** Stands in for a browser's session: the person travels in a header that only this test app reads. */
  const people = new Map<string, SignedIn>()

  function testSession(...[req, _res, next]: Parameters<RequestHandler>): void {
    const id = req.headers['x-test-person']
    const person = typeof id === 'string' ? people.get(id) : undefined
    // Only what the routes read of a session is provided here.
    Object.assign(req, { session: { ...(person ? { person } : {}) } })
    next()
  }

  const as = (side: Side, person: Person | null) => {
    const send = (method: 'get' | 'post' | 'put' | 'patch' | 'delete', path: string) => {
      const call = request(apps[side])
        [method](`/api/v1${path}`)
        .set('origin', origins[side])
        .set('x-evenrule-client', '1')
      return person ? call.set('x-test-person', person.id) : call
    }
    return {
      send,
      /** Calls an endpoint of the contract and expects success; throws the problem otherwise. */
      async call<E extends EndpointShape>(
        endpoint: E,
        params: Record<string, string>,
        input: {
          body?: unknown
          query?: Record<string, unknown>
          file?: { name: string; bytes: Buffer }
        } = {},
      ): Promise<AnswerOf<E>> {
        const path = endpoint.path.replace(/:(\w+)/g, (_m, key: string) => params[key] ?? '')
        let call = send(endpoint.method, path).query(input.query ?? {})
        if (endpoint.upload) {
          call = call.field('data', JSON.stringify(input.body ?? {}))
          if (input.file) call = call.attach('file', input.file.bytes, input.file.name)
        } else if (input.body !== undefined) call = call.send(input.body as object)
        const answer = await call
        if (answer.status >= 400)
          throw Object.assign(new Error(`${answer.status} ${JSON.stringify(answer.body) || answer.text}`), {
            status: answer.status,
            problem: answer.body,
          })
        return answer.body as AnswerOf<E>
      },
    }
  }

  return {
    database: database as Database,
    owner,
    ownerUrl: urlAs('evenrule_migrator'),
    /** The address of this test's database for one of the product's roles. */
    urlAs,
    services,
    routes,
    apps,
    as,
    now: () => now,
    moveClock(to: string | Date) {
      now = new Date(to)
    },
    async person(name: string): Promise<Person> {
      const id = newId()
      const email = `${name.toLowerCase().replace(/\W+/g, '.')}@people.example`
      await owner.query(
        'insert into users (id, issuer, subject, email, email_verified, name, created_at) values ($1, $2, $3, $4, true, $5, $6)',
        [id, 'http://oidc.test', id, email, name, now],
      )
      people.set(id, {
        userId: id,
        name,
        email,
        authenticatedAt: now.toISOString(),
        signedInAt: now.toISOString(),
      })
      return { id, name, email }
    },
    /** Lets a person in who is in the database already. */
    admit({ id, name }: { id: string; name: string }) {
      const at = now.toISOString()
      people.set(id, { userId: id, name, email: '', authenticatedAt: at, signedInAt: at })
    },
    /** The person signs in afresh at the harness's clock. */
    signInAfresh(person: Person) {
      const signedIn = people.get(person.id)
      if (signedIn) people.set(person.id, { ...signedIn, authenticatedAt: now.toISOString() })
    },
    async organisation(name: string, members: [Person, Role[]][] = []): Promise<Organisation> {
      const id = newId()
      await owner.query(
        'insert into organisations (id, name, time_zone, created_at) values ($1, $2, $3, $4)',
        [id, name, 'Europe/Berlin', now],
      )
      for (const [person, roles] of members) {
        await owner.query(
          'insert into memberships (org_id, user_id, roles, created_at) values ($1, $2, $3, $4)',
          [id, person.id, roles, now],
        )
      }
      return { id, name }
    },
    async relationship(supplier: Organisation, customer: Organisation): Promise<Relationship> {
      const id = newId()
      await owner.query(
        'insert into relationships (id, supplier_org_id, customer_org_id, time_zone, created_at) values ($1, $2, $3, $4, $5)',
        [id, supplier.id, customer.id, 'Europe/Berlin', now],
      )
      return { id, supplierOrgId: supplier.id, customerOrgId: customer.id }
    },
    /** Runs work as a person inside an organisation, past the routes; for set-up and for tests of services. */
    inTenant<T>(
      side: Side,
      organisation: Organisation,
      person: Person,
      roles: Role[],
      work: (tenant: Tenant) => Promise<T>,
    ): Promise<T> {
      return withTenant(
        database,
        services,
        {
          organisationId: organisation.id,
          userId: person.id,
          side,
          roles,
          authenticatedAt: now.toISOString(),
        },
        work,
      )
    },
    async stop(): Promise<void> {
      await Promise.all([pool.end(), owner.end()])
      await onAdmin(adminUrl, `drop database ${name} with (force)`)
    },
  }
}

export type Harness = Awaited<ReturnType<typeof startHarness>>

/** The released engines there are; for tests that name one. */
export const releases = (): { version: string; sha256: string; file: string }[] =>
  JSON.parse(
    readFileSync(
      fileURLToPath(new URL('../../packages/metrology/released/index.json', import.meta.url)),
      'utf8',
    ),
  )

async function onAdmin(url: string, statement: string): Promise<void> {
  const client = new pg.Client({ connectionString: url })
  await client.connect()
  try {
    await client.query(statement)
  } finally {
    await client.end()
  }
}

export { sql }
