import type { RouteRecordRaw } from 'vue-router'

export default [
  { path: 'relationships', name: 'relationships', component: () => import('../views/RelationshipsPage.vue') },
] satisfies RouteRecordRaw[]
