import type { RouteRecordRaw } from 'vue-router'

export default [
  {
    path: 'agreements/:agreementId/consequences',
    name: 'consequences',
    component: () => import('../views/ConsequencesPage.vue'),
  },
] satisfies RouteRecordRaw[]
