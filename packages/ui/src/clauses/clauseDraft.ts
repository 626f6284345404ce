import { fieldBounds, type AgreedBaseline, type FieldDescriptor, type Margin } from '@evenrule/metrology'
import { formatNumber, parseNumber } from '../format'
import { shiftDecimal } from '../format/numbers'
import { clauseFormWords } from '../strings/clauseForms'
import { boundsWords } from '../strings/fields'
import { numberProblemWords, problemWords } from '../strings/problems'

/** What stands in for the width of a one-sided tolerance, as typed; an empty kind: nothing was agreed. */
export interface BaselineDraft {
  kind: AgreedBaseline['kind'] | ''
  text: string
  unit: string
}

/** A margin as typed: percent or value as text, so that nothing entered is lost. */
export interface MarginDraft {
  base: Margin['base']
  text: string
  unit: string
  /** Missing in what was kept before there were baselines. */
  baseline?: BaselineDraft
}

/** The fields of a clause as typed, by name. */
export type ClauseDraft = Record<string, string | boolean | MarginDraft | BaselineDraft>

/** What a draft stands for, or messages by field name where it cannot be read. */
export type ReadDraft =
  | { parameters: Record<string, unknown>; problems: null }
  | { parameters: null; problems: Record<string, string> }

const percentKinds = new Set<FieldDescriptor['kind']>(['share', 'confidence'])
const plainText = (value: number): string => String(value)
const percentText = (value: number): string => String(shiftDecimal(value, 2))

const isMargin = (value: unknown): value is Margin =>
  typeof value === 'object' && value !== null && 'base' in value
const isBaseline = (value: unknown): value is AgreedBaseline =>
  typeof value === 'object' && value !== null && 'kind' in value

/** No baseline agreed, ready for typing one. */
export const noBaseline = (unit: string): BaselineDraft => ({ kind: '', text: '', unit })

function draftOfBaseline(value: unknown, unit: string): BaselineDraft {
  if (!isBaseline(value)) return noBaseline(unit)
  if (value.kind === 'process') return { kind: 'process', text: '', unit }
  return {
    kind: value.kind,
    text: plainText(value.value),
    unit: value.kind === 'absolute' ? value.unit : unit,
  }
}

function draftOfMargin(value: unknown, unit: string): MarginDraft {
  if (!isMargin(value)) return { base: 'tolerance', text: '', unit, baseline: noBaseline(unit) }
  return value.base === 'absolute'
    ? { base: 'absolute', text: plainText(value.value), unit: value.unit, baseline: noBaseline(unit) }
    : {
        base: value.base,
        text: percentText(value.share),
        unit,
        baseline: draftOfBaseline(value.base === 'tolerance' ? value.baseline : undefined, unit),
      }
}

const textKinds = new Set<FieldDescriptor['kind']>(['text', 'clause-key'])

function draftOfField(field: FieldDescriptor, value: unknown, unit: string): ClauseDraft[string] {
  if (field.kind === 'boolean') return value === true
  if (field.kind === 'choice') return typeof value === 'string' ? value : (field.choices?.[0] ?? '')
  if (textKinds.has(field.kind)) return typeof value === 'string' ? value : ''
  if (field.kind === 'margin') return draftOfMargin(value, unit)
  if (field.kind === 'baseline') return draftOfBaseline(value, unit)
  if (typeof value !== 'number') return ''
  return percentKinds.has(field.kind) ? percentText(value) : plainText(value)
}

/**
 * A draft to start typing from: the parameters given, or the fields' defaults. `unit` is the characteristic's, for
 * margins given as a value.
 */
export function draftOf(
  fields: readonly FieldDescriptor[],
  { parameters, unit = 'mm' }: { parameters?: object; unit?: string } = {},
): ClauseDraft {
  const given = parameters as Record<string, unknown> | undefined
  return Object.fromEntries(
    fields.map((field) => [field.name, draftOfField(field, given ? given[field.name] : field.default, unit)]),
  )
}

type Bounds = ReturnType<typeof fieldBounds>

