import type {
  AgreedBaseline,
  Characteristic,
  Clause,
  ClauseOf,
  ClauseType,
  Margin,
  Subject,
} from '@evenrule/metrology'
import { formatCount, formatNumber, formatShare } from '../format'

/** What a clause is about, as a row heading. */
export const subjectWords: Record<Subject, string> = {
  design: 'Study design',
  resolution: 'Resolution',
  calibration: 'Calibration',
  bias: 'Bias',
  linearity: 'Linearity',
  stability: 'Stability',
  repeatability: 'Repeatability and reproducibility',
  attribute: 'Attribute inspection',
  uncertainty: 'Measurement uncertainty',
}

/** The name of a clause type, for choosing one. */
export const clauseTypeWords: Record<ClauseType, string> = {
  'design-minimum': 'Study design: least readings and registration',
  'resolution-share': 'Resolution: share of tolerance or process variation',
  'calibration-in-date': 'Calibration: in date on the day of collection',
  'bias-equivalence': 'Bias: equivalence within a margin',
  'bias-interval-inside': 'Bias: whole interval within a margin',
  'bias-point': 'Bias: point limit on the estimate',
  'bias-zero-test': 'Bias: zero-difference test',
  'bias-index': 'Bias: capability indices Cg and Cgk',
  'bias-with-uncertainty': 'Bias: with its expanded uncertainty within a margin',
  'by-hand': 'Judged by hand on a document',
  'does-not-apply': 'A clause of the wider scope does not apply',
}

/** One line on what a clause type asks for, under its name. */
export const clauseTypeHints: Record<ClauseType, string> = {
  'design-minimum':
    'How large a study must be at least, and whether it must be registered before its first reading.',
  'resolution-share': 'The smallest step of the gauge, compared with what it has to tell apart.',
  'calibration-in-date':
    'Gauge and reference standard must be within their calibration when the readings are taken.',
  'bias-equivalence':
    'The supplier shows that the bias lies within a margin. More readings and a better gauge help.',
  'bias-zero-test':
    'The readings must not show a difference from zero. Fewer readings and a worse gauge help.',
  'bias-interval-inside':
    'The two-sided interval of the bias must lie within a margin: stricter than equivalence at the same confidence.',
  'bias-point':
    'The estimated bias alone is compared with a margin. A gauge right at the margin passes every second time.',
  'bias-index':
    'Spread and bias of the gauge against a share of the tolerance, as an index that must reach a least value.',
  'bias-with-uncertainty':
    'Bias and its uncertainty, that of the reference standard included, must fit within a margin together.',
  'by-hand':
    'For a method that is not computed here: the supplier attaches a document and says with a reason what it shows; the customer decides on it.',
  'does-not-apply': 'Takes a clause that was agreed for a wider scope away, with the reason.',
}

/** What the figure of a clause is, beside its number. */
export const figureWords: Record<ClauseType, string> = {
  'design-minimum': 'readings',
  'resolution-share': 'share',
  'calibration-in-date': 'collected on',
  'bias-equivalence': 'bias',
  'bias-interval-inside': 'bias',
  'bias-point': 'bias',
  'bias-zero-test': 'bias',
  'bias-index': 'Cgk',
  'bias-with-uncertainty': 'bias',
  'by-hand': 'document',
  'does-not-apply': 'clause',
}

const baseWords = { tolerance: 'tolerance', process: 'process variation' } as const

/** What stands in for the width of a one-sided tolerance: "the distance to 0", "0.4 mm". */
export function describeBaseline(baseline: AgreedBaseline): string {
  if (baseline.kind === 'process') return baseWords.process
  return baseline.kind === 'absolute'
    ? formatNumber(baseline.value, { unit: baseline.unit })
    : `the distance to ${formatNumber(baseline.value)}`
}

/** " (one-sided: of the distance to 0)", or nothing where no baseline is agreed. */
const inItsStead = (baseline: AgreedBaseline | undefined): string =>
  baseline ? ` (one-sided: of ${describeBaseline(baseline)})` : ''

/** "5 % of tolerance", "5 % of tolerance (one-sided: of the distance to 0)", "0.0025 mm". */
export function describeMargin(margin: Margin): string {
  if (margin.base === 'absolute') return formatNumber(margin.value, { unit: margin.unit })
  const share = `${formatShare(margin.share)} of ${baseWords[margin.base]}`
  return margin.base === 'tolerance' ? share + inItsStead(margin.baseline) : share
}

/** "Cg and Cgk at least 1.33", "Cgk at least 1.33", "Cg at least 1.67 and Cgk at least 1.33", by what is asked for. */
function indexLimits({ leastCg, leastCgk }: ClauseOf<'bias-index'>['parameters']): string {
  const cgk = `Cgk at least ${formatNumber(leastCgk)}`
  if (leastCg === null) return cgk
  return leastCg === leastCgk ? `Cg and ${cgk}` : `Cg at least ${formatNumber(leastCg)} and ${cgk}`
}

/** "20 % of tolerance over 6 s, on the lower bound at 95 %". */
const indexConvention = ({
  share,
  base,
  baseline,
  sigmas,
  basis,
  confidence,
}: ClauseOf<'bias-index'>['parameters']): string =>
  [
    `${formatShare(share)} of ${baseWords[base]}${base === 'tolerance' ? inItsStead(baseline) : ''} over ${formatNumber(sigmas)}\u202Fs`,
    basis === 'bound' ? `on the lower bound at ${formatShare(confidence)}` : 'on the estimate',
  ].join(', ')

