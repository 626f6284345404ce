import { readdirSync, readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { describe, expect, it } from 'vitest'
import { evaluate } from '@evenrule/metrology'
import { newestEngine } from '../engine'
import { misses, type ReferenceCase } from './compare'

const folder = fileURLToPath(new URL('cases/', import.meta.url))
const files = readdirSync(folder)
  .filter((name) => name.endsWith('.json'))
  .map((name) => ({ name, cases: JSON.parse(readFileSync(folder + name, 'utf8')) as ReferenceCase[] }))

const released = await newestEngine()

describe.each(files)('check values from outside: $name', ({ cases }) => {
  it('names source and provenance of every case', () => {
    expect(cases.filter(({ source, provenance }) => !source || !provenance).map(({ id }) => id)).toEqual([])
  })

  it.each(cases)('$id is reached by the source', (each) => {
    expect(misses(evaluate(each.input), each)).toEqual([])
  })

  it.each(cases)('$id is reached by the released engine', (each) => {
    expect(misses(released.evaluate(each.input), each)).toEqual([])
  })
})

describe('the comparison itself', () => {
  const one = (expected: unknown, tolerance = { rel: 1e-9 }): ReferenceCase => ({
    id: 'a',
    source: 'here',
    provenance: 'constructed',
    how: 'by hand',
    notes: null,
    tolerance,
    input: {},
    expected,
  })

  it('names every kind of difference with its path', () => {
    const got = { a: 1.1, b: [1, 2], c: { d: true }, warnings: [] }
    expect(misses(got, one({ a: 1 }))).toEqual(['a: got 1.1, want 1'])
    expect(misses(got, one({ b: [1] }))).toEqual(['b: 2 items, want 1 items'])
    expect(misses(got, one({ b: [1, 3] }))).toEqual(['b[1]: got 2, want 3'])
    expect(misses(got, one({ c: { d: null } }))).toEqual(['c.d: got true, want null'])
    expect(misses(got, one({ e: 0 }))).toEqual(['e: got nothing, want 0'])
    expect(misses(got, one({ $warns: true }))).toEqual([': no warning'])
    expect(misses(got, one({ $error: true }))).toEqual([': no error with code and message'])
    expect(misses({ a: null }, one({ a: 0 }))).toEqual(['a: got null, want 0'])
  })

  it('accepts what is within the tolerance, which a field may bring of its own', () => {
    expect(misses({ a: 1 + 1e-10, b: 2.01 }, one({ a: 1, $tolerance: { rel: 0.1 }, b: 2 }))).toEqual([])
    expect(misses({ a: 1 + 1e-8 }, one({ a: 1 }))).toHaveLength(1)
    expect(misses({ error: { code: 'missing', message: 'Give a.' } }, one({ $error: true }))).toEqual([])
  })
})
