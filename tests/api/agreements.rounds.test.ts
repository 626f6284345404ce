import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { agreements, noTerms, type EndpointShape } from '@evenrule/api/contract'
import { agreementComments } from '../../packages/api/src/server/modules/agreements/agreements.remarks.table'
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
let count = 0

beforeAll(async () => {
  world = await startWorld()
  ;({ engineer, quality, supplierApprover, customerApprover } = world.actors)
})
afterAll(() => world.harness.stop())

const effectiveOn = '2027-01-01'
/** A proposal of the customer for a part of its own. */
async function proposed(clauses = [zeroTest(), readings(20), ruleOfTen], more: object = {}): Promise<Answer> {
  const part = await world.part(`rounds-${(count += 1)}`)
  await world.characteristic(part, 1)
  return world.begin(quality, { partId: part.id, clauses, effectiveOn, send: true, ...more })
}
const at = (agreement: Answer) => ({ agreementId: agreement.id, versionId: newest(agreement).id })
const act = <E extends EndpointShape>(who: Actor, endpoint: E, agreement: Answer, body: object) =>
  world.as(who).call(endpoint, world.inside(who, at(agreement)), { body })

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
const itemOf = (agreement: Answer, key: string) => {
  const found = newest(agreement).acceptance?.items.find(({ kind, clauseKey }) => (clauseKey ?? kind) === key)
  if (!found) throw new Error(`Nothing to accept: ${key}`)
  return { about: { kind: found.kind, clauseKey: found.clauseKey }, sha256: found.sha256 }
}
const marks = (agreement: Answer, keys: string[], accepted = true) => ({
  round: newest(agreement).acceptance?.round,
  items: keys.map((key) => itemOf(agreement, key)),
  accepted,
})
const accepted = (agreement: Answer) =>
  Object.fromEntries(
    (newest(agreement).acceptance?.items ?? []).map(({ kind, clauseKey, supplier, customer }) => [
      clauseKey ?? kind,
      [supplier && `${supplier.how} ${supplier.round}`, customer && `${customer.how} ${customer.round}`],
    ]),
  )
const eventsOf = async (agreement: Answer) => {
  const { rows } = await world.harness.owner.query<{ type: string; chain_id: string; text: string }>(
    'select type, chain_id, text from record_events where subject_id = $1 order by at, sequence',
    [newest(agreement).id],
  )
  return rows
}
const messagesTo = async (who: Actor, agreement: Answer) => {
  const { rows } = await world.harness.owner.query<{ subject: string; body: string }>(
    'select subject, body from messages where user_id = $1 and link like $2 order by created_at, id',
    [who.person.id, `%${agreement.id}%`],
  )
  return rows
}

