import type { RouteRecordRaw } from 'vue-router'

/** The pages of every domain, below `/organisations/:organisationId`; each domain keeps its own file here. */
export const routes = import.meta.glob<RouteRecordRaw[]>('./*.routes.ts', { eager: true, import: 'default' })
