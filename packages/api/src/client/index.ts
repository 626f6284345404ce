import type { AnswerOf, EndpointShape, SentBodyOf, SentParamsOf, SentQueryOf } from '../contract/define'
import type { Problem } from '../contract/common'

/** An answer other than success, with the problem the server named. */
export class ApiProblem extends Error {
  constructor(readonly problem: Problem) {
    super(problem.detail ?? problem.title)
    this.name = 'ApiProblem'
  }
  get code(): string {
    return this.problem.code
  }
  get status(): number {
    return this.problem.status
  }
}

type Part<Name extends string, T> = [T] extends [undefined] ? { [K in Name]?: undefined } : { [K in Name]: T }
export type CallInput<E extends EndpointShape> = Part<'params', SentParamsOf<E>> &
  ([SentQueryOf<E>] extends [undefined] ? { query?: undefined } : { query?: SentQueryOf<E> }) &
  Part<'body', SentBodyOf<E>> & { file?: File; signal?: AbortSignal }

export interface Client {
  call<E extends EndpointShape>(endpoint: E, input: CallInput<E>): Promise<AnswerOf<E>>
  /** The address of a download, for a link. */
  url<E extends EndpointShape>(
    endpoint: E,
    input: { params: SentParamsOf<E>; query?: SentQueryOf<E> },
  ): string
}

/** The one client of both apps: sets the header that the server asks of unsafe methods, and reads problems. */
export function createClient(
  options: { base?: string; fetch?: typeof fetch; onSignedOut?: () => void } = {},
): Client {
  const base = options.base ?? '/api/v1'
  const send = options.fetch ?? ((input, init) => fetch(input, init))
  return {
    async call(endpoint, input) {
      const answer = await request(send, base, endpoint, input as Loose)
      if (!answer.ok) {
        const problem = await readProblem(answer)
        if (problem.status === 401) options.onSignedOut?.()
        throw new ApiProblem(problem)
      }
      return (answer.status === 204 ? undefined : await answer.json()) as never
    },
    url: (endpoint, input) => base + addressOf(endpoint, input as Loose),
  }
}

interface Loose {
  params?: Record<string, string>
  query?: Record<string, unknown>
  body?: unknown
  file?: File
  signal?: AbortSignal
}

async function request(
  send: typeof fetch,
  base: string,
  endpoint: EndpointShape,
  input: Loose,
): Promise<Response> {
  const headers: Record<string, string> = { accept: 'application/json', 'x-evenrule-client': '1' }
  let body: BodyInit | undefined
  if (endpoint.upload) {
    const form = new FormData()
    form.set('data', JSON.stringify(input.body ?? {}))
    if (input.file) form.set('file', input.file)
    body = form
  } else if (input.body !== undefined) {
    headers['content-type'] = 'application/json'
    body = JSON.stringify(input.body)
  }
  try {
    return await send(base + addressOf(endpoint, input), {
      method: endpoint.method.toUpperCase(),
      headers,
      credentials: 'same-origin',
      ...(body === undefined ? {} : { body }),
      ...(input.signal ? { signal: input.signal } : {}),
    })
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error
    throw new ApiProblem(unreachable)
  }
}

const unreachable: Problem = {
  type: 'urn:evenrule:problem:unreachable',
  title: 'unreachable',
  status: 0,
  code: 'unreachable',
  detail: 'The server cannot be reached. What you typed is kept; try again when the connection is back.',
}

async function readProblem(answer: Response): Promise<Problem> {
  try {
    return (await answer.json()) as Problem
  } catch {
    return {
      ...unreachable,
      status: answer.status,
      code: 'unexpected',
      title: 'unexpected',
      detail: `The server answered ${answer.status} without saying why. Try again.`,
    }
  }
}

function addressOf(endpoint: EndpointShape, input: Loose): string {
  const path = endpoint.path.replace(/:(\w+)/g, (_match, name: string) =>
    encodeURIComponent(input.params?.[name] ?? ''),
  )
  const query = new URLSearchParams()
  for (const [name, value] of Object.entries(input.query ?? {})) {
    if (value !== undefined && value !== '' && value !== null) query.set(name, String(value))
  }
  const text = query.toString()
  return text ? `${path}?${text}` : path
}
