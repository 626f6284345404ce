import { problemCodes } from '@evenrule/metrology'
import { z } from 'zod'
import { clauseKeySchema } from './agreements-content'
import { clauseSchema, hashSchema } from './frozen'
import { calendarDate, instant, sideSchema, uuid } from './common'
import { agreementMoveNames, agreementVersionStates } from './moves/agreement-version'
import { termsSchema } from './terms'

/** A clause that cannot be computed for some characteristics of its scope. */
const warningSchema = z.object({
  clause: z.number().int(),
  code: z.enum(problemCodes),
  path: z.string(),
  message: z.string(),
  /** How many characteristics of the scope it concerns, and the first of them (`namedPerFinding` at most). */
  count: z.number().int(),
  characteristicIds: z.array(uuid),
})
const flagSchema = z.object({
  clause: z.number().int(),
  code: z.enum(['zero-difference', 'point-estimate']),
  count: z.number().int(),
  characteristicIds: z.array(uuid),
})
/** A warning or flag names this many characteristics; `count` tells how many there are. */
export const namedPerFinding = 20

/** The challenge that asked for the change: a proposal may have it attached, and both sides see it. */
export const caseSchema = z.object({ submissionId: uuid, challengeId: uuid })
export type AgreementCase = z.output<typeof caseSchema>

export const roundStates = ['draft', 'sent', 'accepted', 'answered', 'replaced', 'withdrawn'] as const
export type RoundState = (typeof roundStates)[number]

/** One side's complete proposal; `draft` ones are seen by their own side alone. */
export const agreementRoundSchema = z.object({
  id: uuid,
  /** Of a draft: the number it would get if it were sent now. */
  number: z.number().int(),
  side: sideSchema,
  /** `answered`: the other side sent a changed one. `replaced`: its own side took a clause out of it. */
  state: z.enum(roundStates),
  clauses: z.array(clauseSchema),
  terms: termsSchema,
  effectiveOn: calendarDate,
  comment: z.string(),
  /** The round it answers: of a draft the one its writer saw; null for a first proposal. */
  answersRound: z.number().int().nullable(),
  /** Clauses that its own side took out of the round before; `comment` says why. */
  withdrawnClauses: z.array(clauseKeySchema),
  /** The customer's house terms from which it was begun. */
  houseTerms: z.object({ id: uuid, number: z.number().int() }).nullable(),
  caseOf: caseSchema.nullable(),
  /** Who wrote it last; null where the person may not be named to the reader any more. */
  by: z.string().nullable(),
  createdAt: instant,
  /** When it was last saved as a draft, or sent. */
  savedAt: instant,
  sentAt: instant.nullable(),
  /** The version to send back when a draft is changed. */
  rowVersion: z.number().int(),
  /** Clauses that cannot be computed for characteristics of the scope as they stand now. */
  warnings: z.array(warningSchema),
  /** Clauses to look at twice, because they would apply to characteristics of class safety. */
  flags: z.array(flagSchema),
})
export type AgreementRound = z.output<typeof agreementRoundSchema>

/**
 * What a refusal `changed-meanwhile`, `draft-exists` or `round-replaced` carries as `current` of the problem: the
 * draft as somebody else of one's own side saved or sent it (null where it was discarded), so that both texts can be
 * shown and put together. To save over it, send `rowVersion` as `expectedVersion`.
 */
export const draftConflictSchema = z.object({
  agreementId: uuid,
  versionId: uuid,
  draft: agreementRoundSchema
    .pick({
      id: true,
      state: true,
      clauses: true,
      terms: true,
      effectiveOn: true,
      comment: true,
      answersRound: true,
      by: true,
      savedAt: true,
      rowVersion: true,
    })
    .nullable(),
})
export type DraftConflict = z.output<typeof draftConflictSchema>

