import type { RouteRecordRaw } from 'vue-router'

export default [
  { path: 'gauges', name: 'gauges', component: () => import('../views/GaugesPage.vue') },
  { path: 'gauges/:gaugeId', name: 'gauge', component: () => import('../views/GaugePage.vue') },
  { path: 'standards', name: 'standards', component: () => import('../views/StandardsPage.vue') },
  { path: 'standards/:standardId', name: 'standard', component: () => import('../views/StandardPage.vue') },
] satisfies RouteRecordRaw[]
