import type { RouteRecordRaw } from 'vue-router'

export default [
  { path: '', name: 'front', component: () => import('../views/FrontPage.vue') },
] satisfies RouteRecordRaw[]
