import { buffer } from 'node:stream/consumers'
import { SMTPServer } from 'smtp-server'
import type { MailStore } from './store'

const largest = 10 * 1024 * 1024

/** Receives mail over SMTP, from anybody on this machine, and delivers none of it any further. */
export function createReceiver(store: MailStore) {
  return new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    disableReverseLookup: true,
    size: largest,
    logger: false,
    onData(stream, session, answer) {
      const to = session.envelope.rcptTo.map(({ address }) => address)
      // The sender hears of success only after the mail is kept, so that nothing it was promised is lost.
      buffer(stream)
        .then((raw) => {
          if (stream.sizeExceeded)
            throw Object.assign(new Error('The mail is larger than 10 MB'), { responseCode: 552 })
          return store.keep(raw, to)
        })
        .then(({ id }) => answer(null, `kept as ${id}`))
        .catch((error: Error) => {
          console.error(error)
          answer(error)
        })
    },
  })
}
