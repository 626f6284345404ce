import { defineError } from '../../errors'

export const noFile = defineError(
  'no-file',
  404,
  'These readings were typed or pasted, so there is no file of them. Read them on the page of the study.',
)
export const standardOfAnotherQuantity = defineError(
  'unit-of-another-quantity',
  409,
  (standard: string, unit: string) =>
    `The certified value of ${standard} is in ${unit} now, which is of another quantity than these readings. Correct the reference standard first.`,
)
