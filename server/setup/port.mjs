// Whether the product can listen where it is told to, asked before anything is brought up.
import net from 'node:net';
import { usersOf } from './users.mjs';
import { fail } from './say.mjs';

function tryToListen(host, port) {
  return new Promise((resolve) => {
    const server = net.createServer();
    server.once('error', (/** @type {NodeJS.ErrnoException} */ error) => resolve(error.code ?? 'unknown'));
    server.listen(port, host, () => server.close(() => resolve(null)));
  });
}

/**
 * @param {string} host
 * @param {string} text the port as the settings have it
 * @param {string} base where the users of our own PostgreSQL are noted
 */
export async function refuseTakenPort(host, text, base) {
  const port = Number(text);
  // what is no port is refused by name when the settings are read
  if (!Number.isInteger(port) || port < 1 || port > 65535) return;
  const code = await tryToListen(host, port);
  if (code === null) return;
  if (code === 'EADDRINUSE') {
    const own = usersOf(base).find((user) => user.note === `npm start at http://${host}:${port}`);
    if (own)
      fail(
        `Gapwright runs already at http://${host}:${port} (process ${own.pid}). Use that one, or set PORT to another one.`,
      );
    fail(`Port ${port} is taken by another program. Stop that program, or set PORT to another one.`);
  }
  if (code === 'EACCES') fail(`This user may not listen on port ${port}. Set PORT to one above 1023.`);
  if (code === 'EADDRNOTAVAIL' || code === 'ENOTFOUND' || code === 'EAI_AGAIN') {
    fail(`The setting HOST is not valid: "${host}" is no address of this machine.`);
  }
  fail(`Port ${port} on ${host} cannot be listened on (${code}).`);
}

/** A port that is free now. @returns {Promise<number>} */
export function freePort() {
  return new Promise((resolve, reject) => {
    const server = net.createServer();
    server.once('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const { port } = /** @type {net.AddressInfo} */ (server.address());
      server.close(() => resolve(port));
    });
  });
}
