import {
  clauseTypes,
  subjects,
  type AgreedBaseline,
  type Clause,
  type ClauseType,
  type Kind,
  type Margin,
  type Rule,
  type RuleType,
} from '@evenrule/metrology'
import { Random } from '../random'

/** Scales of measurement: level, spread and digits shown, ordinary and hard ones. */
const scales = [
  { level: 20, spread: 0.006, digits: 3 },
  { level: 6, spread: 0.2, digits: 1 },
  // Thirteen digits in common: what one pass over squares would lose.
  { level: 1e6, spread: 1e-3, digits: 4 },
  { level: 1e12, spread: 0.1, digits: 2 },
  { level: 0, spread: 1e-9, digits: 12 },
  { level: 1e-7, spread: 1e-9, digits: 11 },
  { level: 3e300, spread: 1e298, digits: null },
  { level: 2e-300, spread: 1e-302, digits: null },
  { level: -273.15, spread: 5, digits: 2 },
]
type Scale = (typeof scales)[number]

const rounded = (value: number, { digits }: Scale) =>
  digits === null ? value : Number(value.toFixed(digits))

function readings(random: Random, scale: Scale): number[] {
  const n = random.of([1, 2, 2, 3, 5, 10, 15, 25, 50, random.whole(2, 200)])
  const still = random.chance(0.05)
  return Array.from({ length: n }, () =>
    rounded(scale.level + (still ? 0 : scale.spread * random.normal()), scale),
  )
}

function reference(random: Random, scale: Scale) {
  const value = rounded(scale.level + scale.spread * random.between(-2, 2), scale)
  return random.chance(0.5) ? { value } : { value, standardUncertainty: scale.spread * random.size(0.01, 3) }
}

function common(random: Random, scale: Scale) {
  const width = scale.spread * random.size(1, 100)
  const limits = {
    lower: rounded(scale.level - width / 2, scale),
    upper: rounded(scale.level + width / 2 + scale.spread, scale),
  }
  const tolerance = random.of([limits, limits, { upper: limits.upper }, { lower: limits.lower }, undefined])
  return {
    unit: 'mm',
    ...(tolerance && { tolerance }),
    ...(random.chance(0.5) && { processStandardDeviation: scale.spread * random.size(0.1, 30) }),
    ...(random.chance(0.5) && { resolution: scale.spread * random.of([0.1, 1, 5]) }),
    ...(random.chance(0.2) && { coverageFactor: random.of([1, 1.65, 3]) }),
    ...(random.chance(0.2) && { sigmas: random.of([4, 5.15]) }),
  }
}

const confidences = [0.5, 0.8, 0.9, 0.95, 0.99, 0.9973, 0.999999]
const alphas = [1e-12, 1e-6, 0.001, 0.01, 0.05, 0.1, 0.25, 0.5]

const ruleMakers: { [T in RuleType]: (random: Random, size: number) => Rule } = {
  'zero-test': (random) => ({ type: 'zero-test', alpha: random.of(alphas) }),
  equivalence: (random, margin) => ({ type: 'equivalence', alpha: random.of(alphas), margin }),
  'interval-inside': (random, margin) => ({ type: 'interval-inside', alpha: random.of(alphas), margin }),
  point: (_, margin) => ({ type: 'point', margin }),
  index: (random, size) => ({
    type: 'index',
    share: random.of([0.1, 0.15, 0.2]),
    sigmas: random.of([4, 6]),
    least: random.of([1, 1.33, 1.67]),
    toleranceWidth: 10 * size,
    ...(random.chance(0.5) && { leastCg: random.of([1, 1.33, 2]) }),
    ...(random.chance(0.5) && { alpha: random.of([0.01, 0.05, 0.1]) }),
  }),
  'with-uncertainty': (random, margin) => ({
    type: 'with-uncertainty',
    margin,
    referenceStandardUncertainty: random.of([0, 0.05, 0.4, 2]) * margin,
    coverageFactor: random.of([1.65, 2, 3]),
  }),
}
const ruleTypes = Object.keys(ruleMakers) as RuleType[]

function ruleAndTruth(random: Random) {
  const size = random.of([1, 0.01, 1e-9, 1e6, 1e60, random.size(1e-3, 1e3)])
  const truth = () => ({
    bias: size * random.of([0, 0.5, 1, 3, -0.7, random.between(-2, 2)]),
    standardDeviation: size * random.size(0.02, 5),
  })
  return { rule: ruleMakers[random.of(ruleTypes)](random, size), truth }
}

