import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { characteristics, gauges, parts, tasks } from '@evenrule/api/contract'
import {
  frozenCharacteristic,
  taskById,
  toCharacteristic,
} from '../../packages/api/src/server/modules/parts/parts.lookup.service'
import { submissions } from '../../packages/api/src/server/modules/submissions/submissions.table'
import { startHarness, type Harness, type Organisation, type Person, type Relationship } from './harness'

let harness: Harness
let engineer: Person, quality: Person, stranger: Person
let supplier: Organisation, customer: Organisation, strangers: Organisation
let relationship: Relationship
let part: parts.Part

beforeAll(async () => {
  harness = await startHarness()
  engineer = await harness.person('Grit Falk')
  quality = await harness.person('Ola Brandt')
  stranger = await harness.person('Sten Uhl')
  supplier = await harness.organisation('Halm Turning', [[engineer, ['gauge-engineer']]])
  customer = await harness.organisation('Nordhof Drives', [[quality, ['quality-representative']]])
  strangers = await harness.organisation('Ufer Springs', [[stranger, ['gauge-engineer']]])
  relationship = await harness.relationship(supplier, customer)
  part = await newPart('7741-220')
})
afterAll(() => harness.stop())

const asSupplier = () => harness.as('supplier', engineer)
const asCustomer = () => harness.as('customer', quality)
const inSupplier = (more: Record<string, string> = {}) => ({ organisationId: supplier.id, ...more })
const inCustomer = (more: Record<string, string> = {}) => ({ organisationId: customer.id, ...more })

const newPart = (number: string) =>
  asCustomer().call(parts.createPart, inCustomer(), {
    body: { relationshipId: relationship.id, number, name: 'Pump housing', revision: 'A' },
  })
const bore = (number: number, more: object = {}) => ({
  number,
  name: 'Bore Ø',
  nominal: '24.000',
  lowerLimit: '23.975',
  upperLimit: '24.025',
  unit: 'mm',
  class: 'significant',
  ...more,
})
const on = (of = part) => ({ partId: of.id, revisionId: of.currentRevision.id })
const asCustomerEnters = (number: number, more: object = {}, of = part) =>
  asCustomer().call(characteristics.createCharacteristic, inCustomer(on(of)), { body: bore(number, more) })
const asSupplierEnters = (number: number, more: object = {}, of = part) =>
  asSupplier().call(characteristics.createCharacteristic, inSupplier(on(of)), { body: bore(number, more) })
const refused = async (body: object, of = part) =>
  asCustomer()
    .send(
      'post',
      `/organisations/${customer.id}/parts/${of.id}/revisions/${of.currentRevision.id}/characteristics`,
    )
    .send(body)

