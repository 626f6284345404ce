import { existsSync, readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import {
  knownMigrations,
  type KnownMigration,
  type Migration,
} from '../../packages/api/src/server/db/journal'

export interface Release {
  version: string
  migrations: readonly Migration[]
}

interface Journal {
  entries: { idx: number; when: number; tag: string }[]
}

/**
 * What is wrong with a folder of migrations, a line for each: released ones must stand first and unedited, each new
 * one must sort after all before it, and journal, files and snapshots must belong together.
 */
export async function journalFaults(folder: string, releases: readonly Release[]): Promise<string[]> {
  const read = (path: string): unknown => JSON.parse(readFileSync(join(folder, path), 'utf8'))
  const { entries } = read('meta/_journal.json') as Journal
  const files = readdirSync(folder).filter((name) => name.endsWith('.sql'))
  const missing = entries.filter(({ tag }) => !files.includes(`${tag}.sql`))
  if (missing.length > 0) return missing.map(({ tag }) => `${tag}.sql is gone`)
  const known = await knownMigrations(folder)
  return [
    ...files
      .filter((name) => !entries.some(({ tag }) => `${tag}.sql` === name))
      .map((name) => `${name} is not in the journal`),
    ...entries.flatMap(({ idx, when, tag }, at) => [
      ...(idx === at && Number(tag.slice(0, 4)) === at ? [] : [`${tag} does not stand at its number`]),
      ...(when > (entries[at - 1]?.when ?? 0) ? [] : [`${tag} is not later than the one before it`]),
    ]),
    ...snapshotFaults(entries, (path) => (existsSync(join(folder, path)) ? read(path) : undefined)),
    ...releases.flatMap((release) => releaseFaults(known, release)),
  ]
}

/** Two migrations made beside one another show in their snapshots: both follow the same one. */
function snapshotFaults(entries: Journal['entries'], read: (path: string) => unknown): string[] {
  let previous = '00000000-0000-0000-0000-000000000000'
  return entries.flatMap(({ tag }) => {
    const snapshot = read(`meta/${tag.slice(0, 4)}_snapshot.json`) as
      { id: string; prevId: string } | undefined
    if (!snapshot) return [`${tag} has no snapshot`]
    const follows = snapshot.prevId === previous
    previous = snapshot.id
    return follows ? [] : [`the snapshot of ${tag} does not follow the one before it`]
  })
}

function releaseFaults(known: readonly KnownMigration[], { version, migrations }: Release): string[] {
  return migrations.flatMap(({ madeAt, sha256 }, at) => {
    const own = known[at]
    if (own?.madeAt !== madeAt) return [`migration ${at} of release ${version} no longer stands at its place`]
    return own.sha256 === sha256 ? [] : [`${own.tag} was edited since release ${version}`]
  })
}
