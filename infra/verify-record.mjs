// Checks the whole record of an instance from its database: `npm run -s verify-record [-- <kept hash>]`.
import { spawnSync } from 'node:child_process'
import { join } from 'node:path'
import { childEnvironment, readConfig, root } from './config.mjs'
import { readJson } from './services/files.mjs'
import { fail, Problem } from './services/say.mjs'

/** The database of the instance that `npm start` runs, unless the environment names another. */
function environment() {
  if (process.env.MIGRATOR_DATABASE_URL) return process.env
  const config = readConfig()
  const secrets = readJson(config.file.secrets)
  if (!secrets) throw new Problem('There is no record yet: start the product once with npm start.')
  return childEnvironment(config, secrets)
}

function main() {
  const program = join(root, 'packages/api/src/server/verify-record.ts')
  const tsx = join(root, 'node_modules/.bin/tsx')
  const { status, error } = spawnSync(tsx, [program, ...process.argv.slice(2)], {
    cwd: root,
    env: environment(),
    stdio: 'inherit',
  })
  if (error) throw error
  process.exitCode = status ?? 2
}

try {
  main()
} catch (error) {
  fail(error)
  process.exitCode = 2
}
