import type { ByHandVerdict } from '@evenrule/api/contract/by-hand-verdicts'

/** Clauses that a person judges on a document. */
export const byHandWords = {
  heading: 'What is judged by hand?',
  text: 'The agreement leaves these to a document and a person. Without a document they are not shown.',
  asks: 'The document must show:',
  judge: 'Judge it',
  change: 'Change',
  title: 'What does the document show?',
  document: 'Document',
  documentMissing: 'Choose the document.',
  verdict: 'Verdict',
  chooseVerdict: 'Choose a verdict.',
  reason: 'Why it is judged so',
  reasonMissing: 'Say what the document shows.',
  save: 'Save the judgement',
  clear: 'Take the judgement back',
  verdicts: { meets: 'meets', 'falls-short': 'falls short', 'not-shown': 'not shown' } satisfies Record<
    ByHandVerdict,
    string
  >,
  shownHeading: 'What was judged by hand?',
  shownText: 'By the supplier, on the documents named; they are among the files.',
} as const
