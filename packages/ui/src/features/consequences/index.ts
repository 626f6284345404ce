export { default as ConsequencesPage } from './ConsequencesPage.vue'
export { clausePagePath } from './clausePagePath'
