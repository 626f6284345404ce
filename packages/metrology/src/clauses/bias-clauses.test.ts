import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { evaluate, isError } from '../evaluate'
import type {
  BiasIndexParameters,
  Characteristic,
  Clause,
  ClauseInput,
  ClauseOutput,
  JudgeOutput,
  Margin,
  Verdict,
} from '../types'

const twoSided: Characteristic = {
  unit: 'mm',
  tolerance: { lower: 9.9, upper: 10.1 },
  processStandardDeviation: 0.03,
}
const tenth: Margin = { base: 'tolerance', share: 0.1 }
const usual: BiasIndexParameters = {
  ...{ share: 0.2, base: 'tolerance', sigmas: 6, leastCg: 1.33, leastCgk: 1.33 },
  ...{ basis: 'estimate', confidence: 0.95 },
}
const equivalence = (confidence = 0.95, margin: Margin = tenth): Clause => ({
  type: 'bias-equivalence',
  parameters: { margin, confidence },
})
const inside = (confidence = 0.95, margin: Margin = tenth): Clause => ({
  type: 'bias-interval-inside',
  parameters: { margin, confidence },
})
const point = (margin: Margin = tenth): Clause => ({ type: 'bias-point', parameters: { margin } })
const index = (changed: Partial<BiasIndexParameters> = {}): Clause => ({
  type: 'bias-index',
  parameters: { ...usual, ...changed },
})
const uncertain = (margin: Margin = tenth, coverageFactor = 2): Clause => ({
  type: 'bias-with-uncertainty',
  parameters: { margin, coverageFactor },
})
const zeroTest: Clause = { type: 'bias-zero-test', parameters: { alpha: 0.05 } }

/** A result as somebody may hand it to `judge`. */
const result = (n: number, bias: number | null, standardDeviation: number | null, u?: number | null) => ({
  kind: 'bias',
  n,
  bias,
  standardDeviation,
  reference: { value: 10, ...(u != null && { standardUncertainty: u }) },
})

function judged(clause: Clause, of: object | null, more: object = {}): JudgeOutput {
  const output = evaluate({ kind: 'judge', ...twoSided, clause, result: of, ...more })
  if (isError(output)) throw new Error(output.error.message)
  return output as JudgeOutput
}
const verdict = (clause: Clause, of: object | null, more: object = {}): [Verdict, string] => {
  const { verdict: word, reason } = judged(clause, of, more)
  return [word, reason.code]
}

/** Without a tolerance no index is computed, which takes most of the time. */
const withoutIndex: Partial<ClauseInput> = { tolerance: undefined }

function submitted(clause: Clause, readings: number[], more: Partial<ClauseInput> = {}, u?: number) {
  const output = evaluate({
    ...{ kind: 'clause', ...twoSided, clause },
    data: {
      kind: 'bias',
      readings,
      reference: { value: 10, ...(u !== undefined && { standardUncertainty: u }) },
    },
    ...more,
  })
  if (isError(output)) throw new Error(`${output.error.path}: ${output.error.message}`)
  return output as ClauseOutput
}

const all: Clause[] = [
  equivalence(),
  inside(),
  point(),
  zeroTest,
  index(),
  index({ basis: 'bound' }),
  uncertain(),
]

