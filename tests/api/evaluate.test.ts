import { spawnSync } from 'node:child_process'
import { fileURLToPath } from 'node:url'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { evaluate, isError } from '@evenrule/metrology'
import { randomInputs } from '../browser/random-inputs'
import { newestEngine, newestRelease } from '../engine'
import { startHarness, type Harness, type Person } from './harness'

let harness: Harness
let member: Person, nobodys: Person

beforeAll(async () => {
  harness = await startHarness()
  member = await harness.person('Grit Falk')
  nobodys = await harness.person('Sten Uhl')
  await harness.organisation('Halm Turning', [[member, ['reader']]])
})
afterAll(() => harness.stop())

const post = (body: unknown, person: Person | null = member, side: 'supplier' | 'customer' = 'supplier') =>
  harness
    .as(side, person)
    .send('post', '/evaluate')
    .send(body as object)

/** What `npm run -s evaluate -- -` prints. */
function commandLine(input: unknown) {
  const root = fileURLToPath(new URL('../..', import.meta.url))
  const { status, stdout } = spawnSync(
    process.execPath,
    ['--import', 'tsx', 'packages/metrology/src/cli.ts', '-'],
    { cwd: root, encoding: 'utf8', input: JSON.stringify(input), maxBuffer: 1 << 28 },
  )
  return { status, stdout }
}

const bias = {
  kind: 'bias',
  readings: [24.004, 24.006, 24.001],
  reference: { value: 24 },
  tolerance: { lower: 23.975, upper: 24.025 },
  margin: 0.005,
}

describe('POST /api/v1/evaluate', () => {
  it('answers one input with its output, on either side, to whoever is signed in', async () => {
    const answer = await post(bias)
    expect(answer.status).toBe(200)
    expect(answer.type).toBe('application/json')
    expect(answer.body).toMatchObject({ kind: 'bias', n: 3, equivalence: { margin: 0.005 } })
    expect((await post(bias, nobodys, 'customer')).text).toBe(answer.text)
  })

  it('needs a session', async () => {
    const answer = await post(bias, null)
    expect(answer.status).toBe(401)
    expect(answer.body).toMatchObject({ code: 'not-signed-in' })
  })

  it('refuses a request that another site could have sent', async () => {
    const foreign = await post(bias).set('origin', 'http://elsewhere.test')
    expect(foreign.status).toBe(403)
  })

  it.each([
    [{ readings: [1, 2] }],
    [{ kind: 'horoscope' }],
    [{ ...bias, readings: [] }],
    [{ ...bias, readings: [1, '2,5', 3] }],
    [{ ...bias, readings: [1, null, 3] }],
    [{ ...bias, confidence: 1.5 }],
    [{ ...bias, tolerance: { lower: 2, upper: 1 } }],
    [{ ...bias, margin: -1 }],
    [{ kind: 'clause', unit: 'mm', clause: { type: 'bias-zero-test', parameters: { alpha: 2 } } }],
    [
      {
        kind: 'sampleSize',
        rule: { type: 'point', margin: 1 },
        truth: { bias: 2, standardDeviation: 1 },
        power: 0.9,
      },
    ],
  ])('%j: 422 with the code, the path and the words of the command line', async (input) => {
    const answer = await post(input)
    expect(answer.status).toBe(422)
    expect(answer.type).toBe('application/problem+json')
    const { status, stdout } = commandLine(input)
    expect(status).toBe(1)
    const { code, message, path } = (JSON.parse(stdout) as { error: Record<string, string> }).error
    expect(answer.body).toMatchObject({ status: 422, code, detail: message, errors: [{ path, message }] })
  })

  it('takes one object: a list, a number or nothing is no input', async () => {
    for (const body of [[bias], [], null]) {
      const answer = await post(body === null ? undefined : body)
      expect(answer.status, JSON.stringify(body)).toBe(422)
    }
    const broken = await harness
      .as('supplier', member)
      .send('post', '/evaluate')
      .set('content-type', 'application/json')
      .send('{"kind":')
    expect(broken.status).toBe(400)
    expect(broken.body).toMatchObject({ code: 'invalid-json' })
  })

  it('answers with the bytes of the function, of the released engine and of the command line', async () => {
    const inputs = randomInputs(150, 7)
    const engine = await newestEngine()
    const lines: string[] = []
    for (const input of inputs) {
      const output = evaluate(input)
      const text = JSON.stringify(output)
      const { status, text: body } = await post(input)
      expect(JSON.stringify(engine.evaluate(input))).toBe(text)
      if (isError(output)) expect(status).toBe(422)
      else expect(body).toBe(text)
      lines.push(text)
    }
    expect(lines.filter((line) => !line.startsWith('{"error"')).length).toBeGreaterThan(120)
    expect(commandLine(inputs).stdout).toBe(`[${lines.join(',')}]\n`)
  })

  it('is computed by the newest release, which is served under its hash for the browser', async () => {
    const { sha256 } = newestRelease()
    expect(harness.services.engines.current.sha256).toBe(sha256)
    const served = await harness.as('supplier', member).send('get', `/engines/${sha256}.mjs`)
    expect(served.status).toBe(200)
    expect(served.type).toBe('text/javascript')
    const other = await harness.as('supplier', member).send('get', `/engines/${'0'.repeat(64)}.mjs`)
    expect(other.status).toBe(404)
  })
})
