import { clauseKey, type Clause } from '@evenrule/metrology'
import fc from 'fast-check'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import {
  agreements,
  defaultTerms,
  gauges,
  noTerms,
  tasks,
  termFields,
  type Terms,
} from '@evenrule/api/contract'
import {
  criteriaFor,
  termsFor,
} from '../../packages/api/src/server/modules/agreements/agreements.apply.service'
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
let engineer: Actor, quality: Actor, supplierApprover: Actor

beforeAll(async () => {
  world = await startWorld()
  ;({ engineer, quality, supplierApprover } = world.actors)
})
afterAll(() => world.harness.stop())

const takesAway = (key: string, reason = 'Checked by the maker.'): Clause => ({
  type: 'does-not-apply',
  parameters: { key, reason },
})

interface Place {
  partId: string
  characteristicId: string
  otherCharacteristicId: string
  taskId: string
}
let places = 0
async function newPlace(): Promise<Place> {
  places += 1
  const part = await world.part(`why-${places}`)
  const { id: characteristicId } = await world.characteristic(part, 1)
  const { id: otherCharacteristicId } = await world.characteristic(part, 2)
  const gauge = await world.as(engineer).call(gauges.createGauge, world.inside(engineer), {
    body: { code: `BG-${places}`, name: 'Bore gauge', resolution: '0.001', unit: 'mm' },
  })
  const task = await world.as(engineer).call(tasks.createTask, world.inside(engineer), {
    body: { characteristicId, gaugeId: gauge.id, site: 'Hall 1' },
  })
  return { partId: part.id, characteristicId, otherCharacteristicId, taskId: task.id }
}
const why = (who: Actor, taskId: string, on?: string) =>
  world.as(who).call(agreements.explainCriteria, world.inside(who, { taskId }), { query: on ? { on } : {} })
const scopeOf = ({ partId, characteristicId }: Place, on: string) => ({
  relationshipId: world.relationship.id,
  partId,
  characteristicId,
  on,
})
const applied = (place: Place, on: string, as = engineer) =>
  world.harness.inTenant(as.side, as.organisation, as.person, [], async (tenant) => ({
    criteria: await criteriaFor(tenant, scopeOf(place, on)),
    terms: await termsFor(tenant, scopeOf(place, on)),
  }))

