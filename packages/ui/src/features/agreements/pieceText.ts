import { clauseDescriptors } from '@evenrule/metrology'
import { readDraftParameters } from '../../clauses/clauseDraft'
import { formatDate } from '../../format'
import { clauseTypeWords, describeClause } from '../../strings/clauses'
import { conflictWords as words } from '../../strings/rounds'
import { describeTerm, termLabels } from '../../strings/terms'
import type { MergeRow } from './merging'
import { readTypedClause, type TypedClause } from './proposalDraft'
import { isClausePiece, termOfPiece } from './proposalPieces'
import { readTerms, typedTerms } from './typedTerms'

/** What a piece is about: the name of the clause, the label of the term or field. */
export function pieceTitle({ key, mine, theirs, base }: MergeRow): string {
  if (isClausePiece(key)) {
    const clause = [mine, theirs, base].find(Boolean) as TypedClause | undefined
    return clause ? clauseTypeWords[clause.type] : key
  }
  const term = termOfPiece(key)
  if (term) return termLabels[term]
  return words.texts[key] ?? key
}

/** The value of a piece in words, also where a clause cannot be read yet. */
export function pieceText(key: string, value: unknown): string {
  if (value === undefined) return words.nothing
  if (isClausePiece(key)) {
    const typed = value as TypedClause
    const clause = readTypedClause(typed)
    if (clause) return describeClause(clause)
    const { problems } = readDraftParameters(clauseDescriptors[typed.type].fields, typed.parameters)
    return `${clauseTypeWords[typed.type]} (${words.unreadable}: ${Object.values(problems ?? {}).join(' ')})`
  }
  const term = termOfPiece(key)
  if (term) return describeTerm(term, readTerms({ ...typedTerms(), [term]: String(value) }).terms[term])
  if (value === '') return words.empty
  return key === 'effectiveOn' ? formatDate(String(value)) : String(value)
}
