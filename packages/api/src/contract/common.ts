import { units } from '@evenrule/metrology'
import { z } from 'zod'
import { roles, sides } from './access'

export const uuid = z.uuid()
export const roleSchema = z.enum(roles)
export const sideSchema = z.enum(sides)
/** An instant, ISO 8601 in UTC. */
export const instant = z.iso.datetime()
/** A calendar date, judged in the relationship's time zone. */
export const calendarDate = z.iso.date('Enter a day, such as 2026-10-14.')

const forbidden =
  // eslint-disable-next-line no-control-regex -- the control characters are what is refused
  /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f]|[\ud800-\udbff](?![\udc00-\udfff])|(?<![\ud800-\udbff])[\udc00-\udfff]/
const storable = (schema: z.ZodString) =>
  schema.refine((value) => !forbidden.test(value), {
    message: 'Contains a character that cannot be stored; remove control characters.',
  })

/** One line of text that a person typed. */
export const line = (maximum = 200) =>
  storable(
    z.string().trim().min(1, 'Enter something here.').max(maximum, `Shorten this to ${maximum} characters.`),
  )
/** Text of several lines; may be empty. */
export const paragraph = (maximum = 4000) =>
  storable(z.string().trim().max(maximum, `Shorten this to ${maximum} characters.`))

/** An e-mail address; two that differ by case alone are the same. */
export const emailAddress = z
  .string()
  .trim()
  .max(254, 'Shorten this to 254 characters.')
  .pipe(z.email('Enter an e-mail address, such as name@company.example.'))

/**
 * A number kept as the text that was entered (so that 24.000 keeps its zeros), with a decimal comma turned
 * into a point. The digits are the record; the double is derived where it is used.
 */
export const decimalText = z
  .string()
  .trim()
  .transform((text) =>
    text
      .replace(/^\u2212/, '-')
      .replace(',', '.')
      .replace(/\s/g, ''),
  )
  .pipe(
    z
      .string()
      .max(40, { error: 'Shorten this number to 40 characters.', abort: true })
      // What is no number is not looked at any further, by the rules of the object around it either.
      .regex(/^[+-]?(\d+(\.\d*)?|\.\d+)(e[+-]?\d{1,3})?$/i, {
        error: 'Enter a number, such as 24.025.',
        abort: true,
      })
      .refine((text) => Number.isFinite(Number(text)), 'This number is too large.'),
  )
export const positiveDecimalText = decimalText.refine(
  (text) => Number(text) > 0,
  'Enter a number above zero.',
)

/** Query of a paged list. `sort` is a column name, with `-` before it for descending. */
export const pageQuery = z.object({
  page: z.coerce.number().int().min(1).max(100_000).default(1),
  size: z.coerce.number().int().min(1).max(100).default(25),
  sort: z.string().max(40).optional(),
  search: z.string().trim().max(100).optional(),
})
export type PageQuery = z.output<typeof pageQuery>

/** `sort` of one list: its allow-list of columns, the first (or the one named) by default. */
export const sortBy = <const K extends string>(columns: readonly K[], standard?: NoInfer<K | `-${K}`>) =>
  z
    .enum(
      columns.flatMap((column): (K | `-${K}`)[] => [column, `-${column}`]),
      `Sort by one of ${columns.join(', ')}, with - before it for descending.`,
    )
    .default((standard ?? columns[0]) as never)

/** Answer of a paged list. */
export const pageOf = <T extends z.ZodType>(item: T) =>
  z.object({ items: z.array(item), total: z.number().int(), page: z.number().int(), size: z.number().int() })

export const organisationParams = z.object({ organisationId: uuid })
/** Params of a tenant route with further ids, each a UUID. */
export const paramsWith = <const K extends string>(...names: K[]) =>
  organisationParams.extend(Object.fromEntries(names.map((name) => [name, uuid])) as Record<K, typeof uuid>)

/** The version of a row that the sender saw; a change by somebody else since then is refused with 409. */
export const expectedVersion = z.number().int().min(1)

/** RFC 9457 problem details, with a stable code, and for bad input the places and mends. */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  code: z.string(),
  detail: z.string().optional(),
  /** Present on unexpected errors: the id under which the log has the details. */
  id: z.string().optional(),
  /** What stands now, where somebody else changed it meanwhile; the endpoint's contract says in what shape. */
  current: z.record(z.string(), z.unknown()).optional(),
  errors: z
    .array(
      z.object({
        path: z.string(),
        message: z.string(),
        row: z.number().optional(),
        column: z.string().optional(),
      }),
    )
    .optional(),
})
export type Problem = z.output<typeof problemSchema>

/** A unit of the closed list; its home, with the exact conversions, is the computation package. */
export const unitSchema = z.enum(
  units.map(({ symbol }) => symbol),
  'Choose a unit from the list.',
)
