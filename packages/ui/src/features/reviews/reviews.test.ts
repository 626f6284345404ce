import { allows, type reviews, type Role, type Side } from '@evenrule/api/contract'
import { challengeMoves } from '@evenrule/api/contract/moves/challenge'
import { describe, expect, it } from 'vitest'
import { challengesOf, isUnderChallenge, mayChallenge, possibleSayings, sayings } from './challenges'

const holding = (side: Side, ...roles: Role[]) =>
  [side, (permission: Parameters<typeof allows>[0]) => allows(permission, side, roles)] as const
const reviewer = holding('customer', 'quality-representative')
const engineer = holding('supplier', 'gauge-engineer')
const reader = holding('customer', 'reader')

describe('what can be said in a challenge', () => {
  it('follows its state, the side and the role', () => {
    expect(possibleSayings('challenged', 'open', ...engineer)).toEqual(['answer'])
    expect(possibleSayings('challenged', 'open', ...reviewer)).toEqual(['withdraw'])
    expect(possibleSayings('answered', 'answered', ...reviewer)).toEqual(['settle', 'reply', 'withdraw'])
    expect(possibleSayings('answered', 'answered', ...engineer)).toEqual([])
    expect(possibleSayings('answered', 'answered', ...reader)).toEqual([])
  })
  it('is nothing once a decision is made or being confirmed', () => {
    for (const state of ['awaiting-second-person', 'refused', 'accepted', 'withdrawn'] as const)
      expect(possibleSayings(state, 'open', ...engineer)).toEqual([])
  })
  it('covers every move of the table that starts from a challenge', () => {
    const names = challengeMoves.filter(({ from }) => from.length > 0).map(({ name }) => name as string)
    // A refusal leaves challenges unresolved by the same act.
    expect(names.filter((name) => name !== 'leave-unresolved').sort()).toEqual([...sayings].sort())
  })
})

describe('opening a challenge', () => {
  it('is the reviewer’s while the decision is to be made', () => {
    expect(mayChallenge('submitted', ...reviewer)).toBe(true)
    expect(mayChallenge('challenged', ...reviewer)).toBe(true)
    expect(mayChallenge('awaiting-second-person', ...reviewer)).toBe(false)
    expect(mayChallenge('submitted', ...engineer)).toBe(false)
    expect(mayChallenge('submitted', ...reader)).toBe(false)
  })
  it('waits until the one before at the same clause is settled', () => {
    const challenge = (number: number, clauseKey: string, state: reviews.Challenge['state']) =>
      ({ number, clauseKey, state }) as reviews.Challenge
    const challenges = [
      challenge(1, 'bias', 'withdrawn'),
      challenge(2, 'bias', 'answered'),
      challenge(3, 'design', 'resolved-by-evidence'),
    ]
    expect(isUnderChallenge({ challenges }, 'bias')).toBe(true)
    expect(isUnderChallenge({ challenges }, 'design')).toBe(false)
    expect(challengesOf({ challenges }, 'bias').map(({ number }) => number)).toEqual([2, 1])
  })
})
