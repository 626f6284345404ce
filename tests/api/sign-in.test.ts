import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { Browser, startSignInWorld } from './sign-in.world'

let world: Awaited<ReturnType<typeof startSignInWorld>>
beforeAll(async () => {
  world = await startSignInWorld()
})
afterAll(() => world.stop())
afterEach(() => world.setAhead(0))

const browser = () => new Browser(world.origins)
const ines = 'demo-ines-calder'
const tomas = 'demo-tomas-brandl'
const mara = 'demo-mara-lindqvist'
const problemOf = (location: string) => new URL(location, 'http://x').searchParams.get('problem')
const owner = () => world.harness.owner
/** Every way in which `change` alters the open sign-ins that sessions remember. */
const tamper = (field: 'nonce' | 'codeVerifier') =>
  owner().query(
    `update session.session set sess = jsonb_set(sess::jsonb, '{pendingSignIns,0,${field}}', to_jsonb($1::text))::json
     where sess::jsonb -> 'pendingSignIns' -> 0 is not null`,
    ['x'.repeat(43)],
  )

describe('a sign-in', () => {
  it('asks the provider with PKCE, a state and a nonce, all new each time', async () => {
    const addresses = [await browser().begin('supplier'), await browser().begin('supplier')]
    for (const { origin, searchParams } of addresses) {
      expect(origin).toBe(world.issuer)
      expect(Object.fromEntries(searchParams)).toMatchObject({
        response_type: 'code',
        client_id: 'evenrule-supplier',
        redirect_uri: `${world.origins.supplier}/api/v1/sign-in/callback`,
        code_challenge_method: 'S256',
        code_challenge: expect.stringMatching(/^[\w-]{43}$/),
        state: expect.stringMatching(/^[\w-]{32,}$/),
        nonce: expect.stringMatching(/^[\w-]{32,}$/),
      })
    }
    for (const name of ['state', 'nonce', 'code_challenge'])
      expect(addresses[0]?.searchParams.get(name)).not.toBe(addresses[1]?.searchParams.get(name))
  })

  it('ends with the person, on the page they came from, in both apps', async () => {
    const visitor = browser()
    const page = '/organisations/1/parts?search=74#list'
    expect(await visitor.signIn('supplier', ines, `?returnTo=${encodeURIComponent(page)}`)).toBe(page)
    expect(await visitor.person('supplier')).toMatchObject({ name: 'Ines Calder' })
    expect(await visitor.person('customer')).toBeUndefined()
    await visitor.signIn('customer', mara)
    expect(await visitor.person('customer')).toMatchObject({ name: 'Mara Lindqvist' })
    expect(await visitor.person('supplier')).toMatchObject({ name: 'Ines Calder' })
  })

  it('makes one person of an issuer and a subject, whatever their e-mail', async () => {
    const first = browser()
    await first.signIn('supplier', tomas)
    const before = await first.person('supplier')
    await owner().query('update users set email = $1 where id = $2', ['elsewhere@people.example', before?.id])
    const second = browser()
    await second.signIn('supplier', tomas)
    expect((await second.person('supplier'))?.id).toBe(before?.id)
    const { rows } = await owner().query('select issuer, email from users where subject = $1', [tomas])
    expect(rows).toEqual([{ issuer: world.issuer, email: 'tomas.brandl@tarnfield.example' }])
  })

  it('puts the session under a new id; the one from before is worth nothing', async () => {
    const visitor = browser()
    const callback = await visitor.choose(await visitor.begin('supplier'), ines)
    const before = visitor.jar.get('evenrule-supplier')
    expect(before).toBeDefined()
    await visitor.visit(callback)
    expect(visitor.jar.get('evenrule-supplier')).not.toBe(before)
    const fixed = browser()
    fixed.jar.set('evenrule-supplier', before ?? '')
    expect(await fixed.person('supplier')).toBeUndefined()
  })

  it('is kept in a cookie that scripts and other sites do not get, one for each app', async () => {
    const visitor = browser()
    await visitor.signIn('supplier', ines)
    const flags = visitor.flags.get('evenrule-supplier') ?? ''
    expect(flags).toMatch(/; *HttpOnly/i)
    expect(flags).toMatch(/; *SameSite=Lax/i)
    expect(flags).toMatch(/; *Path=\/(;|$)/i)
    // The customer app takes no cookie of the supplier app, even under its own name.
    const other = browser()
    other.jar.set('evenrule-customer', visitor.jar.get('evenrule-supplier') ?? '')
    expect(await other.person('customer')).toBeUndefined()
  })

  it.each([
    'https://evil.example/',
    '//evil.example/',
    '/\\evil.example',
    '/\t/evil.example',
    'javascript:alert(1)',
    '/api/v1/session',
    '/sign-in?problem=left',
  ])('never leads elsewhere than into the app: %j', async (returnTo) => {
    expect(await browser().signIn('supplier', ines, `?returnTo=${encodeURIComponent(returnTo)}`)).toBe('/')
  })
})

