import type { agreements } from '@evenrule/api/contract'
import {
  areCompatible,
  clauseDescriptors,
  clauseTypes,
  units,
  type Clause,
  type ClauseType,
} from '@evenrule/metrology'
import { bySubject } from './differences'
import { draftOf, readDraftParameters, type ClauseDraft } from '../../clauses/clauseDraft'

/** A clause as typed. */
export interface TypedClause {
  type: ClauseType
  parameters: ClauseDraft
}

/** A proposal as typed. */
export interface TypedProposal {
  clauses: TypedClause[]
  effectiveOn: string
  comment: string
}

/** Subject and measure of a type: of clauses with one key a proposal holds one. */
export const keyOfType = (type: ClauseType): string => {
  const { subject, measure } = clauseDescriptors[type]
  return `${subject}/${measure}`
}

/** Types that judge the same thing as this one, itself among them. */
export const alternatives = (type: ClauseType): ClauseType[] =>
  clauseTypes.filter((each) => keyOfType(each) === keyOfType(type))

/** Types whose subject and measure no clause has yet; of several for one thing the first. */
export function addableTypes(present: readonly { type: ClauseType }[]): ClauseType[] {
  const taken = new Set(present.map(({ type }) => keyOfType(type)))
  return clauseTypes.filter((type) => !taken.has(keyOfType(type)))
}

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
  typed.forEach(({ type, parameters }, at) => {
    const read = readDraftParameters(clauseDescriptors[type].fields, parameters)
    if (read.problems) {
      for (const [field, message] of Object.entries(read.problems))
        problems[`clauses.${at}.parameters.${field}`] = message
      return
    }
    // The fields of a type, read by their descriptors, are the parameters of that type.
    clauses.push({ type, parameters: read.parameters } as unknown as Clause)
    places.push(at)
  })
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

/** An ISO day some days after another. */
export function dayAfter(day: string, days: number): string {
  const date = new Date(`${day}T00:00:00Z`)
  date.setUTCDate(date.getUTCDate() + days)
  return date.toISOString().slice(0, 10)
}
