import { contentOf } from '../../../contract/submission-content'
import { sha256 } from './record.append'

/** What a signature froze, as it lies in the database beside the record. */
export interface FrozenText {
  text: string
  sha256: string
  clauses: readonly FrozenEvaluation[]
}

export interface FrozenEvaluation {
  clauseKey: string
  inputText: string
  outputText: string
  outputSha256: string
}

/** The events that froze something, and what each names. */
export type Sealed = { kind: 'submission'; id: string; revision: number } | { kind: 'agreement'; id: string }

interface SealingEvent {
  type: string
  subjectId: string
  data: Record<string, unknown> | undefined
}

/** What an event froze; null for one that froze nothing. */
export function sealedBy({ type, subjectId, data }: SealingEvent): Sealed | null {
  if (typeof data?.sha256 !== 'string') return null
  switch (type) {
    case 'submission.signed':
      return { kind: 'submission', id: subjectId, revision: 1 }
    case 'submission.corrected':
      return { kind: 'submission', id: subjectId, revision: Number(data.revision) }
    case 'agreement.signed':
      return { kind: 'agreement', id: subjectId }
    default:
      return null
  }
}

interface NamedClause {
  clauseKey?: unknown
  outputSha256?: unknown
}

/**
 * Whether what an event froze is still there byte for byte: the text by its hash, and the input and output of each
 * evaluation by the hashes that the event and the text name.
 */
export function isAsFrozen(data: Record<string, unknown>, frozen: FrozenText | null): boolean {
  if (!frozen || sha256(frozen.text) !== data.sha256 || frozen.sha256 !== data.sha256) return false
  const named = Array.isArray(data.clauses) ? (data.clauses as NamedClause[]) : []
  const content = named.length > 0 || frozen.clauses.length > 0 ? contentOf(frozen.text) : null
  const inText = content ? [...content.clauses, ...content.advisory] : []
  return (
    named.every(({ clauseKey, outputSha256 }) =>
      frozen.clauses.some((each) => each.clauseKey === clauseKey && each.outputSha256 === outputSha256),
    ) &&
    inText.length === frozen.clauses.length &&
    frozen.clauses.every((stored) => {
      const said = inText.find(({ clauseKey }) => clauseKey === stored.clauseKey)
      return (
        said?.inputSha256 === sha256(stored.inputText) &&
        said.outputSha256 === sha256(stored.outputText) &&
        said.outputSha256 === stored.outputSha256
      )
    })
  )
}
