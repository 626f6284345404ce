import type { Page } from 'playwright-core'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { enterWorld, takeReadings, type World } from './standing.world'
import { axeFaults, choose, dayIn, picture, TwoSides } from './support'

const asks = 'A control chart over three months with no point outside its limits.'
const reason = 'Ninety points since September, none outside its limits.'
const chart = {
  name: 'chart.pdf',
  mimeType: 'application/pdf',
  buffer: Buffer.from('%PDF-1.7\nchart\n%%EOF\n'),
}

describe('what is judged by hand, and what becomes of the acceptance', () => {
  const two = new TwoSides('standing')
  const { errors } = two
  let supplierPage: Page
  let customerPage: Page
  let world: World
  let submission = ''

  beforeAll(async () => {
    await two.open()
    ;({ supplier: supplierPage, customer: customerPage } = two)
    for (const page of [supplierPage, customerPage]) page.setDefaultTimeout(60_000)
    // Nadia Ferro prepares and signs, a colleague took the readings; Sanna Reve reviews and signs.
    await two.as('customer', 'Sanna Reve')
    await two.as('supplier', 'Nadia Ferro')
    world = await enterWorld(customerPage, supplierPage, 'Velloy Springs')
  })
  afterAll(() => two.close())
  afterEach((step) => two.keep(step))

  /** Presses a move's button on the page and then in its dialog. */
  const act = async (page: Page, name: string) => {
    await page.getByRole('button', { name, exact: true }).click()
    await page.getByRole('dialog').getByRole('button', { name, exact: true }).click()
    await page.getByRole('dialog').waitFor({ state: 'hidden' })
  }
  const sign = async (page: Page) => {
    await page.getByRole('button', { name: 'Read and sign' }).click()
    await page.getByLabel(/I have seen what these clauses reward/).check()
    await page.getByRole('button', { name: 'Sign', exact: true }).click()
  }

  it('both sides sign a clause that is judged by hand, and read what it asks for', async () => {
    const page = customerPage
    await two.at('customer', 'agreements')
    await page.getByRole('button', { name: 'Propose criteria' }).first().click()
    const dialog = page.getByRole('dialog')
    await choose(dialog, /Supplier/, /Velloy Springs/)
    await choose(dialog, /Criteria for/, /One part number/)
    await choose(dialog, /Part number/, new RegExp(world.part), world.part)
    await dialog.getByRole('button', { name: 'Begin the proposal' }).click()
    await page.getByRole('button', { name: /^Judged by hand/ }).click()
    await choose(page, 'About', /^Stability/)
    await page.getByLabel('What is judged').fill('Drift over three months')
    await page.getByLabel('What the document must show').fill(asks)
    await page.getByLabel(/First day in force/).fill(dayIn(0))
    await page.getByRole('button', { name: /^Send/ }).click()
    await page.getByText(/Round 1, ours, waits for an answer/).waitFor()
    await two.at('supplier', page.url().replace(/^.*\/agreements/, 'agreements'))
    await supplierPage.getByRole('cell', { name: asks }).waitFor()
    await act(supplierPage, 'Accept the proposal')
    await sign(supplierPage)
    await supplierPage
      .getByText(/waits for the signature of Brackwell/)
      .first()
      .waitFor()
    await page.reload()
    await sign(page)
    await page
      .getByText(/signed by both sides/)
      .first()
      .waitFor()
  })

  it('the supplier judges it on a document, which can be read before it is signed', async () => {
    const page = supplierPage
    await takeReadings(page, world, 'Ulf Rask')
    await two.at('supplier', `tasks/${world.taskId}`)
    await page.getByRole('button', { name: 'Prepare a submission' }).click()
    await page.getByText(/is not shown: a document that shows it is needed/).waitFor()
    await page.getByRole('button', { name: /^Judge it/ }).click()
    const dialog = page.getByRole('dialog')
    await dialog.getByRole('button', { name: 'Save the judgement' }).click()
    await dialog.getByText('Choose the document.').waitFor()
    await dialog.locator('input[type=file]').setInputFiles(chart)
    await choose(dialog, /Verdict/, /^meets/)
    await dialog.getByLabel('Why it is judged so').fill(reason)
    await dialog.getByText(chart.name, { exact: true }).waitFor()
    await dialog.getByRole('button', { name: 'Save the judgement' }).click()
    await dialog.waitFor({ state: 'hidden' })
    await page.getByText(/^Yes, all .* clauses meet/).waitFor()
    await act(page, 'Send for signature')
    await page.getByText(/waits for a signature/).waitFor()
    expect(await bytesOf(page)).toEqual(chart.buffer)
    await picture(page, 'standing-1-judged')
    await act(page, 'Sign and submit')
    await page.getByText(/waits for Brackwell Drivelines’ decision/).waitFor()
    submission = /submissions\/[0-9a-f-]{36}/.exec(page.url())?.[0] ?? ''
  })

  /** The document as the page's own link gives it. */
  async function bytesOf(page: Page): Promise<Buffer> {
    const waiting = page.waitForEvent('download')
    await page.getByRole('link', { name: chart.name }).first().click()
    const chunks: Buffer[] = []
    for await (const chunk of await (await waiting).createReadStream()) chunks.push(chunk as Buffer)
    return Buffer.concat(chunks)
  }

  it('the customer reads document and reason, and accepts', async () => {
    const page = customerPage
    await two.at('customer', submission)
    await page.getByRole('heading', { name: 'What was judged by hand?' }).waitFor()
    await page.getByText(reason).filter({ visible: true }).first().waitFor()
    expect(await bytesOf(page)).toEqual(chart.buffer)
    await act(page, 'Accept')
    await page.getByText(/^Accepted by Brackwell Drivelines on/).waitFor()
  })

  it('a repair of the gauge suspends it, said before it is reported, and both sides read why', async () => {
    const page = supplierPage
    await two.at('supplier', `gauges/${world.gaugeId}`)
    await page.getByRole('button', { name: 'Report an event' }).click()
    const dialog = page.getByRole('dialog')
    await choose(dialog, /Event/, /^repaired/)
    await dialog.getByLabel(/^On/).fill(dayIn(0))
    await dialog.getByLabel(/few words/).fill('Anvil exchanged.')
    await dialog.getByText('1 acceptance with Brackwell Drivelines will be suspended.').waitFor()
    await dialog.getByRole('button', { name: 'Report it and suspend 1 acceptance' }).click()
    await dialog.waitFor({ state: 'hidden' })
    await page
      .getByRole('row', { name: new RegExp(world.part) })
      .getByText('suspended')
      .waitFor()
    await picture(page, 'standing-2-gauge')
    await two.at('supplier', submission)
    await customerPage.reload()
    for (const each of [supplierPage, customerPage])
      await each
        .getByText(new RegExp(`The gauge ${world.gauge} was repaired on .*: “Anvil exchanged.” A newer`))
        .first()
        .waitFor()
    expect(await page.getByRole('button', { name: 'Let it stand again' }).count()).toBe(0)
  })

  it('an approver of the customer lets it stand again, with the reason', async () => {
    const page = customerPage
    await page.getByRole('button', { name: 'Let it stand again' }).first().click()
    const dialog = page.getByRole('dialog')
    await dialog.getByLabel('Why it stands again').fill('Block measured before and after, no shift.')
    await dialog.getByRole('button', { name: 'Let it stand again' }).click()
    await dialog.waitFor({ state: 'hidden' })
    await supplierPage.reload()
    for (const each of [supplierPage, customerPage]) {
      await each.getByText('Sanna Reve let it stand again').first().waitFor()
      expect(await each.getByText(/^Suspended since/).count()).toBe(0)
    }
    await picture(page, 'standing-3-again')
  })

  it('a new revision of the part reopens it, and the customer carries it over', async () => {
    const page = customerPage
    const path = `parts/${world.partId}`
    await two.at('customer', path)
    await page.getByRole('button', { name: 'Add revision' }).click()
    const dialog = page.getByRole('dialog')
    await dialog.getByLabel('Label').fill('B')
    await dialog.getByRole('button', { name: 'Add revision' }).click()
    await dialog.waitFor({ state: 'hidden' })
    await page.getByText('None of it holds for revision B yet.').waitFor()
    await two.at('supplier', path)
    await supplierPage.getByText('reopened; its limits did not change').waitFor()
    expect(await supplierPage.getByRole('button', { name: /^Carry/ }).count()).toBe(0)
    await supplierPage.getByRole('button', { name: 'Take over from revision A' }).click()
    await supplierPage
      .getByRole('row', { name: new RegExp(world.gauge) })
      .first()
      .waitFor()
    await picture(page, 'standing-4-reopened')
    await page.getByRole('button', { name: 'Carry it over', exact: true }).click()
    await page
      .getByRole('dialog')
      .getByRole('button', { name: /^Carry/ })
      .click()
    await page.getByRole('dialog').waitFor({ state: 'hidden' })
    await page.getByText('All of it holds for revision B.').waitFor()
    await picture(page, 'standing-5-carried')
    await two.at('supplier', submission)
    await supplierPage.getByText('Sanna Reve carried it over to revision B').waitFor()
    expect(await supplierPage.getByText(/^Reopened since/).count()).toBe(0)
  })

  it('leaves no error in either console, and no fault that axe finds', async () => {
    expect(errors).toEqual([])
    for (const page of [supplierPage, customerPage]) expect(await axeFaults(page)).toEqual([])
  })
})
