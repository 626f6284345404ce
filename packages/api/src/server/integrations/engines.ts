import { readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { pathToFileURL } from 'node:url'
import type { ClauseInput, ClauseOutput, ErrorOutput, Output } from '@evenrule/metrology'
import { canonicalText, sha256 } from '../modules/record/record.append'

export interface EngineRelease {
  version: string
  sha256: string
  file: string
}

/** One evaluation as it is stored: the canonical texts are the original, the hash names the output's. */
export interface StoredEvaluation {
  inputText: string
  outputText: string
  outputSha256: string
  engineVersion: string
  engineSha256: string
}

interface EngineModule {
  evaluate(input: unknown): Output | ErrorOutput
  canonicalText(value: unknown): string
}

/** The released bundles of the computation, each kept by its hash so that old evaluations can be recomputed. */
export interface Engines {
  readonly current: EngineRelease
  readonly releases: readonly EngineRelease[]
  /** Runs any input of the contract on the newest release. */
  evaluate(input: unknown): Promise<Output | ErrorOutput>
  /** Evaluates one clause on the newest release and returns what is stored of it. */
  evaluateClause(input: ClauseInput): Promise<{ output: ClauseOutput; stored: StoredEvaluation }>
  /** Recomputes a stored evaluation on the release that made it. */
  recompute(stored: StoredEvaluation): Promise<{ outputText: string; equal: boolean }>
  /** The text of a release's module, for the browser's own recompute; undefined where unknown. */
  source(hash: string): Promise<string | undefined>
}

/** Opens the folder of released engines and proves that each file is the one its hash names. */
export async function openEngines(folder: string): Promise<Engines> {
  const releases = JSON.parse(await readFile(join(folder, 'index.json'), 'utf8')) as EngineRelease[]
  const current = releases.at(-1)
  if (!current) throw new Error(`No engine is released in ${folder}; run npm run engine:release.`)
  const modules = new Map<string, Promise<EngineModule>>()
  const load = (hash: string): Promise<EngineModule> => {
    const release = releases.find((each) => each.sha256 === hash)
    if (!release) throw new Error(`No engine with the hash ${hash} is released here.`)
    const loading = modules.get(hash) ?? importRelease(folder, release)
    modules.set(hash, loading)
    return loading
  }
  await load(current.sha256)
  return {
    current,
    releases,
    async evaluate(input) {
      return (await load(current.sha256)).evaluate(input)
    },
    async evaluateClause(input) {
      const engine = await load(current.sha256)
      const answer = engine.evaluate(input)
      if ('error' in answer)
        throw new Error(`The computation refused a clause: ${JSON.stringify(answer.error)}`)
      const output = answer as ClauseOutput
      const outputText = engine.canonicalText(output)
      return {
        output,
        stored: {
          inputText: canonicalText(input),
          outputText,
          outputSha256: sha256(outputText),
          engineVersion: current.version,
          engineSha256: current.sha256,
        },
      }
    },
    async recompute(stored) {
      const engine = await load(stored.engineSha256)
      const outputText = engine.canonicalText(engine.evaluate(JSON.parse(stored.inputText)))
      return {
        outputText,
        equal: outputText === stored.outputText && sha256(outputText) === stored.outputSha256,
      }
    },
    async source(hash) {
      const release = releases.find((each) => each.sha256 === hash)
      return release ? readFile(join(folder, release.file), 'utf8') : undefined
    },
  }
}

async function importRelease(folder: string, release: EngineRelease): Promise<EngineModule> {
  const path = join(folder, release.file)
  if (sha256(await readFile(path)) !== release.sha256)
    throw new Error(`The engine file ${release.file} is not the one that was released.`)
  return (await import(pathToFileURL(path).href)) as EngineModule
}
