import { existsSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { root } from '../config.mjs'
import { readJson } from '../services/files.mjs'
import { Problem } from '../services/say.mjs'
import { runShown } from '../services/run-shown.mjs'

const config = 'tests/vitest.config.ts'

/**
 * Runs one project of Vitest.
 *
 * @param {string} project
 * @param {object} options
 * @param {string[]} options.filters on the names of test files
 * @param {Record<string, string>} options.environment handed to the tests
 * @param {string} options.report file for the result
 * @param {AbortSignal} options.signal
 * @returns {Promise<{ passed: number, failed: number, skipped: number }>} a run that breaks off counts as failed
 */
export async function runProject(project, { filters, environment, report, signal }) {
  if (!existsSync(join(root, config))) throw new Problem(`${config} is missing, so no tests can be run.`)
  rmSync(report, { force: true })
  const vitest = join(root, 'node_modules/vitest/vitest.mjs')
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${report}`]
  const args = [vitest, 'run', '--config', config, '--project', project, ...reporters, ...filters]
  const status = await runShown(process.execPath, args, {
    cwd: root,
    env: { ...process.env, ...environment },
    signal,
  })
  const result = readJson(report)
  const passed = result?.numPassedTests ?? 0
  const failed = result?.numFailedTests ?? 0
  const skipped = (result?.numPendingTests ?? 0) + (result?.numTodoTests ?? 0)
  // A file that cannot be loaded, or no test at all, fails the run without a failed test.
  return { passed, failed: status !== 0 && failed === 0 ? 1 : failed, skipped }
}
