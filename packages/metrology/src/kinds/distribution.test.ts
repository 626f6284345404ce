import { describe, expect, it } from 'vitest'
import { evaluate } from '../evaluate'

const of = (input: object) => evaluate({ kind: 'distribution', ...input })

describe('distribution functions as a kind', () => {
  it.each([
    ['normal', {}],
    ['t', { df: 5 }],
    ['noncentral-t', { df: 5, noncentrality: 2 }],
    ['chi-square', { df: 5 }],
    ['f', { df1: 3, df2: 7 }],
    ['beta', { a: 2, b: 3 }],
  ])('%s: both tails add to one and the quantile goes back', (name, parameters) => {
    const values = (wanted: string, at: number[]) =>
      (of({ name, function: wanted, parameters, at }) as { values: number[] }).values
    const at = values('quantile', [0.01, 0.5, 0.99])
    const [lower, upper] = [values('cdf', at), values('upper-tail', at)]
    lower.forEach((chance, index) => {
      expect(chance).toBeCloseTo([0.01, 0.5, 0.99][index] ?? NaN, 12)
      expect(chance + (upper[index] ?? NaN)).toBeCloseTo(1, 14)
    })
  })

  it('answers a quantile at infinity with null and a warning that names its place', () => {
    expect(of({ name: 't', function: 'quantile', parameters: { df: 5 }, at: [0, 0.5, 1] })).toMatchObject({
      values: [null, 0, null],
      warnings: [
        { code: 'undefined-at-this-value', path: 'at[0]' },
        { code: 'undefined-at-this-value', path: 'at[2]' },
      ],
    })
    expect(of({ name: 'beta', function: 'quantile', parameters: { a: 2, b: 3 }, at: [0, 1] })).toMatchObject({
      values: [0, 1],
      warnings: [],
    })
  })

  it.each([
    [{ name: 'cauchy', function: 'cdf', at: [1] }, 'not-a-choice', 'name'],
    [{ name: 't', function: 'pdf', at: [1] }, 'not-a-choice', 'function'],
    [{ name: 't', function: 'cdf', at: [1] }, 'missing', 'parameters.df'],
    [{ name: 't', function: 'cdf', parameters: { df: 0 }, at: [1] }, 'too-small', 'parameters.df'],
    [{ name: 'normal', function: 'quantile', at: [1.1] }, 'too-large', 'at[0]'],
    [{ name: 'normal', function: 'cdf', at: [] }, 'too-few', 'at'],
  ])('%j is refused: %s at %s', (input, code, path) => {
    expect(of(input)).toMatchObject({ error: { code, path } })
  })
})