describe('every clause on a bias', () => {
  it.each(all)('$type is not shown without a study, with one reading, or without spread', (clause) => {
    expect(verdict(clause, null)).toEqual(['not-shown', 'no-study'])
    expect(verdict(clause, result(1, 0, null, 0.0001))).toEqual(['not-shown', 'one-reading'])
    expect(verdict(clause, result(15, 0, 0, 0.0001))).toEqual(['not-shown', 'zero-spread'])
    expect(verdict(clause, result(15, 0, 0, 0.0001), { resolution: 0.001 })).toEqual([
      'not-shown',
      'zero-spread',
    ])
  })

  it.each(all)('$type gives no verdict from undefined figures', (clause) => {
    expect(verdict(clause, result(15, null, 0.001, 0.0001))).toEqual(['not-shown', 'not-representable'])
    expect(verdict(clause, result(15, 0, null, 0.0001))).toEqual(['not-shown', 'not-representable'])
    const still = submitted(clause, [10, 10, 10], {}, 0.0001)
    expect(still).toMatchObject({ verdict: 'not-shown', interval: null, reason: { code: 'zero-spread' } })
  })

  it.each(all.filter((clause) => clause !== zeroTest))(
    '$type is not shown on a reference whose uncertainty eats the margin',
    (clause) => {
      // A tenth of the width, or half of its fifth, is 0.02: with k = 2 a standard uncertainty of 0.01 is all of it.
      for (const bias of [0, 5]) {
        expect(verdict(clause, result(15, bias, 0.001, 0.01))).toEqual([
          'not-shown',
          'reference-uncertainty-too-large',
        ])
      }
      expect(verdict(clause, result(15, 0, 0.001, 0.0099))[1]).not.toBe('reference-uncertainty-too-large')
    },
  )

  it.each(all.filter((clause) => clause !== zeroTest))('$type is not shown without its margin', (clause) => {
    const { verdict: word, reason } = judged(clause, result(15, 0, 0.001, 0.0001), {
      tolerance: { upper: 10.1 },
    })
    expect([word, ['margin-undefined', 'no-tolerance-width'].includes(reason.code)]).toEqual([
      'not-shown',
      true,
    ])
  })

  it.each(all)('$type judges two readings', (clause) => {
    const { verdict: word, study } = submitted(clause, [10.0001, 9.9999], {}, 0.0001)
    expect(study?.n).toBe(2)
    // Bound and interval need a spread that is small against t on one degree of freedom; this one is.
    expect(word).toBe('meets')
  })
})

describe('the whole interval inside the margin', () => {
  it('is equivalence at half the risk, to the verdict', () => {
    const values = fc.array(fc.integer({ min: -40, max: 40 }), { minLength: 2, maxLength: 20 })
    const risk = fc.constantFrom([0.9, 0.95], [0.95, 0.975], [0.99, 0.995], [0.5, 0.75])
    fc.assert(
      fc.property(values, risk, fc.integer({ min: 1, max: 60 }), (thousandths, [whole, half], width) => {
        const margin: Margin = { base: 'absolute', value: width / 1000, unit: 'mm' }
        const readings = thousandths.map((each) => 10 + each / 1000)
        const a = submitted(inside(whole, margin), readings, withoutIndex)
        const b = submitted(equivalence(half, margin), readings, withoutIndex)
        expect([a.verdict, a.figure, a.interval, a.reason]).toEqual([
          b.verdict,
          b.figure,
          b.interval,
          b.reason,
        ])
      }),
      { seed: 81, numRuns: 300 },
    )
  })

  it('is stricter than equivalence at the same confidence', () => {
    const order: Verdict[] = ['falls-short', 'not-shown', 'meets']
    const values = fc.array(fc.integer({ min: -40, max: 40 }), { minLength: 2, maxLength: 20 })
    let stricter = 0
    fc.assert(
      fc.property(values, fc.integer({ min: 1, max: 60 }), (thousandths, width) => {
        const margin: Margin = { base: 'absolute', value: width / 1000, unit: 'mm' }
        const readings = thousandths.map((each) => 10 + each / 1000)
        const a = submitted(inside(0.95, margin), readings, withoutIndex).verdict
        const b = submitted(equivalence(0.95, margin), readings, withoutIndex).verdict
        if (a !== b) stricter++
        if (a === 'meets') expect(b).toBe('meets')
        if (b === 'not-shown') expect(a).toBe('not-shown')
        expect(order).toContain(a)
      }),
      { seed: 82, numRuns: 500 },
    )
    expect(stricter).toBeGreaterThan(10)
  })

  it('has the verdict that its own interval says', () => {
    const values = fc.array(fc.integer({ min: -40, max: 40 }), { minLength: 2, maxLength: 20 })
    fc.assert(
      fc.property(values, fc.constantFrom(equivalence(), inside()), (thousandths, clause) => {
        const output = submitted(
          clause,
          thousandths.map((each) => 10 + each / 1000),
        )
        if (!output.interval) return
        const { lower, upper } = output.interval as { lower: number; upper: number }
        const word =
          lower >= -0.02 && upper <= 0.02
            ? 'meets'
            : lower > 0.02 || upper < -0.02
              ? 'falls-short'
              : 'not-shown'
        expect(output.verdict).toBe(word)
        const accepts =
          clause.type === 'bias-equivalence'
            ? output.study?.equivalence.accepts
            : output.study?.intervalInside.accepts
        expect(accepts).toBe(word === 'meets')
      }),
      { seed: 83, numRuns: 100 },
    )
  })
})

