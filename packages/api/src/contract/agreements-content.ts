import { clauseTypes, parseClause, type Clause } from '@evenrule/metrology'
import { z } from 'zod'
import { problemsOfClause, repeatedClauses } from './agreement-check'
import { calendarDate, uuid } from './common'
import { clauseSchema, frozenCharacteristicSchema, partySchema, scopeKinds } from './frozen'
import { termsSchema, type Terms } from './terms'

/** A clause as sent: every field wrong with it is named. */
const enteredClause = z
  .custom<Clause>((value) => typeof value === 'object' && value !== null, 'This is not a clause.')
  .transform((value, context): Clause => {
    const problems = problemsOfClause(value)
    for (const { path, message } of problems)
      context.addIssue({ code: 'custom', path: path ? path.split('.') : [], message })
    return problems.length > 0 ? z.NEVER : parseClause(value)
  })

/** The clauses of a proposal; at most one for each subject and measure. */
export const enteredClauses = z
  .array(enteredClause)
  .max(clauseTypes.length * 4, 'These are more clauses than there are subjects.')
  .superRefine((clauses, context) => {
    for (const place of repeatedClauses(clauses))
      context.addIssue({
        code: 'custom',
        path: [place],
        message: 'Another clause here judges the same thing. Keep one of the two.',
      })
  })

/** Subject and measure, by which clauses of two proposals or scopes meet. */
export const clauseKeySchema = z.string().min(1).max(200)

/** Everything a proposal says that can be agreed on. */
export interface RoundContent {
  clauses: readonly Clause[]
  terms: Terms
  effectiveOn: string
}

/** What an agreement covers, named as people name it. */
export const agreementScopeSchema = z.object({
  kind: z.enum(scopeKinds),
  partId: uuid.nullable(),
  partNumber: z.string().nullable(),
  partName: z.string().nullable(),
  characteristicId: uuid.nullable(),
  characteristicNumber: z.number().int().nullable(),
  characteristicName: z.string().nullable(),
  /** The revision to which the one characteristic belongs. */
  revision: z.string().nullable(),
})
export type AgreementScope = z.output<typeof agreementScopeSchema>

/** A characteristic in scope as it stands now: what consequences are computed from. */
export const scopedCharacteristicSchema = frozenCharacteristicSchema.extend({ partId: uuid })
export type ScopedCharacteristic = z.output<typeof scopedCharacteristicSchema>

/** The signed text, RFC 8785, in the form `evenrule.agreement/1`. */
export const agreementTextSchema = z.object({
  format: z.literal('evenrule.agreement/1'),
  agreement: z.number().int(),
  version: z.number().int(),
  supplier: partySchema,
  customer: partySchema,
  timeZone: z.string(),
  scope: agreementScopeSchema,
  /** With their limits, where the scope is narrower than the relationship. */
  characteristics: z.array(scopedCharacteristicSchema),
  clauses: z.array(clauseSchema),
  terms: termsSchema,
  effectiveOn: calendarDate,
})
export type AgreementText = z.output<typeof agreementTextSchema>