describe('what applies to a measuring task, and why', () => {
  it('names what counts, and for everything else the reason', async () => {
    world.harness.moveClock('2026-11-02T09:00:00.000Z')
    const place = await newPlace()
    const { partId, characteristicId, otherCharacteristicId, taskId } = place
    const wide = await world.agree({
      clauses: [readings(15), ruleOfTen, zeroTest()],
      terms: { validityMonths: 24, readingsTakerMaySign: true },
      effectiveOn: '2026-11-02',
    })
    const old = await world.agree({ partId, clauses: [equivalence(0.2)], effectiveOn: '2026-11-03' })
    const ofPart = await world.agree({
      partId,
      clauses: [equivalence(0.1), readings(25)],
      terms: { validityMonths: 12 },
      effectiveOn: '2026-11-10',
    })
    await world.agree({ partId, clauses: [equivalence(0.05)], effectiveOn: '2027-03-01' })
    const one = await world.agree({
      characteristicId,
      clauses: [takesAway('resolution/share')],
      effectiveOn: '2026-11-10',
    })
    const sibling = await world.agree({
      characteristicId: otherCharacteristicId,
      clauses: [zeroTest(0.01)],
      effectiveOn: '2026-11-10',
    })
    const open = await world.begin(quality, {
      characteristicId,
      clauses: [equivalence(0.02)],
      effectiveOn: '2026-12-24',
      send: true,
    })
    const far = await newPlace()
    await world.agree({ partId: far.partId, clauses: [readings(99)], effectiveOn: '2026-11-10' })

    const told = await why(engineer, taskId, '2026-11-20')
    expect(await why(quality, taskId, '2026-11-20')).toEqual(told)
    expect(told).toMatchObject({
      on: '2026-11-20',
      today: '2026-11-02',
      since: '2026-11-02',
      ...{ partId, characteristicId, relationshipId: world.relationship.id },
      elsewhere: { total: 2, named: 2 },
    })
    expect(told.clauses.map(({ clauseKey: key, applies }) => [key, applies])).toEqual([
      ['design/readings', true],
      ['resolution/share', false],
      ['bias/mean', true],
    ])
    const [design, resolution, bias] = told.clauses
    expect(design).toMatchObject({
      winner: {
        clause: readings(25),
        source: {
          agreementId: ofPart.id,
          versionNumber: 2,
          effectiveOn: '2026-11-10',
          scope: { kind: 'part' },
        },
      },
      others: [
        {
          clause: readings(15),
          source: { agreementId: wide.id, scope: { kind: 'relationship' } },
          why: {
            code: 'wider-scope',
            by: { agreementNumber: ofPart.number, versionNumber: 2, scope: 'part' },
          },
        },
        { clause: readings(99), why: { code: 'other-part' } },
      ],
    })
    expect(resolution).toMatchObject({
      winner: { clause: takesAway('resolution/share'), source: { agreementId: one.id } },
      others: [
        {
          clause: ruleOfTen,
          why: {
            code: 'does-not-apply',
            reason: 'Checked by the maker.',
            by: { agreementNumber: one.number, scope: 'characteristic' },
          },
        },
      ],
    })
    expect(bias?.winner).toMatchObject({ clause: equivalence(0.1), source: { agreementId: ofPart.id } })
    expect(
      bias?.others.map(({ clause, source, why: reason }) => [clause, source.agreementId, reason.code]),
    ).toEqual([
      [zeroTest(), wide.id, 'wider-scope'],
      [equivalence(0.05), ofPart.id, 'not-yet-in-force'],
      [equivalence(0.2), old.id, 'superseded'],
      [equivalence(0.02), open.id, 'not-signed'],
      [zeroTest(0.01), sibling.id, 'other-characteristic'],
    ])
    expect(bias?.others.map(({ why: reason }) => reason)).toMatchObject([
      {},
      { effectiveOn: '2027-03-01' },
      { by: { versionNumber: 2 }, since: '2026-11-10' },
      { state: 'proposed', signedBy: [] },
      {},
    ])
    const term = Object.fromEntries(told.terms.map((each) => [each.field, each]))
    expect(term.validityMonths).toMatchObject({
      value: 12,
      source: { agreementId: ofPart.id },
      others: [{ value: 24, why: { code: 'wider-scope', by: { scope: 'part' } } }],
    })
    expect(term.readingsTakerMaySign).toMatchObject({
      value: true,
      source: { agreementId: wide.id },
      others: [],
    })
    expect(term.moved).toMatchObject({ value: 'stays', source: null, others: [] })

    // The very same is what judges, with the first day of each criterion.
    const { criteria, terms } = await applied(place, '2026-11-20')
    expect(criteria.map(({ clause, effectiveOn }) => [clause, effectiveOn])).toEqual([
      [readings(25), '2026-11-10'],
      [equivalence(0.1), '2026-11-10'],
    ])
    expect(terms.values).toEqual({ ...defaultTerms, validityMonths: 12, readingsTakerMaySign: true })

    // On an earlier day the reasons are those of that day.
    const before = await why(engineer, taskId, '2026-11-05')
    expect(before.clauses.find(({ clauseKey: key }) => key === 'bias/mean')).toMatchObject({
      winner: { clause: equivalence(0.2), source: { versionNumber: 1, state: 'signed' } },
    })
    expect(before.clauses.find(({ clauseKey: key }) => key === 'resolution/share')).toMatchObject({
      applies: true,
      winner: { clause: ruleOfTen },
      others: [{ why: { code: 'not-yet-in-force', effectiveOn: '2026-11-10' } }],
    })
    // What was begun later than the day asked about is not named.
    expect((await why(engineer, taskId, '2026-11-01')).clauses).toEqual([])
  })

  it('names the side that has signed, and what has lapsed or was withdrawn', async () => {
    world.harness.moveClock('2026-12-01T09:00:00.000Z')
    const { partId, taskId } = await newPlace()
    const proposal = { partId, clauses: [equivalence()], effectiveOn: '2026-12-10', send: true }
    const withdrawn = await world.begin(quality, proposal)
    await world.withdraw(quality, withdrawn, newest(withdrawn))
    const begun = await world.begin(quality, proposal)
    const agreed = await world.accept(engineer, begun, newest(begun))
    await world.sign(supplierApprover, agreed, newest(agreed))
    const reasons = async () =>
      (await why(quality, taskId)).clauses
        .find(({ clauseKey: key }) => key === 'bias/mean')
        ?.others.filter(({ source }) => source.agreementId === begun.id)
        .map(({ why: reason }) => reason)
    expect(await reasons()).toEqual([
      { code: 'not-signed', state: 'agreed', signedBy: ['supplier'] },
      { code: 'not-signed', state: 'withdrawn', signedBy: [] },
    ])
    world.harness.moveClock('2026-12-11T09:00:00.000Z')
    expect(await reasons()).toMatchObject([
      { state: 'lapsed', signedBy: ['supplier'] },
      { state: 'withdrawn' },
    ])
  })

  it('tells nothing of drafts, nor anything to strangers', async () => {
    world.harness.moveClock('2026-12-12T09:00:00.000Z')
    const { characteristicId, taskId } = await newPlace()
    await world.begin(quality, {
      characteristicId,
      clauses: [takesAway('bias/mean', 'Ours alone.')],
      effectiveOn: '2026-12-24',
    })
    const told = await why(quality, taskId, '2027-01-01')
    expect(JSON.stringify(told)).not.toContain('Ours alone.')
    for (const stranger of [world.actors.stranger, world.actors.strangerAsCustomer])
      await expect(why(stranger, taskId)).rejects.toMatchObject({ status: 404 })
  })
})

