import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { addresses, axeFaults, launch, openWindow, picture, signIn } from './support'

/** Codes of this run alone, so that it can be run again on the same data. */
const run = Date.now().toString(36)
const header =
  'Gauge code,Gauge name,Resolution,Unit,Certificate number,Calibrated on,Due on,Found within limits'
const file = (name: string, ...lines: string[]) => ({
  name,
  mimeType: 'text/csv',
  buffer: Buffer.from([header, ...lines].join('\n')),
})
const good = `IM-${run},Depth gauge,0.01,mm,C-1,2026-03-02,2027-03-02,yes`
const bad = `IN-${run},Caliper,fine,mm,C-2,2026-03-02,2027-03-02,yes`

describe('a file of gauges with a bad row', () => {
  let browser: Browser
  let page: Page
  const errors: string[] = []

  beforeAll(async () => {
    browser = await launch()
    page = await openWindow(browser, errors)
  })
  afterAll(() => browser.close())

  it('is looked at, imported without its bad row, and the rest comes in once it is mended', async () => {
    await signIn(page, addresses().supplier, 'Kofi Brandt')
    await page.getByRole('link', { name: 'Gauges', exact: true }).click()
    await page.getByRole('link', { name: 'Import from a file' }).click()
    await page.getByRole('heading', { level: 1, name: 'What would a file of gauges bring in?' }).waitFor()
    const input = page.locator('input[type=file]')
    await input.setInputFiles(file('gauges.csv', good, bad))
    await page.getByText('1 row cannot be taken as it is.').waitFor()
    await page.getByText('“fine” is no number.').waitFor()
    await picture(page, 'imports-1-preview')
    expect(await axeFaults(page)).toEqual([])

    await page.getByRole('button', { name: 'Import 1 row, leave out 1' }).click()
    await page.getByRole('heading', { level: 1, name: 'What did gauges.csv bring in?' }).waitFor()
    await page.getByText('1 row was left out.').waitFor()
    expect(await axeFaults(page)).toEqual([])
    const [download] = await Promise.all([
      page.waitForEvent('download'),
      page.getByRole('link', { name: 'Download the rows left out' }).click(),
    ])
    expect(download.suggestedFilename()).toBe('gauges left out.csv')

    // Mended: the good row is there already, and only the other one is new.
    await page.goBack()
    await input.setInputFiles(file('mended.csv', good, bad.replace('fine', '0.05')))
    await page.getByText('2 new, 0 changed, 2 unchanged.').waitFor()
    await page.getByRole('button', { name: 'Import all 2 rows' }).press('Enter')
    await page.getByText('It is imported.').waitFor()
    await page.getByRole('link', { name: 'Imports' }).click()
    await page.getByRole('link', { name: 'mended.csv' }).first().waitFor()
    expect(await axeFaults(page)).toEqual([])
    expect(errors).toEqual([])
  }, 60_000)
})
