export { createEvenruleVuetify } from './vuetify'
export { useTheme, type ThemeChoice, type UseThemeReturn } from './useTheme'
export { accentOf, palette, type Side, type ThemeName, type Token } from './tokens'
