import { whatIfOf, whatIfTextSchema } from '@evenrule/api/contract/what-if'
import { canonicalText, evaluate, type Clause } from '@evenrule/metrology'
import { describe, expect, it } from 'vitest'
import { submissionOf } from '../submissions/fixture'
import { readContent } from '../submissions/reading'
import { submissionBase } from './base'
import { changesAnything, clausePath, readChanges, substitutes, typedClause, unchanged } from './changes'
import { changeLines } from './changeWords'
import { changedOf, clauseOf, quoteOf, QuoteProblem } from './quote'
import { comesOutDifferently, suppose } from './suppose'

const texts = ['24.0006', '23.9995', '24.0011', '24.0002', '23.9990', '24.0008', '24.0041', '24.0005']
const equivalence: Clause = {
  type: 'bias-equivalence',
  parameters: { margin: { base: 'tolerance', share: 0.05 }, confidence: 0.95 },
}
const resolution: Clause = { type: 'resolution-share', parameters: { share: 0.05, base: 'tolerance' } }
const engineSha256 = 'c'.repeat(64)
const submission = await submissionOf({ texts, engineSha256, clauses: [equivalence, resolution] })
const base = submissionBase(readContent(submission))
const start = unchanged(base)
const seen = (text: string) => text.replaceAll('\u202F', ' ')
/** Stands for the released engine: the same computation. */
const run = (inputText: string) => Promise.resolve(canonicalText(evaluate(JSON.parse(inputText))))

describe('a what-if in which nothing is changed', () => {
  it('offers what was submitted and changes nothing, whatever way it is typed', () => {
    expect(start).toMatchObject({ study: 'S-1', reference: '24', lower: '23.975', upper: '24.025' })
    const { changes, problems } = readChanges(base, { ...start, reference: '24,000', upper: ' 24.0250' })
    expect(problems).toEqual({})
    expect(changesAnything(changes)).toBe(false)
    expect(suppose(base, changes).every(({ after }) => after === null)).toBe(true)
  })

  it('is the same with the agreed clause opened for typing', () => {
    const own = typedClause('bias-equivalence', 'mm', equivalence.parameters)
    const { changes } = readChanges(base, { ...start, clauses: { 'bias/mean': own } })
    expect(changesAnything(changes)).toBe(false)
  })
})

describe('what is changed', () => {
  it('leaves readings out of the clauses that rest on them, and of no other', () => {
    const { changes } = readChanges(base, { ...start, leftOut: [6] })
    const [bias, step] = suppose(base, changes)
    expect(bias!.after!.output.study!.n).toBe(7)
    expect(bias!.before.output.study!.n).toBe(8)
    const without = texts.filter((_, at) => at !== 6).map((text) => Number(text) - 24)
    const mean = without.reduce((sum, value) => sum + value, 0) / 7
    expect(bias!.after!.output.figure).toBeCloseTo(mean, 12)
    expect(comesOutDifferently(bias!)).toBe(true)
    expect(comesOutDifferently(step!)).toBe(false)
  })

  it('supposes another reference value, other limits, and says where they cannot be', () => {
    const { changes } = readChanges(base, { ...start, reference: '24,0003', upper: '24.005' })
    const [bias, step] = suppose(base, changes)
    expect(bias!.after!.output.limits).toEqual({ lower: -0.0015, upper: 0.0015 })
    expect(step!.after!.output.figure).toBeCloseTo(0.001 / 0.03, 12)
    expect(readChanges(base, { ...start, lower: '25' }).problems).toHaveProperty('upper')
    expect(readChanges(base, { ...start, reference: 'x' }).problems).toHaveProperty('reference')
    expect(readChanges(base, { ...start, leftOut: texts.map((_, at) => at) }).problems).toHaveProperty(
      'leftOut',
    )
  })

  it('tries another kind of clause on the same readings', () => {
    expect(substitutes(equivalence)).toEqual(expect.arrayContaining(['bias-zero-test', 'bias-index']))
    expect(substitutes(resolution)).toEqual(['resolution-share'])
    const own = typedClause('bias-zero-test', 'mm')
    const { changes } = readChanges(base, { ...start, clauses: { 'bias/mean': own } })
    const [bias] = suppose(base, changes)
    expect(bias!.after!.clause.type).toBe('bias-zero-test')
    expect(bias!.before.clause.type).toBe('bias-equivalence')
  })

  it('names the field of a clause that cannot be read', () => {
    const own = typedClause('bias-equivalence', 'mm', equivalence.parameters)
    const typed = { ...own, parameters: { ...own.parameters, confidence: 'x' } }
    const { problems } = readChanges(base, { ...start, clauses: { 'bias/mean': typed } })
    expect(Object.keys(problems)).toEqual([clausePath('bias/mean', 'confidence')])
  })

  it('is told line by line, with every place entered', () => {
    const own = typedClause('bias-zero-test', 'mm')
    const { changes } = readChanges(base, {
      ...start,
      leftOut: [2, 3, 6],
      reference: '24.0003',
      upper: '',
      clauses: { 'bias/mean': own },
    })
    expect(changeLines(changedOf(base, changes), 'mm').map(seen)).toEqual([
      'Readings 3, 4, 7 left out',
      'Reference value 24.0003 mm instead of 24.0000 mm',
      'Limits at least 23.975 mm instead of 23.975 to 24.025 mm',
      '“Bias not told from zero by the zero-difference test, α 0.05” instead of “Bias within ±5 % of tolerance, shown at 95 %”',
    ])
  })
})

describe('a what-if quoted in a challenge', () => {
  const { changes } = readChanges(base, { ...start, leftOut: [6] })

  it('holds what was changed and both figures, computed by the engine that the submission names', async () => {
    const asked: string[] = []
    const { quote, text } = await quoteOf(base, changes, (input, hash) => {
      asked.push(hash)
      return run(input)
    })
    expect(new Set(asked)).toEqual(new Set([engineSha256]))
    expect(quote).toMatchObject({
      submissionSha256: submission.sha256,
      study: 'S-1',
      changed: { leftOut: [6], referenceValue: null, tolerance: null, clauses: [] },
      engineSha256,
    })
    expect(quote.results.map(({ clauseKey }) => clauseKey)).toEqual(['bias/mean'])
    expect(quote.results[0]!.before.figure).toBe(base.results[0]!.output.figure)
    expect(quote.results[0]!.after.readings).toBe(7)
    expect(clauseOf(quote)).toBe('bias/mean')
    expect(whatIfTextSchema.safeParse(text).success).toBe(true)
    expect(whatIfOf(text)).toEqual(quote)
  })

  it('is refused by the contract where it was tampered with', async () => {
    const { text } = await quoteOf(base, changes, run)
    expect(whatIfTextSchema.safeParse(` ${text}`).success).toBe(false)
    expect(whatIfTextSchema.safeParse(text.replace('bias-equivalence', 'bias-nonsense')).success).toBe(false)
    expect(whatIfOf('{}')).toBeNull()
    expect(whatIfOf('no json')).toBeNull()
  })

  it('is not made where the engine does not know the clause', async () => {
    const unknown = () => Promise.resolve('{"error":{"code":"not-a-choice","message":"","path":""}}')
    await expect(quoteOf(base, changes, unknown)).rejects.toBeInstanceOf(QuoteProblem)
  })
})
