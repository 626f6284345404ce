/** How near a number must come: within the larger of an absolute and a relative distance of the one expected. */
export interface Tolerance {
  rel?: number
  abs?: number
}

/**
 * A check value from outside this project. `expected` is a partial output: every number, boolean, string, null and
 * array in it must match, an object is compared field by field; `$error` wants an error answer, `$warns` at least one
 * warning, and `$tolerance` beside fields replaces the case's tolerance for them.
 */
export interface ReferenceCase {
  id: string
  source: string
  provenance: string
  how: string
  notes: string | null
  tolerance?: Tolerance
  input: unknown
  expected: unknown
}

const usual: Tolerance = { rel: 1e-9, abs: 1e-12 }

/** What in an output differs from the expected one, with its path; empty where nothing does. */
export function misses(output: unknown, { expected, tolerance }: ReferenceCase): string[] {
  return compared(output, expected, tolerance ?? usual, '')
}

function compared(got: unknown, want: unknown, tolerance: Tolerance, path: string): string[] {
  if (Array.isArray(want)) {
    if (!Array.isArray(got) || got.length !== want.length) {
      return [`${path}: ${Array.isArray(got) ? `${got.length} items` : text(got)}, want ${want.length} items`]
    }
    return want.flatMap((each, index) => compared(got[index], each, tolerance, `${path}[${index}]`))
  }
  if (isObject(want)) return comparedFields(got, want, tolerance, path)
  const equal = typeof want === 'number' ? isNear(got, want, tolerance) : got === want
  return equal ? [] : [`${path}: got ${text(got)}, want ${text(want)}`]
}

function comparedFields(
  got: unknown,
  want: Record<string, unknown>,
  tolerance: Tolerance,
  path: string,
): string[] {
  const own = (want.$tolerance as Tolerance | undefined) ?? tolerance
  const fields = isObject(got) ? got : {}
  return Object.entries(want).flatMap(([name, each]) => {
    if (name === '$tolerance') return []
    if (name === '$warns') return hasWarnings(fields) ? [] : [`${path}: no warning`]
    if (name === '$error') return isErrorAnswer(fields) ? [] : [`${path}: no error with code and message`]
    return compared(fields[name], each, own, path ? `${path}.${name}` : name)
  })
}

function isNear(got: unknown, want: number, { abs = 0, rel = 0 }: Tolerance): boolean {
  if (typeof got !== 'number' || !Number.isFinite(got)) return false
  return Math.abs(got - want) <= Math.max(abs, rel * Math.abs(want))
}

const hasWarnings = ({ warnings }: Record<string, unknown>) => Array.isArray(warnings) && warnings.length > 0

const isErrorAnswer = ({ error }: Record<string, unknown>) =>
  isObject(error) && Boolean(error.code) && Boolean(error.message)

const isObject = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value)

const text = (value: unknown) => JSON.stringify(value) ?? 'nothing'
