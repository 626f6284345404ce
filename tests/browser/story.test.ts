import type { Page } from 'playwright-core'
import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from 'vitest'
import { tableTypes } from '../../packages/api/src/server/tables/content'
import { rowsXml, workbookParts } from '../../packages/api/src/server/tables/testing/workbook'
import { zipOf } from '../../packages/api/src/server/tables/testing/zip'
import { axeFaults, choose, dayIn, picture, TwoSides } from './support'

const part = '9022-005'
const gauge = 'HG-6'
const studyCode = `HG-6 story ${Date.now().toString(36)}`

/** Readings on a master of 61.49 mm, as a spreadsheet with a decimal comma saves them. */
const csv = (): Buffer => {
  const offsets = [1, 0, 2, -1, 1, 3, 0, 1, -2, 1, 2, 0, 1, -1, 0, 2, 1, 0, 3, 1, -1, 1, 0, 2, 1]
  const rows = offsets.map((offset, at) => `${at + 1};${(61.49 + offset / 100).toFixed(2).replace('.', ',')}`)
  return Buffer.from(`\uFEFFNo.;Reading [mm]\r\n${rows.join('\r\n')}\r\n`, 'utf8')
}

/** A workbook with a cover and the readings of three trials beside each other. */
const workbook = (): Buffer =>
  zipOf(
    workbookParts({
      sheets: [
        { name: 'Cover', rows: rowsXml([['Height gauge', 'HG-6']]) },
        {
          name: 'Data',
          rows: rowsXml([
            ['Part', 'Trial 1', 'Trial 2', 'Trial 3'],
            ...[1, 2, 3, 4].map((number) => [`part ${number}`, 61.49, 61.5, 61.48]),
          ]),
        },
      ],
    }),
  )

