import { readFileSync } from 'node:fs'

const dayInMilliseconds = 86_400_000

/**
 * The clock everything reads that decides by time. With a file it runs as many days ahead as the file says at the
 * moment (a number, such as 3); without one, or while there is no such file, it is the machine's. Tests and trials
 * move a whole instance through due dates with it; nobody sets it where decisions count.
 *
 * @throws {Error} when the file holds something that is not a number of days
 */
export function openClock(file: string | undefined): () => Date {
  if (!file) return () => new Date()
  return () => new Date(Date.now() + daysIn(file) * dayInMilliseconds)
}

function daysIn(file: string): number {
  const text = contentOf(file)
  const days = Number(text)
  if (!Number.isFinite(days)) throw new Error(`${file} must hold a number of days, not "${text}".`)
  return days
}

function contentOf(file: string): string {
  try {
    return readFileSync(file, 'utf8').trim()
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'ENOENT') return '0'
    throw error
  }
}
