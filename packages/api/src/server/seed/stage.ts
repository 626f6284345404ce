import type { AnswerOf, EndpointShape } from '../../contract/define'
import type { Side } from '../../contract/access'
import type { Database } from '../db/database'
import { parse } from '../http/parse'
import { isDownload, type Route, type UploadedFile } from '../http/route'
import { callTenantRoute } from '../http/tenant-call'
import type { Services } from '../services'
import type { SeededOrganisation, SeededPerson } from './base'

export interface ActInput {
  params?: Record<string, string>
  query?: Record<string, unknown>
  body?: unknown
  file?: UploadedFile
}

/** Acts of one person for one organisation on one side, each through the very route the apps use. */
export type Act = <E extends EndpointShape>(endpoint: E, input?: ActInput) => Promise<AnswerOf<E>>

/** Where the demonstration is played: the product's own routes under a clock that is moved through the past. */
export class Stage {
  #now: Date

  constructor(
    private readonly database: Database,
    private readonly services: Services,
    private readonly routes: readonly Route[],
    /** The instant of the seeding; everything is dated relative to it. */
    readonly seededAt: Date,
  ) {
    this.#now = seededAt
  }

  /** Moves the clock to a time of day so many days before the seeding, or after it where negative. */
  daysAgo(days: number, hour = 9, minute = 0): void {
    const day = new Date(this.seededAt.getTime() - days * 86_400_000)
    day.setUTCHours(hour, minute, 0, 0)
    // Never later than now: the record must not hold what is still to come.
    this.#now = day > this.seededAt ? this.seededAt : day
  }

  /** Lets some time pass, so that what follows is later than what was done. */
  pass(minutes: number): void {
    const later = new Date(this.#now.getTime() + minutes * 60_000)
    this.#now = later > this.seededAt ? this.seededAt : later
  }

  /** The calendar day so many days before the seeding, ISO 8601. */
  day(daysAgo: number): string {
    return new Date(this.seededAt.getTime() - daysAgo * 86_400_000).toISOString().slice(0, 10)
  }

  as(side: Side, organisation: SeededOrganisation, person: SeededPerson): Act {
    return async (endpoint, { params = {}, query = {}, body, file } = {}) => {
      const route = this.routes.find(
        (each) => each.endpoint.method === endpoint.method && each.endpoint.path === endpoint.path,
      )
      if (route?.scope !== 'tenant') throw new Error(`${endpoint.path} is no route of an organisation.`)
      const at = this.#now
      const answer = await callTenantRoute(
        route,
        {
          params: { organisationId: organisation.id },
          rest: () => ({
            params: parse(endpoint.params, { organisationId: organisation.id, ...params }, 'params'),
            query: parse(endpoint.query, query, 'query'),
            body: parse(endpoint.body, body, 'body'),
          }),
          file,
          person: { userId: person.id, authenticatedAt: at.toISOString() },
          side,
        },
        { database: this.database, services: { ...this.services, clock: () => at } },
      )
      if (isDownload(answer) || !endpoint.response) return undefined as never
      return endpoint.response.parse(JSON.parse(JSON.stringify(answer ?? null))) as never
    }
  }
}
