import { clauseDescriptors, clauseTypes, subjects, type ClauseType, type Subject } from '@evenrule/metrology'
import { clauseTypeWords, subjectWords } from '../../strings/clauses'
import { addWords } from '../../strings/rounds'
import { isRepeatable, keyOfType } from './proposalDraft'

/** A kind of clause in the list of what can be added. */
export interface AddableType {
  type: ClauseType
  title: string
  /** Type of the clause of the proposal that judges the same already. */
  taken: ClauseType | undefined
}

/** The kinds of clauses about one subject. */
export interface AddableGroup {
  subject: Subject | null
  title: string
  types: AddableType[]
}

/** Every kind of clause there is, by subject in the order of the catalogue; what fits any subject comes last. */
export function addableGroups(present: readonly { type: ClauseType }[]): AddableGroup[] {
  const taken = new Map(present.map(({ type }) => [keyOfType(type), type]))
  const ofSubject = (subject: Subject | null): AddableType[] =>
    clauseTypes
      .filter((type) => clauseDescriptors[type].subject === subject)
      .map((type) => ({
        type,
        title: clauseTypeWords[type],
        taken: isRepeatable(type) ? undefined : taken.get(keyOfType(type)),
      }))
  return [...subjects, null]
    .map((subject) => ({
      subject,
      title: subject === null ? addWords.any : subjectWords[subject],
      types: ofSubject(subject),
    }))
    .filter(({ types }) => types.length > 0)
}
