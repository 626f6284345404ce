import { readFileSync, readdirSync } from 'node:fs'
import { join } from 'node:path'
import { fileURLToPath, pathToFileURL } from 'node:url'
import { describe, expect, it } from 'vitest'
import { bundleEngine, hashOf, releases } from './release-engine.mjs'

const folder = fileURLToPath(new URL('../packages/metrology/released/', import.meta.url))

describe('the released engines', () => {
  it('end with the computation as its source stands, byte for byte', async () => {
    const newest = releases().at(-1)
    const bundle = Buffer.from(await bundleEngine())
    expect(
      hashOf(bundle),
      'packages/metrology/src differs from the newest release: npm run engine:release',
    ).toBe(newest.sha256)
    expect(readFileSync(join(folder, newest.file)).equals(bundle)).toBe(true)
  })

  it('are each the file that their hash names, and there is no other file', () => {
    for (const { file, sha256 } of releases())
      expect(hashOf(readFileSync(join(folder, file))), file).toBe(sha256)
    const listed = releases().map(({ file }) => file)
    expect(readdirSync(folder).sort()).toEqual([...listed, 'index.json'].sort())
  })

  it('have a version each', () => {
    const versions = releases().map(({ version }) => version)
    expect(new Set(versions).size).toBe(versions.length)
  })

  it.each(releases())(
    'engine $version says its own version and imports nothing',
    async ({ file, version }) => {
      const path = join(folder, file)
      const engine = await import(/* @vite-ignore */ pathToFileURL(path).href)
      expect(engine.ENGINE_VERSION).toBe(version)
      expect(Object.keys(engine).sort()).toEqual(['ENGINE_VERSION', 'canonicalText', 'evaluate'])
      expect(readFileSync(path, 'utf8')).not.toMatch(/^\s*import\b|\brequire\(|\bimport\(/m)
    },
  )

  it.each(releases())(
    'engine $version uses no function whose last bits differ between browsers',
    ({ file }) => {
      const text = readFileSync(join(folder, file), 'utf8')
      const used = new Set([...text.matchAll(/\bMath\.(\w+)/g)].map(([, name]) => name))
      const exact = ['SQRT2', 'abs', 'ceil', 'clz32', 'floor', 'max', 'min', 'round', 'sqrt', 'trunc']
      expect([...used].filter((name) => !exact.includes(name))).toEqual([])
      expect(text).not.toMatch(
        /\b(Date|performance|process|crypto|fetch|localeCompare|toLocale\w+|Intl)\b[.(]/,
      )
      // A power operator between operands; the openings of comments do not count.
      expect(text.replace(/\/\*[\s\S]*?\*\/|\/\/.*$/gm, '')).not.toMatch(/[\w)\]]\s*\*\*\s*[\w(]/)
    },
  )
})
