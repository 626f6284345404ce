/** Why a verdict is what it is. Wording belongs to the apps: `Record<ReasonCode, …>` in their catalogues. */
export const reasonCodes = [
  'no-study',
  'one-reading',
  'zero-spread',
  'reference-uncertainty-too-large',
  'not-representable',
  'margin-undefined',
  'interval-inside-margin',
  'interval-outside-margin',
  'interval-crosses-margin',
  'bias-within-allowed',
  'bias-beyond-allowed',
  'design-as-agreed',
  'too-few-readings',
  'not-registered-beforehand',
  'too-many-attempts',
  'design-unknown',
  'resolution-fine-enough',
  'resolution-too-coarse',
  'resolution-unknown',
  'no-tolerance-width',
  'no-process-spread',
  'in-calibration',
  'gauge-out-of-calibration',
  'standard-out-of-calibration',
  'gauge-calibration-unknown',
  'standard-calibration-unknown',
  'calibration-unknown',
] as const
export type ReasonCode = (typeof reasonCodes)[number]

/** What a reader of the figures should know. Warnings never change a verdict. */
export const warningCodes = [
  // about what was asked
  'no-margin',
  'no-tolerance',
  'one-sided-tolerance',
  'confidence-too-low',
  'unknown-field',
  'not-representable',
  'undefined-at-this-value',
  // about the data
  'one-reading',
  'below-resolution',
  'few-readings',
  'few-distinct-values',
  'resolution-above-spread',
  'autocorrelation',
  'outlying-reading',
  'drift',
  'reference-uncertainty-too-large',
] as const
export type WarningCode = (typeof warningCodes)[number]

/** Why a clause cannot be agreed as written. */
export const problemCodes = [
  'missing',
  'not-a-number',
  'not-an-integer',
  'not-a-boolean',
  'not-an-object',
  'not-text',
  'not-a-choice',
  'too-small',
  'too-large',
  'unknown-field',
  'unknown-clause-type',
  'no-tolerance-width',
  'no-process-spread',
  'unit-unknown',
  'unit-of-another-quantity',
  'margin-below-resolution',
] as const
export type ProblemCode = (typeof problemCodes)[number]

/** Why no number of readings can be named that would settle a clause. */
export const settleCodes = [
  'more-readings',
  'settled',
  'no-study',
  'one-reading',
  'finer-resolution',
  'better-standard',
  'estimate-beyond-margin',
  'estimate-too-near-margin',
  'margin-undefined',
  'not-an-equivalence',
] as const
export type SettleCode = (typeof settleCodes)[number]
