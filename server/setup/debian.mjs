// Debian's packages: installed if they are missing, as root or through sudo.
import fs from 'node:fs';
import { isRoot } from './places.mjs';
import { run } from './run.mjs';
import { decidingLine, fail, say, tellsOfFullDisk } from './say.mjs';

/** How to run a command with the rights of root. */
async function rightsOfRoot(name) {
  if (isRoot) return [];
  const quiet = await run('sudo', ['-n', 'true']);
  if (quiet.status === 0) return ['sudo', '-n'];
  // sudo asks on the terminal itself
  if (!quiet.missing && process.stdin.isTTY) return ['sudo'];
  const why = quiet.missing ? 'there is no sudo' : 'sudo asks for a password that nobody can type here';
  return fail(
    `Debian's ${name} is missing and this user may not install it (${why}). Run as root: apt-get install -y ${name}`,
  );
}

function aptGet(prefix, args) {
  const words = [...prefix, 'env', 'DEBIAN_FRONTEND=noninteractive', 'LC_ALL=C.UTF-8'];
  // another installation may be under way
  words.push('apt-get', '-q', '-o', 'DPkg::Lock::Timeout=300', ...args);
  const [command, ...rest] = words;
  const asksPassword = prefix[0] === 'sudo' && prefix.length === 1;
  return run(command, rest, { whole: true, ...(asksPassword ? { stdin: 'inherit' } : {}) });
}

/**
 * Installs Debian packages; the first one names them all.
 * @param {readonly string[]} names
 * @param {{ quiet?: boolean }} [options]
 */
export async function installDebianPackages(names, { quiet = false } = {}) {
  const [name] = names;
  if (!fs.existsSync('/usr/bin/apt-get')) {
    fail(`${name} is missing and this is no Debian machine. Install it by hand; README.md says what is needed.`);
  }
  const prefix = await rightsOfRoot(name);
  if (!quiet) say(`Installing Debian's ${name} …`);
  const install = () => aptGet(prefix, ['install', '-y', '--no-install-recommends', ...names]);
  let result = await install();
  if (result.status !== 0 && /dpkg was interrupted/.test(result.text)) {
    await run(prefix[0] ?? 'dpkg', [...prefix.slice(1), ...(prefix.length > 0 ? ['dpkg'] : []), '--configure', '-a'], {
      whole: true,
    });
    result = await install();
  }
  if (result.status !== 0 && !tellsOfFullDisk(result.text)) {
    // an empty or old list of packages is the usual reason
    const updated = await aptGet(prefix, ['update']);
    const again = await install();
    result = again.status !== 0 && updated.status !== 0 ? { ...again, text: `${updated.text}\n${again.text}` } : again;
  }
  if (result.status === 0) return;
  if (tellsOfFullDisk(result.text)) {
    fail(`The disk is full while Debian's ${name} is installed. Free some space and run it again.`);
  }
  fail(`Debian's ${name} could not be installed: ${decidingLine(result.text, /^E: /)}`);
}

export const CHROMIUM = '/usr/bin/chromium';

/** Debian's Chromium for the browser tests, with a typeface for the signs that the product's own lacks. */
export async function ensureChromium() {
  if (!fs.existsSync(CHROMIUM)) await installDebianPackages(['chromium', 'fonts-dejavu-core']);
}
