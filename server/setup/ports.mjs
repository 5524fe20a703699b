import { createServer } from 'node:net'
import { SetupProblem } from './say.mjs'

const HIGHEST_PORT = 65_535
const TRIES = 50

/**
 * The port PORT asks for; undefined when it asks for none.
 * @param {string | undefined} text
 */
export function parsePort(text) {
  if (text === undefined || text === '') return undefined
  const port = /^\d{1,5}$/.test(text) ? Number(text) : NaN
  if (!(port >= 1 && port <= HIGHEST_PORT)) {
    throw new SetupProblem(`PORT must be a whole number from 1 to ${HIGHEST_PORT}; it is "${text}".`)
  }
  return port
}

/**
 * Whether nobody listens on a port of the loopback address; `0` gives any free port.
 * @param {number} port
 * @returns {Promise<number | undefined>} the port, or undefined when it is taken
 */
export function tryPort(port) {
  return new Promise((resolve) => {
    const server = createServer()
    server.once('error', () => resolve(undefined))
    server.listen(port, '127.0.0.1', () => {
      const address = server.address()
      server.close(() => resolve(typeof address === 'object' && address ? address.port : undefined))
    })
  })
}

/** Any free port of the loopback address. */
export async function findFreePort() {
  const port = await tryPort(0)
  if (port === undefined) throw new SetupProblem('No port of 127.0.0.1 is free.')
  return port
}

/**
 * The port for the server: the one asked for, which must be free, or the first free one from the usual one upwards.
 * @param {number | undefined} asked
 * @param {number} usual
 * @param {(port: number) => Promise<number | undefined>} [probe]
 */
export async function choosePort(asked, usual, probe = tryPort) {
  if (asked !== undefined) {
    if ((await probe(asked)) === undefined) {
      throw new SetupProblem(
        `Port ${asked} is in use by another program. Set PORT to a free one, or to none.`,
      )
    }
    return asked
  }
  for (let port = usual; port < usual + TRIES && port <= HIGHEST_PORT; port += 1) {
    if ((await probe(port)) !== undefined) return port
  }
  throw new SetupProblem(`The ports ${usual} to ${usual + TRIES - 1} are all in use. Set PORT to a free one.`)
}
