import { spawn } from 'node:child_process'
import { Stopped } from './say.mjs'

/**
 * Runs a program of the checkout with its output shown as it comes.
 *
 * @returns {Promise<number>} its exit status, 1 when a signal ended it
 * @throws {Stopped} when it was ended from here
 */
export async function runShown(command, args, { signal, ...options }) {
  if (signal.aborted) throw new Stopped()
  const child = spawn(command, args, { ...options, stdio: ['ignore', 'inherit', 'inherit'], detached: true })
  const end = () => process.kill(-child.pid, 'SIGTERM')
  signal.addEventListener('abort', end)
  try {
    return await new Promise((resolve, reject) => {
      child.once('error', reject)
      child.once('exit', (code) => (signal.aborted ? reject(new Stopped()) : resolve(code ?? 1)))
    })
  } finally {
    signal.removeEventListener('abort', end)
  }
}
