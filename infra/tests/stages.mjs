/**
 * What `npm test` runs, in this order. A stage with `check` is one program that passes or fails, run beside the
 * others of its kind; one with `needs` is a project of tests/vitest.config.ts, and says what must run for it:
 * nothing, the database with the stand-ins, or the whole product with a browser.
 */
export const stages = [
  { name: 'format', check: 'prettier' },
  { name: 'lint', check: 'eslint' },
  { name: 'types', check: 'vue-tsc' },
  { name: 'unit', needs: 'nothing' },
  { name: 'ui', needs: 'nothing' },
  { name: 'reference', needs: 'nothing' },
  { name: 'api', needs: 'database' },
  { name: 'security', needs: 'database' },
  { name: 'upgrade', needs: 'database' },
  { name: 'browser', needs: 'product' },
  { name: 'calendar', needs: 'product' },
  { name: 'faults', needs: 'product' },
]

/**
 * Splits the words behind `npm test --` into the stages to run (all when none is named) and filters on the names
 * of test files.
 */
export function chooseStages(words) {
  const named = stages.filter(({ name }) => words.includes(name))
  const filters = words.filter((word) => !stages.some(({ name }) => name === word))
  return { chosen: named.length > 0 ? named : stages, filters }
}
