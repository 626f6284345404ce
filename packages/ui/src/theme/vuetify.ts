import type { App } from 'vue'
import { createVuetify, type ThemeDefinition } from 'vuetify'
import { aliases, mdi } from 'vuetify/iconsets/mdi-svg'
import { defaults } from './defaults'
import { adoptThemeSheet } from './themeSheet'
import { accentOf, palette, type Side, type ThemeName } from './tokens'
import { storedThemeChoice } from './useTheme'

/** Vuetify's colour names for a look and side, beside the palette's own names. */
function coloursOf(theme: ThemeName, side: Side): Record<string, string> {
  const own = palette[theme]
  const accent = own[accentOf[side]]
  return {
    ...own,
    accent,
    'accent-soft': own[`${accentOf[side]}-soft`],
    background: own.ground,
    surface: own.sheet,
    'surface-bright': own.sheet,
    'surface-light': own.hair,
    'surface-variant': own.ink,
    'on-surface-variant': own.sheet,
    primary: accent,
    secondary: own.soft,
    error: own.rust,
    warning: own.rust,
    info: accent,
    success: own.ink,
    'on-background': own.ink,
    'on-surface': own.ink,
    'on-primary': own['on-accent'],
    'on-error': own['on-accent'],
    'on-warning': own['on-accent'],
  }
}

function themeOf(theme: ThemeName, side: Side): ThemeDefinition {
  const own = palette[theme]
  return {
    dark: theme === 'dark',
    colors: coloursOf(theme, side),
    variables: {
      'border-color': own.line,
      'border-opacity': 1,
      'high-emphasis-opacity': 1,
      'medium-emphasis-opacity': 0.8,
      'disabled-opacity': 0.5,
      'hover-opacity': 0.06,
      'focus-opacity': 0.08,
      'activated-opacity': 0.1,
      'shadow-key-opacity': 0,
      'shadow-ambient-opacity': 0,
    },
  }
}

/**
 * The Vuetify plugin in the product's look for one side of the table.
 * Follows the system's light or dark unless the person chose one (`useTheme`); works under a strict
 * `style-src 'self'`. Import `@evenrule/ui/base.css` beside it.
 */
export function createEvenruleVuetify({ side }: { side: Side }): { install(app: App): void } {
  const vuetify = createVuetify({
    theme: {
      defaultTheme: storedThemeChoice(),
      themes: { light: themeOf('light', side), dark: themeOf('dark', side) },
    },
    icons: { defaultSet: 'mdi', aliases, sets: { mdi } },
    display: { mobileBreakpoint: 768, thresholds: { sm: 600, md: 768 } },
    defaults,
  })
  return {
    install(app) {
      if (typeof document !== 'undefined') document.documentElement.dataset.side = side
      adoptThemeSheet(app, coloursOf('light', side))
      vuetify.install(app)
    },
  }
}