describe('five rounds', () => {
  it('go to and fro with terms, marks and comments to two signatures on what both accepted', async () => {
    const first = await proposed()
    const second = await act(engineer, agreements.answerRound, await world.read(engineer, first.id), {
      expectedVersion: newest(first).rowVersion,
      clauses: [equivalence(), readings(20), ruleOfTen],
      terms: { validityMonths: 24 },
      effectiveOn,
      comment: 'The zero test rewards a worse gauge.',
      send: true,
    })
    const third = await world.answer(quality, second, newest(second), {
      clauses: [equivalence(0.04), readings(20), ruleOfTen],
      terms: { validityMonths: 12, readingsTakerMaySign: false },
      effectiveOn,
      send: true,
    })
    const fourth = await world.answer(engineer, third, newest(third), {
      clauses: [equivalence(0.04), readings(20)],
      terms: { validityMonths: 12, readingsTakerMaySign: false },
      effectiveOn: '2027-02-01',
      send: true,
    })
    const fifth = await world.answer(quality, fourth, newest(fourth), {
      clauses: [equivalence(0.04), readings(20), ruleOfTen],
      terms: { validityMonths: 12, readingsTakerMaySign: false },
      effectiveOn: '2027-02-01',
      send: true,
    })
    expect(
      newest(fifth).rounds.map(({ number, side, state, answersRound }) => [
        number,
        side,
        state,
        answersRound,
      ]),
    ).toEqual([
      [1, 'customer', 'answered', null],
      [2, 'supplier', 'answered', 1],
      [3, 'customer', 'answered', 2],
      [4, 'supplier', 'answered', 3],
      [5, 'customer', 'sent', 4],
    ])
    expect(accepted(fifth)).toEqual({
      'bias/mean': ['written 4', 'written 3'],
      'design/readings': ['written 2', 'written 1'],
      // Left out in between, so that its writing in round 2 counts no more.
      'resolution/share': [null, 'written 5'],
      terms: ['written 4', 'written 3'],
      'effective-on': ['written 4', 'written 5'],
    })
    const marked = await act(engineer, agreements.markAccepted, fifth, marks(fifth, ['resolution/share']))
    expect(newest(marked).acceptance?.everythingBy).toEqual(['supplier', 'customer'])
    expect(newest(marked).state).toBe('countered')
    const agreed = await world.accept(engineer, marked, newest(marked))
    expect(JSON.parse(newest(agreed).text ?? '')).toMatchObject({
      clauses: [equivalence(0.04), readings(20), ruleOfTen],
      terms: { ...noTerms, validityMonths: 12, readingsTakerMaySign: false },
      effectiveOn: '2027-02-01',
    })
    const once = await world.sign(supplierApprover, agreed, newest(agreed))
    const signed = await world.sign(customerApprover, once, newest(once))
    expect(newest(signed)).toMatchObject({ state: 'signed', moves: [] })
    expect((await messagesTo(quality, signed)).map(({ subject }) => subject.split('.')[0])).toContain(
      'Everything you proposed is marked as accepted',
    )
  })
})

describe('a clause taken out of one’s own proposal', () => {
  it('makes a new round of the same side that stands, with the words, and tells the other', async () => {
    const first = await proposed()
    const taken = await act(quality, agreements.withdrawClauses, first, {
      expectedVersion: newest(first).rowVersion,
      clauseKeys: ['bias/mean'],
      words: 'We look at that one again ourselves.',
    })
    expect(newest(taken)).toMatchObject({
      state: 'proposed',
      waitsOn: ['supplier'],
      rounds: [
        { number: 1, state: 'replaced', clauses: [zeroTest(), readings(20), ruleOfTen] },
        {
          number: 2,
          side: 'customer',
          state: 'sent',
          clauses: [readings(20), ruleOfTen],
          withdrawnClauses: ['bias/mean'],
          comment: 'We look at that one again ourselves.',
          effectiveOn,
        },
      ],
    })
    // Nobody else had wanted it, so that it is gone is not to be accepted.
    expect(accepted(taken)).toEqual({
      'design/readings': [null, 'written 1'],
      'resolution/share': [null, 'written 1'],
      'effective-on': [null, 'written 1'],
    })
    expect((await eventsOf(taken)).at(-1)).toMatchObject({
      type: 'agreement.clauses-withdrawn',
      chain_id: world.relationship.id,
    })
    const told = (await messagesTo(engineer, taken)).at(-1)
    expect(told?.subject).toContain('A clause was taken out')
    expect(told?.body).toContain('We look at that one again ourselves.')
    const [row] = (await world.list(engineer, { partId: taken.scope.partId })).items
    expect(row).toMatchObject({ newest: { rounds: 2, proposedBy: 'customer' }, waitsOn: ['supplier'] })
  })

  it('needs words, a clause that stands there, something left, and the standing proposal', async () => {
    const first = await proposed()
    const body = { expectedVersion: newest(first).rowVersion, clauseKeys: ['bias/mean'], words: 'x' }
    const take = (who: Actor, more: object) =>
      refused(act(who, agreements.withdrawClauses, first, { ...body, ...more }))
    expect(await take(quality, { words: ' ' })).toMatchObject({
      status: 422,
      errors: [{ path: 'body.words' }],
    })
    expect(await take(quality, { clauseKeys: ['bias/index'] })).toMatchObject({
      status: 422,
      errors: [{ path: 'body.clauseKeys' }],
    })
    const everything = ['bias/mean', 'design/readings', 'resolution/share']
    expect(await take(quality, { clauseKeys: everything })).toMatchObject({
      status: 409,
      code: 'last-clause',
    })
    expect(await take(engineer, {})).toMatchObject({ status: 409, code: 'own-side-does-not-stand' })
    expect(await take(quality, { expectedVersion: 7 })).toMatchObject({
      status: 409,
      code: 'changed-meanwhile',
    })
    const countered = await world.answer(engineer, first, newest(first), {
      clauses: [equivalence()],
      effectiveOn,
      send: true,
    })
    expect(await take(quality, { expectedVersion: newest(countered).rowVersion })).toMatchObject({
      status: 409,
      code: 'own-side-does-not-stand',
    })
  })

  it('leaves an answer on its way to be looked at again, and neither side learns of the other’s', async () => {
    const first = await proposed()
    const drafted = await world.answer(engineer, first, newest(first), {
      clauses: [equivalence(), readings(20), ruleOfTen],
      effectiveOn,
    })
    expect(newest(drafted).rounds.at(-1)).toMatchObject({ number: 2, state: 'draft', answersRound: 1 })
    const taken = await act(quality, agreements.withdrawClauses, first, {
      expectedVersion: newest(first).rowVersion,
      clauseKeys: ['resolution/share'],
      words: 'The gauge is known.',
    })
    expect(newest(taken).rounds.map(({ number, state }) => [number, state])).toEqual([
      [1, 'replaced'],
      [2, 'sent'],
    ])
    const seen = await world.read(engineer, first.id)
    const draft = newest(seen).rounds.at(-1)
    expect(draft).toMatchObject({ number: 3, state: 'draft', answersRound: 1 })
    expect(newest(seen).hindrances).toContainEqual({ move: 'counter', code: 'round-replaced' })
    const expectedVersion = draft?.rowVersion
    expect(await refused(act(engineer, agreements.sendDraft, seen, { expectedVersion }))).toMatchObject({
      status: 409,
      code: 'round-replaced',
    })
    const written = { clauses: [equivalence(), readings(20)], effectiveOn, send: true, expectedVersion }
    const sent = await act(engineer, agreements.saveDraft, seen, { ...written, answersRound: 2 })
    expect(newest(sent).rounds.at(-1)).toMatchObject({ number: 3, state: 'sent', answersRound: 2 })
    expect(newest(sent).state).toBe('countered')
  })
})

