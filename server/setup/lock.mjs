// Locks between processes. The kernel holds them (a socket without a file) and lets go when the holder ends, however it
// ends: there is no stale lock.
import { createHash } from 'node:crypto';
import net from 'node:net';
import { stopIfAsked } from './run.mjs';
import { fail } from './say.mjs';

const sleep = (ms) => new Promise((resolve) => setTimeout(resolve, ms));

function tryLock(name) {
  return new Promise((resolve, reject) => {
    const server = net.createServer((socket) => socket.destroy());
    server.once('error', (/** @type {NodeJS.ErrnoException} */ error) =>
      error.code === 'EADDRINUSE' ? resolve(null) : reject(error),
    );
    server.listen(`\0gapwright-${name}`, () => resolve(server.unref()));
  });
}

/**
 * Runs `work` alone among all processes that lock the same folder for the same purpose.
 * @template T
 * @param {string} folder
 * @param {string} purpose in words, as in "the database is set up"
 * @param {() => Promise<T>} work
 * @param {{ waitSeconds?: number, toTheEnd?: boolean }} [options] `toTheEnd`: it is part of stopping, and not to be stopped
 * @returns {Promise<T>}
 */
export async function withLock(folder, purpose, work, { waitSeconds = 600, toTheEnd = false } = {}) {
  const name = createHash('sha256').update(`${folder}\0${purpose}`).digest('hex').slice(0, 32);
  const until = Date.now() + waitSeconds * 1000;
  let lock = await tryLock(name);
  while (lock === null) {
    if (!toTheEnd) stopIfAsked();
    if (Date.now() > until) {
      fail(`Another process holds ${folder} since ${waitSeconds} s while ${purpose}. Wait for it or end it.`);
    }
    await sleep(100);
    lock = await tryLock(name);
  }
  try {
    return await work();
  } finally {
    await new Promise((resolve) => lock.close(resolve));
  }
}
