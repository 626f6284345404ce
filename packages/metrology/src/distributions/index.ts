/**
 * Distribution functions, each with both tails. Only deterministic functions of @stdlib and arithmetic are used, so
 * that Node and every browser give the same bits. Proved on reference grids in tests/reference, the seams too.
 */
export { betaDistributionTails, betaQuantile } from './beta'
export { chiConstant, chiDensity, chiMean, logChiShape } from './chi-density'
export { chiSquareQuantile, chiSquareTails } from './chi-square'
export { fQuantile, fTails } from './f'
export { findRoot } from './find-root'
export type { Tails } from './incomplete-gamma'
export {
  noncentralityAt,
  noncentralTQuantile,
  noncentralTQuantileNear,
  noncentralTTails,
} from './noncentral-t'
export { normalCdfWithin, normalReach } from './normal-table'
export { normalCdf, normalQuantile, normalUpperTail } from './normal'
export { remembered } from './remembered'
export { studentizedRangeQuantile, studentizedRangeTails } from './studentized-range'
export { tQuantile, tTails, tTwoSided } from './student-t'
