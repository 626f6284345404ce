import { closeSync, existsSync, mkdirSync, openSync, readSync, renameSync, statSync } from 'node:fs'
import { dirname } from 'node:path'

const largest = 5 * 1024 * 1024

/**
 * Opens the log of one program for appending; a long one is set aside first.
 *
 * @returns {{ file: number, since: number }} descriptor to hand to the child, and where its own lines begin
 */
export function openLog(path) {
  mkdirSync(dirname(path), { recursive: true })
  if (existsSync(path) && statSync(path).size > largest) renameSync(path, `${path}.1`)
  const file = openSync(path, 'a')
  return { file, since: statSync(path).size }
}

/** The last lines that a log holds from a place on, without the stack frames, which only the log's reader needs. */
export function lastLines(path, since, count = 40) {
  const size = statSync(path).size
  const from = Math.max(since, size - 16_384)
  const buffer = Buffer.alloc(size - from)
  const file = openSync(path, 'r')
  readSync(file, buffer, 0, buffer.length, from)
  closeSync(file)
  const lines = buffer.toString('utf8').trimEnd().split('\n')
  return lines
    .filter((line) => !/^\s+at /.test(line))
    .slice(-count)
    .join('\n')
}
