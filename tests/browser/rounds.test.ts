import type { Browser, Page } from 'playwright-core'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { addresses, ask, axeFaults, choose, dayIn, launch, openWindow, picture, signIn } from './support'

const part = `RND-${Date.now().toString(36)}`

/** A part number with one characteristic of its own, entered through the product's own routes. */
async function enterPart(page: Page, number: string, partner: string): Promise<void> {
  const { items } = await ask<{ items: { id: string; partner: { name: string } }[] }>(
    page,
    'relationships?size=100',
  )
  const relationshipId = items.find((each) => each.partner.name === partner)!.id
  const made = await ask<{ id: string; currentRevision: { id: string } }>(page, 'parts', {
    body: { relationshipId, number, name: 'Valve spring seat', revision: 'A' },
  })
  await ask(page, `parts/${made.id}/revisions/${made.currentRevision.id}/characteristics`, {
    body: {
      ...{ number: 1, name: 'Seat height', nominal: '12.00', lowerLimit: '11.90', upperLimit: '12.10' },
      ...{ unit: 'mm', class: 'ordinary' },
    },
  })
}

describe('a negotiation in five rounds', () => {
  let browser: Browser
  const errors: string[] = []
  let mara: Page
  let sanna: Page
  let nadia: Page
  let room = ''
  const app = addresses()
  const pages = () => [mara, sanna, nadia]

  const open = async (side: 'supplier' | 'customer', name: string): Promise<Page> => {
    const page = await openWindow(browser, errors)
    page.setDefaultTimeout(60_000)
    await signIn(page, app[side], name)
    return page
  }
  beforeAll(async () => {
    browser = await launch()
    // One after the other: the sign-in of three people at once would wait for the slowest.
    mara = await open('customer', 'Mara Lindqvist')
    sanna = await open('customer', 'Sanna Reve')
    nadia = await open('supplier', 'Nadia Ferro')
  }, 240_000)
  afterAll(() => browser.close())
  afterEach(async ({ task }) => {
    if (task.result?.state !== 'fail') return
    for (const [at, page] of pages().entries()) await picture(page, `rounds-failed-${at}`)
  })
  const row = (page: Page, name: RegExp | string) =>
    page.getByRole('table', { name: 'Clauses side by side' }).getByRole('row', { name })

  it('round 1: the customer proposes three clauses for a part', async () => {
    await enterPart(mara, part, 'Velloy Springs')
    await mara.getByRole('link', { name: 'Agreements' }).first().click()
    await mara.getByRole('button', { name: 'Propose criteria' }).first().click()
    const dialog = mara.getByRole('dialog')
    await choose(dialog, /Supplier/, /Velloy Springs/)
    await choose(dialog, /Criteria for/, /One part number/)
    await choose(dialog, /Part number/, new RegExp(part), part)
    await dialog.getByRole('button', { name: 'Begin the proposal' }).click()
    await mara.getByRole('heading', { name: 'Our proposal' }).waitFor()
    // The list of every kind stands open while the proposal is empty, and opens again for each further clause.
    for (const kind of [/^Bias: equivalence/, /^Resolution:/, /^Study design:/]) {
      const add = mara.getByRole('button', { name: 'Add a clause' })
      if (await add.isVisible()) await add.click()
      await mara.getByRole('button', { name: kind }).click()
    }
    await mara.getByLabel('Margin either way').fill('5')
    await mara.getByRole('button', { name: 'Set terms' }).click()
    await mara.getByLabel('An acceptance holds for').fill('24')
    await mara.getByLabel(/First day in force/).fill(dayIn(0))
    await picture(mara, 'rounds-1-proposal')
    await mara.getByRole('button', { name: /^Send/ }).click()
    await mara.getByText(/Round 1, ours, waits for an answer/).waitFor()
    room = new URL(mara.url()).pathname.replace(/^.*\/agreements/, 'agreements')
  })

  it('round 2: the supplier accepts one clause, comments on another and answers', async () => {
    const organisation = new URL(nadia.url()).pathname.match(/\/organisations\/[^/]+/)![0]
    await nadia.goto(`${app.supplier}${organisation}/${room}`)
    await nadia.getByRole('button', { name: 'Accept: Resolution' }).click()
    await row(nadia, /Resolution/)
      .getByText('both sides accept')
      .waitFor()
    await nadia.getByRole('button', { name: /^Comment.*: Bias/ }).click()
    await nadia.getByLabel(/Comment for Brackwell/).fill('Eight per cent is what the height gauge can show.')
    await nadia.getByRole('button', { name: 'Send the comment' }).click()
    await nadia.getByRole('listitem').getByText('Eight per cent is what').waitFor()
    await picture(nadia, 'rounds-2-room')
    await nadia.getByRole('button', { name: 'Answer with changes' }).click()
    await nadia.getByLabel('Margin either way').fill('8')
    await nadia.getByRole('button', { name: /^Send/ }).click()
    await nadia.getByText(/Round 2, ours, waits for an answer/).waitFor()
  })

  it('round 3: two people of the customer write on one answer, and nothing typed is lost', async () => {
    await mara.reload()
    await mara.getByText('1 comment').first().waitFor()
    await mara.getByRole('button', { name: 'Answer with changes' }).click()
    await mara.getByLabel('Margin either way').fill('6')
    await mara.getByRole('button', { name: 'Save draft' }).click()
    await mara.getByText('Draft saved.').waitFor()
    // Her colleague goes on with it from another desk.
    const address = mara.url()
    await sanna.goto(address)
    await sanna.getByRole('button', { name: 'Go on with our answer' }).click()
    await sanna.getByLabel('Least number of readings').fill('30')
    await sanna.getByLabel('Margin either way').fill('6.5')
    await sanna.getByRole('button', { name: 'Save draft' }).click()
    await sanna.getByText('Draft saved.').waitFor()
    // She has not seen that, and saves something else.
    await mara.getByLabel('Margin either way').fill('7')
    await mara.getByLabel('Comment to the other side').fill('Seven, if the study is large enough.')
    await mara.getByRole('button', { name: 'Save draft' }).click()
    const conflict = mara.getByRole('heading', { name: 'Sanna Reve saved this round meanwhile' })
    await conflict.waitFor()
    await picture(mara, 'rounds-3-conflict')
    expect(await axeFaults(mara)).toEqual([])
    // Also across a reload both texts are there.
    await mara.reload()
    await mara.getByRole('button', { name: 'Go on with our answer' }).click()
    await conflict.waitFor()
    const bias = mara.getByRole('group', { name: /Bias: equivalence.*both changed it/ })
    await bias.getByText(/±6.5.% of tolerance/).waitFor()
    await bias.getByRole('radio', { name: /Yours, not saved/ }).check()
    await mara.getByRole('button', { name: 'Go on with this choice' }).click()
    expect(await mara.getByLabel('Margin either way').inputValue()).toBe('7')
    expect(await mara.getByLabel('Least number of readings').inputValue()).toBe('30')
    expect(await mara.getByLabel('Comment to the other side').inputValue()).toContain('Seven')
    await mara.getByRole('button', { name: /^Send/ }).click()
    await mara.getByText(/Round 3, ours, waits for an answer/).waitFor()
  })

  it('rounds 4 and 5: the supplier answers, then takes a clause out of its own round', async () => {
    await nadia.reload()
    await nadia.getByRole('button', { name: 'Answer with changes' }).click()
    await nadia.getByLabel('Least number of readings').fill('25')
    await nadia.getByRole('button', { name: /^Send/ }).click()
    await nadia.getByText(/Round 4, ours, waits for an answer/).waitFor()
    await nadia.getByRole('button', { name: 'Take out of our round: Resolution' }).click()
    const dialog = nadia.getByRole('dialog')
    await dialog.getByLabel(/Reason/).fill('The agreement for all parts says the same.')
    await dialog.getByRole('button', { name: 'Take the clause out' }).click()
    await nadia.getByText(/Round 5, ours, waits for an answer/).waitFor()
    await picture(nadia, 'rounds-5-taken-out')
  })

  it('the customer compares rounds, marks point by point and accepts', async () => {
    await mara.reload()
    await mara.getByText(/Round 5, from Velloy Springs, waits for our answer/).waitFor()
    const compare = mara.locator('.rounds-compare')
    await choose(compare, 'Earlier', /^round 3, ours/i)
    const differences = compare.getByRole('table')
    await differences.getByRole('row', { name: /Resolution.*taken out/ }).waitFor()
    const readings = differences.getByRole('row', { name: /Study design.*changed/ })
    expect(await readings.locator('del').last().innerText()).toBe('30')
    expect(await readings.locator('ins').last().innerText()).toBe('25')
    await row(mara, /^Bias/).getByText('both sides accept').waitFor()
    await row(mara, /^Resolution/)
      .getByText('left out of this round')
      .waitFor()
    await mara.getByRole('button', { name: 'Accept: Study design' }).click()
    await row(mara, /^Study design/)
      .getByText('both sides accept')
      .waitFor()
    await picture(mara, 'rounds-6-compared')
    expect(await axeFaults(mara)).toEqual([])
    await mara.getByRole('button', { name: 'Accept the proposal' }).click()
    await mara.getByRole('dialog').getByRole('button', { name: 'Accept the proposal' }).click()
    await mara.getByText(/waits for both signatures/).waitFor()
  })

  it('an approver of each side signs the same text', async () => {
    const hashes: string[] = []
    for (const [side, name, at] of [
      ['customer', 'Joren Vask', mara],
      ['supplier', 'Ulf Rask', nadia],
    ] as const) {
      const page = await open(side, name)
      await page.goto(at.url())
      await page.getByRole('button', { name: 'Read and sign' }).click()
      hashes.push(await page.locator('#sign code').innerText())
      await page.getByLabel(/I have seen what these clauses reward/).check()
      await page.getByRole('button', { name: 'Sign', exact: true }).click()
      await page
        .getByText(side === 'customer' ? /waits for the signature of Velloy/ : /signed by both sides/)
        .first()
        .waitFor()
      await picture(page, `rounds-7-signed-${side}`)
      await page.context().close()
    }
    expect(hashes[0]).toMatch(/^[0-9a-f]{64}$/)
    expect(hashes[1]).toBe(hashes[0])
    expect(errors).toEqual([])
  })
})
