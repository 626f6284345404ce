import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import {
  allows,
  front,
  record,
  roles,
  sides,
  submissions,
  type EndpointShape,
  type Permission,
  type Side,
} from '@evenrule/api/contract'
import type { RecordEvent } from '@evenrule/api/contract/record'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { readManifest } from '../../packages/api/src/server/backup/backup.manifest'
import type { FileStore } from '../../packages/api/src/server/integrations/file-store'
import { sha256 } from '../../packages/api/src/server/modules/record/record.append'
import { memoryFiles, startHarness, type Harness, type Person } from '../api/harness'
import { sampleQuery } from '../security/sample-body'
import { backup, upgradedDatabase } from './stand'

/** The files of the backup, read where they lie. */
const keptFiles: FileStore = {
  ...memoryFiles(),
  get: (key) => readFile(join(backup, key)),
}

let harness: Harness
interface Party {
  side: Side
  organisationId: string
  person: Person
}
let parties: Party[]
interface Frozen {
  submissionId: string
  sha256: string
  supplierOrgId: string
  customerOrgId: string
}
let frozen: Frozen[]

const ask = async <T extends object>(text: string, ...values: unknown[]) =>
  (await harness.owner.query<T>(text, values)).rows

beforeAll(async () => {
  const database = await upgradedDatabase()
  await database.leave()
  harness = await startHarness({ template: database.name, files: keptFiles })
  await database.drop()
  const [last] = await ask<{ at: Date }>('select max(at) as at from record_events')
  harness.moveClock(last?.at ?? new Date())
  // One member of each organisation gets every role, so that nothing is kept from them but by their side.
  const members = await ask<{ org: string; id: string; name: string }>(
    `update memberships m set roles = $1 from users u where u.id = m.user_id and m.user_id =
       (select min(x.user_id::text)::uuid from memberships x where x.org_id = m.org_id)
     returning m.org_id as org, u.id, u.name`,
    roles,
  )
  const held = await ask<{ org: string; side: Side }>(
    'select org_id as org, side from organisations_with_sides()',
  )
  parties = held.flatMap(({ org, side }) =>
    members
      .filter((member) => member.org === org)
      .map(({ id, name }) => ({ side, organisationId: org, person: { id, name, email: '' } })),
  )
  for (const { person } of parties) harness.admit(person)
  frozen = await ask<Frozen>(
    `select distinct on (submission_id) submission_id as "submissionId", sha256, supplier_org_id as "supplierOrgId",
       customer_org_id as "customerOrgId" from submission_texts order by submission_id, revision desc`,
  )
})
afterAll(() => harness.stop())

const partyOf = (side: Side, organisationId: string): Party => {
  const found = parties.find((each) => each.side === side && each.organisationId === organisationId)
  if (!found) throw new Error(`Nobody is on the ${side}'s side of ${organisationId}.`)
  return found
}

/** Where the ids for a parameter of a path come from. */
const tables: Record<string, string> = {
  partId: 'parts',
  characteristicId: 'characteristics',
  taskId: 'measuring_tasks',
  gaugeId: 'gauges',
  standardId: 'reference_standards',
  studyId: 'studies',
  agreementId: 'agreements',
  requestId: 'requests',
  houseTermsId: 'house_terms',
  fileId: 'files',
  revisionId: 'part_revisions',
  submissionId: 'submissions',
  chainId: 'record_heads',
}
const samples: Record<string, string[]> = {}

/** Two ids for a parameter, of what the organisation has or shares; none where the release knew no such thing. */
async function samplesOf(name: string, organisationId: string): Promise<string[]> {
  const table = tables[name]
  if (name === 'organisationId') return [organisationId]
  if (!table) return []
  return (samples[`${name} ${organisationId}`] ??= await selectIds(table, organisationId))
}

async function selectIds(table: string, organisationId: string): Promise<string[]> {
  const columns = await ask<{ name: string }>(
    `select attname as name from pg_attribute where attrelid = $1::regclass and attname = any($2)`,
    `public.${table}`,
    ['org_id', 'supplier_org_id', 'customer_org_id'],
  )
  const rows = await ask<{ id: string }>(
    `select ${table === 'record_heads' ? 'chain_id' : 'id'} as id from ${table}
     where ${columns.map(({ name }) => `${name} = $1`).join(' or ')} order by 1 desc limit 2`,
    organisationId,
  )
  return rows.map(({ id }) => id)
}

