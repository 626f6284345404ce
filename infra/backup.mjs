// Backs up the database and the files of an instance, in use or not: `npm run backup [-- <folder to be made>]`.
import { readConfig } from './config.mjs'
import { command, folderOf, keep, productVersion, usualFolder } from './services/keeper.mjs'

await command((signal) => {
  const [named] = process.argv.slice(2)
  const folder = named ? folderOf(named) : usualFolder(readConfig())
  return keep({
    ...{ name: 'backup', args: [folder, productVersion()], signal },
    ifNothing: 'There is nothing to back up yet: start the product once with npm start.',
  })
}, 'Stopped: no backup was made. What was begun ends in .partial and may be removed.')
