import { join } from 'node:path'
import { database, host } from '../config.mjs'
import { runTask } from './task.mjs'

/**
 * The product's roles. Only the migrator owns anything and passes row security; the other three own nothing and
 * are held by every policy. What each may touch is granted by the migrations.
 */
const rights = {
  migrator: 'login bypassrls nosuperuser nocreatedb nocreaterole',
  app: 'login nobypassrls nosuperuser nocreatedb nocreaterole',
  system: 'login nobypassrls nosuperuser nocreatedb nocreaterole',
  session: 'login nobypassrls nosuperuser nocreatedb nocreaterole',
}

/** Runs SQL as the superuser of the private cluster. */
export function runSql(config, secrets, { binaries, text, what, name = 'postgres', signal }) {
  const args = [
    '-X',
    '-q',
    '-v',
    'ON_ERROR_STOP=1',
    '-h',
    host,
    '-p',
    `${config.port.postgres}`,
    '-U',
    'postgres',
    '-d',
    name,
  ]
  return runTask(join(binaries, 'psql'), args, {
    env: {
      PATH: process.env.PATH,
      PGPASSWORD: secrets.postgres.admin,
      LC_ALL: 'C.UTF-8',
      PGOPTIONS: '-c client_min_messages=warning',
    },
    input: text,
    log: join(config.folder.log, 'setup.log'),
    what,
    signal,
  })
}

/** Statements that make a database of the migrator's unless it exists, open to the product's roles alone. */
export function databaseStatements(name) {
  return `
    select 'create database ${name} owner evenrule_migrator'
      where not exists (select from pg_database where datname = '${name}') \\gexec
    revoke all on database ${name} from public;
    grant connect on database ${name} to evenrule_app, evenrule_system, evenrule_session;
  `
}

/** Makes the roles with their kept passwords, and the product's database; changes nothing that is right already. */
export function makeRoles(config, secrets, { binaries, signal }) {
  const role = ([name, right]) => `
    select 'create role evenrule_${name}'
      where not exists (select from pg_roles where rolname = 'evenrule_${name}') \\gexec
    alter role evenrule_${name} with ${right} password '${secrets.postgres[name]}';
  `
  const text = Object.entries(rights).map(role).join('\n') + databaseStatements(database)
  return runSql(config, secrets, { binaries, text, what: 'Making the database roles', signal })
}
