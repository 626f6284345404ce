import type { ImportThing } from '../../../../contract/imports'

type Values = Readonly<Record<string, string | number | null>>

const shown = (value: string | number | null | undefined): string =>
  value === null || value === undefined ? '' : String(value)

/** What differs between how a thing stands and how the file has it, by the labels of the fields. */
export const differencesOf = (
  labels: Readonly<Record<string, string>>,
  stands: Values,
  wanted: Values,
): ImportThing['differences'] =>
  Object.entries(labels).flatMap(([key, field]) => {
    const [from, to] = [shown(stands[key]), shown(wanted[key])]
    return from === to ? [] : [{ field, from, to }]
  })
