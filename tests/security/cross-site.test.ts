import request from 'supertest'
import { sides, type EndpointShape, type Side } from '@evenrule/api/contract'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { startHarness, type Harness, type Organisation, type Person } from '../api/harness'

let harness: Harness
let person: Person
let organisation: Organisation
let unsafe: EndpointShape[]

beforeAll(async () => {
  harness = await startHarness()
  person = await harness.person('Ada Vogt')
  organisation = await harness.organisation('Supplier', [[person, ['gauge-engineer', 'admin']]])
  unsafe = harness.routes
    .map(({ endpoint }) => endpoint as EndpointShape)
    .filter(({ method }) => method !== 'get')
})
afterAll(() => harness.stop())

const origins: Record<Side, string> = { supplier: 'http://supplier.test', customer: 'http://customer.test' }
const own = (side: Side) => ({ origin: origins[side], 'x-evenrule-client': '1' })
const addressOf = ({ path }: EndpointShape) =>
  `/api/v1${path.replace(':organisationId', organisation.id).replace(/:\w+/g, '0198f5a0-0000-7000-8000-000000000001')}`

/** A request of the signed-in person's browser with these headers, and no others. */
const send = (side: Side, endpoint: EndpointShape, headers: Record<string, string>) =>
  request(harness.apps[side])
    [endpoint.method](addressOf(endpoint))
    .set('x-test-person', person.id)
    .set(headers)

const foreign: [string, (side: Side) => Record<string, string>][] = [
  ['without the header that only our client sets', (side) => ({ origin: origins[side] })],
  ['with a wrong value of that header', (side) => ({ ...own(side), 'x-evenrule-client': 'yes' })],
  ['without an origin', () => ({ 'x-evenrule-client': '1' })],
  ['from another origin', (side) => ({ ...own(side), origin: 'https://evil.example' })],
  ['from no origin in particular', (side) => ({ ...own(side), origin: 'null' })],
  [
    'from the other side’s app',
    (side) => ({ ...own(side), origin: origins[side === 'supplier' ? 'customer' : 'supplier'] }),
  ],
  [
    'from an origin that begins like ours',
    (side) => ({ ...own(side), origin: `${origins[side]}.evil.example` }),
  ],
  ['from another site, as the browser says', (side) => ({ ...own(side), 'sec-fetch-site': 'cross-site' })],
  ['from the same site on another port', (side) => ({ ...own(side), 'sec-fetch-site': 'same-site' })],
  ['typed into the address bar', (side) => ({ ...own(side), 'sec-fetch-site': 'none' })],
]

describe('a request that changes something', () => {
  it.each(foreign)('is refused by every route %s', async (_what, headers) => {
    expect(unsafe.length).toBeGreaterThan(50)
    for (const endpoint of unsafe)
      for (const side of sides) {
        const answer = await send(side, endpoint, headers(side))
        expect([endpoint.path, side, answer.status, answer.body.code]).toEqual([
          ...[endpoint.path, side, 403, 'cross-site'],
        ])
      }
  })

  it('is refused before its body is read', async () => {
    const answer = await request(harness.apps.supplier)
      .post(`/api/v1/organisations/${organisation.id}/gauges`)
      .set({ 'x-test-person': person.id, origin: 'https://evil.example', 'content-type': 'application/json' })
      .send('{ this is no JSON')
    expect(answer.body.code).toBe('cross-site')
  })

  it('passes when it comes from the app itself, with and without what browsers add', async () => {
    const gauge = (code: string) => ({ code, name: 'Bore gauge', resolution: '0.001', unit: 'mm' })
    for (const [code, more] of [
      ['G-1', {}],
      ['G-2', { 'sec-fetch-site': 'same-origin' }],
    ] as const) {
      const answer = await request(harness.apps.supplier)
        .post(`/api/v1/organisations/${organisation.id}/gauges`)
        .set({ 'x-test-person': person.id, ...own('supplier'), ...more })
        .send(gauge(code))
      expect(answer.status).toBe(200)
    }
  })
})

describe('every answer', () => {
  it('forbids other sites to read, frame or sniff it, and caches to keep it', async () => {
    for (const side of sides) {
      const answer = await request(harness.apps[side])
        .get(`/api/v1/organisations/${organisation.id}/gauges`)
        .set({ 'x-test-person': person.id, origin: 'https://evil.example' })
      expect(answer.headers).toMatchObject({
        'cache-control': 'no-store',
        'x-content-type-options': 'nosniff',
        'x-frame-options': expect.stringMatching(/DENY|SAMEORIGIN/),
        'cross-origin-opener-policy': 'same-origin',
        'cross-origin-resource-policy': 'same-origin',
        'referrer-policy': 'same-origin',
      })
      expect(answer.headers).not.toHaveProperty('access-control-allow-origin')
      expect(answer.headers).not.toHaveProperty('x-powered-by')
    }
  })

  it('carries a policy without inline scripts, eval, or other origins', async () => {
    const { headers } = await request(harness.apps.supplier).get('/api/v1/health')
    const policy = Object.fromEntries(
      String(headers['content-security-policy'])
        .split(';')
        .map((part) => part.trim().split(/\s+/))
        .map(([name, ...values]) => [name, values]),
    )
    expect(policy).toMatchObject({
      'default-src': ["'none'"],
      'script-src': ["'self'"],
      'connect-src': ["'self'"],
      'form-action': ["'self'"],
      'frame-ancestors': ["'none'"],
      'base-uri': ["'none'"],
    })
  })

  it('tells strangers nothing of a fault but its number in the log', async () => {
    const answer = await request(harness.apps.supplier)
      .get(`/api/v1/organisations/not-a-uuid/gauges`)
      .set('x-test-person', person.id)
    expect(answer.status).toBe(404)
    expect(answer.text).not.toMatch(/select|uuid|stack|node_modules/i)
  })
})
