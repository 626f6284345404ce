import { repeatedClauses, type agreements } from '@evenrule/api/contract'
import {
  areCompatible,
  clauseDescriptors,
  clauseKey,
  clauseTypes,
  parseClause,
  units,
  type Clause,
  type ClauseType,
} from '@evenrule/metrology'
import { draftOf, readDraftParameters, type ClauseDraft } from '../../clauses/clauseDraft'
import { editorWords } from '../../strings/agreementActs'
import { describeKey } from '../../strings/clauses'
import { bySubject } from './differences'
import type { TypedTerms } from './typedTerms'

/** A clause as typed. */
export interface TypedClause {
  type: ClauseType
  parameters: ClauseDraft
}

/** Clauses and terms as typed: what proposals and house terms have in common. */
export interface TypedCriteria {
  clauses: TypedClause[]
  terms: TypedTerms
}

/** A proposal as typed. */
export interface TypedProposal extends TypedCriteria {
  effectiveOn: string
  comment: string
}

/** Subject and measure of a type; of one whose clauses name their own, the type itself. */
export const keyOfType = (type: ClauseType): string => {
  const { subject, measure } = clauseDescriptors[type]
  return subject === null || measure === null ? type : `${subject}/${measure}`
}

/** A type of which a proposal may hold several clauses, each of a subject and measure of its own. */
export const isRepeatable = (type: ClauseType): boolean => clauseDescriptors[type].measure === null

/** What a clause is, read from what was typed; undefined where it cannot be read. */
export function readTypedClause({ type, parameters }: TypedClause): Clause | undefined {
  const read = readDraftParameters(clauseDescriptors[type].fields, parameters)
  // The fields of a type, read by their descriptors, are the parameters of that type.
  return read.parameters ? ({ type, parameters: read.parameters } as unknown as Clause) : undefined
}

/** The key of a clause as typed: of one that names its own and cannot be read yet, its type. */
export function keyOfTyped(typed: TypedClause): string {
  if (!isRepeatable(typed.type)) return keyOfType(typed.type)
  const clause = readTypedClause(typed)
  return clause ? clauseKey(clause) : typed.type
}

/** Types that judge the same thing as this one, itself among them. */
export const alternatives = (type: ClauseType): ClauseType[] =>
  clauseTypes.filter((each) => keyOfType(each) === keyOfType(type))

export const typedClause = (type: ClauseType, unit?: string, parameters?: object): TypedClause => ({
  type,
  parameters: draftOf(clauseDescriptors[type].fields, { unit, parameters }),
})

/** A set of clauses as it is offered for typing. */
export const typedClauses = (clauses: readonly Clause[], unit?: string): TypedClause[] =>
  bySubject(clauses).map(({ type, parameters }) => typedClause(type, unit, parameters))

/** Where a first proposal for everything starts: one clause of each subject, with the usual figures. */
export const startingTypes: readonly ClauseType[] = [
  'bias-equivalence',
  'resolution-share',
  'calibration-in-date',
  'design-minimum',
]

/** The same clauses as they are stored. */
export const usualClauses = (): Clause[] =>
  startingTypes.map((type) => parseClause(readTypedClause(typedClause(type))))

/** The clauses typed so far that can be read, and what is wrong with the others by path in the form. */
export function readTyped(typed: readonly TypedClause[]): {
  clauses: Clause[]
  /** For every readable clause its place among the typed ones. */
  places: number[]
  problems: Record<string, string>
} {
  const clauses: Clause[] = []
  const places: number[] = []
  const problems: Record<string, string> = {}
  typed.forEach((each, at) => {
    const clause = readTypedClause(each)
    if (clause) {
      clauses.push(clause)
      places.push(at)
      return
    }
    const { problems: found } = readDraftParameters(clauseDescriptors[each.type].fields, each.parameters)
    for (const [field, message] of Object.entries(found ?? {}))
      problems[`clauses.${at}.parameters.${field}`] = message
  })
  const [repeated] = repeatedClauses(clauses)
  if (repeated !== undefined)
    problems.clauses = editorWords.repeated(describeKey(clauseKey(clauses[repeated]!)))
  return { clauses, places, problems }
}

/** Units in which a margin can be given for these characteristics; every unit where there is none yet. */
export function marginUnits(
  characteristics: readonly Pick<agreements.ScopedCharacteristic, 'unit'>[],
): string[] {
  const own = [...new Set(characteristics.map(({ unit }) => unit))]
  const symbols = units.map(({ symbol }) => symbol)
  return own.length ? symbols.filter((symbol) => own.some((unit) => areCompatible(unit, symbol))) : symbols
}

/**
 * How many characteristics have one limit only, for which a share of the tolerance needs a baseline; undefined where
 * that does not matter, because every one has both.
 */
export function oneSidedCount(
  characteristics: readonly Pick<agreements.ScopedCharacteristic, 'lowerLimit' | 'upperLimit'>[],
): number | undefined {
  const count = characteristics.filter(
    ({ lowerLimit, upperLimit }) => (lowerLimit === null) !== (upperLimit === null),
  ).length
  return count > 0 || characteristics.length === 0 ? count : undefined
}

/** An ISO day some days after another. */
export function dayAfter(day: string, days: number): string {
  const date = new Date(`${day}T00:00:00Z`)
  date.setUTCDate(date.getUTCDate() + days)
  return date.toISOString().slice(0, 10)
}
