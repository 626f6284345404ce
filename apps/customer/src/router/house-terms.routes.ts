import type { RouteRecordRaw } from 'vue-router'

export default [
  { path: 'house-terms', name: 'house-terms', component: () => import('../views/HouseTermsListPage.vue') },
  {
    path: 'house-terms/:houseTermsId',
    name: 'house-terms-version',
    component: () => import('../views/HouseTermsPage.vue'),
  },
] satisfies RouteRecordRaw[]
