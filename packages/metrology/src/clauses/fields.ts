import { InvalidInput } from '../input/invalid-input'
import type { Bounds, Reader } from '../input/reader'
import type { FieldDescriptor, Margin } from '../types'

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
  if (!field.required && !reader.has(field.name)) return undefined
  switch (field.kind) {
    case 'integer':
      return reader.integer(field.name, fieldBounds(field))
    case 'number':
    case 'share':
    case 'confidence':
    case 'alpha':
      return reader.number(field.name, fieldBounds(field))
    case 'boolean':
      return reader.boolean(field.name)
    case 'choice':
      return reader.choice(field.name, field.choices ?? [])
    case 'margin':
      return readMargin(reader.object(field.name))
  }
}

function readMargin(reader: Reader): Margin {
  const base = reader.choice('base', ['tolerance', 'process', 'absolute'])
  if (base !== 'absolute') return { base, share: reader.number('share', { above: 0, most: 1 }) }
  const unit = reader.text('unit')
  if (unit === '') throw new InvalidInput('missing', 'Give the unit of the margin.', reader.at('unit'))
  return { base, value: reader.number('value', { above: 0 }), unit }
}
