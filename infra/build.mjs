// Builds the server and both apps without starting anything: `npm run build`.
import { readConfig } from './config.mjs'
import { Builder } from './services/build.mjs'
import { fail, say } from './services/say.mjs'

async function main() {
  const config = readConfig()
  const builder = new Builder(config, { say })
  await builder.server()
  await Promise.all([builder.app('supplier'), builder.app('customer')])
  say(`Everything is built, in ${config.folder.build}.`)
}

main().catch(fail)
