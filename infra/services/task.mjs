import { spawn } from 'node:child_process'
import { closeSync } from 'node:fs'
import { lastLines, openLog } from './log.mjs'
import { Problem, Stopped } from './say.mjs'

/**
 * Runs a program to its end, with its output in a log.
 *
 * @param {string} command
 * @param {string[]} args
 * @param {object} options
 * @param {string} options.log file for the output
 * @param {string} options.what how the work is called in the line that tells of its failure
 * @param {string} [options.input] handed over as standard input
 * @param {AbortSignal} [options.signal] ends it together with everything it started
 * @throws {Problem} with the last lines of the log when it fails; {Stopped} when it was ended
 */
export async function runTask(command, args, { log, what, input, signal, ...options }) {
  if (signal?.aborted) throw new Stopped()
  const { file, since } = openLog(log)
  // A group of its own, so that Ctrl-C in the terminal reaches only the start, which then ends it in order.
  const child = spawn(command, args, {
    ...options,
    stdio: [input === undefined ? 'ignore' : 'pipe', file, file],
    detached: true,
  })
  closeSync(file)
  const end = () => child.pid && killGroup(child.pid)
  signal?.addEventListener('abort', end)
  try {
    child.stdin?.on('error', () => {})
    child.stdin?.end(input)
    const outcome = await new Promise((resolve, reject) => {
      child.once('error', reject)
      child.once('exit', (code, killedBy) => resolve(code ?? killedBy))
    })
    if (signal?.aborted) throw new Stopped()
    if (outcome !== 0)
      throw new Problem(`${what} failed (${outcome}); its last lines, from ${log}:\n${lastLines(log, since)}`)
  } catch (error) {
    if (error.code === 'ENOENT') throw new Problem(`${what} failed: the program ${command} was not found.`)
    throw error
  } finally {
    signal?.removeEventListener('abort', end)
  }
}

function killGroup(pid) {
  try {
    process.kill(-pid, 'SIGTERM')
  } catch (error) {
    if (error.code !== 'ESRCH') throw error
  }
}
