/** The two sides of the table; each app is one of them and carries its accent. */
export type Side = 'supplier' | 'customer'

/** The two looks the system may ask for. */
export type ThemeName = 'light' | 'dark'

/**
 * The palette of the product, the one place where its colours are written.
 * Every text and ground pair that the components use reaches 4.5 : 1, every drawing 3 : 1 (tokens.test.ts).
 */
export const palette = {
  light: {
    ground: '#F2F4F5',
    sheet: '#FFFFFF',
    ink: '#18222B',
    soft: '#55626D',
    line: '#CBD3D9',
    hair: '#E4E9EC',
    edge: '#7F8B95',
    petrol: '#0C5C6C',
    'petrol-soft': '#E2EFF1',
    aubergine: '#4A3A78',
    'aubergine-soft': '#ECE8F6',
    rust: '#B5401B',
    'rust-soft': '#FAECE6',
    'on-accent': '#FFFFFF',
  },
  dark: {
    ground: '#11171C',
    sheet: '#182027',
    ink: '#ECE9E1',
    soft: '#9AA6AF',
    line: '#33404A',
    hair: '#243039',
    edge: '#6F7D88',
    petrol: '#63B7C7',
    'petrol-soft': '#1B343B',
    aubergine: '#B3A5EA',
    'aubergine-soft': '#2B2742',
    rust: '#F08B66',
    'rust-soft': '#38231C',
    'on-accent': '#11171C',
  },
} as const satisfies Record<ThemeName, Record<string, `#${string}`>>

export type Token = keyof (typeof palette)['light']

/** Which palette entry is the accent of a side. */
export const accentOf = { supplier: 'petrol', customer: 'aubergine' } as const satisfies Record<Side, Token>
