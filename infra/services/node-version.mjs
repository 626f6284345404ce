// Read before anything else, so only syntax that older Node.js versions understand.
import { readFileSync } from 'node:fs'

/**
 * Tells whether a Node.js version satisfies a range written like ">=20.19 <21 || >=22".
 *
 * @param {string} version such as "20.19.1"
 * @param {string} range comparisons joined by blanks, alternatives by "||"
 */
export function satisfies(version, range) {
  const order = (text) =>
    text
      .split('.')
      .concat('0', '0')
      .slice(0, 3)
      .reduce((sum, part) => sum * 1e4 + Number(part), 0)
  const meets = (comparison) => {
    const [, sign, bound] = /^(>=|<)(.+)$/.exec(comparison)
    return sign === '<' ? order(version) < order(bound) : order(version) >= order(bound)
  }
  return range.split('||').some((part) => part.trim().split(/\s+/).every(meets))
}

/** One line saying which Node.js is needed, or undefined when this one will do. */
export function nodeProblem(version = process.versions.node) {
  const manifest = JSON.parse(readFileSync(new URL('../../package.json', import.meta.url), 'utf8'))
  if (satisfies(version, manifest.engines.node)) return undefined
  return `Evenrule needs Node.js 20.19 or newer in version 20, or 22 and later; this is ${version}.`
}
