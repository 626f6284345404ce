import type { RouteRecordRaw } from 'vue-router'

export default [
  { path: 'submissions', name: 'submissions', component: () => import('../views/SubmissionsPage.vue') },
  {
    path: 'submissions/:submissionId',
    name: 'submission',
    component: () => import('../views/SubmissionPage.vue'),
  },
  {
    path: 'submissions/:submissionId/print',
    name: 'submission-print',
    component: () => import('../views/SubmissionPrintPage.vue'),
  },
] satisfies RouteRecordRaw[]
