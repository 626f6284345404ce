import { allows, roles, sides, type EndpointShape, type Permission, type Side } from '@evenrule/api/contract'
import type { Route } from '../../packages/api/src/server/http/route'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import type { Person } from '../api/harness'
import { sampleBody, sampleFile, sampleQuery } from './sample-body'
import { startWorld, type Samples, type World } from './world'

let world: World
let tenantRoutes: EndpointShape[]

beforeAll(async () => {
  world = await startWorld()
  tenantRoutes = world.harness.routes
    .filter(({ scope }) => scope === 'tenant')
    .map(({ endpoint }) => endpoint)
}, 240_000)
afterAll(() => world.stop())
beforeEach(() => world.freshen())

/** Routes that need no session, each with the reason. Nothing else may be reached by strangers. */
const publicRoutes: Record<string, string> = {
  'get /health': 'says whether the service stands, and nothing else',
  'get /sign-in': 'where signing in begins',
  'get /sign-in/callback': 'where the sign-in provider leads back to',
}
/** Routes of a person rather than of an organisation. */
const personRoutes = [
  'get /engines/:sha256',
  'get /session',
  'post /evaluate',
  'post /invitations/accept',
  'post /invitations/open',
  'post /sign-out',
  'post /sign-out-everywhere',
]
/** What a customer shows to everybody who supplies it, so that a competitor there sees it too. */
const shownToSuppliers = ['get /organisations/:organisationId/house-terms/:houseTermsId']
const nameOf = ({ method, path }: EndpointShape) => `${method} ${path}`
const paramsOf = ({ path }: EndpointShape) => [...path.matchAll(/:(\w+)/g)].map(([, name]) => name ?? '')

/** The sample for a parameter; a file below a submission is another thing than one of the supplier's own. */
function sample(samples: Samples, { path }: EndpointShape, name: string): string {
  const key = name === 'fileId' && path.includes('/submissions/') ? 'submissionFileId' : name
  const value = samples[key]
  if (!value) throw new Error(`The parameter ${name} of ${path} has no sample: add one to world.ts.`)
  return value
}
const addressOf = (endpoint: EndpointShape, samples: Samples) =>
  endpoint.path.replace(/:(\w+)/g, (_match, name: string) => sample(samples, endpoint, name))

/** Calls a route with a body that its contract takes, as one file with fields where it takes a file. */
async function call(
  side: Side,
  person: Person | null,
  endpoint: EndpointShape,
  samples: Samples,
  at = samples,
) {
  const request = world.harness
    .as(side, person)
    .send(endpoint.method, addressOf(endpoint, samples))
    .query(sampleQuery(endpoint, at))
  const body = sampleBody(endpoint, at)
  if (!endpoint.upload) return body === undefined ? request : request.send(body as object)
  const { name, bytes } = sampleFile(endpoint)
  return request.field('data', JSON.stringify(body)).attach('file', bytes, name)
}

/** Everything the victims have, in one number for each table. */
async function fingerprint() {
  const { rows: tables } = await world.harness.owner.query<{ table: string; columns: string[] }>(
    `select table_name as table, array_agg(column_name::text) as columns from information_schema.columns
     where table_schema = 'public' and column_name in ('org_id', 'supplier_org_id', 'customer_org_id')
       and table_name <> 'security_events' group by 1 order by 1`,
  )
  const result: Record<string, string> = {}
  for (const { table, columns } of tables) {
    const mine = columns.map((each) => `${each} = any($1)`).join(' or ')
    const { rows } = await world.harness.owner.query<{ hash: string }>(
      `select md5(coalesce(string_agg(t::text, '|' order by t::text), '')) as hash from "${table}" t where ${mine}`,
      [[world.victims.supplier.id, world.victims.customer.id]],
    )
    result[table] = rows[0]?.hash ?? ''
  }
  return result
}

describe('the list of routes', () => {
  it('has no public route but those named', () => {
    const open = world.harness.routes.filter(({ scope }) => scope === 'public')
    expect(open.map(({ endpoint }) => nameOf(endpoint)).sort()).toEqual(Object.keys(publicRoutes).sort())
    const persons = world.harness.routes.filter(({ scope }) => scope === 'person')
    expect(persons.map(({ endpoint }) => nameOf(endpoint)).sort()).toEqual(personRoutes)
  })

  it('agrees with the contract about who may reach a route', () => {
    const meant = ({ access }: EndpointShape): Route['scope'] =>
      access === 'public' ? 'public' : access === 'signed-in' ? 'person' : 'tenant'
    const faulty = world.harness.routes.filter(({ scope, endpoint }) => scope !== meant(endpoint))
    expect(faulty.map(({ endpoint }) => nameOf(endpoint))).toEqual([])
  })

  it('names the organisation first in every route of one', () => {
    expect(tenantRoutes.length).toBeGreaterThan(80)
    for (const { path } of tenantRoutes) expect(path).toMatch(/^\/organisations\/:organisationId(\/|$)/)
  })

  it('has a sample for every parameter, and a body for every route that takes one', () => {
    for (const endpoint of tenantRoutes)
      for (const side of sides) {
        for (const name of paramsOf(endpoint)) sample(world.samples[side], endpoint, name)
        sampleBody(endpoint, world.samples[side])
      }
  })
})

describe('a stranger without a session', () => {
  it('is told to sign in, by every route that is not public', async () => {
    for (const { scope, endpoint } of world.harness.routes) {
      if (scope === 'public') continue
      for (const side of sides) {
        const samples = { ...world.samples[side], sha256: '0'.repeat(64) }
        const answer = await world.harness.as(side, null).send(endpoint.method, addressOf(endpoint, samples))
        expect([nameOf(endpoint), answer.status, answer.body.code]).toEqual([
          nameOf(endpoint),
          401,
          'not-signed-in',
        ])
      }
    }
  })
})

