import type { Output, Warning } from './types'

/**
 * The output as it can be written down: numbers that are not finite become null with a warning that says where, and
 * minus zero becomes zero (JSON has neither). Properties that are undefined are left out.
 */
export function finish<O extends Output>(output: O): O {
  const lost: string[] = []
  const finished = tidy(output, '', lost) as O
  if (lost.length === 0) return finished
  const warnings: Warning[] = lost.map((path) => ({
    code: 'not-representable',
    message: `${path} is larger than a number can hold.`,
    path,
  }))
  return { ...finished, warnings: [...finished.warnings, ...warnings] }
}

function tidy(value: unknown, path: string, lost: string[]): unknown {
  if (typeof value === 'number') {
    if (Number.isFinite(value)) return value === 0 ? 0 : value
    lost.push(path)
    return null
  }
  if (Array.isArray(value)) return value.map((item, index) => tidy(item, `${path}[${index}]`, lost))
  if (typeof value !== 'object' || value === null) return value
  const entries = Object.entries(value).filter(([, item]) => item !== undefined)
  return Object.fromEntries(
    entries.map(([name, item]) => [name, tidy(item, path ? `${path}.${name}` : name, lost)]),
  )
}
