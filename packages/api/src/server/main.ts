import type { Server } from 'node:http'
import connectPgSimple from 'connect-pg-simple'
import session from 'express-session'
import pg from 'pg'
import { pino } from 'pino'
import { sides, type Side } from '../contract/access'
import { createApp } from './app'
import { readConfig, type Config } from './config'
import { openDatabase } from './db/database'
import { openEngines } from './integrations/engines'
import { openFileStore } from './integrations/file-store'
import { allRoutes } from './routes'
import type { Services } from './services'

const config = readConfig(process.env)
const logger = pino({ level: config.logLevel, redact: ['req.headers', 'res.headers'] })
const { database, pool } = openDatabase(config.databaseUrl)
const sessions = new pg.Pool({
  connectionString: config.sessionDatabaseUrl,
  max: 4,
  application_name: 'evenrule-session',
})
sessions.on('error', () => undefined)
const services: Services = {
  clock: () => new Date(),
  files: openFileStore(config.s3),
  engines: await openEngines(config.enginesDir),
  logger,
}
const routes = allRoutes({ database, config })

const servers = sides.map((side) => listen(side))
logger.info({ ports: config.ports, engine: services.engines.current.version }, 'api ready')
for (const signal of ['SIGTERM', 'SIGINT'] as const) process.once(signal, () => void stop())

function listen(side: Side): Server {
  const app = createApp({
    side,
    origin: config.origins[side],
    dist: config.dist[side],
    database,
    services,
    session: sessionMiddleware(side, config),
    routes,
  })
  return app.listen(config.ports[side], '127.0.0.1')
}

/** Sessions on the server; the cookie has a name of its own per app, because cookies ignore ports. */
function sessionMiddleware(side: Side, { sessionSecret, origins }: Config) {
  const Store = connectPgSimple(session)
  const secure = origins[side].startsWith('https:')
  return session({
    store: new Store({
      pool: sessions,
      schemaName: 'session',
      tableName: 'session',
      pruneSessionInterval: 900,
    }),
    name: `${secure ? '__Host-' : ''}evenrule-${side}`,
    secret: sessionSecret,
    resave: false,
    saveUninitialized: false,
    rolling: true,
    proxy: secure,
    // Idle limit; the absolute limit is kept with the person in the session.
    cookie: { httpOnly: true, sameSite: 'lax', secure, path: '/', maxAge: 8 * 3_600_000 },
  })
}

/** Finishes what is under way, then closes; a second is plenty for what runs here. */
async function stop(): Promise<void> {
  await Promise.all(
    servers.map(
      (server) =>
        new Promise<void>((resolve) => {
          server.close(() => resolve())
          server.closeIdleConnections()
          setTimeout(() => server.closeAllConnections(), 5_000).unref()
        }),
    ),
  )
  await Promise.all([pool.end(), sessions.end()])
  process.exit(0)
}
