import { BackupProblem } from './backup/backup.problem'
import { restoreBackup } from './backup/restore-backup'
import { readKeeperConfig } from './config'
import { JournalProblem } from './db/journal'
import { openEngines } from './integrations/engines'
import { openFileStore } from './integrations/file-store'
import { tellRecord } from './tell-record'

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
  return tellRecord(ownerUrl, engines)
}

try {
  process.exitCode = await main()
} catch (error) {
  const isPlain = error instanceof BackupProblem || error instanceof JournalProblem
  console.error(isPlain ? error.message : error)
  process.exitCode = 2
}
