import type { RouteRecordRaw } from 'vue-router'

export default [
  { path: 'messages', name: 'messages', component: () => import('../views/MessagesPage.vue') },
] satisfies RouteRecordRaw[]
