import type { VuetifyOptions } from 'vuetify'

const field = {
  variant: 'outlined',
  density: 'compact',
  color: 'primary',
  hideDetails: 'auto',
  persistentHint: true,
} as const

/** Flat, quiet settings for Vuetify's components; what CSS must do on top is in vuetify.css. */
export const defaults: NonNullable<VuetifyOptions['defaults']> = {
  global: { ripple: false },
  VBtn: { variant: 'outlined', color: 'primary', ripple: false },
  VTextField: field,
  VSelect: { ...field, menuProps: { transition: false } },
  VAutocomplete: { ...field, menuProps: { transition: false } },
  VTextarea: { ...field, autoGrow: true, rows: 3 },
  VFileInput: { ...field, prependIcon: '' },
  VCheckbox: { density: 'compact', color: 'primary', hideDetails: 'auto' },
  VRadioGroup: { density: 'compact', color: 'primary', hideDetails: 'auto' },
  VSwitch: { density: 'compact', color: 'primary', hideDetails: 'auto', inset: true },
  VMenu: { transition: false },
  VTooltip: { transition: false },
  VDialog: { transition: 'fade-transition', scrim: 'black' },
  VCard: { variant: 'outlined', elevation: 0 },
  VTabs: { color: 'primary', density: 'compact' },
  VChip: { variant: 'outlined', size: 'small' },
}
