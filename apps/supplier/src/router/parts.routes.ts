import type { RouteRecordRaw } from 'vue-router'

export default [
  { path: 'parts', name: 'parts', component: () => import('../views/PartsPage.vue') },
  { path: 'parts/:partId', name: 'part', component: () => import('../views/PartPage.vue') },
  { path: 'tasks/:taskId', name: 'task', component: () => import('../views/TaskPage.vue') },
] satisfies RouteRecordRaw[]