describe('the point limit', () => {
  it('meets at the margin itself, in decimal: 0.1 of 24.025 − 23.975 is 0.005', () => {
    const tolerance = { lower: 23.975, upper: 24.025 }
    expect(0.1 * (24.025 - 23.975)).not.toBe(0.005)
    expect(verdict(point(), result(15, 0.005, 0.5), { tolerance })).toEqual(['meets', 'bias-within-margin'])
    expect(verdict(point(), result(15, -0.005, 0.5), { tolerance })).toEqual(['meets', 'bias-within-margin'])
    expect(verdict(point(), result(15, 0.0050000001, 1e-6), { tolerance })).toEqual([
      'falls-short',
      'bias-beyond-margin',
    ])
  })

  it('judges the estimate alone, whatever its spread', () => {
    const [at, far] = [judged(point(), result(2, 0.019, 9)), judged(point(), result(50, 0.021, 1e-9))]
    expect([at.verdict, at.interval, far.verdict]).toEqual(['meets', null, 'falls-short'])
  })
})

describe('capability indices', () => {
  it('meet at the least agreed, in decimal', () => {
    // Cg = 0.2 · 0.2 / (6 s) and Cgk = (0.02 − |b|) / (3 s).
    const at = judged(index({ leastCg: 2, leastCgk: 1.5 }), result(50, 0.005, 0.01 / 3))
    expect(at).toMatchObject({ verdict: 'meets', figure: 1.5, limits: { lower: 1.5, upper: null } })
    expect(at).toMatchObject({ quantity: 'ratio', reason: { code: 'index-high-enough', cg: 2, cgk: 1.5 } })
    const short = judged(index({ leastCg: 2, leastCgk: 1.5 }), result(50, 0.0050000001, 0.01 / 3))
    expect(short).toMatchObject({ verdict: 'falls-short', reason: { code: 'index-too-low', index: 'cgk' } })
  })

  it('with readings whose spread is no decimal meet at the least all the same', () => {
    // s² = 2·0.01²/3 and n = 4: the least is formed from the very s, so that Cgk equals it.
    const output = submitted(index({ leastCg: null, leastCgk: 1 }), [9.99, 10.01, 10, 10], {
      tolerance: { lower: 9.9, upper: 10.1 },
    })
    const cgk = output.figure as number
    const { verdict: word } = submitted(index({ leastCg: null, leastCgk: cgk }), [9.99, 10.01, 10, 10])
    expect(word).toBe('meets')
  })

  it('are decided by the one that comes out worse, and Cg only where it is asked for', () => {
    // Cg = 1, Cgk = 0.75.
    const of = (leastCg: number | null, leastCgk: number) => {
      const {
        verdict: word,
        figure,
        reason,
      } = judged(index({ leastCg, leastCgk }), result(50, 0.005, 0.02 / 3))
      return [word, figure, reason.index]
    }
    expect(of(null, 0.75)).toEqual(['meets', 0.75, 'cgk'])
    expect(of(1.33, 0.75)).toEqual(['falls-short', 1, 'cg'])
    expect(of(1, 0.8)).toEqual(['falls-short', 0.75, 'cgk'])
    expect(of(1.33, 0.8)).toEqual(['falls-short', 0.75, 'cgk'])
  })

  it('on bounds: the lower one must reach the least, an upper one below it falls short, else not shown', () => {
    const of = (s: number, more: Partial<BiasIndexParameters> = {}) =>
      verdict(index({ basis: 'bound', leastCg: null, ...more }), result(50, 0.002, s))
    // (0.02 − 0.002) / (3 s) = 1.33 at s = 0.00451…
    expect(of(0.0035)).toEqual(['meets', 'index-bound-high-enough'])
    expect(of(0.0044)).toEqual(['not-shown', 'index-bound-open'])
    expect(of(0.0048)).toEqual(['not-shown', 'index-bound-open'])
    expect(of(0.007)).toEqual(['falls-short', 'index-bound-too-low'])
    expect(of(0.0044, { basis: 'estimate' })).toEqual(['meets', 'index-high-enough'])
  })

  it('on bounds are those of the study', () => {
    const readings = [10.002, 9.999, 10.004, 10.001, 9.998, 10.003]
    const clause = index({ basis: 'bound', leastCgk: 0.3, leastCg: null, confidence: 0.9 })
    const { study, interval, figure } = submitted(clause, readings)
    expect(interval).toEqual({ lower: study?.cgkLowerBound, upper: study?.cgkUpperBound })
    expect(figure).toBe(study?.cgk)
    expect(study?.index).toEqual({ share: 0.2, sigmas: 6, width: 0.2 })
    const plain = evaluate({
      ...{ kind: 'bias', readings, reference: { value: 10 }, tolerance: twoSided.tolerance, confidence: 0.9 },
    })
    expect(plain).toMatchObject({
      cgkLowerBound: study?.cgkLowerBound ?? null,
      cgLowerBound: study?.cgLowerBound ?? null,
    })
  })

  it('take the share of the process variation where agreed', () => {
    // 6 · 0.03 = 0.18: Cg = 0.2 · 0.18 / (6 · 0.006) = 1.
    const { figure, reason } = judged(
      index({ base: 'process', leastCg: 1.1, leastCgk: 0.5 }),
      result(20, 0, 0.006),
    )
    expect([figure, reason.cg]).toEqual([1, 1])
    expect(
      verdict(index({ base: 'process' }), result(20, 0, 0.006), { processStandardDeviation: null }),
    ).toEqual(['not-shown', 'no-process-spread'])
  })

  it('a wider tolerance, more of it or a smaller least never spoil what meets', () => {
    const any = fc.record({
      bias: fc.integer({ min: -25, max: 25 }),
      s: fc.integer({ min: 1, max: 20 }),
      n: fc.integer({ min: 2, max: 60 }),
      basis: fc.constantFrom<BiasIndexParameters['basis']>('estimate', 'bound'),
      times: fc.double({ min: 1, max: 3, noNaN: true }),
    })
    const rank: Record<Verdict, number> = {
      'falls-short': 0,
      'not-shown': 1,
      'meets-with-conditions': 2,
      meets: 3,
    }
    fc.assert(
      fc.property(any, ({ bias, s, n, basis, times }) => {
        const of = result(n, bias / 1000, s / 1000)
        const before = judged(index({ basis }), of).verdict
        const wider = judged(index({ basis }), of, {
          tolerance: { lower: 10 - 0.1 * times, upper: 10.1 },
        }).verdict
        const easier = judged(index({ basis, leastCg: 1.33 / times, leastCgk: 1.33 / times }), of).verdict
        expect(rank[wider]).toBeGreaterThanOrEqual(rank[before])
        expect(rank[easier]).toBeGreaterThanOrEqual(rank[before])
      }),
      { seed: 84, numRuns: 100 },
    )
  })
})