describe('entering a characteristic', () => {
  it('keeps the numbers as they were typed, zeros, comma and all', async () => {
    const made = await asCustomerEnters(1, { lowerLimit: '23,9750', processStandardDeviation: '0.004' })
    expect(made).toMatchObject({
      nominal: '24.000',
      lowerLimit: '23.9750',
      upperLimit: '24.025',
      processStandardDeviation: '0.004',
      partNumber: '7741-220',
      revision: 'A',
      currentRevision: true,
      limitsFrozen: false,
      tasks: 0,
      proof: 'no-task',
    })
  })

  it('takes a tolerance with one limit', async () => {
    const made = await asCustomerEnters(2, {
      nominal: null,
      lowerLimit: null,
      upperLimit: '2.0',
      unit: 'ml/min',
    })
    expect(made).toMatchObject({ nominal: null, lowerLimit: null, upperLimit: '2.0' })
  })

  it('counts as confirmed from the customer and waits when it comes from the supplier', async () => {
    expect((await asCustomerEnters(3)).confirmedByCustomer).toBe(true)
    expect((await asSupplierEnters(4)).confirmedByCustomer).toBe(false)
  })

  it.each([
    [
      { lowerLimit: null, upperLimit: null },
      'body.upperLimit',
      'Enter at least one limit: upper, lower or both.',
    ],
    [
      { lowerLimit: '24.025', upperLimit: '24.0250' },
      'body.upperLimit',
      'Enter an upper limit above the lower limit, 24.025.',
    ],
    [
      { nominal: null, lowerLimit: '0.30000000000000000001', upperLimit: '0.3' },
      'body.upperLimit',
      'Enter an upper limit above the lower limit, 0.30000000000000000001.',
    ],
    [{ nominal: '23' }, 'body.nominal', 'The nominal lies below the lower limit, 23.975. Check both.'],
    [{ nominal: '25' }, 'body.nominal', 'The nominal lies above the upper limit, 24.025. Check both.'],
    [{ nominal: '24 mm' }, 'body.nominal', 'Enter a number, such as 24.025.'],
    [{ upperLimit: '1e999' }, 'body.upperLimit', 'This number is too large.'],
    [{ unit: 'furlong' }, 'body.unit', 'Choose a unit from the list.'],
    [{ class: 'vital' }, 'body.class', 'Choose ordinary, significant or safety.'],
    [{ number: 0 }, 'body.number', 'Numbers on the drawing begin at 1.'],
    [{ number: 1.5 }, 'body.number', 'Enter the whole number it has on the drawing.'],
    [{ processStandardDeviation: '0' }, 'body.processStandardDeviation', 'Enter a number above zero.'],
  ])('refuses %j at its field', async (wrong, path, message) => {
    const answer = await refused(bore(90, wrong))
    expect(answer.status).toBe(422)
    expect(answer.body.errors).toEqual([{ path, message }])
  })

  it('tells limits apart that a double cannot', async () => {
    const made = await asCustomerEnters(5, {
      nominal: null,
      lowerLimit: '0.3',
      upperLimit: '0.30000000000000000001',
    })
    expect(made.upperLimit).toBe('0.30000000000000000001')
  })

  it('refuses a number the revision already has', async () => {
    await asCustomerEnters(6)
    const answer = await refused(bore(6))
    expect(answer.body).toMatchObject({
      status: 409,
      code: 'already-taken',
      errors: [{ path: 'body.number' }],
    })
  })

  it('needs a revision of that very part', async () => {
    const other = await newPart('other-revision')
    const answer = await asCustomer()
      .send(
        'post',
        `/organisations/${customer.id}/parts/${part.id}/revisions/${other.currentRevision.id}/characteristics`,
      )
      .send(bore(7))
    expect(answer.status).toBe(404)
  })
})

describe('confirming', () => {
  it('is the customer’s, once, and what the supplier changes afterwards waits again', async () => {
    const made = await asSupplierEnters(10)
    const at = { characteristicId: made.id }
    const bySupplier = await asSupplier()
      .send('post', `/organisations/${supplier.id}/characteristics/${made.id}/confirm`)
      .send({ expectedVersion: 1 })
    expect(bySupplier.status).toBe(403)
    const confirmed = await asCustomer().call(characteristics.confirmCharacteristic, inCustomer(at), {
      body: { expectedVersion: 1 },
    })
    expect(confirmed).toMatchObject({ confirmedByCustomer: true, rowVersion: 2 })
    const again = await asCustomer()
      .send('post', `/organisations/${customer.id}/characteristics/${made.id}/confirm`)
      .send({ expectedVersion: 2 })
    expect(again.body).toMatchObject({ status: 409, code: 'already-confirmed' })
    const changed = await asSupplier().call(characteristics.changeCharacteristic, inSupplier(at), {
      body: { ...bore(10, { upperLimit: '24.030' }), expectedVersion: 2 },
    })
    expect(changed).toMatchObject({ confirmedByCustomer: false, upperLimit: '24.030' })
  })

  it('is counted on the part', async () => {
    const own = await newPart('unconfirmed')
    await asSupplierEnters(1, {}, own)
    await asCustomerEnters(2, {}, own)
    const seen = await asCustomer().call(parts.readPart, inCustomer({ partId: own.id }))
    expect(seen).toMatchObject({ characteristics: 2, unconfirmed: 1 })
  })

  it('keeps a supplier from archiving what the customer stands behind', async () => {
    const own = await newPart('archive-confirmed')
    const made = await asCustomerEnters(1, {}, own)
    const answer = await asSupplier()
      .send('post', `/organisations/${supplier.id}/characteristics/${made.id}/archive`)
      .send({ expectedVersion: 1 })
    expect(answer.body).toMatchObject({ status: 409, code: 'confirmed-by-customer' })
    const ofPart = await asSupplier()
      .send('post', `/organisations/${supplier.id}/parts/${own.id}/archive`)
      .send({ expectedVersion: 1 })
    expect(ofPart.body).toMatchObject({ status: 409, code: 'confirmed-by-customer' })
    const archived = await asCustomer().call(
      characteristics.archiveCharacteristic,
      inCustomer({ characteristicId: made.id }),
      { body: { expectedVersion: 1 } },
    )
    expect(archived.archivedAt).not.toBeNull()
    const restored = await asCustomer().call(
      characteristics.restoreCharacteristic,
      inCustomer({ characteristicId: made.id }),
      { body: { expectedVersion: 2 } },
    )
    expect(restored.archivedAt).toBeNull()
  })
})

