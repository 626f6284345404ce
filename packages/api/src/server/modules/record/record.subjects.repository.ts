import { and, eq, inArray } from 'drizzle-orm'
import { alias } from 'drizzle-orm/pg-core'
import type { RecordSubject } from '../../../contract/record'
import type { Tenant } from '../../db/tenant'
import { agreements, agreementVersions } from '../agreements/agreements.table'
import { gauges, referenceStandards } from '../gauges/gauges.table'
import { houseTerms } from '../house-terms/house-terms.table'
import { invitations } from '../invitations/invitations.table'
import { files } from '../files/files.table'
import { imports } from '../imports/imports.table'
import { namesOfPeople } from '../organisations/people.repository'
import { organisations } from '../organisations/organisations.table'
import { characteristics, measuringTasks, parts } from '../parts/parts.table'
import { relationships } from '../relationships/relationships.table'
import { requests } from '../requests/requests.table'
import { challenges } from '../reviews/reviews.table'
import { studies } from '../studies/studies.table'
import { submissions } from '../submissions/submissions.table'

/** What people call a subject, and the id of the page that shows it. */
export interface SubjectName {
  id: string
  label: string
  pageId: string
}
type Finder = (tenant: Tenant, ids: string[]) => Promise<SubjectName[]>

const finders: Record<RecordSubject, Finder> = {
  part: async ({ tx }, ids) => {
    const rows = await tx
      .select({ id: parts.id, label: parts.number })
      .from(parts)
      .where(inArray(parts.id, ids))
    return rows.map((row) => ({ ...row, pageId: row.id }))
  },
  characteristic: async ({ tx }, ids) => {
    const rows = await tx
      .select({
        id: characteristics.id,
        number: characteristics.number,
        name: characteristics.name,
        part: parts.number,
        pageId: parts.id,
      })
      .from(characteristics)
      .innerJoin(
        parts,
        and(eq(parts.relationshipId, characteristics.relationshipId), eq(parts.id, characteristics.partId)),
      )
      .where(inArray(characteristics.id, ids))
    return rows.map(({ id, number, name, part, pageId }) => ({
      id,
      label: `${part} no. ${number} ${name}`,
      pageId,
    }))
  },
  'measuring-task': async ({ tx }, ids) => {
    const rows = await tx
      .select({
        id: measuringTasks.id,
        gauge: measuringTasks.gaugeCode,
        characteristic: characteristics.name,
        part: parts.number,
      })
      .from(measuringTasks)
      .innerJoin(
        characteristics,
        and(
          eq(characteristics.relationshipId, measuringTasks.relationshipId),
          eq(characteristics.id, measuringTasks.characteristicId),
        ),
      )
      .innerJoin(
        parts,
        and(eq(parts.relationshipId, measuringTasks.relationshipId), eq(parts.id, measuringTasks.partId)),
      )
      .where(inArray(measuringTasks.id, ids))
    return rows.map(({ id, gauge, characteristic, part }) => ({
      id,
      label: `${gauge} on ${part} ${characteristic}`,
      pageId: id,
    }))
  },
  'agreement-version': async ({ tx }, ids) => {
    const rows = await tx
      .select({
        id: agreementVersions.id,
        version: agreementVersions.number,
        agreement: agreements.number,
        pageId: agreements.id,
      })
      .from(agreementVersions)
      .innerJoin(
        agreements,
        and(
          eq(agreements.relationshipId, agreementVersions.relationshipId),
          eq(agreements.id, agreementVersions.agreementId),
        ),
      )
      .where(inArray(agreementVersions.id, ids))
    return rows.map(({ id, version, agreement, pageId }) => ({
      id,
      label: agreement === null ? '' : version === null ? `${agreement}` : `${agreement}, version ${version}`,
      pageId,
    }))
  },
  study: async ({ tx }, ids) => {
    const rows = await tx
      .select({ id: studies.id, label: studies.code })
      .from(studies)
      .where(inArray(studies.id, ids))
    return rows.map((row) => ({ ...row, pageId: row.id }))
  },
  submission: async ({ tx }, ids) => {
    const rows = await tx
      .select({ id: submissions.id, number: submissions.number })
      .from(submissions)
      .where(inArray(submissions.id, ids))
    return rows.map(({ id, number }) => ({ id, label: number === null ? '' : `${number}`, pageId: id }))
  },
  challenge: async ({ tx }, ids) => {
    const rows = await tx
      .select({
        id: challenges.id,
        number: challenges.number,
        submission: submissions.number,
        pageId: submissions.id,
      })
      .from(challenges)
      .innerJoin(
        submissions,
        and(
          eq(submissions.relationshipId, challenges.relationshipId),
          eq(submissions.id, challenges.submissionId),
        ),
      )
      .where(inArray(challenges.id, ids))
    return rows.map(({ id, number, submission, pageId }) => ({
      id,
      label: `${number} of submission ${submission ?? '–'}`,
      pageId,
    }))
  },
  request: async ({ tx }, ids) => {
    const rows = await tx
      .select({ id: requests.id, number: requests.number })
      .from(requests)
      .where(inArray(requests.id, ids))
    return rows.map(({ id, number }) => ({ id, label: `${number}`, pageId: id }))
  },
  'house-terms': async ({ tx }, ids) => {
    const rows = await tx
      .select({ id: houseTerms.id, number: houseTerms.number })
      .from(houseTerms)
      .where(inArray(houseTerms.id, ids))
    return rows.map(({ id, number }) => ({ id, label: number === null ? 'draft' : `${number}`, pageId: id }))
  },
  gauge: async ({ tx }, ids) => {
    const rows = await tx
      .select({ id: gauges.id, code: gauges.code, name: gauges.name })
      .from(gauges)
      .where(inArray(gauges.id, ids))
    return rows.map(({ id, code, name }) => ({ id, label: `${code} ${name}`, pageId: id }))
  },
  'reference-standard': async ({ tx }, ids) => {
    const rows = await tx
      .select({ id: referenceStandards.id, code: referenceStandards.code, name: referenceStandards.name })
      .from(referenceStandards)
      .where(inArray(referenceStandards.id, ids))
    return rows.map(({ id, code, name }) => ({ id, label: `${code} ${name}`, pageId: id }))
  },
  import: async ({ tx }, ids) => {
    const rows = await tx
      .select({ id: imports.id, label: files.name })
      .from(imports)
      .innerJoin(files, and(eq(files.orgId, imports.orgId), eq(files.id, imports.fileId)))
      .where(inArray(imports.id, ids))
    return rows.map((row) => ({ ...row, pageId: row.id }))
  },
  member: async (tenant, ids) =>
    [...(await namesOfPeople(tenant, ids))].map(([id, label]) => ({ id, label, pageId: id })),
  invitation: async ({ tx }, ids) => {
    const rows = await tx
      .select({ id: invitations.id, email: invitations.email, supplier: invitations.supplierName })
      .from(invitations)
      .where(inArray(invitations.id, ids))
    return rows.map(({ id, email, supplier }) => ({ id, label: supplier ?? email, pageId: id }))
  },
  relationship: async ({ tx }, ids) => {
    const supplier = alias(organisations, 'supplier')
    const customer = alias(organisations, 'customer')
    const rows = await tx
      .select({ id: relationships.id, supplier: supplier.name, customer: customer.name })
      .from(relationships)
      .innerJoin(supplier, eq(supplier.id, relationships.supplierOrgId))
      .innerJoin(customer, eq(customer.id, relationships.customerOrgId))
      .where(inArray(relationships.id, ids))
    return rows.map((row) => ({ id: row.id, label: `${row.supplier} and ${row.customer}`, pageId: row.id }))
  },
  organisation: async ({ tx }, ids) => {
    const rows = await tx
      .select({ id: organisations.id, label: organisations.name })
      .from(organisations)
      .where(inArray(organisations.id, ids))
    return rows.map((row) => ({ ...row, pageId: row.id }))
  },
}

/** Names of the subjects of events, by id; those that this organisation may not see are not in the map. */
export async function namesOfSubjects(
  tenant: Tenant,
  subjects: readonly { type: RecordSubject; id: string }[],
): Promise<Map<string, SubjectName>> {
  const byType = new Map<RecordSubject, Set<string>>()
  for (const { type, id } of subjects) byType.set(type, (byType.get(type) ?? new Set()).add(id))
  const names = new Map<string, SubjectName>()
  // One after the other: they share the transaction's connection.
  for (const [type, ids] of byType)
    for (const name of await finders[type](tenant, [...ids])) names.set(name.id, name)
  return names
}
