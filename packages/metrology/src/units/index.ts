import { multiply, divide, rational, toNumber, type Rational } from '../decimal'

/** Quantities with units of their own; values of different quantities are never compared. */
export const quantities = [
  'length',
  'angle',
  'mass',
  'force',
  'torque',
  'pressure',
  'flow',
  'time',
  'temperature',
  'voltage',
  'current',
  'resistance',
  'hardness-rockwell-c',
  'hardness-vickers',
  'fraction',
  'count',
] as const
export type UnitQuantity = (typeof quantities)[number]

export interface Unit {
  symbol: string
  quantity: UnitQuantity
  /** Size in the first unit of its quantity, as an exact fraction [numerator, denominator]. */
  size: readonly [number, number]
}

const unit = (symbol: string, quantity: UnitQuantity, numerator: number, denominator = 1): Unit => ({
  symbol,
  quantity,
  size: [numerator, denominator],
})

/**
 * The closed list of units, with exact conversions only: 1 in = 25.4 mm and the prefixes of the International System
 * of Units (BIPM, The International System of Units, 9th edition 2019). Units whose ratio is not a fraction are left
 * out.
 */
export const units: readonly Unit[] = [
  unit('mm', 'length', 1),
  unit('µm', 'length', 1, 1000),
  unit('nm', 'length', 1, 1_000_000),
  unit('cm', 'length', 10),
  unit('m', 'length', 1000),
  unit('in', 'length', 254, 10),
  unit('°', 'angle', 1),
  unit('′', 'angle', 1, 60),
  unit('″', 'angle', 1, 3600),
  unit('g', 'mass', 1),
  unit('mg', 'mass', 1, 1000),
  unit('kg', 'mass', 1000),
  unit('N', 'force', 1),
  unit('mN', 'force', 1, 1000),
  unit('kN', 'force', 1000),
  unit('N·m', 'torque', 1),
  unit('N·cm', 'torque', 1, 100),
  unit('N·mm', 'torque', 1, 1000),
  unit('Pa', 'pressure', 1),
  unit('kPa', 'pressure', 1000),
  unit('MPa', 'pressure', 1_000_000),
  unit('mbar', 'pressure', 100),
  unit('bar', 'pressure', 100_000),
  unit('ml/min', 'flow', 1),
  unit('l/min', 'flow', 1000),
  unit('s', 'time', 1),
  unit('ms', 'time', 1, 1000),
  unit('min', 'time', 60),
  unit('°C', 'temperature', 1),
  unit('V', 'voltage', 1),
  unit('mV', 'voltage', 1, 1000),
  unit('A', 'current', 1),
  unit('mA', 'current', 1, 1000),
  unit('Ω', 'resistance', 1),
  unit('mΩ', 'resistance', 1, 1000),
  unit('kΩ', 'resistance', 1000),
  unit('HRC', 'hardness-rockwell-c', 1),
  unit('HV', 'hardness-vickers', 1),
  unit('%', 'fraction', 1),
  unit('‰', 'fraction', 1, 10),
  unit('1', 'count', 1),
]

const bySymbol = new Map(units.map((each) => [each.symbol, each]))

/** The unit with this symbol, or undefined where the list has none. */
export function findUnit(symbol: string): Unit | undefined {
  return bySymbol.get(symbol)
}

/** Whether values in two units can be compared; a unit that is not in the list is compatible with itself alone. */
export function areCompatible(from: string, to: string): boolean {
  return (
    from === to ||
    (findUnit(from)?.quantity !== undefined && findUnit(from)?.quantity === findUnit(to)?.quantity)
  )
}

/** A value in another unit of its quantity, exactly; null where the units are not compatible. */
export function convertExactly(value: Rational, from: string, to: string): Rational | null {
  if (from === to) return value
  const [source, target] = [findUnit(from), findUnit(to)]
  if (!source || !target || source.quantity !== target.quantity) return null
  return divide(multiply(value, sizeOf(source)), sizeOf(target))
}

/** A value in another unit of its quantity, converted in decimal; null where the units are not compatible. */
export function convert(value: number, from: string, to: string): number | null {
  const converted = convertExactly(rational(value), from, to)
  return converted && toNumber(converted)
}

const sizeOf = ({ size: [numerator, denominator] }: Unit): Rational => ({
  numerator: BigInt(numerator),
  denominator: BigInt(denominator),
})
