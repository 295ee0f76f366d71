// Rules about the names and texts of all files, sources or not.

const TOP = [
  // the four homes of the code, and what goes with them
  ...['shared', 'server', 'src', 'tests', 'e2e', 'drizzle', 'assets', 'public', '.ci', '.config'],
  ...['README.md', 'DEVELOPERS.md', 'package.json', 'package-lock.json', 'tsconfig.json', 'vite.config.ts'],
  ...['drizzle.config.ts', 'index.html', '.env.example', '.gitignore', '.npmrc', '.prettierrc.json', '.prettierignore'],
  // pictures for README.md
  'screenshots',
];

export function topLevel(paths: readonly string[]): string[] {
  const strangers = new Set(paths.map((path) => path.split('/')[0]!).filter((name) => !TOP.includes(name)));
  return [...strangers].map((name) => `${name}: the top level holds only what the architecture names`);
}

const KEBAB = /^\.?[a-z0-9]+(-[a-z0-9]+)*(\.[a-z0-9]+(-[a-z0-9]+)*)*$/;

/** Folders and files of the code; README.md and its like stand out on purpose, migrations are named by their tool. */
export function kebabCase(paths: readonly string[]): string[] {
  return paths
    .filter((path) => /^(shared|server|src|tests|e2e|assets|public)\//.test(path))
    .filter((path) => path.split('/').some((name) => !KEBAB.test(name) && !/^[A-Z]+\.md$/.test(name)))
    .map((path) => `${path}: names are in kebab-case`);
}

const host = (...labels: readonly string[]): string => labels.join('\\.');
/** Put together from parts, so that this file does not hold what it looks for. */
const FOREIGN: readonly (readonly [RegExp, string])[] = [
  [
    new RegExp(`${host('npmjs', '(org|com)')}|${host('npmmirror', 'com')}|${host('yarnpkg', 'com')}`, 'i'),
    'a registry',
  ],
  [new RegExp(`\\b${host('(deb|security|snapshot|ftp)', 'debian', 'org')}`, 'i'), 'a registry'],
  [/\b(registry|artifactory|nexus|npm-proxy)\.[a-z0-9-]+\.[a-z]{2,}/i, 'a registry'],
  [/"resolved": "https?:/, 'a registry'],
  [/(?<![\w.}-])\/(root|work)\/\w/, "this machine's folders"],
  [/(?<![\w.}-])\/(home|Users)\/[a-z]/, "a person's folders"],
];

/** A checkout must not tell where it was made, nor where its packages came from. */
export function noForeignPlaces(path: string, text: string): string[] {
  return text
    .split('\n')
    .flatMap((line, i) =>
      FOREIGN.filter(([pattern]) => pattern.test(line)).map(([, what]) => `${path}:${i + 1}: names ${what}`),
    );
}
