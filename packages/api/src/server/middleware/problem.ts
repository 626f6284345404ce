import { randomUUID } from 'node:crypto'
import escapeHtml from 'escape-html'
import type { ErrorRequestHandler, Request, RequestHandler, Response } from 'express'
import type { Logger } from 'pino'
import type { Problem } from '../../contract/common'
import { ProblemError } from '../errors'

/** The one place where errors become answers: `application/problem+json` (RFC 9457) with a stable code. */
export function problemHandler(logger: Logger): ErrorRequestHandler {
  return (error: unknown, request, response, next) => {
    if (response.headersSent) return next(error)
    const problem = toProblem(error)
    if (problem.status >= 500) {
      problem.id = randomUUID()
      logger.error(
        { err: error, id: problem.id, path: request.path, method: request.method },
        'request failed',
      )
    }
    sendProblem(request, response, problem)
  }
}

/** Sends problem details; somebody whose browser came here by a link gets them as a page to read. */
export function sendProblem(request: Request, response: Response, problem: Problem): void {
  response.status(problem.status)
  if (isVisit(request)) response.type('html').send(problemPage(problem))
  else response.type('application/problem+json').send(JSON.stringify(problem))
}

/** A browser that opens an address asks for a page first; our client and programs ask for JSON or anything. */
const isVisit = (request: Request): boolean =>
  request.method === 'GET' && request.accepts(['application/json', 'text/html']) === 'text/html'

const problemPage = ({ detail, id }: Problem): string => `<!doctype html>
<html lang="en">
  <head>
    <meta charset="utf-8" />
    <meta name="viewport" content="width=device-width, initial-scale=1" />
    <meta name="color-scheme" content="light dark" />
    <title>What went wrong? · Evenrule</title>
  </head>
  <body>
    <main>
      <h1>What went wrong?</h1>
      <p>${escapeHtml(detail ?? '')}</p>${id ? `\n      <p>${escapeHtml(id)}</p>` : ''}
      <p><a href="/">Go to the front page</a></p>
    </main>
  </body>
</html>
`

/** An error as problem details; of an unexpected one nothing more than that. */
export function toProblem(error: unknown): Problem {
  if (error instanceof ProblemError) {
    return {
      type: `urn:evenrule:problem:${error.code}`,
      title: error.code,
      status: error.status,
      code: error.code,
      detail: error.message,
      ...(error.errors ? { errors: error.errors.map((each) => ({ ...each })) } : {}),
      ...(error.current ? { current: error.current } : {}),
    }
  }
  const status = bodyParserStatus(error)
  if (status === 413) return plain('body-too-large', 413, 'This is too much at once. Send less.')
  if (status !== undefined)
    return plain('invalid-json', 400, 'The body is not JSON. Check commas, quotes and brackets.')
  if (isUnavailable(error))
    return plain(
      'unavailable',
      503,
      'A part of the service does not answer right now. Nothing was changed; try again in a moment.',
    )
  return plain(
    'unexpected',
    500,
    'Something went wrong on our side. Nothing was changed; the id names the entry in our log.',
  )
}

const plain = (code: string, status: number, detail: string): Problem => ({
  type: `urn:evenrule:problem:${code}`,
  title: code,
  status,
  code,
  detail,
})

/** Errors of the body parser carry a status and a `type`. */
function bodyParserStatus(error: unknown): number | undefined {
  if (typeof error !== 'object' || error === null) return undefined
  const { status, type } = error as { status?: unknown; type?: unknown }
  if (typeof status !== 'number' || status >= 500) return undefined
  return typeof type === 'string' || error instanceof URIError ? status : undefined
}

const unavailableCodes = new Set([
  'ECONNREFUSED',
  'ECONNRESET',
  'ETIMEDOUT',
  'EPIPE',
  '57P01',
  '57P02',
  '57P03',
  '08006',
  '08001',
  '53300',
])

function isUnavailable(error: unknown): boolean {
  for (
    let at: unknown = error;
    typeof at === 'object' && at !== null;
    at = (at as { cause?: unknown }).cause
  ) {
    const { code, errno, message } = at as { code?: unknown; errno?: unknown; message?: unknown }
    if (unavailableCodes.has(String(code ?? errno ?? ''))) return true
    if (typeof message === 'string' && message.startsWith('Connection terminated')) return true
  }
  return false
}

export const unknownRoute: RequestHandler = (request, response) =>
  sendProblem(request, response, plain('not-found', 404, 'There is no such address in this interface.'))

export const tooMany: RequestHandler = (request, response) =>
  sendProblem(
    request,
    response,
    plain('too-many', 429, 'Too many requests in a short time. Wait a minute and try again.'),
  )