describe('comments', () => {
  it('are written by either side about one thing of a round, read by both, and stay', async () => {
    const first = await proposed()
    const about = { kind: 'clause', clauseKey: 'bias/mean' }
    await act(engineer, agreements.commentOnRound, first, { round: 1, about, text: 'Why this one?' })
    await act(quality, agreements.commentOnRound, first, { round: 1, about, text: 'As last year.' })
    const last = await act(engineer, agreements.commentOnRound, first, {
      round: 1,
      about: { kind: 'effective-on' },
      text: 'That is a holiday.',
    })
    for (const who of [engineer, quality, world.actors.reader])
      expect(newest(await world.read(who, first.id)).comments).toMatchObject([
        { round: 1, about, side: 'supplier', by: 'Grit Falk', text: 'Why this one?' },
        { round: 1, about, side: 'customer', by: 'Ola Brandt', text: 'As last year.' },
        { round: 1, about: { kind: 'effective-on', clauseKey: null }, side: 'supplier' },
      ])
    expect(newest(last).rowVersion).toBe(newest(first).rowVersion)
    const told = (await messagesTo(quality, first)).map(({ body }) => body)
    expect(told.some((body) => body.includes('Why this one?'))).toBe(true)
    const events = await eventsOf(first)
    expect(events.map(({ type }) => type)).toEqual([
      'agreement.proposed',
      'agreement.commented',
      'agreement.commented',
      'agreement.commented',
    ])
    expect(JSON.parse(events[1]?.text ?? '').data).toMatchObject({ round: 1, about })
  })

  it('may be about an earlier round, and about a version that waits for signatures, but not after its end', async () => {
    const first = await proposed()
    const countered = await world.answer(engineer, first, newest(first), {
      clauses: [equivalence()],
      effectiveOn,
      send: true,
    })
    const about = { kind: 'clause', clauseKey: 'resolution/share' }
    const body = { round: 1, about, text: 'You left it out.' }
    expect(newest(await act(quality, agreements.commentOnRound, countered, body)).comments).toHaveLength(1)
    const agreed = await world.accept(quality, countered, newest(countered))
    expect(newest(await act(engineer, agreements.commentOnRound, agreed, body)).comments).toHaveLength(2)
    const ended = await world.withdraw(engineer, agreed, newest(agreed))
    expect(await refused(act(engineer, agreements.commentOnRound, ended, body))).toMatchObject({
      status: 409,
      code: 'wrong-state',
    })
  })

  it('and marks are impossible on drafts, unknown clauses, for readers and for strangers', async () => {
    const part = await world.part('rounds-draft')
    await world.characteristic(part, 1)
    const draft = await world.begin(quality, { partId: part.id, clauses: [zeroTest()], effectiveOn })
    const about = { kind: 'clause', clauseKey: 'bias/mean' }
    const comment = { round: 1, about, text: 'x' }
    const mark = { round: 1, items: [{ about, sha256: 'f'.repeat(64) }] }
    for (const who of [quality, customerApprover]) {
      for (const [endpoint, body] of [
        [agreements.commentOnRound, comment],
        [agreements.markAccepted, mark],
      ] as const)
        expect(await refused(act(who, endpoint, draft, body)), who.person.name).toMatchObject({
          status: 409,
          code: 'wrong-state',
        })
    }
    const first = await proposed()
    const answered = await world.answer(engineer, first, newest(first), {
      clauses: [equivalence()],
      effectiveOn,
    })
    // The answer is a draft: its own side cannot comment on it either, and the other does not know of it.
    for (const who of [engineer, quality])
      expect(
        await refused(act(who, agreements.commentOnRound, answered, { ...comment, round: 2 })),
      ).toMatchObject({ status: 409, code: 'not-a-sent-round' })
    expect(
      await refused(
        act(engineer, agreements.commentOnRound, first, {
          ...comment,
          about: { kind: 'clause', clauseKey: 'bias/index' },
        }),
      ),
    ).toMatchObject({ status: 409, code: 'not-a-sent-round' })
    expect(await refused(act(world.actors.reader, agreements.commentOnRound, first, comment))).toMatchObject({
      status: 403,
    })
    for (const stranger of [world.actors.stranger, world.actors.strangerAsCustomer])
      expect(await refused(act(stranger, agreements.commentOnRound, first, comment))).toMatchObject({
        status: 404,
      })
    // Not even past the services: row security asks that the round was sent, and that one writes for one's own side.
    const draftRound = newest(answered).rounds.at(-1)
    for (const [round, side] of [
      [draftRound, 'supplier'],
      [newest(first).rounds[0], 'customer'],
    ] as const)
      await expect(
        world.harness.inTenant('supplier', world.supplier, world.people.engineer, [], async ({ tx }) => {
          await tx.insert(agreementComments).values({
            relationshipId: world.relationship.id,
            supplierOrgId: world.supplier.id,
            customerOrgId: world.customer.id,
            versionId: newest(first).id,
            roundId: round?.id ?? '',
            about: 'effective-on',
            side,
            userId: world.people.engineer.id,
            at: world.harness.now().toISOString(),
            text: 'x',
          })
        }),
      ).rejects.toMatchObject({ cause: { code: '42501' } })
  })
})

