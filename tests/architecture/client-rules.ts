// Rules of src/.
import { below, eachImport, within, type Rule } from './walk';

/** What each part of the client may import of the others. */
const CLIENT: Readonly<Record<string, readonly string[]>> = {
  app: ['pages', 'features', 'document', 'components', 'lib'],
  pages: ['features', 'document', 'components', 'lib'],
  features: ['document', 'workers', 'components', 'lib'],
  document: ['workers', 'lib'],
  workers: ['lib'],
  components: ['lib'],
  lib: [],
};

export const clientFolders: Rule = (files) =>
  eachImport(
    files.filter((file) => within(file, 'src') && below(file.path, 'src') !== ''),
    (file, target, { specifier }) => {
      if (target.kind !== 'file' || !target.path.startsWith('src/')) return null;
      const from = below(file.path, 'src');
      const to = below(target.path, 'src');
      const allowed = CLIENT[from];
      if (allowed === undefined) return `"${from}" is no folder of src/`;
      if (from === 'features' && to === 'features') {
        const own = below(file.path, 'src/features');
        const other = below(target.path, 'src/features');
        return own === other ? null : `the feature ${own} may not import the feature ${other}`;
      }
      return from === to || allowed.includes(to) ? null : `src/${from} may not import ${specifier}`;
    },
  );

/** The kit fetches nothing: it knows neither the API nor who asks it. */
export const kitFetchesNothing: Rule = (files) => [
  ...eachImport(
    files.filter((file) => within(file, 'src/components')),
    (_file, target, { specifier, isTypeOnly }) => {
      if (target.kind === 'package') {
        return target.name === '@tanstack/react-query'
          ? `the kit fetches nothing and may not import ${specifier}`
          : null;
      }
      if (target.kind === 'door') {
        return target.folder === 'api' && !isTypeOnly ? 'the kit fetches nothing and may not import #shared/api' : null;
      }
      const isFetching = /^src\/lib\/(queries\/|api$|auth-calls$|upload$|query-client$|me$)/.test(target.path);
      return isFetching && !isTypeOnly ? `the kit fetches nothing and may not import ${specifier}` : null;
    },
  ),
  ...files
    .filter((file) => within(file, 'src/components'))
    .flatMap((file) =>
      file.globals
        .filter((use) => use.name === 'fetch' || use.name === 'XMLHttpRequest')
        .map((use) => `${file.path}:${use.line}: the kit fetches nothing and may not use ${use.name}`),
    ),
];

/** The open scene does not know React, but for its one file of hooks. */
export const documentWithoutReact: Rule = (files) =>
  eachImport(
    files.filter((file) => within(file, 'src/document') && !/^src\/document\/hooks\.tsx?$/.test(file.path)),
    (_file, target, { specifier }) =>
      target.kind === 'package' && /^(react|react-dom|@react-three\/.*|react-router-dom)$/.test(target.name)
        ? `src/document is React-free but for its hooks.ts, and may not import ${specifier}`
        : null,
  );
