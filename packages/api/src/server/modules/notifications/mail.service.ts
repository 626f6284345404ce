import type { Logger } from 'pino'
import type { Side } from '../../../contract/access'
import type { Database } from '../../db/database'
import type { MailTransport, OutgoingMail } from '../../integrations/mail'
import type { InvitationToMail } from '../invitations/invitations.mail.repository'
import { invitationMail } from '../invitations/invitations.messages'
import { linkOf, tokenOf } from '../invitations/invitations.token'
import { markFailed, markSent, takeDueMail, type MessageToMail, type TakenMail } from './mail.repository'

export interface MailDependencies {
  /** Under the system role: mail goes to the members of every organisation. */
  database: Database
  transport: MailTransport
  origins: Record<Side, string>
  /** Derives the tokens of invitations, which are stored nowhere. */
  invitationSecret: string
  logger: Logger
  clock: () => Date
}

/** A claim holds this long, milliseconds; longer than any delivery can take. */
export const claimFor = 5 * 60_000
/** After as many tries, about two days, a mail is left with its last error; the message stays in the app. */
export const attemptsAtMost = 16

/** Why the mail of an invitation is left. */
const noLongerWanted = 'The invitation was sent again, used, revoked or has run out.'

const firstDelay = 30_000
const longestDelay = 6 * 3_600_000

/** How long to wait after a try that failed, milliseconds: twice as long each time, up to six hours. */
export const delayAfter = (attempt: number): number =>
  Math.min(firstDelay * 2 ** Math.min(attempt - 1, 20), longestDelay)

/** Writes what was taken; undefined for what is not wanted any more. */
export function writeMail(
  { id, content }: TakenMail,
  { origins, invitationSecret }: Pick<MailDependencies, 'origins' | 'invitationSecret'>,
): OutgoingMail | undefined {
  if (content === null) return undefined
  return content.of === 'message'
    ? mailOfMessage(content, origins)
    : mailOfInvitation(id, content, linkOf(origins[content.side], tokenOf(invitationSecret, content)))
}

/** The mail of an invitation, to an address that may be no user's yet. */
function mailOfInvitation(id: string, invitation: InvitationToMail, link: string): OutgoingMail {
  return {
    messageId: `<${id}@${new URL(link).hostname}>`,
    to: { name: '', address: invitation.email },
    ...invitationMail(invitation, link),
    date: invitation.sentAt,
  }
}

/** The mail of one message: its words, and a link into the app of the side it is for. */
function mailOfMessage(mail: MessageToMail, origins: Record<Side, string>): OutgoingMail {
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
  const { database, transport, logger, clock } = dependencies
  const named = { outbox: mail.id, attempt: mail.attempt }
  const written = writeMail(mail, dependencies)
  if (!written) {
    await markFailed(database, mail.id, { error: noLongerWanted, attempts: attemptsAtMost })
    logger.info(named, 'mail no longer wanted')
    return false
  }
  try {
    await transport.send(written)
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