describe('the main job, from the first proposal to the acceptance', () => {
  const two = new TwoSides('story')
  const { app, errors } = two
  let supplierPage: Page
  let customerPage: Page
  /** Path of the submission's page in the supplier's app. */
  let submissionPath = ''

  beforeAll(async () => {
    await two.open()
    ;({ supplier: supplierPage, customer: customerPage } = two)
  })
  afterAll(() => two.close())
  afterEach((step) => two.keep(step))

  const open = (page: Page, link: string) => page.getByRole('link', { name: link }).first().click()
  const heading = (page: Page) => page.getByRole('heading', { level: 1 })

  it('the customer proposes criteria for a part', async () => {
    await two.as('customer', 'Mara Lindqvist')
    await open(customerPage, 'Agreements')
    await customerPage.getByRole('button', { name: 'Propose criteria' }).first().click()
    const dialog = customerPage.getByRole('dialog')
    await choose(dialog, /Supplier/, /Velloy Springs/)
    await choose(dialog, /Criteria for/, /One part number/)
    await choose(dialog, /Part number/, new RegExp(part), part)
    await dialog.getByRole('button', { name: /Begin|Open|Go on/ }).click()
    await customerPage.getByRole('heading', { name: 'Our proposal' }).waitFor()
    await customerPage.getByRole('button', { name: /^Bias: equivalence/ }).click()
    await customerPage.getByLabel('Margin either way').fill('5')
    await customerPage.getByLabel(/First day in force/).fill(dayIn(0))
    await customerPage.getByLabel('Comment to the other side').fill('Half the usual margin for the spring.')
    await picture(customerPage, 'story-1-proposal')
    await customerPage.getByRole('button', { name: /^Send/ }).click()
    await customerPage.getByText(/waits for an answer from Velloy Springs/).waitFor()
  })

  it('the supplier sees what the clause does and answers with a change', async () => {
    await two.as('supplier', 'Nadia Ferro')
    await supplierPage
      .getByRole('link', { name: /Answer the proposal/ })
      .first()
      .click()
    await supplierPage.getByRole('button', { name: 'Answer with changes' }).click()
    await supplierPage.getByRole('heading', { name: 'Our answer' }).waitFor()
    await supplierPage.getByText('Chance to meet the clause, by true bias').first().waitFor()
    await supplierPage.getByLabel('Margin either way').fill('8')
    await supplierPage
      .getByLabel('Comment to the other side')
      .fill('Eight per cent can be shown with 25 readings.')
    await picture(supplierPage, 'story-2-answer')
    await supplierPage.getByRole('button', { name: /^Send/ }).click()
    await supplierPage.getByText(/waits for an answer from Brackwell/).waitFor()
  })

  it('the customer accepts the answer, and an approver of each side signs the same text', async () => {
    await customerPage.reload()
    await customerPage.getByRole('button', { name: 'Accept the proposal' }).click()
    await customerPage.getByRole('dialog').getByRole('button', { name: 'Accept the proposal' }).click()
    await customerPage.getByText(/waits for both signatures/).waitFor()
    const signedHashes: string[] = []
    for (const [page, side, name] of [
      [customerPage, 'customer', 'Joren Vask'],
      [supplierPage, 'supplier', 'Ulf Rask'],
    ] as const) {
      const address = new URL(page.url()).pathname
      await two.as(side, name)
      await page.goto(app[side] + address)
      await page.getByText('Chance to meet the clause, by true bias').first().waitFor()
      await page.getByRole('button', { name: 'Read and sign' }).click()
      signedHashes.push(await page.locator('#sign code').innerText())
      await page.getByLabel(/I have seen what these clauses reward/).check()
      await picture(page, `story-3-sign-${side}`)
      await page.getByRole('button', { name: 'Sign', exact: true }).click()
    }
    await supplierPage.getByText(/signed by both sides, in force since/).waitFor()
    expect(signedHashes[0]).toMatch(/^[0-9a-f]{64}$/)
    expect(signedHashes[1]).toBe(signedHashes[0])
  })

  it('the supplier plans and registers a study before its first reading', async () => {
    await two.as('supplier', 'Nadia Ferro')
    await open(supplierPage, 'Studies')
    await supplierPage
      .getByRole('link', { name: 'Plan a study' })
      .or(supplierPage.getByRole('button', { name: 'Plan a study' }))
      .first()
      .click()
    await choose(supplierPage, /Measuring task/, new RegExp(`${gauge}.*${part}|${part}.*${gauge}`), gauge)
    await supplierPage.getByLabel('Assumed spread').waitFor()
    await choose(supplierPage, /Reference standard/, new RegExp(`RS ${part}-2`), `RS ${part}-2`)
    await supplierPage.getByLabel('Assumed spread').fill('0,02')
    await supplierPage.getByLabel('Planned readings').fill('25')
    await supplierPage.getByLabel('Code of the study').fill(studyCode)
    await picture(supplierPage, 'story-4-plan')
    await supplierPage.getByRole('button', { name: 'Register the study' }).click()
    await supplierPage
      .getByRole('heading', { name: `Which readings does ${studyCode} still need?` })
      .waitFor()
  })

  it('uploads a file with a decimal comma, sees how it was read, and computes', async () => {
    await supplierPage.getByText('Upload a file').click()
    // A workbook first: its readings stand on the second sheet, in three columns.
    await supplierPage
      .locator('input[type=file]')
      .setInputFiles({ name: 'height.xlsx', mimeType: tableTypes.xlsx, buffer: workbook() })
    await supplierPage.getByText('sheet “Data”, three columns, B to D').waitFor()
    await supplierPage.getByRole('checkbox', { name: 'D, Trial 3' }).uncheck()
    await supplierPage.getByText('sheet “Data”, two columns, B to C').waitFor()
    await supplierPage
      .locator('input[type=file]')
      .setInputFiles({ name: 'height.csv', mimeType: 'text/csv', buffer: csv() })
    await supplierPage.getByText('decimal comma', { exact: false }).first().waitFor()
    await supplierPage.getByText('25 readings').first().waitFor()
    await supplierPage.getByLabel('Appraiser code').fill('A1')
    await supplierPage.getByLabel('Day of collection').fill(dayIn(0))
    await picture(supplierPage, 'story-5-readings')
    await supplierPage.getByRole('button', { name: 'Store and compute' }).click()
    await supplierPage.getByRole('dialog').getByRole('button', { name: 'Store and compute' }).click()
    await supplierPage.getByRole('button', { name: /Prepare a submission/ }).waitFor()
    await picture(supplierPage, 'story-6-result')
    expect(await heading(supplierPage).innerText()).toContain(gauge)
  })

  it('sends the submission for signature, and an approver who took no reading signs it', async () => {
    await supplierPage.getByRole('button', { name: /Prepare a submission/ }).click()
    await supplierPage.getByRole('button', { name: 'Send for signature' }).click()
    await supplierPage.getByRole('dialog').getByRole('button', { name: 'Send for signature' }).click()
    await supplierPage.getByText(/waits for a signature/).waitFor()
    submissionPath = new URL(supplierPage.url()).pathname
    await two.as('supplier', 'Ulf Rask')
    await supplierPage.goto(app.supplier + submissionPath)
    await supplierPage.getByRole('button', { name: 'Sign and submit' }).click()
    await supplierPage.getByRole('dialog').getByRole('button', { name: 'Sign and submit' }).click()
    await supplierPage.getByText(/waits for Brackwell Drivelines’ decision/).waitFor()
    await picture(supplierPage, 'story-7-submitted')
  })

  it('the customer recomputes it in the browser, byte for byte, and accepts', async () => {
    await two.as('customer', 'Mara Lindqvist')
    await open(customerPage, 'Submissions')
    await customerPage
      .getByRole('link', { name: new RegExp(gauge) })
      .first()
      .click()
    await customerPage.getByRole('button', { name: 'Recompute' }).click()
    await customerPage
      .getByText(/byte for byte/)
      .last()
      .waitFor()
    await customerPage.getByText(/Equal/).first().waitFor()
    await picture(customerPage, 'story-8-recomputed')
    await customerPage.getByRole('button', { name: 'Accept', exact: true }).click()
    await customerPage.getByRole('dialog').getByRole('button', { name: 'Accept', exact: true }).click()
    await customerPage.getByText(/Accepted by Brackwell Drivelines on/).waitFor()
    await picture(customerPage, 'story-9-accepted')
  })

  it('both sides see the same record, and its check finds it whole', async () => {
    const seen: string[] = []
    for (const [page, partner] of [
      [supplierPage, 'Brackwell Drivelines'],
      [customerPage, 'Velloy Springs'],
    ] as const) {
      await open(page, 'Record')
      // A list opened while the page still loads is drawn anew under the pointer.
      await page.waitForLoadState('networkidle')
      await choose(page, 'Record', partner)
      await page.getByRole('button', { name: 'Check the record' }).click()
      await page
        .getByRole('alert')
        .getByText(/[0-9a-f]{64}/)
        .waitFor()
      await picture(page, `story-10-record-${partner.slice(0, 3)}`)
      seen.push(await page.locator('main').innerText())
    }
    const accepted = seen.map((text) => /accepted submission \d+/.exec(text)?.[0])
    expect(accepted[0]).toBeDefined()
    expect(accepted[1]).toBe(accepted[0])
    const hashes = seen.map((text) => /\b[0-9a-f]{64}\b/.exec(text)?.[0])
    expect(hashes[0]).toBeDefined()
    expect(hashes[1]).toBe(hashes[0])
  })

  it('tells those concerned by mail, with a link to the place', async () => {
    const submission = new URL(supplierPage.url()).origin + submissionPath
    const to = 'nadia.ferro@velloy.example'
    // The worker sends what the demonstration has left waiting before it.
    const found = await vi.waitUntil(
      async () => {
        const list = await fetch(`${app.mail}/messages.json?to=${to}`)
        const { items } = (await list.json()) as { items: { id: string; subject: string }[] }
        for (const { id, subject } of items.filter((mail) => mail.subject.startsWith('Accepted'))) {
          const mail = await (await fetch(`${app.mail}/messages/${id}.json`)).text()
          if (mail.includes(submission)) return subject
        }
        return undefined
      },
      { timeout: 120_000, interval: 2_000 },
    )
    expect(found).toContain('HG-6')
  })

  it('leaves no error in either console, and no fault that axe finds', async () => {
    expect(errors).toEqual([])
    for (const page of [supplierPage, customerPage]) expect(await axeFaults(page)).toEqual([])
  })
})
