import { spawn, type ChildProcessByStdio } from 'node:child_process'
import { join } from 'node:path'
import type { Readable, Writable } from 'node:stream'
import { BackupProblem } from './backup.problem'

export type PostgresProgram = 'pg_dump' | 'pg_restore' | 'psql'

export interface Running {
  child: ChildProcessByStdio<Writable, Readable, Readable>
  /** Ends when the program has ended well; {BackupProblem} with what it said otherwise. */
  ended: Promise<void>
}

/** The settings of an address as the programs read them from their environment: a password has no place in a command line. */
function connectionOf(url: string): Record<string, string> {
  const { hostname, port, username, password, pathname, searchParams } = new URL(url)
  const sslMode = searchParams.get('sslmode')
  const sslRoot = searchParams.get('sslrootcert')
  return {
    PGHOST: decodeURIComponent(hostname),
    PGPORT: port || '5432',
    PGUSER: decodeURIComponent(username),
    PGDATABASE: decodeURIComponent(pathname.slice(1)),
    ...(password ? { PGPASSWORD: decodeURIComponent(password) } : {}),
    ...(sslMode ? { PGSSLMODE: sslMode } : {}),
    ...(sslRoot ? { PGSSLROOTCERT: sslRoot } : {}),
  }
}

/**
 * Starts one of PostgreSQL's programs.
 *
 * @param bin its folder; without one it is looked up on the path
 * @param url the database it works on, if any
 */
export function startProgram(
  program: PostgresProgram,
  args: readonly string[],
  { bin, url }: { bin: string | undefined; url?: string },
): Running {
  const child = spawn(bin ? join(bin, program) : program, args, {
    stdio: ['pipe', 'pipe', 'pipe'],
    env: {
      ...{ PATH: process.env.PATH, LC_ALL: 'C.UTF-8', PGOPTIONS: '-c client_min_messages=warning' },
      ...(url ? connectionOf(url) : {}),
    },
  })
  let said = ''
  child.stderr.on('data', (bytes: Buffer) => (said = `${said}${bytes.toString()}`.slice(-4000)))
  // Who writes to a program that has ended is told by its end.
  child.stdin.on('error', () => undefined)
  const ended = new Promise<void>((resolve, reject) => {
    child.once('error', (error: NodeJS.ErrnoException) =>
      reject(
        error.code === 'ENOENT'
          ? new BackupProblem(
              `${program} was not found; install PostgreSQL's client programs, or name their folder with POSTGRES_BIN.`,
            )
          : error,
      ),
    )
    child.once('close', (code, signal) =>
      code === 0
        ? resolve()
        : reject(new BackupProblem(`${program} failed (${code ?? signal}): ${said.trim()}`)),
    )
  })
  // Whoever waits for it hears of a failure, however late; until then it is nobody's fault.
  ended.catch(() => undefined)
  return { child, ended }
}
