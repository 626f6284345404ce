import { InvalidInput } from '../input/invalid-input'
import type { Bounds, Reader } from '../input/reader'
import { subjects, type AgreedBaseline, type FieldDescriptor, type Margin } from '../types'

/** What may stand in for the width of a one-sided tolerance. */
export const baselineKinds: readonly AgreedBaseline['kind'][] = ['natural-bound', 'process', 'absolute']

/** Longest key of a clause. */
const longestKey = 100

/** Bounds a kind of field has of itself; those of the field itself come on top. */
const boundsOfKind: Partial<Record<FieldDescriptor['kind'], Bounds>> = {
  share: { above: 0, most: 1 },
  confidence: { least: 0.5, below: 1 },
  alpha: { above: 0, below: 1 },
}

/** The bounds of a numeric field, as a form and a reader need them. */
export function fieldBounds(field: FieldDescriptor): Bounds {
  const own: Bounds = {}
  if (field.minimum !== undefined) own.least = field.minimum
  if (field.maximum !== undefined) own.most = field.maximum
  if (field.exclusiveMinimum !== undefined) own.above = field.exclusiveMinimum
  if (field.exclusiveMaximum !== undefined) own.below = field.exclusiveMaximum
  return { ...boundsOfKind[field.kind], ...own }
}

/** Reads one field of a clause's parameters; undefined where it is not given and need not be. */
export function readField(field: FieldDescriptor, reader: Reader): unknown {
  if (!field.required && !reader.has(field.name)) return field.kind === 'nullable-number' ? null : undefined
  switch (field.kind) {
    case 'integer':
      return reader.integer(field.name, fieldBounds(field))
    case 'number':
    case 'nullable-number':
    case 'share':
    case 'confidence':
    case 'alpha':
      return reader.number(field.name, fieldBounds(field))
    case 'boolean':
      return reader.boolean(field.name)
    case 'choice':
      return reader.choice(field.name, field.choices ?? [])
    case 'text':
      return readText(field, reader)
    case 'margin':
      return readMargin(reader.object(field.name))
    case 'baseline':
      return readBaseline(reader.object(field.name))
    case 'clause-key':
      return readKey(field, reader)
  }
}

/** A text without what surrounds it; one of a single line keeps single spaces only. */
function readText({ name, longest, lines }: FieldDescriptor, reader: Reader): string {
  const given = reader.text(name).trim()
  const text = lines ? given : given.replace(/\s+/g, ' ')
  if (text === '') throw new InvalidInput('missing', `Give ${name}.`, reader.at(name))
  if (longest !== undefined && text.length > longest) {
    throw new InvalidInput(
      'too-long',
      `Write at most ${longest} characters here; these are ${text.length}.`,
      reader.at(name),
    )
  }
  return text
}

/** The key of a clause: one of those that are computed, or of one that is judged by hand. */
function readKey({ name, choices = [] }: FieldDescriptor, reader: Reader): string {
  const key = reader.text(name)
  const [subject, by, title, ...more] = key.split('/')
  const judgedByHand = subjects.some((each) => each === subject) && by === 'by-hand' && title && !more.length
  if (choices.includes(key) || (judgedByHand && key.length <= longestKey)) return key
  throw new InvalidInput('not-a-choice', `There is no clause with the key “${key}”.`, reader.at(name))
}

function readMargin(reader: Reader): Margin {
  const base = reader.choice('base', ['tolerance', 'process', 'absolute'])
  if (base === 'absolute') return { base, ...readWithUnit(reader) }
  const share = reader.number('share', { above: 0, most: 1 })
  const baseline = base === 'tolerance' ? reader.optionalObject('baseline') : undefined
  return base === 'tolerance' && baseline
    ? { base, share, baseline: readBaseline(baseline) }
    : { base, share }
}

function readBaseline(reader: Reader): AgreedBaseline {
  const kind = reader.choice('kind', baselineKinds)
  if (kind === 'process') return { kind }
  return kind === 'absolute' ? { kind, ...readWithUnit(reader) } : { kind, value: reader.number('value') }
}

function readWithUnit(reader: Reader): { value: number; unit: string } {
  const unit = reader.text('unit')
  if (unit === '') throw new InvalidInput('missing', 'Give the unit of this value.', reader.at('unit'))
  return { value: reader.number('value', { above: 0 }), unit }
}
