import type { Page } from 'playwright-core'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { axeFaults, picture, TwoSides } from './support'

const part = 'OC 12-118'
const gauge = 'MM-07'

describe('a submission where no criteria are agreed', () => {
  const two = new TwoSides('no-criteria')
  const { errors } = two
  let supplierPage: Page
  let customerPage: Page
  let submission = ''

  beforeAll(async () => {
    await two.open()
    ;({ supplier: supplierPage, customer: customerPage } = two)
  })
  afterAll(() => two.close())
  afterEach((step) => two.keep(step))

  const as = async (side: 'supplier' | 'customer', name: string) => {
    const page = await two.as(side, name)
    if (submission) await two.at(side, submission)
    return page
  }
  /** Presses a move's button on the page and then in its dialog. */
  const act = async (page: Page, name: string) => {
    await page.getByRole('button', { name, exact: true }).click()
    await page.getByRole('dialog').getByRole('button', { name, exact: true }).click()
  }

  it('the customer has house terms that nobody signed', async () => {
    const page = await as('customer', 'Elin Tor')
    const base = `/api/v1/organisations/${two.organisation('customer')}/house-terms`
    const answers = await page.evaluate(async (address) => {
      const send = async (path: string, body: unknown) => {
        const answer = await fetch(path, {
          method: 'POST',
          headers: { 'content-type': 'application/json', 'x-evenrule-client': '1' },
          body: JSON.stringify(body),
        })
        return { status: answer.status, body: (await answer.json()) as { id: string; rowVersion: number } }
      }
      const clauses = [
        {
          type: 'bias-equivalence',
          parameters: { margin: { base: 'tolerance', share: 0.1 }, confidence: 0.95 },
        },
        { type: 'resolution-share', parameters: { share: 0.05, base: 'tolerance' } },
      ]
      const begun = await send(address, { clauses, terms: {}, words: 'What we usually ask.' })
      const { id, rowVersion } = begun.body
      const published = await send(`${address}/${id}/publish`, { expectedVersion: rowVersion })
      return [begun.status, published.status]
    }, base)
    expect(answers).toEqual([200, 200])
  })

  it('the supplier prepares it, and the draft says that no criteria are agreed', async () => {
    const page = await as('supplier', 'Ines Calder')
    await two.at('supplier', `submissions?waitsOn=all&search=${encodeURIComponent(part)}`)
    await page
      .getByRole('link', { name: new RegExp(gauge) })
      .first()
      .click()
    await page.getByRole('link', { name: 'Open the measuring task' }).click()
    await page.getByRole('button', { name: 'Prepare a submission' }).click()
    await page.getByText('No criteria agreed.', { exact: true }).waitFor()
    await page.getByRole('heading', { name: /^What would the house terms of Osmere Castings say/ }).waitFor()
    submission = /submissions\/[0-9a-f-]{36}/.exec(page.url())?.[0] ?? ''
    await act(page, 'Send for signature')
    await page.getByText(/waits for a signature/).waitFor()
    await picture(page, 'no-criteria-1-draft')
  })

  it('shows the house terms for information, with no mark of a verdict', async () => {
    const section = supplierPage.locator('section', {
      has: supplierPage.getByRole('heading', { name: /^What would the house terms/ }),
    })
    await section.getByText(/for information only/).waitFor()
    expect(await section.getByText(/^would /).count()).toBe(2)
    expect(await section.locator('.verdict-mark, svg').count()).toBe(0)
    await supplierPage.getByRole('heading', { name: 'The readings', exact: true }).waitFor()
    expect(await supplierPage.getByText(/^(meets|falls short|not shown)$/).count()).toBe(0)
  })

  it('an approver of the supplier signs it', async () => {
    const page = await as('supplier', 'Tomas Brandl')
    await act(page, 'Sign and submit')
    await page.getByText(/waits for Osmere Castings’ decision/).waitFor()
  })

  it('an approver of the customer accepts it for this once; it does not count yet', async () => {
    const page = await as('customer', 'Elin Tor')
    await page.getByText('No criteria agreed.', { exact: true }).waitFor()
    await act(page, 'Accept')
    await page
      .getByText(/waits for an approver of Tarnfield Turned Parts/)
      .first()
      .waitFor()
    expect(await page.getByText(/^Accepted by/).count()).toBe(0)
    await picture(page, 'no-criteria-2-proposed')
  })

  it('an approver of the supplier agrees, and only then it is accepted', async () => {
    const page = await as('supplier', 'Tomas Brandl')
    await page
      .getByText(/waits for an approver of yours/)
      .first()
      .waitFor()
    await act(page, 'Agree and sign')
    await page.getByText(/^Accepted by Osmere Castings on/).waitFor()
    await page
      .getByText(/agreed to the acceptance without agreed criteria/)
      .first()
      .waitFor()
    await picture(page, 'no-criteria-3-accepted')
  })

  it('lists and prints it as such', async () => {
    const page = customerPage
    await two.at('customer', `submissions?waitsOn=all&verdict=none&search=${encodeURIComponent(part)}`)
    const row = page.getByRole('row', { name: new RegExp(gauge) }).first()
    await row.getByText('no criteria agreed').waitFor()
    await two.at('customer', `${submission}/print`)
    await page.getByText('No criteria agreed.', { exact: true }).waitFor()
    await page.getByText(/for information only/).waitFor()
    await picture(page, 'no-criteria-4-print')
  })

  it('leaves no error in either console, and no fault that axe finds', async () => {
    expect(errors).toEqual([])
    for (const page of [supplierPage, customerPage]) expect(await axeFaults(page)).toEqual([])
  })
})