describe('marks', () => {
  it('hold for the bytes they name, are carried while those stay, and can be taken back', async () => {
    const first = await proposed()
    const marked = await act(
      engineer,
      agreements.markAccepted,
      first,
      marks(first, ['design/readings', 'bias/mean']),
    )
    expect(accepted(marked)).toMatchObject({
      'design/readings': ['marked 1', 'written 1'],
      'bias/mean': ['marked 1', 'written 1'],
      'resolution/share': [null, 'written 1'],
    })
    const [item] = newest(marked).acceptance?.items ?? []
    expect(item?.supplier).toMatchObject({ by: 'Grit Falk' })
    const back = await act(engineer, agreements.markAccepted, marked, marks(marked, ['bias/mean'], false))
    expect(accepted(back)['bias/mean']).toEqual([null, 'written 1'])
    // The customer takes the resolution out and leaves the rest as it is.
    const taken = await act(quality, agreements.withdrawClauses, back, {
      expectedVersion: newest(back).rowVersion,
      clauseKeys: ['resolution/share'],
      words: 'Known.',
    })
    expect(accepted(taken)).toEqual({
      'bias/mean': [null, 'written 1'],
      'design/readings': ['marked 1', 'written 1'],
      'effective-on': [null, 'written 1'],
    })
    const events = (await eventsOf(taken)).map(({ type }) => type)
    expect(events.filter((type) => type === 'agreement.marked')).toHaveLength(2)
  })

  it('are refused for another round, other bytes, and one’s own side’s proposal', async () => {
    const first = await proposed()
    const good = marks(first, ['bias/mean'])
    const [item] = good.items
    const mark = (who: Actor, body: object) => refused(act(who, agreements.markAccepted, first, body))
    expect(await mark(quality, good)).toMatchObject({ status: 409, code: 'not-your-turn' })
    for (const wrong of [
      { ...good, round: 2 },
      { ...good, items: [{ ...item, sha256: 'f'.repeat(64) }] },
      { ...good, items: [{ ...item, about: { kind: 'clause', clauseKey: 'design/readings' } }] },
      { ...good, items: [{ ...item, about: { kind: 'terms' } }] },
    ])
      expect(await mark(engineer, wrong)).toMatchObject({ status: 409, code: 'round-replaced' })
    expect(await mark(engineer, { ...good, items: [{ ...item, about: { kind: 'clause' } }] })).toMatchObject({
      status: 422,
      errors: [{ path: 'body.items.0.about.clauseKey' }],
    })
    expect(accepted(await world.read(quality, first.id))['bias/mean']).toEqual([null, 'written 1'])
  })
})

