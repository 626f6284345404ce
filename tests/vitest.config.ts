import vue from '@vitejs/plugin-vue'
import vuetify from 'vite-plugin-vuetify'
import { fileURLToPath } from 'node:url'
import { defineConfig } from 'vitest/config'

/** The projects that `npm test` runs in the order of infra/tests/stages.mjs. */
const root = fileURLToPath(new URL('..', import.meta.url))
const uiTests = ['packages/ui/**/*.test.ts', 'apps/**/*.test.ts']
const never = ['**/node_modules/**', '.data/**']

const project = (name: string, include: string[], test: object = {}) => ({
  root,
  // Left to itself Vitest keeps a core free, which on two cores is half of the machine.
  test: { name, include, exclude: never, maxWorkers: 2, testTimeout: 30_000, hookTimeout: 60_000, ...test },
})

export default defineConfig({
  root,
  test: {
    projects: [
      project('unit', ['packages/**/*.test.ts', 'fakes/**/*.test.ts', 'infra/**/*.test.mjs'], {
        exclude: [...never, ...uiTests],
      }),
      {
        ...project('ui', uiTests, { environment: 'happy-dom', server: { deps: { inline: ['vuetify'] } } }),
        plugins: [vue(), vuetify()],
      },
      project('reference', ['tests/reference/**/*.test.ts'], { testTimeout: 120_000 }),
      project('api', ['tests/api/**/*.test.ts']),
      project('security', ['tests/security/**/*.test.ts'], { testTimeout: 120_000 }),
      // On databases of their own, made from those of earlier releases.
      project('upgrade', ['tests/upgrade/**/*.test.ts'], { testTimeout: 120_000, hookTimeout: 120_000 }),
      // Two files at a time share the instance: each works on parts, tasks and agreements of its own.
      project('browser', ['tests/browser/**/*.test.ts'], {
        testTimeout: 300_000,
        hookTimeout: 120_000,
      }),
      // What moves the clock of the instance, one file after the other.
      project('calendar', ['tests/calendar/**/*.test.ts'], {
        fileParallelism: false,
        testTimeout: 300_000,
        hookTimeout: 120_000,
      }),
      project('faults', ['tests/faults/**/*.test.ts'], {
        fileParallelism: false,
        testTimeout: 300_000,
        hookTimeout: 120_000,
      }),
    ],
  },
})
