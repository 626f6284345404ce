import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { agreements, characteristics, gauges, tasks, type parts, type Role } from '@evenrule/api/contract'
import type { Clause } from '@evenrule/metrology'
import type { Tenant } from '../../packages/api/src/server/db/tenant'
import {
  criteriaFor,
  criteriaSince,
} from '../../packages/api/src/server/modules/agreements/agreements.apply.service'
import { sign } from '../../packages/api/src/server/modules/agreements/agreements.sign.service'
import { changeCharacteristicOf } from '../../packages/api/src/server/modules/parts/characteristics.service'
import {
  equivalence,
  newest,
  readings,
  ruleOfTen,
  startWorld,
  zeroTest,
  type Actor,
  type Answer,
  type World,
} from './agreements.world'

let world: World
let engineer: Actor, quality: Actor, supplierApprover: Actor, customerApprover: Actor

beforeAll(async () => {
  world = await startWorld()
  ;({ engineer, quality, supplierApprover, customerApprover } = world.actors)
})
afterAll(() => world.harness.stop())

interface Place {
  partId: string
  characteristicId: string
}
const newPlace = async (number: string): Promise<Place & { part: parts.Part }> => {
  const part = await world.part(number)
  const { id } = await world.characteristic(part, 1)
  return { part, partId: part.id, characteristicId: id }
}
const applied = async ({ partId, characteristicId }: Place, on: string, as = engineer) => {
  const scope = { relationshipId: world.relationship.id, partId, characteristicId, on }
  return world.harness.inTenant(as.side, as.organisation, as.person, [], async (tenant) => ({
    criteria: await criteriaFor(tenant, scope),
    since: await criteriaSince(tenant, scope),
  }))
}
const typesOf = ({ criteria }: { criteria: { clause: { type: string } }[] }) =>
  criteria.map(({ clause }) => clause.type)

