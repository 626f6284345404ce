import { mkdtempSync, rmSync } from 'node:fs'
import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import * as openid from 'openid-client'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createApp } from './app'
import { keepKeys } from './keys'
import { groups } from './people'

const folder = mkdtempSync(join(tmpdir(), 'evenrule-oidc-'))
const server = createServer()
const apps = ['supplier', 'customer'].map((name) => ({
  name,
  origin: `http://${name}.localhost`,
  clientId: `evenrule-${name}`,
  clientSecret: `secret-of-${name}`,
}))
const [supplier, customer] = apps as [(typeof apps)[number], (typeof apps)[number]]
let issuer = ''

beforeAll(async () => {
  await new Promise<void>((done) => void server.listen(0, '127.0.0.1', done))
  issuer = `http://127.0.0.1:${(server.address() as AddressInfo).port}`
  server.on('request', createApp({ issuer, apps, keys: keepKeys(folder) }))
})

afterAll(async () => {
  await new Promise((done) => server.close(done))
  rmSync(folder, { recursive: true })
})

/** A browser as far as these pages need one: it keeps cookies and does not follow redirects by itself. */
function browser() {
  const jar = new Map<string, string>()
  return async (url: string, form?: Record<string, string>) => {
    const cookie = [...jar].map(([name, value]) => `${name}=${value}`).join('; ')
    const response = await fetch(new URL(url, issuer), {
      redirect: 'manual',
      headers: { cookie },
      ...(form ? { method: 'POST', body: new URLSearchParams(form) } : {}),
    })
    for (const line of response.headers.getSetCookie()) {
      const [, name = '', value = ''] = /^([^=]+)=([^;]*)/.exec(line) ?? []
      if (/expires=Thu, 01 Jan 1970/.test(line)) jar.delete(name)
      else jar.set(name, value)
    }
    return {
      status: response.status,
      location: response.headers.get('location') ?? '',
      text: await response.text(),
    }
  }
}
type Browser = ReturnType<typeof browser>

const connect = (app: (typeof apps)[number]) =>
  openid.discovery(new URL(issuer), app.clientId, app.clientSecret, undefined, {
    execute: [openid.allowInsecureRequests],
  })

/** Walks a sign-in as an app and its user do. */
async function signIn(
  visit: Browser,
  app: (typeof apps)[number],
  who: string | Record<string, string>,
  more: Record<string, string> = {},
) {
  const config = await connect(app)
  const verifier = openid.randomPKCECodeVerifier()
  const nonce = openid.randomNonce()
  const url = openid.buildAuthorizationUrl(config, {
    redirect_uri: `${app.origin}/api/v1/sign-in/callback`,
    scope: 'openid email profile',
    code_challenge: await openid.calculatePKCECodeChallenge(verifier),
    code_challenge_method: 'S256',
    nonce,
    ...more,
  })
  const asked = await visit(url.href)
  const page = await visit(asked.location)
  const chosen =
    typeof who === 'string'
      ? await visit(`${asked.location}/sign-in`, { sub: who })
      : await visit(`${asked.location}/new`, who)
  const back = await visit(chosen.location)
  const tokens = await openid.authorizationCodeGrant(config, new URL(back.location), {
    pkceCodeVerifier: verifier,
    expectedNonce: nonce,
    ...(more.max_age ? { maxAge: Number(more.max_age) } : {}),
  })
  return { config, page: page.text, claims: tokens.claims(), idToken: tokens.id_token ?? '' }
}

