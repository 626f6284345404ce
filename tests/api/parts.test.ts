import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { parts } from '@evenrule/api/contract'
import { startHarness, type Harness, type Organisation, type Person, type Relationship } from './harness'

let harness: Harness
let engineer: Person, quality: Person, reader: Person, stranger: Person
let supplier: Organisation, customer: Organisation, otherCustomer: Organisation, strangers: Organisation
let relationship: Relationship, otherRelationship: Relationship

beforeAll(async () => {
  harness = await startHarness()
  engineer = await harness.person('Grit Falk')
  quality = await harness.person('Ola Brandt')
  reader = await harness.person('Pim Rehn')
  stranger = await harness.person('Sten Uhl')
  supplier = await harness.organisation('Halm Turning', [
    [engineer, ['gauge-engineer']],
    [reader, ['reader']],
  ])
  customer = await harness.organisation('Nordhof Drives', [[quality, ['quality-representative']]])
  otherCustomer = await harness.organisation('Lindau Pumps')
  strangers = await harness.organisation('Ufer Springs', [[stranger, ['gauge-engineer', 'admin']]])
  relationship = await harness.relationship(supplier, customer)
  otherRelationship = await harness.relationship(supplier, otherCustomer)
})
afterAll(() => harness.stop())

const asSupplier = () => harness.as('supplier', engineer)
const asCustomer = () => harness.as('customer', quality)
const inSupplier = (more: Record<string, string> = {}) => ({ organisationId: supplier.id, ...more })
const inCustomer = (more: Record<string, string> = {}) => ({ organisationId: customer.id, ...more })
const entered = (number: string, more: object = {}) => ({
  relationshipId: relationship.id,
  number,
  name: `Housing ${number}`,
  revision: 'A',
  ...more,
})
const enter = (number: string, more: object = {}) =>
  asCustomer().call(parts.createPart, inCustomer(), { body: entered(number, more) })

describe('entering a part number', () => {
  it('is seen by both sides with its first revision and both names', async () => {
    const made = await enter('7741-220', { name: 'Pump housing' })
    expect(made).toMatchObject({
      number: '7741-220',
      supplierNumber: null,
      name: 'Pump housing',
      currentRevision: { label: 'A', sequence: 1 },
      supplierName: 'Halm Turning',
      customerName: 'Nordhof Drives',
      characteristics: 0,
      rowVersion: 1,
      archivedAt: null,
    })
    const seen = await asSupplier().call(parts.readPart, inSupplier({ partId: made.id }))
    expect(seen).toEqual(made)
  })

  it('writes what was entered into the chain of the relationship', async () => {
    const made = await enter('record-1')
    const { rows } = await harness.owner.query(
      'select chain_id, type, text from record_events where subject_id = $1',
      [made.id],
    )
    expect(rows).toHaveLength(1)
    expect(rows[0]).toMatchObject({ chain_id: relationship.id, type: 'part.created' })
    expect(JSON.parse(rows[0].text).data).toMatchObject({ number: 'record-1', revision: 'A' })
  })

  it('refuses a number the relationship already has, at its field', async () => {
    await enter('twice')
    const answer = await asSupplier()
      .send('post', `/organisations/${supplier.id}/parts`)
      .send(entered('twice'))
    expect(answer.status).toBe(409)
    expect(answer.body).toMatchObject({ code: 'already-taken', errors: [{ path: 'body.number' }] })
    expect(answer.text).not.toMatch(/constraint|parts_relationship/)
  })

  it('allows the same number with another customer', async () => {
    await enter('shared')
    const made = await asSupplier().call(parts.createPart, inSupplier(), {
      body: entered('shared', { relationshipId: otherRelationship.id }),
    })
    expect(made.customerName).toBe('Lindau Pumps')
  })

  it.each([
    [{ number: '' }, 'body.number', 'Enter something here.'],
    [{ number: 'x'.repeat(61) }, 'body.number', 'Shorten this to 60 characters.'],
    [{ name: '   ' }, 'body.name', 'Enter something here.'],
    [{ revision: '' }, 'body.revision', 'Enter something here.'],
    [
      { name: 'Hou\u0000sing' },
      'body.name',
      'Contains a character that cannot be stored; remove control characters.',
    ],
    [{ relationshipId: 'no' }, 'body.relationshipId', 'Invalid UUID'],
  ])('says what is wrong with %j and where', async (wrong, path, message) => {
    const answer = await asCustomer()
      .send('post', `/organisations/${customer.id}/parts`)
      .send(entered('bad', wrong))
    expect(answer.status).toBe(422)
    expect(answer.body.errors).toEqual([{ path, message }])
  })

  it('refuses a relationship of others as if it were none', async () => {
    const answer = await asCustomer()
      .send('post', `/organisations/${customer.id}/parts`)
      .send(entered('foreign', { relationshipId: otherRelationship.id }))
    expect(answer.status).toBe(422)
    expect(answer.body.errors[0].path).toBe('body.relationshipId')
  })

  it('is not for readers', async () => {
    const answer = await harness
      .as('supplier', reader)
      .send('post', `/organisations/${supplier.id}/parts`)
      .send(entered('reader'))
    expect(answer.status).toBe(403)
  })
})