describe('dates, judged in the relationship’s time zone', () => {
  it('put a signed version into force from its day on, at midnight there', async () => {
    world.harness.moveClock('2026-11-02T09:00:00.000Z')
    const at = await newPlace('in-force')
    const signed = await world.agree({
      partId: at.partId,
      clauses: [zeroTest()],
      effectiveOn: '2026-11-05',
    })
    expect(newest(signed).state).toBe('signed')
    expect(await applied(at, '2026-11-04')).toEqual({ criteria: [], since: null })
    expect(await applied(at, '2026-11-05')).toMatchObject({
      criteria: [{ clauseKey: 'bias/mean', versionNumber: 1, scope: 'part' }],
      since: '2026-11-05',
    })
    // Midnight in Berlin is 23:00 in UTC the day before.
    world.harness.moveClock('2026-11-04T22:59:59.000Z')
    expect(newest(await world.read(quality, signed.id)).state).toBe('signed')
    world.harness.moveClock('2026-11-04T23:00:00.000Z')
    const begun = await world.read(quality, signed.id)
    expect(begun).toMatchObject({ today: '2026-11-05', inForce: { number: 1, effectiveOn: '2026-11-05' } })
    expect(newest(begun).state).toBe('in-force')
    const [row] = (await world.list(quality, { partId: at.partId })).items
    expect(row).toMatchObject({ newest: { state: 'in-force' }, inForce: { number: 1 }, waitsOn: [] })
  })

  it('keep the old version in force until the day of the next, which then supersedes it', async () => {
    world.harness.moveClock('2026-11-10T09:00:00.000Z')
    const at = await newPlace('superseded')
    const scope = { partId: at.partId }
    await world.agree({ ...scope, clauses: [zeroTest(), readings(10)], effectiveOn: '2026-11-10' })
    const second = await world.agree({ ...scope, clauses: [equivalence()], effectiveOn: '2026-11-20' })
    const states = async () =>
      (await world.read(engineer, second.id)).versions.map(({ number, state }) => [number, state])
    expect(await states()).toEqual([
      [2, 'signed'],
      [1, 'in-force'],
    ])
    expect(typesOf(await applied(at, '2026-11-19'))).toEqual(['design-minimum', 'bias-zero-test'])
    expect(typesOf(await applied(at, '2026-11-20'))).toEqual(['bias-equivalence'])
    world.harness.moveClock('2026-11-19T23:30:00.000Z')
    expect(await states()).toEqual([
      [2, 'in-force'],
      [1, 'superseded'],
    ])
    // Superseded without a gap: attempts still count from the first day.
    expect((await applied(at, '2026-11-25')).since).toBe('2026-11-10')
    expect((await applied(at, '2026-11-12')).since).toBe('2026-11-10')
  })

  it('let a later version that begins earlier replace one that has not begun', async () => {
    world.harness.moveClock('2026-11-10T09:00:00.000Z')
    const at = await newPlace('overtaken')
    const scope = { partId: at.partId }
    const first = await world.agree({ ...scope, clauses: [zeroTest()], effectiveOn: '2027-01-01' })
    await world.agree({ ...scope, clauses: [equivalence()], effectiveOn: '2026-12-01' })
    expect(await applied(at, '2026-12-15')).toMatchObject({
      criteria: [{ clause: equivalence(), versionNumber: 2 }],
      since: '2026-12-01',
    })
    expect(typesOf(await applied(at, '2027-02-01'))).toEqual(['bias-equivalence'])
    world.harness.moveClock('2026-12-02T09:00:00.000Z')
    expect((await world.read(quality, first.id)).versions.map(({ state }) => state)).toEqual([
      'in-force',
      'superseded',
    ])
  })

  it('let an agreed version lapse that both did not sign in time; it never applies, and a new one may begin', async () => {
    world.harness.moveClock('2026-11-10T09:00:00.000Z')
    const at = await newPlace('lapsed')
    const proposed = await world.begin(quality, {
      partId: at.partId,
      clauses: [zeroTest()],
      effectiveOn: '2026-11-12',
      send: true,
    })
    const agreed = await world.accept(engineer, proposed, newest(proposed))
    const once = await world.sign(supplierApprover, agreed, newest(agreed))
    world.harness.moveClock('2026-11-12T22:59:00.000Z')
    expect(newest(await world.read(customerApprover, once.id))).toMatchObject({
      state: 'agreed',
      waitsOn: ['customer'],
      hindrances: [],
    })
    world.harness.moveClock('2026-11-12T23:00:00.000Z')
    const late = await world.read(customerApprover, once.id)
    expect(newest(late)).toMatchObject({ state: 'lapsed', waitsOn: [], moves: [], hindrances: [] })
    expect(late.mayBegin).toBe(true)
    expect((await world.list(quality, { state: 'lapsed' })).items.map(({ id }) => id)).toEqual([once.id])
    world.harness.signInAfresh(customerApprover.person)
    const refused = await world
      .as(customerApprover)
      .send('post', world.path(customerApprover, late, newest(late), 'sign'))
      .send({ expectedVersion: newest(late).rowVersion, sha256: newest(late).sha256 })
    expect(refused.body).toMatchObject({ status: 409, code: 'wrong-state' })
    expect(refused.body.detail).toContain('lapsed')
    expect((await applied(at, '2026-12-31')).criteria).toEqual([])
    const next = await world.agree({
      partId: at.partId,
      clauses: [zeroTest()],
      effectiveOn: '2026-11-13',
    })
    expect(next).toMatchObject({ id: once.id })
    expect(next.versions.map(({ number, state }) => [number, state])).toEqual([
      [2, 'in-force'],
      [1, 'lapsed'],
    ])
  })

  it('may not lie in the past when a proposal is sent, accepted or signed', async () => {
    world.harness.moveClock('2026-11-10T09:00:00.000Z')
    const at = await newPlace('past')
    const yesterday = await world
      .as(quality)
      .send('post', `/organisations/${world.customer.id}/agreements`)
      .send({
        relationshipId: world.relationship.id,
        partId: at.partId,
        clauses: [zeroTest()],
        effectiveOn: '2026-11-09',
        send: true,
      })
    expect(yesterday.body).toMatchObject({ status: 422, errors: [{ path: 'body.effectiveOn' }] })
    const proposed = await world.begin(quality, {
      partId: at.partId,
      clauses: [zeroTest()],
      effectiveOn: '2026-11-10',
      send: true,
    })
    world.harness.moveClock('2026-11-11T09:00:00.000Z')
    const seen = await world.read(engineer, proposed.id)
    expect(newest(seen).hindrances).toEqual([{ move: 'accept', code: 'effective-date-past' }])
    const accepted = await world
      .as(engineer)
      .send('post', world.path(engineer, seen, newest(seen), 'accept'))
      .send({ expectedVersion: newest(seen).rowVersion })
    expect(accepted.body).toMatchObject({ status: 409, code: 'effective-date-past' })
    const late = await world
      .as(engineer)
      .send('post', world.path(engineer, seen, newest(seen), 'answer'))
      .send({
        expectedVersion: newest(seen).rowVersion,
        clauses: [zeroTest()],
        effectiveOn: '2026-11-10',
        send: true,
      })
    expect(late.body).toMatchObject({ status: 422, errors: [{ path: 'body.effectiveOn' }] })
    // The refused answer left no draft behind.
    expect(newest(await world.read(engineer, proposed.id)).rounds).toHaveLength(1)
  })
})

