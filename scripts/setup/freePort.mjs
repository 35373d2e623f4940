import { createServer } from 'node:net'

function tryPort(host, port) {
  return new Promise((resolve, reject) => {
    const server = createServer()
    server.once('error', reject)
    server.listen(port, host, () => {
      const taken = server.address().port
      server.close(() => resolve(taken))
    })
  })
}

/** Any port nobody listens on at the moment. */
export const anyFreePort = (host = '127.0.0.1') => tryPort(host, 0)

/** `wanted` if it is free, else the next one that is; 0 is any. */
export async function freePortFrom(wanted, host) {
  for (let port = wanted; port <= 65535; port += 1) {
    try {
      return await tryPort(host, port)
    } catch (error) {
      if (error.code !== 'EADDRINUSE') throw error
    }
  }
  return anyFreePort(host)
}
