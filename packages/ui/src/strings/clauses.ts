import type { Characteristic, Clause, ClauseOf, ClauseType, Margin, Subject } from '@evenrule/metrology'
import { formatCount, formatNumber, formatShare } from '../format'

/** What a clause is about, as a row heading. */
export const subjectWords: Record<Subject, string> = {
  design: 'Study design',
  resolution: 'Resolution',
  calibration: 'Calibration',
  bias: 'Bias',
}

/** The name of a clause type, for choosing one. */
export const clauseTypeWords: Record<ClauseType, string> = {
  'design-minimum': 'Study design: least readings and registration',
  'resolution-share': 'Resolution: share of tolerance or process variation',
  'calibration-in-date': 'Calibration: in date on the day of collection',
  'bias-equivalence': 'Bias: equivalence within a margin',
  'bias-zero-test': 'Bias: zero-difference test',
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
}

/** What the figure of a clause is, beside its number. */
export const figureWords: Record<ClauseType, string> = {
  'design-minimum': 'readings',
  'resolution-share': 'share',
  'calibration-in-date': 'collected on',
  'bias-equivalence': 'bias',
  'bias-zero-test': 'bias',
}

const baseWords = { tolerance: 'tolerance', process: 'process variation' } as const

/** "5 % of tolerance", "0.0025 mm". */
export function describeMargin(margin: Margin): string {
  return margin.base === 'absolute'
    ? formatNumber(margin.value, { unit: margin.unit })
    : `${formatShare(margin.share)} of ${baseWords[margin.base]}`
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
  'resolution-share': ({ parameters: { share, base } }) =>
    `Resolution at most ${formatShare(share)} of ${baseWords[base]}`,
  'calibration-in-date': ({ parameters }) =>
    `${capital(both(parameters) || 'nothing')} in calibration on the day of collection`,
  'bias-equivalence': ({ parameters: { margin, confidence } }) =>
    `Bias within ±${describeMargin(margin)}, shown at ${formatShare(confidence)}`,
  'bias-zero-test': ({ parameters: { alpha } }) =>
    `Bias not told from zero by the zero-difference test, α ${formatNumber(alpha)}`,
}

const terms: Builders<string> = {
  'design-minimum': (clause, characteristic) => {
    const sentence = sentences['design-minimum'](clause, characteristic)
    return sentence.charAt(0).toLowerCase() + sentence.slice(1)
  },
  'resolution-share': ({ parameters: { share, base } }) => `≤ ${formatShare(share)} of ${baseWords[base]}`,
  'calibration-in-date': ({ parameters }) => `${both(parameters)} in date on the day of collection`,
  'bias-equivalence': ({ parameters: { margin, confidence } }) =>
    `equivalence within ±${describeMargin(margin)}, ${formatShare(confidence)}`,
  'bias-zero-test': ({ parameters: { alpha } }) => `zero-difference test, α ${formatNumber(alpha)}`,
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

/** Subject of a clause type, to group and to head rows. */
export const subjectOf: Record<ClauseType, Subject> = {
  'design-minimum': 'design',
  'resolution-share': 'resolution',
  'calibration-in-date': 'calibration',
  'bias-equivalence': 'bias',
  'bias-zero-test': 'bias',
}
