import { generateKeyPairSync, randomBytes, randomUUID } from 'node:crypto'
import { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import type { JWK } from 'oidc-provider'

interface Keys {
  signing: JWK
  cookie: string
}

/**
 * The key that signs identity tokens and the one that signs cookies: made once and kept, so that a sign-out after
 * a restart still recognises the token it is shown.
 *
 * @param folder of this stand-in's data
 */
export function keepKeys(folder: string): Keys {
  const path = join(folder, 'keys.json')
  if (existsSync(path)) return JSON.parse(readFileSync(path, 'utf8')) as Keys
  const { privateKey } = generateKeyPairSync('rsa', { modulusLength: 2048 })
  const signing = {
    ...privateKey.export({ format: 'jwk' }),
    use: 'sig',
    alg: 'RS256',
    kid: randomUUID(),
  } as JWK
  const keys = { signing, cookie: randomBytes(32).toString('hex') }
  mkdirSync(folder, { recursive: true })
  writeFileSync(`${path}.new`, JSON.stringify(keys), { mode: 0o600 })
  renameSync(`${path}.new`, path)
  return keys
}
