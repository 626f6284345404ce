import { recomputeWith, serverEngines } from '../submissions/recompute'
import type { RunOn } from './quote'

/** Runs inputs on released engines, each fetched once and checked against its hash before it is run. */
export function engineRun(addressOf: (sha256: string) => string): RunOn {
  const recompute = recomputeWith(serverEngines(addressOf))
  return (inputText, engineSha256) =>
    recompute({ clauseKey: '', inputText, outputText: '', outputSha256: '', engineVersion: '', engineSha256 })
}
