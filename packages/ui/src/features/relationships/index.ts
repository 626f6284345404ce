export { default as RelationshipsPage } from './RelationshipsPage.vue'
