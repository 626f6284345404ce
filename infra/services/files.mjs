import { closeSync, fsyncSync, openSync, readFileSync, renameSync, writeSync } from 'node:fs'

/** Reads a JSON file; undefined when it is missing or was cut short. */
export function readJson(path) {
  try {
    return JSON.parse(readFileSync(path, 'utf8'))
  } catch (error) {
    if (error.code === 'ENOENT' || error instanceof SyntaxError) return undefined
    throw error
  }
}

/** Writes a JSON file whole or not at all, readable by its owner alone. */
export function writeJson(path, value) {
  const draft = `${path}.${process.pid}.new`
  const file = openSync(draft, 'w', 0o600)
  writeSync(file, `${JSON.stringify(value, null, 2)}\n`)
  fsyncSync(file)
  closeSync(file)
  renameSync(draft, path)
}