/** A signed agreement as the agreements module stores it, for a scope; signed at the harness's clock. */
async function signAgreement(scope: { partId?: string; characteristicId?: string }, number: number) {
  const { rows } = await harness.owner.query(
    `insert into agreements (id, relationship_id, supplier_org_id, customer_org_id, part_id, characteristic_id, number, begun_by, created_at)
     values (gen_random_uuid(), $1, $2, $3, $4, $5, $6, 'customer', $7) returning id`,
    [
      relationship.id,
      supplier.id,
      customer.id,
      scope.partId ?? null,
      scope.characteristicId ?? null,
      number,
      harness.now(),
    ],
  )
  await harness.owner.query(
    `insert into agreement_versions (id, relationship_id, supplier_org_id, customer_org_id, agreement_id, number, state, begun_by, effective_on, text, sha256, signed_at, created_at)
     values (gen_random_uuid(), $1, $2, $3, $4, 1, 'signed', 'customer', '2027-01-01', '{}', '', $5, $5)`,
    [relationship.id, supplier.id, customer.id, rows[0].id, harness.now()],
  )
}

describe('limits on which a signed agreement rests', () => {
  it('are frozen with the reason and the way, while the rest may change', async () => {
    const own = await newPart('frozen')
    const made = await asCustomerEnters(1, {}, own)
    await signAgreement({ partId: own.id }, 7)
    const change = (body: object) =>
      asCustomer()
        .send('put', `/organisations/${customer.id}/characteristics/${made.id}`)
        .send({ ...bore(1), ...body })
    for (const limit of [
      { nominal: '24.001' },
      { lowerLimit: '23.970' },
      { upperLimit: '24.0250' },
      { unit: 'cm' },
      { class: 'safety' },
    ]) {
      const answer = await change({ ...limit, expectedVersion: 1 })
      expect(answer.body).toMatchObject({ status: 409, code: 'limits-frozen' })
      expect(answer.body.detail).toContain('Agreement 7 rests on these limits')
      expect(answer.body.detail).toContain('new revision')
    }
    const renamed = await change({ name: 'Bore Ø, front', expectedVersion: 1 })
    expect(renamed.body).toMatchObject({ name: 'Bore Ø, front', limitsFrozen: true })
  })

  it('are reopened by a new revision, whose copies can be changed', async () => {
    const own = await newPart('reopened')
    await asCustomerEnters(1, {}, own)
    await signAgreement({ partId: own.id }, 8)
    harness.moveClock('2026-11-02T10:00:00.000Z')
    const next = await asCustomer().call(parts.addRevision, inCustomer({ partId: own.id }), {
      body: { label: 'B', copyCharacteristics: true, expectedVersion: 1 },
    })
    const list = await asCustomer().call(characteristics.listCharacteristics, inCustomer(), {
      query: { partId: own.id },
    })
    expect(list.items).toHaveLength(1)
    const copy = list.items[0]!
    expect(copy).toMatchObject({
      revision: 'B',
      nominal: '24.000',
      limitsFrozen: false,
      confirmedByCustomer: true,
      rowVersion: 1,
    })
    const changed = await asCustomer().call(
      characteristics.changeCharacteristic,
      inCustomer({ characteristicId: copy.id }),
      { body: { ...bore(1, { upperLimit: '24.030' }), expectedVersion: 1 } },
    )
    expect(changed.upperLimit).toBe('24.030')
    const before = await asCustomer().call(characteristics.listCharacteristics, inCustomer(), {
      query: { partId: own.id, revisionId: own.currentRevision.id },
    })
    expect(before.items[0]).toMatchObject({
      upperLimit: '24.025',
      limitsFrozen: true,
      currentRevision: false,
    })
    expect(next.currentRevision.label).toBe('B')
  })

  it('stay open where the agreement is about another characteristic', async () => {
    const own = await newPart('elsewhere')
    const [one, two] = [await asCustomerEnters(1, {}, own), await asCustomerEnters(2, {}, own)]
    await signAgreement({ partId: own.id, characteristicId: one.id }, 9)
    const list = await asCustomer().call(characteristics.listCharacteristics, inCustomer(), {
      query: { partId: own.id },
    })
    expect(list.items.map((each) => [each.id, each.limitsFrozen])).toEqual([
      [one.id, true],
      [two.id, false],
    ])
  })

  it('wait for the customer again when the supplier copies them into a revision', async () => {
    const own = await newPart('copied-by-supplier')
    await asCustomerEnters(1, {}, own)
    await asSupplier().call(parts.addRevision, inSupplier({ partId: own.id }), {
      body: { label: 'B', copyCharacteristics: true, expectedVersion: 1 },
    })
    const seen = await asSupplier().call(parts.readPart, inSupplier({ partId: own.id }))
    expect(seen).toMatchObject({ characteristics: 1, unconfirmed: 1 })
  })
})

