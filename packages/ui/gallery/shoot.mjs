/**
 * Builds the gallery, serves it under the apps' strict content policy, photographs every page in both looks and
 * widths into the folder named (default /tmp/gallery), and runs axe-core on each.
 *   node packages/ui/gallery/shoot.mjs [out] [page,…]
 */
import { mkdir, readFile } from 'node:fs/promises'
import { createServer } from 'node:http'
import { createRequire } from 'node:module'
import { extname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { chromium } from 'playwright-core'
import { build } from 'vite'

const require = createRequire(import.meta.url)
const out = process.argv[2] ?? '/tmp/gallery'
const wanted = process.argv[3]?.split(',')
const dist = fileURLToPath(new URL('../../../.data/gallery', import.meta.url))
const types = { '.html': 'text/html', '.js': 'text/javascript', '.css': 'text/css', '.woff2': 'font/woff2' }
const policy =
  "default-src 'none'; script-src 'self'; style-src 'self'; font-src 'self'; img-src 'self' data:; connect-src 'self'"

const pages = [
  ['supplier', 'study'],
  ['customer', 'desk'],
  ['customer', 'room'],
  ['supplier', 'plots'],
  ['supplier', 'forms'],
  ['supplier', 'tables'],
  ['supplier', 'states'],
]

await build({ configFile: fileURLToPath(new URL('vite.config.ts', import.meta.url)), logLevel: 'warn' })
const server = createServer(async (request, response) => {
  const path = new URL(request.url, 'http://localhost').pathname
  try {
    const body = await readFile(join(dist, path === '/' ? 'index.html' : path))
    const type = types[extname(path)] ?? 'text/html'
    response.writeHead(200, { 'content-type': type, 'content-security-policy': policy }).end(body)
  } catch {
    response.writeHead(404).end()
  }
})
await new Promise((done) => server.listen(0, '127.0.0.1', done))
const origin = `http://127.0.0.1:${server.address().port}`
await mkdir(out, { recursive: true })

const flags = '--no-sandbox --disable-gpu --disable-quic --no-first-run --disable-background-networking'
const browser = await chromium.launch({
  executablePath: '/usr/bin/chromium',
  args: [...flags.split(' '), '--disable-component-update', '--disable-sync'],
})
const axe = await readFile(require.resolve('axe-core/axe.min.js'), 'utf8')
let failures = 0
for (const [side, page] of pages) {
  if (wanted && !wanted.includes(page)) continue
  for (const colorScheme of ['light', 'dark']) {
    for (const width of [1280, 390]) {
      const context = await browser.newContext({
        viewport: { width, height: 860 },
        colorScheme,
        bypassCSP: false,
      })
      const tab = await context.newPage()
      const complain = (text) => {
        failures += 1
        console.log(`${page} ${colorScheme} ${width}: ${text}`)
      }
      tab.on('pageerror', (error) => complain(error.stack ?? error.message))
      tab.on(
        'console',
        (message) => ['error', 'warning'].includes(message.type()) && complain(message.text()),
      )
      await tab.goto(`${origin}/?side=${side}#/${page}`)
      await tab.waitForSelector('h1')
      await tab.evaluate(() => document.fonts.ready)
      await tab.waitForTimeout(250)
      const overflow = await tab.evaluate(() => document.documentElement.scrollWidth - innerWidth)
      if (overflow > 0) complain(`the page is ${overflow} px too wide`)
      await tab.screenshot({ path: join(out, `${page}-${colorScheme}-${width}.png`), fullPage: true })
      await tab.evaluate(axe)
      const { violations } = await tab.evaluate(() => globalThis.axe.run(document))
      for (const { id, nodes } of violations)
        complain(
          `axe ${id}: ${nodes.map((node) => `${node.html.slice(0, 160)} ${node.any[0]?.message ?? ''}`).join('\n   ')}`,
        )
      if (colorScheme === 'dark' && width === 1280)
        await tab.pdf({ path: join(out, `${page}.pdf`), format: 'A4', preferCSSPageSize: true })
      await context.close()
    }
  }
}
await browser.close()
server.close()
console.log(failures ? `${failures} complaints` : 'no complaints')
process.exitCode = failures ? 1 : 0
