import type { RouteRecordRaw } from 'vue-router'

export default [
  { path: 'record', name: 'record', component: () => import('../views/RecordPage.vue') },
] satisfies RouteRecordRaw[]
