import { describe, expect, it } from 'vitest'
import {
  clausesConcerned,
  isReasonOf,
  missingOf,
  reasonsOfTarget,
  sameTarget,
  type ChallengeTarget,
} from './challenge-targets'

type Content = Parameters<typeof missingOf>[1]
const judged = (clauseKey: string, study: string | null) => ({ clauseKey, study })
const content = {
  clauses: [judged('bias/mean', 'BS-1'), judged('resolution/share', null)],
  advisory: [judged('bias/index', 'BS-1')],
  studies: [{ code: 'BS-1', data: { readings: ['24.001', '24.002'] } }],
} as unknown as Content

const readings = (places: number[], study = 'BS-1'): ChallengeTarget => ({
  ...{ kind: 'readings', study, readings: places },
})

describe('the target of a challenge', () => {
  it.each<[ChallengeTarget, ReturnType<typeof missingOf>]>([
    [{ kind: 'clause', clauseKey: 'bias/mean' }, null],
    [{ kind: 'calculation', clauseKey: 'bias/index' }, null],
    [{ kind: 'clause', clauseKey: 'bias/point' }, 'clauseKey'],
    [{ kind: 'standard', study: 'BS-1' }, null],
    [{ kind: 'set-up', study: 'BS-2' }, 'study'],
    [readings([0, 1]), null],
    [readings([2]), 'readings'],
    [readings([0], 'BS-2'), 'study'],
  ])('%j lacks %s', (target, missing) => expect(missingOf(target, content)).toBe(missing))

  it('concerns the clauses that rest on it', () => {
    expect(clausesConcerned(readings([0]), content)).toEqual(['bias/mean', 'bias/index'])
    expect(clausesConcerned({ kind: 'clause', clauseKey: 'bias/mean' }, content)).toEqual(['bias/mean'])
  })

  it.each<[ChallengeTarget, ChallengeTarget, boolean]>([
    [readings([0, 1]), readings([1, 2]), true],
    [readings([0]), readings([1]), false],
    [readings([0]), readings([0], 'BS-2'), false],
    [{ kind: 'clause', clauseKey: 'a' }, { kind: 'clause', clauseKey: 'a' }, true],
    [{ kind: 'clause', clauseKey: 'a' }, { kind: 'calculation', clauseKey: 'a' }, false],
    [{ kind: 'standard', study: 'a' }, { kind: 'standard', study: 'b' }, false],
    [{ kind: 'standard', study: 'a' }, { kind: 'set-up', study: 'a' }, false],
  ])('%j and %j are the same: %s', (a, b, same) => {
    expect(sameTarget(a, b)).toBe(same)
    expect(sameTarget(b, a)).toBe(same)
  })

  it('has reasons of its own kind, and any other in words', () => {
    expect(isReasonOf('readings', 'outlying')).toBe(true)
    expect(isReasonOf('clause', 'outlying')).toBe(false)
    for (const reasons of Object.values(reasonsOfTarget)) expect(reasons).toContain('other')
  })
})
