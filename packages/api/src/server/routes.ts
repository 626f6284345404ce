import type { Database } from './db/database'
import type { Config } from './config'
import type { Route } from './http/route'
import type { Identity } from './integrations/oidc'
import type { Sessions } from './integrations/sessions'
import { agreementsRoutes } from './modules/agreements/agreements.routes'
import { filesRoutes } from './modules/files/files.routes'
import { frontRoutes } from './modules/front/front.routes'
import { calibrationsRoutes } from './modules/gauges/calibrations.routes'
import { gaugeEventsRoutes } from './modules/gauges/gauge-events.routes'
import { gaugesRoutes } from './modules/gauges/gauges.routes'
import { standardsRoutes } from './modules/gauges/standards.routes'
import { houseTermsRoutes } from './modules/house-terms/house-terms.routes'
import { invitationsRoutes } from './modules/invitations/invitations.routes'
import { importsRoutes } from './modules/imports/imports.routes'
import { messagesRoutes } from './modules/notifications/messages.routes'
import { characteristicsRoutes } from './modules/parts/characteristics.routes'
import { partsRoutes } from './modules/parts/parts.routes'
import { tasksRoutes } from './modules/parts/tasks.routes'
import { organisationsRoutes } from './modules/organisations/organisations.routes'
import { recordRoutes } from './modules/record/record.routes'
import { relationshipsRoutes } from './modules/relationships/relationships.routes'
import { requestsRoutes } from './modules/requests/requests.routes'
import { reviewsRoutes } from './modules/reviews/reviews.routes'
import { signInRoutes } from './modules/sign-in/sign-in.routes'
import { standingRoutes } from './modules/standing/standing.routes'
import { submissionsRoutes } from './modules/submissions/submissions.routes'
import { studiesRoutes } from './modules/studies/studies.routes'
import { systemRoutes } from './modules/system/system.routes'

export interface RouteDependencies {
  database: Database
  config: Pick<Config, 'origins' | 'invitationSecret'>
  identity: Identity
  sessions: Pick<Sessions, 'end' | 'endAllOf'>
}

/** Every route of the product, for the server and for the test that walks them all. */
export function allRoutes({ database, config, identity, sessions }: RouteDependencies): Route[] {
  return [
    ...systemRoutes(database),
    ...signInRoutes({ database, identity, sessions, origins: config.origins }),
    ...frontRoutes,
    ...relationshipsRoutes,
    ...partsRoutes,
    ...characteristicsRoutes,
    ...tasksRoutes,
    ...gaugesRoutes,
    ...standardsRoutes,
    ...calibrationsRoutes,
    ...gaugeEventsRoutes,
    ...standingRoutes,
    ...filesRoutes,
    ...agreementsRoutes,
    ...houseTermsRoutes,
    ...studiesRoutes,
    ...importsRoutes(database),
    ...requestsRoutes,
    ...messagesRoutes,
    ...organisationsRoutes,
    ...invitationsRoutes({ database, invitationSecret: config.invitationSecret }),
    ...recordRoutes,
    ...submissionsRoutes,
    ...reviewsRoutes,
  ]
}
