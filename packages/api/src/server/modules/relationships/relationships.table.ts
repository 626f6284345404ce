import { sql } from 'drizzle-orm'
import { check, foreignKey, index, pgTable, text, unique, uuid } from 'drizzle-orm/pg-core'
import { instant, primaryId, sharedPolicy } from '../../db/columns'
import { organisations } from '../organisations/organisations.table'

export const relationships = pgTable(
  'relationships',
  {
    id: primaryId(),
    supplierOrgId: uuid().notNull(),
    customerOrgId: uuid().notNull(),
    /** Calendar dates of agreements and calibrations are judged here. */
    timeZone: text().notNull(),
    /** The number under which the customer keeps this supplier. */
    supplierNumber: text(),
    createdAt: instant().notNull(),
  },
  (t) => [
    unique('relationships_parties').on(t.id, t.supplierOrgId, t.customerOrgId),
    unique('relationships_pair').on(t.supplierOrgId, t.customerOrgId),
    index('relationships_customer').on(t.customerOrgId),
    check('relationships_two_parties', sql`supplier_org_id <> customer_org_id`),
    foreignKey({
      name: 'relationships_supplier_fk',
      columns: [t.supplierOrgId],
      foreignColumns: [organisations.id],
    }),
    foreignKey({
      name: 'relationships_customer_fk',
      columns: [t.customerOrgId],
      foreignColumns: [organisations.id],
    }),
    sharedPolicy('relationships'),
  ],
)