function baseline(random: Random, { level, spread }: Scale): { baseline?: AgreedBaseline } {
  if (random.chance(0.5)) return {}
  const agreed: AgreedBaseline[] = [
    { kind: 'natural-bound', value: random.of([0, level - 20 * spread, level + 20 * spread]) },
    { kind: 'process' },
    { kind: 'absolute', value: spread * random.size(1, 100), unit: random.of(['mm', 'µm', 'in', 'g']) },
  ]
  return { baseline: random.of(agreed) }
}

function margin(random: Random, scale: Scale): Margin {
  const share = random.of([0.01, 0.05, 0.1])
  if (random.chance(0.3)) {
    const value = scale.spread * random.size(0.1, 5)
    return { base: 'absolute', value, unit: random.of(['mm', 'µm', 'in', 'g']) }
  }
  return random.chance(0.3)
    ? { base: 'process', share }
    : { base: 'tolerance', share, ...baseline(random, scale) }
}

const clauseMakers: { [T in ClauseType]: (random: Random, scale: Scale) => Clause } = {
  'design-minimum': (random) => ({
    type: 'design-minimum',
    parameters: {
      readings: random.of([2, 15, 25]),
      registeredBeforehand: random.chance(0.5),
      ...(random.chance(0.5) && { attempts: random.whole(1, 3) }),
    },
  }),
  'resolution-share': (random, scale) => ({
    type: 'resolution-share',
    parameters: {
      share: random.of([0.05, 0.1, 0.3]),
      base: random.of(['tolerance', 'process'] as const),
      ...baseline(random, scale),
    },
  }),
  'calibration-in-date': (random) => ({
    type: 'calibration-in-date',
    parameters: { gauge: random.chance(0.7), standard: random.chance(0.7) },
  }),
  'bias-equivalence': (random, scale) => ({
    type: 'bias-equivalence',
    parameters: { margin: margin(random, scale), confidence: random.of(confidences) },
  }),
  'bias-interval-inside': (random, scale) => ({
    type: 'bias-interval-inside',
    parameters: { margin: margin(random, scale), confidence: random.of(confidences) },
  }),
  'bias-point': (random, scale) => ({ type: 'bias-point', parameters: { margin: margin(random, scale) } }),
  'bias-zero-test': (random) => ({ type: 'bias-zero-test', parameters: { alpha: random.of(alphas) } }),
  'bias-index': (random, scale) => ({
    type: 'bias-index',
    parameters: {
      share: random.of([0.1, 0.15, 0.2]),
      base: random.of(['tolerance', 'process'] as const),
      ...baseline(random, scale),
      sigmas: random.of([4, 5.15, 6]),
      leastCg: random.of([null, 1, 1.33]),
      leastCgk: random.of([1, 1.33, 1.67]),
      basis: random.of(['estimate', 'bound'] as const),
      confidence: random.of(confidences),
    },
  }),
  'bias-with-uncertainty': (random, scale) => ({
    type: 'bias-with-uncertainty',
    parameters: { margin: margin(random, scale), coverageFactor: random.of([1, 2, 3]) },
  }),
  'by-hand': (random) => ({
    type: 'by-hand',
    parameters: {
      subject: random.of(subjects),
      measure: random.of(['slope', 'Share of  tolerance', 'κ of the line']),
      asks: 'what it must show',
    },
  }),
  'does-not-apply': (random) => ({
    type: 'does-not-apply',
    parameters: { key: random.of(['bias/index', 'linearity/by-hand/slope']), reason: 'not here' },
  }),
}

function calibration(random: Random) {
  const window = () =>
    random.chance(0.2)
      ? null
      : {
          calibratedOn: random.of(['2025-11-30', '2026-01-10']),
          dueOn: random.of(['2026-06-30', '2027-02-28']),
        }
  return {
    collectedOn: random.of(['2025-12-24', '2026-06-30', '2026-07-01']),
    gauge: window(),
    standard: window(),
  }
}

const facts = (random: Random) => ({
  ...(random.chance(0.7) && {
    design: { registeredBeforehand: random.chance(0.5), attempts: random.whole(1, 4) },
  }),
  ...(random.chance(0.7) && { calibration: calibration(random) }),
  ...(random.chance(0.5) && {
    byHand: {
      verdict: random.of(['meets', 'falls-short', 'not-shown'] as const),
      reason: 'as the document says',
      documentSha256: 'ab'.repeat(32),
    },
  }),
})

