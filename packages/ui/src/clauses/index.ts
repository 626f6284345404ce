export { default as ClauseResultRow } from './ClauseResultRow.vue'
export { ruleFigures, type RuleFigures } from './ruleFigures'
