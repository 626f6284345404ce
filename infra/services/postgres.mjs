import {
  chownSync,
  existsSync,
  mkdirSync,
  readFileSync,
  readdirSync,
  readlinkSync,
  renameSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs'
import { spawnSync } from 'node:child_process'
import { dirname, join } from 'node:path'
import { host } from '../config.mjs'
import { identify, stopProcess } from './identity.mjs'
import { clusterVersion, findBinaries } from './postgres-binaries.mjs'
import { Problem } from './say.mjs'
import { runTask } from './task.mjs'

/** The longest path of a socket that the system takes, less the name that PostgreSQL gives it. */
const longestSocketFolder = 80

/** The user who may run the server: oneself, or the one Debian's package makes when root starts it. */
function serverUser() {
  if (process.getuid() !== 0) return {}
  const line = readFileSync('/etc/passwd', 'utf8')
    .split('\n')
    .find((entry) => entry.startsWith('postgres:'))
  if (!line)
    throw new Problem(
      'PostgreSQL refuses to run as root, and there is no user "postgres" to run it; start Evenrule as an ordinary user.',
    )
  const [, , uid, gid] = line.split(':')
  return { uid: Number(uid), gid: Number(gid) }
}

/** Whether the server's user can get to a folder. */
function canReach(folder, user) {
  return spawnSync('test', ['-x', folder], { ...user, stdio: 'ignore' }).status === 0
}

/** Where the cluster of an instance lies: in its data folder, or beside when the server's user cannot get there. */
function clusterFolder(config, user) {
  const { postgres, postgresFallback } = config.folder
  return canReach(config.data, user) ? postgres : postgresFallback
}

function requireOwner(folder, user) {
  const owner = statSync(folder).uid
  if (owner !== (user.uid ?? process.getuid())) {
    throw new Problem(
      `The database in ${folder} belongs to another user (number ${owner}); start Evenrule as the user who made it, or remove that folder.`,
    )
  }
}

/** Server processes that work in a cluster's folder, which is where PostgreSQL makes them all live. */
function processesIn(folder) {
  return readdirSync('/proc')
    .filter((name) => /^\d+$/.test(name))
    .flatMap((pid) => {
      try {
        const ours =
          readlinkSync(`/proc/${pid}/cwd`) === folder &&
          readFileSync(`/proc/${pid}/comm`, 'utf8').trim() === 'postgres'
        return ours ? [identify(Number(pid))].filter(Boolean) : []
      } catch {
        return []
      }
    })
}

/**
 * Ends a server that still holds the cluster though no note tells of it, whole or what a kill left of it, and
 * removes its lock files: PostgreSQL takes them for valid when the number in them has passed to another program,
 * or when nobody has collected the dead process yet.
 */
async function clearLock(folder) {
  const lock = join(folder, 'postmaster.pid')
  const main = existsSync(lock) ? Number(readFileSync(lock, 'utf8').split('\n')[0]) : undefined
  const server = processesIn(folder).find(({ pid }) => pid === main)
  if (server) await stopProcess(server, { signal: 'SIGINT', seconds: 60 })
  for (const orphan of processesIn(folder)) await stopProcess(orphan, { seconds: 5 })
  const locks = readdirSync(folder).filter(
    (name) => name === 'postmaster.pid' || /^\.s\.PGSQL\..*/.test(name),
  )
  for (const name of locks) rmSync(join(folder, name), { force: true })
}

async function makeCluster(folder, { binaries, user, secrets, log, signal, durable }) {
  // Made under another name first: a start that is cut off here leaves no half cluster behind.
  const draft = `${folder}.new`
  const passwordFile = `${folder}.password`
  for (const path of [draft, passwordFile]) rmSync(path, { recursive: true, force: true })
  mkdirSync(draft, { recursive: true, mode: 0o700 })
  writeFileSync(passwordFile, secrets.postgres.admin, { mode: 0o600, flag: 'wx' })
  if (user.uid !== undefined) for (const path of [draft, passwordFile]) chownSync(path, user.uid, user.gid)
  // The tests of a cluster that is thrown away connect as any role; one that is kept asks for passwords.
  const access = [
    '--username=postgres',
    `--auth=${durable ? 'scram-sha-256' : 'trust'}`,
    `--pwfile=${passwordFile}`,
  ]
  // Names sort as people expect, whatever the system's own languages are.
  const language = ['--encoding=UTF8', '--locale=C.UTF-8', '--locale-provider=icu', '--icu-locale=und']
  try {
    await runTask(join(binaries, 'initdb'), ['-D', draft, '--data-checksums', ...access, ...language], {
      ...user,
      cwd: dirname(folder),
      env: { PATH: process.env.PATH, LC_ALL: 'C.UTF-8' },
      log,
      what: 'Making the database cluster',
      signal,
    })
  } finally {
    rmSync(passwordFile)
  }
  renameSync(draft, folder)
}

/** Settings that trade safety for speed, for a cluster that is thrown away. */
const throwAway = ['fsync=off', 'synchronous_commit=off', 'full_page_writes=off', 'max_connections=200']

/** The folder of the cluster that an instance has; undefined when it has none. */
const existingCluster = ({ folder }) =>
  [folder.postgres, folder.postgresFallback].find((path) => existsSync(path))

/** Folder of the programs that fit the cluster of an instance which is running. */
export function programsOfCluster(config, tools) {
  const cluster = existingCluster(config)
  return findBinaries(cluster && clusterVersion(cluster), tools)
}

/**
 * Finds or installs PostgreSQL, makes the private cluster when there is none, and describes how to start it.
 *
 * @param config from readConfig
 * @param secrets from keepSecrets
 * @param {object} tools say, signal, and `durable: false` for a cluster that is thrown away
 * @returns the program for Supervisor.start, with `binaries` and `folder`
 */
export async function preparePostgres(config, secrets, { say, signal, durable = true }) {
  const log = join(config.folder.log, 'setup.log')
  const existing = existingCluster(config)
  const binaries = await findBinaries(existing && clusterVersion(existing), { log, say, signal })
  const user = serverUser()
  const folder = existing ?? clusterFolder(config, user)
  if (existing) {
    requireOwner(folder, user)
    await clearLock(folder)
  } else {
    say(
      folder === config.folder.postgres
        ? 'Making a private database cluster.'
        : `Making a private database cluster in ${folder}, since the database's user cannot reach ${config.data}.`,
    )
    await makeCluster(folder, { binaries, user, secrets, log, signal, durable })
  }
  const sockets = folder.length <= longestSocketFolder && !/[,"']/.test(folder) ? folder : ''
  const settings = [
    `listen_addresses=${host}`,
    `port=${config.port.postgres}`,
    `unix_socket_directories=${sockets}`,
    'timezone=UTC',
    'log_timezone=UTC',
    ...(durable ? [] : throwAway),
  ]
  return {
    binaries,
    folder,
    command: join(binaries, 'postgres'),
    args: ['-D', folder, ...settings.flatMap((setting) => ['-c', setting])],
    options: { ...user, cwd: folder, env: { PATH: process.env.PATH, LC_ALL: 'C.UTF-8' } },
    ready: async () =>
      spawnSync(join(binaries, 'pg_isready'), ['-q', '-h', host, '-p', `${config.port.postgres}`]).status ===
      0,
  }
}

/** Removes the cluster of an instance that is not running. */
export async function removeCluster(config) {
  for (const folder of [config.folder.postgres, config.folder.postgresFallback]) {
    if (!existsSync(folder)) continue
    if (clusterVersion(folder)) await clearLock(folder)
    rmSync(folder, { recursive: true, force: true })
  }
}
