import { Problem, Stopped, fail, say, tell } from '../services/say.mjs'
import { runCheck } from './checks.mjs'
import { runProject } from './project.mjs'
import { TestStand } from './stand.mjs'
import { chooseStages } from './stages.mjs'

const abort = new AbortController()

async function runStage({ name, check, needs }, { stand, filters }) {
  if (check) return runCheck(check, abort.signal)
  const environment = await stand.bringUp(needs)
  return runProject(name, { filters, environment, report: stand.path(`${name}.json`), signal: abort.signal })
}

/** Runs a stage; what keeps it from running at all counts as one failure and does not stop the others. */
async function tryStage(stage, tools) {
  try {
    return await runStage(stage, tools)
  } catch (error) {
    if (error instanceof Stopped) throw error
    console.error(error instanceof Problem ? error.message : error)
    return { passed: 0, failed: 1 }
  }
}

const seconds = (since) => `${((performance.now() - since) / 1000).toFixed(1)} s`

async function runStages(stand, words) {
  const { chosen, filters } = chooseStages(words)
  const timed = async (stage) => {
    say(`${stage.name} …`)
    const since = performance.now()
    const result = await tryStage(stage, { stand, filters })
    return { name: stage.name, time: seconds(since), passed: 0, failed: 0, skipped: 0, ...result }
  }
  // The static checks are a program of one thread each, so they share the cores; projects use all there are.
  const results = await Promise.all(chosen.filter(({ check }) => check).map(timed))
  for (const stage of chosen.filter(({ check }) => !check)) results.push(await timed(stage))
  return results
}

function summary(results) {
  tell('')
  for (const { name, time, passed, failed, skipped } of results) {
    const skips = skipped > 0 ? `, ${skipped} skipped` : ''
    tell(`${name.padEnd(10)} ${passed} passed, ${failed} failed${skips} in ${time}`)
  }
  const sum = (key) => results.reduce((total, result) => total + result[key], 0)
  const skips = sum('skipped') > 0 ? `, ${sum('skipped')} skipped` : ''
  tell(`${sum('passed')} passed, ${sum('failed')} failed${skips}`)
  return sum('failed') === 0 && sum('passed') > 0
}

async function main() {
  const stand = new TestStand(say, abort.signal)
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => abort.abort())
  let results
  try {
    await stand.open()
    await stand.packages()
    results = await runStages(stand, process.argv.slice(2))
  } catch (error) {
    fail(error)
    process.exitCode = 1
  }
  await stand.close({ keepLogs: !results || results.some(({ failed }) => failed > 0) })
  if (results && !summary(results)) process.exitCode = 1
}

main().catch(fail)
