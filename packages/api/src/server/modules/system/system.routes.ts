import { engineSource, evaluate, health } from '../../../contract/system'
import type { Database } from '../../db/database'
import { defineError, notFound, ProblemError } from '../../errors'
import { checkDatabase } from '../../http/mount'
import { personRoute, publicRoute, type Route } from '../../http/route'

const unhealthy = defineError('unhealthy', 503, (part: string) => `The ${part} does not answer.`)

export const systemRoutes = (database: Database): Route[] => [
  publicRoute(health, async ({ services }) => {
    await checkDatabase(database).catch(() => {
      throw unhealthy('database')
    })
    await services.files.check().catch(() => {
      throw unhealthy('file store')
    })
    return { status: 'ok' as const }
  }),

  personRoute(engineSource, async ({ params, services }) => {
    const source = await services.engines.source(params.sha256.replace('.mjs', ''))
    if (source === undefined) throw notFound('engine')
    return { name: params.sha256, contentType: 'text/javascript; charset=utf-8', bytes: source, inline: true }
  }),

  personRoute(evaluate, async ({ body, services }) => {
    const output = await services.engines.evaluate(body)
    if ('error' in output) {
      const { code, message, path } = output.error
      throw new ProblemError(code, 422, message, [{ path, message }])
    }
    return { ...output }
  }),
]