describe('scopes', () => {
  it('of narrower agreements replace the clauses of wider ones, subject by subject', async () => {
    world.harness.moveClock('2026-11-10T09:00:00.000Z')
    const at = await newPlace('narrow')
    const sibling = { ...at, characteristicId: (await world.characteristic(at.part, 2)).id }
    const elsewhere = await newPlace('narrow-elsewhere')
    const day = { effectiveOn: '2026-11-10' }
    const wide = await world.agree({ clauses: [zeroTest(), ruleOfTen, readings(10)], ...day })
    const ofPart = await world.agree({ partId: at.partId, clauses: [readings(20)], ...day })
    const ofOne = await world.agree({
      characteristicId: at.characteristicId,
      clauses: [equivalence()],
      effectiveOn: '2026-11-12',
    })
    const seen = async (place: Place, on: string) =>
      (await applied(place, on)).criteria.map(({ clause, scope, agreementNumber }) => [
        clause.type,
        scope,
        agreementNumber,
      ])
    expect(await seen(at, '2026-11-12')).toEqual([
      ['design-minimum', 'part', ofPart.number],
      ['resolution-share', 'relationship', wide.number],
      ['bias-equivalence', 'characteristic', ofOne.number],
    ])
    expect(await seen(at, '2026-11-11')).toEqual([
      ['design-minimum', 'part', ofPart.number],
      ['resolution-share', 'relationship', wide.number],
      ['bias-zero-test', 'relationship', wide.number],
    ])
    expect(await seen(sibling, '2026-11-12')).toEqual([
      ['design-minimum', 'part', ofPart.number],
      ['resolution-share', 'relationship', wide.number],
      ['bias-zero-test', 'relationship', wide.number],
    ])
    expect((await seen(elsewhere, '2026-11-12')).map(([, scope]) => scope)).toEqual([
      'relationship',
      'relationship',
      'relationship',
    ])
    const [first] = (await applied(at, '2026-11-12')).criteria
    expect(first).toEqual({
      clauseKey: 'design/readings',
      clause: readings(20),
      agreementId: ofPart.id,
      agreementNumber: ofPart.number,
      versionId: newest(ofPart).id,
      versionNumber: 1,
      versionSha256: newest(ofPart).sha256,
      effectiveOn: '2026-11-10',
      scope: 'part',
    })
    // Both sides read the same, strangers nothing.
    expect(await applied(at, '2026-11-12', quality)).toEqual(await applied(at, '2026-11-12', engineer))
    expect(await applied(at, '2026-11-12', world.actors.stranger)).toEqual({ criteria: [], since: null })
    expect(await applied(at, '2026-11-12', { ...quality, side: 'supplier' })).toEqual({
      criteria: [],
      since: null,
    })
    const withdrawn = await world.begin(quality, {
      partId: at.partId,
      clauses: [readings(30)],
      send: true,
      ...day,
    })
    await world.withdraw(quality, withdrawn, newest(withdrawn))
    expect(await seen(at, '2026-11-12')).toHaveLength(3)
  })

  it('are asked for by measuring task, on a day or today', async () => {
    world.harness.moveClock('2026-11-14T23:30:00.000Z')
    const at = await newPlace('by-task')
    await world.agree({
      characteristicId: at.characteristicId,
      clauses: [equivalence(), readings(25)],
      effectiveOn: '2026-11-20',
    })
    const gauge = await world.as(engineer).call(gauges.createGauge, world.inside(engineer), {
      body: { code: 'BG-1', name: 'Bore gauge', resolution: '0.001', unit: 'mm' },
    })
    const task = await world.as(engineer).call(tasks.createTask, world.inside(engineer), {
      body: { characteristicId: at.characteristicId, gaugeId: gauge.id },
    })
    const ask = (who: Actor, query: object = {}) =>
      world
        .as(who)
        .call(agreements.readCriteria, world.inside(who, { taskId: task.id }), { query: { ...query } })
    expect((await ask(engineer)).on).toBe('2026-11-15')
    const later = await ask(quality, { on: '2026-11-20' })
    expect(
      later.criteria.filter(({ scope }) => scope === 'characteristic').map(({ clause }) => clause),
    ).toEqual([readings(25), equivalence()])
    const foreign = await world
      .as(world.actors.stranger)
      .send('get', `/organisations/${world.strangers.id}/tasks/${task.id}/criteria`)
    expect(foreign.status).toBe(404)
    const noDay = await world
      .as(engineer)
      .send('get', `/organisations/${world.supplier.id}/tasks/${task.id}/criteria?on=tomorrow`)
    expect(noDay.body).toMatchObject({ status: 422, errors: [{ path: 'query.on' }] })
  })
})

