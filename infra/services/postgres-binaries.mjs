import { existsSync, readFileSync, readdirSync } from 'node:fs'
import { delimiter, join } from 'node:path'
import { installPostgres } from './debian.mjs'
import { Problem } from './say.mjs'

const oldest = 15
const needed = ['initdb', 'postgres', 'psql', 'pg_isready', 'pg_dump', 'pg_restore']

/** Folders with a complete server, by major version, the highest first. */
function installed() {
  const debian = '/usr/lib/postgresql'
  const versions = existsSync(debian) ? readdirSync(debian).filter((name) => /^\d+$/.test(name)) : []
  return versions
    .map((version) => ({ version: Number(version), folder: join(debian, version, 'bin') }))
    .filter(({ folder }) => needed.every((program) => existsSync(join(folder, program))))
    .sort((a, b) => b.version - a.version)
}

/** Folder of the newest programs that are installed; undefined when they have to be looked up on the path. */
export const newestPrograms = () => installed()[0]?.folder

/** A server that stands on the path, as on systems other than Debian. */
function onPathFolder() {
  return (process.env.PATH ?? '')
    .split(delimiter)
    .find((folder) => needed.every((program) => existsSync(join(folder, program))))
}

/** Major version of the cluster in a folder; undefined when there is none. */
export function clusterVersion(folder) {
  const file = join(folder, 'PG_VERSION')
  return existsSync(file) ? Number(readFileSync(file, 'utf8')) : undefined
}

/**
 * Finds the server's programs, and installs them when there are none.
 *
 * @param {number | undefined} version of a cluster that exists already: no other server can open it
 * @param {object} tools log, say and signal for the installation
 * @returns {Promise<string>} the folder of the programs
 * @throws {Problem} when they cannot be had, are too old, or are not those of the existing cluster
 */
export async function findBinaries(version, tools) {
  if (installed().length === 0 && !onPathFolder()) await installPostgres(tools)
  const found = installed()
  if (version !== undefined && found.length > 0) {
    const same = found.find((server) => server.version === version)
    if (same) return same.folder
    throw new Problem(
      `The database was made by PostgreSQL ${version}, which is not installed (found: ${found.map((server) => server.version).join(', ')}); ` +
        `install postgresql-${version}, or start afresh with npm run reset.`,
    )
  }
  const best = found[0]
  if (best && best.version >= oldest) return best.folder
  const folder = best ? undefined : onPathFolder()
  if (folder) return folder
  throw new Problem(
    `Evenrule needs the server of PostgreSQL ${oldest} or newer; ${best ? `version ${best.version} is installed` : 'none was found after installing'}.`,
  )
}
