import { spawn } from 'node:child_process'
import type { AddressInfo } from 'node:net'
import { buffer } from 'node:stream/consumers'
import { fileURLToPath } from 'node:url'
import { simpleParser, type ParsedMail } from 'mailparser'
import { pino } from 'pino'
import { SMTPServer } from 'smtp-server'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { openDatabase } from '../../packages/api/src/server/db/database'
import { openMail, type MailTransport } from '../../packages/api/src/server/integrations/mail'
import { takeDueMail } from '../../packages/api/src/server/modules/notifications/mail.repository'
import {
  attemptsAtMost,
  claimFor,
  delayAfter,
  sendDueMail,
  writeMail,
} from '../../packages/api/src/server/modules/notifications/mail.service'
import { invitationSecret, startHarness, type Harness, type Organisation, type Person } from './harness'

const origins = { supplier: 'http://supplier.test', customer: 'http://customer.test:4320' }
let harness: Harness
let system: ReturnType<typeof openDatabase>
let receiver: SMTPServer
let smtpUrl = ''
let transport: MailTransport
let received: ParsedMail[] = []
/** What the mail server answers; null takes every mail. */
let refusal: { responseCode: number; message: string } | null = null

let supplier: Organisation, customer: Organisation
let engineer: Person, approver: Person, representative: Person

beforeAll(async () => {
  harness = await startHarness()
  system = openDatabase(harness.urlAs('evenrule_system'), 8)
  receiver = new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    logger: false,
    onData(stream, _session, answer) {
      void buffer(stream).then(async (raw) => {
        if (refusal) return answer(Object.assign(new Error(refusal.message), refusal))
        received.push(await simpleParser(raw))
        answer(null)
      })
    },
  })
  await new Promise<void>((done) => void receiver.listen(0, '127.0.0.1', done))
  smtpUrl = `smtp://127.0.0.1:${(receiver.server.address() as AddressInfo).port}`
  transport = openMail({ url: smtpUrl, from: 'Evenrule <evenrule@supplier.test>' })

  engineer = await harness.person('Ada Vogt')
  approver = await harness.person('Ben Krol')
  representative = await harness.person('Cleo Marsh')
  supplier = await harness.organisation('Supplier', [
    [engineer, ['gauge-engineer']],
    [approver, ['supplier-approver']],
  ])
  customer = await harness.organisation('Customer', [[representative, ['quality-representative']]])
  await harness.relationship(supplier, customer)
})

afterAll(async () => {
  transport.close()
  await new Promise<void>((done) => receiver.close(done))
  await system.pool.end()
  await harness.stop()
})

beforeEach(async () => {
  received = []
  refusal = null
  harness.moveClock('2026-11-02T09:00:00.000Z')
  await harness.owner.query('delete from outbox')
  await harness.owner.query('delete from messages')
})

/** The engineer sends the customer's representatives a message about a submission. */
const tell = (subject: string) =>
  harness.inTenant('supplier', supplier, engineer, ['gauge-engineer'], async (tenant) =>
    tenant.notify({
      organisationId: customer.id,
      side: 'customer',
      roles: ['quality-representative'],
      kind: 'submission',
      subject,
      body: 'Proof for Ø 24.000 ±0.025 waits for your decision.',
      path: 'submissions/0198f5a0-0000-7000-8000-000000000001',
    }),
  )

const send = (more: { transport?: MailTransport; stopped?: () => boolean } = {}) =>
  sendDueMail(
    {
      database: system.database,
      transport: more.transport ?? transport,
      ...{ origins, invitationSecret },
      logger: pino({ level: 'silent' }),
      clock: harness.now,
    },
    more.stopped,
  )

const outboxRows = async () =>
  (
    await harness.owner.query<{
      attempts: number
      sent_at: Date | null
      next_attempt_at: Date
      last_error: string | null
    }>('select attempts, sent_at, next_attempt_at, last_error from outbox order by id')
  ).rows

const passes = (milliseconds: number) => harness.moveClock(new Date(harness.now().getTime() + milliseconds))

