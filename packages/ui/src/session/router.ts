import type { Component } from 'vue'
import {
  createRouter,
  createWebHistory,
  type RouteLocationNormalized,
  type RouteLocationRaw,
  type RouteRecordRaw,
  type Router,
  type RouterHistory,
} from 'vue-router'
import { invitationPath, keptInvitation } from './invitationToken'
import { useSessionStore } from './useSessionStore'

declare module 'vue-router' {
  interface RouteMeta {
    /** Pages that anybody may see, without the frame. */
    public?: boolean
  }
}

type Lazy = () => Promise<Component>

export interface EvenrulePages {
  signIn: Lazy
  signedOut: Lazy
  invitation: Lazy
  noOrganisation: Lazy
  notFound: Lazy
}

export interface RouterOptions {
  pages: EvenrulePages
  /** What `import.meta.glob('./*.routes.ts', { eager: true, import: 'default' })` collected. */
  routes: Record<string, RouteRecordRaw[]>
  history?: RouterHistory
}

/** Path of a page of an organisation. */
export const organisationPath = (organisationId: string, path = ''): string =>
  `/organisations/${organisationId}${path ? `/${path}` : ''}`

/** Whether what an address points to comes to stand on the page, which may have to load it first. */
async function appears(hash: string): Promise<boolean> {
  const id = hash.slice(1)
  for (let tries = 0; tries < 40; tries += 1) {
    if (document.getElementById(id)) return true
    await new Promise((resolve) => setTimeout(resolve, 100))
  }
  return false
}

/** The router of either app: the pages both have, and the app's own below `/organisations/:organisationId`. */
export function createEvenruleRouter({ pages, routes, history = createWebHistory() }: RouterOptions): Router {
  const router = createRouter({
    history,
    routes: [
      { path: '/sign-in', name: 'sign-in', component: pages.signIn, meta: { public: true } },
      { path: '/signed-out', name: 'signed-out', component: pages.signedOut, meta: { public: true } },
      { path: invitationPath, name: 'invitation', component: pages.invitation, meta: { public: true } },
      { path: '/', name: 'home', component: pages.noOrganisation },
      { path: '/no-organisation', name: 'no-organisation', component: pages.noOrganisation },
      { path: '/organisations/:organisationId', children: Object.values(routes).flat() },
      { path: '/:path(.*)*', name: 'not-found', component: pages.notFound },
    ],
    scrollBehavior: async (to, from, saved) =>
      saved ??
      (to.hash
        ? (await appears(to.hash)) && { el: to.hash }
        : to.path === from.path
          ? undefined
          : { top: 0 }),
  })
  router.beforeEach(admit)
  return router
}

/** Lets a person through to a page: signs them in first, and enters the organisation the address names. */
export async function admit(to: RouteLocationNormalized): Promise<true | RouteLocationRaw> {
  if (to.meta.public) return true
  const session = useSessionStore()
  await session.ensure()
  // The app shows the failure in place of the page, and the address stays for another try.
  if (session.failure) return true
  if (session.signedOut) return { name: 'sign-in', query: { returnTo: to.fullPath } }
  if (to.name === 'home') {
    // Whoever signed in to accept an invitation goes on with it.
    if (keptInvitation()) return { name: 'invitation' }
    const { home } = session
    return home ? organisationPath(home.id) : { name: 'no-organisation' }
  }
  const { organisationId } = to.params
  if (typeof organisationId !== 'string' || to.name === 'not-found') return true
  if ([...session.organisations, ...session.foundable].some(({ id }) => id === organisationId)) {
    session.enter(organisationId)
    return true
  }
  if (session.elsewhere.some(({ id }) => id === organisationId)) return { name: 'no-organisation' }
  return {
    name: 'not-found',
    params: { path: to.path.slice(1).split('/') },
    query: to.query,
    hash: to.hash,
    replace: true,
  }
}
