import type { ClauseType } from '@evenrule/metrology'
import { formatCount, formatNumber, type Unit } from '../format'
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
  heading: (subject: string, rule?: string) =>
    `What the ${subject.toLowerCase()} clause does${rule === undefined ? '' : `: ${rule}`}`,
  more: 'Everything this clause does',
  inForce: 'in force',
  proposal: 'proposal',
  chance: 'Chance to meet the clause, by true bias',
  chanceBySpread: 'Chance to meet the clause, by true spread',
  verdictsOf: (name: string) => `Chance of each verdict, by true bias: ${name}`,
  allowed: 'Bias it allows, by number of readings',
  assumed: (readings: number, spread: number, unit: Unit) =>
    `${formatNumber(readings)} readings, spread ${formatNumber(spread, { unit })}`,
  spread: (spread: number, unit: Unit) => `spread ${formatNumber(spread, { unit })}`,
  atReadings: (readings: number) => `${formatNumber(readings)} readings`,
  rewards: 'Does the clause reward the right thing?',
  atBias: (bias: number, unit: Unit) =>
    bias === 0 ? 'without bias' : `at a true bias of ${biasText(bias, unit)}`,
  atBiasAndSpread: (bias: number, spread: number, unit: Unit) =>
    `${bias === 0 ? 'without bias' : `at a true bias of ${biasText(bias, unit)}`} and with a spread of ${biasText(spread, unit)}`,
  moreReadingsHurt: (rule: string, before: string, after: string) =>
    `More readings can make the ${rule} harder to meet: ${before} → ${after} with twice as many.`,
  readings: 'Planned readings',
  readingsProblem: 'Enter a whole number from 2 to 1000.',
  spreadField: 'Assumed spread',
  spreadProblem: 'Enter a number above zero.',
  reference: 'Reference uncertainty, k\u00a0=\u00a01',
  notNegative: 'Enter zero or a number above.',
  bias: 'True bias looked at',
  wanted: 'Wanted chance',
  chanceProblem: 'Enter a chance from 1 to 99.9 %.',
  characteristic: 'Shown for',
  search: 'Type a part number or name',
  clause: 'Clause',
  drag: 'Drag the slides on the plots, move them with the arrow keys, or type here.',
  anyTolerance:
    'No characteristic is entered in this scope yet, so everything is in per cent of the tolerance.',
  anyUnit: '% of tolerance',
  undefined:
    'The margin is not defined for this characteristic: it has no two-sided tolerance, or no process variation is known. Choose another, or write the margin as a value with its unit.',
  computing: 'The consequences are being computed.',
  failed: 'The consequences could not be computed from these entries.',
} as const

/** The page of one clause. */
export const clausePageWords = {
  question: (subject: string) =>
    `What does the ${subject.toLowerCase()} clause ask for, and what does it reward?`,
  breadcrumb: 'Consequences',
  noClause: 'There is no such clause in this agreement.',
  back: 'Back to the agreement',
  /** "A gauge without bias and a spread of 0.8 µm meets it with a chance of 98 %." */
  /** "A gauge without bias and with a spread of 0.8 µm would meet it with a chance of 98 %." */
  answer: (chance: string, bias: string, spread: string) =>
    `A gauge ${bias} and with a spread of ${spread} would meet it with a chance of ${chance}.`,
  replaced: (chance: string) => `Under the clause it would replace the chance is ${chance}.`,
  undefined: 'It is not defined for this characteristic.',
  asksPlainly: 'It asks for something that can be seen, and rewards nothing else.',
  sound: 'A better gauge and more readings make it easier to meet.',
  wrong: {
    'worse-repeatability': 'a gauge with more spread can meet it more easily',
    'more-readings': 'more readings can make it harder to meet',
    'stricter-risk': 'a stricter risk level can make it easier to meet',
  },
  rewardsWrong: (faults: string) => `It can reward the wrong thing: ${faults}.`,
  takenAway: 'This proposal takes the clause away: nothing is asked here any more.',
} as const

/** The gauge a clause asks for, and the least study, in words for whoever buys or repairs gauges. */
export const askedWords = {
  gauge: 'The gauge this clause asks for',
  gaugeText: (chance: string, readings: number) =>
    `To meet it with a chance of ${chance} in a study of ${formatNumber(readings)} readings:`,
  spread: (spread: string) =>
    `A gauge without bias may have a spread of at most ${spread}, as the standard deviation of repeated readings.`,
  spreadWidth: (width: string) =>
    `Six of these standard deviations take ${width}: the figure to ask a maker of gauges for.`,
  noSpread: 'No gauge meets it with that chance, however small its spread.',
  anySpread:
    'A gauge without bias may have any spread: the clause asks nothing of the repeatability, so it names no gauge to buy.',
  bias: (spread: string, bias: string) =>
    `A gauge with a spread of ${spread}, as assumed, may have a true bias of at most ${bias}, either way: what is left after adjusting it must be smaller.`,
  noBias: (spread: string) =>
    `With a spread of ${spread}, as assumed, it is not met with that chance even without bias: adjusting the bias is not enough, the spread must come down.`,
  anyBias: (spread: string) => `With a spread of ${spread}, as assumed, any bias will do.`,
  grows: 'With twice that spread the bias may even be larger: the clause favours the worse gauge.',
  least: 'The least study',
  leastText: (chance: string, spread: string, bias: string) =>
    `For a chance of ${chance} with a spread of ${spread} and ${bias}:`,
  bias0: 'no bias',
  biasOf: (bias: string) => `a true bias of ${bias}`,
  leastReadings: (readings: number, chance: string) =>
    `${formatCount(readings, 'reading')} are enough; the chance is then ${chance}.`,
  leastMinimum: (readings: number) => `${formatCount(readings, 'reading')}, as asked for.`,
  anySize: 'Any number of readings will do.',
  noSize: 'No number of readings gives that chance at this bias and spread.',
  sizeDoesNotHelp: 'More readings do not make it surer, so no number can be named.',
  undefined: 'It could not be computed from these entries.',
  computing: 'It is being computed.',
} as const

/** What clauses without a rule of chance ask, plainly. */
export const plainWords = {
  heading: 'What it asks',
  design: (readings: number) =>
    `A study of at least ${formatCount(readings, 'reading')}. Whoever takes fewer does not meet it, whatever the readings say.`,
  registered: 'It must be registered before its first reading, so that nobody picks the best of several.',
  notRegistered: 'It need not be registered beforehand, so readings taken earlier count too.',
  attempts: (attempts: number) =>
    `At most ${formatCount(attempts, 'attempt')} may be made on one measuring task; every registered study counts as one.`,
  anyAttempts: 'Any number of attempts may be made; a submission names them all.',
  resolution: (share: string, step: string) =>
    `The smallest step of the gauge may take at most ${share}: here ${step}.`,
  resolutionUndefined: (share: string) =>
    `The smallest step of the gauge may take at most ${share}, which is not defined for this characteristic.`,
  resolutionBuy: (step: string) => `Buy or set up a gauge that shows steps of ${step} or finer.`,
  gauge: 'The gauge must be within its calibration on the day the readings are taken.',
  standard: 'The reference standard must be within its calibration on the day the readings are taken.',
  calibrationPlan: 'Take the readings before the earlier of the due dates.',
  byHand: (measure: string) =>
    `“${measure}” is judged by hand on a document that the supplier attaches; nothing is computed.`,
  byHandAsks: (asks: string) => `The document must show: ${asks}`,
  doesNotApply: (reason: string) =>
    `It takes the wider agreement’s clause away here. The reason given: ${reason}`,
} as const
