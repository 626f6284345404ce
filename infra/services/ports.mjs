import { readdirSync, readFileSync, readlinkSync } from 'node:fs'
import { createServer } from 'node:net'
import { host, ports } from '../config.mjs'
import { Problem } from './say.mjs'

/** Whether nobody listens on a port of either loopback address; a browser may try both for "localhost". */
export async function isFree(port) {
  return (await canListen(port, host)) && (await canListen(port, '::1'))
}

function canListen(port, address) {
  return new Promise((resolve, reject) => {
    const server = createServer()
    server.once('error', (error) => {
      if (error.code === 'EADDRINUSE') resolve(false)
      else if (error.code === 'EACCES')
        reject(new Problem(`Port ${port} may not be used without more rights; choose one above 1023.`))
      // A machine without IPv6 has nobody listening there.
      else if (error.code === 'EADDRNOTAVAIL' || error.code === 'EAFNOSUPPORT') resolve(true)
      else reject(error)
    })
    server.listen({ port, host: address, exclusive: true }, () => server.close(() => resolve(true)))
  })
}

/** Ports that are free at this moment, all different. */
export async function freePorts(count) {
  const servers = Array.from({ length: count }, () => createServer())
  await Promise.all(servers.map((server) => new Promise((done) => server.listen({ port: 0, host }, done))))
  const found = servers.map((server) => server.address().port)
  await Promise.all(servers.map((server) => new Promise((done) => server.close(done))))
  return found
}

/** The program that listens on a port, such as "node, process 4711"; undefined when the system does not tell. */
function holder(port) {
  try {
    const suffix = `:${port.toString(16).toUpperCase().padStart(4, '0')}`
    const listening = ['/proc/net/tcp', '/proc/net/tcp6']
      .flatMap((file) => readFileSync(file, 'utf8').split('\n').slice(1))
      .map((line) => line.trim().split(/\s+/))
      .filter((fields) => fields[1]?.endsWith(suffix) && fields[3] === '0A')
      .map((fields) => `socket:[${fields[9]}]`)
    for (const pid of readdirSync('/proc').filter((name) => /^\d+$/.test(name))) {
      const open = descriptors(pid)
      if (listening.some((socket) => open.includes(socket))) {
        return `${readFileSync(`/proc/${pid}/comm`, 'utf8').trim()}, process ${pid}`
      }
    }
  } catch {
    // Naming the program is a courtesy; without it the line is still complete.
  }
  return undefined
}

function descriptors(pid) {
  try {
    return readdirSync(`/proc/${pid}/fd`).map((name) => {
      try {
        return readlinkSync(`/proc/${pid}/fd/${name}`)
      } catch {
        return ''
      }
    })
  } catch {
    return []
  }
}

/**
 * Makes sure that the ports of an instance are free.
 *
 * @throws {Problem} naming the first port that is held, by whom, and the variable that changes it
 */
export async function requireFreePorts(config) {
  for (const [name, { variable, use }] of Object.entries(ports)) {
    const port = config.port[name]
    if (await isFree(port)) continue
    const who = holder(port)
    throw new Problem(
      `Port ${port} (${use}) is held by another program${who ? ` (${who})` : ''}; stop that, or choose another port with ${variable}.`,
    )
  }
}
