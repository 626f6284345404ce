import { formatCount } from '../format'

/** Choosing readings of a study. */
export const pickerWords = {
  numbers: 'Numbers of the readings',
  numbersHint: 'Such as 3, 7–9. Or choose them in the plot or in the list.',
  notThere: (piece: string, count: number) => `“${piece}” names no reading: they are numbered 1 to ${count}.`,
  table: 'Readings to choose from',
  chosen: (count: number) => `${formatCount(count, 'reading')} chosen`,
} as const
