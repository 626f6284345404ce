import type { RouteRecordRaw } from 'vue-router'

export default [
  { path: 'agreements', name: 'agreements', component: () => import('../views/AgreementsPage.vue') },
  {
    path: 'agreements/:agreementId',
    name: 'agreement',
    component: () => import('../views/AgreementPage.vue'),
  },
  { path: 'criteria', name: 'criteria', component: () => import('../views/AppliesPage.vue') },
] satisfies RouteRecordRaw[]