/** The message for a value outside its bounds; percentages are named as percentages. */
function boundsProblem(value: number, bounds: Bounds, percent: boolean): string | undefined {
  const write = (bound: number) =>
    percent ? formatNumber(shiftDecimal(bound, 2), { unit: '%' }) : formatNumber(bound)
  if (bounds.least !== undefined && value < bounds.least) return boundsWords.least(write(bounds.least))
  if (bounds.above !== undefined && value <= bounds.above) return boundsWords.above(write(bounds.above))
  if (bounds.most !== undefined && value > bounds.most) return boundsWords.most(write(bounds.most))
  if (bounds.below !== undefined && value >= bounds.below) return boundsWords.below(write(bounds.below))
  return undefined
}

type Read = { value: unknown } | { problem: string }

function readNumber(text: string, bounds: Bounds, { percent = false, whole = false } = {}): Read {
  const parsed = parseNumber(text)
  if (parsed.problem) return { problem: numberProblemWords[parsed.problem] }
  const value = percent ? shiftDecimal(parsed.value, -2) : parsed.value
  if (whole && !Number.isInteger(value)) return { problem: boundsWords.whole }
  const problem = boundsProblem(value, bounds, percent)
  return problem ? { problem } : { value }
}

/** `value` is left out where nothing was agreed. */
function readBaseline(draft: BaselineDraft | undefined): Read {
  if (!draft?.kind) return { value: undefined }
  if (draft.kind === 'process') return { value: { kind: 'process' } }
  const read = readNumber(draft.text, draft.kind === 'absolute' ? { above: 0 } : {})
  if ('problem' in read) return { problem: clauseFormWords.baselineProblem(read.problem) }
  const value = { kind: draft.kind, value: read.value }
  return { value: draft.kind === 'absolute' ? { ...value, unit: draft.unit } : value }
}

function readMargin(draft: MarginDraft): Read {
  if (draft.base === 'absolute') {
    const read = readNumber(draft.text, { above: 0 })
    return 'problem' in read ? read : { value: { base: 'absolute', value: read.value, unit: draft.unit } }
  }
  const read = readNumber(draft.text, { above: 0, most: 1 }, { percent: true })
  if ('problem' in read) return read
  const baseline = draft.base === 'tolerance' ? readBaseline(draft.baseline) : { value: undefined }
  if ('problem' in baseline) return baseline
  const agreed = baseline.value === undefined ? {} : { baseline: baseline.value }
  return { value: { base: draft.base, share: read.value, ...agreed } }
}

function readText(field: FieldDescriptor, text: string): Read {
  if (text.trim() === '') return { problem: clauseFormWords.textMissing }
  if (field.longest !== undefined && text.trim().length > field.longest)
    return { problem: clauseFormWords.longest(field.longest) }
  return { value: text.trim() }
}

function readField(field: FieldDescriptor, draft: ClauseDraft[string] | undefined): Read {
  if (field.kind === 'boolean') return { value: draft === true }
  if (typeof draft === 'object') return 'kind' in draft ? readBaseline(draft) : readMargin(draft)
  const text = typeof draft === 'string' ? draft : ''
  if (field.kind === 'nullable-number' && text.trim() === '') return { value: null }
  if (field.kind === 'baseline' || (!field.required && text.trim() === '')) return { value: undefined }
  if (field.kind === 'choice') return text ? { value: text } : { problem: problemWords['not-a-choice'] }
  if (field.kind === 'clause-key') return text ? { value: text } : { problem: clauseFormWords.keyMissing }
  if (field.kind === 'text') return readText(field, text)
  return readNumber(text, fieldBounds(field), {
    percent: percentKinds.has(field.kind),
    whole: field.kind === 'integer',
  })
}

/** Reads a draft into a clause's parameters, or says field by field what must change. */
export function readDraftParameters(fields: readonly FieldDescriptor[], draft: ClauseDraft): ReadDraft {
  const parameters: Record<string, unknown> = {}
  const problems: Record<string, string> = {}
  for (const field of fields) {
    const read = readField(field, draft[field.name])
    if ('problem' in read) problems[field.name] = read.problem
    else if (read.value !== undefined) parameters[field.name] = read.value
  }
  return Object.keys(problems).length ? { parameters: null, problems } : { parameters, problems: null }
}
