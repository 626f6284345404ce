import type { App } from 'vue'

/** Part of the head manager's interface that Vuetify talks to when an app provides one. */
interface HeadEntry {
  style: { textContent: string }[]
}

const triplet = (hex: string): string => [1, 3, 5].map((at) => parseInt(hex.slice(at, at + 2), 16)).join(',')

/**
 * Paper is white whatever the screen shows: in print both themes take the light palette.
 * `colours` are those of Vuetify's light theme, by Vuetify's names.
 */
export function printRules(colours: Record<string, string>): string {
  const lines = Object.entries(colours).map(([name, hex]) => `--v-theme-${name}:${triplet(hex)};`)
  return `@media print{:root,.v-theme--light,.v-theme--dark{color-scheme:light;${lines.join('')}}}`
}

/**
 * Gives Vuetify's theme rules to the document as a constructed style sheet.
 *
 * Vuetify would otherwise write a `<style>` element at run time, which a strict `style-src 'self'` refuses.
 * A constructed sheet is set through the object model, which the policy allows, so neither a nonce nor
 * `'unsafe-inline'` is needed. Vuetify hands its rules to an app-provided head manager; this is one that
 * knows that single task.
 */
export function adoptThemeSheet(app: App, lightColours: Record<string, string>): void {
  if (typeof document === 'undefined' || typeof CSSStyleSheet === 'undefined') return
  const sheet = new CSSStyleSheet()
  const write = (entry: () => HeadEntry) =>
    sheet.replaceSync(
      entry()
        .style.map((style) => style.textContent)
        .join('\n') + printRules(lightColours),
    )
  app.provide('usehead', {
    push(entry: () => HeadEntry) {
      write(entry)
      document.adoptedStyleSheets = [...document.adoptedStyleSheets, sheet]
      return { patch: write }
    },
  })
}
