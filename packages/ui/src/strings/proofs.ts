import type { ClauseProblem } from '@evenrule/api/contract'
import { formatCount } from '../format'

/** The recompute: what this browser found. */
export const recomputeWords = {
  heading: 'Does it compute again?',
  text: 'This browser fetches the computation that the text names, checks its hash, computes every clause from the readings and compares the results byte for byte.',
  act: 'Recompute',
  again: 'Recompute again',
  busy: 'Computing …',
  equal: 'Yes. Equal byte for byte.',
  equalText: (clauses: number, studies: number) =>
    `${formatCount(clauses, 'clause result')} and the readings of ${formatCount(studies, 'study', 'studies')}, computed in this browser, have the very hashes that were signed.`,
  equalUnsigned: (clauses: number, studies: number) =>
    `${formatCount(clauses, 'clause result')} and the readings of ${formatCount(studies, 'study', 'studies')}, computed in this browser, have the very hashes that signing would freeze.`,
  differs: 'No. Something differs.',
  differsText: (count: number) =>
    `${formatCount(count, 'check does', 'checks do')} not agree. Do not decide on it before the reason is known.`,
  stored: 'hash named',
  recomputed: 'hash computed here',
  storedValue: 'stored',
  recomputedValue: 'computed here',
  show: (count: number) =>
    count === 1
      ? 'Show the check that agrees, with its hashes'
      : `Show the ${count} checks that agree, with their hashes`,
  hide: 'Hide the checks that agree',
  unchecked: 'Not computed.',
  uncheckedText:
    'The computation that the text names could not be fetched, so this proves nothing either way. What needs no computing agrees.',
  same: 'equal',
  different: 'differs',
  untold: 'not computed',
  path: 'First difference at',
  whole: 'the whole text',
  absent: 'not there',
  theText: 'Text of the submission',
  previousText: 'Text of the revision before it',
  signature: 'Hash named by a signature',
  readingsOf: (study: string) => `Readings of study ${study}`,
  engineIs: (version: string) => `engine ${version}`,
  problems: {
    missing: 'The evaluation that the text names is not there.',
    'not-in-text': 'This evaluation is not named by the signed text.',
    'input-altered': 'The stored input is not the one the text names.',
    'output-altered': 'The stored result is not the one the text names.',
    'verdict-altered': 'The verdict in the text is not the one of its evaluation.',
    'engine-unavailable': 'The computation named could not be fetched. Try again.',
    'engine-altered': 'The computation fetched is not the one with the hash named, so it was not run.',
    'recomputed-differs': 'Computing again gives another result.',
  } satisfies Record<ClauseProblem, string>,
} as const

export const printWords = {
  print: 'Print',
  back: 'Back to the submission',
  title: (number: number | null) => (number === null ? 'Draft of a submission' : `Submission ${number}`),
  unsigned: 'Not signed: a draft of the supplier. It proves nothing to anybody.',
  printed: (when: string) => `Printed ${when}`,
  facts: 'What it is about',
  supplier: 'Supplier',
  customer: 'Customer',
  part: 'Part number',
  characteristic: 'Characteristic',
  class: 'Class',
  gauge: 'Measuring system',
  state: 'State',
  revision: 'Revision',
  resultHashes: 'SHA-256 of each clause result',
  readingsText: (unit: string) => `As entered, in ${unit}, in the order taken.`,
  readingsDeviation: (unit: string) => `As entered, as deviations in ${unit}, in the order taken.`,
} as const
