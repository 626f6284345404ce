import { Html, html, page } from '../page/page'
import type { Listing, Mail, Summary } from './store'

const note = 'Local stand-in for a mail server. What the product sends is kept here and goes to nobody.'

const time = new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium', timeStyle: 'short' })

/** A moment as the machine's own time zone reads it, such as "14 Oct 2026, 09:30". */
const moment = (iso: string) => html`<time datetime="${iso}">${time.format(new Date(iso))}</time>`

const listAddress = (to: string, number: number) => `/?${new URLSearchParams({ to, page: String(number) })}`

function row({ id, received, from, to, subject }: Summary): Html {
  return html`<li class="mail-row">
    <a href="/messages/${id}"><strong>${subject}</strong></a>
    <span>${to.join(', ')}</span>
    <span class="soft">${moment(received)}</span>
    <span class="soft">from ${from}</span>
  </li>`
}

function pager(to: string, { page: current, pages }: Listing): Html | undefined {
  if (pages === 1) return undefined
  const link = (number: number, text: string) => html`<a href="${listAddress(to, number)}">${text}</a>`
  return html`<nav class="pager" aria-label="Pages">
    ${current > 1 ? link(current - 1, 'Newer') : undefined}
    <span>Page ${current} of ${pages}</span>
    ${current < pages ? link(current + 1, 'Older') : undefined}
  </nav>`
}

function answer(to: string, total: number): Html {
  const count = total === 1 ? '1 mail' : `${total} mails`
  if (total > 0) return html`${count}${to ? ` to addresses with “${to}”` : ''}, the newest first.`
  return to
    ? html`None to an address with “${to}”. Change or clear the filter.`
    : html`None yet. Mail appears here as soon as the product sends it.`
}

/** The list of mails. */
export function listPage(to: string, listing: Listing, recipients: string[]): string {
  return page({
    title: 'Mail',
    note,
    body: html`
      <h1>What has been mailed?</h1>
      <p role="status">${answer(to, listing.total)}</p>
      <form class="field" method="get" action="/" role="search">
        <label
          >Recipient<input name="to" value="${to}" list="recipients" type="search" autocomplete="off"
        /></label>
        <datalist id="recipients">
          ${recipients.map((address) => html`<option value="${address}"></option>`)}
        </datalist>
        <button class="plain-button">Filter</button>
        ${to ? html`<a href="/">Show all</a>` : undefined}
      </form>
      ${
        listing.total > 0
          ? html`<ul class="plain sheet">
              ${listing.items.map(row)}
            </ul>`
          : undefined
      }
      ${pager(to, listing)}
    `,
  })
}

/** Text in which addresses of pages are links. */
export function withLinks(text: string): Html {
  // An address ends before the punctuation that follows it in a sentence.
  const parts = text.split(/(https?:\/\/[^\s<>"]*[^\s<>".,;:!?)\]}])/)
  return html`${parts.map((part, at) => (at % 2 === 1 ? html`<a href="${part}">${part}</a>` : part))}`
}

/** One mail. */
export function mailPage({ id, received, from, to, subject, text, attachments }: Mail): string {
  return page({
    title: subject,
    note,
    body: html`
      <p><a href="/">All mail</a></p>
      <h1>${subject}</h1>
      <dl class="facts">
        <dt>From</dt>
        <dd>${from}</dd>
        <dt>To</dt>
        <dd>
          ${to.map((address, at) => html`${at > 0 ? ', ' : ''}<a href="${listAddress(address, 1)}">${address}</a>`)}
        </dd>
        <dt>Received</dt>
        <dd>${moment(received)}</dd>
        ${
          attachments.length > 0
            ? html`<dt>Attached</dt>
                <dd>${attachments.join(', ')}</dd>`
            : undefined
        }
      </dl>
      ${new Html('<div class="sheet mail-text">')}${withLinks(text.trim())}${new Html('</div>')}
      <p><a href="/messages/${id}.eml">As it was sent</a></p>
    `,
  })
}

/** What is said when a mail does not exist. */
export function missingPage(): string {
  return page({
    title: 'No such mail',
    note,
    body: html`<h1>No such mail</h1>
      <p>It may have gone with a reset. <a href="/">All mail</a></p>`,
  })
}
