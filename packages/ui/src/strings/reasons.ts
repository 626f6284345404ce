import type { Reason, ReasonCode, SettleCode, Settling } from '@evenrule/metrology'
import { formatChance, formatCount, formatDate, formatNumber } from '../format'

export interface ReasonWords {
  /** Why the verdict is what it is. */
  sentence: string
  /** What would change it, where something would. */
  remedy?: string
}

/** Why a clause was judged as it was. Figures stand beside the sentence, on the rule and in the table. */
export const reasonWords: Record<ReasonCode, ReasonWords> = {
  'no-study': {
    sentence: 'There is no study for this clause yet.',
    remedy: 'Plan and register one.',
  },
  'one-reading': {
    sentence: 'One reading says nothing about the spread.',
    remedy: 'Take at least a second reading; the plan names the number that settles it.',
  },
  'zero-spread': {
    sentence: 'All readings are the same: the spread hides below the resolution.',
    remedy: 'Use a gauge with a finer resolution.',
  },
  'reference-uncertainty-too-large': {
    sentence: 'The uncertainty of the reference standard alone eats the margin.',
    remedy: 'Use a reference standard with a smaller uncertainty.',
  },
  'not-representable': {
    sentence: 'These values differ by less than can be computed with.',
    remedy: 'Enter the readings as deviations from the reference value.',
  },
  'margin-undefined': {
    sentence: 'The margin is not defined for this characteristic.',
    remedy: 'Agree a margin as a value with its unit.',
  },
  'interval-inside-margin': { sentence: 'The whole interval lies inside the margin.' },
  'interval-outside-margin': {
    sentence: 'The whole interval lies outside the margin.',
    remedy: 'Adjust or recalibrate the gauge, then repeat the study.',
  },
  'interval-crosses-margin': {
    sentence: 'The interval reaches across the margin: the readings neither prove nor disprove it.',
    remedy: 'More readings or less spread narrow the interval.',
  },
  'bias-within-allowed': {
    sentence: 'The bias is smaller than the test can tell from zero with these readings.',
  },
  'bias-beyond-allowed': {
    sentence: 'The bias is larger than the test allows with these readings.',
    remedy: 'Adjust or recalibrate the gauge, then repeat the study.',
  },
  'bias-within-margin': { sentence: 'The estimated bias lies within the margin.' },
  'bias-beyond-margin': {
    sentence: 'The estimated bias lies beyond the margin.',
    remedy: 'Adjust or recalibrate the gauge, then repeat the study.',
  },
  'index-high-enough': { sentence: 'The index reaches the least that is agreed.' },
  'index-too-low': {
    sentence: 'The index is below the least that is agreed.',
    remedy: 'A smaller bias or less spread raises it.',
  },
  'index-bound-high-enough': { sentence: 'The lower bound of the index reaches the least that is agreed.' },
  'index-bound-too-low': {
    sentence: 'Even the upper bound of the index is below the least that is agreed.',
    remedy: 'A smaller bias or less spread raises it.',
  },
  'index-bound-open': {
    sentence:
      'The least that is agreed lies between the bounds of the index: the readings neither prove nor disprove it.',
    remedy: 'More readings bring the bounds together; less spread or bias raises them.',
  },
  'bias-with-uncertainty-inside': {
    sentence: 'Bias and expanded uncertainty together lie within the margin.',
  },
  'bias-with-uncertainty-outside': {
    sentence: 'The bias lies beyond the margin by more than its expanded uncertainty.',
    remedy: 'Adjust or recalibrate the gauge, then repeat the study.',
  },
  'bias-with-uncertainty-crosses': {
    sentence:
      'Within its expanded uncertainty the bias may lie inside or outside the margin: the readings neither prove nor disprove it.',
    remedy: 'More readings, less spread or a reference standard with a smaller uncertainty narrow it.',
  },
  'reference-uncertainty-unknown': {
    sentence: 'The uncertainty of the reference standard is not known.',
    remedy: 'Enter it from the certificate of the standard.',
  },
  'judged-by-hand': { sentence: 'It was judged by hand on the attached document.' },
  'no-document': {
    sentence: 'There is no document yet.',
    remedy: 'Attach one to the submission and say what it shows.',
  },
  'does-not-apply': { sentence: 'The clause does not apply here.' },
  'design-as-agreed': { sentence: 'The study was made as agreed.' },
  'too-few-readings': {
    sentence: 'There are fewer readings than agreed.',
    remedy: 'Register a study of the agreed size.',
  },
  'not-registered-beforehand': {
    sentence: 'The study was not registered before its first reading.',
    remedy: 'Register a new study, then take its readings.',
  },
  'too-many-attempts': {
    sentence: 'More attempts were made on this task than agreed.',
    remedy: 'Ask the other side to agree another attempt.',
  },
  'design-unknown': {
    sentence: 'How the study was made is not known.',
    remedy: 'Register a study, so that its size and date are on record.',
  },
  'resolution-fine-enough': { sentence: 'The resolution is within the agreed share.' },
  'resolution-too-coarse': {
    sentence: 'The resolution is coarser than agreed.',
    remedy: 'Use a gauge with a finer resolution.',
  },
  'resolution-unknown': {
    sentence: 'The resolution of the gauge is not known.',
    remedy: 'Enter it with the gauge.',
  },
  'no-tolerance-width': {
    sentence: 'The characteristic has no two-sided tolerance, so a share of it is not defined.',
    remedy: 'Agree another base for this clause.',
  },
  'no-process-spread': {
    sentence: 'The process variation is not known, so a share of it is not defined.',
    remedy: 'Enter it with the characteristic.',
  },
  'in-calibration': { sentence: 'Everything was in calibration on the day of collection.' },
  'gauge-out-of-calibration': {
    sentence: 'The gauge was out of calibration on the day of collection.',
    remedy: 'Have it calibrated, then repeat the study.',
  },
  'standard-out-of-calibration': {
    sentence: 'The reference standard was out of calibration on the day of collection.',
    remedy: 'Use a standard in calibration, then repeat the study.',
  },
  'gauge-calibration-unknown': {
    sentence: 'There is no calibration on record for the gauge.',
    remedy: 'Add its certificate.',
  },
  'standard-calibration-unknown': {
    sentence: 'There is no calibration on record for the reference standard.',
    remedy: 'Add its certificate.',
  },
  'calibration-unknown': {
    sentence: 'There is no calibration on record for the day of collection.',
    remedy: 'Add the certificates.',
  },
}

