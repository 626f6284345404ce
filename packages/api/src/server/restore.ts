import { BackupProblem } from './backup/backup.problem'
import { restoreBackup } from './backup/restore-backup'
import { readKeeperConfig } from './config'
import { openDatabase } from './db/database'
import { JournalProblem } from './db/journal'
import { openEngines } from './integrations/engines'
import { openFileStore } from './integrations/file-store'
import { reportOf } from './modules/record/record.report'
import { verifyWholeRecord } from './modules/record/record.verify'

/*
 * Puts a backup back and checks the record:
 *   npm run restore -- <folder of the backup> [--replace]
 * Exit status 0 when the record is whole, 1 when it is broken, 2 when nothing or not all was restored
 * or could be checked.
 */

async function main(): Promise<number> {
  const folder = process.argv[2]
  if (!folder) throw new BackupProblem('Use npm run restore -- <folder of the backup> [--replace].')
  const { ownerUrl, s3, postgresBin, migrationsDir, enginesDir } = readKeeperConfig(process.env)
  const engines = await openEngines(enginesDir)
  await restoreBackup(
    {
      ...{ ownerUrl, store: openFileStore(s3), postgresBin, migrationsDir },
      replace: process.argv.includes('--replace'),
      say: (line) => console.log(line),
    },
    folder,
  )
  const { database, pool } = openDatabase(ownerUrl, 1)
  try {
    const { lines, status } = reportOf(await verifyWholeRecord(database, engines))
    for (const line of lines) console.log(line)
    return status
  } finally {
    await pool.end()
  }
}

try {
  process.exitCode = await main()
} catch (error) {
  const isPlain = error instanceof BackupProblem || error instanceof JournalProblem
  console.error(isPlain ? error.message : error)
  process.exitCode = 2
}
