import { subjects, type ClauseDescriptor, type Judgement } from '../types'

const undecided: Omit<Judgement, 'reason'> = {
  verdict: 'not-shown',
  figure: null,
  interval: null,
  limits: null,
  quantity: 'value',
}

/**
 * Judged by hand on an attached document, where a method is not computed here. The verdict is that of whoever judged it,
 * with their reason; without a document it is not shown.
 */
export const byHand: ClauseDescriptor<'by-hand'> = {
  type: 'by-hand',
  subject: null,
  measure: null,
  subjectOf: ({ parameters }) => parameters.subject,
  keyOf: ({ parameters }) => `${parameters.subject}/by-hand/${slug(parameters.measure)}`,
  basis: 'document',
  studyKind: null,
  fields: [
    { name: 'subject', kind: 'choice', required: true, choices: subjects, default: 'repeatability' },
    { name: 'measure', kind: 'text', required: true, longest: 60 },
    { name: 'asks', kind: 'text', required: true, longest: 1000, lines: true },
  ],
  check: () => [],
  judge: (_clause, { byHand: judged }): Judgement =>
    judged
      ? {
          ...undecided,
          verdict: judged.verdict,
          reason: { code: 'judged-by-hand', documentSha256: judged.documentSha256 },
        }
      : { ...undecided, reason: { code: 'no-document' } },
}

/** A title as part of a key: what differs in capitals or spaces only is one title. */
const slug = (title: string): string =>
  title
    .normalize('NFC')
    .trim()
    .toLowerCase()
    .replace(/[\s/]+/g, '-')
