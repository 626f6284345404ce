import type { RecordFault } from '../../../contract/record'
import { canonicalText, sha256 } from './record.append'
import type { EventRow } from './record.repository'

/** Where a chain stands before an event. */
export interface Link {
  chainId: string
  sequence: number
  hash: string
}

/**
 * What is wrong with an event that should follow `before`; null where nothing is. Everything that people see of an
 * event is compared with its text, and the text with its hash.
 */
export function faultOf(event: EventRow, before: Link): RecordFault | null {
  if (event.sequence > before.sequence + 1) return 'missing'
  if (sha256(event.text) !== event.hash) return 'text-changed'
  const content = contentOf(event.text)
  if (!content) return 'text-changed'
  if (content.chain !== before.chainId || content.sequence !== event.sequence) return 'misplaced'
  if (content.previousHash !== before.hash || event.previousHash !== before.hash) return 'link-broken'
  return sameColumns(event, content) ? null : 'columns-changed'
}

/** The data an event's text holds; undefined where it is not the canonical text of an object. */
export function contentOf(text: string): Content | undefined {
  try {
    const content = JSON.parse(text) as Content
    return canonicalText(content) === text ? content : undefined
  } catch {
    return undefined
  }
}

interface Content {
  chain?: unknown
  sequence?: unknown
  previousHash?: unknown
  at?: unknown
  type?: unknown
  actor?: { organisation?: unknown; person?: unknown; side?: unknown }
  subject?: { type?: unknown; id?: unknown }
  task?: unknown
  data?: Record<string, unknown>
}

const sameColumns = (event: EventRow, content: Content): boolean =>
  event.at === content.at &&
  event.type === content.type &&
  event.actorUserId === (content.actor?.person ?? null) &&
  event.actorOrgId === (content.actor?.organisation ?? null) &&
  event.subjectType === content.subject?.type &&
  event.subjectId === content.subject.id &&
  event.taskId === (content.task ?? null)
