import type { Verdict } from '@evenrule/metrology'

/** The words that always stand beside a verdict's mark. */
export const verdictWords: Record<Verdict, string> = {
  meets: 'meets',
  'meets-with-conditions': 'meets with conditions',
  'falls-short': 'falls short',
  'not-shown': 'not shown',
}
