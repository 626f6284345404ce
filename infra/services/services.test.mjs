import { spawn } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import { ports, readConfig } from '../config.mjs'
import { chooseStages } from '../tests/stages.mjs'
import { identify, identifyNew, isAlive, stopProcess } from './identity.mjs'
import { satisfies } from './node-version.mjs'
import { freePorts, isFree, requireFreePorts } from './ports.mjs'
import { RunFile, inStopOrder } from './run-file.mjs'
import { keepSecrets } from './secrets.mjs'

const folder = mkdtempSync(join(tmpdir(), 'evenrule-infra-'))
afterAll(() => rmSync(folder, { recursive: true }))

const sleeper = () => spawn(process.execPath, ['-e', 'setInterval(() => {}, 1000)'], { stdio: 'ignore' })

describe('the Node.js version', () => {
  it.each([
    ['20.19.0', true],
    ['20.20.2', true],
    ['20.18.3', false],
    ['21.7.0', false],
    ['22.0.0', true],
    ['24.1.0', true],
    ['18.20.0', false],
  ])('%s is judged %s against the range of package.json', (version, meets) => {
    expect(satisfies(version, '>=20.19 <21 || >=22')).toBe(meets)
  })
})

describe('the settings', () => {
  it('take ports from the environment and put them into the addresses', () => {
    const config = readConfig({ EVENRULE_SUPPLIER_PORT: '5310' })
    expect(config.address).toMatchObject({
      supplier: 'http://localhost:5310',
      customer: 'http://localhost:4320',
    })
  })

  it('name the variable that is not a port, and two that are the same', () => {
    expect(() => readConfig({ EVENRULE_S3_PORT: '70000' })).toThrow(/EVENRULE_S3_PORT .*not "70000"/)
    expect(() => readConfig({ EVENRULE_S3_PORT: '4310' })).toThrow(
      /EVENRULE_SUPPLIER_PORT and EVENRULE_S3_PORT/,
    )
  })

  it('keep passwords once made', () => {
    const config = { file: { secrets: join(folder, 'secrets.json') } }
    const made = keepSecrets(config)
    expect(made.session).toMatch(/^[0-9a-f]{48}$/)
    expect(keepSecrets(config)).toEqual(made)
    const { invitation: _none, ...earlier } = made
    writeFileSync(config.file.secrets, JSON.stringify(earlier))
    const upgraded = keepSecrets(config)
    expect(upgraded).toEqual({ ...earlier, invitation: expect.stringMatching(/^[0-9a-f]{48}$/) })
    expect(keepSecrets(config)).toEqual(upgraded)
  })
})

describe('the ports', () => {
  it.each(['127.0.0.1', '::1'])(
    'are not free while another program listens on %s, and the message says whose',
    async (address) => {
      const server = createServer()
      await new Promise((done) => server.listen(0, address, done))
      const { port } = server.address()
      expect(await isFree(port)).toBe(false)
      const numbers = await freePorts(Object.keys(ports).length)
      const free = Object.fromEntries(Object.keys(ports).map((name, at) => [name, numbers[at]]))
      const held = requireFreePorts({ port: { ...free, mail: port } })
      await expect(held).rejects.toThrow(`Port ${port} (mail page) is held by another program`)
      await expect(held).rejects.toThrow('EVENRULE_MAIL_PORT')
      await new Promise((done) => server.close(done))
      expect(await isFree(port)).toBe(true)
    },
  )
})

describe('the processes of an earlier start', () => {
  it('are told from later ones with the same number', async () => {
    const child = sleeper()
    const noted = identify(child.pid)
    expect(isAlive(noted)).toBe(true)
    expect(isAlive({ ...noted, began: '1' })).toBe(false)
    expect(isAlive({ ...noted, command: 'another program' })).toBe(false)
    expect(await stopProcess(noted)).toBe(true)
    expect(isAlive(noted)).toBe(false)
  })

  it('are noted with their command line however early they are looked at', () => {
    const children = Array.from({ length: 20 }, () => {
      const child = sleeper()
      return { child, noted: identifyNew(child.pid) }
    })
    for (const { noted } of children) expect(noted.command).toContain('setInterval')
    for (const { child } of children) child.kill()
  })

  it('are stopped by the next start, but not a program that merely has the number of one', async () => {
    const path = join(folder, 'run.json')
    const left = sleeper()
    const stranger = sleeper()
    const children = { api: identify(left.pid), worker: { ...identify(stranger.pid), began: '1' } }
    writeFileSync(path, JSON.stringify({ start: { ...identify(process.pid), began: '1' }, children }))
    const told = []
    expect(await new RunFile(path).claim((names) => told.push(...names))).toBe(true)
    expect(told).toEqual(['api'])
    expect(isAlive(children.api)).toBe(false)
    expect(identify(stranger.pid)).toBeDefined()
    stranger.kill()
  })

  it('keep a second start out while the first is alive, and let it in afterwards', async () => {
    const path = join(folder, 'held.json')
    const first = new RunFile(path)
    expect(await first.claim(() => {})).toBe(true)
    expect(await new RunFile(path).claim(() => {})).toBe(false)
    first.release()
    expect(await new RunFile(path).claim(() => {})).toBe(true)
  })

  it('go in the order in which they need each other', () => {
    expect(inStopOrder(['postgres', 's3', 'api', 'worker'])).toEqual(['worker', 'api', 's3', 'postgres'])
  })
})

describe('npm test', () => {
  it('runs every stage, or those named, and takes other words for names of files', () => {
    expect(chooseStages([]).chosen.map(({ name }) => name)).toContain('browser')
    const { chosen, filters } = chooseStages(['api', 'parts'])
    expect(chosen.map(({ name }) => name)).toEqual(['api'])
    expect(filters).toEqual(['parts'])
  })
})