describe('the mail of a message', () => {
  it('leaves once, as plain text, with a link into the app of the side it is for', async () => {
    await tell('Proof submitted for 7741-220')
    expect(await send()).toBe(1)
    expect(await send()).toBe(0)
    passes(365 * 86_400_000)
    expect(await send()).toBe(0)
    expect(received).toHaveLength(1)
    const [mail] = received
    expect(mail?.subject).toBe('Proof submitted for 7741-220')
    expect(mail?.to).toMatchObject({
      value: [{ name: representative.name, address: representative.email }],
    })
    expect(mail?.from).toMatchObject({ value: [{ address: 'evenrule@supplier.test' }] })
    expect(mail?.html).toBe(false)
    expect(mail?.text).toContain('Proof for Ø 24.000 ±0.025 waits for your decision.')
    expect(mail?.text?.split('\n')).toContain(
      `${origins.customer}/organisations/${customer.id}/submissions/0198f5a0-0000-7000-8000-000000000001`,
    )
    expect(mail?.date).toEqual(new Date('2026-11-02T09:00:00.000Z'))
    expect(await outboxRows()).toMatchObject([{ attempts: 1, sent_at: expect.any(Date), last_error: null }])
  })

  it('is tried again after a failure, later each time, with the last error kept', async () => {
    await tell('Try again')
    refusal = { responseCode: 451, message: 'the mailbox is locked' }
    expect(await send()).toBe(0)
    const [first] = await outboxRows()
    expect(first).toMatchObject({ attempts: 1, sent_at: null })
    expect(first?.last_error).toContain('the mailbox is locked')
    expect(first?.next_attempt_at.getTime()).toBe(harness.now().getTime() + delayAfter(1))

    passes(delayAfter(1) - 1)
    expect(await send()).toBe(0)
    expect((await outboxRows())[0]?.attempts).toBe(1)
    passes(1)
    refusal = { responseCode: 452, message: 'the disk is full' }
    expect(await send()).toBe(0)
    const [second] = await outboxRows()
    expect(second).toMatchObject({ attempts: 2 })
    expect(second?.last_error).toContain('the disk is full')
    expect(second?.next_attempt_at.getTime()).toBe(harness.now().getTime() + delayAfter(2))

    passes(delayAfter(2))
    refusal = null
    expect(await send()).toBe(1)
    expect(received.map((mail) => mail.subject)).toEqual(['Try again'])
    expect(await outboxRows()).toMatchObject([{ attempts: 3, sent_at: expect.any(Date), last_error: null }])
  })

  it('that fails does not hold up the others', async () => {
    await tell('First')
    await tell('Second')
    let calls = 0
    const faulty: MailTransport = {
      ...transport,
      async send(mail) {
        calls += 1
        if (mail.subject === 'First') throw new Error('no such mailbox')
        return transport.send(mail)
      },
    }
    expect(await send({ transport: faulty })).toBe(1)
    expect(calls).toBe(2)
    expect(received.map((mail) => mail.subject)).toEqual(['Second'])
  })

  it('is given up after the last try, and then stays readable in the app', async () => {
    await tell('Never')
    refusal = { responseCode: 550, message: 'no such mailbox' }
    for (let attempt = 1; attempt <= attemptsAtMost + 2; attempt++) {
      await send()
      passes(delayAfter(attempt))
    }
    expect(await outboxRows()).toMatchObject([{ attempts: attemptsAtMost, sent_at: null }])
    expect((await harness.owner.query('select from messages')).rowCount).toBe(1)
  })

  it('cannot carry headers of the sender’s making', async () => {
    await tell('Hello\r\nBcc: everybody@people.example\r\n\r\nother text')
    expect(await send()).toBe(1)
    expect(received[0]?.headers.has('bcc')).toBe(false)
    expect(received[0]?.subject).toContain('Bcc: everybody@people.example')
    expect(received[0]?.text).not.toMatch(/^other text/)
  })
})

describe('several workers', () => {
  it('never send one mail twice', async () => {
    for (let number = 1; number <= 20; number++) await tell(`Number ${number}`)
    const counts = await Promise.all([send(), send(), send(), send()])
    expect(counts.reduce((sum, count) => sum + count, 0)).toBe(20)
    expect(received.map((mail) => mail.subject).sort()).toEqual(
      Array.from({ length: 20 }, (_, index) => `Number ${index + 1}`).sort(),
    )
    expect((await outboxRows()).every((row) => row.attempts === 1)).toBe(true)
  })

  it('leave a mail alone while one of them is sending it', async () => {
    await tell('Slow')
    let release = () => {}
    const held = new Promise<void>((done) => (release = done))
    const slow: MailTransport = { ...transport, send: (mail) => held.then(() => transport.send(mail)) }
    const sending = send({ transport: slow })
    while ((await outboxRows())[0]?.attempts !== 1) await new Promise((done) => setTimeout(done, 10))
    passes(claimFor - 1)
    expect(await send()).toBe(0)
    release()
    expect(await sending).toBe(1)
    expect(received).toHaveLength(1)
  })

  it('take over from one that died, and mark a possible duplicate by the same Message-ID', async () => {
    await tell('Crash')
    const taken = await takeDueMail(system.database, {
      now: harness.now().toISOString(),
      until: new Date(harness.now().getTime() + claimFor).toISOString(),
      attempts: attemptsAtMost,
    })
    expect(taken).toBeDefined()
    // The mail left, and the worker died before it could note that.
    const written = taken && writeMail(taken, { origins, invitationSecret })
    if (written) await transport.send(written)
    expect(await send()).toBe(0)
    passes(claimFor)
    expect(await send()).toBe(1)
    expect(await send()).toBe(0)
    expect(received).toHaveLength(2)
    expect(received[0]?.messageId).toMatch(/^<[0-9a-f-]{36}@customer\.test>$/)
    expect(received[1]?.messageId).toBe(received[0]?.messageId)
  })

  it('stop between two mails when asked to', async () => {
    await tell('One')
    await tell('Two')
    expect(await send({ stopped: () => received.length > 0 })).toBe(1)
    expect(received).toHaveLength(1)
  })
})

