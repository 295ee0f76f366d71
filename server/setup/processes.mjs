// What /proc tells about processes. A process number alone says little: it may be a dead process that nobody reaped yet, or
// given away again.
import fs from 'node:fs';

/** State and start of a process, or null if there is none or it is dead. */
function lookUp(pid) {
  try {
    const stat = fs.readFileSync(`/proc/${pid}/stat`, 'utf8');
    // the name in brackets may hold anything; what follows it is fields 3, 4, …
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return fields[0] === 'Z' || fields[0] === 'X' ? null : { start: fields[19] };
  } catch {
    return null;
  }
}

/**
 * A mark that no other process ever has on this machine since it was switched on; null if the process is gone.
 * @param {number} pid
 * @returns {string | null}
 */
export function processMark(pid) {
  const found = lookUp(pid);
  return found === null ? null : `${pid}-${found.start}`;
}

/**
 * @param {string} mark
 * @returns {boolean}
 */
export const isAlive = (mark) => processMark(Number.parseInt(mark, 10)) === mark;

/**
 * The words a living process was started with.
 * @param {number} pid
 * @returns {string[]}
 */
export function commandLine(pid) {
  if (lookUp(pid) === null) return [];
  try {
    return fs.readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0');
  } catch {
    return [];
  }
}