describe('a callback is refused', () => {
  const callbackOf = async (visitor: Browser) => visitor.choose(await visitor.begin('supplier'), ines)

  it('in a browser that began no sign-in, so that nobody signs another in as themselves', async () => {
    const attacker = browser()
    const callback = await callbackOf(attacker)
    const victim = browser()
    expect(problemOf((await victim.visit(callback)).location)).toBe('not-begun-here')
    expect(await victim.person('supplier')).toBeUndefined()
    // Nor in one that has begun one of its own.
    const busy = browser()
    await busy.begin('supplier')
    expect(problemOf((await busy.visit(callback)).location)).toBe('not-begun-here')
    expect(await busy.person('supplier')).toBeUndefined()
  })

  it('the second time', async () => {
    const visitor = browser()
    const callback = await callbackOf(visitor)
    expect((await visitor.visit(callback)).location).toBe('/')
    expect(problemOf((await visitor.visit(callback)).location)).toBe('not-begun-here')
  })

  it('with another state, another code, or no code at all', async () => {
    for (const [change, problem] of [
      [(url: URL) => url.searchParams.set('state', 'x'.repeat(43)), 'not-begun-here'],
      [(url: URL) => url.searchParams.delete('state'), 'not-begun-here'],
      [(url: URL) => url.searchParams.set('code', 'x'.repeat(43)), 'provider-refused'],
      [(url: URL) => url.searchParams.delete('code'), 'provider-refused'],
    ] as const) {
      const visitor = browser()
      const url = new URL(await callbackOf(visitor))
      change(url)
      expect(problemOf((await visitor.visit(url.href)).location)).toBe(problem)
      expect(await visitor.person('supplier')).toBeUndefined()
    }
  })

  it.each(['nonce', 'codeVerifier'] as const)('when the %s is not the one it began with', async (field) => {
    const visitor = browser()
    const callback = await callbackOf(visitor)
    await tamper(field)
    expect(problemOf((await visitor.visit(callback)).location)).toBe('provider-refused')
    expect(await visitor.person('supplier')).toBeUndefined()
  })

  it('after the sign-in was left, or left open too long', async () => {
    const visitor = browser()
    const at = await visitor.begin('supplier')
    const page = new URL((await visitor.visit(at.href)).location, at)
    const left = await visitor.visit(`${page.href}/cancel`, { method: 'POST' })
    const back = (await visitor.visit(new URL(left.location, at).href)).location
    expect(problemOf((await visitor.visit(back)).location)).toBe('left')
    const slow = browser()
    const callback = await callbackOf(slow)
    world.setAhead(31 * 60_000)
    expect(problemOf((await slow.visit(callback)).location)).toBe('took-too-long')
  })
})

describe('a fresh sign-in for a signature', () => {
  it('asks for a new proof and says when it was given', async () => {
    const visitor = browser()
    await visitor.signIn('supplier', ines)
    const before = await visitor.person('supplier')
    await new Promise((done) => setTimeout(done, 1_100))
    const at = await visitor.begin('supplier', '?fresh=1&returnTo=/submissions')
    expect(Object.fromEntries(at.searchParams)).toMatchObject({ prompt: 'login', max_age: '0' })
    expect(at.searchParams.get('login_hint')).toBe('ines.calder@tarnfield.example')
    expect((await visitor.visit(await visitor.choose(at, ines))).location).toBe('/submissions')
    const after = await visitor.person('supplier')
    expect(Date.parse(after?.authenticatedAt ?? '')).toBeGreaterThan(
      Date.parse(before?.authenticatedAt ?? ''),
    )
  })

  it('by somebody else is refused, and changes nothing for who is signed in', async () => {
    const visitor = browser()
    await visitor.signIn('supplier', ines)
    const before = await visitor.person('supplier')
    expect(problemOf(await visitor.signIn('supplier', tomas, '?fresh=1'))).toBe('another-person')
    expect(await visitor.person('supplier')).toEqual(before)
  })
})

