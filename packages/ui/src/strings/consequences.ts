import type { ClauseType } from '@evenrule/metrology'
import { formatNumber, type Unit } from '../format'
import { placesFor } from '../format/numbers'

/** Short names of rules, for the ends of curves and rows of words. */
export const ruleNames: Record<ClauseType, string> = {
  'design-minimum': 'study design',
  'resolution-share': 'resolution',
  'calibration-in-date': 'calibration',
  'bias-equivalence': 'equivalence',
  'bias-interval-inside': 'interval inside',
  'bias-point': 'point limit',
  'bias-zero-test': 'zero test',
  'bias-index': 'capability index',
  'bias-with-uncertainty': 'with uncertainty',
  'by-hand': 'by hand',
  'does-not-apply': 'does not apply',
}

/** A bias of the plots, to two significant digits. */
export const biasText = (bias: number, unit: Unit): string =>
  formatNumber(bias, { unit, digits: placesFor(bias, 2) })

export const consequenceWords = {
  heading: (subject: string) => `What the ${subject.toLowerCase()} clause does`,
  inForce: 'in force',
  proposal: 'proposal',
  chance: 'Chance to meet the clause, by true bias',
  chanceTwice: 'The same for a gauge of twice the spread',
  allowed: 'Bias it allows, by number of readings',
  assumed: (readings: number, spread: number, unit: Unit) =>
    `${formatNumber(readings)} readings, spread ${formatNumber(spread, { unit })}`,
  spread: (spread: number, unit: Unit) => `spread ${formatNumber(spread, { unit })}`,
  rewards: 'Does the clause reward the right thing?',
  atBias: (bias: number, unit: Unit) => `at a true bias of ${biasText(bias, unit)}`,
  readings: 'Planned readings',
  readingsProblem: 'Enter a whole number from 2 to 1000.',
  spreadField: 'Assumed spread',
  spreadProblem: 'Enter a number above zero.',
  characteristic: 'Shown for',
  search: 'Type a part number or name',
  anyTolerance:
    'No characteristic is entered in this scope yet, so everything is in per cent of the tolerance.',
  anyUnit: '% of tolerance',
  undefined:
    'The margin is not defined for this characteristic: it has no two-sided tolerance, or no process variation is known. Choose another, or write the margin as a value with its unit.',
  computing: 'The consequences are being computed.',
  failed: 'The consequences could not be computed from these entries.',
} as const
