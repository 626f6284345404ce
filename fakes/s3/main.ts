import { mkdirSync } from 'node:fs'
import S3rver from 's3rver'
import { closeOnSignal, required } from '../page/environment'

const directory = required('S3_DATA')
mkdirSync(directory, { recursive: true })
const store = new S3rver({
  address: required('EVENRULE_HOST'),
  port: Number(required('EVENRULE_S3_PORT')),
  directory,
  configureBuckets: [{ name: required('S3_BUCKET'), configs: [] }],
})
await store.run()
closeOnSignal(() => store.close())
