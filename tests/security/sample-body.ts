import type { EndpointShape } from '@evenrule/api/contract'
import { z } from 'zod'
import type { Samples } from './world'

interface JsonSchema {
  type?: string
  format?: string
  enum?: unknown[]
  const?: unknown
  default?: unknown
  minimum?: number
  minItems?: number
  required?: string[]
  properties?: Record<string, JsonSchema>
  items?: JsonSchema
  anyOf?: JsonSchema[]
  oneOf?: JsonSchema[]
}

/** Values for fields that their schema alone does not describe. */
const known: Record<string, unknown> = {
  resolution: '0.001',
  unit: 'mm',
  sha256: '0'.repeat(64),
  certifiedValue: '24.000',
  expandedUncertainty: '0.0004',
  coverageFactor: '2',
  nominal: '24.000',
  lowerLimit: '23.975',
  upperLimit: '24.025',
  number: '7741-220',
  standardDeviation: '0.001',
  chance: 0.9,
  bias: '0',
  timeZone: 'Europe/Berlin',
  email: 'somebody@people.example',
  about: { kind: 'terms' },
  clauses: [{ type: 'bias-zero-test', parameters: { alpha: 0.05 } }],
}
/** Fields with a known value, but not in every body. */
const elsewhere: Record<string, Record<string, unknown>> = {
  '/organisations/:organisationId/parts/:partId/revisions/:revisionId/characteristics': { number: 5 },
  '/organisations/:organisationId/characteristics/:characteristicId': { number: 5 },
}

/**
 * A body that the endpoint's contract takes, made from its schema; ids of other things are those of the samples, so
 * that an attacker names the victim's. Throws where no such body can be made: then `known` must learn a value.
 */
export function sampleBody(endpoint: EndpointShape, samples: Samples): unknown {
  if (!endpoint.body) return undefined
  const schema = z.toJSONSchema(endpoint.body, { io: 'input', unrepresentable: 'any' }) as JsonSchema
  const body = valueOf(schema, '', { ...known, ...samples, ...elsewhere[endpoint.path] })
  const check = endpoint.body.safeParse(body)
  if (!check.success)
    throw new Error(
      `No sample body for ${endpoint.method} ${endpoint.path}: ${JSON.stringify(body)} ${check.error.message}`,
    )
  return body
}

/** The query that an endpoint cannot do without; most need none. */
export function sampleQuery({ query }: EndpointShape, samples: Samples): Record<string, unknown> {
  if (!query) return {}
  const { properties = {}, required = [] } = z.toJSONSchema(query, {
    io: 'input',
    unrepresentable: 'any',
  }) as JsonSchema
  const values = { ...known, ...samples }
  return Object.fromEntries(required.map((name) => [name, valueOf(properties[name] ?? {}, name, values)]))
}

function valueOf(schema: JsonSchema, name: string, values: Record<string, unknown>): unknown {
  const choices = schema.anyOf ?? schema.oneOf
  if (name in values && !(schema.type === 'array' && typeof values[name] === 'string')) return values[name]
  if (schema.const !== undefined) return schema.const
  if (schema.enum) return schema.enum[0]
  if (choices) return valueOf(choices.find(({ type }) => type !== 'null') ?? choices[0] ?? {}, name, values)
  switch (schema.type) {
    case 'object':
      return Object.fromEntries(
        Object.entries(schema.properties ?? {}).flatMap(([key, field]) =>
          schema.required?.includes(key) || key in values ? [[key, valueOf(field, key, values)]] : [],
        ),
      )
    case 'array': {
      const single = name.replace(/Ids$/, 'Id')
      return Array.from({ length: schema.minItems ?? 1 }, () => valueOf(schema.items ?? {}, single, values))
    }
    case 'integer':
    case 'number':
      return Math.max(schema.minimum ?? 1, 1)
    case 'boolean':
      return true
    case 'string':
      if (schema.format === 'date') return '2026-11-02'
      if (schema.format === 'date-time') return '2026-11-02T09:00:00.000Z'
      if (schema.format === 'uuid') return '0198f5a0-0000-7000-8000-00000000ffff'
      return 'Some words'
    default:
      return null
  }
}

/** A file that the endpoint takes: a certificate, or readings. */
export const sampleFile = ({ path }: EndpointShape): { name: string; bytes: Buffer } =>
  /\/(calibrations|certificate|events)$/.test(path)
    ? { name: 'certificate.pdf', bytes: Buffer.from('%PDF-1.7\ncertificate\n%%EOF\n') }
    : { name: 'readings.csv', bytes: Buffer.from('24.001\r\n24.002\r\n') }
