import { createServer } from 'node:net';
import { Sentence } from './say.mjs';

/**
 * Free ports of the loopback address, all different.
 * @param {number} count
 * @returns {Promise<number[]>}
 */
export async function freePorts(count) {
  const servers = await Promise.all(Array.from({ length: count }, () => listen(0)));
  const ports = servers.map((server) => /** @type {import('node:net').AddressInfo} */ (server.address()).port);
  await Promise.all(servers.map((server) => new Promise((resolve) => server.close(resolve))));
  return ports;
}

/**
 * Refuses with a sentence when somebody listens on the port already.
 * @param {number} port
 */
export async function requireFreePort(port) {
  try {
    const server = await listen(port);
    await new Promise((resolve) => server.close(resolve));
  } catch (error) {
    throw new Sentence(`Port ${port} is taken. Choose another one: PORT=${port + 1} npm start`, { cause: error });
  }
}

/**
 * @param {number} port
 * @returns {Promise<import('node:net').Server>}
 */
function listen(port) {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.once('error', reject);
    server.listen(port, '127.0.0.1', () => resolve(server));
  });
}
