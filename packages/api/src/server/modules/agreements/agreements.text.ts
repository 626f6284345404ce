import {
  agreementTextSchema,
  type AgreementScope,
  type AgreementText,
  type ScopedCharacteristic,
} from '../../../contract/agreements'
import type { Clause } from '@evenrule/metrology'
import type { Terms } from '../../../contract/terms'
import { canonicalText, sha256 } from '../record/record.append'
import type { Parties } from '../relationships/relationships.lookup.service'

interface WhatIsAgreed extends Parties {
  agreement: number
  version: number
  timeZone: string
  scope: AgreementScope
  /** Everything in scope now; frozen with its limits where the scope is narrower than the relationship. */
  characteristics: readonly ScopedCharacteristic[]
  clauses: readonly Clause[]
  terms: Terms
  effectiveOn: string
}

/** The bytes that both sides sign, RFC 8785, and their SHA-256. */
export function agreementTextOf(agreed: WhatIsAgreed): { text: string; sha256: string } {
  const { characteristics, clauses, ...rest } = agreed
  const content: AgreementText = {
    format: 'evenrule.agreement/1',
    ...rest,
    characteristics: rest.scope.kind === 'relationship' ? [] : [...characteristics],
    clauses: [...clauses],
  }
  const text = canonicalText(content)
  return { text, sha256: sha256(text) }
}

/** Reads the text of an agreed version back. */
export const readAgreementText = (text: string): AgreementText => agreementTextSchema.parse(JSON.parse(text))

const limits = (of: ScopedCharacteristic) => ({
  id: of.characteristicId,
  nominal: of.nominal,
  lowerLimit: of.lowerLimit,
  upperLimit: of.upperLimit,
  unit: of.unit,
  class: of.class,
  processStandardDeviation: of.processStandardDeviation,
})
const limitsOf = (characteristics: readonly ScopedCharacteristic[]): string =>
  canonicalText(characteristics.map(limits).sort((a, b) => (a.id < b.id ? -1 : 1)))

/**
 * Whether the characteristics in scope, and the limits the text names, are still those of the text. An agreement for
 * the whole relationship names none.
 */
export function limitsAreThoseOf(text: string, now: readonly ScopedCharacteristic[]): boolean {
  const { scope, characteristics } = readAgreementText(text)
  return scope.kind === 'relationship' || limitsOf(characteristics) === limitsOf(now)
}
