import type { Logger } from 'pino'
import type { Side } from '../../../contract/access'
import type { Database } from '../../db/database'
import type { MailTransport, OutgoingMail } from '../../integrations/mail'
import { markFailed, markSent, takeDueMail, type TakenMail } from './mail.repository'

export interface MailDependencies {
  /** Under the system role: mail goes to the members of every organisation. */
  database: Database
  transport: MailTransport
  origins: Record<Side, string>
  logger: Logger
  clock: () => Date
}

/** A claim holds this long, milliseconds; longer than any delivery can take. */
export const claimFor = 5 * 60_000
/** After as many tries, about two days, a mail is left with its last error; the message stays in the app. */
export const attemptsAtMost = 16

const firstDelay = 30_000
const longestDelay = 6 * 3_600_000

/** How long to wait after a try that failed, milliseconds: twice as long each time, up to six hours. */
export const delayAfter = (attempt: number): number =>
  Math.min(firstDelay * 2 ** Math.min(attempt - 1, 20), longestDelay)

/** The mail of one message: its words, and a link into the app of the side it is for. */
export function writeMail(mail: TakenMail, origins: Record<Side, string>): OutgoingMail {
  const address = new URL(mail.link, origins[mail.side])
  const text = [
    mail.body,
    '',
    address.href,
    '',
    'You also find this under Messages in Evenrule, where you can choose which messages come by mail.',
    '',
  ].join('\n')
  return {
    messageId: `<${mail.messageId}@${address.hostname}>`,
    to: mail.to,
    subject: mail.subject,
    text,
    date: mail.createdAt,
  }
}

/**
 * Sends what is due, one mail at a time, until nothing is left or `stopped` says so. Any number of workers may
 * run: each mail is claimed before it is sent. A crash between sending and noting it is the one case that sends
 * a mail twice, and then both carry the same Message-ID.
 *
 * @returns how many mails left
 */
export async function sendDueMail(
  dependencies: MailDependencies,
  stopped: () => boolean = () => false,
): Promise<number> {
  const { database, clock } = dependencies
  let sent = 0
  while (!stopped()) {
    const now = clock()
    const mail = await takeDueMail(database, {
      now: now.toISOString(),
      until: after(now, claimFor),
      attempts: attemptsAtMost,
    })
    if (!mail) return sent
    if (await deliver(dependencies, mail)) sent += 1
  }
  return sent
}

async function deliver(dependencies: MailDependencies, mail: TakenMail): Promise<boolean> {
  const { database, transport, origins, logger, clock } = dependencies
  const named = { outbox: mail.id, message: mail.messageId, attempt: mail.attempt }
  try {
    await transport.send(writeMail(mail, origins))
  } catch (error) {
    const nextAttemptAt = after(clock(), delayAfter(mail.attempt))
    logger.warn({ ...named, err: error, nextAttemptAt }, 'mail not sent')
    const words = error instanceof Error ? error.message : String(error)
    await markFailed(database, mail.id, { error: words.slice(0, 2000), nextAttemptAt })
    return false
  }
  await markSent(database, mail.id, clock().toISOString())
  logger.info(named, 'mail sent')
  return true
}

const after = (instant: Date, milliseconds: number): string =>
  new Date(instant.getTime() + milliseconds).toISOString()
