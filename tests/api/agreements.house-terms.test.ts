import { randomUUID } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { agreements, houseTerms, noTerms, type EndpointShape } from '@evenrule/api/contract'
import { criteriaFor } from '../../packages/api/src/server/modules/agreements/agreements.apply.service'
import { houseTermsFor } from '../../packages/api/src/server/modules/house-terms/house-terms.lookup.service'
import type { Relationship } from './harness'
import {
  equivalence,
  newest,
  readings,
  ruleOfTen,
  startWorld,
  zeroTest,
  type Actor,
  type World,
} from './agreements.world'

let world: World
let engineer: Actor, quality: Actor, customerApprover: Actor, stranger: Actor
let second: Relationship, third: Relationship
let other: Actor

beforeAll(async () => {
  world = await startWorld()
  ;({ engineer, quality, customerApprover, stranger } = world.actors)
  const { harness, customer } = world
  const people = [await harness.person('Mai Lorn'), await harness.person('Jo Karst')] as const
  const supplier = await harness.organisation('Karst Castings', [[people[0], ['gauge-engineer']]])
  const drafty = await harness.organisation('Lorn Springs', [[people[1], ['gauge-engineer']]])
  second = await harness.relationship(supplier, customer)
  third = await harness.relationship(drafty, customer)
  other = { side: 'supplier', organisation: supplier, person: people[0] }
})
afterAll(() => world.harness.stop())

const act = <E extends EndpointShape>(
  who: Actor,
  endpoint: E,
  houseTermsId: string,
  body?: object,
  query?: Record<string, unknown>,
) =>
  world.as(who).call(endpoint, world.inside(who, { houseTermsId }), {
    ...(body ? { body } : {}),
    ...(query ? { query } : {}),
  })
interface Refusal {
  status: number
  code: string
  errors?: { path: string }[]
  current?: unknown
}
const refused = async (work: Promise<unknown>): Promise<Refusal> => {
  try {
    await work
  } catch (error) {
    return (error as { problem: Refusal }).problem
  }
  throw new Error('It was not refused.')
}
const list = async (who: Actor, query: Record<string, unknown> = {}) =>
  (await act(who, houseTerms.listHouseTerms, '', undefined, query)).items
const content = { clauses: [zeroTest(), readings(20)], terms: { validityMonths: 12 }, words: 'As ever.' }

