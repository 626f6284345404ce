import { clauseKey } from '@evenrule/metrology'
import fc from 'fast-check'
import { afterAll, beforeAll, expect, it } from 'vitest'
import {
  agreementMove,
  agreementMoveNames,
  agreementMoves,
  allows,
  noTerms,
  sides,
  type AgreementMoveName,
  type AgreementVersionState,
  type Side,
} from '@evenrule/api/contract'
import { possibleMoves } from '../../packages/api/src/contract/moves/define'
import type { Tenant } from '../../packages/api/src/server/db/tenant'
import { ProblemError } from '../../packages/api/src/server/errors'
import { criteriaFor } from '../../packages/api/src/server/modules/agreements/agreements.apply.service'
import { accept, withdraw } from '../../packages/api/src/server/modules/agreements/agreements.decide.service'
import {
  answer,
  begin,
  discard,
  save,
  send,
} from '../../packages/api/src/server/modules/agreements/agreements.draft.service'
import {
  comment,
  mark,
  withdrawClausesOf,
} from '../../packages/api/src/server/modules/agreements/agreements.remark.service'
import { readAgreementOf } from '../../packages/api/src/server/modules/agreements/agreements.read.service'
import { sign } from '../../packages/api/src/server/modules/agreements/agreements.sign.service'
import {
  equivalence,
  readings,
  startWorld,
  zeroTest,
  type Answer,
  type Version,
  type World,
} from './agreements.world'

let world: World
beforeAll(async () => {
  world = await startWorld()
})
afterAll(() => world.harness.stop())

const dayAfter = (now: Date, days: number): string =>
  new Date(now.getTime() + days * 86_400_000).toISOString().slice(0, 10)

/** An act that somebody tries, whether or not it is possible. */
interface Act {
  name: AgreementMoveName | 'wait'
  side: Side
  approver: boolean
  /** Instead of what is named: the next step towards two signatures, by whoever has it. */
  onwards: boolean
  /** What is begun is kept as a draft first. */
  draft: boolean
  inDays: number
  clauses: number
}
const anAct: fc.Arbitrary<Act> = fc.record({
  name: fc.oneof(
    { weight: 3, arbitrary: fc.constantFrom<Act['name']>('propose', 'accept', 'sign') },
    { weight: 4, arbitrary: fc.constantFrom<Act['name']>('counter', 'keep-draft', 'wait') },
    { weight: 2, arbitrary: fc.constantFrom<Act['name']>('withdraw', 'discard-draft', 'discard-draft') },
    { weight: 2, arbitrary: fc.constantFrom<Act['name']>('comment', 'mark') },
    { weight: 3, arbitrary: fc.constant<Act['name']>('withdraw-clauses') },
  ),
  side: fc.constantFrom(...sides),
  approver: fc.boolean(),
  onwards: fc.boolean(),
  draft: fc.boolean(),
  inDays: fc.integer({ min: 0, max: 4 }),
  clauses: fc.integer({ min: 0, max: 2 }),
})
const choices = [[zeroTest(), readings(20)], [equivalence()], [readings(), zeroTest(0.01)]]

const inTenant = <T>(
  { side, approver }: Pick<Act, 'side' | 'approver'>,
  work: (tenant: Tenant) => Promise<T>,
) => {
  const { engineer, quality, supplierApprover, customerApprover } = world.actors
  const [worker, signer] = side === 'supplier' ? [engineer, supplierApprover] : [quality, customerApprover]
  const { organisation, person } = approver ? signer : worker
  const role =
    side === 'supplier'
      ? approver
        ? 'supplier-approver'
        : 'gauge-engineer'
      : approver
        ? 'customer-approver'
        : 'quality-representative'
  return world.harness.inTenant(side, organisation, person, [role], work)
}

/** Everything about a version that no side may hide, as the owner of the database sees it. */
interface Stored {
  id: string
  state: AgreementVersionState
  sha256: string | null
  signatures: number
}
const storedOf = async (agreementIds: readonly string[]): Promise<Map<string, Stored>> => {
  const { rows } = await world.harness.owner.query<Stored>(
    `select v.id, v.state, v.sha256, (select count(*)::integer from agreement_signatures g where g.version_id = v.id and g.sha256 = v.sha256) as signatures
     from agreement_versions v where v.agreement_id = any($1::uuid[])`,
    [agreementIds],
  )
  return new Map(rows.map((row) => [row.id, row]))
}

