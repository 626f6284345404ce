import type { studies } from '@evenrule/api/contract'
import { convert, evaluate, isError, type BiasOutput } from '@evenrule/metrology'
import { decimalPlaces, formatInterval, formatNumber, formatShare } from '../../format'
import { answerWords } from '../../strings/results'

/** The readings of a study that no clause judges, computed from what is kept; null where they cannot be compared. */
export function unjudgedStudy(
  study: Pick<studies.Study, 'measuredAs' | 'unit'> & {
    standard: Pick<studies.Study['standard'], 'certifiedValue' | 'unit'>
  },
  { values }: Pick<studies.StudyRevision, 'values'>,
): BiasOutput | null {
  const { standard, measuredAs, unit } = study
  // A deviation is already taken from the certified value.
  const value = measuredAs === 'deviation' ? 0 : convert(Number(standard.certifiedValue), standard.unit, unit)
  if (value === null || values.length === 0) return null
  const input = { kind: 'bias' as const, unit, readings: values, reference: { value } }
  const result = evaluate<'bias'>(input)
  return isError(result) ? null : result
}

/** "The bias is −0.0001 mm, its 95 % interval −0.0007 to 0.0004 mm." */
export function unjudgedText(
  { bias, interval, confidence, minimum, maximum }: BiasOutput,
  unit: string,
): string {
  if (bias === null) return ''
  // One place more than the readings have.
  const format = { unit, digits: Math.max(decimalPlaces(minimum), decimalPlaces(maximum)) + 1 }
  const around = interval ? formatInterval(interval, format) : ''
  return answerWords.unjudged(formatNumber(bias, format), around, formatShare(confidence))
}