const makers: { [K in Kind]: (random: Random, scale: Scale) => object } = {
  summary: (random, scale) => ({ readings: readings(random, scale) }),
  bias: (random, scale) => ({
    ...common(random, scale),
    readings: readings(random, scale),
    reference: reference(random, scale),
    confidence: random.of([...confidences, 0.3]),
    ...(random.chance(0.7) && { margin: scale.spread * random.size(0.1, 10) }),
    ...(random.chance(0.3) && { index: { share: random.of([0.1, 0.15]), sigmas: random.of([4, 6]) } }),
  }),
  operatingCharacteristic: (random) => {
    const { rule, truth } = ruleAndTruth(random)
    const n = random.of([2, 3, 5, 15, 50, 300, 100_000])
    return { rule, design: { n }, truth: Array.from({ length: random.whole(1, 8) }, truth) }
  },
  sampleSize: (random) => {
    const { rule, truth } = ruleAndTruth(random)
    return { rule, truth: truth(), power: random.of([0.5, 0.8, 0.9, 0.99]) }
  },
  incentives: (random) => {
    const { rule, truth } = ruleAndTruth(random)
    // Searching over all truths is a hundred times the work of one.
    const given = random.chance(0.9) ? { truth: truth() } : {}
    return { rule, design: { n: random.of([2, 5, 15, 50]) }, ...given }
  },
  judge: (random, scale) => ({
    ...common(random, scale),
    clause: clauseMakers[random.of(clauseTypes)](random, scale),
    ...facts(random),
    ...(random.chance(0.9) && {
      result: {
        kind: 'bias',
        n: random.of([1, 2, 15, 50]),
        bias: scale.spread * random.between(-2, 2),
        standardDeviation: random.chance(0.1) ? 0 : scale.spread * random.size(0.1, 3),
        reference: reference(random, scale),
      },
    }),
  }),
  distribution: (random) => {
    const wanted = random.of(['cdf', 'upper-tail', 'quantile'])
    const degrees = () => random.of([1, 2, 3, 9, 30, 299, 1500, 1e4, 1e6, random.size(0.5, 1e5)])
    const chance = () => random.of([1e-12, 1e-6, 0.025, 0.5, 0.9, 0.975, 1 - 1e-9, random.next()])
    const place = () => random.of([random.size(1e-6, 1e3), random.between(-10, 10)])
    return {
      // A studentised range costs a thousand times as much as the others.
      name: random.chance(0.02)
        ? 'studentized-range'
        : random.of(['normal', 't', 'noncentral-t', 'chi-square', 'f', 'beta']),
      function: wanted,
      parameters: {
        df: degrees(),
        df1: degrees(),
        df2: degrees(),
        a: degrees(),
        b: degrees(),
        noncentrality: random.between(-60, 60),
        groups: random.whole(2, 12),
      },
      at: Array.from({ length: random.whole(1, 4) }, wanted === 'quantile' ? chance : place),
    }
  },
  clause: (random, scale) => ({
    ...common(random, scale),
    clause: clauseMakers[random.of(clauseTypes)](random, scale),
    ...facts(random),
    ...(random.chance(0.9) && {
      data: { kind: 'bias', readings: readings(random, scale), reference: reference(random, scale) },
    }),
  }),
}

/** Kinds in the proportion in which they are tried; sample sizes cost most and come least. */
const proportions: Record<Kind, number> = {
  summary: 2,
  bias: 4,
  operatingCharacteristic: 3,
  sampleSize: 0.5,
  incentives: 0.5,
  judge: 2,
  distribution: 3,
  clause: 5,
}

/** Inputs of every kind, clause type, rule and scale, the same for the same seed. */
export function randomInputs(count: number, seed: number): { kind: Kind }[] {
  const random = new Random(seed)
  const kinds = Object.keys(makers) as Kind[]
  const total = kinds.reduce((sum, kind) => sum + proportions[kind], 0)
  const chosen = (): Kind => {
    let at = random.between(0, total)
    return kinds.find((kind) => (at -= proportions[kind]) < 0) ?? 'summary'
  }
  return Array.from({ length: count }, () => {
    const kind = chosen()
    return { kind, ...makers[kind](random, random.of(scales)) }
  })
}
