import { termFields, type TermField } from '@evenrule/api/contract'
import type { Pieces } from './merging'
import { keyOfTyped, type TypedClause, type TypedProposal } from './proposalDraft'
import { typedTerms } from './typedTerms'

const clausePrefix = 'clause:'
const termPrefix = 'term:'

/** A proposal as typed, piece by piece; two clauses that cannot be read yet stay two. */
export function piecesOf({ clauses, terms, effectiveOn, comment }: TypedProposal): Pieces {
  const pieces: Record<string, unknown> = {}
  for (const clause of clauses) {
    const key = clausePrefix + keyOfTyped(clause)
    let free = key
    for (let again = 2; free in pieces; again += 1) free = `${key} (${again})`
    pieces[free] = clause
  }
  for (const field of termFields) pieces[termPrefix + field] = terms[field]
  return { ...pieces, effectiveOn, comment }
}

/** The proposal that the pieces make up. */
export function proposalOf(pieces: Pieces): TypedProposal {
  const clauses = Object.entries(pieces)
    .filter(([key]) => key.startsWith(clausePrefix))
    .map(([, clause]) => clause as TypedClause)
  const said = termFields.flatMap((field) => {
    const text = pieces[termPrefix + field]
    return typeof text === 'string' ? [[field, text] as const] : []
  })
  return {
    clauses,
    terms: { ...typedTerms(), ...Object.fromEntries(said) },
    effectiveOn: pieces.effectiveOn as string,
    comment: pieces.comment as string,
  }
}

/** The field of terms that a piece is, where it is one. */
export const termOfPiece = (key: string): TermField | undefined =>
  termFields.find((field) => key === termPrefix + field)

export const isClausePiece = (key: string): boolean => key.startsWith(clausePrefix)
