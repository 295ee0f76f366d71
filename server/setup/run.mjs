// Runs programs. Ctrl-C and SIGTERM end the ones that may be ended at any time; the others are let finish first.
import { spawn } from 'node:child_process';
import { SetupFault } from './say.mjs';

/** Thrown where the set-up was asked to stop. */
export class Interrupted extends SetupFault {
  constructor() {
    super('Stopped before it was up.');
  }
}

const interruption = new AbortController();

/** From here on a signal ends the set-up at its next step instead of at once, so that it can clean up. */
export function heedSignals() {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => interruption.abort());
}

export function stopIfAsked() {
  if (interruption.signal.aborted) throw new Interrupted();
}

/**
 * @typedef {object} RunOptions
 * @property {string} [cwd]
 * @property {Record<string, string | undefined>} [env]
 * @property {number} [uid]
 * @property {number} [gid]
 * @property {string} [input] goes to its standard input
 * @property {'inherit'} [stdin] the person may answer its questions
 * @property {boolean} [show] its output goes to the person as it comes
 * @property {boolean} [silent] its output is thrown away, and it may leave a server behind that outlives us
 * @property {boolean} [whole] it is not to be ended half-way
 * @typedef {{ status: number | null, stdout: string, stderr: string, text: string, missing: boolean }} Ran
 */

/**
 * Runs a program to its end; never throws for what the program does.
 * @param {string} command
 * @param {readonly string[]} args
 * @param {RunOptions} [options]
 * @returns {Promise<Ran>}
 */
export function run(command, args, options = {}) {
  const { cwd = '/', env = process.env, uid, gid, input, stdin, show, silent, whole } = options;
  if (!whole) stopIfAsked();
  const out = show ? 'inherit' : silent ? 'ignore' : 'pipe';
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, {
      cwd,
      env,
      uid,
      gid,
      // a group of its own: a terminal's Ctrl-C reaches only us
      detached: whole && stdin === undefined,
      stdio: [input === undefined ? (stdin ?? 'ignore') : 'pipe', out, out],
    });
    const end = () => child.kill('SIGTERM');
    if (!whole) interruption.signal.addEventListener('abort', end, { once: true });
    let stdout = '';
    let stderr = '';
    child.stdout?.setEncoding('utf8').on('data', (part) => (stdout += part));
    child.stderr?.setEncoding('utf8').on('data', (part) => (stderr += part));
    if (input !== undefined) child.stdin?.on('error', () => undefined).end(input);
    const finish = (status, missing) => {
      interruption.signal.removeEventListener('abort', end);
      if (!whole && interruption.signal.aborted) reject(new Interrupted());
      else resolve({ status, stdout, stderr, text: `${stdout}\n${stderr}`, missing });
    };
    child.once('error', (error) => {
      stderr += error.message;
      finish(null, /** @type {NodeJS.ErrnoException} */ (error).code === 'ENOENT');
    });
    child.once('close', (status) => finish(status, false));
  });
}