/** Tries one move on a version as a person would who sees it. */
async function attempt(tenant: Tenant, act: Act, at: Answer, version: Version): Promise<void> {
  const ids = { agreementId: at.id, versionId: version.id }
  const expectedVersion = version.rowVersion
  const draft = version.rounds.find(({ state }) => state === 'draft')
  const standing = version.rounds.findLast(({ state }) => state !== 'draft')
  const [first] = standing?.clauses ?? []
  const written = {
    clauses: choices[act.clauses] ?? [],
    effectiveOn: dayAfter(world.harness.now(), act.inDays),
    comment: '',
    terms: noTerms,
  }
  switch (act.name) {
    case 'keep-draft':
      if (draft)
        await save(tenant, ids, {
          ...written,
          send: false,
          expectedVersion: draft.rowVersion,
          // Whoever writes on has the round before them that stands now, or still the one they began with.
          ...(act.inDays > 1 && standing ? { answersRound: standing.number } : {}),
        })
      else await answer(tenant, ids, { ...written, caseOf: null, send: false, expectedVersion })
      return
    case 'discard-draft':
      await discard(tenant, ids, draft?.rowVersion ?? 1)
      return
    case 'propose':
      await send(tenant, ids, draft?.rowVersion ?? 1)
      return
    case 'counter':
      if (draft) await send(tenant, ids, draft.rowVersion)
      else await answer(tenant, ids, { ...written, caseOf: null, send: true, expectedVersion })
      return
    case 'withdraw-clauses':
      await withdrawClausesOf(tenant, ids, {
        expectedVersion,
        clauseKeys: [first ? clauseKey(first) : 'bias/mean'],
        words: 'x',
      })
      return
    case 'comment':
      await comment(tenant, ids, {
        round: standing?.number ?? 1,
        about: { kind: 'effective-on', clauseKey: null },
        text: 'x',
      })
      return
    case 'mark':
      await mark(tenant, ids, {
        round: standing?.number ?? 1,
        accepted: act.approver,
        items: (version.acceptance?.items ?? []).map(({ kind, clauseKey: key, sha256 }) => ({
          about: { kind, clauseKey: key },
          sha256,
        })),
      })
      return
    case 'accept':
      await accept(tenant, ids, expectedVersion)
      return
    case 'withdraw':
      await withdraw(tenant, ids, { expectedVersion, reason: 'x' })
      return
    case 'sign':
      await sign(tenant, ids, { expectedVersion, sha256: version.sha256 ?? 'f'.repeat(64) })
      return
    case 'wait':
      return
  }
}

it('never leaves its table of moves, offers what then succeeds, and applies nothing unsigned', async () => {
  const reached = new Set<string>()
  let run = 0
  await fc.assert(
    fc.asyncProperty(fc.array(anAct, { minLength: 8, maxLength: 18 }), async (acts) => {
      run += 1
      const part = await world.part(`run-${run}`)
      const { id: characteristicId } = await world.characteristic(part, 1)
      const scope = { relationshipId: world.relationship.id, partId: part.id, characteristicId }
      for (const act of acts) {
        if (act.name === 'wait') world.harness.moveClock(new Date(world.harness.now().getTime() + 86_400_000))
        else await oneAct(act, scope, reached)
        if (await nothingUnsignedApplies(scope)) reached.add('in force')
      }
    }),
    { numRuns: 20, endOnFailure: true, seed: 20261201 },
  )
  // The walk is worth something only where it gets about.
  for (const name of agreementMoveNames) expect([...reached], name).toContain(name)
  expect([...reached]).toContain('in force')
}, 300_000)

interface Scope {
  relationshipId: string
  partId: string
  characteristicId: string
}

const nextStep: Partial<Record<AgreementVersionState, AgreementMoveName>> = {
  draft: 'propose',
  proposed: 'accept',
  countered: 'accept',
  agreed: 'sign',
}

/** The act itself, or the step that leads on from where the scope stands. */
async function chosen(act: Act, scope: Scope): Promise<Act> {
  if (!act.onwards) return act
  for (const { id, number, begun_by } of await agreementsOf(scope)) {
    const viewer = { side: number === null ? begun_by : act.side, approver: true }
    const { versions } = await inTenant(viewer, (tenant) => readAgreementOf(tenant, id))
    for (const { state, waitsOn } of versions) {
      const [side] = waitsOn
      const name = nextStep[state]
      if (side && name) return { ...act, name, side, approver: true }
    }
  }
  return { ...act, name: 'propose' }
}

