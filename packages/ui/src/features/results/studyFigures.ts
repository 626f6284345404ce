import { clauseSubject, type BiasOutput, type Warning } from '@evenrule/metrology'
import { decimalPlaces, formatShare, type Ends } from '../../format'
import { shiftDecimal } from '../../format/numbers'
import { figureDigits } from './digits'
import type { ClauseResult } from './types'

/** Everything the run plot of a study shows. */
export interface StudyFigures {
  readings: readonly number[]
  unit: string
  reference: number
  mean: number | null
  /** The interval of the mean as values, at `confidence`. */
  band: Ends | null
  confidence: string
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
  const equivalence = leading?.clause.type === 'bias-equivalence' ? study.equivalence : null
  const edge = equivalence?.margin ?? null
  return {
    ...readingsOf(any.input.data.readings, any.input.unit, study, warningsOf(results)),
    ...(equivalence
      ? {
          band: study.standardDeviation ? shifted(study.reference.value, equivalence.interval) : null,
          confidence: confidenceText(1 - 2 * equivalence.alpha),
        }
      : {}),
    margin: edge === null ? null : shifted(study.reference.value, { lower: -edge, upper: edge }),
    digits: figureDigits(any),
    leading,
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
    confidence: confidenceText(study.confidence),
    margin: null,
    digits: Math.min(9, readings.reduce((most, reading) => Math.max(most, decimalPlaces(reading)), 0) + 1),
    warnings,
    marked: [...new Set(warnings.flatMap((warning) => warning.readings ?? []))],
    leading: null,
  }
}
