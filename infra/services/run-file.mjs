import { linkSync, renameSync, rmSync } from 'node:fs'
import { readJson, writeJson } from './files.mjs'
import { identify, isAlive, stopProcess } from './identity.mjs'

/** Order in which what runs is stopped: whoever uses another goes first. */
const stopOrder = ['worker', 'api', 'oidc', 'mail', 's3', 'postgres']

/** How each is asked to stop: SIGINT is PostgreSQL's fast shutdown, which rolls open work back and writes everything down. */
export const stopSignal = (name) => (name === 'postgres' ? 'SIGINT' : 'SIGTERM')

/** The names of children in the order of stopping. */
export function inStopOrder(names) {
  const place = (name) => (stopOrder.includes(name) ? stopOrder.indexOf(name) : -1)
  return [...names].sort((a, b) => place(a) - place(b))
}

/** The note of who runs on a data folder: the start itself and its children, so that a later start finds them. */
export class RunFile {
  #path
  #note
  #claimed = false

  constructor(path) {
    this.#path = path
  }

  /** The start that holds the folder, if it still runs. */
  holder() {
    const note = readJson(this.#path)
    return note?.start && isAlive(note.start) ? note.start : undefined
  }

  /**
   * Takes the folder for this process, after stopping what a killed earlier start left behind.
   *
   * @param {(names: string[]) => void} onLeftovers told the names of what is about to be stopped
   * @returns false when another start holds it
   */
  async claim(onLeftovers) {
    this.#note = { start: identify(process.pid), children: {} }
    for (;;) {
      if (this.#create()) return (this.#claimed = true)
      if (this.holder()) return false
      const stale = readJson(this.#path)
      const left = Object.entries(stale?.children ?? {}).filter(([, noted]) => isAlive(noted))
      if (left.length > 0) onLeftovers(left.map(([name]) => name))
      const byName = Object.fromEntries(left)
      for (const name of inStopOrder(Object.keys(byName))) {
        await stopProcess(byName[name], { signal: stopSignal(name) })
      }
      this.#discard(stale)
    }
  }

  /** Notes a child. */
  add(name, noted) {
    this.#note.children[name] = noted
    writeJson(this.#path, this.#note)
  }

  /** Forgets a child that has ended. */
  remove(name) {
    delete this.#note.children[name]
    writeJson(this.#path, this.#note)
  }

  /** Gives the folder back, if this process holds it. */
  release() {
    if (this.#claimed) rmSync(this.#path, { force: true })
    this.#claimed = false
  }

  /** Makes the file, whole, unless it exists: of two starts at the same moment one gets it. */
  #create() {
    const draft = `${this.#path}.${process.pid}.claim`
    writeJson(draft, this.#note)
    try {
      linkSync(draft, this.#path)
      return true
    } catch (error) {
      if (error.code === 'EEXIST') return false
      throw error
    } finally {
      rmSync(draft)
    }
  }

  /** Removes a stale note, but never one that another start has put in its place meanwhile. */
  #discard(stale) {
    const aside = `${this.#path}.${process.pid}.stale`
    try {
      renameSync(this.#path, aside)
      if (JSON.stringify(readJson(aside)) !== JSON.stringify(stale)) linkSync(aside, this.#path)
    } catch (error) {
      if (error.code !== 'ENOENT' && error.code !== 'EEXIST') throw error
    }
    rmSync(aside, { force: true })
  }
}
