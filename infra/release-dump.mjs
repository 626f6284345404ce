// Keeps the database of a release for the tests of later ones: `npm run release:dump`, in a checkout of the release,
// on an instance that holds the fresh demonstration. What it makes is an ordinary backup; one that is kept stays.
import { join } from 'node:path'
import { root } from './config.mjs'
import { command, keep, productVersion } from './services/keeper.mjs'

await command((signal) => {
  const version = productVersion()
  const folder = join(root, 'tests/upgrade', `release-${version}`, 'backup')
  return keep({
    ...{ name: 'backup', args: [folder, version], signal },
    ifNothing: 'There is no demonstration here: start the product once with npm start.',
  })
}, 'Stopped: the release was not kept.')
