// Rules of server/.
import { below, eachImport, within, type Rule } from './walk';

/** A folder per resource: routes, rules, queries. */
export const RESOURCES = [
  'account',
  'projects',
  'scenes',
  'meshes',
  'dry-fits',
  'pictures',
  'reviews',
  'shares',
  'teams',
];
/** What any part of the server may use. */
const SERVICES = ['http', 'auth', 'mail', 'storage', 'jobs', 'db'];
/** The places where the parts meet; the nightly sweep clears up behind all of them. */
const MEETING_PLACES = new Set(['server/main.ts', 'server/app.ts', 'server/db/seed.ts', 'server/jobs/sweep.ts']);

export const serverFolders: Rule = (files) =>
  eachImport(
    files.filter((file) => within(file, 'server')),
    (file, target, { specifier }) => {
      if (target.kind !== 'file' || !target.path.startsWith('server/')) {
        const isSetup = within(file, 'server/setup') && file.path.endsWith('.mjs');
        if (!isSetup || specifier.startsWith('node:')) return null;
        return `the set-up runs before any package is there and may not import ${specifier}`;
      }
      if (target.path === 'server/main') return 'nobody imports main.ts';
      const from = below(file.path, 'server');
      const to = below(target.path, 'server');
      if (from === to) return null;
      if (to === 'setup' || from === 'setup') return `the set-up and the server do not import each other: ${specifier}`;
      if (target.path === 'server/app') return file.path === 'server/main.ts' ? null : 'only main.ts imports app.ts';
      if (!RESOURCES.includes(to) || MEETING_PLACES.has(file.path)) return null;
      if (SERVICES.includes(from)) return `server/${from} serves all resources and may not import ${specifier}`;
      return target.path === `server/${to}/rules`
        ? null
        : `server/${to} is reached through its rules, not ${specifier}`;
    },
  );

export const serverFolderNames: Rule = (files) => {
  const known = [...RESOURCES, ...SERVICES, 'setup', 'cli', ''];
  return files
    .filter((file) => within(file, 'server') && !known.includes(below(file.path, 'server')))
    .map((file) => `${file.path}:1: "${below(file.path, 'server')}" is no folder of server/`);
};
