/** What a process reads from its environment; every name is set by infra/start.mjs. */
export interface Config {
  databaseUrl: string
  sessionDatabaseUrl: string
  sessionSecret: string
  /** Derives the tokens of invitations; the worker writes the links with it. */
  invitationSecret: string
  oidc: { issuer: string; supplier: OidcClient; customer: OidcClient }
  origins: { supplier: string; customer: string }
  ports: { supplier: number; customer: number }
  dist: { supplier: string; customer: string }
  s3: { endpoint: string; bucket: string; accessKeyId: string; secretAccessKey: string; region: string }
  enginesDir: string
  logLevel: string
  /** A file that says how many days ahead the clock runs; only where somebody moves it on purpose. */
  clockFile: string | undefined
}
export interface OidcClient {
  id: string
  secret: string
}

/** What the worker reads: not the app's database role, and no secret of the sign-in or the files. */
export interface WorkerConfig {
  systemDatabaseUrl: string
  origins: { supplier: string; customer: string }
  invitationSecret: string
  smtpUrl: string
  mailFrom: string
  logLevel: string
  clockFile: string | undefined
}

function need(env: NodeJS.ProcessEnv, name: string): string {
  const value = env[name]
  if (!value)
    throw new Error(`The environment variable ${name} is missing; start the product with npm start.`)
  return value
}

export function readConfig(env: NodeJS.ProcessEnv): Config {
  return {
    databaseUrl: need(env, 'DATABASE_URL'),
    sessionDatabaseUrl: need(env, 'SESSION_DATABASE_URL'),
    sessionSecret: need(env, 'SESSION_SECRET'),
    invitationSecret: need(env, 'INVITATION_SECRET'),
    oidc: {
      issuer: need(env, 'OIDC_ISSUER'),
      supplier: {
        id: need(env, 'OIDC_SUPPLIER_CLIENT_ID'),
        secret: need(env, 'OIDC_SUPPLIER_CLIENT_SECRET'),
      },
      customer: {
        id: need(env, 'OIDC_CUSTOMER_CLIENT_ID'),
        secret: need(env, 'OIDC_CUSTOMER_CLIENT_SECRET'),
      },
    },
    origins: readOrigins(env),
    ports: {
      supplier: Number(env.EVENRULE_SUPPLIER_PORT ?? 4310),
      customer: Number(env.EVENRULE_CUSTOMER_PORT ?? 4320),
    },
    dist: { supplier: need(env, 'SUPPLIER_DIST'), customer: need(env, 'CUSTOMER_DIST') },
    s3: readS3(env),
    enginesDir: need(env, 'ENGINES_DIR'),
    logLevel: env.LOG_LEVEL ?? 'info',
    clockFile: env.EVENRULE_CLOCK_FILE,
  }
}

/** What backing up and restoring read: the owner of the database, the files, and where PostgreSQL's programs lie. */
export interface KeeperConfig {
  ownerUrl: string
  s3: Config['s3']
  enginesDir: string
  migrationsDir: string
  /** Folder of pg_dump, pg_restore and psql; without one they are looked up on the path. */
  postgresBin: string | undefined
}

/** Reads what backing up and restoring need of the environment. */
export function readKeeperConfig(env: NodeJS.ProcessEnv): KeeperConfig {
  return {
    ownerUrl: need(env, 'MIGRATOR_DATABASE_URL'),
    s3: readS3(env),
    enginesDir: env.ENGINES_DIR ?? 'packages/metrology/released',
    migrationsDir: env.MIGRATIONS_DIR ?? 'infra/migrations',
    postgresBin: env.POSTGRES_BIN || undefined,
  }
}

/** Reads the worker's part of the environment. */
export function readWorkerConfig(env: NodeJS.ProcessEnv): WorkerConfig {
  const origins = readOrigins(env)
  return {
    systemDatabaseUrl: need(env, 'SYSTEM_DATABASE_URL'),
    origins,
    invitationSecret: need(env, 'INVITATION_SECRET'),
    smtpUrl: need(env, 'SMTP_URL'),
    mailFrom: env.MAIL_FROM ?? `Evenrule <evenrule@${new URL(origins.supplier).hostname}>`,
    logLevel: env.LOG_LEVEL ?? 'info',
    clockFile: env.EVENRULE_CLOCK_FILE,
  }
}

const readS3 = (env: NodeJS.ProcessEnv) => ({
  endpoint: need(env, 'S3_ENDPOINT'),
  bucket: need(env, 'S3_BUCKET'),
  accessKeyId: need(env, 'S3_ACCESS_KEY_ID'),
  secretAccessKey: need(env, 'S3_SECRET_ACCESS_KEY'),
  region: env.S3_REGION ?? 'us-east-1',
})

const readOrigins = (env: NodeJS.ProcessEnv) => ({
  supplier: need(env, 'SUPPLIER_ORIGIN'),
  customer: need(env, 'CUSTOMER_ORIGIN'),
})
