import type { Clause } from '@evenrule/metrology'
import { z } from 'zod'
import { characteristicFacts } from './characteristics'
import { uuid } from './common'

export const hashSchema = z.string().regex(/^[0-9a-f]{64}$/, 'This is not a SHA-256 hash.')

export const partySchema = z.object({ id: uuid, name: z.string() })

/** What an agreement may be about, the widest first. */
export const scopeKinds = ['relationship', 'part', 'characteristic'] as const
export type ScopeKind = (typeof scopeKinds)[number]

/** A clause as stored: it was checked when it was entered, and is kept whole, whatever its type. */
export const clauseSchema = z.custom<Clause>(
  (value) => typeof value === 'object' && value !== null && 'type' in value && 'parameters' in value,
)

/** A characteristic as it stood when something came to rest on it; decimal text as entered. */
export const frozenCharacteristicSchema = z.object({
  characteristicId: uuid,
  partNumber: z.string(),
  revision: z.string(),
  ...characteristicFacts,
  processStandardDeviation: z.string().nullable(),
})
export type FrozenCharacteristic = z.output<typeof frozenCharacteristicSchema>
