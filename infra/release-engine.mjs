import { createHash } from 'node:crypto'
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'

const root = join(dirname(fileURLToPath(import.meta.url)), '..')
const folder = join(root, 'packages/metrology/released')
const indexFile = join(folder, 'index.json')

/** The computation as one module without imports: what the server and a reviewer's browser run. */
export async function bundleEngine() {
  const { build } = await import('esbuild')
  const { outputFiles } = await build({
    absWorkingDir: root,
    entryPoints: ['packages/metrology/src/engine.ts'],
    bundle: true,
    write: false,
    platform: 'neutral',
    mainFields: ['module', 'main'],
    target: 'es2022',
    format: 'esm',
    // Names and lines stay readable: whoever doubts a figure may read the very file that made it.
    minifySyntax: false,
    legalComments: 'none',
    charset: 'utf8',
    define: { 'process.env.NODE_ENV': '"production"' },
  })
  return outputFiles[0].contents
}

export const hashOf = (bytes) => createHash('sha256').update(bytes).digest('hex')

export const releases = () => (existsSync(indexFile) ? JSON.parse(readFileSync(indexFile, 'utf8')) : [])

function engineVersion() {
  const text = readFileSync(join(root, 'packages/metrology/src/version.ts'), 'utf8')
  const version = /ENGINE_VERSION = '([^']+)'/.exec(text)?.[1]
  if (!version) throw new Error('packages/metrology/src/version.ts names no ENGINE_VERSION.')
  return version
}

/**
 * Adds the computation as it stands to `packages/metrology/released` under its hash. A version that is released
 * stays as it is: evaluations name it. `replace` is for a version that no instance has used yet.
 */
async function release(replace) {
  const bytes = await bundleEngine()
  const sha256 = hashOf(bytes)
  const version = engineVersion()
  const all = releases()
  if (all.some((each) => each.sha256 === sha256)) return `Engine ${version} is released already: ${sha256}.`
  const same = all.find((each) => each.version === version)
  if (same && !replace) {
    throw new Error(
      `Engine ${version} is released with other code. Raise ENGINE_VERSION, or pass --replace when nobody has used it.`,
    )
  }
  mkdirSync(folder, { recursive: true })
  if (same) rmSync(join(folder, same.file), { force: true })
  const file = `engine-${version}-${sha256.slice(0, 12)}.mjs`
  writeFileSync(join(folder, file), bytes)
  const next = [...all.filter((each) => each !== same), { version, sha256, file }]
  writeFileSync(indexFile, `${JSON.stringify(next, null, 2)}\n`)
  return `Engine ${version} is released: ${sha256}.`
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  try {
    console.log(await release(process.argv.includes('--replace')))
  } catch (error) {
    console.error(error.message)
    process.exitCode = 1
  }
}