describe('bias with its expanded uncertainty', () => {
  it('meets at the margin itself, in decimal', () => {
    // s²/n = 0.0003², u = 0.0004: the uncertainty is 0.0005, and 0.0007 + 2·0.0005 is 0.0017.
    const at = (value: number) =>
      submitted(uncertain({ base: 'absolute', value, unit: 'mm' }), [10.0004, 10.001], {}, 0.0004)
    expect(at(0.0017)).toMatchObject({
      verdict: 'meets',
      figure: 0.0007,
      reason: { code: 'bias-with-uncertainty-inside', expandedUncertainty: 0.001 },
    })
    expect(at(0.00169999)).toMatchObject({ verdict: 'not-shown' })
    expect(at(0.0017).study?.withUncertainty.insideMargin).toBe(true)
  })

  it('falls short when the bias is beyond the margin by more than the uncertainty, else is not shown', () => {
    // √(0.004²/16 + 0) = 0.001 and k = 2.
    const of = (bias: number) => verdict(uncertain(), result(16, bias, 0.004, 0))
    expect(of(0.018)).toEqual(['meets', 'bias-with-uncertainty-inside'])
    expect(of(-0.0181)).toEqual(['not-shown', 'bias-with-uncertainty-crosses'])
    expect(of(0.022)).toEqual(['not-shown', 'bias-with-uncertainty-crosses'])
    expect(of(-0.0221)).toEqual(['falls-short', 'bias-with-uncertainty-outside'])
  })

  it('is not shown where the certificate states no uncertainty: unknown is not zero', () => {
    expect(verdict(uncertain(), result(16, 0, 0.004))).toEqual(['not-shown', 'reference-uncertainty-unknown'])
    expect(submitted(uncertain(), [10.001, 10.002, 9.999])).toMatchObject({ verdict: 'not-shown' })
  })

  it('uses its own coverage factor, also for what eats the margin', () => {
    expect(verdict(uncertain(tenth, 3), result(16, 0.0175, 0.004, 0))[0]).toBe('not-shown')
    expect(verdict(uncertain(tenth, 3), result(16, 0, 0.004, 0.0067))[1]).toBe(
      'reference-uncertainty-too-large',
    )
    expect(verdict(uncertain(tenth, 2), result(16, 0, 0.004, 0.0067))[0]).toBe('meets')
    expect(
      submitted(uncertain(tenth, 3), [10.001, 10.002, 9.999], {}, 0.001).study?.withUncertainty,
    ).toMatchObject({
      coverageFactor: 3,
      insideMargin: true,
    })
  })

  it('takes the resolution for the repeatability where that is larger', () => {
    const readings = [10, 10, 10, 10.001]
    const fine = submitted(uncertain(), readings, { resolution: 0.0001 }, 0.001)
    const coarse = submitted(uncertain(), readings, { resolution: 0.02 }, 0.001)
    expect(fine.study?.withUncertainty.resolutionUsed).toBe(false)
    expect(coarse.study?.withUncertainty.resolutionUsed).toBe(true)
    expect(coarse.reason.expandedUncertainty).toBeGreaterThan(fine.reason.expandedUncertainty as number)
    // The same from the figures of the result alone.
    const { standardDeviation, bias } = coarse.study ?? {}
    const again = judged(uncertain(), result(4, bias ?? null, standardDeviation ?? null, 0.001), {
      resolution: 0.02,
    })
    expect(again.reason.expandedUncertainty).toBeCloseTo(coarse.reason.expandedUncertainty as number, 15)
  })

  it('judging a result gives the verdict of the study it is the result of', () => {
    const values = fc.array(fc.integer({ min: -30, max: 30 }), { minLength: 2, maxLength: 12 })
    fc.assert(
      fc.property(
        values,
        fc.constantFrom(...all),
        fc.constantFrom(0, 0.0005, 0.004),
        (thousandths, clause, u) => {
          const output = submitted(
            clause,
            thousandths.map((each) => 10 + each / 1000),
            { resolution: 0.001 },
            u,
          )
          const { kind: _k, clauseKey: _c, study, warnings: _w, ...judgement } = output
          expect(judged(clause, study, { resolution: 0.001 })).toMatchObject(judgement)
        },
      ),
      { seed: 85, numRuns: 120 },
    )
  })
})