describe('limits', () => {
  const limits = {
    number: 1,
    name: 'Bore Ø',
    nominal: '24.000',
    lowerLimit: '23.975',
    unit: 'mm',
    class: 'significant',
  } as const
  const change = (characteristicId: string, expectedVersion: number, upperLimit: string) =>
    world
      .as(quality)
      .send('put', `/organisations/${world.customer.id}/characteristics/${characteristicId}`)
      .send({ ...limits, upperLimit, expectedVersion })
  const agreedFor = async (scope: object): Promise<Answer> => {
    const body = { clauses: [equivalence()], effectiveOn: '2027-03-01', send: true, ...scope }
    const proposed = await world.begin(quality, body)
    return world.accept(engineer, proposed, newest(proposed))
  }
  const trySign = (who: Actor, agreement: Answer) => {
    world.harness.signInAfresh(who.person)
    const { sha256, rowVersion } = newest(agreement)
    return world
      .as(who)
      .send('post', world.path(who, agreement, newest(agreement), 'sign'))
      .send({ expectedVersion: rowVersion, sha256 })
  }

  it('that changed after the agreement are not signed', async () => {
    const at = await newPlace('changed-limits')
    const agreed = await agreedFor({ characteristicId: at.characteristicId })
    expect((await change(at.characteristicId, 1, '24.030')).status).toBe(200)
    expect(newest(await world.read(supplierApprover, agreed.id)).hindrances).toEqual([
      { move: 'sign', code: 'limits-changed' },
    ])
    expect((await trySign(supplierApprover, agreed)).body).toMatchObject({
      status: 409,
      code: 'limits-changed',
    })
    expect((await change(at.characteristicId, 2, '24.025')).status).toBe(200)
    expect((await trySign(supplierApprover, agreed)).status).toBe(200)
  })

  it('of a characteristic added to the part after the agreement are not signed either', async () => {
    const at = await newPlace('added')
    const agreed = await agreedFor({ partId: at.partId })
    await world.characteristic(at.part, 2)
    expect((await trySign(supplierApprover, agreed)).body).toMatchObject({ code: 'limits-changed' })
  })

  it('are frozen by the second signature, whatever the scope', async () => {
    const one = await newPlace('frozen-one')
    const agreed = await agreedFor({ characteristicId: one.characteristicId })
    const once = await world.sign(supplierApprover, agreed, newest(agreed))
    const frozen = () =>
      world
        .as(engineer)
        .call(
          characteristics.readCharacteristic,
          world.inside(engineer, { characteristicId: one.characteristicId }),
        )
        .then(({ limitsFrozen }) => limitsFrozen)
    // The relationship-wide agreement of another test came first; this characteristic is younger.
    expect(await frozen()).toBe(false)
    await world.sign(customerApprover, once, newest(once))
    expect(await frozen()).toBe(true)
    expect((await change(one.characteristicId, 1, '24.030')).body).toMatchObject({
      status: 409,
      code: 'limits-frozen',
    })
  })

  it('take the spread of the process with them where a clause takes a share of it', async () => {
    const part = await world.part('spread')
    const spread = { processStandardDeviation: '0.004' }
    const [one, two] = [
      await world.characteristic(part, 1, spread),
      await world.characteristic(part, 2, spread),
    ]
    const ofProcess: Clause = { type: 'resolution-share', parameters: { share: 0.1, base: 'process' } }
    const body = { effectiveOn: '2027-03-01' }
    const agreed = await world.agree({ ...body, characteristicId: one.id, clauses: [ofProcess] })
    await world.agree({ ...body, characteristicId: two.id, clauses: [equivalence()] })
    const widen = (id: string, number: number) =>
      world
        .as(engineer)
        .send('put', `/organisations/${world.supplier.id}/characteristics/${id}`)
        .send({
          ...limits,
          number,
          upperLimit: '24.025',
          processStandardDeviation: '0.040',
          expectedVersion: 1,
        })
    const refused = await widen(one.id, 1)
    expect(refused.body).toMatchObject({ status: 409, code: 'spread-frozen' })
    expect(refused.body.detail).toContain(`Agreement ${agreed.number} `)
    expect((await widen(two.id, 2)).status).toBe(200)
    // It stands in for the width of a one-sided tolerance too, where that was agreed.
    const three = await world.characteristic(part, 3, { ...spread, lowerLimit: null, nominal: null })
    const baseline: Clause = {
      type: 'bias-equivalence',
      parameters: {
        margin: { base: 'tolerance', share: 0.1, baseline: { kind: 'process' } },
        confidence: 0.95,
      },
    }
    await world.agree({ ...body, characteristicId: three.id, clauses: [baseline] })
    const upper = { ...limits, lowerLimit: null, nominal: null, upperLimit: '24.025' }
    const again = await world
      .as(engineer)
      .send('put', `/organisations/${world.supplier.id}/characteristics/${three.id}`)
      .send({ ...upper, number: 3, processStandardDeviation: '0.040', expectedVersion: 1 })
    expect(again.body).toMatchObject({ status: 409, code: 'spread-frozen' })
  })

  /** Work in a transaction of the customer that stays open until `release`. */
  const heldOpen = (work: (tenant: Tenant) => Promise<unknown>) => {
    let release = () => {}
    const gate = new Promise<void>((resolve) => (release = resolve))
    let begun = () => {}
    const working = new Promise<void>((resolve) => (begun = resolve))
    const roles: Role[] = ['quality-representative', 'customer-approver']
    const done = world.harness.inTenant(
      'customer',
      world.customer,
      customerApprover.person,
      roles,
      async (tenant) => {
        await work(tenant)
        begun()
        await gate
      },
    )
    return { working, done, release }
  }
  const pending = Symbol('pending')
  const soon = () => new Promise((resolve) => setTimeout(() => resolve(pending), 300))

  it.each(['part', 'characteristic'])(
    'wait for each other’s end: a change on its way keeps the last signature of a %s waiting, then refuses it',
    async (kind) => {
      const at = await newPlace(`change-first-${kind}`)
      const agreed = await agreedFor(
        kind === 'part' ? { partId: at.partId } : { characteristicId: at.characteristicId },
      )
      const once = await world.sign(supplierApprover, agreed, newest(agreed))
      const changing = heldOpen((tenant) =>
        changeCharacteristicOf(tenant, at.characteristicId, {
          ...limits,
          upperLimit: '24.030',
          processStandardDeviation: null,
          expectedVersion: 1,
        }),
      )
      await changing.working
      const signing = trySign(customerApprover, once).then((answer) => answer)
      expect(await Promise.race([signing, soon()])).toBe(pending)
      changing.release()
      await changing.done
      expect((await signing).body).toMatchObject({ status: 409, code: 'limits-changed' })
    },
  )

  it('wait for each other’s end: a signature on its way keeps a change waiting, then refuses it', async () => {
    const at = await newPlace('signature-first')
    const agreed = await agreedFor({ partId: at.partId })
    const once = await world.sign(supplierApprover, agreed, newest(agreed))
    const { id: versionId, rowVersion: expectedVersion, sha256 } = newest(once)
    const signing = heldOpen((tenant) =>
      sign(tenant, { agreementId: once.id, versionId }, { expectedVersion, sha256: sha256 ?? '' }),
    )
    await signing.working
    const changing = change(at.characteristicId, 1, '24.030').then((answer) => answer)
    const adding = world.characteristic(at.part, 2)
    expect(await Promise.race([changing, adding, soon()])).toBe(pending)
    signing.release()
    await signing.done
    expect((await changing).body).toMatchObject({ status: 409, code: 'limits-frozen' })
    expect((await adding).number).toBe(2)
  })
})