describe('what release 0.1.0 has stored is read by this version', () => {
  it('as every signed submission, in turn by one side and the other, with the hash its signatures stand under', async () => {
    expect(frozen.length).toBeGreaterThan(40)
    for (const [at, { submissionId, sha256: recorded, supplierOrgId, customerOrgId }] of frozen.entries()) {
      const readers = [partyOf('supplier', supplierOrgId), partyOf('customer', customerOrgId)]
      // Both read the first ten.
      for (const { side, organisationId, person } of at < 10 ? readers : [readers[at % 2] as Party]) {
        const params = { organisationId, submissionId }
        const page = await harness.as(side, person).call(submissions.readSubmission, params)
        expect([submissionId, page.sha256, sha256(page.text)]).toEqual([submissionId, recorded, recorded])
        const signed = page.signatures.filter(({ revision }) => revision === page.revision)
        expect(signed.length).toBeGreaterThan(0)
        for (const signature of signed) expect(signature.sha256).toBe(recorded)
      }
    }
  })

  it('as the queue of each side', async () => {
    let waitingForAnybody = 0
    for (const { side, organisationId, person } of parties) {
      const as = harness.as(side, person)
      const waiting = await as.call(front.listWaiting, { organisationId }, { query: { size: 100 } })
      const counts = await as.call(front.readCounts, { organisationId })
      expect(waiting.items).toHaveLength(counts.waiting)
      waitingForAnybody += waiting.total
    }
    expect(waitingForAnybody).toBeGreaterThan(20)
  })

  it('as the record of both sides, whole, with the events that froze those hashes', async () => {
    const { record: ends } = await readManifest(backup)
    for (const party of parties) {
      const { side, organisationId } = party
      const events = await eventsOf(party)
      for (const { text, hash } of events) expect(sha256(text)).toBe(hash)
      for (const chainId of new Set(events.map((event) => event.chainId))) {
        const params = { organisationId, chainId }
        const check = await harness.as(side, party.person).call(record.verifyRecord, params)
        const end = ends.find((each) => each.chainId === chainId)
        expect(check).toMatchObject({ broken: null, sound: end?.sequence, last: { hash: end?.hash } })
      }
      const column = side === 'supplier' ? 'supplierOrgId' : 'customerOrgId'
      const mine = frozen.filter((text) => text[column] === organisationId)
      expect(mine.filter((text) => !events.some((event) => event.text.includes(text.sha256)))).toEqual([])
    }
  })

  it('on every page that release 0.1.0 filled, on each side that has it, without a fault on any', async () => {
    const routes = harness.routes
      .filter(({ scope, endpoint }) => scope === 'tenant' && endpoint.method === 'get')
      .map(({ endpoint }) => endpoint)
    const answered = { supplier: 0, customer: 0 }
    for (const side of sides)
      for (const endpoint of routes.filter(({ access }) => allows(access as Permission, side, roles)))
        if (await isAnswered(side, endpoint)) answered[side] += 1
    expect(answered.supplier).toBeGreaterThanOrEqual(40)
    expect(answered.customer).toBeGreaterThanOrEqual(30)
  })
})

/** Asks one party after the other for a page until it is there for one; what is not theirs to see is no fault. */
async function isAnswered(side: Side, endpoint: EndpointShape): Promise<boolean> {
  for (const { organisationId, person } of parties.filter((party) => party.side === side))
    for (const [path, params] of await addresses(endpoint, organisationId)) {
      const answer = await harness.as(side, person).send('get', path).query(sampleQuery(endpoint, params))
      if (answer.status === 200) return true
      expect([path, [404, 409].includes(answer.status), answer.text]).toEqual([path, true, answer.text])
    }
  return false
}

/** All events that a side may see, page by page. */
async function eventsOf({ side, organisationId, person }: Party) {
  const events: RecordEvent[] = []
  for (let page = 1; ; page += 1) {
    const query = { size: 100, page }
    const { items, total } = await harness
      .as(side, person)
      .call(record.listEvents, { organisationId }, { query })
    events.push(...items)
    if (events.length >= total || items.length === 0) return events
  }
}

/** The addresses of a route with the ids that an organisation has, a few of each. */
async function addresses(
  endpoint: EndpointShape,
  organisationId: string,
): Promise<[string, Record<string, string>][]> {
  let found: [string, Record<string, string>][] = [[endpoint.path, {}]]
  for (const [, name = ''] of endpoint.path.matchAll(/:(\w+)/g)) {
    const ids = await samplesOf(name, organisationId)
    found = found.flatMap(([path, params]) =>
      ids.map((id): [string, Record<string, string>] => [
        path.replace(`:${name}`, id),
        { ...params, [name]: id },
      ]),
    )
  }
  return found
}
