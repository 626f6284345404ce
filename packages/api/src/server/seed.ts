import { pino } from 'pino'
import { readConfig, readWorkerConfig } from './config'
import { openDatabase } from './db/database'
import { openEngines } from './integrations/engines'
import { openFileStore } from './integrations/file-store'
import { openIdentity } from './integrations/oidc'
import { tellReminders } from './modules/reminders/reminders.service'
import { allRoutes } from './routes'
import { finishSeed, seedBase } from './seed/base'
import { playDemonstration } from './seed/run'
import { Stage } from './seed/stage'

const ownerUrl = process.env.MIGRATOR_DATABASE_URL
if (!ownerUrl) throw new Error('MIGRATOR_DATABASE_URL is missing.')
const config = readConfig(process.env)
const seededAt = new Date()
const base = await seedBase(
  ownerUrl,
  config.oidc.issuer,
  new Date(seededAt.getTime() - 365 * 86_400_000).toISOString(),
)
if (!base) {
  console.log('The demonstration is there already.')
} else {
  const { database, pool } = openDatabase(config.databaseUrl)
  const services = {
    clock: () => seededAt,
    files: openFileStore(config.s3),
    engines: await openEngines(config.enginesDir),
    logger: pino({ level: config.logLevel }),
  }
  const routes = allRoutes({
    database,
    config,
    identity: openIdentity(config),
    // Nobody is signed in while the demonstration is laid out.
    sessions: { end: async () => undefined, endAllOf: async () => 0 },
  })
  await playDemonstration(new Stage(database, services, routes, seededAt), base)
  await pool.end()
  await remindOf(new Date(seededAt.getTime() - 86_400_000))
  await finishSeed(ownerUrl)
  console.log('The demonstration is laid out.')
}

/** What the worker would have told by then, so that its first run does not tell of a whole year at once. */
async function remindOf(instant: Date): Promise<void> {
  const { database, pool } = openDatabase(readWorkerConfig(process.env).systemDatabaseUrl, 1)
  const logger = pino({ level: config.logLevel })
  await tellReminders({ database, logger, clock: () => instant })
  await pool.end()
}
