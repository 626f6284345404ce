import { BackupProblem } from './backup/backup.problem'
import { makeBackup } from './backup/make-backup'
import { readKeeperConfig } from './config'
import { openFileStore } from './integrations/file-store'

/*
 * Backs an instance up, in use or not:
 *   npm run backup [-- <folder to be made>]
 * Exit status 0 when the backup is whole, 1 when none was made.
 */

const size = (bytes: number): string =>
  bytes < 1_000_000 ? `${Math.ceil(bytes / 1000)} kB` : `${(bytes / 1_000_000).toFixed(1)} MB`

try {
  const [folder, product] = process.argv.slice(2)
  if (!folder || !product) throw new BackupProblem('Use npm run backup -- <folder to be made>.')
  const { ownerUrl, s3, postgresBin } = readKeeperConfig(process.env)
  const source = { ownerUrl, store: openFileStore(s3), postgresBin, product, now: new Date() }
  const { database, files, record } = await makeBackup(source, folder)
  const bytes = files.reduce((sum, file) => sum + file.bytes, 0)
  console.log(
    `The backup is whole: database ${size(database.bytes)}, ${record.length} chains of the record, ${files.length} files (${size(bytes)}), in ${folder}.`,
  )
} catch (error) {
  console.error(error instanceof BackupProblem ? error.message : error)
  process.exitCode = 1
}
