import express from 'express'
import type { ErrorRequestHandler, Request, RequestHandler } from 'express'
import { errors } from 'oidc-provider'
import type Provider from 'oidc-provider'
import { pageAssets } from '../page/page'
import { frontPage, messagePage, signInPage } from './pages'
import { Newcomers } from './newcomers'
import { findPerson, people } from './people'
import { cookieNames, createProvider } from './provider'
import type { Settings } from './provider'

/**
 * Hides the provider's own session from a sign-in: two apps on one host share its cookie, and each may hold a
 * different person. So every sign-in asks who it is, whether or not somebody has signed in before.
 */
const askAlways: RequestHandler = (request, _response, next) => {
  const ours = new RegExp(`^${cookieNames.session}(\\.sig)?=`)
  const kept = (request.headers.cookie ?? '').split(/;\s*/).filter((cookie) => !ours.test(cookie))
  request.headers.cookie = kept.join('; ')
  next()
}

const filterOf = ({ query }: Request) => (typeof query.filter === 'string' ? query.filter.trim() : '')

function interactionRoutes(provider: Provider, { apps }: Settings, newcomers: Newcomers) {
  const router = express.Router()
  const form = express.urlencoded({ extended: false, limit: '4kb' })

  router.get('/:uid', async (request, response) => {
    const { uid, params } = await provider.interactionDetails(request, response)
    const app = apps.find(({ clientId }) => clientId === params.client_id)
    const hint = params.login_hint
    response.type('html').send(
      signInPage({
        uid,
        app: app?.name ?? '',
        filter: filterOf(request),
        others: newcomers.all(),
        expected: [...people, ...newcomers.all()].find(
          ({ sub, email }) => hint !== undefined && (sub === hint || email === hint),
        ),
        fresh: String(params.prompt ?? '').includes('login') || params.max_age !== undefined,
      }),
    )
  })

  router.post('/:uid/sign-in', form, async (request, response) => {
    const { sub } = request.body as { sub?: unknown }
    const person = typeof sub === 'string' ? (findPerson(sub) ?? newcomers.find(sub)) : undefined
    if (!person) {
      response
        .status(422)
        .type('html')
        .send(messagePage('Nobody was chosen', 'Go back and choose one of the people listed.', apps))
      return
    }
    await provider.interactionFinished(request, response, {
      login: { accountId: person.sub, remember: false },
    })
  })

  router.post('/:uid/new', form, async (request, response) => {
    const { name, email, verified } = request.body as Record<string, unknown>
    const person = newcomers.enter({
      name: typeof name === 'string' ? name : '',
      email: typeof email === 'string' ? email : '',
      verified: verified === 'yes',
    })
    if (!person) {
      response
        .status(422)
        .type('html')
        .send(
          messagePage(
            'This is no e-mail address',
            'Go back and enter one, such as name@company.example.',
            apps,
          ),
        )
      return
    }
    await provider.interactionFinished(request, response, {
      login: { accountId: person.sub, remember: false },
    })
  })

  router.post('/:uid/cancel', async (request, response) => {
    const result = {
      error: 'access_denied',
      error_description: 'The sign-in was left without choosing anybody',
    }
    await provider.interactionFinished(request, response, result)
  })
  return router
}

/** The whole stand-in: pages to choose a person, and the provider behind them. */
export function createApp(settings: Settings) {
  const newcomers = new Newcomers()
  const provider = createProvider(settings, newcomers)
  const app = express()
  app.disable('x-powered-by')
  app.use(pageAssets(settings.apps.map(({ origin }) => origin)))
  app.get('/', (request, response) => void response.type('html').send(frontPage(filterOf(request))))
  app.get('/submit.js', (_request, response) => {
    response.sendFile('fakes/oidc/submit.js', { root: process.env.EVENRULE_ROOT ?? process.cwd() })
  })
  app.use('/interaction', interactionRoutes(provider, settings, newcomers))
  app.use('/auth', askAlways)
  app.use(provider.callback())

  const onError: ErrorRequestHandler = (error: Error, _request, response, next) => {
    if (response.headersSent) return next(error)
    const expired = error instanceof errors.SessionNotFound
    if (!expired) console.error(error)
    const text = expired
      ? 'It was left open too long, or opened in another browser. Go back to the app and sign in again.'
      : 'The stand-in failed; its log says why. Go back to the app and sign in again.'
    const title = expired ? 'This sign-in has run out' : 'The sign-in failed'
    response
      .status(expired ? 400 : 500)
      .type('html')
      .send(messagePage(title, text, settings.apps))
  }
  app.use(onError)
  return app
}
