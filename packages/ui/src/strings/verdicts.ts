import type { Verdict } from '@evenrule/metrology'

/** The words that always stand beside a verdict's mark. */
export const verdictWords: Record<Verdict, string> = {
  meets: 'meets',
  'meets-with-conditions': 'meets with conditions',
  'falls-short': 'falls short',
  'not-shown': 'not shown',
}

/** What a clause would come to under a what-if: never the word of a verdict. */
export const supposedWords: Record<Verdict, string> = {
  meets: 'would meet',
  'meets-with-conditions': 'would meet with conditions',
  'falls-short': 'would fall short',
  'not-shown': 'would not be shown',
}
