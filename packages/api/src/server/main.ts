import type { Server } from 'node:http'
import { pino } from 'pino'
import { sides, type Side } from '../contract/access'
import { createApp } from './app'
import { openClock } from './clock'
import { readConfig } from './config'
import { openDatabase } from './db/database'
import { openEngines } from './integrations/engines'
import { openFileStore } from './integrations/file-store'
import { openIdentity } from './integrations/oidc'
import { openSessions } from './integrations/sessions'
import { allRoutes } from './routes'
import type { Services } from './services'

const config = readConfig(process.env)
const logger = pino({ level: config.logLevel, redact: ['req.headers', 'res.headers'] })
const { database, pool } = openDatabase(config.databaseUrl)
const sessions = openSessions(config)
const services: Services = {
  clock: openClock(config.clockFile),
  files: openFileStore(config.s3),
  engines: await openEngines(config.enginesDir),
  logger,
}
const routes = allRoutes({ database, config, identity: openIdentity(config), sessions })

const servers = sides.map((side) => listen(side))
if (config.clockFile) logger.warn({ file: config.clockFile }, 'the clock follows a file')
logger.info({ ports: config.ports, engine: services.engines.current.version }, 'api ready')
for (const signal of ['SIGTERM', 'SIGINT'] as const) process.once(signal, () => void stop())

function listen(side: Side): Server {
  const app = createApp({
    side,
    origin: config.origins[side],
    dist: config.dist[side],
    database,
    services,
    session: sessions.middleware(side),
    routes,
  })
  return app.listen(config.ports[side], '127.0.0.1')
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
  await Promise.all([pool.end(), sessions.close()])
  process.exit(0)
}
