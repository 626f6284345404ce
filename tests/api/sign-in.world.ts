import { mkdtempSync, rmSync } from 'node:fs'
import { createServer, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { sides, type Side } from '@evenrule/api/contract'
import { createApp as createProvider } from '../../fakes/oidc/app'
import { keepKeys } from '../../fakes/oidc/keys'
import { createApp } from '../../packages/api/src/server/app'
import { openIdentity } from '../../packages/api/src/server/integrations/oidc'
import { openSessions } from '../../packages/api/src/server/integrations/sessions'
import { allRoutes } from '../../packages/api/src/server/routes'
import { invitationSecret, startHarness } from './harness'

const listen = async (): Promise<{ server: Server; address: string }> => {
  const server = createServer()
  await new Promise<void>((done) => void server.listen(0, '127.0.0.1', done))
  return { server, address: `http://127.0.0.1:${(server.address() as AddressInfo).port}` }
}

/** Both apps with real sessions before the real stand-in of a sign-in provider, all on ports of their own. */
export async function startSignInWorld() {
  const harness = await startHarness()
  const [provider, supplier, customer] = await Promise.all([listen(), listen(), listen()])
  const servers = { supplier, customer }
  const origins = { supplier: supplier.address, customer: customer.address }
  const clients = {
    supplier: { id: 'evenrule-supplier', secret: 'secret of the supplier app' },
    customer: { id: 'evenrule-customer', secret: 'secret of the customer app' },
  }
  const folder = mkdtempSync(join(tmpdir(), 'evenrule-sign-in-'))
  provider.server.on(
    'request',
    createProvider({
      issuer: provider.address,
      keys: keepKeys(folder),
      apps: sides.map((name) => ({
        ...{ name, origin: origins[name], clientId: clients[name].id, clientSecret: clients[name].secret },
      })),
    }),
  )
  /** Milliseconds that the apps' clock is ahead of the provider's. */
  let ahead = 0
  const clock = () => new Date(Date.now() + ahead)
  const sessions = openSessions(
    {
      sessionDatabaseUrl: harness.urlAs('evenrule_session'),
      sessionSecret: 'a secret of this test',
      origins,
    },
    clock,
  )
  const identity = openIdentity({ origins, oidc: { issuer: provider.address, ...clients } })
  const routes = allRoutes({
    database: harness.database,
    config: { origins, invitationSecret },
    identity,
    sessions,
  })
  for (const side of sides)
    servers[side].server.on(
      'request',
      createApp({
        ...{ side, origin: origins[side], database: harness.database, routes, rateLimitPerMinute: 0 },
        services: { ...harness.services, clock },
        session: sessions.middleware(side),
      }),
    )
  return {
    harness,
    origins,
    issuer: provider.address,
    setAhead: (milliseconds: number) => void (ahead = milliseconds),
    async stop() {
      for (const { server } of [provider, supplier, customer]) {
        server.closeAllConnections()
        await new Promise((done) => server.close(done))
      }
      await sessions.close()
      await harness.stop()
      rmSync(folder, { recursive: true })
    },
  }
}

type Origins = Record<Side, string>

/** A browser as far as signing in needs one: it keeps cookies, which ignore ports, and follows nothing by itself. */
export class Browser {
  readonly jar = new Map<string, string>()
  /** The flags of the cookies that were set last, by name. */
  readonly flags = new Map<string, string>()

  constructor(private readonly origins: Origins) {}

  async visit(url: string, init: RequestInit = {}) {
    const response = await fetch(url, {
      redirect: 'manual',
      ...init,
      headers: {
        cookie: [...this.jar].map(([name, value]) => `${name}=${value}`).join('; '),
        ...(init.headers as Record<string, string>),
      },
    })
    for (const line of response.headers.getSetCookie()) {
      const [, name = '', value = '', flags = ''] = /^([^=]+)=([^;]*)(.*)/.exec(line) ?? []
      if (/expires=Thu, 01 Jan 1970/i.test(line)) this.jar.delete(name)
      else this.jar.set(name, value)
      this.flags.set(name, flags)
    }
    const text = await response.text()
    return { status: response.status, location: response.headers.get('location') ?? '', text }
  }

  /** Begins a sign-in; the provider's address it leads to. */
  async begin(side: Side, query = ''): Promise<URL> {
    const { location } = await this.visit(`${this.origins[side]}/api/v1/sign-in${query}`)
    return new URL(location, this.origins[side])
  }

  /** Chooses a person at the provider; the address that leads back to the app. */
  async choose(at: URL, subject: string): Promise<string> {
    const asked = await this.visit(at.href)
    const page = new URL(asked.location, at)
    const chosen = await this.visit(`${page.href}/sign-in`, {
      method: 'POST',
      body: new URLSearchParams({ sub: subject }),
    })
    return (await this.visit(new URL(chosen.location, at).href)).location
  }

  /** Signs in as the app and its user do; the page it ends on. */
  async signIn(side: Side, subject: string, query = ''): Promise<string> {
    const callback = await this.choose(await this.begin(side, query), subject)
    return (await this.visit(callback)).location
  }

  /** What the app knows of the person signed in; undefined for nobody. */
  async person(side: Side): Promise<{ id: string; name: string; authenticatedAt: string } | undefined> {
    const { status, text } = await this.visit(`${this.origins[side]}/api/v1/session`)
    if (status !== 200) return undefined
    return (JSON.parse(text) as { person: { id: string; name: string; authenticatedAt: string } }).person
  }

  post(side: Side, path: string) {
    const origin = this.origins[side]
    return this.visit(`${origin}/api/v1${path}`, {
      method: 'POST',
      headers: { origin, 'x-evenrule-client': '1' },
    })
  }
}
