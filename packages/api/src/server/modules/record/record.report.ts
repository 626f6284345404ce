import type { CheckedChain, CheckedText, VerifiedRecord } from './record.verify'

const faults: Record<NonNullable<CheckedChain['broken']>['fault'], string> = {
  missing: 'it is missing',
  'text-changed': 'its text and its hash do not belong together',
  misplaced: 'its text names another chain or another place',
  'link-broken': 'it does not follow from the event before',
  'columns-changed': 'day, person or subject are not those of its text',
  'frozen-changed': 'what it froze is no longer what it names',
  added: 'it was put in past the end',
  'end-changed': 'the end of the chain names another last event',
  'end-missing': 'the end of the chain is gone',
}

function lineOf({ name, sound, last, broken }: CheckedChain): string {
  if (broken)
    return `BROKEN  ${name}: event ${broken.sequence}${broken.type ? ` (${broken.type})` : ''}, ${faults[broken.fault]}; ${sound} events before it stand`
  const events = `${sound} ${sound === 1 ? 'event' : 'events'}`
  return `whole   ${name}: ${events}, last hash ${last?.hash ?? 'none'}${last ? ` of ${last.at}` : ''}`
}

const textLine = ({ name, revision, fault }: CheckedText): string =>
  `BROKEN  ${name}, revision ${revision}: ${fault ?? ''}`

const notHereLine = ({ name, revision, withoutEngines }: CheckedText): string =>
  `OPEN    ${name}, revision ${revision}: cannot be recomputed here: ${withoutEngines
    .map(({ version, sha256 }) => `engine ${version} (${sha256})`)
    .join(' and ')} is not kept`

/** What the texts came to, in one line. */
function sumOf(texts: readonly CheckedText[], broken: number, open: number): string {
  const computed = texts.filter(({ withoutEngines }) => withoutEngines.length === 0)
  const evaluations = computed.reduce((sum, text) => sum + text.evaluations, 0)
  const outcome = broken === 0 ? 'all equal' : `${broken} not equal`
  const rest = open === 0 ? '' : ` ${open} cannot be recomputed here.`
  return `${computed.length} signed texts and ${evaluations} evaluations recomputed, ${outcome}.${rest}`
}

const endings = {
  0: 'The record is whole.',
  1: 'The record is broken.',
  2: 'Nothing is broken, but not everything could be checked: put the engines back that are named.',
}

/**
 * What a check of the whole record has found, line by line, and the status for whoever runs it: 0 when everything
 * is whole, 1 when something is broken, 2 when not everything could be checked.
 */
export function reportOf(
  { chains, texts }: VerifiedRecord,
  knownHash?: string,
): { lines: string[]; status: 0 | 1 | 2 } {
  const broken = texts.filter(({ fault }) => fault !== null)
  const open = texts.filter(({ fault, withoutEngines }) => fault === null && withoutEngines.length > 0)
  const holder = chains.find(({ known }) => known !== null)
  const isWhole =
    chains.every((chain) => chain.broken === null) &&
    broken.length === 0 &&
    (knownHash === undefined || holder !== undefined)
  const status = isWhole ? (open.length > 0 ? 2 : 0) : 1
  const kept = holder?.known
    ? `The hash you kept is that of event ${holder.known.sequence} of ${holder.name}.`
    : 'BROKEN  The hash you kept is nowhere in the record: it was rewritten since then.'
  const lines = [
    ...chains.map(lineOf),
    ...broken.map(textLine),
    ...open.map(notHereLine),
    sumOf(texts, broken.length, open.length),
    ...(knownHash === undefined ? [] : [kept]),
    endings[status],
  ]
  return { lines, status }
}
