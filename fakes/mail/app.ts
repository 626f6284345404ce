import express from 'express'
import type { Request } from 'express'
import { pageAssets } from '../page/page'
import { listPage, mailPage, missingPage } from './pages'
import type { MailStore } from './store'

const recipientOf = ({ query }: Request) => (typeof query.to === 'string' ? query.to.trim() : '')
const pageOf = ({ query }: Request) => Math.trunc(Number(query.page)) || 1

/** The page that shows what was mailed, and the same as JSON for tests. */
export function createApp(store: MailStore) {
  const app = express()
  app.disable('x-powered-by')
  app.use(pageAssets())
  app.get('/', (request, response) => {
    const to = recipientOf(request)
    response.type('html').send(listPage(to, store.list(to, pageOf(request)), store.recipients()))
  })
  app.get('/messages.json', (request, response) => {
    response.json(store.list(recipientOf(request), pageOf(request)))
  })
  app.get('/messages/:id.json', async (request, response) => {
    const mail = await store.open(request.params.id)
    response.status(mail ? 200 : 404).json(mail ?? { title: 'No such mail' })
  })
  app.get('/messages/:id.eml', async (request, response) => {
    const raw = await store.raw(request.params.id)
    if (raw) response.type('text/plain').send(raw)
    else response.status(404).type('html').send(missingPage())
  })
  app.get('/messages/:id', async (request, response) => {
    const mail = await store.open(request.params.id)
    response
      .status(mail ? 200 : 404)
      .type('html')
      .send(mail ? mailPage(mail) : missingPage())
  })
  return app
}