/** What would likely settle a clause that is not shown. */
export const settleWords: Record<SettleCode, string> = {
  'more-readings': 'More readings would likely settle it.',
  settled: 'Nothing more is needed.',
  'no-study': 'A study would settle it.',
  'one-reading': 'A second reading is needed before anything can be said.',
  'finer-resolution': 'A gauge with a finer resolution would settle it.',
  'better-standard': 'A reference standard with a smaller uncertainty is needed.',
  'standard-uncertainty': 'The uncertainty of the reference standard is needed, from its certificate.',
  'index-below-least':
    'More readings would rather show that it falls short: the index is below the least that is agreed.',
  'index-too-near-least':
    'The index lies so near the least that is agreed that no practical number of readings settles it.',
  document: 'A document that shows it is needed.',
  'estimate-beyond-margin':
    'More readings would rather show that it falls short: the estimate lies beyond the margin.',
  'estimate-too-near-margin':
    'The estimate lies so near the margin that no practical number of readings settles it.',
  'margin-undefined': 'A margin must be agreed first.',
  'not-an-equivalence': 'This clause has no number of readings that makes it surer.',
}

const numberOf = (reason: Reason, name: string): number | undefined => {
  const value = reason[name]
  return typeof value === 'number' ? value : undefined
}
const dayOf = (reason: Reason, name: string): string => {
  const value = reason[name]
  return formatDate(typeof value === 'string' ? value : null)
}

/** The index that decided, by its name, and the least agreed for it. */
function indexSentence(say: (name: string, least: string) => string) {
  return (reason: Reason): string | undefined => {
    const least = numberOf(reason, 'least')
    return least === undefined ? undefined : say(reason.index === 'cg' ? 'Cg' : 'Cgk', formatNumber(least))
  }
}

/** Sentences that name their figures, where the judgement gave them. */
const detailed: Partial<Record<ReasonCode, (reason: Reason) => string | undefined>> = {
  'index-too-low': indexSentence((name, least) => `${name} is below the ${least} that is agreed.`),
  'index-bound-too-low': indexSentence(
    (name, least) => `Even the upper bound of ${name} is below the ${least} that is agreed.`,
  ),
  'index-bound-open': indexSentence(
    (name, least) =>
      `${least} lies between the bounds of ${name}: the readings neither prove nor disprove it.`,
  ),
  'too-few-readings': (reason) => {
    const [readings, least] = [numberOf(reason, 'readings'), numberOf(reason, 'least')]
    if (readings === undefined || least === undefined) return undefined
    return `The study has ${formatCount(readings, 'reading')}; at least ${least} are agreed.`
  },
  'too-many-attempts': (reason) => {
    const [attempts, most] = [numberOf(reason, 'attempts'), numberOf(reason, 'most')]
    if (attempts === undefined || most === undefined) return undefined
    return `This is attempt ${attempts} on the task; at most ${most} are agreed.`
  },
  'gauge-out-of-calibration': (reason) =>
    'dueOn' in reason
      ? `The gauge was calibrated ${dayOf(reason, 'calibratedOn')}, due ${dayOf(reason, 'dueOn')}; the readings were taken ${dayOf(reason, 'collectedOn')}.`
      : undefined,
  'standard-out-of-calibration': (reason) =>
    'dueOn' in reason
      ? `The reference standard was calibrated ${dayOf(reason, 'calibratedOn')}, due ${dayOf(reason, 'dueOn')}; the readings were taken ${dayOf(reason, 'collectedOn')}.`
      : undefined,
}

/** Why a clause was judged as it was, with its figures where there are any, and what would mend it. */
export function describeReason(reason: Reason): ReasonWords {
  const words = reasonWords[reason.code]
  return { ...words, sentence: detailed[reason.code]?.(reason) ?? words.sentence }
}

/** What would likely settle a clause that is not shown: "19 readings in all would show it with a chance of 90 %." */
export function describeSettling({ reason, readings, chance }: Settling): string {
  if (reason !== 'more-readings' || readings === null) return settleWords[reason]
  const likely = chance === null ? '' : ` with a chance of ${formatChance(chance)}`
  return `${formatCount(readings, 'reading')} in all would show it${likely}, if bias and spread stay as they are.`
}
