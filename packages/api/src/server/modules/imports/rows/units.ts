import { findUnit } from '@evenrule/metrology'

/** Other ways in which files write the units of the list. */
const spellings: Readonly<Record<string, string>> = {
  um: 'µm',
  μm: 'µm',
  micron: 'µm',
  inch: 'in',
  '"': 'in',
  deg: '°',
  degc: '°C',
  ohm: 'Ω',
  lpm: 'l/min',
  pcs: '1',
}

/** The unit of the list that a cell means; the cell itself where it means none. Torque is often written Nm or N*m. */
export function unitOf(cell: string): string {
  // Ohm signs and omegas look alike.
  const text = cell.normalize('NFC')
  if (findUnit(text)) return text
  const torque = /^N[ .*·⋅]?(m|cm|mm)$/.exec(text)?.[1]
  return torque ? `N·${torque}` : (spellings[text.toLowerCase()] ?? text)
}
