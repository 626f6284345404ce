import type { RouteRecordRaw } from 'vue-router'

export default [
  { path: 'requests', name: 'requests', component: () => import('../views/RequestsPage.vue') },
  { path: 'requests/:requestId', name: 'request', component: () => import('../views/RequestPage.vue') },
] satisfies RouteRecordRaw[]