describe('two people of one side', () => {
  it('who write one draft do not overwrite each other: the second gets what the first saved', async () => {
    const part = await world.part('rounds-two')
    await world.characteristic(part, 1)
    const draft = await world.begin(quality, { partId: part.id, clauses: [zeroTest()], effectiveOn })
    const save = (who: Actor, readingsLeast: number, expectedVersion: number) =>
      act(who, agreements.saveDraft, draft, {
        clauses: [zeroTest(), readings(readingsLeast)],
        terms: { validityMonths: readingsLeast },
        effectiveOn,
        comment: `by ${who.person.name}`,
        expectedVersion,
      })
    const results = await Promise.allSettled([save(quality, 20, 1), save(customerApprover, 30, 1)])
    expect(results.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected'])
    const winner = results[0]?.status === 'fulfilled' ? quality : customerApprover
    const loser = winner === quality ? customerApprover : quality
    const least = winner === quality ? 20 : 30
    const failed = results.find((each) => each.status === 'rejected')
    const { code, current } = (failed?.reason as { problem: Refusal }).problem
    expect(code).toBe('changed-meanwhile')
    const conflict = agreements.draftConflictSchema.parse(current)
    expect(conflict).toMatchObject({
      agreementId: draft.id,
      versionId: newest(draft).id,
      draft: {
        by: winner.person.name,
        state: 'draft',
        clauses: [zeroTest(), readings(least)],
        terms: { ...noTerms, validityMonths: least },
        comment: `by ${winner.person.name}`,
        savedAt: world.harness.now().toISOString(),
        rowVersion: 2,
      },
    })
    expect(newest(await world.read(loser, draft.id)).rounds[0]?.clauses).toEqual([
      zeroTest(),
      readings(least),
    ])
    // With both texts before them they put them together, and save over what they saw.
    const merged = await save(loser, 25, conflict.draft?.rowVersion ?? 0)
    expect(newest(merged).rounds[0]).toMatchObject({
      by: loser.person.name,
      clauses: [zeroTest(), readings(25)],
    })
  })

  it('of whom one sends, discards or answers first tell the other so', async () => {
    const part = await world.part('rounds-three')
    await world.characteristic(part, 1)
    const draft = await world.begin(quality, { partId: part.id, clauses: [zeroTest()], effectiveOn })
    // A colleague begins for the same scope: there is a draft, and it comes along.
    const begun = await refused(
      world.begin(customerApprover, { partId: part.id, clauses: [equivalence()], effectiveOn }),
    )
    expect(begun).toMatchObject({ status: 409, code: 'draft-exists' })
    expect(agreements.draftConflictSchema.parse(begun.current)).toMatchObject({
      agreementId: draft.id,
      draft: { by: 'Ola Brandt', clauses: [zeroTest()] },
    })
    const sent = await act(quality, agreements.sendDraft, draft, { expectedVersion: 1 })
    const body = { clauses: [equivalence()], effectiveOn, expectedVersion: 1 }
    const late = await refused(act(customerApprover, agreements.saveDraft, draft, body))
    expect(late.code).toBe('changed-meanwhile')
    expect(agreements.draftConflictSchema.parse(late.current).draft).toMatchObject({
      state: 'sent',
      by: 'Ola Brandt',
    })
    const answered = await world.answer(engineer, sent, newest(sent), {
      clauses: [equivalence()],
      effectiveOn,
    })
    const twice = await refused(
      world.answer(supplierApprover, sent, newest(sent), { clauses: [readings()], effectiveOn }),
    )
    expect(twice.code).toBe('draft-exists')
    expect(agreements.draftConflictSchema.parse(twice.current).draft).toMatchObject({
      by: 'Grit Falk',
      clauses: [equivalence()],
    })
    await act(engineer, agreements.discardDraft, answered, { expectedVersion: 1 })
    const gone = await refused(act(supplierApprover, agreements.saveDraft, answered, body))
    expect(agreements.draftConflictSchema.parse(gone.current).draft).toBeNull()
    // To the other side the refusals say nothing of drafts.
    const other = await refused(
      world.answer(quality, sent, newest(sent), { clauses: [readings()], effectiveOn }),
    )
    expect(other).toMatchObject({ code: 'not-your-turn' })
    expect(other.current).toBeUndefined()
  })
})

describe('what a proposal says', () => {
  it('may be terms alone; nothing at all is not sent', async () => {
    const terms = await proposed([], { terms: { validityMonths: 12 } })
    expect(newest(terms).rounds[0]).toMatchObject({ clauses: [], terms: { ...noTerms, validityMonths: 12 } })
    expect(await refused(proposed([]))).toMatchObject({ status: 422, errors: [{ path: 'body.clauses' }] })
    expect(await refused(proposed([zeroTest()], { terms: { validityMonths: 0 } }))).toMatchObject({
      status: 422,
      errors: [{ path: 'body.terms.validityMonths' }],
    })
  })

  it('may not take away a clause where there is no wider scope', async () => {
    const takes = { type: 'does-not-apply', parameters: { key: 'bias/mean', reason: 'No reference.' } }
    expect(await refused(world.begin(quality, { clauses: [takes], effectiveOn, send: true }))).toMatchObject({
      status: 422,
      errors: [{ path: 'body.clauses.0.parameters.key' }],
    })
    expect(newest(await proposed([takes as never])).rounds[0]?.clauses).toEqual([takes])
  })

  it('covers characteristics that are paged', async () => {
    const part = await world.part('rounds-many')
    for (let number = 1; number <= 55; number += 1) await world.characteristic(part, number)
    const wide = await world.begin(quality, { partId: part.id, clauses: [zeroTest()], effectiveOn })
    expect(wide.characteristics).toHaveLength(agreements.characteristicsPerAgreement)
    expect(wide.characteristicsTotal).toBe(55)
    const page = await world
      .as(quality)
      .call(agreements.listScoped, world.inside(quality, { agreementId: wide.id }), {
        query: { page: 2, size: 50, sort: 'number' },
      })
    expect(page).toMatchObject({ total: 55, page: 2 })
    expect(page.items.map(({ number }) => number)).toEqual([51, 52, 53, 54, 55])
    expect(
      await refused(
        world.as(engineer).call(agreements.listScoped, world.inside(engineer, { agreementId: wide.id })),
      ),
    ).toMatchObject({ status: 404 })
  })
})
