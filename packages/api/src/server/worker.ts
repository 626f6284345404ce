import { pino } from 'pino'
import { openClock } from './clock'
import { readWorkerConfig } from './config'
import { openDatabase } from './db/database'
import { openMail } from './integrations/mail'
import { sendDueMail } from './modules/notifications/mail.service'
import { tellReminders } from './modules/reminders/reminders.service'

/** How often to look for mail that is due, milliseconds. */
const interval = 1_000

const config = readWorkerConfig(process.env)
const logger = pino({ level: config.logLevel, base: { process: 'worker' } })
const { database, pool } = openDatabase(config.systemDatabaseUrl, 2)
const clock = openClock(config.clockFile)
const transport = openMail({ url: config.smtpUrl, from: config.mailFrom })
const stopping = new AbortController()
for (const signal of ['SIGTERM', 'SIGINT'] as const) process.once(signal, () => stopping.abort())

const stopped = (): boolean => stopping.signal.aborted
/** The hour in which reminders were last looked for: days begin in every time zone at some hour. */
let remindedIn = ''

logger.info('worker ready')
while (!stopped()) {
  try {
    await remindHourly()
  } catch (error) {
    logger.error({ err: error }, 'reminders could not be looked for')
  }
  try {
    await sendDueMail(
      {
        database,
        transport,
        origins: config.origins,
        invitationSecret: config.invitationSecret,
        logger,
        clock,
      },
      stopped,
    )
  } catch (error) {
    // The database may be away for a while; the mail waits in it and is looked for again.
    logger.error({ err: error }, 'mail could not be looked for')
  }
  await pause(interval)
}
transport.close()
await pool.end()
logger.info('worker stopped')

/** Reminders once an hour by the clock, and at the start; what was told already is not told again. */
async function remindHourly(): Promise<void> {
  const hour = clock().toISOString().slice(0, 13)
  if (hour === remindedIn) return
  const told = await tellReminders({ database, logger, clock }, stopped)
  remindedIn = hour
  logger.info({ told }, 'reminders told')
}

/** Waits, or not any longer once asked to stop. */
function pause(milliseconds: number): Promise<void> {
  return new Promise((resolve) => {
    if (stopping.signal.aborted) return resolve()
    const timer = setTimeout(done, milliseconds)
    stopping.signal.addEventListener('abort', done, { once: true })
    function done() {
      clearTimeout(timer)
      stopping.signal.removeEventListener('abort', done)
      resolve()
    }
  })
}
