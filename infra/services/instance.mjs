import { mkdirSync, rmSync } from 'node:fs'
import { join } from 'node:path'
import { childEnvironment } from '../config.mjs'
import { Builder } from './build.mjs'
import { ensurePackages } from './packages.mjs'
import { isFree, requireFreePorts } from './ports.mjs'
import { preparePostgres, removeCluster } from './postgres.mjs'
import { makeRoles } from './roles.mjs'
import { RunFile } from './run-file.mjs'
import { keepSecrets } from './secrets.mjs'
import { Supervisor } from './supervisor.mjs'
import { runTask } from './task.mjs'
import { answers } from './waiting.mjs'

/** One running copy of the product with everything it needs, on its own ports and in its own data folder. */
export class Instance {
  #config
  #say
  #abort = new AbortController()
  #durable
  #runFile
  #supervisor
  #builder
  #binaries

  /**
   * @param config from readConfig
   * @param {object} options
   * @param {(text: string) => void} options.say
   * @param {boolean} [options.durable] false for an instance that is thrown away
   */
  constructor(config, { say, durable = true }) {
    this.#config = config
    this.#say = say
    this.#durable = durable
    this.#runFile = new RunFile(config.file.run)
    const { signal } = this.#abort
    this.#supervisor = new Supervisor({ runFile: this.#runFile, logFolder: config.folder.log, say, signal })
    this.#builder = new Builder(config, { say, signal })
  }

  /** Whether it has been asked to stop. */
  get stopping() {
    return this.#abort.signal.aborted
  }

  /** The start that runs on the data folder already, if any. */
  holder() {
    return this.#runFile.holder()
  }

  /** Folder of PostgreSQL's programs, once the database is up. */
  get binaries() {
    return this.#binaries
  }

  /**
   * Takes the data folder, clearing what a killed start left, and makes sure of the ports.
   *
   * @returns false when another start holds the folder
   */
  async claim() {
    mkdirSync(this.#config.data, { recursive: true, mode: 0o711 })
    const claimed = await this.#runFile.claim((names) =>
      this.#say(`Stopping what an earlier start left running: ${names.join(', ')}.`),
    )
    if (!claimed) return false
    for (const folder of ['log', 'oidc', 's3', 'mail'])
      mkdirSync(this.#config.folder[folder], { recursive: true })
    this.secrets = keepSecrets(this.#config)
    this.environment = childEnvironment(this.#config, this.secrets)
    await requireFreePorts(this.#config)
    return true
  }

  /** Forgets the database, the files and the mail; packages, builds and passwords stay. */
  async clear() {
    await removeCluster(this.#config)
    for (const folder of [this.#config.folder.s3, this.#config.folder.mail]) {
      rmSync(folder, { recursive: true, force: true })
      mkdirSync(folder)
    }
  }

  /** Brings up what keeps things, with the database as it is: packages, bundles, stand-ins, PostgreSQL. */
  async stores() {
    await this.#together([this.#code(), this.database()])
  }

  /** Brings up everything that the servers stand on: the stores, and a migrated database. */
  async foundation() {
    await this.stores()
    await this.#chore('migrate', 'Bringing the database up to date')
  }

  /** Puts the demonstration into a database that has none. */
  async seed() {
    await this.#chore('seed', 'Laying out the demonstration')
  }

  /** Builds both apps. */
  async apps() {
    await this.#together([this.#builder.app('supplier'), this.#builder.app('customer')])
  }

  /** Starts the API and the worker, and waits until both sides say that they are healthy. */
  async servers() {
    const { supplier, customer } = this.#config.address
    const healthy = async () =>
      (await answers(`${supplier}/api/v1/health`)) && (await answers(`${customer}/api/v1/health`))
    // The worker answers nobody: it counts as started when it still runs at the moment the API is healthy.
    await this.#together([
      this.#supervisor.start('api', this.#program('main', healthy)),
      this.#supervisor.start('worker', this.#program('worker', healthy)),
    ])
    this.#say('The API and the worker are running.')
  }

  /** Starts PostgreSQL on its private cluster, with the product's roles. */
  async database() {
    const { signal } = this.#abort
    const postgres = await preparePostgres(this.#config, this.secrets, {
      say: this.#say,
      signal,
      durable: this.#durable,
    })
    this.#binaries = postgres.binaries
    await this.#supervisor.start('postgres', postgres)
    await makeRoles(this.#config, this.secrets, { binaries: postgres.binaries, signal })
    this.#say(`PostgreSQL answers on port ${this.#config.port.postgres}.`)
  }

  /** Installs the npm packages when they are missing or not those that the lock file asks for. */
  async packages() {
    const log = join(this.#config.folder.log, 'packages.log')
    await ensurePackages({ root: this.#config.root, log, say: this.#say, signal: this.#abort.signal })
  }

  /** Runs a bundled program to its end. */
  async run(name, what, environment = {}) {
    await runTask(process.execPath, this.#script(name), {
      cwd: this.#config.root,
      env: { ...this.environment, ...environment },
      log: join(this.#config.folder.log, `${name}.log`),
      what,
      signal: this.#abort.signal,
    })
  }

  /** Stops everything in order and gives the data folder back. */
  async stop() {
    this.#abort.abort()
    await this.#supervisor.stop()
    this.#runFile.release()
  }

  async #code() {
    await this.packages()
    await this.#builder.server()
    await this.#fakes()
  }

  async #fakes() {
    const { address, port } = this.#config
    const listening = (number) => async () => !(await isFree(number))
    await this.#together([
      this.#supervisor.start(
        'oidc',
        this.#program('oidc', () => answers(`${address.oidc}/.well-known/openid-configuration`)),
      ),
      this.#supervisor.start('s3', this.#program('s3', listening(port.s3))),
      this.#supervisor.start(
        'mail',
        this.#program('mail', async () => (await answers(address.mail)) && listening(port.smtp)()),
      ),
    ])
    this.#say('The stand-ins for sign-in, files and mail are running.')
  }

  async #chore(name, what) {
    this.#say(`${what}.`)
    await this.run(name, what)
  }

  #program(name, ready) {
    return {
      command: process.execPath,
      args: this.#script(name),
      options: { cwd: this.#config.root, env: this.environment },
      ready,
    }
  }

  #script(name) {
    return ['--enable-source-maps', join(this.#config.folder.build, 'server', `${name}.mjs`)]
  }

  /** Waits for all; when one fails the others are ended, so that nothing goes on behind the message. */
  async #together(works) {
    try {
      await Promise.all(works)
    } catch (error) {
      this.#abort.abort()
      await Promise.allSettled(works)
      throw error
    }
  }
}