describe('a mail server that is down for an hour', () => {
  const minute = 60_000
  it('loses no mail and sends none twice, with three workers of which one dies in the middle', async () => {
    // Nobody listens there.
    const down = openMail({ url: 'smtp://127.0.0.1:9', from: 'Evenrule <evenrule@supplier.test>' })
    const workers = (transport: MailTransport) => Promise.all([1, 2, 3].map(() => send({ transport })))
    const subjects: string[] = []
    const tellOf = async (subject: string) => {
      subjects.push(subject)
      await tell(subject)
    }
    for (const number of [1, 2, 3, 4, 5]) await tellOf(`Before ${number}`)
    for (let passed = 0; passed < 60; passed += 1) {
      if (passed % 15 === 5) await tellOf(`At minute ${passed}`)
      expect(await workers(down)).toEqual([0, 0, 0])
      passes(minute)
    }
    down.close()
    expect(received).toEqual([])
    const tried = await outboxRows()
    expect(tried).toHaveLength(subjects.length)
    // Tried again and again, but not every minute, and nobody has given up.
    for (const { attempts, sent_at } of tried) {
      expect(sent_at).toBeNull()
      expect(attempts).toBeLessThan(10)
    }
    expect(Math.max(...tried.map(({ attempts }) => attempts))).toBeGreaterThan(5)

    // The server is up again. One worker takes a mail and dies before it has sent it.
    await tellOf('After it')
    const died = await takeDueMail(system.database, {
      now: harness.now().toISOString(),
      until: new Date(harness.now().getTime() + claimFor).toISOString(),
      attempts: attemptsAtMost,
    })
    expect(died).toBeDefined()
    for (let passed = 0; passed < 60; passed += 1) {
      await workers(transport)
      passes(minute)
    }
    expect(received.map((mail) => mail.subject).sort()).toEqual([...subjects].sort())
    expect(new Set(received.map((mail) => mail.messageId)).size).toBe(subjects.length)
    expect((await outboxRows()).every(({ sent_at }) => sent_at !== null)).toBe(true)
    expect(await workers(transport)).toEqual([0, 0, 0])
  }, 120_000)
})

it('the worker’s program sends what comes, and ends in order on SIGTERM', async () => {
  const worker = spawn(
    process.execPath,
    ['--import', 'tsx', fileURLToPath(new URL('../../packages/api/src/server/worker.ts', import.meta.url))],
    {
      env: {
        PATH: process.env.PATH ?? '',
        SYSTEM_DATABASE_URL: harness.urlAs('evenrule_system'),
        SMTP_URL: smtpUrl,
        INVITATION_SECRET: invitationSecret,
        SUPPLIER_ORIGIN: origins.supplier,
        CUSTOMER_ORIGIN: origins.customer,
      },
    },
  )
  let log = ''
  worker.stdout.on('data', (chunk: Buffer) => (log += chunk.toString()))
  worker.stderr.on('data', (chunk: Buffer) => (log += chunk.toString()))
  const ended = new Promise<number | null>((done) => worker.once('exit', done))
  try {
    await until(
      () => log.includes('worker ready'),
      () => log,
    )
    await tell('While it runs')
    await until(
      () => log.includes('mail sent'),
      () => log,
    )
    expect(received.map((mail) => mail.subject)).toEqual(['While it runs'])
    worker.kill('SIGTERM')
    expect(await ended).toBe(0)
    expect(log).toContain('worker stopped')
    // The log names rows, never people or their words.
    expect(log).not.toContain('While it runs')
    expect(log).not.toContain(representative.email)
  } finally {
    worker.kill('SIGKILL')
  }
}, 150_000)

async function until(reached: () => boolean, state: () => string): Promise<void> {
  const deadline = Date.now() + 60_000
  while (!reached()) {
    if (Date.now() > deadline) throw new Error(`not reached; so far:\n${state()}`)
    await new Promise((done) => setTimeout(done, 25))
  }
}
