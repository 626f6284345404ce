import type { Database } from './db/database'
import type { Config } from './config'
import type { Route } from './http/route'
import { systemRoutes } from './modules/system/system.routes'

export interface RouteDependencies {
  database: Database
  config: Pick<Config, 'oidc' | 'origins'>
}

/** Every route of the product, for the server and for the test that walks them all. */
export function allRoutes({ database }: RouteDependencies): Route[] {
  return [...systemRoutes(database)]
}
