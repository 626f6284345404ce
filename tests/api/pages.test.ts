import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import request from 'supertest'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { createApp } from '../../packages/api/src/server/app'
import { startHarness, type Harness } from './harness'

describe('the pages of an app', () => {
  let harness: Harness
  const folder = mkdtempSync(join(tmpdir(), 'evenrule-pages-'))
  const dist = join(folder, '.data', 'supplier')
  beforeAll(async () => {
    harness = await startHarness()
    mkdirSync(dist, { recursive: true })
    writeFileSync(join(dist, 'index.html'), '<!doctype html><title>Evenrule</title>')
  })
  afterAll(async () => {
    rmSync(folder, { recursive: true, force: true })
    await harness.stop()
  })

  it('are served from a folder whose path has a name with a dot', async () => {
    const app = createApp({
      side: 'supplier',
      origin: 'http://supplier.test',
      dist,
      database: harness.database,
      services: harness.services,
      session: (_request, _response, next) => next(),
      routes: [],
      rateLimitPerMinute: 0,
    })
    for (const path of ['/', '/organisations/x/parts']) {
      const answer = await request(app).get(path)
      expect(answer.status).toBe(200)
      expect(answer.text).toContain('<title>Evenrule</title>')
    }
  })
})
