import { createHash } from 'node:crypto'
import {
  cpSync,
  existsSync,
  lstatSync,
  mkdirSync,
  readFileSync,
  readdirSync,
  readlinkSync,
  rmSync,
  symlinkSync,
} from 'node:fs'
import { join, relative } from 'node:path'
import { readJson, writeJson } from './files.mjs'
import { Problem } from './say.mjs'
import { runTask } from './task.mjs'

/** The programs bundled for the server side; the names are those of the bundles. */
const serverEntries = {
  main: 'packages/api/src/server/main.ts',
  worker: 'packages/api/src/server/worker.ts',
  thread: 'packages/api/src/server/thread/thread.ts',
  migrate: 'packages/api/src/server/migrate.ts',
  seed: 'packages/api/src/server/seed.ts',
  oidc: 'fakes/oidc/main.ts',
  s3: 'fakes/s3/main.ts',
  mail: 'fakes/mail/main.ts',
}

/** What each build is made from, and the file that shows that it is there. */
const targets = {
  server: { sources: ['packages', 'fakes'], skip: /^packages\/ui\//, proof: 'server/main.mjs' },
  supplier: {
    sources: ['packages', 'apps/supplier', 'vite.config.ts'],
    skip: /^packages\/api\/src\/server\//,
    proof: 'supplier/index.html',
  },
  customer: {
    sources: ['packages', 'apps/customer', 'vite.config.ts'],
    skip: /^packages\/api\/src\/server\//,
    proof: 'customer/index.html',
  },
}

const common = ['package.json', 'package-lock.json', 'tsconfig.json', 'infra/services/build.mjs']
const never = /(^|\/)(node_modules|released|dist|tests?)(\/|$)|\.test\.[a-z]+$|\.md$/

function filesUnder(root, path) {
  const full = join(root, path)
  if (never.test(path) || !existsSync(full)) return []
  if (!lstatSync(full).isDirectory()) return [path]
  return readdirSync(full)
    .sort()
    .flatMap((name) => filesUnder(root, `${path}/${name}`))
}

/** One hash over the names and the content of everything that a build is made from. */
function fingerprint(root, { sources, skip }) {
  const hash = createHash('sha256')
  for (const path of [...common, ...sources].flatMap((source) => filesUnder(root, source))) {
    if (skip.test(path)) continue
    hash
      .update(`${path}\0`)
      .update(readFileSync(join(root, path)))
      .update('\0')
  }
  return hash.digest('hex')
}

/** Builds what has changed, and remembers from what it was built. */
export class Builder {
  #config
  #tools

  /**
   * @param config from readConfig
   * @param {object} tools say and signal
   */
  constructor(config, tools) {
    this.#config = config
    this.#tools = tools
  }

  /** Bundles the servers, the chores and the stand-ins. */
  async server() {
    await this.#build('server', () => bundleServer(this.#config))
  }

  /** Builds one app; tells and goes on when it has no page yet. */
  async app(name) {
    const { root } = this.#config
    if (!existsSync(join(root, 'apps', name, 'index.html'))) {
      this.#tools.say(`The ${name} app is left out: apps/${name}/index.html does not exist.`)
      return
    }
    await this.#build(name, () => this.#vite(name))
  }

  async #build(name, make) {
    const { root, folder, file } = this.#config
    const target = targets[name]
    const made = fingerprint(root, target)
    const current = (build, stamp) =>
      readJson(stamp)?.[name] === made && existsSync(join(build, target.proof))
    if (current(folder.build, file.stamp)) return
    mkdirSync(folder.build, { recursive: true })
    linkPackages(root, folder.build)
    const usual = join(root, '.data/build')
    if (current(usual, join(usual, 'stamp.json'))) {
      // A second instance, such as the one of the tests, takes over what the first has built.
      cpSync(join(usual, name), join(folder.build, name), { recursive: true })
    } else {
      this.#tools.say(`Building the ${name === 'server' ? 'server' : `${name} app`}.`)
      await make()
    }
    writeJson(file.stamp, { ...readJson(file.stamp), [name]: made })
  }

  async #vite(name) {
    const { root, folder } = this.#config
    const outcome = join(folder.build, name)
    await runTask(
      process.execPath,
      [join(root, 'node_modules/vite/bin/vite.js'), 'build', '--logLevel', 'warn'],
      {
        cwd: root,
        env: {
          ...process.env,
          NODE_ENV: 'production',
          NO_COLOR: '1',
          EVENRULE_APP: name,
          EVENRULE_DIST: outcome,
        },
        log: join(folder.log, `build-${name}.log`),
        what: `Building the ${name} app`,
        signal: this.#tools.signal,
      },
    )
  }
}

/** Packages of this workspace are bundled; all others are loaded from node_modules when the bundle runs. */
const externalPackages = {
  name: 'external packages',
  setup(build) {
    build.onResolve({ filter: /^[^./]/ }, ({ path, kind }) => {
      if (kind === 'entry-point' || path.startsWith('@evenrule/')) return undefined
      return { path, external: true }
    })
  },
}

async function bundleServer({ root, folder }) {
  const entryPoints = Object.entries(serverEntries).map(([out, path]) => ({ out, in: join(root, path) }))
  const missing = Object.values(serverEntries).filter((path) => !existsSync(join(root, path)))
  if (missing.length > 0) throw new Problem(`The server cannot be built: ${missing.join(', ')} is missing.`)
  const { build } = await import('esbuild')
  const outdir = join(folder.build, 'server')
  rmSync(outdir, { recursive: true, force: true })
  try {
    await build({
      absWorkingDir: root,
      entryPoints,
      outdir,
      outExtension: { '.js': '.mjs' },
      bundle: true,
      splitting: true,
      platform: 'node',
      target: 'node20',
      format: 'esm',
      sourcemap: true,
      plugins: [externalPackages],
      logLevel: 'silent',
    })
  } catch (error) {
    throw new Problem(`The server cannot be built:\n${error.message}`)
  }
}

/** Bundles outside the checkout find the packages through a link, as those inside do by their place. */
function linkPackages(root, folder) {
  if (!relative(root, folder).startsWith('..')) return
  const [link, packages] = [join(folder, 'node_modules'), join(root, 'node_modules')]
  // Left as it is where it is right: programs may be loading through it while the next build begins.
  if (lstatSync(link, { throwIfNoEntry: false })?.isSymbolicLink() && readlinkSync(link) === packages) return
  rmSync(link, { force: true })
  symlinkSync(packages, link)
}
