import { describe, expect, it } from 'vitest'
import { evaluate, isError } from '../evaluate'
import type { ByHandFacts, Clause, ClauseOutput } from '../types'
import {
  clauseBasis,
  clauseDescriptors,
  clauseKey,
  clauseProblems,
  clauseSubject,
  clauseTypes,
  parseClause,
  typeKey,
} from '.'
import { computedKeys } from './does-not-apply'

const clause = (parameters: object = {}): Clause =>
  parseClause({
    type: 'by-hand',
    parameters: { subject: 'linearity', measure: 'Slope over the range', asks: 'below 1 %', ...parameters },
  })
const documentSha256 = 'ab'.repeat(32)
const judgedAs = (verdict: ByHandFacts['verdict']): ByHandFacts => ({
  verdict,
  reason: 'The laboratory report, page 3.',
  documentSha256,
})
const output = (byHand: unknown): ClauseOutput => {
  const answer = evaluate({ kind: 'clause', unit: 'mm', clause: clause(), byHand })
  if (isError(answer)) throw new Error(`${answer.error.path} ${answer.error.code}`)
  return answer as ClauseOutput
}

describe('a clause judged by hand', () => {
  it('has a key of its subject and its title, in which capitals, spaces and slashes do not matter', () => {
    expect(clauseKey(clause())).toBe('linearity/by-hand/slope-over-the-range')
    expect(clauseKey(clause({ measure: '  Slope  over THE range ' }))).toBe(clauseKey(clause()))
    expect(clauseKey(clause({ measure: 'Slope / range' }))).toBe('linearity/by-hand/slope-range')
    expect(clauseKey(clause({ measure: 'Slope' }))).not.toBe(clauseKey(clause()))
    expect(clauseSubject(clause())).toBe('linearity')
    expect(clauseSubject(clause({ subject: 'attribute' }))).toBe('attribute')
  })

  it('is not shown without a document, and then as somebody judged it', () => {
    for (const missing of [null, undefined])
      expect(output(missing)).toMatchObject({ verdict: 'not-shown', reason: { code: 'no-document' } })
    for (const verdict of ['meets', 'falls-short', 'not-shown'] as const) {
      expect(output(judgedAs(verdict))).toMatchObject({
        verdict,
        figure: null,
        study: null,
        reason: { code: 'judged-by-hand', documentSha256 },
      })
    }
  })

  it.each([
    [{ verdict: 'meets-with-conditions' }, 'byHand.verdict not-a-choice'],
    [{ documentSha256: 'abc' }, 'byHand.documentSha256 not-a-hash'],
    [{ reason: null }, 'byHand.reason missing'],
  ])('%j is refused: %s', (change, problem) => {
    expect(() => output({ ...judgedAs('meets'), ...change })).toThrow(problem)
  })

  it('needs words, and not too many', () => {
    const problems = (parameters: object) =>
      clauseProblems(
        { type: 'by-hand', parameters: { subject: 'bias', measure: 'a', asks: 'b', ...parameters } },
        { unit: 'mm' },
      ).map(({ code, path }) => `${path} ${code}`)
    expect(problems({})).toEqual([])
    expect(problems({ measure: ' \n ' })).toEqual(['parameters.measure missing'])
    expect(problems({ measure: 'x'.repeat(61) })).toEqual(['parameters.measure too-long'])
    expect(problems({ asks: 'x'.repeat(1001) })).toEqual(['parameters.asks too-long'])
    expect(problems({ asks: 5 })).toEqual(['parameters.asks not-text'])
    expect(problems({ subject: 'colour' })).toEqual(['parameters.subject not-a-choice'])
  })
})

describe('a clause that does not apply', () => {
  const taken = (key: string): Clause => ({
    type: 'does-not-apply',
    parameters: { key, reason: 'one-off part' },
  })

  it('has the key of the one it takes away', () => {
    expect(clauseKey(taken('bias/mean'))).toBe('bias/mean')
    expect(clauseSubject(taken('bias/mean'))).toBe('bias')
    expect(clauseKey(taken(clauseKey(clause())))).toBe(clauseKey(clause()))
  })

  it('names a clause there is', () => {
    const problems = (key: string) =>
      clauseProblems(taken(key), { unit: 'mm' }).map(({ code, path }) => `${path} ${code}`)
    for (const key of [...computedKeys, clauseKey(clause())]) expect(problems(key)).toEqual([])
    const none = ['bias', 'bias/colour', 'colour/by-hand/x', 'bias/by-hand/', 'bias/by-hand/a/b', '']
    for (const key of [...none, `bias/by-hand/${'x'.repeat(100)}`])
      expect(problems(key)).toEqual(['parameters.key not-a-choice'])
  })

  it('can take any computed clause away', () => {
    const keys = clauseTypes.map(typeKey).filter((key) => key !== null)
    expect([...new Set(keys)].sort()).toEqual([...computedKeys].sort())
  })

  it('never judges', () => {
    const answer = evaluate({
      kind: 'clause',
      unit: 'mm',
      clause: taken('bias/mean'),
      byHand: judgedAs('meets'),
    })
    expect(answer).toMatchObject({ verdict: 'not-shown', reason: { code: 'does-not-apply' } })
  })
})

describe('subject, key and basis', () => {
  it('are named by the type or by the clause itself', () => {
    for (const type of clauseTypes) {
      const { subject, measure, subjectOf, keyOf } = clauseDescriptors[type]
      expect(subject !== null || subjectOf !== undefined, type).toBe(true)
      expect(measure !== null || keyOf !== undefined, type).toBe(true)
    }
  })

  it('an index rests on what it names', () => {
    const index = (basis: 'estimate' | 'bound'): Clause => ({
      type: 'bias-index',
      parameters: {
        ...{ share: 0.2, base: 'tolerance', sigmas: 6, leastCg: null, leastCgk: 1, confidence: 0.95 },
        basis,
      },
    })
    expect([clauseBasis(index('estimate')), clauseBasis(index('bound'))]).toEqual(['estimate', 'bound'])
    expect(clauseBasis(clause())).toBe('document')
  })
})
