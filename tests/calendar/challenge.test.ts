import type { Page } from 'playwright-core'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { axeFaults, choose, dayIn, moveClock, picture, TwoSides } from '../browser/support'

const gauge = 'BG-14'
describe('a challenge of two readings, its correction, and an acceptance whose condition lapses', () => {
  const two = new TwoSides('challenge')
  const { errors } = two
  let supplierPage: Page
  let customerPage: Page
  /** Path of the submission's page below the organisation. */
  let submission = ''
  const corrected = { at: [2, 10], texts: ['', ''] }

  beforeAll(async () => {
    moveClock(0)
    await two.open()
    ;({ supplier: supplierPage, customer: customerPage } = two)
  })
  afterAll(async () => {
    moveClock(0)
    await two.close()
  })
  afterEach((step) => two.keep(step))

  const as = async (side: 'supplier' | 'customer', name: string) => {
    const page = await two.as(side, name)
    if (submission) await two.at(side, submission)
    return page
  }

  it('the customer challenges two readings, chosen in the plot and in the list', async () => {
    const page = await as('customer', 'Mara Lindqvist')
    await two.at('customer', `submissions?search=${gauge}`)
    await page
      .getByRole('link', { name: new RegExp(gauge) })
      .first()
      .click()
    await page.getByRole('button', { name: /^Challenge readings/ }).click()
    submission = /submissions\/[0-9a-f-]{36}/.exec(page.url())?.[0] ?? ''
    const dialog = page.getByRole('dialog')
    await dialog.locator('.target').nth(10).click()
    await dialog.getByRole('checkbox', { name: /^3 / }).check()
    expect(await dialog.getByLabel('Numbers of the readings').inputValue()).toBe('3, 11')
    expect(await dialog.getByRole('checkbox', { name: /^11 / }).isChecked()).toBe(true)
    expect(await dialog.locator('.er-plot .frame').count()).toBe(2)
    await choose(dialog, 'Reason', /not taken as planned/)
    await dialog.getByLabel('What is wrong with it').fill('Both were taken after the fixture was set anew.')
    await picture(page, 'challenge-1-dialog')
    await dialog.getByRole('button', { name: 'Send the challenge' }).click()
    await dialog.waitFor({ state: 'hidden' })
    await page.getByRole('heading', { name: /^Challenge 1: readings 3 and 11 of study/ }).waitFor()
  })

  it('shows both marked in every plot and table, and no decision before it is settled', async () => {
    const page = customerPage
    expect(await page.locator('.er-plot .frame').count()).toBe(4)
    for (let plot = 0; plot < 2; plot += 1)
      await page.getByRole('button', { name: 'Show the numbers' }).first().click()
    expect(await page.getByRole('cell', { name: 'challenge 1', exact: true }).count()).toBe(4)
    await page.getByText(/You cannot decide on it yet: a challenge waits for the supplier’s answer/).waitFor()
    expect(await page.getByRole('button', { name: 'Accept', exact: true }).isDisabled()).toBe(true)
    await picture(page, 'challenge-2-open')
  })

  it('the supplier corrects the two readings in the study', async () => {
    const page = await as('supplier', 'Ines Calder')
    await page
      .getByText(/waits for your answer/)
      .first()
      .waitFor()
    await page.getByRole('button', { name: /^Correct the data/ }).click()
    await page.getByRole('link', { name: /^Correct the readings of/ }).click()
    await page.getByRole('heading', { name: 'Correct the readings' }).waitFor()
    await page.getByText('Paste', { exact: true }).click()
    await page.getByLabel('Copied cells').fill(await readingsCorrected())
    await page.getByLabel('Appraiser code').fill('A1')
    await page.getByLabel(/^Reason/).fill('The two readings were taken again on the first setting.')
    await picture(page, 'challenge-3-correct')
    await page.getByRole('button', { name: 'Store corrected readings' }).click()
    const dialog = page.getByRole('dialog')
    await dialog.getByText(/2 readings changed/).waitFor()
    await picture(page, 'challenge-4-difference')
    await dialog.getByRole('button', { name: 'Ask an approver to sign it' }).click()
    await dialog.getByText(/approvers are told/).waitFor()
    await dialog.getByRole('button', { name: 'Close' }).click()
    await dialog.waitFor({ state: 'hidden' })
  })

  /** The readings as they were submitted, the two in question otherwise. */
  async function readingsCorrected(): Promise<string> {
    const page = customerPage
    const texts = await page.locator('.numbers').last().locator('tbody tr td:nth-child(3)').allInnerTexts()
    // The decimal sign stays as it was entered: what is written otherwise counts as changed.
    const sign = texts[0]?.includes(',') ? ',' : '.'
    const places = texts[0]?.split(sign)[1]?.length ?? 0
    const valueOf = (text: string) => Number(text.replace(',', '.'))
    const write = (value: number) => value.toFixed(places).replace('.', sign)
    const others = texts.filter((_text, place) => !corrected.at.includes(place)).map(valueOf)
    const usual = others.reduce((sum, value) => sum + value, 0) / others.length
    // Close to the others, and never the text that stood there.
    corrected.texts = corrected.at.map((place) =>
      write(usual) === texts[place] ? write(usual + 10 ** -places) : write(usual),
    )
    return texts.map((text, place) => corrected.texts[corrected.at.indexOf(place)] ?? text).join('\n')
  }

  it('an approver who took none of them signs the corrected revision', async () => {
    const page = await as('supplier', 'Tomas Brandl')
    await page.getByRole('button', { name: /^Correct the data/ }).click()
    const dialog = page.getByRole('dialog')
    await dialog.getByLabel('What was corrected, and why').fill('Readings 3 and 11 taken again.')
    await dialog.getByRole('button', { name: 'Sign the correction' }).click()
    await page
      .getByText(/answered by a correction|signed a correction/)
      .first()
      .waitFor()
    await page.getByText(/answered; the customer has the next word/).waitFor()
  })

  it('the customer reads what changed and the revision before, and settles it', async () => {
    const page = await as('customer', 'Mara Lindqvist')
    const thread = page.locator('article', { has: page.getByRole('heading', { name: /^Challenge 1/ }) })
    await thread.getByText(/2 readings changed/).waitFor()
    for (const text of corrected.texts) await thread.locator('ins', { hasText: text }).first().waitFor()
    await picture(page, 'challenge-5-corrected')
    await thread.getByRole('link', { name: /revision 1/ }).click()
    await page.getByText(/You read revision 1. Revision 2 has taken its place/).waitFor()
    expect(await page.getByRole('button', { name: 'Accept', exact: true }).count()).toBe(0)
    await page.getByRole('link', { name: 'Read the newest' }).click()
    await page.getByRole('button', { name: 'Recompute' }).click()
    await page.getByText('Yes. Equal byte for byte.').waitFor()
    await page.getByRole('button', { name: /^The correction settles it/ }).click()
    await page.getByRole('dialog').getByRole('button', { name: 'The correction settles it' }).click()
    await page.getByText('resolved by correction').first().waitFor()
  })

  it('an approver accepts it on a condition due tomorrow', async () => {
    const page = await as('customer', 'Joren Vask')
    const direct = page.getByRole('button', { name: 'Accept with conditions', exact: true })
    await page.getByRole('button', { name: 'Accept', exact: true }).waitFor()
    if (!(await direct.isVisible())) {
      await page.getByRole('button', { name: 'Other steps', exact: true }).click()
      await page
        .getByRole('listitem')
        .or(page.getByRole('menuitem'))
        .getByText('Accept with conditions')
        .click()
    } else await direct.click()
    const dialog = page.getByRole('dialog')
    await dialog.getByLabel('What must follow').fill('Show the fixture’s setting sheet.')
    await dialog.getByLabel('Until when').fill(dayIn(1))
    await choose(dialog, 'What shows it', 'A document')
    await picture(page, 'challenge-6-conditions')
    await dialog.getByRole('button', { name: 'Accept with conditions' }).click()
    await page.getByRole('heading', { name: 'Condition 1: a document' }).waitFor()
    await page
      .getByText(/1 day left/)
      .first()
      .waitFor()
    await picture(page, 'challenge-7-accepted')
  })

  it('the acceptance lapses when the day is over, and both sides read why', async () => {
    await as('supplier', 'Tomas Brandl')
    moveClock(3)
    for (const page of [supplierPage, customerPage]) {
      await page.reload()
      await page
        .getByText(/^Lapsed since/)
        .first()
        .waitFor()
      await page
        .getByText(/A condition was due on .* and is not confirmed/)
        .first()
        .waitFor()
      await page
        .getByText(/2 days over/)
        .first()
        .waitFor()
    }
    await picture(customerPage, 'challenge-8-lapsed')
    await two.at('customer', `submissions?waitsOn=all&state=lapsed&search=${gauge}`)
    await customerPage.getByText('lapsed', { exact: true }).first().waitFor()
  })

  it('leaves no error in either console, and no fault that axe finds', async () => {
    await two.at('customer', submission)
    await customerPage
      .getByText(/^Lapsed since/)
      .first()
      .waitFor()
    expect(errors).toEqual([])
    for (const page of [supplierPage, customerPage]) expect(await axeFaults(page)).toEqual([])
  })
})
