export { default as ImportPage } from './ImportPage.vue'
export { default as ImportsPage } from './ImportsPage.vue'
export { default as NewImportPage } from './NewImportPage.vue'
