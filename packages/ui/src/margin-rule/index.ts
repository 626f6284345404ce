export { default as MarginRule } from './MarginRule.vue'
export { default as VerdictMark } from './VerdictMark.vue'
export {
  layoutMarginRule,
  type MarginRuleInput,
  type MarginRuleLayout,
  type RuleEnds,
  type RuleTick,
} from './marginRule'
export { useWidth } from './useWidth'
