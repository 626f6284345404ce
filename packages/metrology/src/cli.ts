import { readFileSync } from 'node:fs'
import { evaluate, isError } from './evaluate'
import type { ErrorOutput, Output } from './types'

/**
 * `npm run -s evaluate -- input.json` answers one input object, or an array of them in order; "-" reads standard
 * input. Prints JSON and nothing else; exit status 1 where any input is invalid.
 */
function answer(source: string | undefined): Output | ErrorOutput | (Output | ErrorOutput)[] {
  if (source === undefined) {
    return failure('no-input', 'Name a file with the input, or "-" for standard input.')
  }
  let text: string
  try {
    text = readFileSync(source === '-' ? 0 : source, 'utf8')
  } catch {
    return failure('unreadable', `The file ${source} cannot be read.`)
  }
  let input: unknown
  try {
    input = JSON.parse(text.replace(/^\uFEFF/, ''))
  } catch (error) {
    return failure('invalid-json', `The input is not JSON: ${(error as Error).message}`)
  }
  return Array.isArray(input) ? input.map((each: unknown) => evaluate(each)) : evaluate(input)
}

const failure = (code: string, message: string): ErrorOutput => ({ error: { code, message, path: '' } })

const output = answer(process.argv[2])
process.exitCode = [output].flat().some(isError) ? 1 : 0
process.stdout.write(`${JSON.stringify(output)}\n`)
