import {
  betaDistributionTails,
  betaQuantile,
  chiSquareQuantile,
  chiSquareTails,
  fQuantile,
  fTails,
  noncentralTQuantile,
  noncentralTTails,
  normalCdf,
  normalQuantile,
  normalUpperTail,
  studentizedRangeQuantile,
  studentizedRangeTails,
  tQuantile,
  tTails,
  type Tails,
} from '../distributions'
import type { Bounds, Reader } from '../input/reader'
import type { DistributionOutput, Warning } from '../types'

/** A distribution with its parameters: both tails, quantiles inside (0, 1) and the ends of its support. */
interface Distribution {
  tails(x: number): Tails
  quantile(p: number): number
  support: [number, number]
}

const positive: Bounds = { above: 0, least: 1e-3, most: 1e8 }

const readers: Record<string, (parameters: Reader) => Distribution> = {
  normal: () => ({
    tails: (z) => ({ lower: normalCdf(z), upper: normalUpperTail(z) }),
    quantile: normalQuantile,
    support: [-Infinity, Infinity],
  }),
  t: (parameters) => {
    const df = parameters.number('df', positive)
    return { tails: (t) => tTails(t, df), quantile: (p) => tQuantile(p, df), support: [-Infinity, Infinity] }
  },
  'noncentral-t': (parameters) => {
    const df = parameters.number('df', { least: 0.1, most: 1e8 })
    const shift = parameters.number('noncentrality', { least: -1e5, most: 1e5 })
    return {
      tails: (t) => noncentralTTails(t, df, shift),
      quantile: (p) => noncentralTQuantile(p, df, shift),
      support: [-Infinity, Infinity],
    }
  },
  'chi-square': (parameters) => {
    const df = parameters.number('df', positive)
    return {
      tails: (x) => chiSquareTails(x, df),
      quantile: (p) => chiSquareQuantile(p, df),
      support: [0, Infinity],
    }
  },
  f: (parameters) => {
    const df1 = parameters.number('df1', positive)
    const df2 = parameters.number('df2', positive)
    return {
      tails: (x) => fTails(x, df1, df2),
      quantile: (p) => fQuantile(p, df1, df2),
      support: [0, Infinity],
    }
  },
  beta: (parameters) => {
    const a = parameters.number('a', positive)
    const b = parameters.number('b', positive)
    return {
      tails: (x) => betaDistributionTails(x, a, b),
      quantile: (p) => betaQuantile(p, a, b),
      support: [0, 1],
    }
  },
  'studentized-range': (parameters) => {
    const groups = parameters.integer('groups', { least: 2, most: 1000 })
    const df = parameters.number('df', { least: 1, most: 1e8 })
    return {
      tails: (q) => studentizedRangeTails(q, groups, df),
      quantile: (p) => studentizedRangeQuantile(p, groups, df),
      support: [0, Infinity],
    }
  },
}

/** Values of a distribution function, upper tail or quantile function; a quantile at infinity is null. */
export function distribution(reader: Reader): DistributionOutput {
  const name = reader.choice('name', Object.keys(readers))
  const wanted = reader.choice('function', ['cdf', 'upper-tail', 'quantile'])
  const parameters = reader.optionalObject('parameters') ?? reader.empty('parameters')
  const of = (readers[name] as (parameters: Reader) => Distribution)(parameters)
  const at = reader.numbers('at', 1, wanted === 'quantile' ? { least: 0, most: 1 } : {})
  const warnings: Warning[] = []
  const values = at.map((x, index) => {
    if (wanted === 'cdf') return of.tails(x).lower
    if (wanted === 'upper-tail') return of.tails(x).upper
    const value = x === 0 ? of.support[0] : x === 1 ? of.support[1] : of.quantile(x)
    if (Number.isFinite(value)) return value
    const path = `at[${index}]`
    warnings.push({ code: 'undefined-at-this-value', message: `The quantile at ${x} is not finite.`, path })
    return null
  })
  return { kind: 'distribution', values, warnings }
}