describe('signing out', () => {
  it('ends the session, also for a copy of its cookie, and leads to the provider’s own sign-out', async () => {
    const visitor = browser()
    await visitor.signIn('supplier', ines)
    const copy = browser()
    copy.jar.set('evenrule-supplier', visitor.jar.get('evenrule-supplier') ?? '')
    expect(await copy.person('supplier')).toBeDefined()
    const { status, text } = await visitor.post('supplier', '/sign-out')
    expect(status).toBe(200)
    const next = new URL((JSON.parse(text) as { next: string }).next)
    expect(next.origin).toBe(world.issuer)
    expect(next.searchParams.get('post_logout_redirect_uri')).toBe(`${world.origins.supplier}/signed-out`)
    expect(next.searchParams.get('id_token_hint')).toBeTruthy()
    expect(visitor.jar.has('evenrule-supplier')).toBe(false)
    expect(await copy.person('supplier')).toBeUndefined()
  })

  it('takes a request of the app itself, never a link', async () => {
    const visitor = browser()
    await visitor.signIn('supplier', ines)
    for (const init of [
      { method: 'GET' },
      { method: 'POST' },
      { method: 'POST', headers: { origin: 'http://evil.example', 'x-evenrule-client': '1' } },
    ]) {
      const { status } = await visitor.visit(`${world.origins.supplier}/api/v1/sign-out`, init)
      expect([403, 404]).toContain(status)
    }
    expect(await visitor.person('supplier')).toBeDefined()
  })

  it('everywhere ends every session of the person, in both apps, and nobody else’s', async () => {
    const [first, second, other] = [browser(), browser(), browser()]
    await first.signIn('supplier', ines)
    await second.signIn('supplier', ines)
    await second.signIn('customer', ines)
    await other.signIn('supplier', tomas)
    const { text } = await first.post('supplier', '/sign-out-everywhere')
    expect((JSON.parse(text) as { sessions: number }).sessions).toBeGreaterThanOrEqual(3)
    expect(await first.person('supplier')).toBeUndefined()
    expect(await second.person('supplier')).toBeUndefined()
    expect(await second.person('customer')).toBeUndefined()
    expect(await other.person('supplier')).toMatchObject({ name: 'Tomas Brandl' })
  })
})

describe('a session', () => {
  it('ends twelve hours after the sign-in, however busy it is', async () => {
    const visitor = browser()
    await visitor.signIn('supplier', ines)
    world.setAhead(11.9 * 3_600_000)
    expect(await visitor.person('supplier')).toBeDefined()
    world.setAhead(12.1 * 3_600_000)
    expect(await visitor.person('supplier')).toBeUndefined()
  })

  it('ends after eight hours without a request', async () => {
    const visitor = browser()
    await visitor.signIn('supplier', ines)
    const id = decodeURIComponent(visitor.jar.get('evenrule-supplier') ?? '').replace(/^s:|\..*$/g, '')
    const { rows } = await owner().query<{ seconds: number }>(
      `select extract(epoch from expire - now()::timestamp)::float as seconds from session.session where sid = $1`,
      [id],
    )
    expect(rows[0]?.seconds).toBeGreaterThan(8 * 3600 - 60)
    expect(rows[0]?.seconds).toBeLessThanOrEqual(8 * 3600 + 1)
    await owner().query(
      `update session.session set expire = now()::timestamp - interval '1 second' where sid = $1`,
      [id],
    )
    expect(await visitor.person('supplier')).toBeUndefined()
  })
})

it('sign-ins, sign-outs and refusals are logged, without tokens', async () => {
  const { rows } = await owner().query<{ kind: string; detail: object }>(
    'select kind, detail from security_events',
  )
  const kinds = new Set(rows.map(({ kind }) => kind))
  expect([...kinds].sort()).toEqual(['sign-in', 'sign-in-refused', 'sign-out', 'sign-out-everywhere'])
  expect(JSON.stringify(rows)).not.toMatch(/eyJ|code=|[\w-]{43}/)
})
