import { JournalProblem } from './db/journal'
import { migrateDatabase } from './db/migrate'

const url = process.env.MIGRATOR_DATABASE_URL
if (!url) throw new Error('MIGRATOR_DATABASE_URL is missing.')
try {
  const count = await migrateDatabase(url, process.env.MIGRATIONS_DIR ?? 'infra/migrations')
  console.log(`${count} migrations applied`)
} catch (error) {
  if (!(error instanceof JournalProblem)) throw error
  console.error(error.message)
  process.exitCode = 1
}
