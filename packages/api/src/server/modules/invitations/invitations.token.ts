import { createHmac, randomBytes, timingSafeEqual } from 'node:crypto'
import { sha256 } from '../record/record.append'

/** What names one sending of an invitation; with the secret of the environment it makes the token of its link. */
export interface Sending {
  id: string
  nonce: string
}

export const newNonce = (): string => randomBytes(18).toString('base64url')

/** The token of a sending: 256 bits that nobody without the secret can derive, and that are stored nowhere. */
export const tokenOf = (secret: string, { id, nonce }: Sending): string =>
  createHmac('sha256', secret).update(`invitation ${id} ${nonce}`).digest('base64url')

/** What is kept of a token, and what it is looked up by. */
export const hashOf = (token: string): string => sha256(token)

/** Whether the token is the very one that this sending derives, compared in constant time. */
export function isTokenOf(secret: string, sending: Sending, token: string): boolean {
  const [own, given] = [Buffer.from(tokenOf(secret, sending)), Buffer.from(token)]
  return own.length === given.length && timingSafeEqual(own, given)
}

/** The link of a mail. The token stands in the fragment, which no browser sends and no log sees. */
export const linkOf = (origin: string, token: string): string => `${origin}/invitation#${token}`
