/** A unit's symbol as shown; empty or left out for pure numbers. */
export type Unit = string | null | undefined
