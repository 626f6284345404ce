// The version is checked before anything is loaded that an older Node.js could not read.
import { nodeProblem } from './services/node-version.mjs'

const problem = nodeProblem()
if (problem) {
  console.error(problem)
  process.exit(1)
}
await import('./tests/main.mjs')
