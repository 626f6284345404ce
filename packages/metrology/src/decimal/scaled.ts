import { decimalParts, powerOfTen } from './rational'

/** Values as whole multiples of one power of ten: value i is exactly `integers[i] · 10^exponent`. */
export interface Scaled {
  integers: bigint[]
  exponent: number
}

/** Brings finite numbers, in their shortest decimal form, to whole multiples of a common power of ten. */
export function scale(values: readonly number[]): Scaled {
  const parts = values.map(decimalParts)
  let exponent = 0
  let first = true
  for (const part of parts) {
    if (part.coefficient === 0n) continue
    if (first || part.exponent < exponent) exponent = part.exponent
    first = false
  }
  const integers = parts.map((part) =>
    part.coefficient === 0n || part.exponent === exponent
      ? part.coefficient
      : part.coefficient * powerOfTen(part.exponent - exponent),
  )
  return { integers, exponent }
}
