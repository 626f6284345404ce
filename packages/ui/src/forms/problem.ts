import { problemNoticeWords } from '../strings/interface'

/** One thing wrong with the input: where, and how to mend it. */
export interface FieldProblem {
  path: string
  message: string
  row?: number
  column?: string
}

/** What a failed request told, as far as it is shown (RFC 9457 problem details). */
export interface ShownProblem {
  code: string
  title: string
  detail?: string
  /** Names the entry in the server's log. */
  id?: string
  errors: FieldProblem[]
}

const isRecord = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null
const text = (value: unknown): string | undefined => (typeof value === 'string' && value ? value : undefined)

function fieldProblems(value: unknown): FieldProblem[] {
  if (!Array.isArray(value)) return []
  return value.filter(isRecord).map((each) => ({
    path: text(each.path) ?? '',
    message: text(each.message) ?? problemNoticeWords.other,
    ...(typeof each.row === 'number' ? { row: each.row } : {}),
    ...(text(each.column) ? { column: text(each.column) } : {}),
  }))
}

/** Reads a problem out of whatever was thrown: the client's `ApiProblem`, problem details, or any error. */
export function toShownProblem(thrown: unknown): ShownProblem {
  const source =
    isRecord(thrown) && isRecord(thrown.problem) ? thrown.problem : isRecord(thrown) ? thrown : {}
  const code = text(source.code) ?? 'unexpected'
  const known = problemNoticeWords.titles[code]
  // A plain error's message is for developers; only what the server wrote for people is shown.
  const detail = text(source.detail) ?? (typeof thrown === 'string' ? thrown : undefined)
  return {
    code,
    title: known ?? problemNoticeWords.other,
    ...(detail ? { detail } : {}),
    ...(text(source.id) && text(source.code) ? { id: text(source.id) } : {}),
    errors: fieldProblems(source.errors),
  }
}

/** "body.readings[3].value" as "readings.3.value": the name of a field in a form. */
export const fieldPath = (path: string): string =>
  path
    .replace(/^\/?(body|query|params)([./[]|$)/, (_match, _part, next: string) => (next === '[' ? '[' : ''))
    .replace(/\[(\w+)\]/g, '.$1')
    .replace(/\//g, '.')
    .replace(/^\./, '')
