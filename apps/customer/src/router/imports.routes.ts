import type { RouteRecordRaw } from 'vue-router'

export default [
  { path: 'imports', name: 'imports', component: () => import('../views/ImportsPage.vue') },
  { path: 'imports/new/:kind', name: 'new-import', component: () => import('../views/NewImportPage.vue') },
  { path: 'imports/:importId', name: 'import', component: () => import('../views/ImportPage.vue') },
] satisfies RouteRecordRaw[]
