import { openDatabase } from './db/database'
import type { Engines } from './integrations/engines'
import { reportOf } from './modules/record/record.report'
import { verifyWholeRecord } from './modules/record/record.verify'

/**
 * Recomputes the whole record of a database, whose owner `ownerUrl` names, and prints what it came to; the answer is
 * the exit status: 0 whole, 1 broken, 2 not all of it could be checked. `knownHash` is one that somebody kept.
 */
export async function tellRecord(ownerUrl: string, engines: Engines, knownHash?: string): Promise<number> {
  const { database, pool } = openDatabase(ownerUrl, 1)
  try {
    const { lines, status } = reportOf(await verifyWholeRecord(database, engines, knownHash), knownHash)
    for (const line of lines) console.log(line)
    return status
  } finally {
    await pool.end()
  }
}
