// PostgreSQL's programs: found, or installed from Debian's package.
import fs from 'node:fs';
import path from 'node:path';
import { installDebianPackages } from './debian.mjs';
import { run } from './run.mjs';
import { fail } from './say.mjs';

const LIBRARY = '/usr/lib/postgresql';
const OLDEST = 13;

/** @typedef {{ major: number, bin: string }} Programs */

/** The server programs that Debian has put on this machine, the newest first. */
function installedMajors() {
  if (!fs.existsSync(LIBRARY)) return [];
  return fs
    .readdirSync(LIBRARY)
    .filter((v) => /^\d+$/.test(v) && fs.existsSync(path.join(LIBRARY, v, 'bin/initdb')))
    .map(Number)
    .filter((major) => major >= OLDEST)
    .sort((a, b) => b - a);
}

const binOf = (major) => path.join(LIBRARY, String(major), 'bin');

/** The majors whose data lies in a folder. */
function dataMajors(base) {
  if (!fs.existsSync(base)) return [];
  return fs
    .readdirSync(base)
    .map((name) => Number(/^postgresql-(\d+)$/.exec(name)?.[1]))
    .filter((major) => major > 0);
}

/** The programs that the setting names. */
async function namedPrograms(bin) {
  const version = await run(path.join(bin, 'postgres'), ['--version'], { whole: true });
  const major = Number(/\) (\d+)/.exec(version.stdout)?.[1]);
  if (!major) fail(`The setting GAPWRIGHT_PG_BIN names ${bin}, which holds no PostgreSQL server.`);
  if (major < OLDEST) fail(`The setting GAPWRIGHT_PG_BIN names PostgreSQL ${major}; ${OLDEST} or newer is needed.`);
  return { major, bin };
}

/** The data of another major must not be passed over in silence: it would seem gone. */
function refuseOtherMajor(base, other, major) {
  const folder = path.join(base, `postgresql-${other}`);
  fail(
    `The data in ${folder} was made by PostgreSQL ${other}, but PostgreSQL ${major} is what is installed; nothing was touched. ` +
      `Either install PostgreSQL ${other} and set GAPWRIGHT_PG_BIN to its folder of programs, or move the data over: ` +
      `with ${other} start once and run pg_dump "$(npm run --silent db:url)" > gapwright.sql, move ${folder} away, ` +
      `start once with ${major}, and run psql "$(npm run --silent db:url)" < gapwright.sql.`,
  );
}

/**
 * Chooses the programs for the data in a folder; installs Debian's if there are none at all.
 * @param {string} base
 * @param {{ quiet?: boolean }} [options]
 * @returns {Promise<Programs>}
 */
export async function choosePrograms(base, { quiet = false } = {}) {
  const [data, ...more] = dataMajors(base);
  if (more.length > 0) {
    fail(
      `${base} holds the data of PostgreSQL ${[data, ...more].join(' and ')}. Move all but one of the folders away.`,
    );
  }
  const named = process.env.GAPWRIGHT_PG_BIN;
  if (!named && installedMajors().length === 0) await installDebianPackages(['postgresql'], { quiet });
  const majors = installedMajors();
  if (!named && data !== undefined && majors.includes(data)) return { major: data, bin: binOf(data) };
  const [newest] = majors;
  const chosen = named ? await namedPrograms(named) : newest && { major: newest, bin: binOf(newest) };
  if (!chosen) return fail(`Debian's postgresql is installed but its server programs are not under ${LIBRARY}.`);
  if (data !== undefined && data !== chosen.major) refuseOtherMajor(base, data, chosen.major);
  return chosen;
}
