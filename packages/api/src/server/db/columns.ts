import { sql, type SQL } from 'drizzle-orm'
import { customType, foreignKey, pgPolicy, uuid, type AnyPgColumn } from 'drizzle-orm/pg-core'
import { v7 } from 'uuid'

export const newId = (): string => v7()

/** SQL: the organisation and the person of the running transaction; null (no rows) where none is set. */
export const currentOrg = `nullif(current_setting('app.org_id', true), '')::uuid`
export const currentUser = `nullif(current_setting('app.user_id', true), '')::uuid`

/** An instant as ISO 8601 text in UTC, so that what is stored, signed and shown is the same string. */
export const instant = customType<{ data: string; driverData: string }>({
  dataType: () => 'timestamp (3) with time zone',
  fromDriver: (value) => new Date(value).toISOString(),
})

export const primaryId = () => uuid().primaryKey().$defaultFn(newId)

/** The one organisation that owns the row. */
export const ownerColumn = { orgId: uuid().notNull() }

/** The two organisations that share the row. */
export const sharedColumns = {
  relationshipId: uuid().notNull(),
  supplierOrgId: uuid().notNull(),
  customerOrgId: uuid().notNull(),
}

/**
 * Row security of an organisation binds the program, and the worker's chores, which read as one organisation after the
 * other; what each role may do at all is granted in infra/migrations.
 */
const tenantRoles = ['evenrule_app', 'evenrule_system']

/** Rows of one organisation: seen and written by it alone. */
export const ownerPolicy = (name: string, column = 'org_id') =>
  pgPolicy(`${name}_owner`, {
    as: 'permissive',
    for: 'all',
    to: tenantRoles,
    using: sql.raw(`${column} = ${currentOrg}`),
    withCheck: sql.raw(`${column} = ${currentOrg}`),
  })

const party = `(supplier_org_id = ${currentOrg} or customer_org_id = ${currentOrg})`

/** Rows of a relationship: seen and written by its two parties. */
export const sharedPolicy = (name: string) =>
  pgPolicy(`${name}_parties`, {
    as: 'permissive',
    for: 'all',
    to: tenantRoles,
    using: sql.raw(party),
    withCheck: sql.raw(party),
  })

/**
 * Narrows what the permissive policy grants; `condition` is SQL over the table's own columns. For a change it is asked
 * of the row before and after; `after` where that is another condition.
 */
export const restrictPolicy = (
  name: string,
  condition: string,
  command: 'all' | 'select' | 'insert' | 'update' | 'delete' = 'all',
  after = condition,
) =>
  pgPolicy(name, {
    as: 'restrictive',
    for: command,
    to: tenantRoles,
    ...(command === 'insert' ? {} : { using: sql.raw(condition) }),
    ...(command === 'select' || command === 'delete' ? {} : { withCheck: sql.raw(after) }),
  })

/** SQL: the row's column names the side that the current organisation has in this row's relationship. */
export const ownSideOnly = (sideColumn: string): string =>
  `((${sideColumn} = 'supplier' and supplier_org_id = ${currentOrg}) or (${sideColumn} = 'customer' and customer_org_id = ${currentOrg}))`

export const supplierOnly = `supplier_org_id = ${currentOrg}`
export const customerOnly = `customer_org_id = ${currentOrg}`

interface SharedTable {
  relationshipId: AnyPgColumn
  supplierOrgId: AnyPgColumn
  customerOrgId: AnyPgColumn
}

/** Foreign-key checks bypass row security, so shared rows refer to the relationship with both parties. */
export const relationshipKey = (
  name: string,
  table: SharedTable,
  relationships: () => Omit<SharedTable, 'relationshipId'> & { id: AnyPgColumn },
) =>
  foreignKey({
    name: `${name}_relationship_fk`,
    columns: [table.relationshipId, table.supplierOrgId, table.customerOrgId],
    foreignColumns: [relationships().id, relationships().supplierOrgId, relationships().customerOrgId] as [
      AnyPgColumn,
      AnyPgColumn,
      AnyPgColumn,
    ],
  })

export type { SQL }
