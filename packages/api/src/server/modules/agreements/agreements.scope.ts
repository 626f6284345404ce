import type { AgreementScope, ScopeKind } from '../../../contract/agreements'

export interface ScopeColumns {
  partId: string | null
  characteristicId: string | null
}

/** What an agreement's columns say about its scope. */
export const scopeKindOf = ({ partId, characteristicId }: ScopeColumns): ScopeKind =>
  characteristicId ? 'characteristic' : partId ? 'part' : 'relationship'

/** The scope with the names of what it covers. */
export const namedScope = (
  { partId, characteristicId }: ScopeColumns,
  names: {
    part: { number: string; name: string } | null
    characteristic: { number: number; name: string } | null
    revision: string | null
  },
): AgreementScope => ({
  kind: scopeKindOf({ partId, characteristicId }),
  partId,
  partNumber: names.part?.number ?? null,
  partName: names.part?.name ?? null,
  characteristicId,
  characteristicNumber: names.characteristic?.number ?? null,
  characteristicName: names.characteristic?.name ?? null,
  revision: names.revision,
})

/** The scope as a sentence names it: `7741-220 C, no. 5 Bore`. */
export function scopeWords(scope: AgreementScope): string {
  if (scope.kind === 'relationship') return 'all part numbers'
  if (scope.kind === 'part') return `${scope.partNumber} ${scope.partName}`
  return `${scope.partNumber} ${scope.revision}, no. ${scope.characteristicNumber} ${scope.characteristicName}`
}
