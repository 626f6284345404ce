import type { z } from 'zod'
import { invalidInput, notFound, type FieldError } from '../errors'

/** Reads one part of a request with the contract; what is wrong names its path and how to mend it. */
export function parse(schema: z.ZodType | undefined, value: unknown, where: string): unknown {
  if (!schema) return undefined
  const result = schema.safeParse(value ?? {})
  if (result.success) return result.data
  // A malformed id in the address is an address that leads nowhere.
  if (where === 'params') throw notFound('page')
  throw invalidInput(
    result.error.issues.map((issue): FieldError => ({
      path: [where, ...issue.path].join('.'),
      message: issue.message,
    })),
  )
}
