// Checks the whole record of an instance from its database: `npm run -s verify-record [-- <kept hash>]`.
import { command, keep } from './services/keeper.mjs'

await command(
  (signal) =>
    keep({
      ...{ name: 'verify-record', args: process.argv.slice(2), signal },
      ifNothing: 'There is no record yet: start the product once with npm start.',
    }),
  'Stopped: the check came to no end, and changed nothing.',
)
