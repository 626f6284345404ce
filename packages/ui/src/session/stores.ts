import type { PiniaPlugin, StoreGeneric } from 'pinia'

const known = new Set<StoreGeneric>()

/** Stores that belong to the person, not to the organisation they work for. */
const personal = new Set(['session', 'page'])

/** Remembers every store as it is made, so that all can be emptied when the organisation changes. */
export const rememberStores: PiniaPlugin = ({ store }) => {
  known.add(store)
}

/** Empties every store that holds an organisation's data. A setup store without `$reset` fails loudly. */
export function resetOrganisationStores(): void {
  for (const store of known) if (!personal.has(store.$id)) store.$reset()
}