const lowerFirst = (text: string): string => text.charAt(0).toLowerCase() + text.slice(1)

/** What a key is about: "Bias: mean", "Linearity: slope by hand". */
export function describeKey(key: string): string {
  const known = keyWords[key]
  if (known) return known
  const [subject = '', , title] = key.split('/')
  const about = subjectWords[subject as Subject]
  return about && title ? `${about}, by hand: ${title.replaceAll('-', ' ')}` : key
}

const keyWords: Record<string, string> = {
  'design/readings': 'Study design',
  'resolution/share': 'Resolution',
  'calibration/date': 'Calibration',
  'bias/mean': 'Bias',
  'bias/index': 'Capability indices Cg and Cgk',
  'bias/with-uncertainty': 'Bias with its uncertainty',
}

const both = (parameters: { gauge: boolean; standard: boolean }): string =>
  [parameters.gauge && 'gauge', parameters.standard && 'reference standard'].filter(Boolean).join(' and ')

type Builders<Out> = { [T in ClauseType]: (clause: ClauseOf<T>, characteristic?: Characteristic) => Out }

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1)

const sentences: Builders<string> = {
  'design-minimum': ({ parameters: { readings, registeredBeforehand, attempts } }) =>
    [
      `At least ${formatCount(readings, 'reading')}`,
      registeredBeforehand && 'registered beforehand',
      attempts !== undefined && `at most ${formatCount(attempts, 'attempt')}`,
    ]
      .filter(Boolean)
      .join(', '),
  'resolution-share': ({ parameters: { share, base, baseline } }) =>
    `Resolution at most ${formatShare(share)} of ${baseWords[base]}${base === 'tolerance' ? inItsStead(baseline) : ''}`,
  'calibration-in-date': ({ parameters }) =>
    `${capital(both(parameters) || 'nothing')} in calibration on the day of collection`,
  'bias-equivalence': ({ parameters: { margin, confidence } }) =>
    `Bias within ±${describeMargin(margin)}, shown at ${formatShare(confidence)}`,
  'bias-zero-test': ({ parameters: { alpha } }) =>
    `Bias not told from zero by the zero-difference test, α ${formatNumber(alpha)}`,
  'bias-interval-inside': ({ parameters: { margin, confidence } }) =>
    `Whole ${formatShare(confidence)} interval of the bias within ±${describeMargin(margin)}`,
  'bias-point': ({ parameters: { margin } }) => `Estimated bias within ±${describeMargin(margin)}`,
  'bias-index': ({ parameters }) => `${indexLimits(parameters)} for ${indexConvention(parameters)}`,
  'bias-with-uncertainty': ({ parameters: { margin, coverageFactor } }) =>
    `Bias and its expanded uncertainty (k = ${formatNumber(coverageFactor)}) within ±${describeMargin(margin)}`,
  'by-hand': ({ parameters: { subject, measure } }) => `${subjectWords[subject]}, judged by hand: ${measure}`,
  'does-not-apply': ({ parameters: { key } }) => `Does not apply: ${lowerFirst(describeKey(key))}`,
}

const terms: Builders<string> = {
  'design-minimum': (clause, characteristic) => {
    return lowerFirst(sentences['design-minimum'](clause, characteristic))
  },
  'resolution-share': ({ parameters: { share, base, baseline } }) =>
    `≤ ${formatShare(share)} of ${baseWords[base]}${base === 'tolerance' ? inItsStead(baseline) : ''}`,
  'calibration-in-date': ({ parameters }) => `${both(parameters)} in date on the day of collection`,
  'bias-equivalence': ({ parameters: { margin, confidence } }) =>
    `equivalence within ±${describeMargin(margin)}, ${formatShare(confidence)}`,
  'bias-zero-test': ({ parameters: { alpha } }) => `zero-difference test, α ${formatNumber(alpha)}`,
  'bias-interval-inside': ({ parameters: { margin, confidence } }) =>
    `whole ${formatShare(confidence)} interval within ±${describeMargin(margin)}`,
  'bias-point': ({ parameters: { margin } }) => `estimate within ±${describeMargin(margin)}`,
  'bias-index': ({ parameters }) => `${indexLimits(parameters)}, ${indexConvention(parameters)}`,
  'bias-with-uncertainty': ({ parameters: { margin, coverageFactor } }) =>
    `with uncertainty (k = ${formatNumber(coverageFactor)}) within ±${describeMargin(margin)}`,
  'by-hand': ({ parameters: { measure, asks } }) =>
    `${measure}, judged by hand on a document that shows: ${asks}`,
  'does-not-apply': ({ parameters: { reason } }) => `does not apply: ${reason}`,
}

/** Each builder only ever gets clauses of its own type; TypeScript cannot follow that through the union. */
const build = <Out>(builders: Builders<Out>, clause: Clause, characteristic?: Characteristic): Out =>
  (builders[clause.type] as (clause: Clause, characteristic?: Characteristic) => Out)(clause, characteristic)

/** A clause as a sentence: "Bias within ±5 % of tolerance, shown at 95 %". */
export const describeClause = (clause: Clause, characteristic?: Characteristic): string =>
  build(sentences, clause, characteristic)

/** A clause's terms without its subject, for a table whose row names the subject: "zero-difference test, α 0.05". */
export const describeTerms = (clause: Clause, characteristic?: Characteristic): string =>
  build(terms, clause, characteristic)
