import { spawnSync } from 'node:child_process'
import { existsSync } from 'node:fs'
import { join } from 'node:path'
import { root } from '../config.mjs'
import { runShown } from '../services/run-shown.mjs'

const program = (path) => join(root, 'node_modules', path)

/** Files that git knows and that still exist, so that drafts beside them fail nobody. */
function trackedFiles() {
  const listed = spawnSync('git', ['ls-files', '-z'], { cwd: root, encoding: 'utf8', maxBuffer: 2 ** 26 })
  if (listed.status !== 0) return ['.']
  return listed.stdout.split('\0').filter((path) => path && existsSync(join(root, path)))
}

const commands = {
  prettier: () => [
    program('prettier/bin/prettier.cjs'),
    '--check',
    '--ignore-unknown',
    '--log-level',
    'warn',
    ...trackedFiles(),
  ],
  eslint: () => [program('eslint/bin/eslint.js'), '--max-warnings', '0', '.'],
  'vue-tsc': () => [program('vue-tsc/bin/vue-tsc.js'), '--noEmit', '-p', 'tsconfig.json'],
}

/**
 * Runs a static check over the whole checkout.
 *
 * @returns {Promise<{ passed: number, failed: number }>} one of either
 */
export async function runCheck(check, signal) {
  const status = await runShown(process.execPath, commands[check](), { cwd: root, signal })
  return status === 0 ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 }
}
