import type { agreements } from '@evenrule/api/contract'
import type { LocationQueryValue } from 'vue-router'

const uuid = /^[0-9a-f-]{36}$/

/** The challenge that an address names, as `caseOf=<submission>.<challenge>`, where one came from it. */
export function caseFromQuery(
  value: LocationQueryValue | LocationQueryValue[] | undefined,
): agreements.AgreementCase | null {
  const [submissionId = '', challengeId = '', more] = (typeof value === 'string' ? value : '').split('.')
  return more === undefined && uuid.test(submissionId) && uuid.test(challengeId)
    ? { submissionId, challengeId }
    : null
}
