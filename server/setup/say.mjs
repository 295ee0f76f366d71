// What the set-up says, and how it gives up: one clear sentence and an exit code that is not 0.

/** A fault that a person can act on; its message is the sentence. */
export class SetupFault extends Error {}

export function fail(sentence) {
  throw new SetupFault(sentence);
}

export function say(line) {
  process.stderr.write(`${line}\n`);
}

/** Turns the faults of the system into sentences. */
export function sentenceOf(error, what) {
  if (error instanceof SetupFault) return error.message;
  const text = `${error?.message ?? error}`;
  if (error?.code === 'ENOSPC' || /ENOSPC|no space left/i.test(text)) {
    return `The disk is full while ${what}. Free some space and run it again; nothing was lost.`;
  }
  if (error?.code === 'EACCES' || error?.code === 'EPERM') {
    return `A right is missing while ${what}: ${error.path ?? text}. Give this user the right, or set GAPWRIGHT_DATA to a folder it owns.`;
  }
  if (error?.code === 'EROFS') return `The file system is read-only while ${what}: ${error.path ?? text}.`;
  return `It failed while ${what}: ${text.replace(/\s+/g, ' ').slice(0, 400)}`;
}

/** Runs an entry point; any fault ends it with one sentence. */
export async function runOrFail(what, main) {
  try {
    await main();
  } catch (error) {
    say(sentenceOf(error, what));
    if (process.env.GAPWRIGHT_TRACE) console.error(error);
    process.exit(1);
  }
}
