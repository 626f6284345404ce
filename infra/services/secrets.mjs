import { randomBytes } from 'node:crypto'
import { roles } from '../config.mjs'
import { readJson, writeJson } from './files.mjs'

const secret = () => randomBytes(24).toString('hex')

/**
 * Passwords and keys of this instance: made once, kept in a file that only its owner may read.
 *
 * @returns {{ postgres: Record<string, string>, oidc: Record<string, string>, session: string, invitation: string }}
 */
export function keepSecrets(config) {
  const kept = readJson(config.file.secrets) ?? {}
  const all = {
    postgres: Object.fromEntries(['admin', ...roles].map((role) => [role, secret()])),
    oidc: { supplier: secret(), customer: secret() },
    session: secret(),
    invitation: secret(),
    ...kept,
  }
  // An instance of an earlier release gets what it lacks, and keeps what it has.
  if (Object.keys(kept).length < Object.keys(all).length) writeJson(config.file.secrets, all)
  return all
}
