import { spawnSync } from 'node:child_process'
import { existsSync } from 'node:fs'
import { delimiter, join } from 'node:path'
import { Problem } from './say.mjs'
import { runTask } from './task.mjs'

/** Whether a program can be found. */
export const onPath = (program) =>
  (process.env.PATH ?? '').split(delimiter).some((folder) => folder && existsSync(join(folder, program)))

/** What has to stand before a command so that it runs as root; undefined when that cannot be had. */
function asRoot() {
  if (process.getuid() === 0) return []
  const sudo = onPath('sudo') && spawnSync('sudo', ['-n', 'true'], { stdio: 'ignore' }).status === 0
  return sudo ? ['sudo', '-n'] : undefined
}

/**
 * Installs packages of Debian (or a system made from it).
 *
 * @param {string[]} packages
 * @param {object} options
 * @param {string} options.what what they are for, as the messages call it
 * @param {string} options.log file for the output
 * @param {(text: string) => void} options.say
 * @param {AbortSignal} [options.signal]
 * @throws {Problem} one line with the command to run where it cannot be done from here
 */
export async function installPackages(packages, { what, log, say, signal }) {
  if (!onPath('apt-get')) {
    throw new Problem(
      `Without apt-get ${what} cannot be installed from here; please install it (Debian: ${packages.join(' ')}).`,
    )
  }
  const root = asRoot()
  if (!root) {
    throw new Problem(
      `${what} is missing, and installing it needs root; please run: sudo apt-get install -y ${packages.join(' ')}`,
    )
  }
  say(`Installing ${what} (${packages.join(', ')}) from the system's packages.`)
  const run = ([command, ...args]) => runTask(command, args, { log, what: `Installing ${what}`, signal })
  const apt = [
    ...root,
    'env',
    'DEBIAN_FRONTEND=noninteractive',
    'apt-get',
    '-q',
    '-o',
    'DPkg::Lock::Timeout=300',
  ]
  // An old list may still do, so a failing update alone is no reason to give up.
  await run([...apt, 'update']).catch((error) => {
    if (!(error instanceof Problem)) throw error
    say('The list of packages could not be renewed; trying with the one at hand.')
  })
  await run([...apt, 'install', '-y', '--no-install-recommends', ...packages])
}

const ruleFolder = '/etc/postgresql-common/createcluster.d'

/**
 * Installs the PostgreSQL server without the cluster that its package would make and start by itself.
 * The package's own configuration is left alone: a rule beside it holds while the server is being installed.
 */
export async function installPostgres({ log, say, signal }) {
  const what = 'the PostgreSQL server'
  const root = onPath('apt-get') ? asRoot() : undefined
  // Without apt-get or root, installPackages tells the reader what to do.
  if (!root) return installPackages(['postgresql'], { what, log, say, signal })
  const run = ([command, ...args], input) => runTask(command, args, { log, what: `Preparing ${what}`, input })
  const rule = join(ruleFolder, 'evenrule.conf')
  await run([...root, 'mkdir', '-p', ruleFolder])
  await run(
    [...root, 'tee', rule],
    '# Made while Evenrule installs the server for a private cluster.\ncreate_main_cluster = false\n',
  )
  try {
    await installPackages(['postgresql'], { what, log, say, signal })
  } finally {
    await run([...root, 'rm', '-f', rule])
  }
}
