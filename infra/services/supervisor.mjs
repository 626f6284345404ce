import { spawn } from 'node:child_process'
import { closeSync } from 'node:fs'
import { join } from 'node:path'
import { identifyNew } from './identity.mjs'
import { lastLines, openLog } from './log.mjs'
import { inStopOrder, stopSignal } from './run-file.mjs'
import { Problem, Stopped } from './say.mjs'
import { until } from './waiting.mjs'

/** A child that lived this long starts again at once; one that keeps dying waits longer every time. */
const steady = 60_000
const longestWait = 30_000

/** Starts the programs of an instance, keeps them running, and stops them in order. */
export class Supervisor {
  #children = new Map()
  #runFile
  #logFolder
  #say
  #signal
  #stopping = false

  /**
   * @param {object} options
   * @param {import('./run-file.mjs').RunFile} options.runFile where process ids are noted
   * @param {string} options.logFolder one log per child
   * @param {(text: string) => void} options.say
   * @param {AbortSignal} options.signal ends the waiting for a child to answer
   */
  constructor({ runFile, logFolder, say, signal }) {
    this.#runFile = runFile
    this.#logFolder = logFolder
    this.#say = say
    this.#signal = signal
  }

  /**
   * Starts a program and waits until it answers; from then on it is started again whenever it dies.
   *
   * @param {string} name of its log and of its note
   * @param {object} program
   * @param {string} program.command
   * @param {string[]} program.args
   * @param {object} [program.options] for spawn: env, cwd, uid, gid
   * @param {() => Promise<boolean>} program.ready whether it answers
   * @param {number} [program.seconds] how long it may take to answer
   * @throws {Problem} with the last lines of its log when it dies or does not answer
   */
  async start(name, program) {
    if (this.#stopping) throw new Stopped()
    const child = { name, program, attempts: 0, steady: false }
    this.#children.set(name, child)
    this.#spawn(child)
    const seconds = program.seconds ?? 60
    const answered = await until(() => child.exit !== undefined || program.ready(), {
      seconds,
      signal: this.#signal,
    })
    if (child.exit === undefined && answered) {
      child.steady = true
      return
    }
    const why =
      child.exit === undefined ? `does not answer after ${seconds} s` : `ended while starting (${child.exit})`
    throw new Problem(
      `${name} ${why}; its last lines, from ${child.log}:\n${lastLines(child.log, child.since)}`,
    )
  }

  #spawn(child) {
    const { name, program } = child
    child.log = join(this.#logFolder, `${name}.log`)
    const { file, since } = openLog(child.log)
    child.since = since
    child.exit = undefined
    child.began = Date.now()
    // Detached: Ctrl-C in the terminal reaches only the start, which then stops the children in order.
    const running = spawn(program.command, program.args, {
      ...program.options,
      stdio: ['ignore', file, file],
      detached: true,
    })
    closeSync(file)
    running.once('error', (error) => this.#ended(child, error.message))
    running.once('exit', (code, signal) => this.#ended(child, code === null ? signal : `exit ${code}`))
    child.running = running
    const noted = running.pid && identifyNew(running.pid)
    if (noted) this.#runFile.add(name, noted)
  }

  #ended(child, reason) {
    child.exit = reason
    if (this.#stopping || !child.steady) return
    if (Date.now() - child.began > steady) child.attempts = 0
    const wait = Math.min(1000 * 2 ** child.attempts, longestWait)
    child.attempts += 1
    this.#say(
      `${child.name} ended unexpectedly (${reason}); it starts again in ${wait / 1000} s. Its log: ${child.log}`,
    )
    child.timer = setTimeout(() => this.#again(child), wait)
  }

  async #again(child) {
    if (this.#stopping) return
    this.#spawn(child)
    try {
      const up = await until(() => child.exit !== undefined || child.program.ready(), {
        seconds: 60,
        signal: this.#signal,
      })
      if (up && child.exit === undefined) this.#say(`${child.name} answers again.`)
    } catch (error) {
      if (!(error instanceof Stopped)) throw error
    }
  }

  /** Stops everything in order; whoever does not stop in time is ended and named. */
  async stop() {
    this.#stopping = true
    for (const name of inStopOrder(this.#children.keys())) {
      const child = this.#children.get(name)
      clearTimeout(child.timer)
      const seconds = name === 'postgres' ? 60 : 15
      const gone = () => child.exit !== undefined
      if (!gone()) child.running.kill(stopSignal(name))
      if (!(await until(gone, { seconds, every: 20 }))) {
        child.running.kill('SIGKILL')
        await until(gone, { seconds: 5 })
        this.#say(`${name} did not stop within ${seconds} s and was ended.`)
      }
      this.#runFile.remove(name)
    }
  }
}
