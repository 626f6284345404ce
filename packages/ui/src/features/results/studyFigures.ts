import { clauseSubject, type BiasOutput, type Warning } from '@evenrule/metrology'
import { decimalPlaces, formatNumber, formatShare, type Ends } from '../../format'
import { shiftDecimal } from '../../format/numbers'
import { figuresWords as words } from '../../strings/results'
import { figureDigits } from './digits'
import type { ClauseResult } from './types'

/** Everything the run plot of a study shows. */
export interface StudyFigures {
  readings: readonly number[]
  unit: string
  reference: number
  mean: number | null
  /** What surrounds the mean, as values, and what it is: "95 % interval", "expanded uncertainty (k = 2)". */
  band: Ends | null
  bandName: string
  /** The agreed margin around the reference value; null where none is agreed. */
  margin: Ends | null
  digits: number
  warnings: Warning[]
  /** Zero-based places of readings that a warning names. */
  marked: number[]
  /** The result that the plot explains. */
  leading: ClauseResult | null
}

const urgency = { 'falls-short': 0, 'not-shown': 1, 'meets-with-conditions': 2, meets: 3 } as const

/** The clause on the mean that a reader asks about first: what falls short, then what is not shown. */
function leadingOf(results: readonly ClauseResult[]): ClauseResult | null {
  const onMean = results.filter(
    ({ clause, input, output }) =>
      clauseSubject(clause) === 'bias' && output.study !== null && Boolean(input.data),
  )
  return onMean.sort((a, b) => urgency[a.output.verdict] - urgency[b.output.verdict])[0] ?? null
}

/** Each warning once, in the order found. */
export function warningsOf(results: readonly ClauseResult[]): Warning[] {
  const seen = new Map<string, Warning>()
  for (const { output } of results)
    for (const warning of output.warnings) if (!seen.has(warning.code)) seen.set(warning.code, warning)
  return [...seen.values()]
}

const confidenceText = (confidence: number): string =>
  formatShare(shiftDecimal(Math.round(shiftDecimal(confidence, 6)), -6))

const shifted = (by: number, ends: { lower: number; upper: number } | null): Ends | null =>
  ends && { lower: by + ends.lower, upper: by + ends.upper }

/** The readings of a study with what they are judged against; null where no clause rests on readings. */
export function studyFiguresOf(results: readonly ClauseResult[]): StudyFigures | null {
  const leading = leadingOf(results)
  const any = leading ?? results.find(({ input, output }) => output.study !== null && input.data) ?? null
  const study = any?.output.study
  if (!any || !study || !any.input.data) return null
  // A study is evaluated with the margin of its clause, where that has one.
  const edge = leading ? study.equivalence.margin : null
  return {
    ...readingsOf(any.input.data.readings, any.input.unit, study, warningsOf(results)),
    ...(leading && judgedBand(leading, study)),
    margin: edge === null ? null : shifted(study.reference.value, { lower: -edge, upper: edge }),
    digits: figureDigits(any),
    leading,
  }
}

/** What surrounds the mean where the clause compares something else than the two-sided interval. */
function judgedBand(
  { clause }: ClauseResult,
  study: BiasOutput,
): Pick<StudyFigures, 'band' | 'bandName'> | null {
  const { reference, equivalence, withUncertainty, bias } = study
  const of = (ends: { lower: number; upper: number } | null) =>
    study.standardDeviation ? shifted(reference.value, ends) : null
  if (clause.type === 'bias-equivalence') {
    const confidence = confidenceText(1 - 2 * equivalence.alpha)
    return { band: of(equivalence.interval), bandName: words.interval(confidence) }
  }
  if (clause.type !== 'bias-with-uncertainty') return null
  const { expandedUncertainty: u, coverageFactor } = withUncertainty
  return {
    band: of(u === null || bias === null ? null : { lower: bias - u, upper: bias + u }),
    bandName: words.uncertainty(formatNumber(coverageFactor)),
  }
}

/** Warnings about what a clause would have asked, where there is none. */
const aboutClauses = new Set(['no-margin', 'no-tolerance', 'one-sided-tolerance'])

/** The same for a study that no agreed clause judges: estimate and interval alone. */
export function readingsOf(
  readings: readonly number[],
  unit: string,
  study: BiasOutput,
  warnings: Warning[] = study.warnings.filter(({ code }) => !aboutClauses.has(code)),
): StudyFigures {
  return {
    readings,
    unit,
    reference: study.reference.value,
    mean: study.mean,
    band: study.standardDeviation ? shifted(study.reference.value, study.interval) : null,
    bandName: words.interval(confidenceText(study.confidence)),
    margin: null,
    digits: Math.min(9, readings.reduce((most, reading) => Math.max(most, decimalPlaces(reading)), 0) + 1),
    warnings,
    marked: [...new Set(warnings.flatMap((warning) => warning.readings ?? []))],
    leading: null,
  }
}
