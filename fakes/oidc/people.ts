import demonstration from './people.json'

/** A person of the demonstration, with what the sign-in page says of them. */
export interface Person {
  sub: string
  name: string
  email: string
  /** Whether the provider vouches for the address. */
  verified: boolean
  /** Name of the organisation; undefined for somebody who belongs to none. */
  organisation: string | undefined
  /** What the organisation is, such as "supplier". */
  side: string
  roles: string[]
}

/** People of one organisation, as the sign-in page groups them. */
export interface Group {
  title: string
  side: string
  people: Person[]
}

const organisations = new Map(demonstration.organisations.map((entry) => [entry.id, entry]))

/** Everybody who can sign in, in the order of the file. */
export const people: Person[] = demonstration.people.map(({ organisation, ...person }) => {
  const found = organisation === null ? undefined : organisations.get(organisation)
  if (organisation !== null && !found)
    throw new Error(`${person.sub} names an organisation that is not listed.`)
  return {
    ...person,
    verified: true,
    organisation: found?.name,
    side: found?.side ?? 'belongs to nobody yet',
  }
})

/** The person with this subject. */
export const findPerson = (sub: string) => people.find((person) => person.sub === sub)

/**
 * People by organisation, each of whom has all the words of the filter in their name, e-mail address, role or
 * organisation. `others` are those who are not of the demonstration.
 */
export function groups(filter: string, others: readonly Person[] = []): Group[] {
  const words = filter.toLowerCase().split(/\s+/).filter(Boolean)
  const found = new Map<string, Group>()
  for (const person of [...people, ...others]) {
    const text = [person.name, person.email, person.organisation ?? '', ...person.roles]
      .join(' ')
      .toLowerCase()
    if (!words.every((word) => text.includes(word))) continue
    const title = person.organisation ?? (others.includes(person) ? 'Entered here' : 'No organisation')
    const group = found.get(title) ?? { title, side: person.side, people: [] }
    group.people.push(person)
    found.set(title, group)
  }
  return [...found.values()]
}
