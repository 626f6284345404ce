import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import S3rver from 's3rver'
import { openFileStore } from '../../packages/api/src/server/integrations/file-store'

/** An object store of a test's own, empty at first. */
export async function startObjectStore() {
  const directory = mkdtempSync(join(tmpdir(), 'evenrule-objects-'))
  const server = new S3rver({
    ...{ address: '127.0.0.1', port: 0, directory, silent: true },
    configureBuckets: [{ name: 'evenrule', configs: [] }],
  })
  const { port } = await server.run()
  const config = {
    ...{ endpoint: `http://127.0.0.1:${port}`, bucket: 'evenrule', region: 'us-east-1' },
    ...{ accessKeyId: 'S3RVER', secretAccessKey: 'S3RVER' },
  }
  return {
    store: openFileStore(config),
    /** For a program that opens it. */
    environment: {
      S3_ENDPOINT: config.endpoint,
      S3_BUCKET: config.bucket,
      S3_ACCESS_KEY_ID: config.accessKeyId,
      S3_SECRET_ACCESS_KEY: config.secretAccessKey,
    },
    /** Where an object lies, for tests that damage one. */
    pathOf: (key: string) => join(directory, 'evenrule', `${key}._S3rver_object`),
    clear: () => rmSync(join(directory, 'evenrule/files'), { recursive: true, force: true }),
    async stop() {
      await server.close()
      rmSync(directory, { recursive: true, force: true })
    },
  }
}

export type ObjectStore = Awaited<ReturnType<typeof startObjectStore>>