describe('the list of characteristics', () => {
  it('shows the current revision, sorted by number, by class in order of weight, searched by name', async () => {
    const own = await newPart('list')
    await asCustomerEnters(12, { name: 'Depth', class: 'safety' }, own)
    await asCustomerEnters(3, { name: 'Width', class: 'ordinary' }, own)
    await asCustomerEnters(7, { name: 'Depth of groove' }, own)
    const list = async (query: object) =>
      (
        await asSupplier().call(characteristics.listCharacteristics, inSupplier(), {
          query: { partId: own.id, ...query },
        })
      ).items.map((each) => each.number)
    expect(await list({})).toEqual([3, 7, 12])
    expect(await list({ sort: '-class' })).toEqual([12, 7, 3])
    expect(await list({ search: 'depth', sort: '-number' })).toEqual([12, 7])
    expect(await list({ class: 'safety' })).toEqual([12])
    expect(await list({ size: 2, page: 2 })).toEqual([12])
  })
})

describe('measuring tasks', () => {
  const newGauge = (code: string, unit = 'mm') =>
    asSupplier().call(gauges.createGauge, inSupplier(), {
      body: { code, name: `Bore gauge ${code}`, resolution: '0.001', unit },
    })
  const newTask = (characteristicId: string, gaugeId: string, more: object = {}) =>
    asSupplier().call(tasks.createTask, inSupplier(), { body: { characteristicId, gaugeId, ...more } })

  it('name a gauge for a characteristic, of which the customer sees code and name alone', async () => {
    const made = await asCustomerEnters(20)
    const gauge = await newGauge('BG-14')
    const task = await newTask(made.id, gauge.id, { site: 'Grinding shop', processStep: 'OP 40' })
    expect(task).toMatchObject({
      gaugeId: gauge.id,
      gaugeCode: 'BG-14',
      gaugeName: 'Bore gauge BG-14',
      site: 'Grinding shop',
      processStep: 'OP 40',
      proof: 'missing',
      partNumber: '7741-220',
      characteristic: { number: 20, nominal: '24.000', class: 'significant' },
    })
    const seen = await asCustomer().call(tasks.readTask, inCustomer({ taskId: task.id }))
    expect(seen).toEqual({ ...task, gaugeId: null })
    const counted = await asCustomer().call(
      characteristics.readCharacteristic,
      inCustomer({ characteristicId: made.id }),
    )
    expect(counted).toMatchObject({ tasks: 1, proof: 'missing' })
  })

  it('need a gauge of the same quantity, in use, and an active characteristic, of one’s own', async () => {
    const made = await asCustomerEnters(21)
    const scale = await newGauge('SC-1', 'g')
    const send = (body: object) => asSupplier().send('post', `/organisations/${supplier.id}/tasks`).send(body)
    const wrongQuantity = await send({ characteristicId: made.id, gaugeId: scale.id })
    expect(wrongQuantity.body.errors).toEqual([
      {
        path: 'body.gaugeId',
        message: 'SC-1 reads in g, but the characteristic is in mm. Choose a gauge of the same quantity.',
      },
    ])
    const micrometre = await newGauge('UM-1', 'µm')
    expect((await send({ characteristicId: made.id, gaugeId: micrometre.id })).status).toBe(200)
    const foreign = await send({ characteristicId: made.id, gaugeId: made.id })
    expect(foreign.body.errors[0].path).toBe('body.gaugeId')
    const noCharacteristic = await send({ characteristicId: scale.id, gaugeId: scale.id })
    expect(noCharacteristic.body.errors[0].path).toBe('body.characteristicId')
  })

  it('stand once for the same gauge, site and process step', async () => {
    const made = await asCustomerEnters(22)
    const gauge = await newGauge('BG-22')
    await newTask(made.id, gauge.id)
    const answer = await asSupplier()
      .send('post', `/organisations/${supplier.id}/tasks`)
      .send({ characteristicId: made.id, gaugeId: gauge.id })
    expect(answer.body).toMatchObject({
      status: 409,
      code: 'already-taken',
      errors: [{ path: 'body.gaugeId' }],
    })
    expect((await newTask(made.id, gauge.id, { processStep: 'OP 50' })).processStep).toBe('OP 50')
  })

  it('are filtered, archived and taken up again; a gauge in use cannot be archived', async () => {
    const made = await asCustomerEnters(23)
    const gauge = await newGauge('BG-23')
    const task = await newTask(made.id, gauge.id)
    const count = async (query: object) =>
      (await asSupplier().call(tasks.listTasks, inSupplier(), { query: { ...query } })).total
    expect(await count({ gaugeId: gauge.id })).toBe(1)
    expect(await count({ characteristicId: made.id, search: 'bg-23' })).toBe(1)
    const inUse = await asSupplier()
      .send('post', `/organisations/${supplier.id}/gauges/${gauge.id}/archive`)
      .send({ expectedVersion: 1 })
    expect(inUse.body).toMatchObject({ status: 409, code: 'gauge-in-use' })
    await asSupplier().call(tasks.archiveTask, inSupplier({ taskId: task.id }), {
      body: { expectedVersion: 1 },
    })
    expect(await count({ gaugeId: gauge.id })).toBe(0)
    await asSupplier().call(gauges.archiveGauge, inSupplier({ gaugeId: gauge.id }), {
      body: { expectedVersion: 1 },
    })
    const noGauge = await asSupplier()
      .send('post', `/organisations/${supplier.id}/tasks/${task.id}/restore`)
      .send({ expectedVersion: 2 })
    expect(noGauge.body).toMatchObject({ status: 409, code: 'archived' })
    await asSupplier().call(gauges.restoreGauge, inSupplier({ gaugeId: gauge.id }), {
      body: { expectedVersion: 2 },
    })
    const restored = await asSupplier().call(tasks.restoreTask, inSupplier({ taskId: task.id }), {
      body: { expectedVersion: 2 },
    })
    expect(restored.archivedAt).toBeNull()
  })

  it('follow their gauge’s new name, in the record of the relationship too', async () => {
    const made = await asCustomerEnters(24)
    const gauge = await newGauge('BG-24')
    const task = await newTask(made.id, gauge.id)
    await asSupplier().call(gauges.changeGauge, inSupplier({ gaugeId: gauge.id }), {
      body: { code: 'BG-24a', name: 'Bore gauge, new', resolution: '0.001', unit: 'mm', expectedVersion: 1 },
    })
    const seen = await asCustomer().call(tasks.readTask, inCustomer({ taskId: task.id }))
    expect(seen).toMatchObject({ gaugeCode: 'BG-24a', gaugeName: 'Bore gauge, new' })
    const { rows } = await harness.owner.query(
      'select type, chain_id from record_events where subject_id = $1 order by sequence',
      [task.id],
    )
    expect(rows).toEqual([
      { type: 'measuring-task.created', chain_id: relationship.id },
      { type: 'measuring-task.changed', chain_id: relationship.id },
    ])
  })

  it('keep gauge and characteristic of one quantity, from whichever side one changes it', async () => {
    const made = await asCustomerEnters(25)
    const gauge = await newGauge('BG-25')
    await newTask(made.id, gauge.id)
    const ofGauge = await asSupplier()
      .send('put', `/organisations/${supplier.id}/gauges/${gauge.id}`)
      .send({ code: 'BG-25', name: 'x', resolution: '0.001', unit: 'N', expectedVersion: 1 })
    expect(ofGauge.body.errors[0].path).toBe('body.unit')
    const ofCharacteristic = await asCustomer()
      .send('put', `/organisations/${customer.id}/characteristics/${made.id}`)
      .send({ ...bore(25, { unit: 'N' }), expectedVersion: 1 })
    expect(ofCharacteristic.body).toMatchObject({ status: 409, code: 'unit-of-another-quantity' })
  })

  it('are out of reach of the customer’s hand and of strangers’ eyes', async () => {
    const made = await asCustomerEnters(26)
    const task = await newTask(made.id, (await newGauge('BG-26')).id)
    const byCustomer = await asCustomer()
      .send('put', `/organisations/${customer.id}/tasks/${task.id}`)
      .send({ site: 'x', processStep: null, expectedVersion: 1 })
    expect(byCustomer.status).toBe(403)
    const byStranger = await harness
      .as('supplier', stranger)
      .send('get', `/organisations/${strangers.id}/tasks/${task.id}`)
    expect(byStranger.status).toBe(404)
  })

  it('carry their proof to the characteristic, which is as far as the worst of them', async () => {
    const own = await newPart('proof')
    const made = await asCustomerEnters(1, {}, own)
    const gauge = await newGauge('BG-31')
    const [one, two] = [
      await newTask(made.id, gauge.id, { processStep: 'OP 1' }),
      await newTask(made.id, gauge.id, { processStep: 'OP 2' }),
    ]
    let number = 500
    const submit = (taskId: string, state: 'submitted' | 'accepted' | 'challenged' | 'draft') =>
      harness.inTenant('supplier', supplier, engineer, ['gauge-engineer'], async ({ tx, now }) => {
        await tx.insert(submissions).values({
          relationshipId: relationship.id,
          supplierOrgId: supplier.id,
          customerOrgId: customer.id,
          number: state === 'draft' ? null : (number += 1),
          taskId,
          partId: own.id,
          characteristicId: made.id,
          state,
          stateSince: now,
          createdAt: now,
          createdBy: engineer.id,
          submittedAt: state === 'draft' ? null : now,
          criteria: state === 'draft' ? null : 'agreed',
          safety: false,
        })
      })
    const seen = async () => ({
      ofTask: (await asCustomer().call(tasks.readTask, inCustomer({ taskId: one.id }))).proof,
      ofCharacteristic: (
        await asSupplier().call(characteristics.readCharacteristic, inSupplier({ characteristicId: made.id }))
      ).proof,
    })
    await submit(one.id, 'draft')
    expect(await seen()).toEqual({ ofTask: 'missing', ofCharacteristic: 'missing' })
    await submit(one.id, 'accepted')
    expect(await seen()).toEqual({ ofTask: 'accepted', ofCharacteristic: 'missing' })
    await submit(two.id, 'challenged')
    expect(await seen()).toEqual({ ofTask: 'accepted', ofCharacteristic: 'challenged' })
    await submit(two.id, 'accepted')
    expect(await seen()).toEqual({ ofTask: 'accepted', ofCharacteristic: 'accepted' })
  })

  it('are taken over into a new revision by the numbers of the characteristics, once', async () => {
    const own = await newPart('take-over')
    const bored = await asCustomerEnters(1, {}, own)
    const weighed = await asCustomerEnters(2, { unit: 'g' }, own)
    const gone = await asCustomerEnters(3, {}, own)
    const [gauge, scale] = [await newGauge('BG-30'), await newGauge('SC-30', 'g')]
    await newTask(bored.id, gauge.id, { site: 'Grinding shop', processStep: 'OP 40' })
    await newTask(weighed.id, scale.id)
    await newTask(gone.id, gauge.id)
    const early = await asSupplier().send(
      'post',
      `/organisations/${supplier.id}/parts/${own.id}/tasks/take-over`,
    )
    expect(early.body).toMatchObject({ status: 409, code: 'no-earlier-revision' })
    const next = await asCustomer().call(parts.addRevision, inCustomer({ partId: own.id }), {
      body: { label: 'B', copyCharacteristics: false, expectedVersion: 1 },
    })
    await asCustomerEnters(1, { unit: 'cm' }, next)
    await asCustomerEnters(2, { unit: 'N' }, next)
    const take = () => asSupplier().call(tasks.takeOverTasks, inSupplier({ partId: own.id }))
    expect(await take()).toEqual({ taken: 1, left: 2 })
    expect(await take()).toEqual({ taken: 0, left: 3 })
    const list = await asSupplier().call(tasks.listTasks, inSupplier(), {
      query: { revisionId: next.currentRevision.id },
    })
    expect(list.items).toMatchObject([
      { gaugeCode: 'BG-30', site: 'Grinding shop', processStep: 'OP 40', revision: 'B', proof: 'missing' },
    ])
  })

  it('refuse a stale version', async () => {
    const made = await asCustomerEnters(27)
    const task = await newTask(made.id, (await newGauge('BG-27')).id)
    const change = (step: string) =>
      asSupplier()
        .send('put', `/organisations/${supplier.id}/tasks/${task.id}`)
        .send({ site: null, processStep: step, expectedVersion: 1 })
    expect((await change('OP 1')).body.rowVersion).toBe(2)
    expect((await change('OP 2')).body).toMatchObject({ status: 409, code: 'changed-meanwhile' })
  })

  it('give studies what they freeze: the limits as text, and for computing as numbers in one unit', async () => {
    const made = await asCustomerEnters(28, { processStandardDeviation: '0.0040' })
    const task = await newTask(made.id, (await newGauge('BG-28', 'µm')).id)
    await harness.inTenant('supplier', supplier, engineer, ['gauge-engineer'], async (tenant) => {
      expect(await taskById(tenant, task.id)).toMatchObject({ gaugeCode: 'BG-28', characteristicId: made.id })
      const frozen = await frozenCharacteristic(tenant, made.id)
      expect(frozen).toEqual({
        characteristicId: made.id,
        partNumber: '7741-220',
        revision: 'A',
        number: 28,
        name: 'Bore Ø',
        nominal: '24.000',
        lowerLimit: '23.975',
        upperLimit: '24.025',
        unit: 'mm',
        class: 'significant',
        processStandardDeviation: '0.0040',
      })
      expect(toCharacteristic(frozen, { resolution: '0.1', gaugeUnit: 'µm' })).toEqual({
        unit: 'mm',
        tolerance: { lower: 23.975, upper: 24.025 },
        processStandardDeviation: 0.004,
        resolution: 0.0001,
      })
    })
  })
})
