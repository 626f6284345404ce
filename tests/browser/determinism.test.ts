import { createHash } from 'node:crypto'
import { readFileSync } from 'node:fs'
import { createServer, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { clauseTypes } from '@evenrule/metrology'
import { newestEngine, newestRelease, type Engine } from '../engine'
import { randomInputs } from './random-inputs'
import { launch } from './support'

/** What the page script defines. */
interface PageScript {
  answers(address: string, block: string): Promise<string[]>
  hashOfAnswers(address: string, block: string): Promise<string>
}

const count = 10_000
const blockSize = 250
const engineText = readFileSync(newestRelease().path, 'utf8')
/** One node of integration changed in its last digit: a difference of the size that engines of browsers could have. */
const otherText = engineText.replace('0.8656312023878318', '0.8656312023878319')

const served: Record<string, [type: string, body: string]> = {
  '/': [
    'text/html',
    '<!doctype html><title>Determinism</title><script type="module" src="/page.js"></script>',
  ],
  '/page.js': ['text/javascript', readFileSync(new URL('determinism.page.js', import.meta.url), 'utf8')],
  '/engine.mjs': ['text/javascript', engineText],
  '/other.mjs': ['text/javascript', otherText],
}

let server: Server
let browser: Browser
let page: Page
let engine: Engine

beforeAll(async () => {
  engine = await newestEngine()
  server = createServer((request, response) => {
    const [type, body] = served[request.url ?? ''] ?? []
    response
      .writeHead(type ? 200 : 404, { 'content-type': `${type ?? 'text/plain'}; charset=utf-8` })
      .end(body)
  })
  await new Promise<void>((listening) => server.listen(0, '127.0.0.1', listening))
  browser = await launch()
  page = await browser.newPage()
  await page.goto(`http://127.0.0.1:${(server.address() as AddressInfo).port}/`)
  await page.waitForFunction(() => 'hashOfAnswers' in globalThis)
})
afterAll(async () => {
  await browser?.close()
  server?.close()
})

const inNode = (block: readonly unknown[]) =>
  block.map((input) => engine.canonicalText(engine.evaluate(input)))
const hash = (texts: readonly string[]) => createHash('sha256').update(texts.join('\n')).digest('hex')

/** The first input of a block that the page answers otherwise, with both answers; null where the bytes are the same. */
async function firstDifference(address: string, block: readonly unknown[]) {
  const here = inNode(block)
  const text = JSON.stringify(block)
  const there = await page.evaluate(
    ([from, inputs]) => (globalThis as unknown as PageScript).hashOfAnswers(from, inputs),
    [address, text] as const,
  )
  if (there === hash(here)) return null
  const texts = await page.evaluate(
    ([from, inputs]) => (globalThis as unknown as PageScript).answers(from, inputs),
    [address, text] as const,
  )
  const at = here.findIndex((each, index) => each !== texts[index])
  return { at, input: block[at], node: here[at], browser: texts[at] }
}

const inputs = randomInputs(count, 20261201)
const blocks = Array.from({ length: count / blockSize }, (_, i) =>
  inputs.slice(i * blockSize, (i + 1) * blockSize),
)

describe('the released engine gives the same bytes in Node and in Chromium', () => {
  it('is tried with every kind, rule, clause type and verdict, and mostly with inputs it can answer', () => {
    const has = (part: string) => inputs.filter((input) => JSON.stringify(input).includes(part)).length
    for (const kind of new Set(inputs.map((input) => input.kind)))
      expect(has(`"kind":"${kind}"`)).toBeGreaterThan(150)
    expect(new Set(inputs.map((input) => input.kind)).size).toBe(8)
    for (const type of clauseTypes) expect(has(`"type":"${type}"`), type).toBeGreaterThan(200)
    for (const rule of [
      'zero-test',
      'equivalence',
      'interval-inside',
      'point',
      'index',
      'with-uncertainty',
    ]) {
      expect(has(`"rule":{"type":"${rule}"`), rule).toBeGreaterThan(200)
    }
    const answers = inNode(inputs.slice(0, 2000))
    for (const verdict of ['meets', 'falls-short', 'not-shown']) {
      expect(
        answers.filter((text) => text.includes(`"verdict":"${verdict}"`)).length,
        verdict,
      ).toBeGreaterThan(50)
    }
    expect(answers.filter((text) => text.startsWith('{"error"')).length).toBeLessThan(100)
    expect(answers.filter((text) => text.includes('"below-resolution"')).length).toBeGreaterThan(10)
  })

  it.each(blocks.map((block, index) => ({ block, first: index * blockSize })))(
    'inputs from $first',
    async ({ block, first }) => {
      const difference = await firstDifference('/engine.mjs', block)
      expect(difference && { ...difference, at: first + difference.at }).toBeNull()
    },
  )

  it('and the comparison finds a last digit that differs, and names the input', async () => {
    expect(otherText).not.toBe(engineText)
    const block = blocks[0] ?? []
    const difference = await firstDifference('/other.mjs', block)
    expect(difference?.node).not.toBe(difference?.browser)
    expect(JSON.stringify(difference?.input)).toBe(JSON.stringify(block[difference?.at ?? -1]))
    const before = block.slice(0, difference?.at)
    expect(await firstDifference('/other.mjs', before)).toBeNull()
  })
})
