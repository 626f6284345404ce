// Puts a backup back and checks the record: `npm run restore -- <folder of the backup> [--replace]`.
import { parseArgs } from 'node:util'
import { command, folderOf, keep } from './services/keeper.mjs'
import { Problem } from './services/say.mjs'

const usage = 'Use npm run restore -- <folder of the backup> [--replace].'

function readArguments() {
  try {
    const { values, positionals } = parseArgs({
      options: { replace: { type: 'boolean', default: false } },
      allowPositionals: true,
    })
    if (positionals.length === 1) return [folderOf(positionals[0]), ...(values.replace ? ['--replace'] : [])]
  } catch {
    // Told in the same words as a missing folder.
  }
  throw new Problem(usage)
}

await command(
  (signal) =>
    keep({
      ...{ name: 'restore', args: readArguments(), signal },
      whileRunning: 'Evenrule is running, and a restore would take its database away; stop it first',
    }),
  'Stopped: the database holds what it held before or the backup whole, never a part. Run the same command again; where it then says that the database is not empty, npm run -s verify-record shows the record that it holds.',
)
