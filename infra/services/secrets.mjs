import { randomBytes } from 'node:crypto'
import { roles } from '../config.mjs'
import { readJson, writeJson } from './files.mjs'

const secret = () => randomBytes(24).toString('hex')

/**
 * Passwords and keys of this instance: made once, kept in a file that only its owner may read.
 *
 * @returns {{ postgres: Record<string, string>, oidc: Record<string, string>, session: string }}
 */
export function keepSecrets(config) {
  const kept = readJson(config.file.secrets)
  if (kept) return kept
  const made = {
    postgres: Object.fromEntries(['admin', ...roles].map((role) => [role, secret()])),
    oidc: { supplier: secret(), customer: secret() },
    session: secret(),
  }
  writeJson(config.file.secrets, made)
  return made
}