describe('house terms', () => {
  let first: houseTerms.HouseTerms

  it('are drafted by the customer alone, and seen by nobody else until published', async () => {
    const draft = await act(quality, houseTerms.beginHouseTerms, '', content)
    expect(draft).toMatchObject({
      ...{ number: null, state: 'draft', current: false, by: 'Ola Brandt', sha256: null },
      clauses: content.clauses,
      terms: { ...noTerms, validityMonths: 12 },
      moves: ['keep-draft', 'discard-draft', 'publish'],
    })
    expect(await list(quality)).toHaveLength(1)
    expect(await list(quality, { show: 'current' })).toEqual([])
    for (const who of [engineer, other, stranger]) {
      expect(await list(who)).toEqual([])
      expect((await refused(act(who, houseTerms.readHouseTerms, draft.id))).status).toBe(404)
    }
    expect((await refused(act(engineer, houseTerms.beginHouseTerms, '', content))).status).toBe(403)
    const again = await refused(act(customerApprover, houseTerms.beginHouseTerms, '', content))
    expect(again).toMatchObject({ status: 409, code: 'draft-exists' })
    expect(houseTerms.houseTermsConflictSchema.parse(again.current).draft?.id).toBe(draft.id)
    expect(
      await refused(act(quality, houseTerms.offerHouseTerms, draft.id, offerTo(world.relationship))),
    ).toMatchObject({
      status: 409,
      code: 'wrong-state',
    })
    first = draft
  })

  it('written by two at once keep both texts', async () => {
    const save = (who: Actor, words: string, expectedVersion = 1) =>
      act(who, houseTerms.saveHouseTerms, first.id, { ...content, words, expectedVersion })
    const results = await Promise.allSettled([save(quality, 'One.'), save(customerApprover, 'Two.')])
    expect(results.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected'])
    const failed = results.find((each) => each.status === 'rejected')
    const { code, current } = (failed?.reason as { problem: Refusal }).problem
    expect(code).toBe('changed-meanwhile')
    const kept = results[0]?.status === 'fulfilled' ? 'One.' : 'Two.'
    expect(houseTerms.houseTermsConflictSchema.parse(current).draft).toMatchObject({
      words: kept,
      rowVersion: 2,
    })
    expect(await save(quality, 'Both.', 2)).toMatchObject({ words: 'Both.', by: 'Ola Brandt' })
  })

  it('published are numbered, read by every supplier with a relationship, and never changed', async () => {
    const published = await act(quality, houseTerms.publishHouseTerms, first.id, { expectedVersion: 3 })
    expect(published).toMatchObject({ number: 1, state: 'published', current: true, moves: ['offer'] })
    expect(published.sha256).toMatch(/^[0-9a-f]{64}$/)
    for (const who of [engineer, other]) {
      expect(await list(who)).toMatchObject([
        { number: 1, customer: { name: 'Nordhof Drives' }, clauseCount: 2 },
      ])
      expect(await act(who, houseTerms.readHouseTerms, first.id)).toMatchObject({
        clauses: content.clauses,
        moves: [],
      })
    }
    expect(await list(engineer, { relationshipId: second.id })).toEqual([])
    expect(await list(stranger)).toEqual([])
    expect((await refused(act(stranger, houseTerms.readHouseTerms, first.id))).status).toBe(404)
    const body = { ...content, expectedVersion: published.rowVersion }
    for (const [endpoint, sent] of [
      [houseTerms.saveHouseTerms, body],
      [houseTerms.publishHouseTerms, { expectedVersion: published.rowVersion }],
      [houseTerms.discardHouseTerms, { expectedVersion: published.rowVersion }],
    ] as const)
      expect(await refused(act(quality, endpoint, first.id, sent))).toMatchObject({
        status: 409,
        code: 'wrong-state',
      })
    // Nor past the services.
    const { rowCount } = await world.harness.inTenant(
      'customer',
      world.customer,
      quality.person,
      [],
      ({ tx }) => tx.execute(`update house_terms set words = 'other' where id = '${first.id}'`),
    )
    expect(rowCount).toBe(0)
    first = published
  })

  it('of which later ones are published stay readable; the newest is what is offered', async () => {
    const next = await act(quality, houseTerms.beginHouseTerms, '', { ...content, clauses: [equivalence()] })
    expect(await list(engineer)).toHaveLength(1)
    const published = await act(quality, houseTerms.publishHouseTerms, next.id, { expectedVersion: 1 })
    expect(published.number).toBe(2)
    expect((await list(engineer)).map(({ number, current }) => [number, current])).toEqual([
      [2, true],
      [1, false],
    ])
    expect((await list(engineer, { show: 'current' })).map(({ number }) => number)).toEqual([2])
    for (const who of [engineer, quality])
      expect(
        await world.harness.inTenant(who.side, who.organisation, who.person, [], (tenant) =>
          houseTermsFor(tenant, world.relationship.id),
        ),
      ).toMatchObject({ id: next.id, number: 2, clauses: [equivalence()], terms: { validityMonths: 12 } })
    const empty = await act(quality, houseTerms.beginHouseTerms, '', { clauses: [] })
    expect(empty.moves).toEqual(['keep-draft', 'discard-draft'])
    expect(
      await refused(act(quality, houseTerms.publishHouseTerms, empty.id, { expectedVersion: 1 })),
    ).toMatchObject({ status: 409, code: 'says-nothing' })
    await act(quality, houseTerms.discardHouseTerms, empty.id, { expectedVersion: 1 })
    expect(await list(quality)).toHaveLength(2)
    const events = await world.harness.owner.query<{ type: string }>(
      `select type from record_events where chain_id = $1 and type like 'house-terms.%' order by sequence`,
      [world.customer.id],
    )
    expect(events.rows.map(({ type }) => type).filter((type) => type !== 'house-terms.draft-kept')).toEqual([
      'house-terms.drafted',
      'house-terms.published',
      'house-terms.drafted',
      'house-terms.published',
      'house-terms.drafted',
      'house-terms.draft-discarded',
    ])
  })
})

const offerTo = (...relationships: { id: string }[]) => ({
  relationshipIds: relationships.map(({ id }) => id),
  effectiveOn: '2027-01-01',
  comment: 'For everybody.',
})

describe('house terms offered', () => {
  it('begin a proposal in each relationship, with their number; where one cannot, the reason is told', async () => {
    const [current] = await list(quality)
    const id = current?.id ?? ''
    await world.begin(engineer, { clauses: [ruleOfTen], effectiveOn: '2027-01-01', send: true })
    const foreign = await world.harness.relationship(world.strangers, world.supplier)
    const answer = await act(
      quality,
      houseTerms.offerHouseTerms,
      id,
      offerTo(world.relationship, second, foreign),
    )
    expect(answer.offered).toHaveLength(1)
    expect(answer.offered).toMatchObject([{ relationshipId: second.id }])
    expect(new Map(answer.refused.map(({ relationshipId, code }) => [relationshipId, code]))).toEqual(
      new Map([
        [world.relationship.id, 'negotiation-open'],
        [foreign.id, 'not-found'],
      ]),
    )
    const agreement = await world.read(other, answer.offered[0]?.agreementId ?? '')
    expect(agreement).toMatchObject({ scope: { kind: 'relationship' }, customer: { name: 'Nordhof Drives' } })
    expect(newest(agreement)).toMatchObject({
      state: 'proposed',
      waitsOn: ['supplier'],
      rounds: [
        {
          clauses: [equivalence()],
          terms: { ...noTerms, validityMonths: 12 },
          houseTerms: { id, number: 2 },
          comment: 'For everybody.',
        },
      ],
    })
    const { rows } = await world.harness.owner.query<{ subject: string }>(
      'select subject from messages where user_id = $1',
      [other.person.id],
    )
    expect(rows.map(({ subject }) => subject.split('.')[0])).toEqual(['Criteria are proposed to you'])
    const again = await act(quality, houseTerms.offerHouseTerms, id, offerTo(second))
    expect(again).toEqual({ offered: [], refused: [{ relationshipId: second.id, code: 'negotiation-open' }] })
    expect(
      await refused(
        act(quality, houseTerms.offerHouseTerms, id, { ...offerTo(third), effectiveOn: '2026-01-01' }),
      ),
    ).toMatchObject({ status: 422, errors: [{ path: 'body.effectiveOn' }] })
    expect(await refused(act(engineer, houseTerms.offerHouseTerms, id, offerTo(third)))).toMatchObject({
      status: 404,
    })
  })

  it('are what a supplier may begin from itself, of its own customer’s alone', async () => {
    const [current, earlier] = await list(engineer)
    const part = await world.part('from-house-terms')
    await world.characteristic(part, 1)
    const begun = await world.begin(engineer, {
      ...{ partId: part.id, clauses: [equivalence(0.1)], effectiveOn: '2027-01-01', send: true },
      houseTermsId: earlier?.id,
    })
    expect(newest(begun).rounds[0]?.houseTerms).toEqual({ id: earlier?.id, number: 1 })
    const elsewhere = await world
      .as(world.actors.strangerAsCustomer)
      .call(houseTerms.beginHouseTerms, world.inside(world.actors.strangerAsCustomer), { body: content })
    const draft = await act(quality, houseTerms.beginHouseTerms, '', content)
    const free = await world.part('from-others')
    await world.characteristic(free, 1)
    for (const houseTermsId of [elsewhere.id, draft.id])
      expect(
        await refused(
          world.begin(quality, {
            houseTermsId,
            clauses: [zeroTest()],
            effectiveOn: '2027-01-01',
            partId: free.id,
          }),
        ),
      ).toMatchObject({ status: 422, errors: [{ path: 'body.houseTermsId' }] })
    expect(current?.number).toBe(2)
  })

  it('bind nobody: no clause of them is a criterion before both sides signed', async () => {
    const { organisation, person } = other
    const place = { relationshipId: second.id, partId: randomUUID(), characteristicId: randomUUID() }
    const applied = () =>
      world.harness.inTenant('supplier', organisation, person, [], (tenant) =>
        criteriaFor(tenant, { ...place, on: '2027-06-01' }),
      )
    expect(await applied()).toEqual([])
    const found = await world.as(other).call(agreements.listAgreements, world.inside(other))
    expect(found.items).toMatchObject([{ newest: { state: 'proposed' }, inForce: null }])
  })
})
