import type { GaugeAskedFor, ReadingsNeeded } from '@evenrule/metrology'
import { formatChance, formatNumber, type Unit } from '../../format'
import { shiftDecimal } from '../../format/numbers'
import { askedWords as words } from '../../strings/consequences'

/** A limit to buy by: three significant digits, rounded down so that what is written still meets the clause. */
export function writtenLimit(value: number, unit: Unit): string {
  if (value === 0) return formatNumber(0, { unit })
  const places = 2 - Math.floor(Math.log10(value))
  const down = shiftDecimal(Math.floor(shiftDecimal(value, places)), -places)
  return formatNumber(down, { unit, digits: Math.max(0, places) })
}

/** The gauge a clause asks for, a sentence each; what is wrong with asking so is told apart. */
export function gaugeLines(
  { spread, bias, biasGrowsWithSpread }: GaugeAskedFor,
  ownSpread: number,
  unit: Unit,
): { text: string; wrong: boolean }[] {
  const own = formatNumber(ownSpread, { unit })
  const ofSpread =
    spread.value !== null
      ? [
          { text: words.spread(writtenLimit(spread.value, unit)), wrong: false },
          { text: words.spreadWidth(writtenLimit(6 * spread.value, unit)), wrong: false },
        ]
      : [
          spread.reason === 'any-spread'
            ? { text: words.anySpread, wrong: true }
            : { text: words.noSpread, wrong: false },
        ]
  // Where no spread will do, the assumed one will not either.
  const ofBias =
    spread.reason === 'no-spread'
      ? []
      : [
          bias.value !== null
            ? words.bias(own, writtenLimit(bias.value, unit))
            : bias.reason === 'not-without-bias'
              ? words.noBias(own)
              : words.anyBias(own),
        ]
  return [
    ...ofSpread,
    ...ofBias.map((text) => ({ text, wrong: false })),
    ...(biasGrowsWithSpread && bias.value !== null ? [{ text: words.grows, wrong: true }] : []),
  ]
}

/** The least study in one sentence. */
export function leastLine({ readings, chance, reason }: ReadingsNeeded): string {
  if (reason === 'size-found' && readings !== null) return words.leastReadings(readings, formatChance(chance))
  if (reason === 'minimum' && readings !== null) return words.leastMinimum(readings)
  if (reason === 'any-size') return words.anySize
  return reason === 'size-does-not-help' ? words.sizeDoesNotHelp : words.noSize
}
