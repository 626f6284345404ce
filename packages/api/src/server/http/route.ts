import type { Request, Response } from 'express'
import type { AnswerInputOf, BodyOf, EndpointShape, ParamsOf, QueryOf } from '../../contract/define'
import type { Side } from '../../contract/access'
import type { Tenant } from '../db/tenant'
import type { Services } from '../services'
import type { SignedIn } from './session'

/** One uploaded file, whole in memory up to the endpoint's limit. */
export interface UploadedFile {
  name: string
  bytes: Buffer
}

interface Parsed<E extends EndpointShape> {
  params: ParamsOf<E>
  query: QueryOf<E>
  body: BodyOf<E>
}

export interface TenantCall<E extends EndpointShape, P = undefined> extends Parsed<E> {
  tenant: Tenant
  /** What `prepare` returned. */
  prepared: P
}

export interface PrepareCall<E extends EndpointShape> extends Parsed<E> {
  file: UploadedFile | undefined
  services: Services
  /** Asks the organisation's rows for what the preparation needs, in a short transaction of its own. */
  ask: <T>(question: (tenant: Tenant) => Promise<T>) => Promise<T>
}

export interface PersonCall<E extends EndpointShape> extends Parsed<E> {
  person: SignedIn
  side: Side
  services: Services
  request: Request
  response: Response
}

export interface PublicCall<E extends EndpointShape> extends Parsed<E> {
  side: Side
  services: Services
  request: Request
  response: Response
}

/** A file sent back as an attachment. */
export interface Download {
  name: string
  contentType: string
  bytes: Buffer | string
  /** Scripts of ours only: served inline so that the browser may import them. */
  inline?: boolean
}

export type Route =
  | {
      scope: 'tenant'
      endpoint: EndpointShape
      prepare?: (call: never) => Promise<unknown>
      handle: (call: never) => Promise<unknown>
    }
  | { scope: 'person'; endpoint: EndpointShape; handle: (call: never) => Promise<unknown> }
  | { scope: 'public'; endpoint: EndpointShape; handle: (call: never) => Promise<unknown> }

/** A route inside one organisation: authorised by the endpoint's permission, run in one transaction. */
export function tenantRoute<E extends EndpointShape>(
  endpoint: E,
  handle: (call: TenantCall<E>) => Promise<AnswerInputOf<E> | Download>,
): Route {
  return { scope: 'tenant', endpoint, handle }
}

/**
 * A tenant route with slow work (reading an upload, storing a file) that must happen before the transaction:
 * `prepare` runs after authorisation and outside it, `handle` inside.
 */
export function preparedRoute<E extends EndpointShape, P>(
  endpoint: E,
  prepare: (call: PrepareCall<E>) => Promise<P>,
  handle: (call: TenantCall<E, P>) => Promise<AnswerInputOf<E> | Download>,
): Route {
  return { scope: 'tenant', endpoint, prepare, handle }
}

/** A route for any signed-in person, outside any organisation. */
export function personRoute<E extends EndpointShape>(
  endpoint: E,
  handle: (call: PersonCall<E>) => Promise<AnswerInputOf<E> | Download | void>,
): Route {
  return { scope: 'person', endpoint, handle }
}

/** A route that needs no session; it stands on the explicit list of public routes. */
export function publicRoute<E extends EndpointShape>(
  endpoint: E,
  handle: (call: PublicCall<E>) => Promise<AnswerInputOf<E> | Download | void>,
): Route {
  return { scope: 'public', endpoint, handle }
}

export const isDownload = (answer: unknown): answer is Download =>
  typeof answer === 'object' && answer !== null && 'bytes' in answer && 'contentType' in answer