describe('the database itself', () => {
  it('changes nothing of a signed version, and deletes nothing that was sent', async () => {
    const at = await newPlace('immutable')
    const signed = await world.agree({
      partId: at.partId,
      clauses: [zeroTest()],
      effectiveOn: '2027-01-01',
    })
    const { id } = newest(signed)
    const statements = [
      `update agreement_versions set text = '{}' where id = '${id}'`,
      `delete from agreement_versions where id = '${id}'`,
      `delete from agreement_rounds where version_id = '${id}'`,
      `delete from agreements where id = '${signed.id}'`,
    ]
    for (const statement of statements) {
      const { rowCount } = await world.harness.inTenant(
        'customer',
        world.customer,
        quality.person,
        [],
        ({ tx }) => tx.execute(statement),
      )
      expect(rowCount, statement).toBe(0)
    }
    for (const statement of [
      `update agreement_signatures set sha256 = 'x' where version_id = '${id}'`,
      `delete from agreement_signatures where version_id = '${id}'`,
    ])
      await expect(
        world.harness.inTenant('customer', world.customer, quality.person, [], ({ tx }) =>
          tx.execute(statement),
        ),
      ).rejects.toMatchObject({ cause: { code: '42501' } })
  })

  it('lets neither side sign in the other’s name', async () => {
    const at = await newPlace('forged')
    const proposed = await world.begin(quality, {
      partId: at.partId,
      clauses: [zeroTest()],
      effectiveOn: '2027-01-01',
      send: true,
    })
    const { id } = newest(proposed)
    const { supplier, customer, relationship } = world
    await expect(
      world.harness.inTenant('customer', customer, quality.person, [], ({ tx }) =>
        tx.execute(
          `insert into agreement_signatures (id, relationship_id, supplier_org_id, customer_org_id, version_id, side, user_id, sha256, signed_at, authenticated_at)
           values (gen_random_uuid(), '${relationship.id}', '${supplier.id}', '${customer.id}', '${id}', 'supplier', '${quality.person.id}', 'x', now(), now())`,
        ),
      ),
    ).rejects.toMatchObject({ cause: { code: '42501' } })
  })
})
