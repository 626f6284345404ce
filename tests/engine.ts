import { readFileSync } from 'node:fs'
import { fileURLToPath, pathToFileURL } from 'node:url'
import type { ErrorOutput, Output } from '@evenrule/metrology'

/** What a released engine file exports. */
export interface Engine {
  evaluate(input: unknown): Output | ErrorOutput
  canonicalText(value: unknown): string
  ENGINE_VERSION: string
}

export interface Release {
  version: string
  sha256: string
  file: string
}

const folder = fileURLToPath(new URL('../packages/metrology/released/', import.meta.url))

/** The release that the server computes with: the last of the index. */
export function newestRelease(): Release & { path: string } {
  const releases = JSON.parse(readFileSync(`${folder}index.json`, 'utf8')) as Release[]
  const newest = releases.at(-1)
  if (!newest) throw new Error('No engine is released: run npm run engine:release.')
  return { ...newest, path: folder + newest.file }
}

/** The newest release, loaded from its file as a browser or the server would. */
export async function newestEngine(): Promise<Engine> {
  return (await import(/* @vite-ignore */ pathToFileURL(newestRelease().path).href)) as Engine
}
