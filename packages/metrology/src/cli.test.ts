import { spawnSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { afterAll, describe, expect, it } from 'vitest'
import { evaluate } from './evaluate'

const root = fileURLToPath(new URL('../../..', import.meta.url))
const folder = mkdtempSync(join(tmpdir(), 'evenrule-cli-'))
afterAll(() => rmSync(folder, { recursive: true }))

/** Runs what `npm run -s evaluate` runs. */
function run(parameters: string[], input = '') {
  const cli = fileURLToPath(new URL('cli.ts', import.meta.url))
  const { status, stdout } = spawnSync(process.execPath, ['--import', 'tsx', cli, ...parameters], {
    cwd: root,
    encoding: 'utf8',
    input,
  })
  return { status, stdout }
}

function file(name: string, text: string): string {
  const path = join(folder, name)
  writeFileSync(path, text)
  return path
}

const good = { kind: 'summary', readings: [1, 2, 4] }
const bad = { kind: 'summary', readings: [1, null, 4] }

describe('the command line', () => {
  it('prints the output of one input and nothing else, status 0', () => {
    const { status, stdout } = run([file('one.json', JSON.stringify(good))])
    expect(status).toBe(0)
    expect(stdout).toBe(`${JSON.stringify(evaluate(good))}\n`)
  })

  it('answers an array in order; a bad input stands in its place, status 1', () => {
    const { status, stdout } = run([file('many.json', JSON.stringify([good, bad, good]))])
    expect(status).toBe(1)
    expect(JSON.parse(stdout)).toEqual([
      evaluate(good),
      { error: { code: 'not-a-number', message: expect.any(String), path: 'readings[1]' } },
      evaluate(good),
    ])
  })

  it('reads standard input, also with a byte order mark; an empty array is no fault', () => {
    expect(run(['-'], `\uFEFF${JSON.stringify(good)}`).status).toBe(0)
    expect(run(['-'], '[]')).toEqual({ status: 0, stdout: '[]\n' })
  })

  it.each([
    ['no file named', [], '', 'no-input'],
    ['a file that is not there', ['/nowhere/input.json'], '', 'unreadable'],
    ['text that is not JSON', ['-'], '{"kind":', 'invalid-json'],
    ['an input that is not an object', ['-'], '5', 'not-an-object'],
  ])('%s: an error object and status 1', (_what, parameters, input, code) => {
    const { status, stdout } = run(parameters, input)
    expect(status).toBe(1)
    expect(JSON.parse(stdout)).toEqual({ error: { code, message: expect.any(String), path: '' } })
  })
})