async function oneAct(tried: Act, scope: Scope, reached: Set<string>): Promise<void> {
  const act = await chosen(tried, scope)
  const own = await agreementsOf(scope)
  const seen = await inTenant(act, async (tenant) => {
    const answers = []
    for (const { id, number, begun_by } of own)
      if (number !== null || begun_by === act.side) answers.push(await readAgreementOf(tenant, id))
    return answers
  })
  const versions = seen.flatMap((at) => at.versions.map((version) => ({ at, version })))
  const target =
    versions.find(({ version }) => version.moves.includes(act.name as AgreementMoveName)) ?? versions[0]
  if (!target || (act.name === 'keep-draft' && versions.every(({ version }) => version.moves.length === 0)))
    return tryToBegin(act, scope, seen, reached)
  const { at, version } = target
  // Sending is one act; whether it proposes or answers follows from what is sent.
  const sends = act.name === 'propose' || act.name === 'counter'
  const name = sends ? (version.state === 'draft' ? 'propose' : 'counter') : (act.name as AgreementMoveName)
  const before = await storedOf(own.map(({ id }) => id))
  const refusal = await refusalOf(() =>
    inTenant(act, (tenant) => attempt(tenant, { ...act, name }, at, version)),
  )
  const after = await storedOf((await agreementsOf(scope)).map(({ id }) => id))
  const offered = version.moves.includes(name) && !version.hindrances.some(({ move }) => move === name)
  expect(refusal === undefined, `${name} by ${act.side} from ${version.state}: ${refusal}`).toBe(offered)
  if (refusal !== undefined) return expect([...after]).toEqual([...before])
  reached.add(name)
  const to = after.get(version.id)?.state ?? 'discarded'
  const discarded = to === 'discarded'
  expect(
    agreementMove(name, act.side, version.state, discarded ? to : stored(to)),
    `${name} from ${version.state} to ${to}`,
  ).toBeDefined()
  for (const [id, row] of before) if (id !== version.id) expect(after.get(id)).toEqual(row)
  const open = [...after.values()].filter(({ state }) => state === 'proposed' || state === 'countered')
  expect(open.length).toBeLessThanOrEqual(1)
}

const stored = (state: AgreementVersionState) => {
  if (state === 'in-force' || state === 'superseded' || state === 'lapsed')
    throw new Error(`${state} is stored, but follows from dates.`)
  return state
}

async function tryToBegin(act: Act, scope: Scope, seen: readonly Answer[], reached: Set<string>) {
  const mayBegin = seen.every((at) => at.mayBegin)
  const refusal = await refusalOf(() =>
    inTenant(act, (tenant) =>
      begin(tenant, {
        relationshipId: scope.relationshipId,
        partId: scope.partId,
        characteristicId: scope.characteristicId,
        clauses: choices[act.clauses] ?? [],
        effectiveOn: dayAfter(world.harness.now(), act.inDays),
        comment: '',
        terms: noTerms,
        houseTermsId: null,
        caseOf: null,
        send: !act.draft,
      }),
    ),
  )
  expect(refusal === undefined, String(refusal)).toBe(mayBegin)
  if (refusal === undefined) reached.add(act.draft ? 'keep-draft' : 'propose')
}

const refusalOf = async (work: () => Promise<unknown>): Promise<string | undefined> => {
  try {
    await work()
    return undefined
  } catch (error) {
    if (!(error instanceof ProblemError)) throw error
    return error.code
  }
}

const agreementsOf = async ({ characteristicId }: Scope) => {
  const { rows } = await world.harness.owner.query<{ id: string; number: number | null; begun_by: Side }>(
    'select id, number, begun_by from agreements where characteristic_id = $1 order by number nulls last',
    [characteristicId],
  )
  return rows
}

/** Whatever the day, only clauses of versions with two signatures on their very hash, the same for both sides; whether any do. */
async function nothingUnsignedApplies(scope: Scope): Promise<boolean> {
  let applies = false
  const known = await storedOf((await agreementsOf(scope)).map(({ id }) => id))
  for (const on of [0, 3].map((days) => dayAfter(world.harness.now(), days))) {
    const [bySupplier, byCustomer] = [
      await inTenant({ side: 'supplier', approver: false }, (tenant) =>
        criteriaFor(tenant, { ...scope, on }),
      ),
      await inTenant({ side: 'customer', approver: false }, (tenant) =>
        criteriaFor(tenant, { ...scope, on }),
      ),
    ]
    expect(bySupplier).toEqual(byCustomer)
    applies ||= bySupplier.length > 0
    for (const { versionId, versionSha256 } of bySupplier)
      expect(known.get(versionId)).toMatchObject({ state: 'signed', sha256: versionSha256, signatures: 2 })
  }
  return applies
}

it('leads nowhere from what both sides signed, withdrew or let lapse', () => {
  for (const state of ['signed', 'withdrawn'] as const)
    for (const side of sides) expect(possibleMoves(agreementMoves, state, side, () => true)).toEqual([])
  for (const state of ['in-force', 'superseded', 'lapsed'] as const)
    expect(agreementMoves.filter(({ from }) => (from as readonly string[]).includes(state))).toEqual([])
})

it('gives every move to both sides alike, and signing to approvers alone', () => {
  const without = (side: Side) =>
    agreementMoves.filter((move) => move.side === side).map((move) => ({ ...move, side: null }))
  expect(without('supplier')).toEqual(without('customer'))
  const mayMake = (side: Side, role: 'gauge-engineer' | 'supplier-approver' | 'customer-approver') =>
    agreementMoves.some(
      (move) => move.name === 'sign' && move.side === side && allows(move.permission, side, [role]),
    )
  expect(mayMake('supplier', 'gauge-engineer')).toBe(false)
  expect(mayMake('supplier', 'supplier-approver')).toBe(true)
  expect(mayMake('supplier', 'customer-approver')).toBe(false)
})
