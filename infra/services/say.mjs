/** Something the reader can mend: told in one line, without a stack trace. */
export class Problem extends Error {
  name = 'Problem'
}

/** The reader asked to stop while something was still under way. */
export class Stopped extends Error {
  name = 'Stopped'
}

// A closed pipe (`npm start | head`) must not bring the product down.
for (const stream of [process.stdout, process.stderr]) stream.on('error', () => {})

/** Says one thing that is happening, with the seconds since this program began. */
export function say(text) {
  process.stdout.write(`${process.uptime().toFixed(1).padStart(6)} s  ${text}\n`)
}

/** Writes a line without the time in front. */
export function tell(text) {
  process.stdout.write(`${text}\n`)
}

/** Ends the program after a failure: a plain line for a Problem, the whole stack for anything unforeseen. */
export function fail(error) {
  if (error instanceof Stopped) return
  process.stderr.write(`${inWords(error)}\n`)
  process.exitCode = 1
}

function inWords(error) {
  if (error instanceof Problem) return error.message
  const refused = error?.code === 'EACCES' || error?.code === 'EPERM'
  if (refused && error.path)
    return `This user may not use ${error.path}; start Evenrule as the one who owns it.`
  return error?.stack ?? error
}
