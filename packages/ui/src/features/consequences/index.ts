export { default as ClauseLink } from './ClauseLink.vue'
export { default as ConsequencesPage } from './ConsequencesPage.vue'
