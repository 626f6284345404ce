import type { RequestHandler } from 'express'
import { defineError } from '../errors'

const crossSite = defineError(
  'cross-site',
  403,
  'This request did not come from the app itself. Open the app in its own window and try again.',
)
const safe = new Set(['GET', 'HEAD', 'OPTIONS'])

/**
 * Unsafe methods need the header that our client sets, and an origin that is this app's own. The two apps share
 * a host and differ by port, which browsers call same-site: the origin and `Sec-Fetch-Site` tell them apart.
 */
export function sameOrigin(origin: string): RequestHandler {
  return (request, _response, next) => {
    if (safe.has(request.method)) return next()
    const fetchSite = request.headers['sec-fetch-site']
    const wrongSite = fetchSite !== undefined && fetchSite !== 'same-origin'
    if (request.headers['x-evenrule-client'] !== '1' || request.headers.origin !== origin || wrongSite)
      throw crossSite()
    next()
  }
}
