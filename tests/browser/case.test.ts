import type { Page } from 'playwright-core'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { axeFaults, choose, picture, TwoSides } from './support'

const gauge = 'VC-22'
describe('a challenge answered by another criterion, one that quotes a what-if, and one left unresolved', () => {
  const two = new TwoSides('case')
  /** Path of the submission’s page below the organisation. */
  let submission = ''

  beforeAll(() => two.open())
  afterAll(() => two.close())
  afterEach((step) => two.keep(step))

  const as = async (side: 'supplier' | 'customer', name: string): Promise<Page> => {
    const page = await two.as(side, name)
    if (submission) await two.at(side, submission)
    return page
  }
  const thread = (page: Page, number: number) =>
    page.locator('article', { has: page.getByRole('heading', { name: new RegExp(`^Challenge ${number}:`) }) })

  it('the supplier proposes another criterion with the challenge as its case, and answers by it', async () => {
    const page = await as('supplier', 'Ines Calder')
    await two.at('supplier', `submissions?state=challenged&search=NV-55-310`)
    await page
      .getByRole('link', { name: new RegExp(gauge) })
      .first()
      .click()
    await page.waitForURL(/submissions\/[0-9a-f-]{36}/)
    submission = /submissions\/[0-9a-f-]{36}/.exec(page.url())?.[0] ?? ''
    await page.getByRole('button', { name: 'Change the criterion' }).click()
    await page.getByText(/The challenge you came from is attached/).waitFor()
    await page.getByLabel('Margin either way').fill('8')
    await page.getByRole('button', { name: /^Send/ }).click()
    await page.getByText(/ours, waits for an answer/).waitFor()
    expect(page.url()).not.toContain('caseOf')
    await picture(page, 'case-1-sent')
    await page.getByRole('link', { name: 'Answer the challenge with it' }).click()
    const dialog = page.getByRole('dialog')
    await dialog.getByText('By another criterion').waitFor()
    await dialog.getByLabel('Your answer').fill('Ten readings cannot show it; we propose another margin.')
    await dialog.getByRole('button', { name: 'Send the answer' }).click()
    await dialog.waitFor({ state: 'hidden' })
    await thread(page, 1).getByText('answered by proposing another criterion').waitFor()
  })

  it('the customer reads the proposal with its case', async () => {
    const page = await as('customer', 'Leo Sandmark')
    await thread(page, 1).getByRole('link', { name: 'Read the proposal' }).click()
    await page.getByText('A challenge asks for this change of criteria.').waitFor()
    await page.getByRole('link', { name: 'Open the challenge' }).click()
    // The page scrolls to the challenge once it has loaded.
    await thread(page, 1).waitFor()
    await expect.poll(() => page.evaluate(() => scrollY), { timeout: 10_000 }).toBeGreaterThan(0)
  })

  it('the customer quotes a what-if in another challenge, and withdraws it in the end', async () => {
    const { customer: page } = two
    await page.getByRole('button', { name: 'Try a what-if' }).click()
    await page.getByRole('checkbox', { name: /^5 / }).first().check()
    await page.getByRole('button', { name: /^Quote it in a challenge/ }).click()
    const dialog = page.getByRole('dialog')
    await dialog.getByText('Your what-if goes with it').waitFor()
    await choose(dialog, 'Reason', /lie far/)
    await dialog.getByLabel('What is wrong with it').fill('Without the fifth reading it comes out otherwise.')
    await picture(page, 'case-2-quote')
    await dialog.getByRole('button', { name: 'Send the challenge' }).click()
    await dialog.waitFor({ state: 'hidden' })
    const quoted = thread(page, 2)
    await quoted.getByText(/no verdict follows from it/).waitFor()
    await quoted.getByRole('button', { name: /^Withdraw the challenge/ }).click()
    await dialog.getByRole('button', { name: 'Withdraw the challenge' }).click()
    await quoted.getByText(/^withdrawn/).waitFor()
  })

  it('an approver of each side leaves the challenge unresolved', async () => {
    const customer = await as('customer', 'Birte Ahl')
    await customer.getByRole('button', { name: /^Leave it unresolved/ }).click()
    const question = customer.getByRole('dialog')
    await question.getByLabel('Why it cannot be resolved').fill('Nobody can show how it was taken.')
    await question.getByRole('button', { name: 'Propose to leave it unresolved' }).click()
    await question.waitFor({ state: 'hidden' })
    const supplier = await as('supplier', 'Tomas Brandl')
    await supplier
      .getByText(/an approver of yours/)
      .first()
      .waitFor()
    await supplier.getByRole('button', { name: /^Agree to leave it unresolved/ }).click()
    await supplier.getByRole('dialog').getByRole('button', { name: 'Agree to leave it unresolved' }).click()
    await thread(supplier, 1)
      .getByText(/left unresolved by both sides/)
      .waitFor()
  })

  it('and an approver of the customer decides', async () => {
    const page = await as('customer', 'Birte Ahl')
    await page.getByRole('button', { name: 'Accept', exact: true }).click()
    await page.getByRole('dialog').getByRole('button', { name: 'Accept', exact: true }).click()
    await page
      .getByText(/^Accepted by/)
      .first()
      .waitFor()
    expect(await axeFaults(page)).toEqual([])
    expect(two.errors).toEqual([])
  })
})
