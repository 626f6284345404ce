import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { addresses, axeFaults, launch, picture, signIn, watchErrors } from './support'

type Side = 'supplier' | 'customer'

/**
 * Pages below the organisation; after `>` the row of the list whose page is opened, after `+` the page below that one.
 */
const pages: Record<Side, { person: string; paths: string[] }> = {
  supplier: {
    person: 'Ines Calder',
    paths: [
      '',
      'relationships',
      'parts',
      'parts>0',
      'gauges',
      'gauges>0',
      'standards',
      'standards>0',
      'agreements',
      'agreements>1',
      'agreements>1+consequences',
      'house-terms',
      'house-terms>0',
      'criteria',
      'requests',
      'requests>0',
      'studies',
      'studies?state=computed>0',
      'studies?state=registered>0',
      'studies?state=collecting>0',
      'studies?state=abandoned>0',
      'studies/new',
      'submissions',
      'submissions>0',
      'record',
      'messages',
      'members',
    ],
  },
  customer: {
    person: 'Mara Lindqvist',
    paths: [
      '',
      'relationships',
      'parts',
      'parts>0',
      'agreements',
      'agreements>0',
      'agreements>3',
      'agreements>3+consequences',
      'house-terms',
      'house-terms>0',
      'criteria',
      'requests',
      'requests>0',
      'requests/new',
      'submissions',
      'submissions>0',
      'submissions?waitsOn=all&state=challenged>0',
      'submissions?waitsOn=all&state=accepted-with-conditions>0',
      'record',
      'messages',
      'members',
    ],
  },
}

/** Both widths and both themes; the contrast of every pair of colours is proved with the theme's tokens. */
const looks = [
  { width: 1280, height: 860, colorScheme: 'light' },
  { width: 390, height: 844, colorScheme: 'dark' },
] as const

let browser: Browser
beforeAll(async () => {
  browser = await launch()
})
afterAll(() => browser.close())

async function settle(page: Page): Promise<void> {
  await page.getByRole('heading', { level: 1 }).first().waitFor()
  await page.waitForLoadState('networkidle')
}

async function open(page: Page, base: string, path: string): Promise<void> {
  const [list = '', place] = path.split('>')
  await page.goto(`${base}/${list}`)
  await settle(page)
  if (place === undefined) return
  const [row, below] = place.split('+')
  const address = await page.locator('a.row-link').nth(Number(row)).getAttribute('href')
  await page.goto(new URL(`${address}${below ? `/${below}` : ''}`, base).href)
  await settle(page)
}

describe.each(['supplier', 'customer'] as const)('the pages of the %s app', (side) => {
  // Two windows at once: a page mostly waits for its data.
  it.concurrent.each(looks)(
    'are sound at $width px in $colorScheme',
    async ({ width, height, colorScheme }) => {
      const context = await browser.newContext({
        viewport: { width, height },
        colorScheme,
        locale: 'en-GB',
        timezoneId: 'Europe/Berlin',
        reducedMotion: 'reduce',
      })
      const errors = watchErrors(context)
      const page = await context.newPage()
      page.setDefaultTimeout(20_000)
      const { person, paths } = pages[side]
      const app = addresses()[side]
      await signIn(page, app, person)
      const base = /^.*\/organisations\/[^/?#]+/.exec(page.url())?.[0] ?? ''
      const faults: string[] = []
      for (const path of paths) {
        await open(page, base, path)
        const overflow = await page.evaluate(
          () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
        )
        if (overflow > 0) faults.push(`${path}: ${overflow} px wider than the window`)
        faults.push(...(await axeFaults(page)).map((fault) => `${path}: ${fault}`))
        await picture(page, `${side}-${path.replace(/\W+/g, '-') || 'front'}-${width}-${colorScheme}`)
      }
      await context.close()
      expect(faults).toEqual([])
      expect(errors).toEqual([])
    },
  )
})

describe('an empty organisation', () => {
  it('is told on its front page what to do first', async () => {
    const context = await browser.newContext({ viewport: { width: 390, height: 844 }, locale: 'en-GB' })
    const page = await context.newPage()
    page.setDefaultTimeout(20_000)
    await signIn(page, addresses().supplier, 'Ada Pell')
    await settle(page)
    await page.getByRole('heading', { name: 'Begin here' }).waitFor()
    await page.getByRole('link', { name: 'Open gauges' }).waitFor()
    await picture(page, 'supplier-empty')
    expect(await axeFaults(page)).toEqual([])
    await context.close()
  })
})
