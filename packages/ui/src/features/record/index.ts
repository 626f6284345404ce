export { default as RecordOf } from './RecordOf.vue'
export { default as RecordPage } from './RecordPage.vue'
