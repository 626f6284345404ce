import { existsSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { onPath } from './debian.mjs'
import { readJson } from './files.mjs'
import { Problem } from './say.mjs'
import { runTask } from './task.mjs'

/**
 * Whether node_modules holds what the lock file asks for, by the note that npm leaves of its last installation.
 * Optional packages may be missing: they are those of other systems.
 */
function installedAsLocked(root) {
  const wanted = readJson(join(root, 'package-lock.json'))
  const present = readJson(join(root, 'node_modules/.package-lock.json'))
  if (!wanted || !present) return false
  return Object.entries(wanted.packages).every(([path, { version, link, optional }]) => {
    if (!path.includes('node_modules/') || optional) return true
    const found = present.packages[path]
    return found !== undefined && (link ? existsSync(join(root, path)) : found.version === version)
  })
}

/** npm's own program: from the path, or else from beside node. */
function npmCommand() {
  if (onPath('npm')) return ['npm']
  const beside = join(dirname(process.execPath), 'npm')
  if (existsSync(beside)) return [beside]
  throw new Problem(
    'npm was not found; install the Node.js that brings it along (Debian: apt-get install npm), or put it on the PATH.',
  )
}

/**
 * Installs the npm packages when they are missing or the lock file asks for others.
 *
 * @throws {Problem} when npm is missing or fails
 */
export async function ensurePackages({ root, log, say, signal }) {
  if (installedAsLocked(root)) return
  const [npm] = npmCommand()
  say('Installing the npm packages (a minute or two the first time).')
  const args = ['ci', '--no-audit', '--no-fund', '--include=dev']
  await runTask(npm, args, {
    cwd: root,
    env: { ...process.env, NODE_ENV: '' },
    log,
    what: 'Installing the npm packages',
    signal,
  })
  say('The npm packages are installed.')
}
