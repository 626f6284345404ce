import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { openClock } from './clock'

const folder = mkdtempSync(join(tmpdir(), 'evenrule-clock-'))
afterAll(() => rmSync(folder, { recursive: true }))
const ahead = (clock: () => Date): number => Math.round((clock().getTime() - Date.now()) / 86_400_000) + 0

describe('the clock', () => {
  it('is the machine’s without a file, and while the file is not there', () => {
    expect(ahead(openClock(undefined))).toBe(0)
    expect(ahead(openClock(join(folder, 'absent')))).toBe(0)
  })

  it('runs as many days ahead as the file says at the moment', () => {
    const file = join(folder, 'days')
    const clock = openClock(file)
    writeFileSync(file, '3\n')
    expect(ahead(clock)).toBe(3)
    writeFileSync(file, '40')
    expect(ahead(clock)).toBe(40)
  })

  it('refuses a file that holds no number', () => {
    const file = join(folder, 'words')
    writeFileSync(file, 'tomorrow')
    expect(openClock(file)).toThrow('must hold a number of days, not "tomorrow"')
  })
})
