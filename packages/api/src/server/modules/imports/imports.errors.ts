import { ProblemError } from '../../errors'
import { formatCount } from './rows/words'

/** What the preview told no longer holds: which rows, and that one looks again. */
export const changedSincePreview = (rows: readonly number[], words: (row: number) => string): ProblemError =>
  new ProblemError(
    'changed-since-preview',
    409,
    `Since the preview somebody changed what ${formatCount(rows.length, 'row')} of this file rest${rows.length === 1 ? 's' : ''} on. Nothing was imported. Look at the preview again.`,
    rows.slice(0, 20).map((row) => ({ path: 'body.file', row, message: words(row) })),
  )

/** A refusal of the single act, at the row it was made for. */
export const refusedAtRow = (row: number, { code, status, message, errors }: ProblemError): ProblemError =>
  new ProblemError(code, status, 'A row was refused. Nothing was imported; look at the preview again.', [
    { path: 'body.file', row, message: errors?.[0]?.message ?? message },
  ])
