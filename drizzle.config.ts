import { defineConfig } from 'drizzle-kit'

export default defineConfig({
  dialect: 'postgresql',
  schema: './packages/api/src/server/db/schema.ts',
  out: './infra/migrations',
  casing: 'snake_case',
  // The roles belong to the cluster and are made by infra/start.mjs before the first migration.
  entities: { roles: { provider: '', include: [] } },
})
