import { createPinia } from 'pinia'
import { createApp, type Component } from 'vue'
import type { RouterOptions } from '../../session/router'
import { createClient, provideClient } from '../../session/client'
import { takeInvitation } from '../../session/invitationToken'
import { createEvenruleRouter } from '../../session/router'
import { rememberStores } from '../../session/stores'
import { useSessionStore } from '../../session/useSessionStore'
import { createEvenruleVuetify } from '../../theme/vuetify'
import type { Side } from '../../theme/tokens'

export interface AppOptions {
  side: Side
  /** The app's own root, around EvenruleApp. */
  root: Component
  routes: RouterOptions['routes']
}

/** Builds one side's app and puts it on the page. */
export function startApp({ side, root, routes }: AppOptions): void {
  takeInvitation()
  const pinia = createPinia().use(rememberStores)
  const client = createClient({ onSignedOut: () => useSessionStore(pinia).expire() })
  const router = createEvenruleRouter({
    routes,
    pages: {
      signIn: () => import('./SignInPage.vue'),
      signedOut: () => import('./SignedOutPage.vue'),
      invitation: () => import('../invitations/InvitationPage.vue'),
      noOrganisation: () => import('./NoOrganisationPage.vue'),
      notFound: () => import('./NotFoundPage.vue'),
    },
  })
  const app = createApp(root)
  provideClient(app, { side, client })
  app.use(pinia).use(router).use(createEvenruleVuetify({ side })).mount('#app')
}
