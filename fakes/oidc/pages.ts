import { Html, html, page } from '../page/page'
import { groups } from './people'
import type { Person } from './people'

const note = 'Local stand-in for a sign-in provider. These people are invented, and nobody needs a password.'

/** What a sign-in in progress asks of the page. */
export interface SignIn {
  uid: string
  app: string
  filter: string
  /** Those who entered themselves before. */
  others: readonly Person[]
  /** Somebody who is expected to sign in, such as the one who is about to sign a submission. */
  expected: Person | undefined
  /** Whether the app asked for a fresh sign-in though somebody may be signed in there. */
  fresh: boolean
}

const roleLine = ({ roles, email, verified }: Person) =>
  roles.length > 0 ? roles.join(', ') : `${email}${verified ? '' : ', not confirmed'}`

function personButton(person: Person, uid: string): Html {
  return html`<form method="post" action="/interaction/${uid}/sign-in">
    <button class="person" name="sub" value="${person.sub}">
      <strong>${person.name}</strong><span>${roleLine(person)}</span>
    </button>
  </form>`
}

function personEntry(person: Person): Html {
  return html`<div class="person">
    <strong>${person.name}</strong><span>${roleLine(person)}</span><span>${person.email}</span>
  </div>`
}

function peopleList(filter: string, entry: (person: Person) => Html, others: readonly Person[] = []): Html {
  const found = groups(filter, others)
  if (found.length === 0)
    return html`<p role="status">Nobody here matches “${filter}”. Change or clear the filter.</p>`
  return html`${found.map(
    ({ title, side, people }) => html`
      <section>
        <h2>${title}</h2>
        <p class="soft">${side}</p>
        <ul class="plain people">
          ${people.map((person) => html`<li>${entry(person)}</li>`)}
        </ul>
      </section>
    `,
  )}`
}

/** For somebody who is not on the list, such as one who has been invited. */
const newPersonForm = (uid: string): Html => html`
  <section>
    <h2>Somebody else</h2>
    <p class="soft">Signs in anybody under any address, as a new person or as the same one as before.</p>
    <form class="field" method="post" action="/interaction/${uid}/new">
      <label>E-mail<input name="email" type="email" required maxlength="254" /></label>
      <label>Name<input name="name" maxlength="200" /></label>
      <label class="check"
        ><input name="verified" type="checkbox" value="yes" checked />Address confirmed</label
      >
      <button class="plain-button">Sign in as this person</button>
    </form>
  </section>
`

function filterForm(action: string, filter: string): Html {
  return html`<form class="field" method="get" action="${action}" role="search">
    <label>Name, role or organisation<input name="filter" value="${filter}" type="search" /></label>
    <button class="plain-button">Filter</button>
  </form>`
}

/** The page on which one chooses whom to sign in as. */
export function signInPage({ uid, app, filter, others, expected, fresh }: SignIn): string {
  const heading =
    fresh && expected ? `Sign in afresh as ${expected.name}?` : `Who signs in to the ${app} app?`
  const answer = fresh
    ? `The ${app} app asks for a fresh sign-in. One click signs you in.`
    : 'One click signs you in. Each app keeps its own person, so both sides of the table fit into one browser.'
  return page({
    title: 'Sign in',
    note,
    body: html`
      <h1>${heading}</h1>
      <p>${answer}</p>
      ${expected ? html`<div class="people">${personButton(expected, uid)}</div>` : undefined}
      ${filterForm(`/interaction/${uid}`, filter)}
      ${peopleList(filter, (person) => personButton(person, uid), others)} ${newPersonForm(uid)}
      <form class="field" method="post" action="/interaction/${uid}/cancel">
        <button class="plain-button">Back to the ${app} app without signing in</button>
      </form>
    `,
  })
}

/** What the stand-in says when it is opened by itself. */
export function frontPage(filter: string): string {
  return page({
    title: 'People of the demonstration',
    note,
    body: html`
      <h1>Who is in the demonstration?</h1>
      <p>Open the supplier or the customer app and choose one of these people there.</p>
      ${filterForm('/', filter)} ${peopleList(filter, personEntry)}
    `,
  })
}

/** A page that only says one thing, with the ways back to the apps. */
export function messagePage(title: string, text: string, apps: { name: string; origin: string }[]): string {
  return page({
    title,
    note,
    body: html`
      <h1>${title}</h1>
      <p>${text}</p>
      <ul class="plain">
        ${apps.map(({ name, origin }) => html`<li><a href="${origin}">Open the ${name} app</a></li>`)}
      </ul>
    `,
  })
}

/** Ends the provider's session without a further question; the button serves browsers that run no script. */
export function signOutPage(form: string, formId: string): string {
  // The provider hands over the form as markup and names it; only the answer "yes" is added.
  return page({
    title: 'Signing out',
    note,
    head: html`<script src="/submit.js" defer></script>`,
    body: html`
      <h1>Signing out</h1>
      ${new Html(form)}
      <button class="plain-button" form="${formId}" name="logout" value="yes" id="sign-out">Sign out</button>
    `,
  })
}
