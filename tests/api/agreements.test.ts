import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createHash } from 'node:crypto'
import { agreements, noTerms } from '@evenrule/api/contract'
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

const effectiveOn = '2027-01-01'
const proposal = { clauses: [zeroTest()], effectiveOn, comment: 'As last year.', send: true }

const eventsOf = async (versionId: string) => {
  const { rows } = await world.harness.owner.query(
    'select type, chain_id, text from record_events where subject_id = $1 order by at, sequence',
    [versionId],
  )
  return rows as { type: string; chain_id: string; text: string }[]
}
const messagesTo = async (person: { id: string }) => {
  const { rows } = await world.harness.owner.query(
    'select subject, body, link, kind from messages where user_id = $1 order by created_at, id',
    [person.id],
  )
  return rows as { subject: string; body: string; link: string; kind: string }[]
}

describe('the whole story', () => {
  it('goes from a proposal over a changed one to two signatures on the same bytes', async () => {
    const part = await world.part('7741-220')
    const bore = await world.characteristic(part, 5)
    const proposed = await world.begin(quality, { ...proposal, partId: part.id })
    expect(proposed).toMatchObject({
      number: 1,
      scope: { kind: 'part', partNumber: '7741-220', partName: 'Pump housing' },
      supplier: { name: 'Halm Turning' },
      customer: { name: 'Nordhof Drives' },
      timeZone: 'Europe/Berlin',
      today: '2026-11-02',
      inForce: null,
      mayBegin: false,
    })
    expect(newest(proposed)).toMatchObject({
      number: 1,
      state: 'proposed',
      begunBy: 'customer',
      waitsOn: ['supplier'],
      moves: ['withdraw-clauses', 'comment', 'withdraw'],
      hindrances: [{ move: 'withdraw-clauses', code: 'last-clause' }],
      rounds: [{ number: 1, side: 'customer', state: 'sent', by: 'Ola Brandt', comment: 'As last year.' }],
    })
    expect(proposed.characteristics).toMatchObject([
      { characteristicId: bore.id, lowerLimit: '23.975', upperLimit: '24.025', unit: 'mm' },
    ])

    const seen = await world.read(engineer, proposed.id)
    expect(newest(seen).moves).toEqual(['keep-draft', 'counter', 'comment', 'mark', 'accept', 'withdraw'])
    const countered = await world.answer(engineer, seen, newest(seen), {
      clauses: [equivalence(), readings(20)],
      effectiveOn,
      comment: 'The zero test rewards a worse gauge.',
      send: true,
    })
    expect(newest(countered)).toMatchObject({
      state: 'countered',
      waitsOn: ['customer'],
      rounds: [
        { number: 1, side: 'customer', state: 'answered' },
        { number: 2, side: 'supplier', state: 'sent', by: 'Grit Falk' },
      ],
    })

    const agreed = await world.accept(quality, countered, newest(countered))
    // The whole is accepted with one act, so every thing in it is.
    expect(newest(agreed).acceptance?.everythingBy).toEqual(['supplier', 'customer'])
    const version = newest(agreed)
    expect(version).toMatchObject({
      state: 'agreed',
      effectiveOn,
      waitsOn: ['supplier', 'customer'],
      rounds: [{ state: 'answered' }, { state: 'accepted' }],
    })
    expect(version.sha256).toBe(
      createHash('sha256')
        .update(version.text ?? '')
        .digest('hex'),
    )
    expect(JSON.parse(version.text ?? '')).toEqual({
      format: 'evenrule.agreement/1',
      agreement: 1,
      version: 1,
      supplier: { id: world.supplier.id, name: 'Halm Turning' },
      customer: { id: world.customer.id, name: 'Nordhof Drives' },
      timeZone: 'Europe/Berlin',
      scope: agreed.scope,
      characteristics: agreed.characteristics,
      clauses: [equivalence(), readings(20)],
      terms: noTerms,
      effectiveOn,
    })

    const once = await world.sign(customerApprover, agreed, version)
    expect(newest(once)).toMatchObject({
      state: 'agreed',
      waitsOn: ['supplier'],
      signatures: [{ side: 'customer', name: 'Ida Roth', sha256: version.sha256 }],
    })
    expect(newest(await world.read(customerApprover, agreed.id)).hindrances).toContainEqual({
      move: 'sign',
      code: 'own-side-has-signed',
    })
    const signed = await world.sign(supplierApprover, once, newest(once))
    expect(newest(signed)).toMatchObject({ state: 'signed', waitsOn: [], moves: [], hindrances: [] })
    expect(newest(signed).signatures.map(({ side, sha256 }) => [side, sha256])).toEqual([
      ['customer', version.sha256],
      ['supplier', version.sha256],
    ])
    expect(newest(signed).text).toBe(version.text)

    expect((await eventsOf(version.id)).map(({ type, chain_id }) => [type, chain_id])).toEqual([
      ['agreement.proposed', world.relationship.id],
      ['agreement.countered', world.relationship.id],
      ['agreement.accepted', world.relationship.id],
      ['agreement.signature-given', world.relationship.id],
      ['agreement.signed', world.relationship.id],
    ])
    const told = await messagesTo(engineer.person)
    expect(told[0]).toMatchObject({
      kind: 'agreement',
      subject: 'Criteria are proposed to you. Agreement 1, version 1: 7741-220 Pump housing',
      link: `/organisations/${world.supplier.id}/agreements/${agreed.id}`,
    })
    expect(told[0]?.body).toContain('From Nordhof Drives.')
    expect(told[0]?.body).toContain('As last year.')
    expect((await messagesTo(supplierApprover.person)).map(({ subject }) => subject.split('.')[0])).toEqual([
      'Criteria are proposed to you',
      'Criteria are agreed and wait for signatures',
      'Criteria wait for the signature of your side',
    ])
  })

  it('keeps the agreed text canonical: members sorted, no white space', async () => {
    const part = await world.part('canonical')
    await world.characteristic(part, 1)
    const proposed = await world.begin(quality, { ...proposal, partId: part.id })
    const { text } = newest(await world.accept(engineer, proposed, newest(proposed)))
    expect(text).toMatch(/^\{"agreement":\d+,"characteristics":\[\{"characteristicId":"/)
    expect(text).toContain('"clauses":[{"parameters":{"alpha":0.05},"type":"bias-zero-test"}]')
    expect(text).not.toMatch(/[:,]\s/)
  })

  it('may be ended by either side with a reason, while the version in force stays', async () => {
    const part = await world.part('withdrawn')
    await world.characteristic(part, 1)
    await world.agree({ clauses: [readings()], effectiveOn: '2026-11-02', partId: part.id })
    const next = await world.begin(engineer, { ...proposal, partId: part.id })
    expect(next.versions.map(({ number, state }) => [number, state])).toEqual([
      [2, 'proposed'],
      [1, 'in-force'],
    ])
    const without = await world
      .as(quality)
      .send('post', world.path(quality, next, newest(next), 'withdraw'))
      .send({ expectedVersion: newest(next).rowVersion, reason: ' ' })
    expect(without.body).toMatchObject({ status: 422, errors: [{ path: 'body.reason' }] })
    const ended = await world.withdraw(quality, next, newest(next), 'We stay with what we have.')
    expect(newest(ended)).toMatchObject({
      state: 'withdrawn',
      withdrawnBy: 'customer',
      withdrawnReason: 'We stay with what we have.',
      moves: [],
      rounds: [{ state: 'withdrawn' }],
    })
    expect(ended).toMatchObject({ inForce: { number: 1 }, mayBegin: true })
    const afterwards = await world
      .as(quality)
      .send('post', world.path(quality, ended, newest(ended), 'accept'))
      .send({ expectedVersion: newest(ended).rowVersion })
    expect(afterwards.body).toMatchObject({ status: 409, code: 'wrong-state' })
  })

  it('may be withdrawn after one signature, not after both', async () => {
    const part = await world.part('one-signature')
    await world.characteristic(part, 1)
    const proposed = await world.begin(quality, { ...proposal, partId: part.id })
    const agreed = await world.accept(engineer, proposed, newest(proposed))
    const once = await world.sign(supplierApprover, agreed, newest(agreed))
    const ended = await world.withdraw(quality, once, newest(once))
    expect(newest(ended).state).toBe('withdrawn')
    const signed = await world.agree({ clauses: [readings()], effectiveOn, partId: part.id })
    const refused = await world
      .as(quality)
      .send('post', world.path(quality, signed, newest(signed), 'withdraw'))
      .send({ expectedVersion: newest(signed).rowVersion, reason: 'Too late.' })
    expect(refused.body).toMatchObject({ status: 409, code: 'wrong-state' })
    expect(refused.body.detail).toContain('signed')
  })
})

describe('drafts', () => {
  it('are seen by their own side alone: not in lists, not by id, not by a number left out', async () => {
    const part = await world.part('secret')
    await world.characteristic(part, 1)
    const before = await world.list(quality)
    const draft = await world.begin(engineer, { ...proposal, send: false, partId: part.id })
    expect(draft).toMatchObject({ number: null, mayBegin: false })
    expect(newest(draft)).toMatchObject({
      number: null,
      state: 'draft',
      waitsOn: ['supplier'],
      moves: ['keep-draft', 'discard-draft', 'propose'],
      hindrances: [],
    })
    expect((await world.list(quality)).total).toBe(before.total)
    const byId = await world
      .as(quality)
      .send('get', `/organisations/${world.customer.id}/agreements/${draft.id}`)
    expect(byId.status).toBe(404)
    for (const act of ['accept', 'withdraw', 'draft/send', 'draft/discard']) {
      const answer = await world
        .as(quality)
        .send('post', world.path(quality, draft, newest(draft), act))
        .send({ expectedVersion: 1, reason: 'x' })
      expect(answer.status, act).toBe(404)
    }
    const own = await world.list(engineer, { partId: part.id })
    expect(own.items).toMatchObject([
      { id: draft.id, number: null, newest: { state: 'draft', number: null }, waitsOn: ['supplier'] },
    ])
    // The other side’s next proposal takes the next number, as if the draft were not there.
    const elsewhere = await world.part('secret-2')
    await world.characteristic(elsewhere, 1)
    const theirs = await world.begin(quality, { ...proposal, partId: elsewhere.id })
    const highest = Math.max(...before.items.map(({ number }) => number ?? 0))
    expect(theirs.number).toBe(highest + 1)
    expect(await messagesTo(quality.person)).not.toContainEqual(
      expect.objectContaining({ subject: expect.stringContaining('secret Pump') }),
    )
    expect(await eventsOf(newest(draft).id)).toMatchObject([
      { type: 'agreement.drafted', chain_id: world.supplier.id },
    ])
  })

  it('are changed, sent, and only then numbered', async () => {
    const part = await world.part('sent-later')
    await world.characteristic(part, 1)
    const draft = await world.begin(engineer, {
      clauses: [],
      effectiveOn,
      comment: '',
      send: false,
      partId: part.id,
    })
    expect(newest(draft).hindrances).toEqual([{ move: 'propose', code: 'no-clauses' }])
    const at = world.inside(engineer, { agreementId: draft.id, versionId: newest(draft).id })
    const saved = await world.as(engineer).call(agreements.saveDraft, at, {
      body: { clauses: [equivalence()], effectiveOn, comment: 'Five percent.', expectedVersion: 1 },
    })
    expect(newest(saved).rounds).toMatchObject([
      { clauses: [equivalence()], comment: 'Five percent.', rowVersion: 2, state: 'draft' },
    ])
    const stale = await world
      .as(engineer)
      .send('put', world.path(engineer, draft, newest(draft), 'draft'))
      .send({ clauses: [], effectiveOn, expectedVersion: 1 })
    expect(stale.body).toMatchObject({ status: 409, code: 'changed-meanwhile' })
    const sent = await world.as(engineer).call(agreements.sendDraft, at, { body: { expectedVersion: 2 } })
    expect(sent.id).toBe(draft.id)
    expect(newest(sent)).toMatchObject({ number: 1, state: 'proposed', rounds: [{ state: 'sent' }] })
    expect((await world.read(quality, sent.id)).number).toBe(sent.number)
  })

  it('of an answer are seen by their own side alone, and go when the proposal is accepted as it is', async () => {
    const part = await world.part('answer-draft')
    await world.characteristic(part, 1)
    const proposed = await world.begin(quality, { ...proposal, partId: part.id })
    const answering = await world.answer(engineer, proposed, newest(proposed), {
      clauses: [equivalence()],
      effectiveOn,
      comment: 'not yet',
    })
    expect(newest(answering)).toMatchObject({
      state: 'proposed',
      rowVersion: newest(proposed).rowVersion,
      rounds: [{ state: 'sent' }, { number: 2, state: 'draft', comment: 'not yet' }],
    })
    expect(newest(answering).moves).toContain('discard-draft')
    const theirs = newest(await world.read(quality, proposed.id))
    expect(theirs).toEqual(newest(proposed))
    const second = await world
      .as(supplierApprover)
      .send('post', world.path(supplierApprover, answering, newest(answering), 'answer'))
      .send({ clauses: [], effectiveOn, expectedVersion: newest(answering).rowVersion })
    expect(second.body).toMatchObject({ status: 409, code: 'draft-exists' })
    const agreed = await world.accept(engineer, answering, newest(answering))
    expect(newest(agreed).rounds.map(({ state }) => state)).toEqual(['accepted'])
  })

  it('are discarded without a trace for the other side', async () => {
    const part = await world.part('discarded')
    await world.characteristic(part, 1)
    const draft = await world.begin(engineer, { ...proposal, send: false, partId: part.id })
    const gone = await world
      .as(engineer)
      .call(
        agreements.discardDraft,
        world.inside(engineer, { agreementId: draft.id, versionId: newest(draft).id }),
        { body: { expectedVersion: 1 } },
      )
    expect(gone).toEqual({ agreementId: null })
    expect((await world.list(engineer, { partId: part.id })).total).toBe(0)
    const proposed = await world.begin(quality, { ...proposal, partId: part.id })
    const answering = await world.answer(engineer, proposed, newest(proposed), {
      clauses: [equivalence()],
      effectiveOn,
    })
    const kept = await world
      .as(engineer)
      .call(
        agreements.discardDraft,
        world.inside(engineer, { agreementId: proposed.id, versionId: newest(answering).id }),
        { body: { expectedVersion: 1 } },
      )
    expect(kept).toEqual({ agreementId: proposed.id })
    expect(newest(await world.read(engineer, proposed.id)).rounds).toHaveLength(1)
  })

  it('of both sides for one scope exist at once; whoever sends second joins the first one’s agreement', async () => {
    const part = await world.part('both-draft')
    await world.characteristic(part, 1)
    const scope = { partId: part.id }
    const ours = await world.begin(engineer, { ...proposal, ...scope, send: false })
    const again = await world
      .as(engineer)
      .send('post', `/organisations/${world.supplier.id}/agreements`)
      .send({ relationshipId: world.relationship.id, ...proposal, ...scope })
    expect(again.body).toMatchObject({ status: 409, code: 'draft-exists' })
    const theirs = await world.begin(quality, { ...proposal, ...scope })
    expect(newest(await world.read(engineer, ours.id)).hindrances).toEqual([
      { move: 'propose', code: 'negotiation-open' },
    ])
    const send = () =>
      world
        .as(engineer)
        .send('post', world.path(engineer, ours, newest(ours), 'draft/send'))
        .send({ expectedVersion: 1 })
    expect((await send()).body).toMatchObject({ status: 409, code: 'negotiation-open' })
    await world.withdraw(quality, theirs, newest(theirs))
    const joined = (await send()).body as Answer
    expect(joined).toMatchObject({ id: theirs.id, number: theirs.number })
    expect(joined.versions.map(({ number, state, begunBy }) => [number, state, begunBy])).toEqual([
      [2, 'proposed', 'supplier'],
      [1, 'withdrawn', 'customer'],
    ])
    const old = await world
      .as(engineer)
      .send('get', `/organisations/${world.supplier.id}/agreements/${ours.id}`)
    expect(old.status).toBe(404)
  })
})

describe('clauses', () => {
  const refusedFor = async (scope: object, clauses: unknown[], more: object = {}) => {
    const answer = await world
      .as(quality)
      .send('post', `/organisations/${world.customer.id}/agreements`)
      .send({ relationshipId: world.relationship.id, ...proposal, ...scope, clauses, ...more })
    expect(answer.status).toBe(422)
    return answer.body.errors as { path: string; message: string }[]
  }

  it('are refused at their field where a characteristic cannot carry them', async () => {
    const part = await world.part('one-sided')
    const flow = await world.characteristic(part, 1, {
      nominal: null,
      lowerLimit: null,
      upperLimit: '2.0',
      unit: 'ml/min',
    })
    const scope = { characteristicId: flow.id }
    const absolute = (unit: string) => ({
      type: 'bias-equivalence',
      parameters: { margin: { base: 'absolute', value: 0.1, unit }, confidence: 0.95 },
    })
    expect(await refusedFor(scope, [readings(), ruleOfTen, equivalence()])).toEqual([
      { path: 'body.clauses.1.parameters.base', message: expect.stringContaining('two-sided tolerance') },
      {
        path: 'body.clauses.2.parameters.margin.base',
        message: expect.stringContaining('absolute value instead'),
      },
    ])
    expect(await refusedFor(scope, [absolute('mm')])).toEqual([
      {
        path: 'body.clauses.0.parameters.margin.unit',
        message: 'A value in mm cannot limit a characteristic in ml/min.',
      },
    ])
    const sent = await world.begin(quality, { ...proposal, ...scope, clauses: [absolute('ml/min')] })
    expect(newest(sent).state).toBe('proposed')
    expect(sent.scope).toMatchObject({ kind: 'characteristic', partId: part.id, characteristicNumber: 1 })
  })

  it('are refused as written, whatever they are about, in a draft too', async () => {
    const draft = { send: false }
    expect(await refusedFor({}, [{ type: 'wish', parameters: {} }], draft)).toMatchObject([
      { path: 'body.clauses.0.type' },
    ])
    expect(
      await refusedFor(
        {},
        [readings(), { type: 'bias-zero-test', parameters: { alpha: 2, beta: 1 } }],
        draft,
      ),
    ).toMatchObject([{ path: 'body.clauses.1.parameters.alpha' }, { path: 'body.clauses.1.parameters.beta' }])
    expect(await refusedFor({}, [equivalence(), readings(), zeroTest()], draft)).toEqual([
      {
        path: 'body.clauses.2',
        message: 'Another clause here judges the same thing. Keep one of the two.',
      },
    ])
    expect(await refusedFor({}, ['x'], draft)).toMatchObject([{ path: 'body.clauses.0' }])
    expect(await refusedFor({}, [])).toEqual([
      { path: 'body.clauses', message: 'Add at least one clause, or one of the terms.' },
    ])
  })

  it('of a wider scope warn of the characteristics they cannot be computed for, and flag safety', async () => {
    const part = await world.part('wider')
    const bore = await world.characteristic(part, 1, { class: 'safety' })
    const flow = await world.characteristic(part, 2, {
      nominal: null,
      lowerLimit: null,
      upperLimit: '2.0',
      unit: 'ml/min',
    })
    const sent = await world.begin(quality, {
      ...proposal,
      partId: part.id,
      clauses: [ruleOfTen, zeroTest()],
    })
    const [round] = newest(sent).rounds
    expect(round?.warnings).toEqual([
      {
        clause: 0,
        code: 'no-tolerance-width',
        path: 'parameters.base',
        message: expect.stringContaining('two-sided tolerance'),
        count: 1,
        characteristicIds: [flow.id],
      },
    ])
    expect(round?.flags).toEqual([
      { clause: 1, code: 'zero-difference', count: 1, characteristicIds: [bore.id] },
    ])
  })

  it('of a wider scope are refused where they can be computed for none of its characteristics', async () => {
    const part = await world.part('none-of-them')
    await world.characteristic(part, 1, { nominal: null, lowerLimit: null, upperLimit: '2.0' })
    expect(await refusedFor({ partId: part.id }, [equivalence()])).toMatchObject([
      { path: 'body.clauses.0.parameters.margin.base' },
    ])
  })

  it('need a scope of one’s own, in use', async () => {
    const part = await world.part('scope')
    const other = await world.part('scope-2')
    const bore = await world.characteristic(part, 1)
    expect(await refusedFor({ partId: other.id, characteristicId: bore.id }, [readings()])).toMatchObject([
      { path: 'body.characteristicId' },
    ])
    expect(await refusedFor({ partId: bore.id }, [readings()])).toMatchObject([{ path: 'body.partId' }])
    const foreign = await world
      .as(world.actors.stranger)
      .send('post', `/organisations/${world.strangers.id}/agreements`)
      .send({ relationshipId: world.relationship.id, ...proposal })
    expect(foreign.body).toMatchObject({ status: 422, errors: [{ path: 'body.relationshipId' }] })
  })
})

describe('who may do what', () => {
  it('leaves answering to the side whose turn it is', async () => {
    const part = await world.part('turns')
    await world.characteristic(part, 1)
    const proposed = await world.begin(quality, { ...proposal, partId: part.id })
    for (const [act, body] of [
      ['accept', {}],
      ['answer', { clauses: [readings()], effectiveOn, send: true }],
    ] as const) {
      const refused = await world
        .as(quality)
        .send('post', world.path(quality, proposed, newest(proposed), act))
        .send({ ...body, expectedVersion: newest(proposed).rowVersion })
      expect(refused.body, act).toMatchObject({ status: 409, code: 'not-your-turn' })
    }
  })

  it('leaves signing to approvers who signed in afresh, on the bytes they saw, once for each side', async () => {
    const part = await world.part('signing')
    await world.characteristic(part, 1)
    const proposed = await world.begin(quality, { ...proposal, partId: part.id })
    const agreed = await world.accept(engineer, proposed, newest(proposed))
    const version = newest(agreed)
    const attempt = (who: Actor, sha256 = version.sha256, expectedVersion = version.rowVersion) =>
      world
        .as(who)
        .send('post', world.path(who, agreed, version, 'sign'))
        .send({ expectedVersion, sha256 })
    world.harness.moveClock(new Date(world.harness.now().getTime() + 6 * 60_000))
    expect((await attempt(supplierApprover)).body).toMatchObject({ status: 403, code: 'sign-in-afresh' })
    for (const person of Object.values(world.people)) world.harness.signInAfresh(person)
    expect((await attempt(engineer)).body).toMatchObject({ status: 403, code: 'not-allowed' })
    expect((await attempt(quality)).body).toMatchObject({ status: 403, code: 'not-allowed' })
    expect((await attempt(world.actors.reader)).body).toMatchObject({ status: 403, code: 'not-allowed' })
    expect((await attempt(world.actors.stranger)).status).toBe(404)
    expect((await attempt(world.actors.strangerAsCustomer)).status).toBe(404)
    expect((await attempt(supplierApprover, 'f'.repeat(64))).body).toMatchObject({
      status: 409,
      code: 'not-as-seen',
    })
    const once = (await attempt(supplierApprover)).body as Answer
    expect(newest(once).signatures).toHaveLength(1)
    const twice = await attempt(supplierApprover, version.sha256, newest(once).rowVersion)
    expect(twice.body).toMatchObject({ status: 409, code: 'own-side-has-signed' })
  })

  it('hides everything from strangers, and from the same organisation on its other side', async () => {
    const part = await world.part('hidden')
    await world.characteristic(part, 1)
    const proposed = await world.begin(quality, { ...proposal, partId: part.id })
    for (const who of [world.actors.stranger, world.actors.strangerAsCustomer]) {
      const read = await world
        .as(who)
        .send('get', `/organisations/${who.organisation.id}/agreements/${proposed.id}`)
      expect(read.status).toBe(404)
      expect((await world.list(who)).total).toBe(0)
    }
    const otherHat = { ...quality, side: 'supplier' } as const
    expect((await world.list(otherHat)).total).toBe(0)
    const otherRead = await world
      .as(otherHat)
      .send('get', `/organisations/${world.customer.id}/agreements/${proposed.id}`)
    expect(otherRead.status).toBe(404)
    const byReader = await world
      .as(world.actors.reader)
      .send('post', world.path(world.actors.reader, proposed, newest(proposed), 'accept'))
      .send({ expectedVersion: newest(proposed).rowVersion })
    expect(byReader.status).toBe(403)
    expect(newest(await world.read(world.actors.reader, proposed.id)).moves).toEqual([])
  })
})

describe('at the same instant', () => {
  const statuses = async (calls: PromiseLike<{ status: number; body: { code?: string } }>[]) => {
    const answers = await Promise.all(calls)
    return answers.map(({ status, body }) => (status === 200 ? 'done' : `${status} ${body.code}`)).sort()
  }

  it('two acceptances leave one', async () => {
    const part = await world.part('two-accepts')
    await world.characteristic(part, 1)
    const proposed = await world.begin(quality, { ...proposal, partId: part.id })
    const accept = (who: Actor) =>
      world
        .as(who)
        .send('post', world.path(who, proposed, newest(proposed), 'accept'))
        .send({ expectedVersion: newest(proposed).rowVersion })
    expect(await statuses([accept(engineer), accept(supplierApprover)])).toEqual([
      '409 changed-meanwhile',
      'done',
    ])
  })

  it('an acceptance and a withdrawal leave one', async () => {
    const part = await world.part('accept-withdraw')
    await world.characteristic(part, 1)
    const proposed = await world.begin(quality, { ...proposal, partId: part.id })
    const body = { expectedVersion: newest(proposed).rowVersion, reason: 'x' }
    const outcome = await statuses([
      world
        .as(engineer)
        .send('post', world.path(engineer, proposed, newest(proposed), 'accept'))
        .send(body),
      world
        .as(quality)
        .send('post', world.path(quality, proposed, newest(proposed), 'withdraw'))
        .send(body),
    ])
    expect(outcome).toEqual(['409 changed-meanwhile', 'done'])
  })

  it('both sides’ first proposals for one scope leave one', async () => {
    const part = await world.part('two-sends')
    await world.characteristic(part, 1)
    const begin = (who: Actor) =>
      world
        .as(who)
        .send('post', `/organisations/${who.organisation.id}/agreements`)
        .send({ relationshipId: world.relationship.id, ...proposal, partId: part.id })
    expect(await statuses([begin(engineer), begin(quality)])).toEqual(['409 negotiation-open', 'done'])
    const list = await world.list(engineer, { partId: part.id })
    expect(list.items).toHaveLength(1)
    expect((await world.list(quality, { partId: part.id })).items).toHaveLength(1)
  })

  it('proposals for several scopes take a number each', async () => {
    const own = await Promise.all(['n-1', 'n-2', 'n-3', 'n-4'].map((number) => world.part(number)))
    for (const part of own) await world.characteristic(part, 1)
    const made = await Promise.all(
      own.map((part, i) => world.begin(i % 2 ? engineer : quality, { ...proposal, partId: part.id })),
    )
    const numbers = made.map(({ number }) => number ?? 0).sort((a, b) => a - b)
    expect(numbers).toEqual(numbers.map((_, i) => (numbers[0] ?? 0) + i))
  })
})

describe('the list', () => {
  it('says the scope in words, whose step it is and what is in force, and finds by each of them', async () => {
    const part = await world.part('88-LIST')
    const bore = await world.characteristic(part, 12, { name: 'Groove depth' })
    await world.agree({ clauses: [readings()], effectiveOn: '2026-11-02', characteristicId: bore.id })
    await world.begin(quality, { ...proposal, characteristicId: bore.id })
    const list = await world.list(engineer, { search: 'groove' })
    expect(list.total).toBe(1)
    expect(list.items[0]).toMatchObject({
      other: { name: 'Nordhof Drives' },
      scope: {
        kind: 'characteristic',
        partNumber: '88-LIST',
        revision: 'A',
        characteristicNumber: 12,
        characteristicName: 'Groove depth',
      },
      newest: { number: 2, state: 'proposed', proposedBy: 'customer', rounds: 1, effectiveOn },
      waitsOn: ['supplier'],
      inForce: { number: 1, effectiveOn: '2026-11-02' },
    })
    const found = async (query: object) =>
      (await world.list(engineer, { partId: part.id, ...query })).items.length
    expect(await found({ state: 'proposed' })).toBe(1)
    expect(await found({ state: 'in-force' })).toBe(1)
    expect(await found({ state: 'withdrawn' })).toBe(0)
    expect(await found({ waitsOn: 'supplier' })).toBe(1)
    expect(await found({ waitsOn: 'customer' })).toBe(0)
    expect(await found({ relationshipId: world.relationship.id })).toBe(1)
    for (const sort of agreements.agreementSorts)
      for (const direction of ['', '-'])
        expect((await world.list(quality, { sort: `${direction}${sort}`, size: 3 })).items).toHaveLength(3)
    const numbers = (await world.list(quality, { sort: '-number', size: 100 })).items.map(
      ({ number }) => number,
    )
    expect(numbers).toEqual([...numbers].sort((a, b) => (b ?? 0) - (a ?? 0)))
  })
})
