import { createHash } from 'node:crypto'
import type { Person } from './people'

/** What somebody enters who is not on the list. */
export interface Entered {
  name: string
  email: string
  verified: boolean
}

const address = /^[^\s@]+@[^\s@]+\.[^\s@]+$/

/** People who entered themselves on the sign-in page; forgotten when the stand-in stops. */
export class Newcomers {
  readonly #people = new Map<string, Person>()

  /**
   * Takes somebody in, or what has changed of them; undefined for an address that is none. One address is one subject,
   * so that whoever enters it again is the same person to the apps.
   */
  enter({ name, email, verified }: Entered): Person | undefined {
    const [own, given] = [email.trim(), name.trim()]
    if (!address.test(own) || own.length > 254 || given.length > 200) return undefined
    const sub = `new-${createHash('sha256').update(own.toLowerCase()).digest('hex').slice(0, 24)}`
    const person: Person = {
      ...{ sub, name: given || own, email: own, verified },
      ...{ organisation: undefined, side: 'entered on this page', roles: [] },
    }
    this.#people.set(sub, person)
    return person
  }

  find = (sub: string): Person | undefined => this.#people.get(sub)

  all = (): Person[] => [...this.#people.values()]
}
