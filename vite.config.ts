import { fileURLToPath } from 'node:url'
import vue from '@vitejs/plugin-vue'
import { defineConfig } from 'vite'
import vuetify from 'vite-plugin-vuetify'

// One configuration builds either side: EVENRULE_APP=supplier|customer names which.
const app = process.env.EVENRULE_APP ?? 'supplier'
const here = (path: string) => fileURLToPath(new URL(path, import.meta.url))

export default defineConfig({
  root: here(`apps/${app}`),
  plugins: [vue(), vuetify({ autoImport: true })],
  build: {
    outDir: process.env.EVENRULE_DIST ?? here(`.data/build/${app}`),
    emptyOutDir: true,
    target: 'es2022',
    sourcemap: false,
    // Fonts must stay files: the content security policy allows none inlined.
    assetsInlineLimit: 0,
  },
})
