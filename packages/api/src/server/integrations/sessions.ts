import { createHmac } from 'node:crypto'
import connectPgSimple from 'connect-pg-simple'
import type { Request, RequestHandler, Response } from 'express'
import session from 'express-session'
import pg from 'pg'
import type { Side } from '../../contract/access'
import type { Config } from '../config'
import { absoluteLimit, idleLimit } from '../http/session'

/** Sessions on the server, in a database schema and under a role of their own. */
export interface Sessions {
  /** Puts `request.session` in place, and drops a person whose absolute limit has passed. */
  middleware(side: Side): RequestHandler
  /** Ends the session of this request and takes the cookie away. */
  end(request: Request, response: Response, side: Side): Promise<void>
  /** Ends every session of a person in both apps; resolves with their number. */
  endAllOf(userId: string): Promise<number>
  close(): Promise<void>
}

type Settings = Pick<Config, 'sessionDatabaseUrl' | 'sessionSecret' | 'origins'>

export function openSessions(
  { sessionDatabaseUrl, sessionSecret, origins }: Settings,
  clock: () => Date = () => new Date(),
): Sessions {
  const pool = new pg.Pool({
    connectionString: sessionDatabaseUrl,
    max: 4,
    application_name: 'evenrule-session',
  })
  // An idle client that loses its server must not take the process down; the next query reconnects.
  pool.on('error', () => undefined)
  const Store = connectPgSimple(session)
  const store = new Store({ pool, schemaName: 'session', tableName: 'session', pruneSessionInterval: 900 })

  const isSecure = (side: Side) => origins[side].startsWith('https:')
  // Cookies ignore ports, so each app has a name of its own; and a key of its own, so that neither takes the other's.
  const nameOf = (side: Side) => `${isSecure(side) ? '__Host-' : ''}evenrule-${side}`
  const secretOf = (side: Side) => createHmac('sha256', sessionSecret).update(side).digest('hex')
  const cookieOf = (side: Side) => ({
    httpOnly: true,
    // Strict would break the return from the provider.
    sameSite: 'lax' as const,
    secure: isSecure(side),
    path: '/',
  })

  return {
    middleware(side) {
      const load = session({
        store,
        name: nameOf(side),
        secret: secretOf(side),
        resave: false,
        saveUninitialized: false,
        rolling: true,
        proxy: isSecure(side),
        cookie: { ...cookieOf(side), maxAge: idleLimit },
      })
      return (request, response, next) =>
        load(request, response, (error?: unknown) => {
          if (error) return next(error)
          const { person } = request.session
          if (person && clock().getTime() - Date.parse(person.signedInAt) > absoluteLimit)
            return request.session.regenerate(next)
          next()
        })
    },

    async end(request, response, side) {
      await new Promise<void>((resolve, reject) =>
        request.session.destroy((error: unknown) => (error ? reject(error as Error) : resolve())),
      )
      response.clearCookie(nameOf(side), cookieOf(side))
    },

    async endAllOf(userId) {
      const { rowCount } = await pool.query(
        "delete from session.session where sess -> 'person' ->> 'userId' = $1",
        [userId],
      )
      return rowCount ?? 0
    },

    async close() {
      store.close()
      await pool.end()
    },
  }
}
