import { array, assert, constantFrom, property } from 'fast-check'
import { describe, expect, it } from 'vitest'
import { allows, sides } from '../access'
import { addDays } from '../days'
import {
  invitationDays,
  invitationKinds,
  invitationMove,
  invitationMoves,
  invitationState,
  invitationStates,
  type InvitationKind,
} from './invitation'

interface Facts {
  acceptedAt: string | null
  revokedAt: string | null
  expiresOn: string
}
const steps = ['day', 'week', 'resend', 'revoke', 'accept'] as const
const instant = (day: string) => `${day}T09:00:00.000Z`

/** What a step does to the facts, where the table allows it. */
function take(facts: Facts, step: (typeof steps)[number], kind: InvitationKind, today: string): Facts {
  if (step === 'day' || step === 'week') return facts
  if (!invitationMove(step, kind, invitationState(facts, today))) return facts
  if (step === 'resend') return { ...facts, expiresOn: addDays(today, invitationDays) }
  return step === 'revoke'
    ? { ...facts, revokedAt: instant(today) }
    : { ...facts, acceptedAt: instant(today) }
}

describe('the moves of an invitation', () => {
  it('are the customer’s admins’ for a supplier, any admin’s for a member, and admins’ to accept for theirs', () => {
    for (const { name, kind, permission } of invitationMoves) {
      if (name === 'accept') expect(permission).toBe(kind === 'member' ? null : 'organisation.change')
      else if (permission)
        expect([kind, ...sides.map((side) => allows(permission, side, ['admin']))]).toEqual([
          ...[kind, kind === 'member', true],
        ])
      for (const side of sides)
        expect(permission && allows(permission, side, ['customer-approver', 'gauge-engineer'])).toBeFalsy()
    }
  })

  it('reach every state that is stored, for each kind, and lead out of none that has ended', () => {
    for (const kind of invitationKinds) {
      const own = invitationMoves.filter((move) => move.kind === kind)
      expect(new Set(own.map(({ to }) => to))).toEqual(new Set(['pending', 'revoked', 'accepted']))
      for (const ended of ['accepted', 'revoked'] as const)
        expect(own.filter(({ from }) => from.includes(ended))).toEqual([])
    }
  })

  it('never leave the table, whatever happens in whatever order; only time makes one expire', () => {
    let changes = 0
    const seen = new Set<string>()
    assert(
      property(
        constantFrom(...invitationKinds),
        array(constantFrom(...steps), { minLength: 3, maxLength: 20 }),
        (kind, story) => {
          let today = '2026-11-02'
          let facts: Facts = { acceptedAt: null, revokedAt: null, expiresOn: addDays(today, invitationDays) }
          for (const step of story) {
            if (step === 'day' || step === 'week') today = addDays(today, step === 'day' ? 1 : 7)
            const before = invitationState(facts, today)
            facts = take(facts, step, kind, today)
            const after = invitationState(facts, today)
            seen.add(after)
            if (before === after) continue
            changes += 1
            expect(step).not.toMatch(/day|week/)
            expect(['pending', 'expired']).toContain(before)
            if (step === 'accept') expect(before).toBe('pending')
          }
        },
      ),
      { numRuns: 2000 },
    )
    expect(changes).toBeGreaterThan(500)
    expect([...seen].sort()).toEqual([...invitationStates].sort())
  })

  it('hold to the end of the last day', () => {
    const facts = { acceptedAt: null, revokedAt: null, expiresOn: '2026-11-16' }
    expect(invitationState(facts, '2026-11-16')).toBe('pending')
    expect(invitationState(facts, '2026-11-17')).toBe('expired')
    expect(invitationState({ ...facts, acceptedAt: instant('2026-11-03') }, '2026-11-17')).toBe('accepted')
  })
})
