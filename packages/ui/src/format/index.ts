export { daysBetween, formatAge, formatDate, formatDateTime, formatDue } from './dates'
export { formatInterval, formatLimits, formatTolerance, type Ends } from './intervals'
export {
  decimalPlaces,
  formatChance,
  formatCount,
  formatNumber,
  formatShare,
  minusSign,
  noFigure,
  thinSpace,
  type NumberFormat,
} from './numbers'
export { parseNumber, type NumberProblem, type ParsedNumber } from './parseNumber'
export type { Unit } from './units'
export { capital, countWord, inSentence, joinWords } from './words'
