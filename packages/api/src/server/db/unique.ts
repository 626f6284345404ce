import { ProblemError, type FieldError } from '../errors'

/** What to say when a unique constraint of the database refuses a row: which field, and how to mend it. */
export type UniqueFields = Record<string, { path: string; message: string }>

/**
 * Runs a write and turns the refusal by one of the named constraints into a 409 at its field. Constraints
 * include the tenant, so the answer tells nothing about other organisations.
 */
export async function uniqueOr409<T>(fields: UniqueFields, write: () => Promise<T>): Promise<T> {
  try {
    return await write()
  } catch (error) {
    const field = fields[violated(error) ?? '']
    if (!field) throw error
    throw alreadyTaken(field)
  }
}

/** What the sender entered exists already; the field says what, and how to mend it. */
export const alreadyTaken = (field: FieldError): ProblemError =>
  new ProblemError('already-taken', 409, 'This exists already. See the marked field.', [field])

function violated(error: unknown): string | undefined {
  for (let at = error; typeof at === 'object' && at !== null; at = (at as { cause?: unknown }).cause) {
    const { code, constraint } = at as { code?: unknown; constraint?: unknown }
    if (code === '23505' && typeof constraint === 'string') return constraint
  }
  return undefined
}
