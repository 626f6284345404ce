import type { RouteRecordRaw } from 'vue-router'

export default [
  { path: 'studies', name: 'studies', component: () => import('../views/StudiesPage.vue') },
  { path: 'studies/new', name: 'new-study', component: () => import('../views/NewStudyPage.vue') },
  { path: 'studies/:studyId', name: 'study', component: () => import('../views/StudyPage.vue') },
] satisfies RouteRecordRaw[]
