import { formatNumber, unitText, type NumberFormat } from './numbers'

/** Two ends; an open end is null or left out. */
export interface Ends {
  lower?: number | null
  upper?: number | null
}

/** "−0.0017 to −0.0001 mm"; with one end open "at most …" or "at least …". */
export function formatInterval(ends: Ends | null | undefined, options: NumberFormat = {}): string {
  const { lower, upper } = ends ?? {}
  const bare = { ...options, unit: undefined }
  if (lower != null && upper != null)
    return `${formatNumber(lower, bare)} to ${formatNumber(upper, bare)}${unitText(options.unit)}`
  if (upper != null) return `at most ${formatNumber(upper, options)}`
  if (lower != null) return `at least ${formatNumber(lower, options)}`
  return formatNumber(null)
}

/** Limits: "±0.0025 mm" where they are symmetric about zero, otherwise as an interval. */
export function formatLimits(limits: Ends | null | undefined, options: NumberFormat = {}): string {
  const { lower, upper } = limits ?? {}
  if (lower != null && upper != null && upper > 0 && lower === -upper)
    return `±${formatNumber(upper, options)}`
  return formatInterval(limits, options)
}

/** A nominal with its tolerance as on a drawing: "24.000 ±0.025", "24.000 +0.021/0", "at most 2.0". */
export function formatTolerance(
  { nominal, lower, upper }: { nominal?: number | null } & Ends,
  options: NumberFormat & { deviations?: { lower: number; upper: number } } = {},
): string {
  const { deviations, ...format } = options
  const bare = { ...format, unit: undefined }
  if (nominal == null || lower == null || upper == null) return formatInterval({ lower, upper }, format)
  const { lower: down, upper: up } = deviations ?? { lower: lower - nominal, upper: upper - nominal }
  const same = Math.abs(up + down) <= 1e-9 * Math.max(Math.abs(up), Math.abs(down))
  const range = same
    ? `±${formatNumber(up, bare)}`
    : `${formatNumber(up, { ...bare, signed: true })}/${formatNumber(down, { ...bare, signed: true })}`
  return `${formatNumber(nominal, bare)} ${range}${unitText(format.unit)}`
}
