import { submissions } from '@evenrule/api/contract'
import { EngineProblem, sha256Of, type Recompute } from '@evenrule/api/contract/submission-check'
import type { Client } from '../../session/client'
import type { ReadSubmission } from './reading'

/** The text of the revision before the one shown; undefined for the first. */
export const previousText = async (
  api: Client,
  params: { organisationId: string },
  { content, revision, submission }: ReadSubmission,
): Promise<string | undefined> =>
  content.corrects === null
    ? undefined
    : (
        await api.call(submissions.readSubmission, {
          params: { ...params, submissionId: submission.id },
          query: { revision: revision - 1 },
        })
      ).text

/** What is checked of one revision: its own signatures, and the text it takes the place of. */
export const ofRevision = ({ submission, revision }: ReadSubmission, previous: string | undefined) => ({
  ...submission,
  signatures: submission.signatures.filter((signature) => signature.revision === revision),
  previousText: previous,
})

/** What a released engine offers. */
export interface EngineModule {
  evaluate(input: unknown): unknown
  canonicalText(value: unknown): string
}

/** How this browser gets at an engine; the tests give their own. */
export interface EngineSource {
  /** The text of the module released under a hash; undefined where the server has none. */
  text(sha256: string): Promise<string | undefined>
  /** Runs the module whose bytes have this hash, and no other. */
  load(sha256: string): Promise<EngineModule>
}

const isEngine = (module: unknown): module is EngineModule =>
  typeof module === 'object' &&
  module !== null &&
  typeof (module as EngineModule).evaluate === 'function' &&
  typeof (module as EngineModule).canonicalText === 'function'

/**
 * Recomputes evaluations on the engines they name. Each engine is fetched once, its SHA-256 is computed here and
 * compared with the one named, and only then is it run.
 */
export function recomputeWith(source: EngineSource): Recompute {
  const engines = new Map<string, Promise<EngineModule>>()
  const engine = (sha256: string): Promise<EngineModule> => {
    const loading = engines.get(sha256) ?? checked(source, sha256)
    engines.set(sha256, loading)
    return loading
  }
  return async ({ inputText, engineSha256 }) => {
    const { evaluate, canonicalText } = await engine(engineSha256)
    return canonicalText(evaluate(JSON.parse(inputText)))
  }
}

async function checked(source: EngineSource, sha256: string): Promise<EngineModule> {
  const text = await source.text(sha256).catch(() => undefined)
  if (text === undefined) throw new EngineProblem('engine-unavailable')
  if ((await sha256Of(text)) !== sha256) throw new EngineProblem('engine-altered')
  const module: unknown = await source.load(sha256).catch(() => undefined)
  if (!isEngine(module)) throw new EngineProblem('engine-altered')
  return module
}

/** A SHA-256 in hex as the browser's integrity attribute writes it. */
export function integrityOf(sha256: string): string {
  const bytes = sha256.match(/../g)?.map((pair) => parseInt(pair, 16)) ?? []
  return `sha256-${btoa(String.fromCharCode(...bytes))}`
}

/**
 * Engines from this app's own server. The strict content security policy lets no module run from memory, so the
 * address itself is run; the integrity attribute makes the browser refuse other bytes than those the hash names,
 * and the import then gets the very module that was let through.
 */
export const serverEngines = (addressOf: (sha256: string) => string): EngineSource => ({
  async text(sha256) {
    const answer = await fetch(addressOf(sha256), { credentials: 'same-origin' })
    return answer.ok ? answer.text() : undefined
  },
  async load(sha256) {
    const address = new URL(addressOf(sha256), location.href).href
    const script = document.createElement('script')
    Object.assign(script, { type: 'module', src: address, integrity: integrityOf(sha256) })
    try {
      await new Promise<unknown>((resolve, reject) => {
        script.addEventListener('load', resolve)
        script.addEventListener('error', reject)
        document.head.append(script)
      })
    } finally {
      script.remove()
    }
    return (await import(/* @vite-ignore */ address)) as EngineModule
  },
})
