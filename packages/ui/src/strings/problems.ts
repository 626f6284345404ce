import type { ProblemCode } from '@evenrule/metrology'
import type { NumberProblem } from '../format'

/** Why a field of a clause cannot stand as it is, with the mend. */
export const problemWords: Record<ProblemCode, string> = {
  missing: 'Fill this in.',
  'not-a-number': 'Enter a number, such as 0.05.',
  'not-an-integer': 'Enter a whole number.',
  'not-a-boolean': 'Choose yes or no.',
  'not-an-object': 'Something is missing here; fill in all its parts.',
  'not-text': 'Enter text here.',
  'not-a-choice': 'Choose one of the entries offered.',
  'too-small': 'This is too small.',
  'too-large': 'This is too large.',
  'unknown-field': 'This field does not belong to the clause; leave it out.',
  'unknown-clause-type': 'This kind of clause is not known; choose another.',
  'no-tolerance-width':
    'The characteristic has no two-sided tolerance. Name what stands in for its width, a value with its unit, or a share of process variation.',
  'no-process-spread':
    'The process variation of this characteristic is not known. Enter it with the characteristic, or choose another base.',
  'unit-unknown': 'This unit is not known; choose one from the list.',
  'unit-of-another-quantity':
    'This unit measures something else than the characteristic; choose one of the same quantity.',
  'bound-beyond-limit':
    'The natural bound must lie on the other side of the limit of the characteristic; enter it in its unit.',
  'too-long': 'This is too long; shorten it.',
  'margin-below-resolution':
    'The margin is smaller than one step of the gauge, so nothing could show it. Widen the margin or use a finer gauge.',
}

/** Why a typed text is not a number, with the mend. */
export const numberProblemWords: Record<NumberProblem, string> = {
  empty: 'Enter a number.',
  'not-a-number': 'Enter a number only, such as 24.0012 or 24,0012; the unit is given beside the field.',
  ambiguous: 'Point and comma are both in this number. Use one of them, for the decimals only.',
  'too-large': 'This number is too large to compute with.',
}
