import nodemailer from 'nodemailer'

export interface OutgoingMail {
  /** The same for every try of one mail, so that a duplicate can be recognised. */
  messageId: string
  to: { name: string; address: string }
  subject: string
  text: string
  date: string
}

export interface MailTransport {
  /** Resolves once the mail server has taken the mail over. */
  send(mail: OutgoingMail): Promise<void>
  close(): void
}

/** No phase of a delivery may take longer than this, milliseconds. */
const patience = 20_000

/** Opens the mail server at `url`; nothing is connected before the first mail. */
export function openMail({ url, from }: { url: string; from: string }): MailTransport {
  const transport = nodemailer.createTransport(
    {
      url,
      connectionTimeout: patience,
      greetingTimeout: patience,
      socketTimeout: patience,
      // Nothing in a mail may make the worker read a file or an address.
      disableFileAccess: true,
      disableUrlAccess: true,
    },
    { from },
  )
  return {
    async send({ messageId, to, subject, text, date }) {
      await transport.sendMail({
        messageId,
        to,
        subject,
        text,
        date,
        // So that holiday replies are not sent back.
        headers: { 'Auto-Submitted': 'auto-generated' },
      })
    },
    close: () => transport.close(),
  }
}
