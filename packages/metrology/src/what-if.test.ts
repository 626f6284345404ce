import { describe, expect, it } from 'vitest'
import { evaluate, isError } from './evaluate'
import type { ClauseInput } from './types'
import { whatIf, whatIfInput } from './what-if'

const stored: ClauseInput = {
  kind: 'clause',
  unit: 'mm',
  tolerance: { lower: 9.9, upper: 10.1 },
  clause: {
    type: 'bias-equivalence',
    parameters: { margin: { base: 'tolerance', share: 0.05 }, confidence: 0.95 },
  },
  data: {
    kind: 'bias',
    readings: [10.002, 9.999, 10.004, 10.091, 9.998],
    reference: { value: 10, standardUncertainty: 0.001 },
  },
}

describe('a what-if', () => {
  it('leaves readings out, supposes another reference, tolerance or clause, and touches nothing stored', () => {
    const before = JSON.stringify(stored)
    const point = {
      type: 'bias-point',
      parameters: { margin: { base: 'tolerance', share: 0.05 } },
    } as const
    const input = whatIfInput(stored, {
      leftOut: [3, 3, 99],
      referenceValue: 10.001,
      tolerance: { lower: 9.8, upper: 10.2 },
      clause: point,
    })
    expect(input).toEqual({
      ...stored,
      tolerance: { lower: 9.8, upper: 10.2 },
      clause: point,
      data: {
        kind: 'bias',
        readings: [10.002, 9.999, 10.004, 9.998],
        reference: { value: 10.001, standardUncertainty: 0.001 },
      },
    })
    expect(JSON.stringify(stored)).toBe(before)
    expect(whatIfInput(stored, {})).toEqual(stored)
  })

  it('is evaluated as its input is: the reading far off decides', () => {
    const as = (leftOut: number[]) => {
      const { output } = whatIf(stored, { leftOut })
      if (isError(output)) throw new Error(output.error.message)
      return [output.verdict, output.study?.n]
    }
    expect(as([])).toEqual(['not-shown', 5])
    expect(as([3])).toEqual(['meets', 4])
    expect(whatIf(stored, { leftOut: [3] }).output).toEqual(evaluate(whatIfInput(stored, { leftOut: [3] })))
  })

  it('without a reading left has no study', () => {
    expect(whatIf(stored, { leftOut: [0, 1, 2, 3, 4] }).output).toMatchObject({
      verdict: 'not-shown',
      reason: { code: 'no-study' },
      study: null,
    })
  })

  it('is computed by the engine it is given', () => {
    const error = { error: { code: 'none', message: 'no engine', path: '' } }
    expect(whatIf(stored, {}, () => error).output).toBe(error)
  })
})
