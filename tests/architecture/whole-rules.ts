// Rules of the whole tree.
import { targetOf, type SourceFile, type Target } from './source-file';
import { eachImport, type Rule } from './walk';

/** Imports whose path is put together at run time, each with its reason. */
const UNKNOWN_IMPORTS: Readonly<Record<string, string>> = {
  'server/setup/check.mjs': 'runs the compiled command, which is there only when it is built',
};

export const everyImportIsKnown: Rule = (files) =>
  files.flatMap((file) =>
    file.imports
      .filter((one) => !one.isKnown && UNKNOWN_IMPORTS[file.path] === undefined)
      .map(
        (one) => `${file.path}:${one.line}: import of ${one.specifier}: write the path out, so that it can be followed`,
      ),
  );

/** `server` and `src` import `shared`, never each other; nothing imports tests. */
export const sides: Rule = (files) =>
  eachImport(files, (file, target, { specifier }) => {
    if (target.kind !== 'file') return null;
    const [side = ''] = file.path.split('/');
    const [to = ''] = target.path.split('/');
    if (side === 'server' && to === 'src') return `the server may not import the client's ${specifier}`;
    if (side === 'src' && to === 'server') return `the client may not import the server's ${specifier}`;
    if (side === 'e2e' && (to === 'src' || to === 'server') && !target.path.startsWith('server/setup/')) {
      return `browser tests use the product as people do and import no ${specifier}`;
    }
    const isProduct = side === 'server' || side === 'src' || side === 'shared';
    if (isProduct && (to === 'tests' || to === 'e2e')) return `the product may not import the tests' ${specifier}`;
    return null;
  });

const ending = /\.(tsx?|mjs|js)$/;

/** Where an import of a file leads, among the files that there are. */
function resolver(files: readonly SourceFile[]): (target: Target) => string | null {
  const byStem = new Map<string, string>();
  for (const file of files) {
    const stem = file.path.replace(ending, '');
    byStem.set(stem, file.path);
    if (stem.endsWith('/index')) byStem.set(stem.slice(0, -'/index'.length), file.path);
  }
  return (target) => {
    if (target.kind === 'package') return null;
    return byStem.get(target.kind === 'door' ? `shared/${target.folder}/index` : target.path) ?? null;
  };
}

/** Names every ring of files that import one another, each once. */
export const noCycles: Rule = (files) => {
  const resolve = resolver(files);
  const next = new Map(
    files.map((file) => [
      file.path,
      [
        ...new Set(file.imports.map((one) => (one.isKnown ? resolve(targetOf(file.path, one.specifier)) : null))),
      ].filter((path) => path !== null),
    ]),
  );
  const done = new Set<string>();
  const found = new Map<string, string>();
  const visit = (path: string, trail: readonly string[]): void => {
    const at = trail.indexOf(path);
    if (at >= 0) {
      const ring = trail.slice(at);
      found.set([...ring].sort().join(), `${[...ring, path].join(' -> ')}: these import one another in a circle`);
      return;
    }
    if (done.has(path)) return;
    for (const other of next.get(path) ?? []) visit(other, [...trail, path]);
    done.add(path);
  };
  for (const file of files) visit(file.path, []);
  return [...found.values()];
};

export const LONGEST = 400;

/** Files above the limit, but for those listed with a reason; a reason that is no longer needed is a fault too. */
export const fileLength =
  (reasons: Readonly<Record<string, string>>): Rule =>
  (files) => [
    ...files
      .filter((file) => file.lines > LONGEST && reasons[file.path] === undefined)
      .map((file) => `${file.path}:1: ${file.lines} lines, above ${LONGEST}; split it, or give the reason`),
    ...Object.keys(reasons)
      .filter((path) => !files.some((file) => file.path === path && file.lines > LONGEST))
      .map((path) => `${path}:1: the reason for its length is no longer needed`),
  ];

const word = (...parts: readonly string[]): RegExp => new RegExp(`\\b${parts.join('')}\\b`);
/** Put together from parts, so that this file does not hold what it looks for. */
const SWITCHES: readonly (readonly [RegExp, string])[] = [
  [word('eslint', '-disable'), 'switches the linter off'],
  [word('ts', '-(ignore|expect-error|nocheck)'), 'switches the compiler off'],
  [word('(TO', 'DO|FIX', 'ME)'), 'leaves something for later'],
  [word('(test|it|describe)', '\\.(skip|only|fixme|todo|skipIf|runIf)'), 'switches tests off'],
];

export const nothingSwitchedOff: Rule = (files) =>
  files.flatMap((file) =>
    file.text
      .split('\n')
      .flatMap((line, i) =>
        SWITCHES.filter(([pattern]) => pattern.test(line)).map(([, what]) => `${file.path}:${i + 1}: ${what}`),
      ),
  );
