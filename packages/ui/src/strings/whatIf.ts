import { formatCount, formatNumber } from '../format'

/** Words of a what-if. None of them is the word of a verdict. */
export const whatIfWords = {
  heading: 'What if it were otherwise?',
  text: 'Leave readings out, or try another reference value, other limits or another clause. It is computed in this browser: nothing is stored, no verdict changes.',
  open: 'Try a what-if',
  close: 'Put the what-if away',
  reset: 'Back to what was submitted',
  resetStudy: 'Back to the result',
  /** Stands on every part of it, so that no picture of one can be taken for a result. */
  mark: 'What-if',
  loud: 'What-if: nothing is stored, no verdict changes.',
  quoted: 'Quoted what-if: an argument, never a verdict. Nothing is judged by it.',
  changes: 'What is changed',
  nothing: 'Nothing is changed yet, so there is nothing to compare.',
  study: 'Readings of study',
  task: 'Measuring task',
  leaveOut: 'Readings left out',
  leaveOutHint: 'In the plot, in the list, or by their numbers. A reading left out here stays in the study.',
  allLeftOut: 'Leave at least one reading in.',
  values: 'Reference value and limits',
  figure: 'Figure',
  reference: 'Reference value',
  referenceHint: (value: string) => `As it stands: ${value}.`,
  deviationHint: 'The readings are deviations from the reference standard: 0 is its certified value.',
  lower: 'Lower limit',
  upper: 'Upper limit',
  limitsHint: 'Empty where there is none.',
  limitsCrossed: 'The upper limit must be above the lower one.',
  clause: 'Clauses',
  changeClause: 'Try another clause here',
  keepClause: 'Back to the agreed clause',
  type: 'Kind of clause',
  submitted: 'As submitted',
  result: 'As it stands',
  same: 'Nothing about this clause would be different.',
  failed: 'This could not be computed.',
  readings: 'Readings',
  bias: 'Bias',
  spread: 'Spread (standard deviation)',
  quote: 'Quote it in a challenge',
  quoting: 'Computing on the submission’s own engine …',
  quoteHint:
    'The challenge then carries what was changed and the figures before and after, marked as a what-if.',
  quoteFailed:
    'It could not be computed on the engine that this submission names, so it cannot be quoted. Where another kind of clause was tried, put it back and try again.',
  quoteTooLong: 'It is too long to be quoted. Leave fewer readings out.',
  unreadable: 'The quoted what-if cannot be read any more.',
  change: {
    leftOut: (numbers: string, count: number) =>
      `${count === 1 ? 'Reading' : 'Readings'} ${numbers} left out`,
    reference: (before: string, after: string) => `Reference value ${after} instead of ${before}`,
    limits: (before: string, after: string) => `Limits ${after} instead of ${before}`,
    clause: (before: string, after: string) => `“${after}” instead of “${before}”`,
  },
  noLimits: 'none',
  /** "2 of 4 clauses would come out differently." */
  summary: (different: number, total: number) =>
    different === 0
      ? 'No clause would come out differently.'
      : `${formatNumber(different)} of ${formatCount(total, 'clause')} would come out differently.`,
  corrected: 'The readings it was tried on are not those that stand here: they have been corrected.',
  pair: (subject: string) => `${subject}: as it stands and under the what-if`,
  engine: (version: string, hash: string) => `Computed by engine ${version}, SHA-256 ${hash}…`,
} as const
