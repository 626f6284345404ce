import { openDatabase } from './db/database'
import { openEngines } from './integrations/engines'
import { verifyWholeRecord, type CheckedChain, type CheckedText } from './modules/record/record.verify'

/*
 * Recomputes the whole record from the database, with every frozen text and evaluation:
 *   npm run -s verify-record [-- <hash kept from an earlier check>]
 * Exit status 0 when everything is whole, 1 when something is broken, 2 when it could not be checked, or not all of it.
 */

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

async function main(): Promise<number> {
  const url = process.env.MIGRATOR_DATABASE_URL
  if (!url) throw new Error('MIGRATOR_DATABASE_URL is missing.')
  const knownHash = process.argv[2]
  if (knownHash !== undefined && !/^[0-9a-f]{64}$/.test(knownHash))
    throw new Error(`"${knownHash}" is no hash: give 64 characters, 0 to 9 and a to f.`)
  const { database, pool } = openDatabase(url, 1)
  try {
    const engines = await openEngines(process.env.ENGINES_DIR ?? 'packages/metrology/released')
    const { chains, texts } = await verifyWholeRecord(database, engines, knownHash)
    for (const chain of chains) console.log(lineOf(chain))
    const broken = texts.filter(({ fault }) => fault !== null)
    for (const text of broken) console.log(textLine(text))
    const open = texts.filter(({ fault, withoutEngines }) => fault === null && withoutEngines.length > 0)
    for (const text of open) console.log(notHereLine(text))
    console.log(sumOf(texts, broken.length, open.length))
    const holder = chains.find(({ known }) => known !== null)
    if (knownHash !== undefined)
      console.log(
        holder?.known
          ? `The hash you kept is that of event ${holder.known.sequence} of ${holder.name}.`
          : 'BROKEN  The hash you kept is nowhere in the record: it was rewritten since then.',
      )
    const isWhole =
      chains.every((chain) => chain.broken === null) &&
      broken.length === 0 &&
      (knownHash === undefined || holder !== undefined)
    if (!isWhole) console.log('The record is broken.')
    else if (open.length > 0)
      console.log(
        'Nothing is broken, but not everything could be checked: put the engines back that are named.',
      )
    else console.log('The record is whole.')
    return isWhole ? (open.length > 0 ? 2 : 0) : 1
  } finally {
    await pool.end()
  }
}

try {
  process.exitCode = await main()
} catch (error) {
  console.error(`The record could not be checked: ${error instanceof Error ? error.message : String(error)}`)
  process.exitCode = 2
}
