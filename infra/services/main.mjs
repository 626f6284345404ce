import { parseArgs } from 'node:util'
import { readConfig } from '../config.mjs'
import { Instance } from './instance.mjs'
import { stopProcess } from './identity.mjs'
import { Problem, Stopped, fail, say, tell } from './say.mjs'
import { answers } from './waiting.mjs'

function readArguments() {
  try {
    return parseArgs({ options: { reset: { type: 'boolean', default: false }, data: { type: 'string' } } })
      .values
  } catch (error) {
    throw new Problem(`${error.message.split('. ')[0]}. Known are --reset and --data <folder>.`)
  }
}

/** Says what already runs here, in one line; a start that is not healthy makes this one fail. */
async function tellRunning(config, { pid }) {
  const { supplier, customer } = config.address
  if ((await answers(`${supplier}/api/v1/health`)) && (await answers(`${customer}/api/v1/health`))) {
    tell(`Evenrule is already running (process ${pid}): supplier app ${supplier}, customer app ${customer}.`)
    return
  }
  throw new Problem(
    `Another start of Evenrule (process ${pid}) is under way or does not answer; wait for it, or stop it with: kill ${pid}`,
  )
}

function readyLine({ address }) {
  return [
    `Evenrule is ready: supplier app ${address.supplier} (sign in as Ines Calder or Tomas Brandl of Tarnfield Turned Parts)`,
    `customer app ${address.customer} (sign in as Mara Lindqvist or Joren Vask of Brackwell Drivelines)`,
    `mail ${address.mail}`,
    'one click signs any demo person in, without a password; Ctrl-C stops everything.',
  ].join('; ')
}

async function start(instance, config) {
  await instance.foundation()
  await Promise.all([instance.seed(), instance.apps()])
  await instance.servers()
  tell(readyLine(config))
}

async function reset(instance) {
  say('Removing the database, the files and the mail.')
  await instance.clear()
  await instance.foundation()
  await instance.seed()
  await instance.stop()
  tell('The demonstration is as new. Start it with: npm start')
}

async function main() {
  const options = readArguments()
  const config = readConfig(options.data ? { ...process.env, EVENRULE_DATA: options.data } : process.env)
  const instance = new Instance(config, { say })

  let stopped
  const stop = () => {
    stopped ??= (async () => {
      say('Stopping: the worker, the API, the stand-ins, then PostgreSQL.')
      await instance.stop()
      tell('Evenrule has stopped; everything is kept for the next start.')
    })()
  }
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, stop)

  const running = instance.holder()
  if (running && !options.reset) return tellRunning(config, running)
  if (running) {
    say(`Stopping the Evenrule that is running (process ${running.pid}).`)
    await stopProcess(running, { seconds: 120 })
  }
  try {
    if (!(await instance.claim())) return await tellRunning(config, instance.holder() ?? { pid: 'unknown' })
    await (options.reset ? reset(instance) : start(instance, config))
  } catch (error) {
    if (!(error instanceof Stopped)) fail(error)
    if (!stopped) await instance.stop()
  }
  await stopped
}

main().catch(fail)
