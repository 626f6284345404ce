export { default as CoverageKey } from './CoverageKey.vue'
export { default as CoverageRule } from './CoverageRule.vue'
export type { CoverageState, CoverageTick } from './types'