/** What this test believes to have been signed, in the order of signing. */
interface Signed {
  width: 0 | 1 | 2
  effectiveOn: string
  clauses: Clause[]
  terms: Terms
}
const day = (offset: number) => new Date(Date.UTC(2027, 0, 10 + offset)).toISOString().slice(0, 10)
const aClauses: fc.Arbitrary<Clause[]> = fc
  .record({
    design: fc.option(fc.integer({ min: 5, max: 40 }).map(readings)),
    resolution: fc.option(fc.constantFrom(ruleOfTen, takesAway('resolution/share'))),
    bias: fc.option(fc.constantFrom(zeroTest(), zeroTest(0.01), equivalence(0.1), takesAway('bias/mean'))),
  })
  .map((found) => Object.values(found).filter((each) => each !== null))
const anAct = fc.record({
  width: fc.constantFrom<0 | 1 | 2>(0, 1, 2),
  inDays: fc.integer({ min: 0, max: 12 }),
  clauses: aClauses,
  terms: fc.record({
    validityMonths: fc.option(fc.oneof(fc.integer({ min: 1, max: 120 }), fc.constant('no-expiry' as const))),
    moved: fc.option(fc.constantFrom('suspended' as const, 'stays' as const)),
  }),
  /** How far it gets: signed by both, agreed, countered, or proposed and withdrawn again. */
  end: fc.constantFrom('signed', 'signed', 'signed', 'half-signed', 'agreed', 'proposed'),
})

/** The rule in other words than the product's: the last signed one begun by then for each width, the narrowest first. */
function modelOf(signed: readonly Signed[], on: string) {
  const layers = ([0, 1, 2] as const).flatMap((width) => {
    const last = signed.filter((each) => each.width === width && each.effectiveOn <= on).at(-1)
    return last ? [last] : []
  })
  const clauses: Clause[] = []
  for (const key of ['design/readings', 'resolution/share', 'bias/mean']) {
    const [first] = layers.flatMap((each) => each.clauses).filter((each) => clauseKey(each) === key)
    if (first && first.type !== 'does-not-apply') clauses.push(first)
  }
  const terms = Object.fromEntries(
    termFields.map((field) => {
      const [first] = layers.map((each) => each.terms[field]).filter((value) => value !== null)
      return [field, first === 'no-expiry' ? null : (first ?? defaultTerms[field])]
    }),
  )
  return { clauses, terms }
}

it('no expiry, said for one characteristic, counts there against a wider validity and nowhere else', async () => {
  world.harness.moveClock('2026-11-02T09:00:00.000Z')
  const place = await newPlace()
  const { partId, characteristicId, otherCharacteristicId, taskId } = place
  const on = '2026-11-02'
  const wide = await world.agree({
    partId,
    clauses: [zeroTest()],
    terms: { validityMonths: 12 },
    effectiveOn: on,
  })
  const narrow = await world.agree({
    characteristicId,
    clauses: [],
    terms: { validityMonths: 'no-expiry' },
    effectiveOn: on,
  })
  expect(JSON.parse(narrow.versions[0]?.text ?? '')).toMatchObject({ terms: { validityMonths: 'no-expiry' } })
  const { terms } = await applied(place, on)
  expect(terms.values.validityMonths).toBeNull()
  const told = await why(engineer, taskId)
  expect(told.terms.find(({ field }) => field === 'validityMonths')).toMatchObject({
    value: null,
    source: { agreementId: narrow.id },
    // Terms of the whole relationship may stand behind these two.
    others: expect.arrayContaining([
      expect.objectContaining({
        value: 12,
        source: expect.objectContaining({ agreementId: wide.id }),
        why: expect.objectContaining({
          code: 'wider-scope',
          by: expect.objectContaining({ scope: 'characteristic' }),
        }),
      }),
    ]),
  })
  const sibling = await applied({ ...place, characteristicId: otherCharacteristicId }, on)
  expect(sibling.terms.values.validityMonths).toBe(12)
})