/** What a comment or a mark is about. */
export const aboutKinds = ['clause', 'terms', 'effective-on'] as const
export const aboutSchema = z
  .object({ kind: z.enum(aboutKinds), clauseKey: clauseKeySchema.nullable().default(null) })
  .refine(({ kind, clauseKey }) => (kind === 'clause') === (clauseKey !== null), {
    path: ['clauseKey'],
    message: 'Name the clause, and only where it is about one.',
  })
export type About = z.output<typeof aboutSchema>

/** What one side said about one thing in a round that was sent; never changed. */
export const agreementCommentSchema = z.object({
  id: uuid,
  round: z.number().int(),
  about: z.object({ kind: z.enum(aboutKinds), clauseKey: clauseKeySchema.nullable() }),
  side: sideSchema,
  by: z.string().nullable(),
  at: instant,
  text: z.string(),
})
export type AgreementComment = z.output<typeof agreementCommentSchema>

/** Since which round a side has accepted a thing as it stands: by writing it itself, or by a mark. */
const acceptedSchema = z.object({
  round: z.number().int(),
  how: z.enum(['written', 'marked']),
  by: z.string().nullable(),
  at: instant,
})
export const acceptanceItemSchema = z.object({
  kind: z.enum(aboutKinds),
  clauseKey: clauseKeySchema.nullable(),
  /** False for a clause that an earlier round had and the standing one leaves out: that too is to be accepted. */
  present: z.boolean(),
  /** Hash of exactly what would be accepted; a mark names it. */
  sha256: hashSchema,
  supplier: acceptedSchema.nullable(),
  customer: acceptedSchema.nullable(),
})
export type AcceptanceItem = z.output<typeof acceptanceItemSchema>

/** Who has accepted what of the standing round. */
export const acceptanceSchema = z.object({
  round: z.number().int(),
  items: z.array(acceptanceItemSchema),
  /** Sides that have accepted everything. */
  everythingBy: z.array(sideSchema),
})
export type Acceptance = z.output<typeof acceptanceSchema>

/** Why a move that state and role allow cannot be made now. */
export const agreementHindranceSchema = z.object({
  move: z.enum(agreementMoveNames),
  code: z.enum([
    'no-clauses',
    'clauses-cannot-be-agreed',
    'effective-date-past',
    'negotiation-open',
    'limits-changed',
    'own-side-has-signed',
    'last-clause',
    'round-replaced',
  ]),
})
export type AgreementHindrance = z.output<typeof agreementHindranceSchema>

export const agreementStateSchema = z.enum(agreementVersionStates)

export const agreementVersionSchema = z.object({
  id: uuid,
  /** Null for a draft. */
  number: z.number().int().nullable(),
  state: agreementStateSchema,
  begunBy: sideSchema,
  /** From agreement on: first day in force, the canonical text, and its SHA-256. */
  effectiveOn: calendarDate.nullable(),
  text: z.string().nullable(),
  sha256: hashSchema.nullable(),
  createdAt: instant,
  agreedAt: instant.nullable(),
  signedAt: instant.nullable(),
  withdrawnAt: instant.nullable(),
  withdrawnBy: sideSchema.nullable(),
  withdrawnReason: z.string().nullable(),
  /** The challenge attached to the newest proposal that has one. */
  caseOf: caseSchema.nullable(),
  /** The version to send back with every move that is not about a draft. */
  rowVersion: z.number().int(),
  waitsOn: z.array(sideSchema),
  /** Moves that this person may make now; those listed under hindrances are allowed, but refused for the reason. */
  moves: z.array(z.enum(agreementMoveNames)),
  hindrances: z.array(agreementHindranceSchema),
  /** In the order they were made; an unsent answer of one's own side is the last, with state `draft`. */
  rounds: z.array(agreementRoundSchema),
  /** In the order they were written. */
  comments: z.array(agreementCommentSchema),
  /** Of the round that stands or stood last; null for a version never sent. */
  acceptance: acceptanceSchema.nullable(),
  signatures: z.array(
    z.object({ side: sideSchema, name: z.string().nullable(), sha256: hashSchema, signedAt: instant }),
  ),
})
export type AgreementVersion = z.output<typeof agreementVersionSchema>
