import { finish } from './finish'
import { InvalidInput } from './input/invalid-input'
import { readCommon } from './input/common'
import { Reader } from './input/reader'
import { kinds } from './kinds'
import type { ErrorOutput, Kind, Output, OutputByKind } from './types'

/**
 * The one entry of the computation: answers one input object of the contract with its output, or with what is wrong
 * and where. Never throws on any input, keeps no state, and gives the same answer everywhere.
 */
export function evaluate<K extends Kind>(input: { kind: K }): OutputByKind[K] | ErrorOutput
export function evaluate(input: unknown): Output | ErrorOutput
export function evaluate(input: unknown): Output | ErrorOutput {
  try {
    return compute(input)
  } catch (error) {
    if (!(error instanceof InvalidInput)) throw error
    return { error: { code: error.code, message: error.message, path: error.path } }
  }
}

function compute(input: unknown): Output {
  const reader = Reader.of(input)
  const kind = reader.text('kind')
  if (!isKind(kind)) {
    const known = Object.keys(kinds).join(', ')
    throw new InvalidInput('unknown-kind', `“${kind}” is not computed here; kinds are ${known}.`, 'kind')
  }
  // Fields that every kind understands are checked for every kind.
  readCommon(reader)
  const output: Output = kinds[kind](reader)
  for (const path of reader.unknownFields()) {
    output.warnings.push({
      code: 'unknown-field',
      message: `The field ${path} is not known for this kind; it was not used.`,
      path,
    })
  }
  return finish(output)
}

function isKind(text: string): text is Kind {
  return Object.prototype.hasOwnProperty.call(kinds, text)
}

/** Whether an answer is an error. */
export function isError(output: Output | ErrorOutput): output is ErrorOutput {
  return 'error' in output
}