describe('changing a part', () => {
  it('takes the version the sender saw and raises it', async () => {
    const made = await enter('change-1')
    const changed = await asSupplier().call(parts.changePart, inSupplier({ partId: made.id }), {
      body: { number: 'change-1', supplierNumber: 'H-77', name: 'Cover', expectedVersion: 1 },
    })
    expect(changed).toMatchObject({ supplierNumber: 'H-77', name: 'Cover', rowVersion: 2 })
  })

  it('refuses a stale version and changes nothing', async () => {
    const made = await enter('change-2')
    const body = { number: 'change-2', supplierNumber: null, name: 'First', expectedVersion: 1 }
    await asCustomer().call(parts.changePart, inCustomer({ partId: made.id }), { body })
    const answer = await asCustomer()
      .send('put', `/organisations/${customer.id}/parts/${made.id}`)
      .send({ ...body, name: 'Second' })
    expect(answer.status).toBe(409)
    expect(answer.body.code).toBe('changed-meanwhile')
    expect((await asCustomer().call(parts.readPart, inCustomer({ partId: made.id }))).name).toBe('First')
  })

  it('leaves the supplier’s own number to the supplier', async () => {
    const made = await enter('change-3')
    const answer = await asCustomer()
      .send('put', `/organisations/${customer.id}/parts/${made.id}`)
      .send({ number: 'change-3', supplierNumber: 'ours', name: 'x', expectedVersion: 1 })
    expect(answer.status).toBe(422)
    expect(answer.body.errors[0].path).toBe('body.supplierNumber')
  })

  it('does not find the parts of others', async () => {
    const made = await enter('change-4')
    for (const [method, path] of [
      ['get', ''],
      ['put', ''],
      ['post', '/archive'],
      ['get', '/revisions'],
    ] as const) {
      const answer = await harness
        .as('supplier', stranger)
        .send(method, `/organisations/${strangers.id}/parts/${made.id}${path}`)
        .send({ number: 'x', supplierNumber: null, name: 'x', expectedVersion: 1 })
      expect(answer.status).toBe(404)
    }
  })
})

describe('archiving a part', () => {
  it('takes it out of the list, refuses changes, and brings it back whole', async () => {
    const made = await enter('archive-1')
    const at = { partId: made.id }
    const archived = await asCustomer().call(parts.archivePart, inCustomer(at), {
      body: { expectedVersion: 1 },
    })
    expect(archived.archivedAt).toBe('2026-11-02T09:00:00.000Z')
    const list = (archivedIs: string) =>
      asCustomer().call(parts.listParts, inCustomer(), {
        query: { search: 'archive-1', archived: archivedIs },
      })
    expect((await list('active')).total).toBe(0)
    expect((await list('archived')).total).toBe(1)
    expect((await list('all')).total).toBe(1)
    const change = await asCustomer()
      .send('put', `/organisations/${customer.id}/parts/${made.id}`)
      .send({ number: 'archive-1', supplierNumber: null, name: 'x', expectedVersion: 2 })
    expect(change.body).toMatchObject({ status: 409, code: 'archived' })
    const restored = await asCustomer().call(parts.restorePart, inCustomer(at), {
      body: { expectedVersion: 2 },
    })
    expect(restored).toMatchObject({ archivedAt: null, name: made.name, rowVersion: 3 })
    const again = await asCustomer()
      .send('post', `/organisations/${customer.id}/parts/${made.id}/restore`)
      .send({ expectedVersion: 3 })
    expect(again.body).toMatchObject({ status: 409, code: 'not-archived' })
  })
})

