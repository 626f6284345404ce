import { InvalidInput } from '../input/invalid-input'
import { Reader } from '../input/reader'
import type {
  Basis,
  Characteristic,
  Clause,
  ClauseDescriptor,
  ClauseOf,
  ClauseType,
  Judgement,
  JudgementFacts,
  Problem,
  ProblemCode,
  Subject,
} from '../types'
import { problemCodes } from '../types'
import { biasIndex } from './bias-index'
import { biasEquivalence, biasIntervalInside } from './bias-intervals'
import { biasPoint } from './bias-point'
import { biasWithUncertainty } from './bias-with-uncertainty'
import { biasZeroTest } from './bias-zero-test'
import { byHand } from './by-hand'
import { calibrationInDate } from './calibration-in-date'
import { designMinimum } from './design-minimum'
import { doesNotApply } from './does-not-apply'
import { readField } from './fields'
import { resolutionShare } from './resolution-share'

/** Every clause type there is. A new one is a file beside this and a line here. */
export const clauseDescriptors: { [T in ClauseType]: ClauseDescriptor<T> } = {
  'design-minimum': designMinimum,
  'resolution-share': resolutionShare,
  'calibration-in-date': calibrationInDate,
  'bias-equivalence': biasEquivalence,
  'bias-interval-inside': biasIntervalInside,
  'bias-point': biasPoint,
  'bias-zero-test': biasZeroTest,
  'bias-index': biasIndex,
  'bias-with-uncertainty': biasWithUncertainty,
  'by-hand': byHand,
  'does-not-apply': doesNotApply,
}

/** Every clause type there is, in the order of the catalogue. */
export const clauseTypes = Object.keys(clauseDescriptors) as ClauseType[]

/** The descriptor of a clause’s own type. */
export function clauseDescriptor<T extends ClauseType>(clause: ClauseOf<T>): ClauseDescriptor<T> {
  return clauseDescriptors[clause.type as T]
}

/** What a clause is about. */
export function clauseSubject(clause: Clause): Subject {
  const descriptor = clauseDescriptor(clause)
  // Every descriptor has one of the two; a test goes through them all.
  return descriptor.subject ?? (descriptor.subjectOf?.(clause) as Subject)
}

/** Subject and measure: of two clauses with the same key the narrower scope's replaces the other. */
export function clauseKey(clause: Clause): string {
  const descriptor = clauseDescriptor(clause)
  return descriptor.keyOf?.(clause) ?? `${descriptor.subject}/${descriptor.measure}`
}

/** The key of all clauses of a type; null where each clause names its own. */
export function typeKey(type: ClauseType): string | null {
  const { subject, measure } = clauseDescriptors[type]
  return subject && measure && `${subject}/${measure}`
}

/** Whether a clause compares the estimate or a bound, or is judged on documents. */
export function clauseBasis(clause: Clause): Basis {
  const descriptor = clauseDescriptor(clause)
  return descriptor.basisOf?.(clause) ?? descriptor.basis
}

/** The one place where a verdict is made. */
export function judgeClause(clause: Clause, facts: JudgementFacts): Judgement {
  return clauseDescriptor(clause).judge(clause, facts)
}

/** Reads a clause; the first thing wrong with it is an `InvalidInput`. */
export function readClause(reader: Reader): Clause {
  const { type, parameters, fields } = openClause(reader)
  return assembled(
    type,
    collect(fields, (field) => readField(field, parameters)),
  )
}

/** Reads a clause from unknown data, such as a request body or a stored agreement. */
export function parseClause(value: unknown, path = 'clause'): Clause {
  return readClause(Reader.of(value, path))
}

/** Everything that keeps a clause, as written, from being agreed for a characteristic; empty when nothing does. */
export function clauseProblems(value: unknown, characteristic: Characteristic): Problem[] {
  const problems: Problem[] = []
  const attempt = <V>(read: () => V): V | undefined => {
    try {
      return read()
    } catch (error) {
      if (!(error instanceof InvalidInput)) throw error
      problems.push({ code: asProblemCode(error.code), path: error.path, message: error.message })
      return undefined
    }
  }
  const opened = attempt(() => openClause(Reader.of(value)))
  if (!opened) return problems
  const { type, parameters, fields } = opened
  const values = collect(fields, (field) => attempt(() => readField(field, parameters)))
  // Reading a field stops at its first fault: what is left unread inside it is not therefore unknown.
  const faulty = problems.map(({ path }) => path.split('.', 2).join('.') + '.')
  for (const path of parameters.unknownFields().filter((each) => !faulty.some((of) => each.startsWith(of)))) {
    problems.push({ code: 'unknown-field', path, message: 'This field is not part of the clause.' })
  }
  if (problems.length > 0) return problems
  const clause = assembled(type, values)
  return clauseDescriptor(clause).check(clause, characteristic)
}

function openClause(reader: Reader) {
  const type = reader.choice('type', clauseTypes)
  return { type, parameters: reader.object('parameters'), fields: clauseDescriptors[type].fields }
}

function collect<F extends { name: string }>(fields: readonly F[], read: (field: F) => unknown) {
  const given = fields.map((field) => [field.name, read(field)] as const)
  return Object.fromEntries(given.filter(([, value]) => value !== undefined))
}

/** The fields of a type, read by their descriptors, are the parameters of that type. */
function assembled(type: ClauseType, parameters: Record<string, unknown>): Clause {
  return { type, parameters } as unknown as Clause
}

/** Codes of unreadable input that are no problem code of a clause are told as a number that is none. */
function asProblemCode(code: string): ProblemCode {
  return problemCodes.find((known) => known === code) ?? 'not-a-number'
}
