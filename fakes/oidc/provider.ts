import Provider from 'oidc-provider'
import type { ClientMetadata, Configuration, JWK } from 'oidc-provider'
import { messagePage, signOutPage } from './pages'
import type { Newcomers } from './newcomers'
import { findPerson } from './people'

/** One of the two apps as the provider knows it. */
export interface App {
  /** As the pages call it: "supplier" or "customer". */
  name: string
  origin: string
  clientId: string
  clientSecret: string
}

/** Settings of the stand-in. */
export interface Settings {
  issuer: string
  apps: App[]
  keys: { signing: JWK; cookie: string }
}

/** Names of their own: cookies ignore ports, so those of the apps lie in the same jar. */
export const cookieNames = {
  session: 'evenrule_oidc_session',
  interaction: 'evenrule_oidc_interaction',
  resume: 'evenrule_oidc_resume',
}

const scopes = 'openid email profile'

const client = ({ origin, clientId, clientSecret }: App): ClientMetadata => ({
  client_id: clientId,
  client_secret: clientSecret,
  redirect_uris: [`${origin}/api/v1/sign-in/callback`],
  post_logout_redirect_uris: [`${origin}/signed-out`],
  response_types: ['code'],
  grant_types: ['authorization_code'],
  token_endpoint_auth_method: 'client_secret_post',
  // A signature needs proof of when its signer signed in.
  require_auth_time: true,
  scope: scopes,
})

/** The provider with both apps registered; every demo person is an account, and whoever enters themselves. */
export function createProvider({ issuer, apps, keys }: Settings, newcomers: Newcomers): Provider {
  const cookie = { signed: true, httpOnly: true, sameSite: 'lax' as const }
  const configuration: Configuration = {
    clients: apps.map(client),
    jwks: { keys: [keys.signing] },
    scopes: scopes.split(' '),
    claims: { openid: ['sub'], email: ['email', 'email_verified'], profile: ['name'] },
    // The apps read who signed in from the identity token, without a second call.
    conformIdTokenClaims: false,
    pkce: { required: () => true },
    cookies: { names: cookieNames, keys: [keys.cookie], long: cookie, short: cookie },
    ttl: { Interaction: 3600, Session: 86_400, Grant: 86_400, AccessToken: 3600, IdToken: 3600 },
    interactions: { url: (_context, interaction) => `/interaction/${interaction.uid}` },
    features: {
      devInteractions: { enabled: false },
      rpInitiatedLogout: {
        enabled: true,
        logoutSource: (context, form) => {
          context.body = signOutPage(form, 'op.logoutForm')
        },
        postLogoutSuccessSource: (context) => {
          context.body = messagePage('Signed out', 'You are signed out of the sign-in provider.', apps)
        },
      },
    },
    findAccount: (_context, sub) => {
      const person = findPerson(sub) ?? newcomers.find(sub)
      if (!person) return undefined
      const { name, email, verified } = person
      return { accountId: sub, claims: () => ({ sub, name, email, email_verified: verified }) }
    },
    // Both apps belong to the product: nobody is asked whether they may know a name and an e-mail address.
    loadExistingGrant: async (context) => {
      const grant = new context.oidc.provider.Grant({
        clientId: context.oidc.client?.clientId,
        accountId: context.oidc.session?.accountId,
      })
      grant.addOIDCScope(scopes)
      await grant.save()
      return grant
    },
    renderError: (context, { error, error_description: description }) => {
      context.type = 'html'
      context.body = messagePage(
        'The sign-in cannot go on',
        `${description ?? error} (${error}). Start again from the app.`,
        apps,
      )
    },
  }
  return new Provider(issuer, configuration)
}
