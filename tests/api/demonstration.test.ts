import type { ClauseOutput } from '@evenrule/metrology'
import { front, invitations, record, requests, requestStates, type Side } from '@evenrule/api/contract'
import { studyStates } from '@evenrule/api/contract/moves/study'
import { submissionStates } from '@evenrule/api/contract/moves/submission'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import {
  finishSeed,
  seedBase,
  type Base,
  type SeededOrganisation,
} from '../../packages/api/src/server/seed/base'
import { playDemonstration } from '../../packages/api/src/server/seed/run'
import { gauges } from '../../packages/api/src/server/seed/scenario.gauges'
import { Stage } from '../../packages/api/src/server/seed/stage'
import { people } from '../../fakes/oidc/people'
import { startHarness, type Harness } from './harness'

const seededAt = new Date('2026-11-20T08:00:00.000Z')

describe('the demonstration', () => {
  let harness: Harness
  let base: Base
  beforeAll(async () => {
    harness = await startHarness()
    harness.moveClock(seededAt)
    base = (await seedBase(harness.ownerUrl, 'http://oidc.test', '2025-11-20T08:00:00.000Z')) as Base
    await playDemonstration(new Stage(harness.database, harness.services, harness.routes, seededAt), base)
    await finishSeed(harness.ownerUrl)
  }, 300_000)
  afterAll(() => harness.stop())

  /** Calls as a member of a seeded organisation. */
  const asMember = (side: Side, organisation: SeededOrganisation, name: string) => {
    const person = organisation.people.find((each) => each.name === name)
    if (!person) throw new Error(`${organisation.name} has no ${name}.`)
    harness.admit(person)
    return harness.as(side, { ...person, email: '' })
  }

  it('is laid out once: a second start finds it there', async () => {
    expect(await seedBase(harness.ownerUrl, 'http://oidc.test', seededAt.toISOString())).toBeUndefined()
  })

  it('has studies and submissions in every state there is, and agreements in every stored one', async () => {
    const states = async (table: string) =>
      (await harness.owner.query<{ state: string }>(`select distinct state from ${table}`)).rows.map(
        ({ state }) => state,
      )
    expect((await states('studies')).sort()).toEqual([...studyStates].sort())
    expect((await states('submissions')).sort()).toEqual([...submissionStates].sort())
    expect((await states('agreement_versions')).sort()).toEqual(
      ['agreed', 'countered', 'draft', 'proposed', 'signed', 'withdrawn'].sort(),
    )
  })

  it('has requests in every state, with each of two customers', async () => {
    for (const [key, name] of [
      ['brackwell', 'Mara Lindqvist'],
      ['norvane', 'Leo Sandmark'],
    ] as const) {
      const organisation = base.organisations[key]
      const { items } = await asMember('customer', organisation, name).call(
        requests.listRequests,
        { organisationId: organisation.id },
        { query: { size: 100 } },
      )
      expect(new Set(items.map(({ state }) => state))).toEqual(new Set(requestStates))
      expect(items.some(({ state, daysLeft }) => state === 'open' && daysLeft < 0)).toBe(true)
    }
  })

  it('leaves its messages readable, and none of its mail to be sent but that of invitations', async () => {
    const { rows } = await harness.owner.query<{ waiting: number; messages: number }>(
      `select (select count(*) from outbox where sent_at is null and message_id is not null)::integer as waiting,
         (select count(*) from messages)::integer as messages`,
    )
    expect(rows[0]?.waiting).toBe(0)
    expect(rows[0]?.messages).toBeGreaterThan(100)
  })

  it('has invitations that are pending and one that has expired, of a person whom the sign-in page offers', async () => {
    const { brackwell } = base.organisations
    const admin = asMember('customer', brackwell, 'Adaeze Holm')
    const params = { organisationId: brackwell.id }
    const suppliers = await admin.call(invitations.listSupplierInvitations, params)
    expect(suppliers.items.map(({ supplierName, state }) => [supplierName, state])).toEqual([
      ['Dunmere Gears', 'pending'],
      ['Halden Forge', 'expired'],
    ])
    const members = await admin.call(invitations.listInvitations, params)
    expect(members.items).toMatchObject([{ email: 'wren.idle@idle.example', state: 'pending' }])
    for (const { email, state } of [...suppliers.items, ...members.items])
      if (state === 'pending')
        expect(people.find((person) => person.email === email)).toMatchObject({ organisation: undefined })
  })

  it('estimates the bias that the gauges were given, as often as their intervals promise', async () => {
    const { rows } = await harness.owner.query<{ code: string; unit: string; outputText: string }>(
      `select g.code, s.unit, e.output_text as "outputText" from study_evaluations e
       join studies s on s.org_id = e.org_id and s.id = e.study_id
       join gauges g on g.org_id = s.org_id and g.id = s.gauge_id
       where e.clause_key like 'bias/%' and s.unit = g.unit`,
    )
    const covered = rows.map(({ code, outputText }) => {
      const truth = gauges.find((gauge) => gauge.code === code)?.bias ?? NaN
      const interval = (JSON.parse(outputText) as ClauseOutput).study?.interval
      return interval !== undefined && interval !== null && interval.lower <= truth && truth <= interval.upper
    })
    expect(covered.length).toBeGreaterThan(40)
    // Intervals of 90 or 95 %; a miss of more than a quarter would be less likely than one in ten thousand.
    expect(covered.filter(Boolean).length / covered.length).toBeGreaterThan(0.75)
  })

  it.each([
    ['supplier', 'tarnfield', 'Ines Calder'],
    ['customer', 'brackwell', 'Mara Lindqvist'],
    ['customer', 'norvane', 'Leo Sandmark'],
    ['supplier', 'osmere', 'Kofi Brandt'],
  ] as const)('fills the front page of the %s %s', async (side, key, name) => {
    const organisation = base.organisations[key]
    const act = asMember(side, organisation, name)
    const params = { organisationId: organisation.id }
    const waiting = await act.call(front.listWaiting, params, { query: { size: 100 } })
    const counts = await act.call(front.readCounts, params)
    const coverage = await act.call(front.listCoverage, params)
    expect(waiting.total).toBeGreaterThan(0)
    expect(waiting.items).toHaveLength(waiting.total)
    expect(counts.waiting).toBe(waiting.total)
    expect(counts.agreements).toBe(waiting.items.filter(({ act }) => /proposal|criteria/.test(act)).length)
    // What is overdue first, then what has waited longest.
    const overdue = waiting.items.filter(({ daysLeft }) => daysLeft !== null && daysLeft < 0)
    expect(waiting.overdue).toBe(overdue.length)
    expect(waiting.items.slice(0, overdue.length)).toEqual(overdue)
    for (const part of [overdue, waiting.items.slice(overdue.length)])
      expect(part.map(({ since }) => since)).toEqual(part.map(({ since }) => since).sort())
    expect(waiting.oldestDays).toBe(Math.max(...waiting.items.map(({ ageDays }) => ageDays)))
    expect(coverage.total).toBeGreaterThan(0)
  })

  it('leads with what waits for the side that asks, and never with what waits for the other', async () => {
    const brackwell = base.organisations.brackwell
    const customer = await asMember('customer', brackwell, 'Mara Lindqvist').call(
      front.listWaiting,
      { organisationId: brackwell.id },
      { query: { size: 100 } },
    )
    expect(new Set(customer.items.map(({ act }) => act))).toEqual(
      new Set([
        'decide',
        'confirm-as-second-person',
        'answer-proposal',
        'finish-proposal',
        'confirm-characteristics',
      ]),
    )
  })

  it('stands in a record without a break, on every chain', async () => {
    const { rows } = await harness.owner.query<{ id: string; supplier: string }>(
      'select id, supplier_org_id as supplier from relationships',
    )
    for (const { id, supplier } of rows) {
      const organisation = Object.values(base.organisations).find((each) => each.id === supplier)
      if (!organisation) throw new Error('A relationship without a supplier.')
      const answer = await asMember('supplier', organisation, organisation.people[0]?.name ?? '').call(
        record.verifyRecord,
        { organisationId: supplier, chainId: id },
      )
      expect(answer.broken).toBeNull()
      expect(answer.sound).toBeGreaterThan(0)
    }
  })
})
