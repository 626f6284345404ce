export { default as PrintPage } from './PrintPage.vue'
export { default as SubmissionPage } from './SubmissionPage.vue'
export { default as SubmissionsPage } from './SubmissionsPage.vue'
export { default as SubmissionsTable } from './SubmissionsTable.vue'
