// Who uses a PostgreSQL of ours at the moment: the last one out stops it.
import fs from 'node:fs';
import path from 'node:path';
import { isAlive, processMark } from './processes.mjs';

const KEPT = 'kept';
const folderOf = (base) => path.join(base, 'users');

/**
 * Notes that this process uses the server.
 * @param {string} base
 * @param {string} note what it is, for the other users' sentences
 */
export function joinUsers(base, note) {
  fs.mkdirSync(folderOf(base), { recursive: true, mode: 0o700 });
  fs.writeFileSync(path.join(folderOf(base), processMark(process.pid) ?? String(process.pid)), note);
}

/** @param {string} base */
export function leaveUsers(base) {
  fs.rmSync(path.join(folderOf(base), processMark(process.pid) ?? String(process.pid)), { force: true });
}

/**
 * The notes of the processes that use the server; those that ended without leaving are forgotten.
 * @param {string} base
 * @returns {{ pid: number, note: string }[]}
 */
export function usersOf(base) {
  const folder = folderOf(base);
  if (!fs.existsSync(folder)) return [];
  const users = [];
  for (const mark of fs.readdirSync(folder)) {
    const file = path.join(folder, mark);
    if (mark === KEPT) continue;
    if (isAlive(mark)) users.push({ pid: Number.parseInt(mark, 10), note: fs.readFileSync(file, 'utf8') });
    else fs.rmSync(file, { force: true });
  }
  return users;
}

/**
 * Whether the server stays up without users, as after `npm run db:url`.
 * @param {string} base
 */
export const isKept = (base) => fs.existsSync(path.join(folderOf(base), KEPT));

/**
 * @param {string} base
 * @param {boolean} keep
 */
export function setKept(base, keep) {
  fs.mkdirSync(folderOf(base), { recursive: true, mode: 0o700 });
  if (keep) fs.writeFileSync(path.join(folderOf(base), KEPT), '');
  else fs.rmSync(path.join(folderOf(base), KEPT), { force: true });
}
