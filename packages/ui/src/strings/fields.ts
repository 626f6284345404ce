import type {
  AgreedBaseline,
  ClauseParameters,
  ClauseType,
  FieldDescriptor,
  Margin,
} from '@evenrule/metrology'
import { formatNumber, formatShare } from '../format'
import { describeBaseline, describeKey, describeMargin, subjectWords } from './clauses'

export interface FieldWords {
  label: string
  hint?: string
  /** After the number, where the field has no unit of its own. */
  suffix?: string
}

type Words = { [T in ClauseType]: { [F in keyof Required<ClauseParameters[T]>]: FieldWords } }

const baseline: FieldWords = {
  label: 'Where the tolerance is one-sided, of',
  hint: 'A one-sided tolerance has no width: name what stands in for it.',
}

/** Labels of the fields of every clause type; the forms are made from their descriptors. */
export const clauseFieldWords: Words = {
  'design-minimum': {
    readings: { label: 'Least number of readings' },
    registeredBeforehand: {
      label: 'Registered before its first reading',
      hint: 'So that a study cannot be chosen after its readings are seen.',
    },
    attempts: {
      label: 'Most attempts',
      hint: 'On one measuring task since the agreement came into force. Empty: any number, all of them named.',
    },
  },
  'resolution-share': {
    share: { label: 'Resolution at most' },
    base: { label: 'Of', hint: 'What the smallest step of the gauge is compared with.' },
    baseline,
  },
  'calibration-in-date': {
    gauge: { label: 'Gauge in calibration on the day of collection' },
    standard: { label: 'Reference standard in calibration on the day of collection' },
  },
  'bias-equivalence': {
    margin: { label: 'Margin either way', hint: 'The bias must be shown to lie within plus or minus this.' },
    confidence: { label: 'Shown at', hint: 'Confidence of each of the two one-sided tests.' },
  },
  'bias-zero-test': {
    alpha: {
      label: 'Risk level α',
      hint: 'Chance that a gauge without any bias is refused. A stricter level passes more gauges with a bias.',
    },
  },
  'bias-interval-inside': {
    margin: { label: 'Margin either way', hint: 'The whole interval must lie within plus or minus this.' },
    confidence: { label: 'Interval at', hint: 'Confidence of the two-sided interval of the bias.' },
  },
  'bias-point': {
    margin: { label: 'Margin either way', hint: 'The estimated bias must lie within plus or minus this.' },
  },
  'bias-index': {
    share: {
      label: 'Share allowed',
      hint: 'How much of the width below the gauge may take up; 20 % is usual.',
    },
    base: { label: 'Of', hint: 'The width that the share is taken of.' },
    baseline,
    sigmas: {
      label: 'Spread taken as',
      hint: 'How many standard deviations count as the spread.',
      suffix: 's',
    },
    leastCg: { label: 'Least Cg', hint: 'Spread alone. Empty: only Cgk is asked for.' },
    leastCgk: { label: 'Least Cgk', hint: 'Spread and bias together.' },
    basis: {
      label: 'Compared',
      hint: 'The lower bound keeps a small study from passing by luck; the estimate does not.',
    },
    confidence: { label: 'Bound at', hint: 'Confidence of the lower bound; without effect on the estimate.' },
  },
  'bias-with-uncertainty': {
    margin: {
      label: 'Margin either way',
      hint: 'Bias and expanded uncertainty together must lie within plus or minus this.',
    },
    coverageFactor: { label: 'Coverage factor k', hint: 'Times the standard uncertainty; 2 is usual.' },
  },
  'by-hand': {
    subject: { label: 'About' },
    measure: {
      label: 'What is judged',
      hint: 'A short title, such as “Repeatability on the assembly line”.',
    },
    asks: { label: 'What the document must show', hint: 'So that both sides know when it meets.' },
  },
  'does-not-apply': {
    key: { label: 'Clause of the wider scope' },
    reason: { label: 'Why it does not apply' },
  },
}

export const marginBaseWords: Record<Margin['base'], string> = {
  tolerance: '% of tolerance',
  process: '% of process variation',
  absolute: 'a value with its unit',
}

/** Entries of choice fields. */
export const choiceWords: Record<string, string> = {
  tolerance: 'tolerance',
  process: 'process variation',
  estimate: 'the estimate',
  bound: 'the confidence bound',
  ...subjectWords,
}

export const marginWords = { base: 'Given as', unit: 'Unit' } as const

/** What is wrong with a number that lies outside the field's bounds. */
export const boundsWords = {
  whole: 'Enter a whole number.',
  least: (bound: string) => `Enter ${bound} or more.`,
  above: (bound: string) => `Enter more than ${bound}.`,
  most: (bound: string) => `Enter ${bound} or less.`,
  below: (bound: string) => `Enter less than ${bound}.`,
} as const

const yesNo = (value: unknown): string => (value === true ? 'yes' : 'no')

/** The value of one parameter for reading: "±5 % of tolerance", "95 %", "yes", "15"; "any" where it is left open. */
export function describeParameter(field: FieldDescriptor, value: unknown): string {
  if (field.kind === 'nullable-number' && value === null) return 'not asked for'
  if (field.kind === 'baseline' && !value) return 'not named'
  if (value === undefined || value === null) return 'any'
  if (field.kind === 'baseline') return describeBaseline(value as AgreedBaseline)
  if (field.kind === 'clause-key') return describeKey(String(value))
  if (field.kind === 'text') return String(value)
  if (field.kind === 'margin') return `±${describeMargin(value as Margin)}`
  if (field.kind === 'boolean') return yesNo(value)
  if (field.kind === 'choice') return choiceWords[String(value)] ?? String(value)
  const number = Number(value)
  return field.kind === 'share' || field.kind === 'confidence' ? formatShare(number) : formatNumber(number)
}
