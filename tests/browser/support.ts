import { mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import { chromium, type Browser, type BrowserContext, type Locator, type Page } from 'playwright-core'

const need = (name: string): string => {
  const value = process.env[name]
  if (!value) throw new Error(`${name} is missing: run the tests through npm test.`)
  return value
}

/** Addresses of the running instance that npm test started. */
export const addresses = () => ({
  supplier: need('E2E_SUPPLIER_URL'),
  customer: need('E2E_CUSTOMER_URL'),
  mail: need('E2E_MAIL_URL'),
})

/**
 * Lets the running instance’s clock go so many days ahead of the machine’s; 0 puts it back. The browser’s own clock
 * stays, so let pages say what the server says; and a fresh sign-in is judged by it, so nobody signs while it is moved.
 * Only for tests in tests/calendar, which run one after the other.
 */
export const moveClock = (days: number): void => writeFileSync(need('E2E_CLOCK_FILE'), `${days}`)

/** Debian's Chromium, headless, with nothing that reaches for the network by itself. */
export const launch = (): Promise<Browser> =>
  chromium.launch({
    executablePath: process.env.CHROMIUM_PATH ?? '/usr/bin/chromium',
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  })

/** Signs a person of the demonstration in through the provider's page, as they would. */
export async function signIn(page: Page, app: string, name: string): Promise<void> {
  await page.goto(app)
  await page
    .getByRole('link', { name: /^sign in/i })
    .or(page.getByRole('button', { name: /^sign in/i }))
    .first()
    .click()
  await chooseAtProvider(page, name)
  await page.waitForURL((url) => url.href.startsWith(app) && url.pathname.includes('/organisations/'))
}

/** Signs out by the account menu, where somebody is signed in. */
export async function signOut(page: Page): Promise<void> {
  if (page.url() === 'about:blank') return
  await page.getByRole('button', { name: /^Account/ }).click()
  await page.getByRole('button', { name: 'Sign out', exact: true }).click()
  await page
    .getByText(/signed out/i)
    .first()
    .waitFor()
}

/** Picks a person on the provider's page; also used when a signature asks for a fresh sign-in. */
export async function chooseAtProvider(page: Page, name: string): Promise<void> {
  await page
    .getByRole('button', { name: new RegExp(name) })
    .first()
    .click()
}

const axeSource = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8')

interface AxeResult {
  violations: { id: string; help: string; nodes: { target: unknown[]; failureSummary?: string }[] }[]
}

/** Accessibility faults of the page as it stands, one line each; empty when there is none. */
export async function axeFaults(page: Page): Promise<string[]> {
  // Through evaluate, which the content security policy does not govern.
  await page.evaluate(axeSource)
  const result = await page.evaluate(
    async () =>
      (await (globalThis as unknown as { axe: { run: (options: unknown) => Promise<unknown> } }).axe.run({
        runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'best-practice'],
      })) as never,
  )
  return (result as AxeResult).violations.flatMap((violation) =>
    violation.nodes.map((node) => `${violation.id}: ${violation.help} at ${node.target.join(' ')}`),
  )
}

/** Saves a picture for people to look at when the variable names a folder; nothing is compared with it. */
export async function picture(page: Page, name: string): Promise<void> {
  const folder = process.env.E2E_PICTURES
  if (!folder) return
  mkdirSync(folder, { recursive: true })
  await page.screenshot({ path: `${folder}/${name}.png`, fullPage: true })
}

/** Errors a page wrote to its console or threw; a test expects none. */
export function watchErrors(context: BrowserContext, errors: string[] = []): string[] {
  context.on('page', (page) => {
    page.on('pageerror', (error) => errors.push(`${page.url()}: ${error.message}`))
    page.on('console', (message) => {
      if (message.type() === 'error' && !/status of (401|403|409|422)/.test(message.text()))
        errors.push(`${page.url()}: ${message.text()}`)
    })
  })
  return errors
}

/** A day so many days from now as a date field takes it, in the time zone of the demonstration's relationships. */
export const dayIn = (days: number): string =>
  new Date(Date.now() + days * 86_400_000).toLocaleDateString('sv-SE', { timeZone: 'Europe/Berlin' })

/** Picks an entry of a drop-down list by keyboard, typing first where it searches. */
export async function choose(
  within: Page | Locator,
  label: string | RegExp,
  entry: string | RegExp,
  typed?: string,
): Promise<void> {
  const field = within.getByRole('combobox', { name: label })
  await field.focus()
  if (typed) await field.pressSequentially(typed)
  else await field.press('ArrowDown')
  const page = 'mouse' in within ? within : within.page()
  await page.getByRole('option', { name: entry }).first().click()
}

/**
 * Asks the API as whoever sits at a page, for what a story needs and does not tell; throws what was refused. `data`
 * goes as an upload without a file where the route takes one.
 */
export async function ask<Answer>(
  page: Page,
  path: string,
  sent: { body?: object; data?: object } = {},
): Promise<Answer> {
  return page.evaluate(
    async ([below, { body, data }]) => {
      const organisation = /\/organisations\/[^/]+/.exec(location.pathname)?.[0] ?? ''
      const form = new FormData()
      if (data) form.set('data', JSON.stringify(data))
      const answer = await fetch(`/api/v1${organisation}/${below}`, {
        method: body || data ? 'POST' : 'GET',
        headers: { 'x-evenrule-client': '1', ...(body ? { 'content-type': 'application/json' } : {}) },
        ...(data ? { body: form } : body ? { body: JSON.stringify(body) } : {}),
      })
      if (!answer.ok) throw new Error(`${below}: ${await answer.text()}`)
      return (await answer.json()) as Answer
    },
    [path, sent] as const,
  )
}

/** A window of its own, as one person at a desk has it. */
export async function openWindow(browser: Browser, errors: string[] = []): Promise<Page> {
  const context = await browser.newContext({
    viewport: { width: 1280, height: 860 },
    locale: 'en-GB',
    timezoneId: 'Europe/Berlin',
  })
  watchErrors(context, errors)
  const page = await context.newPage()
  page.setDefaultTimeout(20_000)
  return page
}

/** A window for each side, side by side, with the errors that either writes to its console. */
export class TwoSides {
  /** Set once `open` has run. */
  supplier!: Page
  customer!: Page
  readonly errors: string[] = []
  readonly app = addresses()
  browser!: Browser
  /** @param story name of the pictures of what failed */
  constructor(private readonly story: string) {}

  async open(): Promise<void> {
    this.browser = await launch()
    this.supplier = await openWindow(this.browser, this.errors)
    this.customer = await openWindow(this.browser, this.errors)
  }

  close = (): Promise<void> => this.browser.close()

  /** Changes who sits at the window of a side. */
  async as(side: 'supplier' | 'customer', name: string): Promise<Page> {
    const page = this[side]
    await signOut(page)
    await signIn(page, this.app[side], name)
    return page
  }

  /** Opens a page below the organisation of whoever sits there. */
  async at(side: 'supplier' | 'customer', path: string): Promise<void> {
    await this[side].goto(`${this.app[side]}/organisations/${this.organisation(side)}/${path}`)
  }

  /** Id of the organisation whose page stands in the window of a side. */
  organisation(side: 'supplier' | 'customer'): string {
    return /organisations\/([^/?#]+)/.exec(this[side].url())?.[1] ?? ''
  }

  /** Both windows as they stand when a step has failed. */
  async keep({ task }: { task: { result?: { state: string } } }): Promise<void> {
    if (task.result?.state !== 'fail') return
    for (const side of ['supplier', 'customer'] as const)
      await picture(this[side], `${this.story}-failed-${side}`)
  }
}
