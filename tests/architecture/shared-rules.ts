// Rules of shared/: who may call whom, and what a pure folder keeps away from.
import { below, eachImport, within, type Rule } from './walk';
import type { Target } from './source-file';

/** The folder of shared/ that an import leads to. */
const sharedFolder = (target: Target): string | null => {
  if (target.kind === 'door') return target.folder;
  return target.kind === 'file' && target.path.startsWith('shared/') ? below(target.path, 'shared') : null;
};

interface SharedFolder {
  readonly may: readonly string[];
  /** Folders of which it may know the types only. */
  readonly mayTypes?: readonly string[];
  readonly packages?: readonly string[];
}

/** `units <- geometry, scene <- check <- fit` and `units, scene <- parts, pedals, setout, review, access <- api`. */
export const SHARED_FOLDERS: Readonly<Record<string, SharedFolder>> = {
  units: { may: [] },
  geometry: { may: ['units'], packages: ['three', 'three-mesh-bvh'] },
  scene: { may: ['units'], packages: ['zod'] },
  check: { may: ['units', 'geometry', 'scene'], packages: ['zod'] },
  fit: { may: ['units', 'geometry', 'scene', 'check'], packages: ['zod'] },
  parts: { may: ['units', 'scene'], packages: ['zod'] },
  pedals: { may: ['units', 'scene'], packages: ['zod'] },
  setout: { may: ['units', 'scene'], packages: ['zod'] },
  // a finding's life is that of the report's findings
  review: { may: ['units', 'scene'], mayTypes: ['check'], packages: ['zod'] },
  access: { may: [], packages: ['zod'] },
  api: {
    may: ['units', 'scene', 'parts', 'pedals', 'setout', 'review', 'access'],
    mayTypes: ['check'],
    packages: ['zod'],
  },
};

export const sharedDirections: Rule = (files) =>
  eachImport(
    files.filter((file) => within(file, 'shared')),
    (file, target, { specifier, isTypeOnly }) => {
      const from = below(file.path, 'shared');
      const folder = SHARED_FOLDERS[from];
      if (folder === undefined) return `"${from}" is no folder of shared/`;
      if (target.kind === 'package') {
        return folder.packages?.includes(target.name) ? null : `shared/${from} may not import the package ${specifier}`;
      }
      const to = sharedFolder(target);
      if (to === null) return `shared/ imports nothing outside itself, here ${specifier}`;
      if (to === from || folder.may.includes(to)) return null;
      if (isTypeOnly && folder.mayTypes?.includes(to)) return null;
      const only = folder.mayTypes?.includes(to) ? ' but for its types' : '';
      return `shared/${from} may not import shared/${to}${only}`;
    },
  );

/** One door per folder: `#shared/x` from outside, relative paths inside. A folder's own tests may go inside. */
export const sharedDoors: Rule = (files) =>
  eachImport(files, (file, target, { specifier }) => {
    const from = within(file, 'shared') ? below(file.path, 'shared') : null;
    if (target.kind === 'door') {
      if (SHARED_FOLDERS[target.folder] === undefined) return `${specifier} is no door of shared/`;
      return target.folder === from ? `inside shared/${from} the path is relative, not ${specifier}` : null;
    }
    const to = sharedFolder(target);
    if (to === null || to === from || within(file, `tests/shared/${to}`)) return null;
    return `shared/${to} is entered through #shared/${to}, not ${specifier}`;
  });

/** What the language offers and a pure folder must not touch; what belongs to browser and Node does not even compile there. */
const IMPURE = new Set(
  (
    'Date globalThis performance process crypto Buffer window document navigator location fetch ' +
    'setTimeout setInterval setImmediate queueMicrotask requestAnimationFrame localStorage sessionStorage ' +
    'Worker self postMessage XMLHttpRequest require module __dirname __filename console'
  ).split(' '),
);

export const sharedPurity: Rule = (files) =>
  files
    .filter((file) => within(file, 'shared'))
    .flatMap((file) => [
      ...file.globals
        .filter((use) => IMPURE.has(use.name))
        .map((use) => `${file.path}:${use.line}: shared/ is pure and may not use ${use.name}`),
      ...file.mathUses
        .filter((use) => use.name === 'random')
        .map((use) => `${file.path}:${use.line}: shared/ is pure and may not use Math.random`),
    ]);

/** Their last digits differ from engine to engine; square roots and the four operations do not. */
const INEXACT = new Set(
  (
    'sin cos tan asin acos atan atan2 sinh cosh tanh asinh acosh atanh exp expm1 log log10 log1p log2 pow cbrt ' +
    'hypot ?'
  ).split(' '),
);

export const sameInEveryEngine: Rule = (files) =>
  files
    .filter((file) => ['shared/geometry', 'shared/check', 'shared/fit', 'shared/scene'].some((f) => within(file, f)))
    .flatMap((file) => [
      ...file.mathUses
        .filter((use) => INEXACT.has(use.name))
        .map((use) => `${file.path}:${use.line}: Math.${use.name} differs between engines; take shared/units' own`),
      ...file.powers.map((line) => `${file.path}:${line}: ** differs between engines; multiply`),
    ]);
