/**
 * Exact arithmetic on the shortest decimal form of entered numbers. Everything a verdict compares with a limit
 * (differences, means, widths, shares) is formed here, so that 24.025 − 23.975 is 0.05.
 */
export * from './rational'
export { scale, type Scaled } from './scaled'
