import { InvalidInput } from './invalid-input'

/** Bounds of a number; exclusive ones are not allowed themselves. */
export interface Bounds {
  above?: number
  least?: number
  below?: number
  most?: number
}

/**
 * Reads one object of an input field by field and remembers which fields were asked for, so that a misspelt
 * optional field is reported and not silently ignored. A field that is null counts as not given.
 */
export class Reader {
  private readonly known = new Set<string>()
  private readonly all: Reader[] = []

  constructor(
    private readonly source: Record<string, unknown>,
    private readonly path: string,
    private readonly root: Reader | null = null,
  ) {
    ;(root ?? this).all.push(this)
  }

  static of(value: unknown, path = ''): Reader {
    return new Reader(asObject(value, path), path)
  }

  at(name: string | number): string {
    if (typeof name === 'number') return `${this.path}[${name}]`
    return this.path ? `${this.path}.${name}` : name
  }

  has(name: string): boolean {
    return this.value(name) !== undefined
  }

  /** The raw value; undefined where it is missing or null. */
  value(name: string): unknown {
    this.known.add(name)
    const value = Object.prototype.hasOwnProperty.call(this.source, name) ? this.source[name] : undefined
    return value === null ? undefined : value
  }

  required(name: string): unknown {
    const value = this.value(name)
    if (value === undefined) throw new InvalidInput('missing', `Give ${name}.`, this.at(name))
    return value
  }

  number(name: string, bounds: Bounds = {}): number {
    return asNumber(this.required(name), this.at(name), bounds)
  }

  optionalNumber(name: string, bounds: Bounds = {}): number | undefined {
    const value = this.value(name)
    return value === undefined ? undefined : asNumber(value, this.at(name), bounds)
  }

  integer(name: string, bounds: Bounds = {}): number {
    return asInteger(this.required(name), this.at(name), bounds)
  }

  optionalInteger(name: string, bounds: Bounds = {}): number | undefined {
    const value = this.value(name)
    return value === undefined ? undefined : asInteger(value, this.at(name), bounds)
  }

  boolean(name: string): boolean {
    const value = this.required(name)
    if (typeof value === 'boolean') return value
    throw new InvalidInput('not-a-boolean', 'Write true or false here.', this.at(name))
  }

  text(name: string): string {
    return asText(this.required(name), this.at(name))
  }

  optionalText(name: string): string | undefined {
    const value = this.value(name)
    return value === undefined ? undefined : asText(value, this.at(name))
  }

  choice<T extends string>(name: string, choices: readonly T[]): T {
    const value = asText(this.required(name), this.at(name))
    const found = choices.find((choice) => choice === value)
    if (found !== undefined) return found
    throw new InvalidInput('not-a-choice', `Choose one of ${choices.join(', ')}.`, this.at(name))
  }

  object(name: string): Reader {
    return this.child(this.required(name), this.at(name))
  }

  optionalObject(name: string): Reader | undefined {
    const value = this.value(name)
    return value === undefined ? undefined : this.child(value, this.at(name))
  }

  /** Stands for an object that was not given. */
  empty(name: string): Reader {
    return this.child({}, this.at(name))
  }

  numbers(name: string, least: number, bounds: Bounds = {}): number[] {
    const path = this.at(name)
    const list = asList(this.required(name), path, least)
    return list.map((value, index) => asNumber(value, `${path}[${index}]`, bounds))
  }

  objects(name: string, least: number): Reader[] {
    const path = this.at(name)
    const list = asList(this.required(name), path, least)
    return list.map((value, index) => this.child(value, `${path}[${index}]`))
  }

  /** Leaves the rest of this object unread on purpose: it is an output of ours, of which only a part is needed. */
  ignoreRest(): this {
    for (const name of Object.keys(this.source)) this.known.add(name)
    return this
  }

  /** Paths of given fields that nothing asked for, in this object and in those read through it. */
  unknownFields(): string[] {
    return (this.root ?? this).all.flatMap((reader) =>
      Object.keys(reader.source)
        .filter((name) => !reader.known.has(name))
        .map((name) => reader.at(name)),
    )
  }

  private child(value: unknown, path: string): Reader {
    return new Reader(asObject(value, path), path, this.root ?? this)
  }
}

function asObject(value: unknown, path: string): Record<string, unknown> {
  if (typeof value === 'object' && value !== null && !Array.isArray(value))
    return value as Record<string, unknown>
  throw new InvalidInput('not-an-object', `Write an object here, not ${describe(value)}.`, path)
}

/** A list with at least so many items; a million is the most one evaluation takes. */
function asList(value: unknown, path: string, least: number): unknown[] {
  if (!Array.isArray(value)) {
    throw new InvalidInput('not-a-list', `Write a list here, not ${describe(value)}.`, path)
  }
  if (value.length < least) {
    throw new InvalidInput('too-few', `Give at least ${least} here; there are ${value.length}.`, path)
  }
  if (value.length > 1_000_000) {
    throw new InvalidInput('too-many', `Give at most 1,000,000 here; there are ${value.length}.`, path)
  }
  // A hole in an array would be skipped by `map` and reach the arithmetic as undefined.
  return Array.from(value as unknown[])
}

/** A finite number within bounds; throws `InvalidInput` with the path otherwise. */
export function asNumber(value: unknown, path: string, bounds: Bounds = {}): number {
  if (typeof value !== 'number') {
    throw new InvalidInput('not-a-number', `Write a number here, not ${describe(value)}.`, path)
  }
  if (!Number.isFinite(value)) {
    throw new InvalidInput('not-finite', 'Write a number that is not too large to be computed with.', path)
  }
  const { above, least, below, most } = bounds
  if (above !== undefined && value <= above) throw outside('too-small', `above ${above}`, value, path)
  if (least !== undefined && value < least) throw outside('too-small', `at least ${least}`, value, path)
  if (below !== undefined && value >= below) throw outside('too-large', `below ${below}`, value, path)
  if (most !== undefined && value > most) throw outside('too-large', `at most ${most}`, value, path)
  return value
}

function asInteger(value: unknown, path: string, bounds: Bounds): number {
  const number = asNumber(value, path, bounds)
  if (Number.isSafeInteger(number)) return number
  throw new InvalidInput('not-an-integer', `Write a whole number here, not ${number}.`, path)
}

function asText(value: unknown, path: string): string {
  if (typeof value === 'string') return value
  throw new InvalidInput('not-text', `Write text here, not ${describe(value)}.`, path)
}

function outside(code: string, wanted: string, value: number, path: string): InvalidInput {
  return new InvalidInput(code, `The number must be ${wanted}; it is ${value}.`, path)
}

function describe(value: unknown): string {
  if (value === undefined || value === null) return 'nothing'
  if (Array.isArray(value)) return 'a list'
  if (typeof value === 'string') return `text (“${value.length > 20 ? `${value.slice(0, 20)}…` : value}”)`
  if (typeof value === 'object') return 'an object'
  return `${String(value)}`
}
