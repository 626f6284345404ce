export { default as TaskPage } from './TaskPage.vue'
export { default as TasksTable } from './TasksTable.vue'
