import { canonicalText } from '@evenrule/metrology'

/**
 * Two people wrote on the same round: what one saved meanwhile and what the other has typed, piece by piece. A piece is
 * a clause, a term, the first day or the comment; each is plain data, so that it can be kept and compared.
 */
export interface Pieces {
  [key: string]: unknown
}

export type Choice = 'theirs' | 'mine'

/** One piece in which what was saved and what is typed differ; undefined where it is not there. */
export interface MergeRow {
  key: string
  base: unknown
  theirs: unknown
  mine: unknown
  /** Whose change it is, where only one of them touched it; null where both did. */
  changedBy: Choice | null
}

const same = (a: unknown, b: unknown): boolean =>
  a === undefined || b === undefined ? a === b : canonicalText(a) === canonicalText(b)

/** The pieces in which the two differ: first in the order of one's own, then what only the other has. */
export function differingPieces(base: Pieces, theirs: Pieces, mine: Pieces): MergeRow[] {
  const keys = [...new Set([...Object.keys(mine), ...Object.keys(theirs)])]
  return keys
    .filter((key) => !same(theirs[key], mine[key]))
    .map((key) => ({
      key,
      base: base[key],
      theirs: theirs[key],
      mine: mine[key],
      changedBy: same(base[key], mine[key]) ? 'theirs' : same(base[key], theirs[key]) ? 'mine' : null,
    }))
}

/** What is chosen to begin with: each one's own changes stand; where both changed the same, what one typed. */
export const firstChoices = (rows: readonly MergeRow[]): Record<string, Choice> =>
  Object.fromEntries(rows.map(({ key, changedBy }) => [key, changedBy ?? 'mine']))

/** The pieces as chosen, in the order of one's own; a piece that the chosen one left out falls away. */
export function mergedPieces(
  theirs: Pieces,
  mine: Pieces,
  choices: Readonly<Record<string, Choice>>,
): Pieces {
  const keys = [...new Set([...Object.keys(mine), ...Object.keys(theirs)])]
  // What both have alike was not chosen between.
  const chosen = (key: string) => (choices[key] === 'theirs' ? theirs[key] : mine[key])
  return Object.fromEntries(
    keys.map((key) => [key, chosen(key)]).filter(([, value]) => value !== undefined),
  ) as Pieces
}