describe('the list of parts', () => {
  it('searches by number, own number and name, whatever the case, and takes wildcards as they stand', async () => {
    await enter('find-1', { name: 'Valve spool' })
    await enter('find-2', { supplierNumber: 'OWN-9' })
    const search = async (text: string) =>
      (await asSupplier().call(parts.listParts, inSupplier(), { query: { search: text } })).items.map(
        (each) => each.number,
      )
    expect(await search('VALVE SP')).toEqual(['find-1'])
    expect(await search('own-9')).toEqual(['find-2'])
    expect(await search('find-')).toEqual(['find-1', 'find-2'])
    expect(await search('%')).toEqual([])
  })

  it('sorts by the columns it allows, both ways, and names them when asked for another', async () => {
    await enter('sort-b', { name: 'Alpha' })
    await enter('sort-a', { name: 'Beta' })
    const sorted = async (sort: string) =>
      (
        await asSupplier().call(parts.listParts, inSupplier(), { query: { search: 'sort-', sort } })
      ).items.map((each) => each.number)
    expect(await sorted('number')).toEqual(['sort-a', 'sort-b'])
    expect(await sorted('-number')).toEqual(['sort-b', 'sort-a'])
    expect(await sorted('name')).toEqual(['sort-b', 'sort-a'])
    const answer = await asSupplier().send('get', `/organisations/${supplier.id}/parts?sort=createdBy`)
    expect(answer.status).toBe(422)
    expect(answer.body.errors[0]).toMatchObject({
      path: 'query.sort',
      message: expect.stringContaining('number, name, supplierNumber, partner, createdAt'),
    })
  })

  it('comes in pages that add up, and tells the total beyond the last one', async () => {
    for (const number of ['page-1', 'page-2', 'page-3']) await enter(number)
    const page = (at: number) =>
      asSupplier().call(parts.listParts, inSupplier(), { query: { search: 'page-', size: 2, page: at } })
    expect(await page(1)).toMatchObject({ total: 3, page: 1, size: 2 })
    expect((await page(2)).items.map((each) => each.number)).toEqual(['page-3'])
    expect(await page(9)).toMatchObject({ items: [], total: 3 })
  })

  it('filters by relationship', async () => {
    const found = await asSupplier().call(parts.listParts, inSupplier(), {
      query: { relationshipId: otherRelationship.id, size: 100 },
    })
    expect(found.items.map((each) => each.customerName)).toEqual(['Lindau Pumps'])
  })

  it('shows an organisation nothing on the side it does not have', async () => {
    const answer = await harness.as('customer', engineer).send('get', `/organisations/${supplier.id}/parts`)
    expect(answer.body).toMatchObject({ items: [], total: 0 })
  })
})

describe('revisions', () => {
  it('are counted upwards, and the last one added is the current one', async () => {
    const made = await enter('rev-1')
    const changed = await asCustomer().call(parts.addRevision, inCustomer({ partId: made.id }), {
      body: { label: 'B', copyCharacteristics: false, expectedVersion: 1 },
    })
    expect(changed).toMatchObject({ currentRevision: { label: 'B', sequence: 2 }, rowVersion: 2 })
    const list = await asSupplier().call(parts.listRevisions, inSupplier({ partId: made.id }))
    expect(list.items.map((each) => each.label)).toEqual(['B', 'A'])
  })

  it('have labels of their own within a part', async () => {
    const made = await enter('rev-2')
    const answer = await asCustomer()
      .send('post', `/organisations/${customer.id}/parts/${made.id}/revisions`)
      .send({ label: 'A', copyCharacteristics: true, expectedVersion: 1 })
    expect(answer.body).toMatchObject({
      status: 409,
      code: 'already-taken',
      errors: [{ path: 'body.label' }],
    })
    expect((await asCustomer().call(parts.readPart, inCustomer({ partId: made.id }))).rowVersion).toBe(1)
  })
})
