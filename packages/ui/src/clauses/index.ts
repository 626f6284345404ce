export { default as ClauseForm } from './ClauseForm.vue'
export { default as ClauseResultRow } from './ClauseResultRow.vue'
export {
  draftOf,
  readDraftParameters,
  noBaseline,
  type BaselineDraft,
  type ClauseDraft,
  type MarginDraft,
  type ReadDraft,
} from './clauseDraft'
export { ruleFigures, type RuleFigures } from './ruleFigures'
