import { mkdtempSync, rmSync } from 'node:fs'
import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { createTransport } from 'nodemailer'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createApp } from './app'
import { withLinks } from './pages'
import { createReceiver } from './receiver'
import { MailStore, pageSize } from './store'

const folder = mkdtempSync(join(tmpdir(), 'evenrule-mail-'))
const store = new MailStore(folder)
const receiver = createReceiver(store)
const server = createServer(createApp(store))
let page = ''
let send: (to: string, subject: string, text: string) => Promise<unknown>

beforeAll(async () => {
  await new Promise<void>((done) => void receiver.listen(0, '127.0.0.1', done))
  await new Promise<void>((done) => void server.listen(0, '127.0.0.1', done))
  const { port } = receiver.server.address() as AddressInfo
  page = `http://127.0.0.1:${(server.address() as AddressInfo).port}`
  const transport = createTransport({ host: '127.0.0.1', port, secure: false })
  send = (to, subject, text) => transport.sendMail({ from: 'desk@evenrule.example', to, subject, text })
})

afterAll(async () => {
  await new Promise<void>((done) => receiver.close(done))
  await new Promise((done) => server.close(done))
  rmSync(folder, { recursive: true })
})

const text = async (path: string) => (await fetch(`${page}${path}`)).text()

interface Listing {
  items: { id: string; to: string[]; subject: string }[]
  total: number
  pages: number
}
const list = async (query: string) =>
  (await (await fetch(`${page}/messages.json?${query}`)).json()) as Listing

describe('the mail stand-in', () => {
  it('keeps a mail that was taken, for a store opened afterwards on the same folder too', async () => {
    await send(
      'mara.lindqvist@brackwell.example',
      'Ø 24.000 ±0.025 awaits your decision',
      'See http://localhost:4320/queue.',
    )
    const { items } = await list('to=mara.lindqvist')
    expect(items.map(({ subject }) => subject)).toEqual(['Ø 24.000 ±0.025 awaits your decision'])
    expect(new MailStore(folder).list('mara.lindqvist', 1).items).toEqual(items)
  })

  it('shows the mail with its link, and everything else of it escaped', async () => {
    await send(
      'joren.vask@brackwell.example',
      '<b>Sign</b>',
      'Open http://localhost:4320/sign?a=1&b=2 <script>',
    )
    const { items } = await list('to=joren')
    const shown = await text(`/messages/${items[0]?.id}`)
    expect(shown).toContain('<a href="http://localhost:4320/sign?a=1&amp;b=2">')
    expect(shown).toContain('&lt;b&gt;Sign&lt;/b&gt;')
    expect(shown).not.toContain('<script>')
  })

  it('leaves the full stop behind an address out of the link', () => {
    expect(withLinks('See http://localhost:4320/queue.').text).toBe(
      'See <a href="http://localhost:4320/queue">http://localhost:4320/queue</a>.',
    )
  })

  it('lists by recipient, the newest first, in pages', async () => {
    for (let number = 1; number <= pageSize + 1; number += 1)
      await send('piet@tarnfield.example', `Note ${number}`, 'x')
    const first = await list('to=piet@')
    expect(first).toMatchObject({ total: pageSize + 1, pages: 2 })
    expect(first.items[0]?.subject).toBe(`Note ${pageSize + 1}`)
    expect((await list('to=piet@&page=2')).items.map(({ subject }) => subject)).toEqual(['Note 1'])
    expect(await text('/?to=nobody')).toContain('None to an address with “nobody”')
  })

  it('answers 404 for a mail that does not exist', async () => {
    expect((await fetch(`${page}/messages/..%2Fsecrets`)).status).toBe(404)
    expect((await fetch(`${page}/messages/none.json`)).status).toBe(404)
  })
})
