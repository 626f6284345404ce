import { spawn } from 'node:child_process'
import { mkdtemp, readFile, rm, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { record, reviews } from '@evenrule/api/contract'
import { openDatabase } from '../../packages/api/src/server/db/database'
import { canonicalText, sha256 } from '../../packages/api/src/server/modules/record/record.append'
import { verifyWholeRecord } from '../../packages/api/src/server/modules/record/record.verify'
import { startStory, type Story } from './prepared'

let story: Story
let owner: ReturnType<typeof openDatabase>
let chainId: string

const kept = [
  'record_events',
  'record_heads',
  'submission_texts',
  'submission_clauses',
  'agreement_versions',
] as const

beforeAll(async () => {
  story = await startStory()
  owner = openDatabase(story.harness.ownerUrl, 2)
  chainId = story.relationship.id
  const task = await story.ready()
  const submissionId = await story.submission(task.id, 'submitted')
  const { rowVersion, sha256: seen } = await story.read('quality', submissionId)
  await story
    .by('quality')
    .call(reviews.accept, { submissionId }, { body: { expectedVersion: rowVersion, sha256: seen } })
  for (const table of kept)
    await story.harness.owner.query(`create table kept_${table} as select * from ${table}`)
})
afterAll(async () => {
  await owner.pool.end()
  await story.stop()
})

const run = (text: string, ...values: unknown[]) => story.harness.owner.query(text, values)

/** Everything as it was before somebody tampered with it. */
async function restore() {
  for (const table of ['record_events', 'record_heads'])
    await run(`delete from ${table}`).then(() => run(`insert into ${table} select * from kept_${table}`))
  await run(
    'update submission_texts t set text = k.text from kept_submission_texts k where t.submission_id = k.submission_id',
  )
  await run(
    'update submission_clauses t set output_text = k.output_text, input_text = k.input_text, output_sha256 = k.output_sha256 from kept_submission_clauses k where t.id = k.id',
  )
  await run('update agreement_versions t set text = k.text from kept_agreement_versions k where t.id = k.id')
}

interface Row {
  sequence: number
  type: string
  text: string
  previous_hash: string
  hash: string
}

const rows = async (): Promise<Row[]> =>
  (
    await run(
      'select sequence, type, text, previous_hash, hash from record_events where chain_id = $1 order by sequence',
      chainId,
    )
  ).rows as Row[]

/** The command as people call it, with its exit status and what it says. */
const command = (...args: string[]) => commandWith({}, ...args)
const commandWith = (environment: Record<string, string>, ...args: string[]) =>
  new Promise<{ status: number | null; said: string }>((resolve, reject) => {
    const child = spawn('node', ['infra/verify-record.mjs', ...args], {
      cwd: fileURLToPath(new URL('../..', import.meta.url)),
      env: { ...process.env, MIGRATOR_DATABASE_URL: story.harness.ownerUrl, ...environment },
    })
    let said = ''
    child.stdout.on('data', (bytes: Buffer) => (said += bytes.toString()))
    child.stderr.on('data', (bytes: Buffer) => (said += bytes.toString()))
    child.once('error', reject)
    child.once('exit', (status) => resolve({ status, said }))
  })

const verify = (hash?: string) => verifyWholeRecord(owner.database, story.harness.services.engines, hash)
const byFunction = async (hash?: string) =>
  (await verify(hash)).chains.find((chain) => chain.chainId === chainId)
const byRoute = (query: Record<string, unknown> = {}) =>
  story.by('engineer').call(record.verifyRecord, { chainId }, { query })

/** Writes an event anew with a hash of its own, as somebody would who knows how the chain is made. */
async function rewrite(row: Row, change: Record<string, unknown>, previousHash = row.previous_hash) {
  const text = canonicalText({ ...(JSON.parse(row.text) as object), ...change, previousHash })
  const hash = sha256(text)
  await run(
    'update record_events set text = $3, previous_hash = $4, hash = $5 where chain_id = $1 and sequence = $2',
    ...[chainId, row.sequence, text, previousHash, hash],
  )
  return hash
}

const at = (all: Row[], sequence: number): Row => {
  const row = all.find((each) => each.sequence === sequence)
  if (!row) throw new Error(`There is no event ${sequence}.`)
  return row
}

const insertCopy = (sequence: number, of: number) =>
  run(
    `insert into record_events select chain_id, org_id, supplier_org_id, customer_org_id, $2::integer, at, type,
       actor_user_id, actor_org_id, subject_type, subject_id, task_id, text, previous_hash, hash
     from record_events where chain_id = $1 and sequence = $3::integer`,
    ...[chainId, sequence, of],
  )

const shift = async (from: number, last: number, by: 1 | -1) => {
  const all = Array.from({ length: last - from + 1 }, (_, index) => from + index)
  for (const sequence of by === 1 ? all.reverse() : all)
    await run(
      'update record_events set sequence = sequence + $3::integer where chain_id = $1 and sequence = $2::integer',
      ...[chainId, sequence, by],
    )
}

/** What somebody does who owns the database, and the event at which the record shows it. */
const ways: [string, (all: Row[]) => Promise<unknown>, (all: Row[]) => number][] = [
  [
    'the text of an event changed',
    () =>
      run(
        `update record_events set text = replace(text, '"at":"2026', '"at":"2025') where chain_id = $1 and sequence = 4`,
        chainId,
      ),
    () => 4,
  ],
  [
    'a row deleted in the middle',
    () => run('delete from record_events where chain_id = $1 and sequence = 5', chainId),
    () => 5,
  ],
  [
    'the last row deleted',
    (all) => run('delete from record_events where chain_id = $1 and sequence = $2', chainId, all.length),
    (all) => all.length,
  ],
  [
    'two rows swapped',
    async () => {
      for (const [from, to] of [
        [2, 999],
        [4, 2],
        [999, 4],
      ])
        await run(
          'update record_events set sequence = $3::integer where chain_id = $1 and sequence = $2::integer',
          ...[chainId, from, to],
        )
    },
    () => 2,
  ],
  [
    'one row rewritten with a hash that fits it',
    (all) => rewrite(at(all, 3), { data: { forged: true } }),
    () => 4,
  ],
  ['a gap in the sequence', (all) => shift(6, all.length, 1), () => 6],
  [
    'another actor in the columns',
    () =>
      run(
        'update record_events set actor_user_id = $2 where chain_id = $1 and sequence = 3',
        chainId,
        story.people.stranger.id,
      ),
    () => 3,
  ],
  [
    'another time in the columns',
    () =>
      run(
        `update record_events set at = at - interval '1 hour' where chain_id = $1 and sequence = 6`,
        chainId,
      ),
    () => 6,
  ],
  [
    'a row inserted',
    async (all) => {
      await shift(5, all.length, 1)
      await insertCopy(5, 4)
    },
    () => 5,
  ],
  [
    'an event moved to another chain',
    async (all) => {
      const journal = story.organisations.supplier.id
      await run(
        `insert into record_events select $2::uuid, $2::uuid, null, null, (select max(sequence) + 1 from record_events where chain_id = $2::uuid),
           at, type, actor_user_id, actor_org_id, subject_type, subject_id, task_id, text, previous_hash, hash
         from record_events where chain_id = $1 and sequence = $3::integer`,
        ...[chainId, journal, all.length],
      )
      await run('delete from record_events where chain_id = $1 and sequence = $2', chainId, all.length)
    },
    (all) => all.length,
  ],
  [
    'a frozen evaluation changed',
    () =>
      run(
        `update submission_clauses set output_text = replace(output_text, '"verdict":"meets"', '"verdict":"falls-short"'), output_sha256 = encode(sha256(convert_to(replace(output_text, '"verdict":"meets"', '"verdict":"falls-short"'), 'utf8')), 'hex')`,
      ),
    (all) => all.find(({ type }) => type === 'submission.signed')?.sequence ?? 0,
  ],
  [
    'one byte of the input of a frozen evaluation changed',
    () =>
      run(
        `update submission_clauses set input_text = replace(input_text, '24.0003', '24.0002') where position = 3`,
      ).then(() => run(`update submission_clauses set input_text = input_text || ' ' where position = 0`)),
    (all) => all.find(({ type }) => type === 'submission.signed')?.sequence ?? 0,
  ],
  [
    'the signed text of a submission changed',
    () => run(`update submission_texts set text = replace(text, '24.0003', '24.0002')`),
    (all) => all.find(({ type }) => type === 'submission.signed')?.sequence ?? 0,
  ],
  [
    'the signed text of an agreement changed',
    () => run(`update agreement_versions set text = replace(text, '0.95', '0.90') where text is not null`),
    (all) => all.find(({ type }) => type === 'agreement.signed')?.sequence ?? 0,
  ],
]

describe('a record that nobody touched', { timeout: 120_000 }, () => {
  it('is whole, by the function, the route and the command', async () => {
    const { chains, texts } = await verify()
    expect(chains.every(({ broken }) => broken === null)).toBe(true)
    expect(texts).toMatchObject([
      { name: 'submission 1 of Halm Turning → Nordhof Drives', revision: 1, evaluations: 4, fault: null },
    ])
    expect((await byRoute()).broken).toBeNull()
    const { status, said } = await command()
    expect(said).toContain('The record is whole.')
    expect(said).toMatch(/whole {3}Halm Turning → Nordhof Drives: \d+ events, last hash [0-9a-f]{64}/)
    expect(said).toContain('1 signed texts and 4 evaluations recomputed, all equal.')
    expect(status).toBe(0)
  })
})

describe('the owner of the database cannot hide', { timeout: 120_000 }, () => {
  it.each(ways)('%s', async (_what, tamper, brokenAt) => {
    const all = await rows()
    try {
      await tamper(all)
      const sequence = brokenAt(all)
      expect(sequence).toBeGreaterThan(0)
      expect((await byFunction())?.broken).toMatchObject({ sequence })
      expect((await byRoute()).broken).toMatchObject({ sequence })
      const { status, said } = await command()
      expect(said).toContain(`BROKEN  Halm Turning → Nordhof Drives: event ${sequence}`)
      expect(said).toContain('The record is broken.')
      expect(status).toBe(1)
    } finally {
      await restore()
    }
    expect((await byFunction())?.broken).toBeNull()
  })

  it('a whole suffix rewritten with hashes that fit, from somebody who kept a hash', async () => {
    const all = await rows()
    const last = at(all, all.length)
    try {
      let previous = at(all, 2).hash
      for (const row of all.slice(2))
        previous = await rewrite(row, row.sequence === 3 ? { data: { forged: true } } : {}, previous)
      await run('update record_heads set hash = $2 where chain_id = $1', chainId, previous)
      // By itself the chain is consistent: only what somebody kept outside tells.
      expect(await byFunction(last.hash)).toMatchObject({ broken: null, known: null })
      expect(await byRoute({ hash: last.hash })).toMatchObject({ broken: null, known: null })
      const { status, said } = await command(last.hash)
      expect(said).toContain('The hash you kept is nowhere in the record')
      expect(status).toBe(1)
    } finally {
      await restore()
    }
    const { status, said } = await command(last.hash)
    expect(said).toContain(
      `The hash you kept is that of event ${last.sequence} of Halm Turning → Nordhof Drives.`,
    )
    expect(status).toBe(0)
  })

  it('from a command that is told no database or no hash', async () => {
    expect(await command('abc')).toMatchObject({ status: 2 })
  })
})

describe('an engine that is not kept any more', { timeout: 120_000 }, () => {
  const released = fileURLToPath(new URL('../../packages/metrology/released', import.meta.url))
  let folder = ''
  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), 'engines-'))
  })
  afterAll(() => rm(folder, { recursive: true }))

  /** A folder with a later engine alone, whose list may still name the one that made every evaluation. */
  async function withoutTheEngine(isListed: boolean) {
    const { current } = story.harness.services.engines
    const text = `${await readFile(join(released, current.file), 'utf8')}\n// later\n`
    const later = { version: '9.9.9', sha256: sha256(text), file: 'later.mjs' }
    await writeFile(join(folder, later.file), text)
    await writeFile(join(folder, 'index.json'), JSON.stringify(isListed ? [current, later] : [later]))
    return current
  }

  it.each([true, false])('is told apart from tampering, listed %s', async (isListed) => {
    const { version, sha256: hash } = await withoutTheEngine(isListed)
    const { status, said } = await commandWith({ ENGINES_DIR: folder })
    expect(said).toContain(
      `OPEN    submission 1 of Halm Turning → Nordhof Drives, revision 1: cannot be recomputed here: engine ${version} (${hash}) is not kept`,
    )
    expect(said).toContain(
      '0 signed texts and 0 evaluations recomputed, all equal. 1 cannot be recomputed here.',
    )
    expect(said).not.toMatch(/BROKEN|broken\.|The record is whole/)
    expect(status).toBe(2)
  })

  it('hides nothing that was changed', async () => {
    await withoutTheEngine(false)
    try {
      await run(`update submission_clauses set output_text = output_text || ' ' where position = 1`)
      const { status, said } = await commandWith({ ENGINES_DIR: folder })
      expect(said).toMatch(/BROKEN {2}submission 1 .* has another output than was signed/)
      expect(said).toContain('The record is broken.')
      expect(status).toBe(1)
    } finally {
      await restore()
    }
  })
})