describe('the sign-in stand-in', () => {
  it('tells the app who was chosen and when they signed in', async () => {
    const { claims, page } = await signIn(browser(), supplier, 'demo-ines-calder')
    expect(page).toContain('Who signs in to the supplier app?')
    expect(claims).toMatchObject({
      sub: 'demo-ines-calder',
      name: 'Ines Calder',
      email: 'ines.calder@tarnfield.example',
      email_verified: true,
    })
    expect(Math.abs(Date.now() / 1000 - Number(claims?.auth_time))).toBeLessThan(10)
  })

  it('asks again every time, so that each app holds its own person in one browser', async () => {
    const visit = browser()
    expect((await signIn(visit, supplier, 'demo-ines-calder')).claims?.sub).toBe('demo-ines-calder')
    expect((await signIn(visit, customer, 'demo-mara-lindqvist')).claims?.sub).toBe('demo-mara-lindqvist')
  })

  it('puts the expected person on top when a fresh sign-in is asked for', async () => {
    const more = { prompt: 'login', max_age: '0', login_hint: 'tomas.brandl@tarnfield.example' }
    const { page, claims } = await signIn(browser(), supplier, 'demo-tomas-brandl', more)
    expect(page).toContain('Sign in afresh as Tomas Brandl?')
    expect(claims?.auth_time).toBeDefined()
  })

  it('refuses a sign-in without PKCE and an address that is not registered', async () => {
    const query = { client_id: supplier.clientId, response_type: 'code', scope: 'openid' }
    const own = new URLSearchParams({ ...query, redirect_uri: `${supplier.origin}/api/v1/sign-in/callback` })
    expect((await browser()(`/auth?${own}`)).location).toContain('error=invalid_request')
    const foreign = new URLSearchParams({ ...query, redirect_uri: 'http://elsewhere.example/callback' })
    expect((await browser()(`/auth?${foreign}`)).status).toBe(400)
  })

  it('signs in nobody who is not listed', async () => {
    const visit = browser()
    const config = await connect(supplier)
    const url = openid.buildAuthorizationUrl(config, {
      redirect_uri: `${supplier.origin}/api/v1/sign-in/callback`,
      scope: 'openid',
      code_challenge: await openid.calculatePKCECodeChallenge('x'.repeat(43)),
      code_challenge_method: 'S256',
    })
    const { location } = await visit(url.href)
    expect((await visit(`${location}/sign-in`, { sub: 'demo-nobody' })).status).toBe(422)
    const left = await visit(`${location}/cancel`, {})
    expect((await visit(left.location)).location).toContain('error=access_denied')
  })

  it('signs in anybody who enters an address, confirmed or not, as one person for each address', async () => {
    const visit = browser()
    const first = await signIn(visit, supplier, {
      ...{ email: 'Nia.Brook@gears.example', name: 'Nia Brook', verified: 'yes' },
    })
    expect(first.claims).toMatchObject({
      ...{ name: 'Nia Brook', email: 'Nia.Brook@gears.example', email_verified: true },
    })
    const again = await signIn(visit, customer, { email: 'nia.brook@GEARS.example', name: '' })
    expect(again.claims).toMatchObject({
      ...{ sub: first.claims?.sub, name: 'nia.brook@GEARS.example', email_verified: false },
    })
    // From then on the page offers them by a click, marked as not confirmed.
    const listed = await signIn(visit, supplier, String(first.claims?.sub))
    expect(listed.page).toContain('nia.brook@GEARS.example, not confirmed')
    expect(listed.claims?.email_verified).toBe(false)
  })

  it('takes no address that is none', async () => {
    const visit = browser()
    const config = await connect(supplier)
    const { location } = await visit(
      openid.buildAuthorizationUrl(config, {
        redirect_uri: `${supplier.origin}/api/v1/sign-in/callback`,
        scope: 'openid',
        code_challenge: await openid.calculatePKCECodeChallenge('x'.repeat(43)),
        code_challenge_method: 'S256',
      }).href,
    )
    for (const email of ['', 'nobody', 'a b@c.example', `${'x'.repeat(250)}@c.example`])
      expect((await visit(`${location}/new`, { email })).status).toBe(422)
  })

  it('ends its session without a further question when the app signs out', async () => {
    const visit = browser()
    const { config, idToken } = await signIn(visit, customer, 'demo-mara-lindqvist')
    const url = openid.buildEndSessionUrl(config, {
      id_token_hint: idToken,
      post_logout_redirect_uri: `${customer.origin}/signed-out`,
    })
    const asked = await visit(url.href)
    expect(asked.text).toContain('<script src="/submit.js" defer')
    const [, action = '', xsrf = ''] =
      /action="([^"]+)"[\s\S]*name="xsrf" value="([^"]+)"/.exec(asked.text) ?? []
    expect((await visit(action, { xsrf, logout: 'yes' })).location).toBe(`${customer.origin}/signed-out`)
  })

  it('says what to do when a sign-in was left open too long', async () => {
    const { status, text } = await browser()('/interaction/long-gone')
    expect(status).toBe(400)
    expect(text).toContain('This sign-in has run out')
  })

  it('finds people by words of name, role and organisation', () => {
    const names = (filter: string) => groups(filter).flatMap(({ people }) => people.map(({ name }) => name))
    expect(names('tarnfield approver')).toEqual(['Tomas Brandl'])
    expect(names('wren')).toEqual(['Wren Idle'])
    expect(names('nobody of this name')).toEqual([])
  })
})
