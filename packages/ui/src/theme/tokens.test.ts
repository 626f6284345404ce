import { describe, expect, it } from 'vitest'
import { palette, type ThemeName, type Token } from './tokens'

/** Relative luminance of an sRGB colour, WCAG 2.2. */
function luminance(hex: string): number {
  const [r, g, b] = [1, 3, 5].map((at) => {
    const channel = parseInt(hex.slice(at, at + 2), 16) / 255
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4
  }) as [number, number, number]
  return 0.2126 * r + 0.7152 * g + 0.0722 * b
}

function contrast(a: string, b: string): number {
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x) as [number, number]
  return (light + 0.05) / (dark + 0.05)
}

const grounds: Token[] = ['ground', 'sheet', 'petrol-soft', 'aubergine-soft', 'rust-soft']
const texts: Token[] = ['ink', 'soft', 'rust']

describe.each(['light', 'dark'] satisfies ThemeName[])('the %s palette', (theme) => {
  const colours = palette[theme]

  it.each(texts.flatMap((text) => grounds.map((ground) => [text, ground] as const)))(
    'shows %s on %s at 4.5 : 1 or better',
    (text, ground) => expect(contrast(colours[text], colours[ground])).toBeGreaterThanOrEqual(4.5),
  )

  it.each([
    ['petrol', 'ground'],
    ['petrol', 'sheet'],
    ['petrol', 'petrol-soft'],
    ['aubergine', 'ground'],
    ['aubergine', 'sheet'],
    ['aubergine', 'aubergine-soft'],
    ['on-accent', 'petrol'],
    ['on-accent', 'aubergine'],
    ['on-accent', 'rust'],
  ] as [Token, Token][])('shows the accent pair %s on %s at 4.5 : 1 or better', (text, ground) =>
    expect(contrast(colours[text], colours[ground])).toBeGreaterThanOrEqual(4.5),
  )

  it.each(['ground', 'sheet'] satisfies Token[])('shows field edges on %s at 3 : 1 or better', (ground) =>
    expect(contrast(colours.edge, colours[ground])).toBeGreaterThanOrEqual(3),
  )
})
