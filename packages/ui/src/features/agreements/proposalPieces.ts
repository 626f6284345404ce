import { termFields, type TermField } from '@evenrule/api/contract'
import type { Pieces } from './merging'
import { keyOfTyped, type TypedClause, type TypedCriteria } from './proposalDraft'
import { typedTerms } from './typedTerms'

const clausePrefix = 'clause:'
const termPrefix = 'term:'

/** What is typed, piece by piece; two clauses that cannot be read yet stay two. */
export function piecesOf<T extends TypedCriteria>({ clauses, terms, ...texts }: T): Pieces {
  const pieces: Record<string, unknown> = {}
  for (const clause of clauses) {
    const key = clausePrefix + keyOfTyped(clause)
    let free = key
    for (let again = 2; free in pieces; again += 1) free = `${key} (${again})`
    pieces[free] = clause
  }
  for (const field of termFields) pieces[termPrefix + field] = terms[field]
  return { ...pieces, ...texts }
}

/** What the pieces make up; texts that are no piece any more stay as in `like`. */
export function fromPieces<T extends TypedCriteria>(pieces: Pieces, like: T): T {
  const clauses = Object.entries(pieces)
    .filter(([key]) => isClausePiece(key))
    .map(([, clause]) => clause as TypedClause)
  const said = termFields.flatMap((field) => {
    const text = pieces[termPrefix + field]
    return typeof text === 'string' ? [[field, text] as const] : []
  })
  const texts = Object.fromEntries(
    Object.entries(pieces).filter(([key]) => !isClausePiece(key) && !termOfPiece(key)),
  )
  return { ...like, ...texts, clauses, terms: { ...typedTerms(), ...Object.fromEntries(said) } }
}

/** The field of terms that a piece is, where it is one. */
export const termOfPiece = (key: string): TermField | undefined =>
  termFields.find((field) => key === termPrefix + field)

export const isClausePiece = (key: string): boolean => key.startsWith(clausePrefix)
