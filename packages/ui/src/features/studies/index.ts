export { default as NewStudyPage } from './NewStudyPage.vue'
export { default as StudiesPage } from './StudiesPage.vue'
export { default as StudyPage } from './StudyPage.vue'
export { default as TaskStudies } from './TaskStudies.vue'
