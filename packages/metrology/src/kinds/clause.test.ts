import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { canonicalText } from '../canonical'
import { evaluate, isError } from '../evaluate'
import type { ClauseInput, ClauseOutput, JudgeOutput } from '../types'

const answer = <O>(input: object): O => {
  const output = evaluate(input)
  if (isError(output)) throw new Error(`${output.error.path}: ${output.error.message}`)
  return output as O
}

const equivalence = {
  type: 'bias-equivalence',
  parameters: { margin: { base: 'tolerance', share: 0.1 }, confidence: 0.9 },
} as const
const base: ClauseInput = {
  kind: 'clause',
  unit: 'mm',
  tolerance: { lower: 9.9, upper: 10.1 },
  clause: equivalence,
  data: { kind: 'bias', readings: [10.002, 9.999, 10.004, 10.001, 9.998], reference: { value: 10 } },
}

describe('one clause of a submission', () => {
  it('is evaluated with the confidence and the margin of the clause', () => {
    const output = answer<ClauseOutput>(base)
    expect(output.study).toMatchObject({ confidence: 0.9, equivalence: { margin: 0.02, alpha: 0.1 } })
    expect(output).toMatchObject({
      clauseKey: 'bias/mean',
      verdict: 'meets',
      limits: { lower: -0.02, upper: 0.02 },
    })
  })

  it('has the verdict that judging its own study gives, and that the study itself says', () => {
    const readings = fc.array(fc.integer({ min: 9960, max: 10040 }), { minLength: 1, maxLength: 20 })
    const clause = fc.oneof(
      fc.constant(equivalence),
      fc
        .constantFrom(0.01, 0.05, 0.1)
        .map((alpha) => ({ type: 'bias-zero-test', parameters: { alpha } }) as const),
    )
    fc.assert(
      fc.property(readings, clause, fc.constantFrom(0, 0.001, 0.02), (values, of, standardUncertainty) => {
        const data = {
          kind: 'bias' as const,
          readings: values.map((value) => value / 1000),
          reference: { value: 10, standardUncertainty },
        }
        const output = answer<ClauseOutput>({ ...base, clause: of, data })
        const { unit, tolerance } = base
        const judged = answer<JudgeOutput>({
          kind: 'judge',
          unit,
          tolerance,
          clause: of,
          result: output.study,
        })
        const { kind: _k, clauseKey: _c, study, warnings: _w, ...judgement } = output
        expect(judged).toMatchObject(judgement)
        const accepts = of.type === 'bias-zero-test' ? study?.zeroTest.accepts : study?.equivalence.accepts
        if (output.reason.code === 'reference-uncertainty-too-large') expect(output.verdict).toBe('not-shown')
        else expect(output.verdict === 'meets').toBe(accepts === true)
      }),
      { seed: 51, numRuns: 300 },
    )
  })

  it('keeps the warnings of its study, but for those about inputs it does not use', () => {
    const zero = { type: 'bias-zero-test', parameters: { alpha: 0.05 } } as const
    const output = answer<ClauseOutput>({ kind: 'clause', unit: 'mm', clause: zero, data: base.data })
    expect(output.study?.warnings.map(({ code }) => code)).toEqual([
      'no-margin',
      'no-tolerance',
      'few-readings',
    ])
    expect(output.warnings.map(({ code }) => code)).toEqual(['few-readings'])
    const calibration = { type: 'calibration-in-date', parameters: { gauge: true, standard: false } } as const
    expect(answer<ClauseOutput>({ ...base, clause: calibration }).warnings).toEqual([])
  })

  it.each([
    [{ unit: null }, 'missing', 'unit'],
    [{ clause: null }, 'missing', 'clause'],
    [{ clause: { type: 'bias-zero-test', parameters: {} } }, 'missing', 'clause.parameters.alpha'],
    [{ data: { kind: 'crossed', readings: [] } }, 'not-a-choice', 'data.kind'],
    [
      { data: { kind: 'bias', readings: [1, '2'], reference: { value: 1 } } },
      'not-a-number',
      'data.readings[1]',
    ],
    [{ data: { kind: 'bias', readings: [], reference: { value: 1 } } }, 'too-few', 'data.readings'],
    [{ data: { kind: 'bias', readings: [1] } }, 'missing', 'data.reference'],
    [
      { design: { registeredBeforehand: 'yes', attempts: 1 } },
      'not-a-boolean',
      'design.registeredBeforehand',
    ],
    [{ calibration: { collectedOn: '2026-02-29' } }, 'not-a-day', 'calibration.collectedOn'],
    [
      {
        calibration: {
          collectedOn: '2026-02-28',
          gauge: { calibratedOn: '2026-02-28', dueOn: '2026-02-27' },
        },
      },
      'limits-inverted',
      'calibration.gauge.dueOn',
    ],
  ])('%j is refused: %s at %s', (change, code, path) => {
    expect(evaluate({ ...base, ...change })).toMatchObject({ error: { code, path } })
  })

  it('writes the same canonical text whatever the order of its input', () => {
    const turned = Object.fromEntries(Object.entries(base).toReversed())
    expect(canonicalText(evaluate(turned))).toBe(canonicalText(evaluate(base)))
  })
})
