import { asc, sql } from 'drizzle-orm'
import { contentOf } from '../../../contract/submission-content'
import { checkSubmission, type ClauseProblem } from '../../../contract/submission-check'
import type { RecordCheck } from '../../../contract/record'
import type { Database, Transaction } from '../../db/database'
import type { Engines } from '../../integrations/engines'
import { recomputeOn } from '../submissions/submissions.verify.service'
import { submissionSignatures, submissionTexts } from '../submissions/submissions.table'
import { recomputeChain } from './record.chain'
import { selectSubmissionEvaluations } from './record.frozen.repository'

export interface CheckedChain extends RecordCheck {
  /** Whose chain it is: an organisation's name, or those of supplier and customer. */
  name: string
}

export interface CheckedText {
  submissionId: string
  /** What people call it: its number and whose it is; its id where the text cannot be read any more. */
  name: string
  revision: number
  evaluations: number
  /** What differs, in short; null where nothing does. */
  fault: string | null
  /** Engines that it names and that are not kept here, so that nobody can tell whether it computes again. */
  withoutEngines: { version: string; sha256: string }[]
}

export interface VerifiedRecord {
  chains: CheckedChain[]
  texts: CheckedText[]
}

/**
 * Recomputes every chain of the database and every frozen evaluation on the engine it names, in one snapshot that
 * changes nothing. For the owner of the database, who sees all organisations.
 */
export async function verifyWholeRecord(
  database: Database,
  engines: Engines,
  knownHash?: string,
): Promise<VerifiedRecord> {
  return database.transaction(
    async (tx) => {
      const chains: CheckedChain[] = []
      for (const { id, name } of await selectChains(tx))
        chains.push({ name, ...(await recomputeChain({ tx }, id, knownHash)) })
      return { chains, texts: await checkTexts(tx, engines) }
    },
    { isolationLevel: 'repeatable read', accessMode: 'read only' },
  )
}

/** Every chain there is a trace of, by its head or by its events. */
async function selectChains(tx: Transaction): Promise<{ id: string; name: string }[]> {
  const { rows } = await tx.execute<{ id: string; name: string }>(sql`
    select c.id, coalesce(o.name || ' (journal)', s.name || ' → ' || b.name, c.id::text) as name
    from (select chain_id as id from record_heads union select chain_id from record_events) c
    left join organisations o on o.id = c.id
    left join relationships r on r.id = c.id
    left join organisations s on s.id = r.supplier_org_id
    left join organisations b on b.id = r.customer_org_id
    order by o.name is null, name, c.id`)
  return rows
}

async function checkTexts(tx: Transaction, engines: Engines): Promise<CheckedText[]> {
  const { submissionId, revision, text, sha256 } = submissionTexts
  const texts = await tx
    .select({ submissionId, revision, text, sha256 })
    .from(submissionTexts)
    .orderBy(asc(submissionTexts.frozenAt), asc(submissionId), asc(revision))
  const signatures = await tx.select().from(submissionSignatures)
  const checked: CheckedText[] = []
  for (const frozen of texts) {
    const evaluations = await selectSubmissionEvaluations({ tx }, frozen)
    const previous = texts.find(
      (each) => each.submissionId === frozen.submissionId && each.revision === frozen.revision - 1,
    )
    const check = await checkSubmission(
      {
        ...{ text: frozen.text, sha256: frozen.sha256, evaluations, previousText: previous?.text },
        signatures: signatures.filter(
          (each) => each.submissionId === frozen.submissionId && each.revision === frozen.revision,
        ),
      },
      recomputeOn(engines),
    )
    checked.push({
      ...{ submissionId: frozen.submissionId, revision: frozen.revision },
      name: nameOf(frozen),
      evaluations: evaluations.length,
      fault: faultIn(check),
      withoutEngines: missingEngines(check),
    })
  }
  return checked
}

function nameOf({ text, submissionId }: { text: string; submissionId: string }): string {
  const content = contentOf(text)
  if (!content) return `submission ${submissionId}`
  const { number, relationship } = content
  return `submission ${number} of ${relationship.supplier.name} → ${relationship.customer.name}`
}

const problemWords: Record<Exclude<ClauseProblem, 'engine-unavailable'>, string> = {
  missing: 'is gone',
  'not-in-text': 'is not in the signed text',
  'input-altered': 'has another input than was signed',
  'output-altered': 'has another output than was signed',
  'verdict-altered': 'shows another verdict than was computed',
  'engine-altered': 'cannot be recomputed: its engine is not the one that was released',
  'recomputed-differs': 'gives another result when it is computed again',
}

type Check = Awaited<ReturnType<typeof checkSubmission>>

/** What was changed; an engine that is not kept here proves nothing either way, so it is told apart. */
function faultIn({ text, signatures, data, clauses, corrects }: Check): string | null {
  if (!text.equal) return 'the signed text was changed'
  const signature = signatures.find(({ equal }) => !equal)
  if (signature) return `a signature (${signature.meaning}) names another text`
  const study = data.find(({ equal }) => !equal)
  if (study) return `the readings of ${study.study} were changed`
  for (const { clauseKey, equal, problem } of clauses)
    if (!equal && problem !== 'engine-unavailable')
      return `the evaluation of ${clauseKey} ${problem ? problemWords[problem] : 'differs'}`
  return corrects && !corrects.equal ? 'it names another text as the one it corrects' : null
}

function missingEngines({ clauses }: Check): CheckedText['withoutEngines'] {
  const missing = clauses.filter(({ problem }) => problem === 'engine-unavailable')
  return [
    ...new Map(
      missing.map(({ engineVersion: version, engineSha256: sha256 }) => [sha256, { version, sha256 }]),
    ).values(),
  ]
}
