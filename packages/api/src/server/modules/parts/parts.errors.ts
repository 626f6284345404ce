import { defineError } from '../../errors'

export const isArchived = defineError(
  'archived',
  409,
  (what: string) => `This ${what} is archived. Restore it before changing it.`,
)
export const isNotArchived = defineError(
  'not-archived',
  409,
  (what: string) => `This ${what} is not archived.`,
)
export const limitsFrozen = defineError(
  'limits-frozen',
  409,
  (agreement: string) =>
    `${agreement} rests on these limits, so nominal, limits, unit and class can no longer change here. Add a new revision of the part and change them there.`,
)
export const spreadFrozen = defineError(
  'spread-frozen',
  409,
  (agreement: string) =>
    `${agreement} has a clause that takes a share of the process variation, so the standard deviation of the process can no longer change here. Add a new revision of the part and change it there.`,
)
export const customerStandsBehind = defineError(
  'confirmed-by-customer',
  409,
  (what: string) => `The customer confirmed this ${what}, so only the customer can archive it. Ask them to.`,
)
export const alreadyConfirmed = defineError(
  'already-confirmed',
  409,
  'The customer has already confirmed this characteristic.',
)
export const noEarlierRevision = defineError(
  'no-earlier-revision',
  409,
  'This part has only one revision, so there are no measuring tasks to take over.',
)
export const otherQuantity = defineError(
  'unit-of-another-quantity',
  409,
  (unit: string) =>
    `Gauges that read another quantity measure this characteristic, so its unit cannot become ${unit}. Archive their measuring tasks first.`,
)
