import { chmodSync, existsSync, mkdirSync, readdirSync, rmSync } from 'node:fs'
import { createHash } from 'node:crypto'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { adminUrl, databaseUrl, host, ports, readConfig, roles, root } from '../config.mjs'
import { installPackages } from '../services/debian.mjs'
import { Instance } from '../services/instance.mjs'
import { freePorts } from '../services/ports.mjs'
import { removeCluster } from '../services/postgres.mjs'
import { databaseStatements, runSql } from '../services/roles.mjs'
import { RunFile } from '../services/run-file.mjs'

const template = 'evenrule_template'
const chromium = '/usr/bin/chromium'
const prefix = `evenrule-test-${createHash('sha256').update(root).digest('hex').slice(0, 12)}-`

/** Removes what test runs left that were killed: their processes and their folders. */
async function clearLeftovers(say) {
  for (const name of readdirSync(tmpdir()).filter((entry) => entry.startsWith(prefix))) {
    const data = join(tmpdir(), name)
    const runFile = new RunFile(join(data, 'run.json'))
    if (!(await runFile.claim(() => say('Stopping what an earlier test run left running.')))) continue
    await removeCluster(readConfig({ EVENRULE_DATA: data }))
    rmSync(data, { recursive: true, force: true })
  }
}

/** A copy of the product for one test run: own ports, own data, thrown away afterwards. */
export class TestStand {
  #say
  #config
  #instance
  #signal
  #up = new Map()

  /**
   * @param {(text: string) => void} say
   * @param {AbortSignal} signal ends everything that this stand is doing
   */
  constructor(say, signal) {
    this.#say = say
    this.#signal = signal
  }

  /** Takes a folder and ports; nothing runs yet. */
  async open() {
    await clearLeftovers(this.#say)
    const data = join(tmpdir(), `${prefix}${process.pid}`)
    mkdirSync(data)
    // The database's user must be able to get to its cluster.
    chmodSync(data, 0o711)
    const free = await freePorts(Object.keys(ports).length)
    const environment = Object.fromEntries(
      Object.values(ports).map(({ variable }, at) => [variable, `${free[at]}`]),
    )
    this.#config = readConfig({
      ...environment,
      EVENRULE_DATA: data,
      EVENRULE_CLOCK_FILE: join(data, 'clock-days'),
      LOG_LEVEL: process.env.LOG_LEVEL,
    })
    this.#instance = new Instance(this.#config, { say: this.#say, durable: false })
    this.#signal.addEventListener('abort', () => this.#instance.stop())
    await this.#instance.claim()
  }

  /** Installs the npm packages when they are missing. */
  async packages() {
    await this.#instance.packages()
  }

  /** A file in the folder of this run. */
  path(name) {
    return join(this.#config.data, name)
  }

  /**
   * Brings up what a stage needs, unless it is up already.
   *
   * @param {'nothing' | 'database' | 'product'} need
   * @returns environment for the tests
   */
  async bringUp(need) {
    if (need !== 'nothing') await this.#once('database', () => this.#database())
    if (need === 'product') await this.#once('product', () => this.#product())
    return this.#environment()
  }

  /** Stops everything and removes the folder; the logs stay when something failed. */
  async close({ keepLogs }) {
    await this.#instance.stop()
    await removeCluster(this.#config)
    if (keepLogs) this.#say(`The logs of this run are in ${this.#config.folder.log} until the next one.`)
    const kept = keepLogs ? ['log'] : []
    for (const name of readdirSync(this.#config.data).filter((entry) => !kept.includes(entry))) {
      rmSync(this.path(name), { recursive: true, force: true })
    }
    if (!keepLogs) rmSync(this.#config.data, { recursive: true, force: true })
  }

  /** Brings a thing up at the first call; later calls share its outcome, failure too. */
  #once(what, make) {
    if (!this.#up.has(what)) this.#up.set(what, make())
    return this.#up.get(what)
  }

  async #database() {
    await this.#instance.foundation()
    const { secrets, binaries } = this.#instance
    const text = databaseStatements(template)
    await runSql(this.#config, secrets, { binaries, text, what: 'Making the template database' })
    const url = databaseUrl(this.#config, secrets, 'migrator', template)
    await this.#instance.run('migrate', 'Migrating the template database', { MIGRATOR_DATABASE_URL: url })
  }

  async #product() {
    if (!existsSync(chromium)) {
      const log = join(this.#config.folder.log, 'setup.log')
      await installPackages(['chromium'], { what: 'the browser for the tests', log, say: this.#say })
    }
    await Promise.all([this.#instance.seed(), this.#instance.apps()])
    await this.#instance.servers()
  }

  #environment() {
    const { address, port } = this.#config
    const { secrets, environment, binaries } = this.#instance
    const oidc = Object.entries(environment).filter(
      ([name]) => name.startsWith('OIDC_') && name !== 'OIDC_DATA',
    )
    const s3 = Object.entries(environment).filter(([name]) => name.startsWith('S3_') && name !== 'S3_DATA')
    const database = {
      TEST_POSTGRES_HOST: host,
      TEST_POSTGRES_PORT: `${port.postgres}`,
      TEST_POSTGRES_ADMIN_URL: adminUrl(this.#config, secrets),
      TEST_TEMPLATE_DATABASE: template,
      TEST_POSTGRES_BIN: binaries,
      ...Object.fromEntries(
        roles.map((role) => [`TEST_PASSWORD_${role.toUpperCase()}`, secrets.postgres[role]]),
      ),
      ...Object.fromEntries([...oidc, ...s3].map(([name, value]) => [`TEST_${name}`, value])),
      TEST_SMTP_URL: address.smtp,
      TEST_MAIL_URL: address.mail,
      TEST_SUPPLIER_ORIGIN: address.supplier,
      TEST_CUSTOMER_ORIGIN: address.customer,
    }
    const product = {
      E2E_SUPPLIER_URL: address.supplier,
      E2E_CUSTOMER_URL: address.customer,
      E2E_OIDC_URL: address.oidc,
      E2E_MAIL_URL: address.mail,
      E2E_CLOCK_FILE: this.#config.clockFile,
      CHROMIUM_PATH: chromium,
      // What was built for this run, so that a further instance need not build it again.
      TEST_BUILD_FOLDER: this.#config.folder.build,
    }
    return { ...(this.#up.has('database') ? database : {}), ...(this.#up.has('product') ? product : {}) }
  }
}