it('what applies is a function of date and scope, under any history: no unsigned clause ever judges', async () => {
  let compared = 0
  await fc.assert(
    fc.asyncProperty(fc.array(anAct, { minLength: 3, maxLength: 7 }), async (acts) => {
      // Each run in a relationship of its own, so that agreements for the whole of it begin anew.
      const run = await startRun()
      const signed: Signed[] = []
      for (const [at, act] of acts.entries()) {
        world.harness.moveClock(`${day(at)}T09:00:00.000Z`)
        // At the widest scope nothing can be taken away.
        const clauses = act.clauses.filter(({ type }) => act.width < 2 || type !== 'does-not-apply')
        const terms = { ...noTerms, ...act.terms }
        if (clauses.length === 0 && act.terms.validityMonths === null && act.terms.moved === null) continue
        const effectiveOn = day(at + act.inDays)
        await run.play({ ...act, clauses, terms, effectiveOn })
        if (act.end === 'signed') signed.push({ width: act.width, effectiveOn, clauses, terms })
      }
      for (const on of [-1, 0, 2, 4, 6, 9, 14, 30].map(day)) {
        const model = modelOf(signed, on)
        const found = await run.applied(on)
        expect(found.criteria.map(({ clause }) => clause)).toEqual(model.clauses)
        expect(found.terms.values).toEqual(model.terms)
        const told = await run.why(on)
        expect(told.clauses.filter(({ applies }) => applies).map(({ winner }) => winner?.clause)).toEqual(
          model.clauses,
        )
        expect(Object.fromEntries(told.terms.map(({ field, value }) => [field, value]))).toEqual(model.terms)
        compared += model.clauses.length
      }
    }),
    { numRuns: 8, seed: 20261201 },
  )
  expect(compared).toBeGreaterThan(50)
}, 300_000)

let runs = 0
/** Two companies of one run, with one measuring task, and histories played between them. */
async function startRun() {
  runs += 1
  const { harness, people } = world
  const supplier = await harness.organisation(`Run supplier ${runs}`, [
    [people.engineer, ['gauge-engineer']],
    [people.supplierApprover, ['supplier-approver']],
  ])
  const relationship = await harness.relationship(supplier, world.customer)
  const from = (who: Actor): Actor => (who.side === 'supplier' ? { ...who, organisation: supplier } : who)
  const bySupplier = from(engineer)
  const { id: partId, currentRevision } = await world.part(`run-${runs}`, relationship.id)
  const { id: characteristicId } = await world.characteristic(
    { id: partId, currentRevision } as Parameters<World['characteristic']>[0],
    1,
  )
  const gauge = await world.as(bySupplier).call(gauges.createGauge, world.inside(bySupplier), {
    body: { code: 'BG-1', name: 'Bore gauge', resolution: '0.001', unit: 'mm' },
  })
  const task = await world.as(bySupplier).call(tasks.createTask, world.inside(bySupplier), {
    body: { characteristicId, gaugeId: gauge.id, site: 'Hall 1' },
  })
  return {
    async play({
      width,
      end,
      ...body
    }: Pick<Signed, 'width' | 'effectiveOn' | 'clauses' | 'terms'> & { end: string }): Promise<void> {
      const scope = [{ characteristicId }, { partId }, {}][width]
      let at: Answer = await world.begin(quality, {
        ...scope,
        ...{ relationshipId: relationship.id, effectiveOn: body.effectiveOn, send: true },
        ...{ clauses: body.clauses, terms: body.terms },
      })
      if (end !== 'proposed') at = await world.accept(bySupplier, at, newest(at))
      if (end === 'signed' || end === 'half-signed')
        at = await world.sign(from(supplierApprover), at, newest(at))
      if (end === 'signed') await world.sign(world.actors.customerApprover, at, newest(at))
      else await world.withdraw(quality, at, newest(at))
    },
    applied: (on: string) =>
      harness.inTenant('supplier', supplier, people.engineer, [], async (tenant) => {
        const scope = { relationshipId: relationship.id, partId, characteristicId, on }
        return { criteria: await criteriaFor(tenant, scope), terms: await termsFor(tenant, scope) }
      }),
    why: (on: string) => why(bySupplier, task.id, on),
  }
}
