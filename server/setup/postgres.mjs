// A PostgreSQL of the project's own, on loopback, with its own data folder, port and password. It touches no other server
// and not Debian's ready-made cluster.
import fs from 'node:fs';
import { Cluster } from './cluster.mjs';
import { withLock } from './lock.mjs';
import { dataFolder } from './places.mjs';
import { choosePrograms } from './programs.mjs';
import { isKept, joinUsers, leaveUsers, setKept, usersOf } from './users.mjs';

/** @typedef {'main' | 'test'} Purpose `test` has data that nobody would miss, and writes it carelessly */

async function openCluster(purpose, base, options) {
  return Cluster.open(purpose, base, await choosePrograms(base, options));
}

const alone = (base, work, options) => withLock(base, 'the database is set up', work, options);

/**
 * Brings the server of one purpose up and notes that this process uses it.
 * @param {Purpose} purpose
 * @param {{ quiet?: boolean, note?: string, keep?: boolean }} [options] `note`: what this process is. `keep`: the server
 *   stays when its last user leaves
 * @returns {Promise<{ url: string, base: string }>}
 */
export async function startPostgres(purpose, { quiet = false, note = '', keep = false } = {}) {
  const base = dataFolder(purpose, { create: true });
  return alone(base, async () => {
    const cluster = await openCluster(purpose, base, { quiet });
    if (!cluster.isRunning()) {
      await cluster.create();
      await cluster.launch();
    }
    joinUsers(base, note);
    if (keep) setKept(base, true);
    await cluster.ensureDatabase();
    return { url: cluster.url(), base };
  });
}

/**
 * This process uses the server no longer; the last one out stops it.
 * @param {Purpose} purpose
 */
export async function releasePostgres(purpose) {
  const base = dataFolder(purpose);
  const leave = async () => {
    leaveUsers(base);
    if (usersOf(base).length > 0 || isKept(base)) return;
    const cluster = await openCluster(purpose, base, { quiet: true });
    if (cluster.isRunning()) await cluster.stop();
  };
  await alone(base, leave, { toTheEnd: true });
}

/**
 * Stops the server, whoever uses it.
 * @param {Purpose} purpose
 * @returns {Promise<boolean>} whether it ran
 */
export async function stopPostgres(purpose) {
  const base = dataFolder(purpose);
  if (!fs.existsSync(base)) return false;
  return alone(base, async () => {
    setKept(base, false);
    const cluster = await openCluster(purpose, base, { quiet: true });
    if (!cluster.isRunning()) return false;
    await cluster.stop();
    return true;
  });
}

/**
 * Makes an empty database on a server that runs.
 * @param {Purpose} purpose
 * @param {string} name a plain identifier
 * @returns {Promise<string>} its address
 */
export async function createDatabase(purpose, name) {
  const base = dataFolder(purpose);
  const cluster = await openCluster(purpose, base, { quiet: true });
  await cluster.ask(`create database ${name}`);
  return cluster.url(name);
}

/**
 * Drops a database, whoever uses it.
 * @param {Purpose} purpose
 * @param {string} name a plain identifier
 */
export async function dropDatabase(purpose, name) {
  const base = dataFolder(purpose);
  const cluster = await openCluster(purpose, base, { quiet: true });
  if (cluster.isRunning()) await cluster.ask(`drop database if exists ${name} with (force)`);
}
