import { randomBytes } from 'node:crypto'
import { mkdirSync, readFileSync, readdirSync } from 'node:fs'
import { open, readFile, rename } from 'node:fs/promises'
import { join } from 'node:path'
import { simpleParser } from 'mailparser'
import type { AddressObject } from 'mailparser'

/** What the list shows of a mail. */
export interface Summary {
  id: string
  received: string
  from: string
  /** Those the mail was delivered to, as given to the receiver and not as written in the mail. */
  to: string[]
  subject: string
}

/** A mail opened for reading. */
export interface Mail extends Summary {
  text: string
  attachments: string[]
}

/** Part of the list. */
export interface Listing {
  items: Summary[]
  total: number
  page: number
  pages: number
}

export const pageSize = 25

/** Mails kept as files: `<id>.eml` as it came, and beside it `<id>.json` with what the list shows. */
export class MailStore {
  #newestFirst: Summary[]

  /** @param folder where the files lie; made when missing */
  constructor(private readonly folder: string) {
    mkdirSync(folder, { recursive: true })
    this.#newestFirst = readdirSync(folder)
      .filter((name) => name.endsWith('.json'))
      .map((name) => JSON.parse(readFileSync(join(folder, name), 'utf8')) as Summary)
      .sort((a, b) => (a.id < b.id ? 1 : -1))
  }

  /**
   * Keeps a mail. When this returns it is on the disk, so the sender may be told that it was taken.
   *
   * @param raw the mail as it came
   * @param to those it was delivered to
   */
  async keep(raw: Buffer, to: string[]): Promise<Summary> {
    const parsed = await simpleParser(raw)
    const now = new Date()
    // Ids sort by time of arrival.
    const id = `${now.getTime().toString().padStart(15, '0')}-${randomBytes(6).toString('hex')}`
    const from = addressText(parsed.from)
    const summary = { id, received: now.toISOString(), from, to, subject: parsed.subject ?? '(no subject)' }
    await this.#write(`${id}.eml`, raw)
    await this.#write(`${id}.json`, JSON.stringify(summary))
    this.#newestFirst.unshift(summary)
    return summary
  }

  /**
   * Lists mails, the newest first.
   *
   * @param to part of a recipient's address; empty for everybody's
   * @param page from 1; one beyond the end shows the last
   */
  list(to: string, page: number): Listing {
    const wanted = to.toLowerCase()
    const found = this.#newestFirst.filter((mail) =>
      mail.to.some((address) => address.toLowerCase().includes(wanted)),
    )
    const pages = Math.max(1, Math.ceil(found.length / pageSize))
    const shown = Math.min(Math.max(1, page), pages)
    return {
      items: found.slice((shown - 1) * pageSize, shown * pageSize),
      total: found.length,
      page: shown,
      pages,
    }
  }

  /** Every address that has received something. */
  recipients(): string[] {
    return [...new Set(this.#newestFirst.flatMap(({ to }) => to))].sort()
  }

  /** The file of a mail as it came; undefined when there is no such mail. */
  async raw(id: string): Promise<Buffer | undefined> {
    const known = this.#newestFirst.some((mail) => mail.id === id)
    return known ? readFile(join(this.folder, `${id}.eml`)) : undefined
  }

  /** A mail with its text; undefined when there is no such mail. */
  async open(id: string): Promise<Mail | undefined> {
    const summary = this.#newestFirst.find((mail) => mail.id === id)
    const raw = await this.raw(id)
    if (!summary || !raw) return undefined
    const { text, attachments } = await simpleParser(raw)
    return {
      ...summary,
      text: text ?? '',
      attachments: attachments.map(({ filename }) => filename ?? 'unnamed'),
    }
  }

  async #write(name: string, content: Buffer | string) {
    const draft = join(this.folder, `${name}.new`)
    const file = await open(draft, 'w')
    await file.writeFile(content)
    await file.sync()
    await file.close()
    await rename(draft, join(this.folder, name))
  }
}

function addressText(sender: AddressObject | undefined): string {
  const { name, address } = sender?.value[0] ?? {}
  return name ? `${name} <${address ?? ''}>` : (address ?? '(nobody)')
}
