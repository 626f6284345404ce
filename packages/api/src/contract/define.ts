import type { z } from 'zod'
import type { Permission } from './access'

export type Method = 'get' | 'post' | 'put' | 'patch' | 'delete'

/** What an endpoint may be reached with. `public` routes need no session; `signed-in` ones need no organisation. */
export type Access = 'public' | 'signed-in' | Permission

export interface EndpointShape {
  method: Method
  /** Path below `/api/v1`, in Express's notation. */
  path: string
  access: Access
  params?: z.ZodType
  query?: z.ZodType
  body?: z.ZodType
  /** Parsing the answer strips every field the contract does not declare. Absent for downloads. */
  response?: z.ZodType
  /** A signature: the person must have signed in within the last minutes. */
  fresh?: boolean
  /** The body is `multipart/form-data`: one file in the field `file`, the body's fields as text. */
  upload?: { maximumBytes: number }
  summary: string
}

/** One endpoint of the contract that server, client and documentation share. */
export const defineEndpoint = <const E extends EndpointShape>(endpoint: E): E => endpoint

type Parsed<S> = S extends z.ZodType ? z.output<S> : undefined
type Sent<S> = S extends z.ZodType ? z.input<S> : undefined

export type ParamsOf<E extends EndpointShape> = Parsed<E['params']>
export type QueryOf<E extends EndpointShape> = Parsed<E['query']>
export type BodyOf<E extends EndpointShape> = Parsed<E['body']>
export type AnswerOf<E extends EndpointShape> = Parsed<E['response']>
/** What a handler returns: the response before stripping. */
export type AnswerInputOf<E extends EndpointShape> = Sent<E['response']>
export type SentParamsOf<E extends EndpointShape> = Sent<E['params']>
export type SentQueryOf<E extends EndpointShape> = Sent<E['query']>
export type SentBodyOf<E extends EndpointShape> = Sent<E['body']>
