import type { Warning, WarningCode } from '@evenrule/metrology'

/** What a reader of the figures should know. None of these changes a verdict. */
export const warningWords: Record<WarningCode, string> = {
  'no-margin': 'No margin was given, so equivalence is not judged.',
  'no-tolerance': 'No tolerance was given, so shares of it are not shown.',
  'one-sided-tolerance': 'The tolerance is one-sided, so shares of its width are not defined.',
  'confidence-too-low': 'The confidence is so low that the interval says little.',
  'unknown-field': 'A field was given that is not used here.',
  'not-representable': 'Some values differ by less than can be computed with.',
  'undefined-at-this-value': 'A figure is not defined at this value.',
  'one-reading': 'There is one reading only, so no spread and no interval.',
  'below-resolution': 'All readings are the same: the spread hides below the resolution.',
  'few-readings': 'There are few readings, so the interval is wide and one reading weighs much.',
  'few-distinct-values': 'The readings take few distinct values: the resolution is coarse for this spread.',
  'resolution-above-spread': 'The resolution is coarser than the spread; the resolution stands in for it.',
  autocorrelation: 'Neighbouring readings resemble each other, so the interval may be too narrow.',
  'outlying-reading': 'Some readings lie far from the others. They stay in; look for a cause.',
  drift: 'The readings wander with time.',
  'reference-uncertainty-too-large': 'The uncertainty of the reference standard is large for this margin.',
}

/** "Readings 4 and 9", counted from one in the order taken. */
export function nameReadings(places: readonly number[]): string {
  const numbers = places.map((place) => String(place + 1))
  const last = numbers.pop()
  if (last === undefined) return ''
  return numbers.length ? `Readings ${numbers.join(', ')} and ${last}` : `Reading ${last}`
}

/** Sentences that take a direction from the warning's figures. */
const directed: Partial<Record<WarningCode, (figures: Record<string, number>) => string | undefined>> = {
  autocorrelation: ({ lag1Autocorrelation = 0 }) =>
    lag1Autocorrelation < 0
      ? 'Neighbouring readings lie on opposite sides more often than by chance, so the interval may be too wide.'
      : undefined,
  drift: ({ direction }) =>
    direction === undefined ? undefined : `The readings ${direction > 0 ? 'rise' : 'fall'} with time.`,
}

/** A warning as a sentence that names the readings it is about. */
export function describeWarning(warning: Pick<Warning, 'code' | 'readings' | 'figures'>): string {
  const about = warning.readings?.length ? `${nameReadings(warning.readings)}: ` : ''
  const sentence = warning.figures && directed[warning.code]?.(warning.figures)
  return about + (sentence ?? warningWords[warning.code])
}
