// What the set-up says, and how it gives up: one clear sentence and an exit code that is not 0.

/** A fault that a person can act on; its message is the sentence. */
export class SetupFault extends Error {}

/**
 * @param {string} sentence
 * @returns {never}
 */
export function fail(sentence) {
  throw new SetupFault(sentence);
}

/** @param {string} line */
export function say(line) {
  process.stderr.write(`${line}\n`);
}

const FULL = /ENOSPC|EDQUOT|no space left|disk quota exceeded|53100/i;

/**
 * Whether a program's output tells of a full disk.
 * @param {string} text
 */
export const tellsOfFullDisk = (text) => FULL.test(text);

/**
 * The line of a program's output that says what went wrong.
 * @param {string} text
 * @param {RegExp} [mark] how such a line looks
 */
export function decidingLine(text, mark) {
  const lines = text
    .split('\n')
    .map((line) => line.trim())
    .filter((line) => line !== '');
  return (mark && lines.find((line) => mark.test(line))) ?? lines.at(-1) ?? 'it said nothing';
}

/**
 * Turns the faults of the system into sentences.
 * @param {unknown} error
 * @param {string} what what was done, as in "while the product is built"
 * @returns {string}
 */
export function sentenceOf(error, what) {
  if (error instanceof SetupFault) return error.message;
  const { code, path, message } = /** @type {NodeJS.ErrnoException} */ (error ?? {});
  const text = `${message ?? error}`;
  if (FULL.test(`${code} ${text}`)) {
    return `The disk is full while ${what}. Free some space and run it again; nothing was lost.`;
  }
  if (code === 'EACCES' || code === 'EPERM') {
    return `A right is missing while ${what}: ${path ?? text}. Give this user the right, or set GAPWRIGHT_DATA to a folder it owns.`;
  }
  if (code === 'ENOENT' && path !== undefined) return `It failed while ${what}: ${path} cannot be made or found.`;
  if (code === 'EROFS') return `The file system is read-only while ${what}: ${path ?? text}.`;
  return `It failed while ${what}: ${text.replace(/\s+/g, ' ').slice(0, 400)}`;
}

/**
 * Runs an entry point; any fault ends it with one sentence.
 * @param {string} what
 * @param {() => Promise<void>} main
 */
export async function runOrFail(what, main) {
  try {
    await main();
  } catch (error) {
    say(sentenceOf(error, what));
    if (process.env.GAPWRIGHT_TRACE) console.error(error);
    process.exit(1);
  }
}
