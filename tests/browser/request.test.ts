import type { Page } from 'playwright-core'
import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from 'vitest'
import { axeFaults, dayIn, picture, signIn, signOut, TwoSides } from './support'

const gauge = 'DG-9'
const words = `Please show it again ${Date.now().toString(36)}.`

describe('a request for proof, from the question to the answer', () => {
  const two = new TwoSides('request')
  const { app, errors } = two
  let supplierPage: Page
  let customerPage: Page
  /** Path of the request's page in either app, below its organisation. */
  let path = ''

  beforeAll(async () => {
    await two.open()
    ;({ supplier: supplierPage, customer: customerPage } = two)
  })
  afterAll(() => two.close())
  afterEach((step) => two.keep(step))

  it('the customer asks a supplier for proof of a measuring task by a day', async () => {
    const page = customerPage
    await signIn(page, app.customer, 'Mara Lindqvist')
    await page.getByRole('link', { name: 'Requests' }).first().click()
    await page.getByRole('link', { name: 'Ask for proof' }).first().click()
    const field = page.getByRole('combobox', { name: 'Supplier' })
    await field.focus()
    await field.pressSequentially('Osmere')
    await page.getByRole('option', { name: /Osmere Castings/ }).click()
    await page.getByRole('searchbox', { name: /Search part/ }).fill(gauge)
    await page
      .getByRole('checkbox', { name: new RegExp(gauge) })
      .first()
      .check()
    await page.getByText('1 measuring task chosen:').waitFor()
    // What is missing is said at its field, and nothing that was chosen is lost.
    await page.getByRole('button', { name: 'Ask for proof' }).click()
    await page.getByText('Enter the day by which you want it.').waitFor()
    await page.getByLabel(/Due by/).fill(dayIn(9))
    await page.getByRole('combobox', { name: 'Occasion' }).press('ArrowDown')
    await page.getByRole('option', { name: 'yearly' }).click()
    await page.getByLabel(/should know/).fill(words)
    await picture(page, 'request-1-ask')
    await page.getByRole('button', { name: 'Ask for proof' }).click()
    await page.getByRole('heading', { level: 1, name: /Has Osmere Castings proved/ }).waitFor()
    await page.getByText('Not yet: the measuring task has no answer.').waitFor()
    path = /requests\/[0-9a-f-]{36}/.exec(page.url())?.[0] ?? ''
    expect(path).not.toBe('')
    await picture(page, 'request-2-asked')
    expect(await axeFaults(page)).toEqual([])
  })

  it('the supplier finds it on the front page and in the mail', async () => {
    const page = supplierPage
    await signIn(page, app.supplier, 'Kofi Brandt')
    await page
      .getByRole('link', { name: /Prove what is asked for/ })
      .first()
      .waitFor()
    await picture(page, 'request-3-front')
    const link = await vi.waitUntil(
      async () => {
        const list = await fetch(`${app.mail}/messages.json?to=kofi.brandt@osmere.example`)
        const { items } = (await list.json()) as { items: { id: string; subject: string }[] }
        for (const { id } of items.filter(({ subject }) => subject.startsWith('Asks for proof'))) {
          const mail = await (await fetch(`${app.mail}/messages/${id}.json`)).text()
          if (mail.includes(words)) return /https?:[^\s"\\]+requests\/[0-9a-f-]{36}/.exec(mail)?.[0]
        }
        return undefined
      },
      { timeout: 60_000, interval: 1_000 },
    )
    expect(link?.startsWith(app.supplier)).toBe(true)
    expect(link?.endsWith(path)).toBe(true)
    await page.goto(link ?? '')
    await page.getByRole('heading', { level: 1, name: /Have we proved to Brackwell/ }).waitFor()
    await page.getByText(words).waitFor()
  })

  it('the supplier prepares the submission from it, and an approver signs', async () => {
    const page = supplierPage
    await page.getByRole('button', { name: 'Prepare the submission' }).click()
    await page.getByRole('button', { name: 'Send for signature' }).first().click()
    await page.getByRole('dialog').getByRole('button', { name: 'Send for signature' }).click()
    await page.getByText(/It waits for a signature/).waitFor()
    const submission = page.url()
    await signOut(page)
    await signIn(page, app.supplier, 'Elin Tor')
    await page.goto(submission)
    await page.getByRole('button', { name: 'Sign and submit' }).first().click()
    await page.getByRole('dialog').getByRole('button', { name: 'Sign and submit' }).click()
    await page.getByText(/waits for Brackwell Drivelines’ decision/).waitFor()
  })

  it('the customer sees it answered', async () => {
    const page = customerPage
    await page.reload()
    await page.getByText('Everything is answered; 1 waits for the decision.').waitFor()
    await page
      .getByRole('link', { name: /^Submission \d+/ })
      .first()
      .waitFor()
    await picture(page, 'request-4-answered')
    await page.getByRole('link', { name: 'Messages' }).first().click()
    await page
      .getByText(/Answered: request \d+/)
      .first()
      .waitFor()
  })

  it('leaves no error in either console, and no fault that axe finds', async () => {
    expect(errors).toEqual([])
    for (const page of [supplierPage, customerPage]) expect(await axeFaults(page)).toEqual([])
  })
})
