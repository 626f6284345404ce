export { default as NewRequestPage } from './NewRequestPage.vue'
export { default as RequestPage } from './RequestPage.vue'
export { default as RequestsPage } from './RequestsPage.vue'
export { default as RequestsTable } from './RequestsTable.vue'
