import type { Page } from 'playwright-core'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { axeFaults, chooseAtProvider, picture, signIn, signOut, TwoSides } from './support'

const two = new TwoSides('invitations')
const mark = `${Date.now()}`
const founder = { name: 'Nia Brook', email: `nia.brook.${mark}@gears.example` }
const colleague = { name: 'Tam Weller', email: `tam.weller.${mark}@brackwell.example` }
const shop = `Gear shop ${mark}`

beforeAll(() => two.open())
afterAll(() => two.close())
afterEach((context) => two.keep(context))

/** The link of the newest mail to an address, once it has come. */
async function linkTo(address: string): Promise<string> {
  for (let attempt = 0; attempt < 60; attempt += 1) {
    const list = await fetch(`${two.app.mail}/messages.json?to=${encodeURIComponent(address)}`)
    const [newest] = ((await list.json()) as { items: { id: string }[] }).items
    if (newest) {
      const mail = await (await fetch(`${two.app.mail}/messages/${newest.id}.json`)).json()
      const link = /^https?:\S+#\S+$/m.exec((mail as { text: string }).text)?.[0]
      if (link) return link
    }
    await new Promise((done) => setTimeout(done, 500))
  }
  throw new Error(`No mail came to ${address}.`)
}

/** Signs in at the provider's page as somebody who is not on its list. */
async function enterAtProvider(page: Page, { name, email }: { name: string; email: string }): Promise<void> {
  await page.getByLabel('E-mail').fill(email)
  await page.getByLabel('Name', { exact: true }).fill(name)
  await page.getByRole('button', { name: 'Sign in as this person' }).click()
}

const heading = (page: Page, name: string | RegExp) => page.getByRole('heading', { level: 1, name }).waitFor()
const press = (page: Page, name: string) => page.getByRole('button', { name, exact: true }).click()

describe('a supplier that is not here yet', () => {
  it('is invited by the customer’s admin', async () => {
    const { customer } = two
    await signIn(customer, two.app.customer, 'Adaeze Holm')
    await two.at('customer', 'relationships')
    await press(customer, 'Invite a supplier')
    await customer.getByLabel(/^Supplier required/).fill(shop)
    await customer.getByLabel('Supplier number').fill('B-1')
    await customer.getByLabel(/^E-mail/).fill(founder.email)
    await customer.getByLabel('Message').fill('Welcome.')
    await press(customer, 'Send the invitation')
    const row = customer.getByRole('row', { name: new RegExp(founder.email) })
    await row.getByText(/^pending, until/).waitFor()
    expect(await axeFaults(customer)).toEqual([])
  })

  it('is founded by the person who opens the link, signs in as the address and accepts', async () => {
    const { supplier } = two
    await supplier.goto(await linkTo(founder.email))
    await heading(supplier, 'Whom is this invitation for?')
    expect(new URL(supplier.url()).hash).toBe('')
    await supplier.getByRole('link', { name: 'Sign in and read it' }).click()
    await enterAtProvider(supplier, founder)
    await heading(supplier, 'Will you supply Brackwell Drivelines in Evenrule?')
    await supplier.getByText('Welcome.').waitFor()
    expect(await axeFaults(supplier)).toEqual([])
    await picture(supplier, 'invitation-supplier')
    // The name the customer used is there already; without a site it does not go on.
    await press(supplier, 'Accept and begin')
    await supplier.getByText('Enter one place where you measure.').waitFor()
    await supplier.getByLabel(/^First site/).fill('Hall 1')
    await press(supplier, 'Accept and begin')
    await supplier.getByRole('heading', { name: 'Begin here' }).waitFor()
    await two.at('supplier', 'relationships')
    await supplier.getByText('Brackwell Drivelines').first().waitFor()
  })

  it('is a supplier of the customer then, who is told', async () => {
    const { customer } = two
    await two.at('customer', `relationships?search=${mark}`)
    await customer
      .getByRole('row', { name: new RegExp(`${shop}.*B-1`) })
      .first()
      .waitFor()
    await customer
      .getByText(new RegExp(`^accepted .* by ${founder.name}$`))
      .first()
      .waitFor()
    await two.at('customer', 'messages')
    await customer.getByText(`${shop} is your supplier now`).waitFor()
  })
})

describe('a member who is invited', () => {
  it('is asked by an admin, with a role', async () => {
    const { customer } = two
    await two.at('customer', 'members')
    await press(customer, 'Invite a member')
    await customer.getByLabel(/^E-mail/).fill(colleague.email)
    await press(customer, 'Send the invitation')
    await customer.getByText('Choose at least one role').waitFor()
    await customer.getByLabel('Quality representative').check()
    await press(customer, 'Send the invitation')
    await customer.getByRole('row', { name: new RegExp(colleague.email) }).waitFor()
  })

  it('cannot be somebody else: the wrong address is refused, and shown the invited one by a mask alone', async () => {
    const { supplier } = two
    // The founder of before opens the mail that is not theirs, in the customer app.
    await supplier.goto(await linkTo(colleague.email))
    await supplier.getByRole('link', { name: 'Sign in and read it' }).click()
    await chooseAtProvider(supplier, founder.name)
    await heading(supplier, 'Is this invitation for you?')
    const text = await supplier.getByRole('main').innerText()
    expect(text).toContain('t•••@b•••.example')
    expect(text).not.toContain(colleague.email)
    expect(await axeFaults(supplier)).toEqual([])
    await picture(supplier, 'invitation-another')
  })

  it('signs in with the right one instead, is led back to the invitation, and joins', async () => {
    const { supplier } = two
    await press(supplier, 'Use another account')
    await supplier.getByRole('link', { name: 'Sign in again' }).click()
    await enterAtProvider(supplier, colleague)
    await heading(supplier, 'Will you join Brackwell Drivelines?')
    await supplier.getByText('quality representative').waitFor()
    await press(supplier, 'Accept and join')
    await supplier.waitForURL(/\/organisations\/[0-9a-f-]{36}$/)
    await two.at('customer', `members?search=${mark}`)
    await two.customer
      .getByRole('row', { name: /Tam Weller.*Quality representative/ })
      .first()
      .waitFor()
  })
})

it('somebody without an organisation is told what to do', async () => {
  const { customer } = two
  await signOut(customer)
  await customer.getByRole('link', { name: 'Sign in again' }).click()
  await enterAtProvider(customer, { name: 'No One', email: `no.one.${mark}@people.example` })
  await customer.getByText('You belong to no organisation yet.').waitFor()
  await customer.getByText(`no.one.${mark}@people.example`).first().waitFor()
  await customer.getByLabel('Link of the invitation').fill('my invitation')
  await press(customer, 'Open the invitation')
  await customer.getByText(/^This is no link of an invitation/).waitFor()
  expect(await axeFaults(customer)).toEqual([])
  expect(two.errors).toEqual([])
})
