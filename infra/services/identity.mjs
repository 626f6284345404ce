import { readFileSync } from 'node:fs'
import { until } from './waiting.mjs'

function read(path) {
  try {
    return readFileSync(path, 'utf8')
  } catch {
    return undefined
  }
}

/**
 * What tells a process from a later one with the same number: the boot, the moment it began, its command line.
 *
 * @returns {{ pid: number, boot: string, began: string, command: string } | undefined} undefined when it is gone
 */
export function identify(pid) {
  const stat = read(`/proc/${pid}/stat`)
  const command = read(`/proc/${pid}/cmdline`)
  // The program's name stands in brackets and may hold blanks, so fields are counted behind it.
  const fields = stat?.slice(stat.lastIndexOf(')') + 2).split(' ')
  if (!fields || command === undefined || fields[0] === 'Z' || fields[0] === 'X') return undefined
  return {
    pid,
    boot: (read('/proc/sys/kernel/random/boot_id') ?? '').trim(),
    began: fields[19],
    command: command.replaceAll('\0', ' ').trim(),
  }
}

/**
 * What tells a child that has just been started from others. For a moment after the start the system does not know
 * its command line yet, and a note without it would fit nothing later.
 */
export function identifyNew(pid) {
  const end = performance.now() + 1000
  let found = identify(pid)
  while (found && !found.command && performance.now() < end) found = identify(pid)
  return found
}

/** Whether the very process that was noted still runs. */
export function isAlive(noted) {
  const now = identify(noted.pid)
  return now !== undefined && ['boot', 'began', 'command'].every((key) => now[key] === noted[key])
}

function send(pid, signal) {
  try {
    process.kill(pid, signal)
  } catch (error) {
    if (error.code !== 'ESRCH') throw error
  }
}

/**
 * Stops a noted process: asks it with a signal, and ends it when it has not gone in time.
 *
 * @returns whether it went by itself
 */
export async function stopProcess(noted, { signal = 'SIGTERM', seconds = 15 } = {}) {
  if (!isAlive(noted)) return true
  send(noted.pid, signal)
  if (await until(() => !isAlive(noted), { seconds })) return true
  if (isAlive(noted)) send(noted.pid, 'SIGKILL')
  await until(() => !isAlive(noted), { seconds: 5 })
  return false
}
