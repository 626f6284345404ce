import { existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { files } from '@evenrule/api/contract'
import { readManifest, type Manifest } from '../../packages/api/src/server/backup/backup.manifest'
import { sha256 } from '../../packages/api/src/server/modules/record/record.append'
import { startHarness } from '../api/harness'
import { startBackups, withTarget, type Backups } from './backup.world'

let world: Backups
let made: string
let manifest: Manifest
let told: string

beforeAll(async () => {
  world = await startBackups()
  const { status, said } = await world.command('backup', world.source.url, 'mine')
  expect([status, said]).toEqual([0, said])
  told = said
  made = join(world.folder, 'mine')
  manifest = await readManifest(made)
})
afterAll(() => world.stop())

describe('a backup', () => {
  it('is told in one line, and holds every file that a row names, each by its hash', async () => {
    expect(told).toMatch(
      /^The backup is whole: database \d+ kB, 11 chains of the record, 141 files \(98 kB\), in .*mine\.\n$/,
    )
    expect(manifest.files).toHaveLength(141)
    for (const { key, sha256: hash } of manifest.files)
      expect([key, sha256(readFileSync(join(made, key)))]).toEqual([
        `files/${hash.slice(0, 2)}/${hash}`,
        hash,
      ])
    // Whatever else in the database looks like the key of a file is the key of one that was kept.
    const kept = new Set(manifest.files.map(({ key }) => key))
    const { rows: columns } = await world.source.admin.query<{ table: string; column: string }>(
      `select table_name as table, column_name as column from information_schema.columns where table_schema = 'public' and data_type = 'text'`,
    )
    const union = columns
      .map(
        ({ table, column }) =>
          `select "${column}" as key from "${table}" where "${column}" like 'files/__/%'`,
      )
      .join(' union ')
    const { rows: keys } = await world.source.admin.query<{ key: string }>(union)
    expect(keys.length).toBeGreaterThan(100)
    expect(keys.filter(({ key }) => !kept.has(key))).toEqual([])
  })

  it('never overwrites another, and leaves what was cut short under another name', async () => {
    await expect(world.backUp('mine')).rejects.toThrow(/exists already, and no backup is ever overwritten/)
    const path = world.objects.pathOf(manifest.files[0]?.key ?? '')
    const whole = readFileSync(path)
    writeFileSync(path, 'other bytes')
    await expect(world.backUp('cut')).rejects.toThrow(/^The file store does not give files\//)
    writeFileSync(path, whole)
    expect(readdirSync(world.folder).sort()).toEqual(['cut.partial', 'mine'])
    await withTarget((target) =>
      expect(world.restore(target, join(world.folder, 'cut.partial'))).rejects.toThrow(
        /is no complete backup: it has no manifest\.json/,
      ),
    )
    expect((await world.backUp('cut')).files).toHaveLength(141)
    expect(existsSync(join(world.folder, 'cut.partial'))).toBe(false)
  })

  it('of an empty database is refused', () =>
    withTarget((target) =>
      expect(world.backUp('empty', target)).rejects.toThrow(
        'The database is empty: there is nothing to back up.',
      ),
    ))

  it('restored into a wiped instance gives back schema, rows and files, and a record that is verified', async () => {
    world.objects.clear()
    await withTarget(async (target) => {
      const { status, said } = await world.command('restore', target.url, 'mine')
      expect([status, said]).toEqual([0, said])
      expect(said).toContain('141 files are in the file store.')
      expect(said).toContain('11 chains of the record end where the backup says.')
      expect(said).toContain('53 signed texts and 190 evaluations recomputed, all equal.')
      expect(said).toMatch(/The record is whole\.\n$/)
      await world.expectRestored(target)

      const harness = await startHarness({ template: target.name, files: world.objects.store })
      const { rows: all } = await harness.owner.query<{
        org: string
        user: string
        id: string
        sha256: string
      }>(
        `select f.org_id as org, m.user_id as user, f.id, f.sha256 from files f
         join lateral (select user_id from memberships where org_id = f.org_id and not roles && '{reader}' limit 1) m on true order by f.id`,
      )
      expect(all).toHaveLength(144)
      for (const { org, user, id, sha256: hash } of all.filter((_file, at) => at % 6 === 0)) {
        const person = { id: user, name: 'Somebody', email: '' }
        harness.admit(person)
        const path = files.downloadFile.path.replace(':organisationId', org).replace(':fileId', id)
        const answer = await harness.as('supplier', person).send('get', path).buffer().responseType('blob')
        expect([id, answer.status, sha256(answer.body as Buffer)]).toEqual([id, 200, hash])
      }
      await harness.stop()
    })
  })
})