describe('a member of the organisation', () => {
  it('with every role reads everything that the samples name, on a side that may, and changes nothing by it', async () => {
    const before = await fingerprint()
    for (const endpoint of tenantRoutes.filter(({ method }) => method === 'get')) {
      const statuses = []
      for (const side of sides) {
        const answer = await call(side, world.insider, endpoint, world.samples[side])
        statuses.push(answer.status)
      }
      expect([nameOf(endpoint), statuses.includes(200), statuses]).toEqual([nameOf(endpoint), true, statuses])
    }
    expect(await fingerprint()).toEqual(before)
  })

  it('is refused on the side that has no such work', async () => {
    let refused = 0
    for (const endpoint of tenantRoutes)
      for (const side of sides) {
        if (allows(endpoint.access as Permission, side, roles)) continue
        const answer = await call(side, world.insider, endpoint, world.samples[side])
        expect([nameOf(endpoint), side, answer.status, answer.body.code]).toEqual([
          ...[nameOf(endpoint), side, 403, 'not-allowed'],
        ])
        refused += 1
      }
    expect(refused).toBeGreaterThan(20)
  })

  it('is refused without a role that may', async () => {
    let refused = 0
    for (const endpoint of tenantRoutes)
      for (const side of sides)
        for (const role of roles) {
          if (allows(endpoint.access as Permission, side, [role])) continue
          const answer = await call(side, world.withOnly[role], endpoint, world.samples[side])
          expect([nameOf(endpoint), side, role, answer.status, answer.body.code]).toEqual([
            ...[nameOf(endpoint), side, role, 403, 'not-allowed'],
          ])
          refused += 1
        }
    expect(refused).toBeGreaterThan(200)
  })

  it('who only reads can change nothing but what is their own', async () => {
    const changing = tenantRoutes.filter(
      ({ method, access }) =>
        method !== 'get' && sides.some((side) => allows(access as Permission, side, ['reader'])),
    )
    expect(changing.map(nameOf).sort()).toEqual([
      'post /organisations/:organisationId/messages/:messageId/read',
      'post /organisations/:organisationId/messages/read',
      // Computes a plan and keeps nothing.
      'post /organisations/:organisationId/studies/plan',
      'put /organisations/:organisationId/mail-choice',
    ])
  })

  it('whose membership has ended is a stranger', async () => {
    const former = world.withOnly.reader
    const set = (endsOn: string | null) =>
      world.harness.owner.query('update memberships set ends_on = $1 where user_id = $2', [endsOn, former.id])
    await set('2026-11-01')
    for (const endpoint of tenantRoutes) {
      const answer = await call('supplier', former, endpoint, world.samples.supplier)
      expect([nameOf(endpoint), answer.status]).toEqual([nameOf(endpoint), 404])
    }
    await set(null)
  })

  it('must have signed in just now to sign', async () => {
    const signing = tenantRoutes.filter(({ fresh }) => fresh)
    expect(signing.length).toBeGreaterThan(4)
    const now = world.harness.now()
    world.harness.moveClock(new Date(now.getTime() + 5 * 60_000 + 1))
    for (const endpoint of signing) {
      const side = sides.find((each) => allows(endpoint.access as Permission, each, roles)) ?? 'supplier'
      const answer = await call(side, world.insider, endpoint, world.samples[side])
      expect([nameOf(endpoint), answer.status, answer.body.code]).toEqual([
        ...[nameOf(endpoint), 403, 'sign-in-afresh'],
      ])
    }
    world.harness.moveClock(now)
  })
})

describe.each(['a competitor', 'a foreigner'])('%s', (name) => {
  const attacker = () => {
    const found = world.attackers.find((each) => each.name === name)
    if (!found) throw new Error(`${name} is not prepared.`)
    return found
  }

  it('does not reach into the organisation by its address', async () => {
    for (const endpoint of tenantRoutes)
      for (const side of sides) {
        const answer = await call(side, attacker().person, endpoint, world.samples[side])
        expect([nameOf(endpoint), side, answer.status, answer.body.code]).toEqual([
          ...[nameOf(endpoint), side, 404, 'not-found'],
        ])
      }
  })

  it('does not reach its things from their own organisation, by address or in a body', async () => {
    const before = await fingerprint()
    for (const endpoint of tenantRoutes)
      for (const side of sides) {
        if (!allows(endpoint.access as Permission, side, roles)) continue
        const victim = world.samples[side]
        const answer = await call(
          side,
          attacker().person,
          endpoint,
          { ...victim, organisationId: attacker().home.id },
          victim,
        )
        const context = [nameOf(endpoint), side, answer.status, JSON.stringify(answer.body).slice(0, 300)]
        const isShown =
          name === 'a competitor' && side === 'supplier' && endpoint.path.includes('/house-terms')
        if (isShown && endpoint.method === 'get') {
          if (paramsOf(endpoint).length > 1) expect(shownToSuppliers).toContain(nameOf(endpoint))
          expect([...context, answer.status]).toEqual([...context, 200])
          continue
        }
        const further = paramsOf(endpoint).filter((each) => each !== 'organisationId')
        if (further.length > 0) expect([...context, answer.status]).toEqual([...context, 404])
        // Lists of one's own are answered, and hold nothing of the victim's; bodies that name the victim's are refused.
        else if (answer.status < 300) {
          for (const [key, id] of Object.entries(victim))
            if (/^[0-9a-f-]{36}$/.test(id) && key !== 'organisationId')
              expect([...context, answer.text.includes(id)]).toEqual([...context, false])
        } else expect([...context, [403, 404, 409, 422].includes(answer.status)]).toEqual([...context, true])
      }
    expect(await fingerprint()).toEqual(before)
  })
})
