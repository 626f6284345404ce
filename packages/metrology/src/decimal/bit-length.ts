/** Number of binary digits of an integer of zero or above; 0 for zero. */
export function bitLength(value: bigint): number {
  if (value === 0n) return 0
  const hexadecimal = value.toString(16)
  return hexadecimal.length * 4 - 4 + (32 - Math.clz32(Number.parseInt(hexadecimal[0] ?? '0', 16)))
}
