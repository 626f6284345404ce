import { join, resolve } from 'node:path'
import { childEnvironment, readConfig, root } from '../config.mjs'
import { readJson } from './files.mjs'
import { Instance } from './instance.mjs'
import { newestPrograms } from './postgres-binaries.mjs'
import { programsOfCluster } from './postgres.mjs'
import { runShown } from './run-shown.mjs'
import { Problem, Stopped, fail, say, tell } from './say.mjs'

/** Version of the product that this checkout is. */
export const productVersion = () => readJson(join(root, 'package.json')).version

/** A folder as whoever typed it means it: npm runs its scripts in the root of the checkout. */
export const folderOf = (text) => resolve(process.env.INIT_CWD ?? process.cwd(), text)

/** Where a backup goes when no folder is named. */
export const usualFolder = (config, now = new Date()) =>
  join(config.data, 'backups', `evenrule-${now.toISOString().slice(0, 19).replaceAll(':', '-')}Z`)

/** Runs a program of the server, its output shown, with the environment of one instance. */
const runProgram = (name, args, env, signal) =>
  runShown(join(root, 'node_modules/.bin/tsx'), [join(root, `packages/api/src/server/${name}.ts`), ...args], {
    cwd: root,
    env: { AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true', ...env },
    signal,
  })

/** The environment as it is; PostgreSQL's programs are the newest there are, unless it names others. */
function ownEnvironment() {
  const folder = newestPrograms()
  return { ...(folder ? { POSTGRES_BIN: folder } : {}), ...process.env }
}

/** Runs a program on an instance that is running and stays so. */
async function onRunning(config, { name, args, signal }) {
  const secrets = readJson(config.file.secrets)
  const log = join(config.folder.log, 'setup.log')
  const env = {
    ...childEnvironment(config, secrets),
    POSTGRES_BIN: await programsOfCluster(config, { log, say }),
  }
  return runProgram(name, args, env, signal)
}

/** Brings up the database and the files of an instance, runs a program on them, and stops them again. */
async function onStopped(instance, { name, args, signal }) {
  try {
    if (!(await instance.claim()))
      throw new Problem('Another start of Evenrule is under way; stop it, then try again.')
    await instance.stores()
    return await runProgram(name, args, { ...instance.environment, POSTGRES_BIN: instance.binaries }, signal)
  } finally {
    await instance.stop()
  }
}

/**
 * Runs a program of the server on what an instance holds: the one that the environment names
 * (MIGRATOR_DATABASE_URL, S3_…), or the one of the data folder, running or not.
 *
 * @param {object} work
 * @param {string} work.name of the program
 * @param {string[]} work.args
 * @param {string} [work.whileRunning] why not while it runs; without it that is fine
 * @param {string} [work.ifNothing] what to say where there is no instance yet; without it one is made
 * @param {AbortSignal} work.signal
 * @returns {Promise<number>} the exit status
 */
export async function keep(work) {
  if (process.env.MIGRATOR_DATABASE_URL)
    return runProgram(work.name, work.args, ownEnvironment(), work.signal)
  const config = readConfig()
  if (work.ifNothing && !readJson(config.file.secrets)) throw new Problem(work.ifNothing)
  const instance = new Instance(config, { say })
  const running = instance.holder()
  if (!running) return onStopped(instance, work)
  if (work.whileRunning) throw new Problem(`${work.whileRunning} (kill ${running.pid}).`)
  return onRunning(config, work)
}

/**
 * The frame of a command: ends what it runs when it is asked to stop, and says what that leaves.
 *
 * @param {(signal: AbortSignal) => Promise<number>} main gives the exit status
 * @param {string} stopped what to say after it was stopped
 */
export async function command(main, stopped) {
  const abort = new AbortController()
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => abort.abort())
  try {
    process.exitCode = await main(abort.signal)
  } catch (error) {
    if (error instanceof Stopped) tell(stopped)
    else fail(error)
    process.exitCode = 2
  }
}
