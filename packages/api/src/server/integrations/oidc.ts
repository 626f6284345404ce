import * as oidc from 'openid-client'
import type { Side } from '../../contract/access'
import type { SignInProblem } from '../../contract/sign-in'
import type { Config } from '../config'

/** What a sign-in on its way must remember; each is used once. */
export interface SignInSecrets {
  state: string
  nonce: string
  codeVerifier: string
}

/** A person as the provider names them. Issuer and subject are the identity; e-mail is only an address. */
export interface Identified {
  issuer: string
  subject: string
  email: string
  emailVerified: boolean
  name: string
  /** When they last proved who they are, seconds since 1970; undefined where the provider does not say. */
  authTime: number | undefined
  idToken: string | undefined
}

/** Why the provider did not name anybody; the cause is for the log. */
export class IdentityError extends Error {
  constructor(
    readonly problem: SignInProblem,
    options: { cause?: unknown } = {},
  ) {
    super(`sign-in: ${problem}`, options)
    this.name = 'IdentityError'
  }
}

/** The sign-in provider, by OpenID Connect's authorization code flow with PKCE. */
export interface Identity {
  /** The address to send the browser to. `fresh` asks for a new proof, whatever session the provider has. */
  begin(
    side: Side,
    options: { fresh: boolean; hint?: string },
  ): Promise<{ address: string; secrets: SignInSecrets }>
  /** Turns the callback's address into a person; checks state, nonce, signature, audience and PKCE. */
  finish(side: Side, callback: URL, options: SignInSecrets & { fresh: boolean }): Promise<Identified>
  /** The address that ends the provider's session; undefined where it has none. */
  endSession(side: Side, idToken: string | undefined): Promise<string | undefined>
}

const scope = 'openid email profile'
/** Seconds a request to the provider may take. */
const timeout = 8
/** `max_age=0` asks for a new proof; the answer itself may take this many seconds. The caller compares exactly. */
const freshAnswerWithin = 600

const isLoopback = ({ hostname }: URL): boolean => ['localhost', '127.0.0.1', '[::1]'].includes(hostname)

/** Opens the provider lazily: the servers start, and stay up, while it is away. */
export function openIdentity({ oidc: settings, origins }: Pick<Config, 'oidc' | 'origins'>): Identity {
  const issuer = new URL(settings.issuer)
  const insecure = issuer.protocol === 'http:' && isLoopback(issuer)
  const configurations = new Map<Side, Promise<oidc.Configuration>>()

  function configuration(side: Side): Promise<oidc.Configuration> {
    const known = configurations.get(side)
    if (known) return known
    const { id, secret } = settings[side]
    const discovered = oidc
      .discovery(issuer, id, undefined, oidc.ClientSecretPost(secret), {
        timeout,
        ...(insecure ? { execute: [oidc.allowInsecureRequests] } : {}),
      })
      .catch((cause: unknown) => {
        configurations.delete(side)
        throw new IdentityError('provider-unreachable', { cause })
      })
    configurations.set(side, discovered)
    return discovered
  }

  return {
    async begin(side, { fresh, hint }) {
      const provider = await configuration(side)
      const secrets = {
        state: oidc.randomState(),
        nonce: oidc.randomNonce(),
        codeVerifier: oidc.randomPKCECodeVerifier(),
      }
      const address = oidc.buildAuthorizationUrl(provider, {
        redirect_uri: `${origins[side]}/api/v1/sign-in/callback`,
        scope,
        state: secrets.state,
        nonce: secrets.nonce,
        code_challenge: await oidc.calculatePKCECodeChallenge(secrets.codeVerifier),
        code_challenge_method: 'S256',
        ...(fresh ? { prompt: 'login', max_age: '0' } : {}),
        ...(hint ? { login_hint: hint } : {}),
      })
      return { address: address.href, secrets }
    },

    async finish(side, callback, { state, nonce, codeVerifier, fresh }) {
      const provider = await configuration(side)
      try {
        const tokens = await oidc.authorizationCodeGrant(provider, callback, {
          pkceCodeVerifier: codeVerifier,
          expectedState: state,
          expectedNonce: nonce,
          idTokenExpected: true,
          ...(fresh ? { maxAge: freshAnswerWithin } : {}),
        })
        return await identified(provider, tokens)
      } catch (cause) {
        throw cause instanceof IdentityError ? cause : new IdentityError(reasonOf(cause), { cause })
      }
    },

    async endSession(side, idToken) {
      const provider = await configuration(side)
      if (!provider.serverMetadata().end_session_endpoint) return undefined
      return oidc.buildEndSessionUrl(provider, {
        post_logout_redirect_uri: `${origins[side]}/signed-out`,
        ...(idToken ? { id_token_hint: idToken } : {}),
      }).href
    },
  }
}

type Tokens = Awaited<ReturnType<typeof oidc.authorizationCodeGrant>>

async function identified(provider: oidc.Configuration, tokens: Tokens): Promise<Identified> {
  const claims = tokens.claims()
  if (!claims) throw new IdentityError('provider-refused')
  // Some providers put the e-mail address into the identity token, others tell it on a second call only.
  const told =
    claims.email === undefined ? await oidc.fetchUserInfo(provider, tokens.access_token, claims.sub) : claims
  const { email, name, email_verified: verified } = told
  if (typeof email !== 'string' || email === '') throw new IdentityError('no-email')
  return {
    issuer: claims.iss,
    subject: claims.sub,
    email,
    emailVerified: verified === true,
    name: typeof name === 'string' && name !== '' ? name : email,
    authTime: claims.auth_time,
    idToken: tokens.id_token,
  }
}

const awayCodes = /^(ECONN|ENOTFOUND|EAI_AGAIN|ETIMEDOUT|EPIPE|UND_ERR)/

function reasonOf(error: unknown): SignInProblem {
  if (error instanceof oidc.AuthorizationResponseError)
    return error.error === 'access_denied' ? 'left' : 'provider-refused'
  for (let at: unknown = error; at instanceof Error; at = at.cause) {
    const { code } = at as { code?: unknown }
    if (at.name === 'TimeoutError' || (typeof code === 'string' && awayCodes.test(code)))
      return 'provider-unreachable'
  }
  return 'provider-refused'
}
