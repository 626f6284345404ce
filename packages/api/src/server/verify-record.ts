import { openEngines } from './integrations/engines'
import { tellRecord } from './tell-record'

/*
 * Recomputes the whole record from the database, with every frozen text and evaluation:
 *   npm run -s verify-record [-- <hash kept from an earlier check>]
 * Exit status 0 when everything is whole, 1 when something is broken, 2 when it could not be checked, or not all of it.
 */

async function main(): Promise<number> {
  const url = process.env.MIGRATOR_DATABASE_URL
  if (!url) throw new Error('MIGRATOR_DATABASE_URL is missing.')
  const knownHash = process.argv[2]
  if (knownHash !== undefined && !/^[0-9a-f]{64}$/.test(knownHash))
    throw new Error(`"${knownHash}" is no hash: give 64 characters, 0 to 9 and a to f.`)
  const engines = await openEngines(process.env.ENGINES_DIR ?? 'packages/metrology/released')
  return tellRecord(url, engines, knownHash)
}

try {
  process.exitCode = await main()
} catch (error) {
  console.error(`The record could not be checked: ${error instanceof Error ? error.message : String(error)}`)
  process.exitCode = 2
}
