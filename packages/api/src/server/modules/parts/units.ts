import { units, type Unit } from '../../../contract/common'
import { multiplyDecimals } from '../../../contract/decimal'

/** The double nearest to a decimal text in one unit, expressed in another of the same quantity. */
export function convertText(text: string, from: string, to: string): number {
  if (from === to) return Number(text)
  const [source, target] = [units[from as Unit], units[to as Unit]]
  if (!source || !target || source.quantity !== target.quantity)
    throw new Error(`${from} cannot be converted to ${to}.`)
  return Number(multiplyDecimals(text, source.factor)) / Number(target.factor)
}
