import { Worker } from 'node:worker_threads'
import { defineError, ProblemError, type FieldError } from '../errors'
import type { JobInput, JobName, JobOutcome } from './jobs'

export type Answer =
  { outcome: unknown } | { problem: Pick<ProblemError, 'code' | 'status' | 'message' | 'errors'> }

/** How many threads run at once; others wait for their turn, and beyond that they are asked to come again. */
const atOnce = 2
const mostWaiting = 30
/** Longest time one job may take, milliseconds. */
const longest = 60_000
/** Memory one job may use, megabytes. */
const memory = { maxOldGenerationSizeMb: 768, maxYoungGenerationSizeMb: 64 }

const tooLong = defineError(
  'too-long-to-read',
  422,
  'Reading this took too long and was given up. Remove what is not needed, or split it into several files.',
)
const tooLarge = defineError(
  'too-large-to-read',
  422,
  'Reading this needs more memory than one upload may take. Remove what is not needed, or split it into several files.',
)
const busy = defineError(
  'too-many',
  429,
  'Several large files are being read right now. Wait a minute and choose the file again; nothing was stored.',
)

let running = 0
const waiting: (() => void)[] = []

/** Runs a job on a thread of its own, so that no other request waits for it; within limits of time and memory. */
export async function runOnThread<N extends JobName>(name: N, ...input: JobInput<N>): Promise<JobOutcome<N>> {
  if (running >= atOnce) {
    if (waiting.length >= mostWaiting) throw busy()
    await new Promise<void>((resolve) => waiting.push(resolve))
  } else running++
  try {
    const answer = await answerOf(name, input)
    if ('outcome' in answer) return answer.outcome as JobOutcome<N>
    const { code, status, message, errors } = answer.problem
    throw new ProblemError(code, status, message, errors as readonly FieldError[] | undefined)
  } finally {
    const next = waiting.shift()
    if (next) next()
    else running--
  }
}

function answerOf(name: JobName, input: readonly unknown[]): Promise<Answer> {
  const worker = new Worker(...program({ name, input }))
  return new Promise<Answer>((resolve, reject) => {
    const timer = setTimeout(() => reject(tooLong()), longest)
    worker.once('message', resolve)
    worker.once('error', (error: Error & { code?: string }) =>
      reject(error.code === 'ERR_WORKER_OUT_OF_MEMORY' ? tooLarge() : error),
    )
    worker.once('exit', () => reject(new Error('The thread ended without an answer.')))
    worker.once('exit', () => clearTimeout(timer))
  }).finally(() => worker.terminate())
}

/** The bundle of the thread beside that of the server; in development its source, read as TypeScript. */
function program(workerData: unknown): ConstructorParameters<typeof Worker> {
  const source = import.meta.url.endsWith('.ts')
  return [
    new URL(source ? './development.mjs' : './thread.mjs', import.meta.url),
    { workerData, resourceLimits: memory, execArgv: [] },
  ]
}
