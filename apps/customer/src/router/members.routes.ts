import type { RouteRecordRaw } from 'vue-router'

export default [
  { path: 'members', name: 'members', component: () => import('../views/MembersPage.vue') },
] satisfies RouteRecordRaw[]
