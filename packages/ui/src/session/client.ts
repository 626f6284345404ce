import { createClient, type Client } from '@evenrule/api/client'
import { inject, type App, type InjectionKey } from 'vue'
import type { Side } from '../theme/tokens'

const clientKey: InjectionKey<Client> = Symbol('evenrule client')
const sideKey: InjectionKey<Side> = Symbol('evenrule side')

const missing = (what: string): never => {
  throw new Error(`No ${what} is provided: the app must call provideClient first.`)
}

/** Gives the app its client and says which side of the table it is. */
export function provideClient(app: App, { side, client }: { side: Side; client: Client }): void {
  app.provide(clientKey, client)
  app.provide(sideKey, side)
}

/** The one client of the app. Works in components, composables and Pinia setup stores. */
export const useApi = (): Client => inject(clientKey) ?? missing('client')

/** Which side of the table this app is. */
export const useSide = (): Side => inject(sideKey) ?? missing('side')

export { createClient }
export type { Client }
