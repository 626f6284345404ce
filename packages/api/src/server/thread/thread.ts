import { parentPort, workerData } from 'node:worker_threads'
import { ProblemError } from '../errors'
import { jobs, type JobName } from './jobs'
import type { Answer } from './run'

/** The whole life of a thread: one job, one answer. */
async function answerTo({ name, input }: { name: JobName; input: readonly unknown[] }): Promise<Answer> {
  const job = jobs[name] as (...input: readonly unknown[]) => Promise<unknown>
  try {
    return { outcome: await job(...input.map(withBuffers)) }
  } catch (error) {
    if (!(error instanceof ProblemError)) throw error
    const { code, status, message, errors } = error
    return { problem: { code, status, message, errors } }
  }
}

/** Bytes lose their type on the way between threads. */
function withBuffers(value: unknown): unknown {
  if (value instanceof Uint8Array) return Buffer.from(value.buffer, value.byteOffset, value.byteLength)
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return value
  return Object.fromEntries(Object.entries(value).map(([key, each]) => [key, withBuffers(each)]))
}

parentPort?.postMessage(await answerTo(workerData as Parameters<typeof answerTo>[0]))
