// What the rules are made with.
import { targetOf, type Import, type SourceFile, type Target } from './source-file';

/** Gives the places that break it, each place with a sentence. */
export type Rule = (files: readonly SourceFile[]) => string[];

export const within = (file: { readonly path: string }, folder: string): boolean => file.path.startsWith(`${folder}/`);
/** The folder right below another, or '' for a file that lies in it. */
export const below = (path: string, folder: string): string => {
  const rest = path.slice(folder.length + 1);
  return rest.includes('/') ? rest.slice(0, rest.indexOf('/')) : '';
};
/** Judges every import whose path can be followed. */
export function eachImport(
  files: readonly SourceFile[],
  judge: (file: SourceFile, target: Target, one: Import) => string | null,
): string[] {
  return files.flatMap((file) =>
    file.imports.flatMap((one) => {
      if (!one.isKnown) return [];
      const fault = judge(file, targetOf(file.path, one.specifier), one);
      return fault === null ? [] : [`${file.path}:${one.line}: ${fault}`];
    }),
  );
}