describe('a wider margin', () => {
  it('never spoils what meets', () => {
    const withMargin = [equivalence, inside].map((of) => (margin: Margin) => of(0.95, margin))
    const any = fc.constantFrom(...withMargin, point, uncertain)
    const values = fc.array(fc.integer({ min: -40, max: 40 }), { minLength: 2, maxLength: 15 })
    const rank: Record<Verdict, number> = {
      'falls-short': 0,
      'not-shown': 1,
      'meets-with-conditions': 2,
      meets: 3,
    }
    fc.assert(
      fc.property(
        any,
        values,
        fc.integer({ min: 1, max: 50 }),
        fc.integer({ min: 0, max: 50 }),
        (of, list, at, more) => {
          const readings = list.map((each) => 10 + each / 1000)
          const verdictAt = (thousandths: number) => {
            const margin: Margin = { base: 'absolute', value: thousandths / 1000, unit: 'mm' }
            const { verdict: word, reason } = submitted(of(margin), readings, withoutIndex, 0.0001)
            return reason.code === 'reference-uncertainty-too-large' ? null : word
          }
          const [narrow, wide] = [verdictAt(at), verdictAt(at + more)]
          if (narrow && wide) expect(rank[wide]).toBeGreaterThanOrEqual(rank[narrow])
        },
      ),
      { seed: 86, numRuns: 300 },
    )
  })
})
