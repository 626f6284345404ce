import { spawn, type ChildProcess } from 'node:child_process'
import { cpSync, existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { createServer, type AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { createTransport } from 'nodemailer'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'

// Starting, killing and starting again is what these tests are about; each step waits for real programs.
const patience = 60_000
const root = fileURLToPath(new URL('../..', import.meta.url))
const names = ['SUPPLIER', 'CUSTOMER', 'OIDC', 'MAIL', 'SMTP', 'S3', 'POSTGRES']
const data = mkdtempSync(join(tmpdir(), 'evenrule-start-'))
const running: Start[] = []
let port: Record<string, number> = {}

interface Noted {
  pid: number
}
interface Run {
  start: Noted
  children: Record<string, Noted>
}
interface Start {
  process: ChildProcess
  output: () => string
  ended: Promise<number | null>
}

beforeAll(async () => {
  const build = process.env.TEST_BUILD_FOLDER
  if (!build) throw new Error('TEST_BUILD_FOLDER is missing: run the tests through npm test.')
  cpSync(build, join(data, 'build'), { recursive: true, verbatimSymlinks: true })
  const servers = names.map(() => createServer().listen(0, '127.0.0.1'))
  await Promise.all(servers.map((server) => new Promise((done) => server.once('listening', done))))
  port = Object.fromEntries(
    servers.map((server, at) => [names[at] ?? '', (server.address() as AddressInfo).port]),
  )
  await Promise.all(servers.map((server) => new Promise((done) => server.close(done))))
})

afterAll(async () => {
  for (const { process: child, ended } of running) {
    child.kill('SIGTERM')
    await ended
  }
  rmSync(data, { recursive: true, force: true })
}, patience)

/** Runs the real start on a folder and ports of this test. */
function start(...args: string[]): Start {
  const variables = names.map((name) => [`EVENRULE_${name}_PORT`, String(port[name])])
  const child = spawn(process.execPath, ['infra/start.mjs', '--data', data, ...args], {
    cwd: root,
    env: { ...process.env, ...Object.fromEntries(variables) },
    stdio: ['ignore', 'pipe', 'pipe'],
  })
  let output = ''
  for (const stream of [child.stdout, child.stderr])
    stream.on('data', (chunk: Buffer) => (output += chunk.toString()))
  const ended = new Promise<number | null>((done) => child.once('close', done))
  const started = { process: child, output: () => output, ended }
  running.push(started)
  return started
}

async function ready(started: Start): Promise<void> {
  let over = false
  void started.ended.then(() => (over = true))
  while (!/^Evenrule is ready/m.test(started.output())) {
    if (over) throw new Error(`The start ended early:\n${started.output()}`)
    await new Promise((done) => setTimeout(done, 100))
  }
}

const readRun = () => JSON.parse(readFileSync(join(data, 'run.json'), 'utf8')) as Run
const lives = (pid: number) =>
  existsSync(`/proc/${pid}/exe`) && !/ [ZX] /.test(readFileSync(`/proc/${pid}/stat`, 'utf8'))
const health = async (side: string) => (await fetch(`http://localhost:${port[side]}/api/v1/health`)).json()
const mails = async () =>
  (await (await fetch(`http://localhost:${port.MAIL}/messages.json?to=kept@brackwell.example`)).json()) as {
    total: number
  }

describe('npm start', () => {
  it(
    'ends with a line that it is ready, after which both sides are healthy',
    async () => {
      const first = start()
      await ready(first)
      expect(first.output().trimEnd().split('\n').at(-1)).toMatch(/^Evenrule is ready/)
      expect(await health('SUPPLIER')).toEqual({ status: 'ok' })
      expect(await health('CUSTOMER')).toEqual({ status: 'ok' })
    },
    patience,
  )

  it(
    'says in one line that it runs already when it is started a second time',
    async () => {
      const second = start()
      expect(await second.ended).toBe(0)
      expect(second.output()).toMatch(/^Evenrule is already running \(process \d+\).*\n$/)
    },
    patience,
  )

  it(
    'starts a program again that was killed',
    async () => {
      const { pid } = readRun().children.api ?? { pid: 0 }
      process.kill(pid, 'SIGKILL')
      await expect.poll(() => readRun().children.api?.pid, { timeout: 20_000 }).not.toBe(pid)
      await expect
        .poll(() => health('SUPPLIER').catch(() => undefined), { timeout: 20_000 })
        .toEqual({ status: 'ok' })
    },
    patience,
  )

  it(
    'recovers after everything was killed at once, and has kept the mail that was taken just before',
    async () => {
      const transport = createTransport({ host: '127.0.0.1', port: port.SMTP })
      await transport.sendMail({
        from: 'a@evenrule.example',
        to: 'kept@brackwell.example',
        subject: 'Kept',
        text: 'x',
      })
      const { start: own, children } = readRun()
      for (const { pid } of [own, ...Object.values(children)]) process.kill(pid, 'SIGKILL')
      await ready(start())
      expect(await health('CUSTOMER')).toEqual({ status: 'ok' })
      expect((await mails()).total).toBe(1)
    },
    patience,
  )

  it(
    'stops what a start left that was killed alone',
    async () => {
      const { start: own, children } = readRun()
      process.kill(own.pid, 'SIGKILL')
      const next = start()
      await ready(next)
      expect(next.output()).toContain('Stopping what an earlier start left running')
      expect(Object.values(children).filter(({ pid }) => lives(pid))).toEqual([])
    },
    patience,
  )

  it(
    'stops everything when it is asked to, and takes its note away',
    async () => {
      const { children } = readRun()
      const last = running.at(-1)
      last?.process.kill('SIGTERM')
      expect(await last?.ended).toBe(0)
      expect(Object.values(children).filter(({ pid }) => lives(pid))).toEqual([])
      expect(existsSync(join(data, 'run.json'))).toBe(false)
    },
    patience,
  )

  it(
    'names the port that another program holds and the variable that changes it, in one line',
    async () => {
      const server = createServer().listen(port.CUSTOMER, '127.0.0.1')
      const refused = start()
      expect(await refused.ended).toBe(1)
      expect(refused.output()).toMatch(
        new RegExp(`^Port ${port.CUSTOMER} \\(customer app\\) is held.*EVENRULE_CUSTOMER_PORT\\.\\n$`),
      )
      await new Promise((done) => server.close(done))
    },
    patience,
  )

  it(
    'returns to the fresh demonstration with --reset',
    async () => {
      const reset = start('--reset')
      expect(await reset.ended).toBe(0)
      await ready(start())
      expect((await mails()).total).toBe(0)
    },
    patience,
  )
})
