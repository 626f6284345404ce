import type { agreements } from '@evenrule/api/contract'
import { comparisonWords as words } from '../../strings/agreements'
import { problemWords } from '../../strings/problems'
import { safetyFlagWords } from '../../strings/agreementActs'

type Notes = Pick<agreements.AgreementRound, 'warnings' | 'flags'>

/** What is to be known of the clause at a place: that it is weak for class safety, and where it cannot be computed. */
export function comparisonNotes(
  warnings: Notes['warnings'],
  flags: Notes['flags'],
): (place: number) => { flag: string; warnings: string[] } {
  return (place) => {
    const flag = flags.find(({ clause }) => clause === place)
    return {
      flag: flag ? safetyFlagWords[flag.code](flag.count) : '',
      warnings: warnings
        .filter(({ clause }) => clause === place)
        .map(({ code, count }) => words.notFor(count, problemWords[code])),
    }
  }
}
