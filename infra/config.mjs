import { createHash } from 'node:crypto'
import { join, resolve } from 'node:path'
import { fileURLToPath } from 'node:url'
import { Problem } from './services/say.mjs'

/** The root of the checkout. */
export const root = fileURLToPath(new URL('..', import.meta.url)).replace(/\/$/, '')

/** Every port the product uses: the variable that changes it, its default, and what it is for. */
export const ports = {
  supplier: { variable: 'EVENRULE_SUPPLIER_PORT', default: 4310, use: 'supplier app' },
  customer: { variable: 'EVENRULE_CUSTOMER_PORT', default: 4320, use: 'customer app' },
  oidc: { variable: 'EVENRULE_OIDC_PORT', default: 4330, use: 'sign-in page' },
  mail: { variable: 'EVENRULE_MAIL_PORT', default: 4340, use: 'mail page' },
  smtp: { variable: 'EVENRULE_SMTP_PORT', default: 4341, use: 'mail receiver' },
  s3: { variable: 'EVENRULE_S3_PORT', default: 4350, use: 'file store' },
  postgres: { variable: 'EVENRULE_POSTGRES_PORT', default: 4370, use: 'PostgreSQL' },
}

/** Loopback only: nothing that starts here may be reached from another machine. */
export const host = '127.0.0.1'

export const database = 'evenrule'
export const bucket = 'evenrule'

/** Login roles of the database; what each may do stands in infra/services/roles.mjs. */
export const roles = ['migrator', 'app', 'system', 'session']

function readPort(env, { variable, default: fallback, use }) {
  const text = env[variable]
  if (text === undefined || text === '') return fallback
  const port = Number(text)
  if (Number.isInteger(port) && port >= 1 && port <= 65535) return port
  throw new Problem(`${variable} (${use}) must be a whole number from 1 to 65535, not "${text}".`)
}

function readPorts(env) {
  const taken = new Map()
  const result = {}
  for (const [name, entry] of Object.entries(ports)) {
    const port = readPort(env, entry)
    const other = taken.get(port)
    if (other)
      throw new Problem(`${other} and ${entry.variable} are both ${port}; give each a port of its own.`)
    taken.set(port, entry.variable)
    result[name] = port
  }
  return result
}

/**
 * Reads the settings of one instance of the product.
 *
 * @param {Record<string, string | undefined>} env variables, normally process.env
 * @returns ports, addresses and folders of the instance
 * @throws {Problem} when a port is not a port, or two are the same
 */
export function readConfig(env = process.env) {
  const port = readPorts(env)
  const data = resolve(root, env.EVENRULE_DATA || '.data')
  const clusterName = `evenrule-${createHash('sha256').update(data).digest('hex').slice(0, 12)}`
  return {
    root,
    data,
    port,
    logLevel: env.LOG_LEVEL || 'info',
    clockFile: env.EVENRULE_CLOCK_FILE ? resolve(env.EVENRULE_CLOCK_FILE) : undefined,
    address: {
      supplier: `http://localhost:${port.supplier}`,
      customer: `http://localhost:${port.customer}`,
      oidc: `http://localhost:${port.oidc}`,
      mail: `http://localhost:${port.mail}`,
      smtp: `smtp://localhost:${port.smtp}`,
      s3: `http://localhost:${port.s3}`,
    },
    folder: {
      build: join(data, 'build'),
      log: join(data, 'log'),
      oidc: join(data, 'oidc'),
      s3: join(data, 's3'),
      mail: join(data, 'mail'),
      postgres: join(data, 'postgres'),
      // Used when the database's user cannot reach the data folder, as under root's home.
      postgresFallback: join('/var/tmp', clusterName),
    },
    file: {
      run: join(data, 'run.json'),
      secrets: join(data, 'secrets.json'),
      stamp: join(data, 'build', 'stamp.json'),
    },
  }
}

/** Address of a database for one role. */
export function databaseUrl(config, secrets, role, name = database) {
  return `postgres://evenrule_${role}:${secrets.postgres[role]}@${host}:${config.port.postgres}/${name}`
}

/** Address of a database for the superuser of the private cluster; for the infrastructure and tests only. */
export function adminUrl(config, secrets, name = 'postgres') {
  return `postgres://postgres:${secrets.postgres.admin}@${host}:${config.port.postgres}/${name}`
}

/**
 * Environment of every process started here: what the product's servers and the stand-ins read.
 *
 * @param config from readConfig
 * @param secrets from services/secrets.mjs
 */
export function childEnvironment(config, secrets) {
  const inherited = ['PATH', 'HOME', 'LANG', 'TZ', 'TMPDIR', 'NODE_OPTIONS', 'NODE_EXTRA_CA_CERTS']
  const kept = inherited.flatMap((name) =>
    process.env[name] === undefined ? [] : [[name, process.env[name]]],
  )
  return {
    ...Object.fromEntries(kept),
    NODE_ENV: 'production',
    LOG_LEVEL: config.logLevel,
    EVENRULE_ROOT: config.root,
    ...(config.clockFile ? { EVENRULE_CLOCK_FILE: config.clockFile } : {}),
    EVENRULE_HOST: host,
    ...Object.fromEntries(
      Object.entries(ports).map(([name, { variable }]) => [variable, `${config.port[name]}`]),
    ),
    DATABASE_URL: databaseUrl(config, secrets, 'app'),
    SYSTEM_DATABASE_URL: databaseUrl(config, secrets, 'system'),
    SESSION_DATABASE_URL: databaseUrl(config, secrets, 'session'),
    MIGRATOR_DATABASE_URL: databaseUrl(config, secrets, 'migrator'),
    MIGRATIONS_DIR: join(config.root, 'infra/migrations'),
    OIDC_ISSUER: config.address.oidc,
    OIDC_SUPPLIER_CLIENT_ID: 'evenrule-supplier',
    OIDC_SUPPLIER_CLIENT_SECRET: secrets.oidc.supplier,
    OIDC_CUSTOMER_CLIENT_ID: 'evenrule-customer',
    OIDC_CUSTOMER_CLIENT_SECRET: secrets.oidc.customer,
    OIDC_DATA: config.folder.oidc,
    SUPPLIER_ORIGIN: config.address.supplier,
    CUSTOMER_ORIGIN: config.address.customer,
    S3_ENDPOINT: config.address.s3,
    S3_BUCKET: bucket,
    // The stand-in knows this one pair of keys and no other.
    S3_ACCESS_KEY_ID: 'S3RVER',
    S3_SECRET_ACCESS_KEY: 'S3RVER',
    S3_DATA: config.folder.s3,
    SMTP_URL: config.address.smtp,
    MAIL_DATA: config.folder.mail,
    SESSION_SECRET: secrets.session,
    INVITATION_SECRET: secrets.invitation,
    SUPPLIER_DIST: join(config.folder.build, 'supplier'),
    CUSTOMER_DIST: join(config.folder.build, 'customer'),
    ENGINES_DIR: join(config.root, 'packages/metrology/released'),
  }
}
